import type { ForecastHour } from './case.ts';
import { unknownHour } from './unknown-hour.ts';
import { hourMs, hourStartMs, withHumidity } from './hours.ts';

/** Hours of weather around a morning's start that its night, dew and wet leaves come from, and the drying goes on in. */
const hoursBefore = 48;
const hoursAfter = 40;

/** A missing hour's rain is taken for a wetting one. */
const wettingMm = 1;
/** A missing temperature aloft, where the forecast has one at other hours, is taken this much warmer than near the ground. */
const warmerAloftC = 3;

/** The hours that a morning's inversion and leaf wetness are estimated from, dew point and humidity brought together. */
export function hoursAround(hours: readonly ForecastHour[], startMs: number): readonly ForecastHour[] {
  const fromMs = startMs - hoursBefore * hourMs;
  const toMs = startMs + hoursAfter * hourMs;
  let from = 0;
  while (from < hours.length && hourStartMs(hours[from]!.time) < fromMs) from += 1;
  let to = hours.length;
  while (to > from && hourStartMs(hours[to - 1]!.time) > toMs) to -= 1;
  return hours.slice(from, to).map(withHumidity);
}

const layers = ['cloudCoverPct', 'windSpeed10mMs', 'temperature2mC', 'precipitationMm', 'shortwaveWm2', 'temperature80mC'] as const;
type Layer = (typeof layers)[number];

/**
 * The same hours with every gap filled by the value that speaks most for an inversion and for wet leaves: calm, clear by night,
 * dull by day, saturated, rained on. An estimate made from them is an upper bound for the one that the missing values would have
 * given, so a gap never opens a morning. A layer that the forecast never gives is left out (its absence is the provider's), but for
 * sky, wind and rain, without which no morning is told to be safe.
 * @returns null when nothing is missing
 */
export function cautiousHours(hours: readonly ForecastHour[], sunAltitudeDegAt: (epochMs: number) => number): ForecastHour[] | null {
  if (hours.length === 0 || !hasGaps(hours)) return null;
  const given = new Set<Layer>(['cloudCoverPct', 'windSpeed10mMs', 'precipitationMm']);
  for (const hour of hours) for (const layer of layers) if (hour[layer] !== null) given.add(layer);
  const knownC = hours.flatMap((hour) => hour.temperature2mC ?? []);
  const lowestC = knownC.length === 0 ? null : Math.min(...knownC);
  const filled: ForecastHour[] = [];
  const firstMs = hourStartMs(hours[0]!.time);
  const lastMs = hourStartMs(hours.at(-1)!.time);
  let next = 0;
  for (let ms = firstMs; ms <= lastMs; ms += hourMs) {
    const isGiven = hourStartMs(hours[next]!.time) === ms;
    filled.push(fill(isGiven ? hours[next]! : unknownHour(new Date(ms).toISOString()), given, sunAltitudeDegAt(ms) <= 0, lowestC));
    if (isGiven) next += 1;
  }
  return filled;
}

/** True when an hour is missing in the row or a value within an hour. */
function hasGaps(hours: readonly ForecastHour[]): boolean {
  let givenAloft = 0;
  let givenSun = 0;
  for (const hour of hours) {
    if (hour.cloudCoverPct === null || hour.windSpeed10mMs === null || hour.temperature2mC === null || hour.precipitationMm === null || (hour.dewPoint2mC === null && hour.relativeHumidityPct === null)) return true;
    if (hour.temperature80mC !== null) givenAloft += 1;
    if (hour.shortwaveWm2 !== null) givenSun += 1;
  }
  if ((givenAloft > 0 && givenAloft < hours.length) || (givenSun > 0 && givenSun < hours.length)) return true;
  return hourStartMs(hours.at(-1)!.time) - hourStartMs(hours[0]!.time) !== (hours.length - 1) * hourMs;
}

function fill(hour: ForecastHour, given: ReadonlySet<Layer>, isNight: boolean, lowestC: number | null): ForecastHour {
  const temperature2mC = hour.temperature2mC ?? lowestC;
  const or = (layer: Layer, value: number | null): number | null => hour[layer] ?? (given.has(layer) ? value : null);
  const isDry = hour.dewPoint2mC !== null || hour.relativeHumidityPct !== null;
  return {
    ...hour,
    temperature2mC,
    dewPoint2mC: isDry ? hour.dewPoint2mC : temperature2mC,
    relativeHumidityPct: isDry ? hour.relativeHumidityPct : 100,
    windSpeed10mMs: or('windSpeed10mMs', 0),
    cloudCoverPct: or('cloudCoverPct', isNight ? 0 : 100),
    precipitationMm: or('precipitationMm', wettingMm),
    shortwaveWm2: or('shortwaveWm2', 0),
    temperature80mC: or('temperature80mC', temperature2mC === null ? null : temperature2mC + warmerAloftC),
  };
}
