import { prepareInversion } from '../../shared/atmosphere/inversion/index.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { sunAltitudeDeg, sunTimesNear } from '../../shared/sun/sun.ts';
import { fairHours, site } from './cases.ts';

/** The invented farm's June morning: three days of hours, dawn in the second night. */
export const sunriseMs = sunTimesNear(Date.parse('2026-06-11T20:00:00Z'), site.latitude, site.longitude).sunriseMs!;
export const altitudeAt = (epochMs: number): number => sunAltitudeDeg(epochMs, site.latitude, site.longitude);
const warmth = (epochMs: number): number => Math.sin(((((epochMs / 3_600_000 - 7) % 24) - 9) / 24) * 2 * Math.PI);

/** A run of clear days with a wide range of temperature and hardly any wind. */
export const clearCalm = (change: Partial<ForecastHour> = {}): ForecastHour[] =>
  fairHours((epochMs) => ({ temperature2mC: 14 + 9 * warmth(epochMs), relativeHumidityPct: 68 - 28 * warmth(epochMs), dewPoint2mC: null, windSpeed10mMs: 0.9, cloudCoverPct: 0, shortwaveWm2: null, ...change }));

/** Overcast and windy, hardly warmer by day. */
export const dullWindy = (change: Partial<ForecastHour> = {}): ForecastHour[] =>
  fairHours((epochMs) => ({ temperature2mC: 14 + 1.5 * warmth(epochMs), relativeHumidityPct: 80, dewPoint2mC: null, windSpeed10mMs: 7, cloudCoverPct: 100, shortwaveWm2: null, ...change }));

/** Likelihood so many hours after sunrise. */
export function likelihoodAt(hours: readonly ForecastHour[], fromSunriseH: number, place: Partial<Parameters<typeof prepareInversion>[0]['site']> = {}): number | null {
  return prepareInversion({ site: { ...site, ...place }, hours, sunAltitudeDegAt: altitudeAt }).at(sunriseMs + fromSunriseH * 3_600_000).likelihood;
}
