export type StabilityClass = 'A' | 'B' | 'C' | 'D' | 'E' | 'F' | 'G';
export const stabilityClasses = ['A', 'B', 'C', 'D', 'E', 'F', 'G'] as const satisfies readonly StabilityClass[];

/** [epa454, Table 6-4]: upper edge of the wind row (m/s at 10 m, one decimal) and class 1–7 for net radiation index 4, 3, 2, 1, 0, −1, −2. */
const rows: readonly (readonly [upToMs: number, classes: readonly number[]])[] = [
  [0.7, [1, 1, 2, 3, 4, 6, 7]],
  [1.8, [1, 2, 2, 3, 4, 6, 7]],
  [2.8, [1, 2, 3, 4, 4, 5, 6]],
  [3.3, [2, 2, 3, 4, 4, 5, 6]],
  [3.8, [2, 2, 3, 4, 4, 4, 5]],
  [4.8, [2, 3, 3, 4, 4, 4, 5]],
  [5.4, [3, 3, 4, 4, 4, 4, 5]],
  [5.9, [3, 3, 4, 4, 4, 4, 4]],
  [Infinity, [3, 4, 4, 4, 4, 4, 4]],
];

/**
 * Turner's stability class from wind and net radiation index [turner1964; epa454, Table 6-4].
 * @param windMs 10 m wind, m/s @param netRadiationIndex −2..4
 * @returns 'A' (very unstable) … 'G' (very stable; EPA merges G into F); null for unknown input
 */
export function turnerClass(windMs: number, netRadiationIndex: number): StabilityClass | null {
  if (!(windMs >= 0) || !Number.isInteger(netRadiationIndex) || netRadiationIndex < -2 || netRadiationIndex > 4) return null;
  const rounded = Math.round(windMs * 10) / 10;
  const row = rows.find(([upToMs]) => rounded <= upToMs);
  const number = row?.[1][4 - netRadiationIndex];
  return number === undefined ? null : (stabilityClasses[number - 1] ?? null);
}

/** Insolation class number by solar altitude [epa454, Table 6-5; the row up to 15° from memory]. */
export function insolationClass(sunAltitudeDeg: number): 1 | 2 | 3 | 4 {
  if (sunAltitudeDeg > 60) return 4;
  if (sunAltitudeDeg > 35) return 3;
  return sunAltitudeDeg > 15 ? 2 : 1;
}

/**
 * Net radiation index [epa454, Table 6-6; the cloudy-day rows from memory].
 * @param sunAltitudeDeg degrees @param cloudTenths 0–10 @param ceilingM height of the cloud base, m; null = unknown, then taken as high
 * @param isNight Turner's night: from one hour before sunset to ONE HOUR AFTER SUNRISE
 * @returns −2..4
 */
export function netRadiationIndex(sunAltitudeDeg: number, cloudTenths: number, ceilingM: number | null, isNight: boolean): number {
  const low = 7000 * 0.3048;
  const middle = 16_000 * 0.3048;
  const ceiling = ceilingM ?? Infinity;
  if (cloudTenths >= 10 && ceiling < low) return 0;
  if (isNight) return cloudTenths <= 4 ? -2 : -1;
  const insolation = insolationClass(sunAltitudeDeg);
  if (cloudTenths <= 5) return insolation;
  let less = 0;
  if (ceiling < low) less = 2;
  else if (ceiling < middle || cloudTenths >= 10) less = 1;
  return Math.max(1, insolation - less);
}
