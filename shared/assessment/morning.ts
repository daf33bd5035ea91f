import { clearSkyHaurwitzWm2 } from '../atmosphere/radiation/haurwitz.ts';
import { sunAltitudeDeg, sunTimesNear, type SunTimes } from '../sun/sun.ts';
import { localInstantMs, zoneOffsetMinutes } from '../units/time-zone.ts';
import type { Site } from './case.ts';
import { hourMs } from './hours.ts';

export const stepMinutes = 5;
export const stepMs = stepMinutes * 60_000;
const stepsPerHour = 12;

/** One date at one site: its steps and its sun, computed once and shared by every forecast, member and plan. */
export interface Morning {
  site: Site;
  date: string;
  sun: SunTimes;
  localNoonMs: number;
  /** Number of 5-minute steps; step i stands for [startMs + i·5 min, + 5 min). 0 when there is no morning (polar night). */
  count: number;
  startMs: number;
  /** Start of the hour in which the first step lies, and the hours that the steps touch. */
  firstHourMs: number;
  hourCount: number;
  /** Steps between `firstHourMs` and `startMs`. */
  offsetSteps: number;
  /** Sun's altitude at the start of each step, degrees, without refraction. */
  sunAltitudeDeg: Float64Array;
  /** Clear-sky radiation at each step, and its mean over each hour touched, W/m² [haurwitz1945]. */
  clearSkyWm2: Float64Array;
  clearSkyOfHourWm2: Float64Array;
  /** Start of each step, UTC ISO 8601. */
  times(): readonly string[];
}

/**
 * Lays out the morning of a date: from civil dawn to 12:00 on the local clock in steps of 5 minutes, the first on the first
 * full 5 minutes after civil dawn. Where the sun stays above −6° all night (polar day) the morning begins at local midnight;
 * where it never reaches −6° (polar night) there is no morning.
 * @param date local calendar date, `YYYY-MM-DD`
 * @throws RangeError for an unknown zone
 */
export function morningOf(site: Site, date: string): Morning {
  const localNoonMs = localInstantMs(date, 720, site.timeZone);
  const midnightMs = localInstantMs(date, 0, site.timeZone);
  const sun = sunTimesNear(localNoonMs, site.latitude, site.longitude);
  const dawnMs = sun.civilDawnMs ?? (sunAltitudeDeg(sun.solarNoonMs, site.latitude, site.longitude) > -6 ? midnightMs : Infinity);
  const startMs = Math.ceil(Math.max(dawnMs, midnightMs) / stepMs) * stepMs;
  const count = startMs < localNoonMs ? Math.ceil((localNoonMs - startMs) / stepMs) : 0;
  const firstHourMs = count > 0 ? Math.floor(startMs / hourMs) * hourMs : Math.floor(localNoonMs / hourMs) * hourMs;
  const hourCount = count > 0 ? Math.ceil((startMs + count * stepMs - firstHourMs) / hourMs) : 0;
  const offsetSteps = count > 0 ? (startMs - firstHourMs) / stepMs : 0;
  const altitude = new Float64Array(count);
  const clearSky = new Float64Array(count);
  const clearSkyOfHour = new Float64Array(hourCount);
  for (let grid = 0; grid < hourCount * stepsPerHour; grid += 1) {
    const degrees = sunAltitudeDeg(firstHourMs + grid * stepMs, site.latitude, site.longitude);
    const clear = clearSkyHaurwitzWm2(degrees);
    const hour = Math.floor(grid / stepsPerHour);
    clearSkyOfHour[hour] = clearSkyOfHour[hour]! + clear / stepsPerHour;
    const step = grid - offsetSteps;
    if (step < 0 || step >= count) continue;
    altitude[step] = degrees;
    clearSky[step] = clear;
  }
  let times: string[] | null = null;
  return {
    site,
    date,
    sun,
    localNoonMs,
    count,
    startMs,
    firstHourMs,
    hourCount,
    offsetSteps,
    sunAltitudeDeg: altitude,
    clearSkyWm2: clearSky,
    clearSkyOfHourWm2: clearSkyOfHour,
    times: () => (times ??= Array.from({ length: count }, (_, step) => new Date(startMs + step * stepMs).toISOString())),
  };
}

/** Minutes by the local clock since midnight of the morning's date; 1440 and more on the next day. */
export function clockMinutes(morning: Pick<Morning, 'date' | 'site'>, epochMs: number): number {
  const wallMs = epochMs + zoneOffsetMinutes(epochMs, morning.site.timeZone) * 60_000;
  return Math.round((wallMs - Date.parse(`${morning.date}T00:00:00Z`)) / 60_000);
}
