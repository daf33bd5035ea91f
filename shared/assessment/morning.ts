import { clearSkyHaurwitzWm2 } from '../atmosphere/radiation/haurwitz.ts';
import { sunAltitudeDeg, sunTimesNear, type SunTimes } from '../sun/sun.ts';
import { localInstantMs } from '../units/time-zone.ts';
import type { AssessmentAnswer } from './answer.ts';
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
  /** Sun's altitude at any instant, degrees, without refraction; each instant is computed once for all members and plans. */
  sunAltitudeDegAt(epochMs: number): number;
  /** Sun's altitude at the start of each step, degrees, without refraction. */
  sunAltitudeDeg: Float64Array;
  /** Clear-sky radiation at each step, and its mean over each hour touched, W/m² [haurwitz1945]. */
  clearSkyWm2: Float64Array;
  clearSkyOfHourWm2: Float64Array;
  /** Start of each step and the end of the last, epoch ms and UTC ISO 8601; made when first asked for. */
  stepStartsMs(): Float64Array;
  times(): readonly string[];
  /** Sun times as the answer tells them. */
  sunTimes(): AssessmentAnswer['sun'];
}

/** Mornings laid out lately, so that cases of one site and day share one sun. */
const kept = new Map<string, Morning>();
const mostKept = 64;

/**
 * Lays out the morning of a date: from civil dawn to 12:00 on the local clock in steps of 5 minutes, the first on the first
 * full 5 minutes after civil dawn. Where the sun stays above −6° all night (polar day) the morning begins at local midnight;
 * where it never reaches −6° (polar night) there is no morning.
 * @param date local calendar date, `YYYY-MM-DD`
 * @throws RangeError for an unknown zone
 */
export function morningOf(site: Site, date: string): Morning {
  const key = [site.latitude, site.longitude, site.elevationM, site.timeZone, site.exposure, date].join(' ');
  let morning = kept.get(key);
  if (!morning) {
    if (kept.size >= mostKept) kept.clear();
    kept.set(key, (morning = layOut(site, date)));
  }
  return morning;
}

function layOut(site: Site, date: string): Morning {
  const localNoonMs = localInstantMs(date, 720, site.timeZone);
  const midnightMs = localInstantMs(date, 0, site.timeZone);
  const sun = sunTimesNear(localNoonMs, site.latitude, site.longitude);
  const dawnMs = sun.civilDawnMs ?? (sunAltitudeDeg(sun.solarNoonMs, site.latitude, site.longitude) > -6 ? midnightMs : Infinity);
  // Without a dawn before noon the morning is empty, and lies at noon.
  const startMs = Math.ceil(Math.min(Math.max(dawnMs, midnightMs), localNoonMs) / stepMs) * stepMs;
  const count = Math.max(0, Math.ceil((localNoonMs - startMs) / stepMs));
  const firstHourMs = count > 0 ? Math.floor(startMs / hourMs) * hourMs : Math.floor(localNoonMs / hourMs) * hourMs;
  const hourCount = count > 0 ? Math.ceil((startMs + count * stepMs - firstHourMs) / hourMs) : 0;
  const offsetSteps = count > 0 ? (startMs - firstHourMs) / stepMs : 0;
  const known = new Map<number, number>();
  const altitudeAt = (epochMs: number): number => {
    let degrees = known.get(epochMs);
    if (degrees === undefined) known.set(epochMs, (degrees = sunAltitudeDeg(epochMs, site.latitude, site.longitude)));
    return degrees;
  };
  const altitude = new Float64Array(count);
  const clearSky = new Float64Array(count);
  const clearSkyOfHour = new Float64Array(hourCount);
  for (let grid = 0; grid < hourCount * stepsPerHour; grid += 1) {
    const degrees = altitudeAt(firstHourMs + grid * stepMs);
    const clear = clearSkyHaurwitzWm2(degrees);
    const hour = Math.floor(grid / stepsPerHour);
    clearSkyOfHour[hour] = clearSkyOfHour[hour]! + clear / stepsPerHour;
    const step = grid - offsetSteps;
    if (step < 0 || step >= count) continue;
    altitude[step] = degrees;
    clearSky[step] = clear;
  }
  let starts: Float64Array | null = null;
  let times: string[] | null = null;
  let told: AssessmentAnswer['sun'] | null = null;
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
    sunAltitudeDegAt: altitudeAt,
    sunAltitudeDeg: altitude,
    clearSkyWm2: clearSky,
    clearSkyOfHourWm2: clearSkyOfHour,
    stepStartsMs: () => (starts ??= Float64Array.from({ length: count }, (_, step) => startMs + step * stepMs)),
    times: () => (times ??= Array.from({ length: count + 1 }, (_, step) => new Date(startMs + step * stepMs).toISOString())),
    sunTimes: () => (told ??= { civilDawn: isoOf(sun.civilDawnMs), sunrise: isoOf(sun.sunriseMs), solarNoon: isoOf(sun.solarNoonMs), sunset: isoOf(sun.sunsetMs), localNoon: new Date(localNoonMs).toISOString() }),
  };
}

const isoOf = (ms: number | null): string | null => (ms === null ? null : new Date(ms).toISOString());
