import { windProfileFactor } from '../atmosphere/wind-profile.ts';
import type { ForecastHour, Reading } from './case.ts';
import { hourMs, hourStartMs } from './hours.ts';

export interface SiteWindFactor {
  /** Wind at the site over the forecast's wind, at equal height. */
  factor: number;
  /** Readings it was learned from. */
  readings: number;
}

/** Below this many usable readings nothing is learned. */
const leastReadings = 5;
/** In lighter forecast wind a ratio says little. */
const leastForecastMs = 1;
/** A learned factor outside this range is taken for a faulty instrument or height and held at its edge. */
const plausible = [0.3, 2] as const;

function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

/**
 * Learns how the site's wind compares with the forecast's: the median ratio of anemometer readings, brought to 10 m by the
 * FAO-56 profile, to the forecast interpolated to their moments.
 * @param hours in order; only readings that they cover count
 * @returns null below 5 usable readings
 */
export function learnSiteWindFactor(hours: readonly ForecastHour[], readings: readonly Reading[]): SiteWindFactor | null {
  if (readings.length < leastReadings) return null;
  const windAt = new Map<number, number>();
  for (const hour of hours) if (hour.windSpeed10mMs !== null) windAt.set(hourStartMs(hour.time), hour.windSpeed10mMs);
  const ratios: number[] = [];
  for (const reading of readings) {
    if (reading.windSpeedMs === null) continue;
    const atMs = Date.parse(reading.time);
    const hourStart = Math.floor(atMs / hourMs) * hourMs;
    const from = windAt.get(hourStart);
    const to = atMs === hourStart ? from : windAt.get(hourStart + hourMs);
    if (from === undefined || to === undefined) continue;
    const forecastMs = from + ((to - from) * (atMs - hourStart)) / hourMs;
    const profile = windProfileFactor(reading.windHeightM, 10);
    if (forecastMs >= leastForecastMs && profile > 0) ratios.push((reading.windSpeedMs * profile) / forecastMs);
  }
  if (ratios.length < leastReadings) return null;
  return { factor: Math.min(plausible[1], Math.max(plausible[0], median(ratios))), readings: ratios.length };
}
