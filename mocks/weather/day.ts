import { getTimes } from 'suncalc';
import { stream, uniform } from './noise.ts';

export const hourMs = 3_600_000;
const dayMs = 24 * hourMs;

/** The sun's times on one solar day, epoch milliseconds. */
export interface SolarDay {
  index: number;
  sunriseMs: number;
  noonMs: number;
  sunsetMs: number;
  /** When the breeze begins and how long it takes to come up, hours; when the inversion is gone, hours after sunrise. */
  onsetH: number;
  rampH: number;
  breakH: number;
}

/** Solar days at a place, remembered; where the sun does not rise or set the day is drawn in to half an hour from noon or midnight. */
export function createDays(seed: number, latitude: number, longitude: number): { at(atMs: number): SolarDay; day(index: number): SolarDay } {
  const key = stream(seed, 'breeze');
  const known = new Map<number, SolarDay>();
  const offsetMs = (longitude / 15) * hourMs;
  function day(index: number): SolarDay {
    const kept = known.get(index);
    if (kept) return kept;
    const middayMs = index * dayMs + dayMs / 2 - offsetMs;
    const { sunrise, sunset, solarNoon, alwaysUp } = getTimes(new Date(middayMs), latitude, longitude);
    const noonMs = solarNoon.getTime();
    const halfMs = sunrise && sunset ? (sunset.getTime() - sunrise.getTime()) / 2 : (alwaysUp ? 11.5 : 0.5) * hourMs;
    const lateness = uniform(key, index);
    const made = { index, sunriseMs: noonMs - halfMs, noonMs, sunsetMs: noonMs + halfMs, onsetH: 0.8 + 1.7 * lateness, rampH: 2.4 + 1.4 * uniform(key, index + 500_000), breakH: 0.8 + 1.3 * lateness };
    known.set(index, made);
    return made;
  }
  return { day, at: (atMs) => day(Math.floor((atMs + offsetMs) / dayMs)) };
}
