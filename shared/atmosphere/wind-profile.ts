/** Short grass (roughness about 0.015 m), near-neutral air; inside a tree block it does not hold. */
export const windProfileValidity = { heightM: [0.5, 20] } as const;

/** The logarithmic term of [fao56, eq. 47] at a height in m. */
const logTerm = (heightM: number): number => Math.log(67.8 * heightM - 5.42);

/**
 * Ratio of the wind at one height to the wind at another by the FAO-56 logarithmic profile [fao56, eq. 47].
 * @param fromM height of the known wind, m, 0.5–20 @param toM height wanted, m, 0.5–20
 * @returns factor to multiply a wind speed with; NaN outside the validity
 */
export function windProfileFactor(fromM: number, toM: number): number {
  const [min, max] = windProfileValidity.heightM;
  if (!(fromM >= min && fromM <= max && toM >= min && toM <= max)) return NaN;
  return logTerm(toM) / logTerm(fromM);
}

/**
 * Wind at 2 m from the wind at another height [fao56, eq. 47].
 * @param windMs m/s at `heightM` @param heightM m
 * @returns m/s at 2 m
 */
export const windAt2mMs = (windMs: number, heightM: number): number => (windMs * 4.87) / logTerm(heightM);

/** Wind at `toM` from wind at `fromM`, m/s; the two agree at equal heights. */
export const windAtHeightMs = (windMs: number, fromM: number, toM: number): number => windMs * windProfileFactor(fromM, toM);
