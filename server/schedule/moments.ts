import { createHash } from 'node:crypto';
import { DateTime } from 'luxon';
import { getTimes } from 'suncalc';

/** What of a farm decides its moments. */
export interface Place {
  latitude: number;
  longitude: number;
  /** IANA zone. */
  timeZone: string;
  /** Local time of the eve notice, HH:MM. */
  eveTime: string;
  /** The dawn notice comes this long before sunrise. */
  dawnLeadMinutes: number;
}

/** One moment of a farm's day, and the morning (local date) it is about. */
export interface Moment {
  at: Date;
  morning: string;
}

/** Where the sun neither rises nor reaches civil twilight in the morning, dawn is taken at this local time. */
const polarDawn = '06:00';
/** A sun that comes up later than this leaves no morning before local noon: the ends of the polar night. */
const latestDawn = '11:00';
const dayMs = 86_400_000;

/**
 * The instant of a local time. In the hour that a clock change leaves out, as much later as the gap is long; in the hour that
 * comes twice, the first.
 */
export function localInstant(date: string, time: string, timeZone: string): Date {
  const local = DateTime.fromISO(`${date}T${time}:00`, { zone: timeZone });
  return new Date(Math.min(...local.getPossibleOffsets().map((possible) => possible.toMillis())));
}

const shifted = (date: string, days: number): string => DateTime.fromISO(date, { zone: 'utc' }).plus({ days }).toISODate()!;
const localDate = (instant: Date, timeZone: string): string => DateTime.fromJSDate(instant, { zone: timeZone }).toISODate()!;

/** The eve of a morning: the farm's eve time on the local date before it. */
export const eveAt = (morning: string, place: Pick<Place, 'eveTime' | 'timeZone'>): Date => localInstant(shifted(morning, -1), place.eveTime, place.timeZone);

/** Sun times of the solar day whose noon lies nearest to the local noon of a date; every date has exactly one. */
function sunOf(date: string, { latitude, longitude, timeZone }: Pick<Place, 'latitude' | 'longitude' | 'timeZone'>) {
  const noon = localInstant(date, '12:00', timeZone).getTime();
  const days = [0, -1, 1].map((offset) => getTimes(new Date(noon + offset * dayMs), latitude, longitude));
  return days.reduce((nearest, day) => (Math.abs(day.solarNoon.getTime() - noon) < Math.abs(nearest.solarNoon.getTime() - noon) ? day : nearest));
}

/** Sunrise of a date; where there is none in the morning (polar day or night) the beginning of civil twilight, and without that 06:00 local. */
export function daybreakAt(morning: string, place: Pick<Place, 'latitude' | 'longitude' | 'timeZone'>): Date {
  const { sunrise, dawn } = sunOf(morning, place);
  const latest = localInstant(morning, latestDawn, place.timeZone);
  return [sunrise, dawn].find((at) => at !== null && at <= latest) ?? localInstant(morning, polarDawn, place.timeZone);
}

/** The dawn notice of a morning. */
export const dawnAt = (morning: string, place: Place): Date => new Date(daybreakAt(morning, place).getTime() - place.dawnLeadMinutes * 60_000);

/** A notice about a morning helps until its local noon. */
export const morningEnds = (morning: string, timeZone: string): Date => localInstant(morning, '12:00', timeZone);

/** The first moment of a kind after an instant. */
export function nextMoment(kind: 'eve' | 'dawn', place: Place, after: Date): Moment {
  const moment = kind === 'eve' ? eveAt : dawnAt;
  let morning = shifted(localDate(after, place.timeZone), -1);
  for (let tries = 0; tries < 6; tries += 1) {
    const at = moment(morning, place);
    if (at > after) return { at, morning };
    morning = shifted(morning, 1);
  }
  throw new Error(`No ${kind} was found within five days of ${after.toISOString()} in ${place.timeZone}.`);
}

/** The last moment of a kind at or before an instant. */
export function lastMoment(kind: 'eve' | 'dawn', place: Place, until: Date): Moment {
  const moment = kind === 'eve' ? eveAt : dawnAt;
  let morning = shifted(localDate(until, place.timeZone), 2);
  for (let tries = 0; tries < 6; tries += 1) {
    const at = moment(morning, place);
    if (at <= until) return { at, morning };
    morning = shifted(morning, -1);
  }
  throw new Error(`No ${kind} was found within five days before ${until.toISOString()} in ${place.timeZone}.`);
}

/** The next hourly refresh of a farm after an instant: each farm has its own minute and second, so that they do not all ask at once. */
export function nextRefresh(farmId: string, after: Date): Date {
  const offsetMs = (createHash('sha256').update(farmId).digest().readUInt32BE(0) % 3600) * 1000;
  const hourMs = 3_600_000;
  return new Date(Math.floor((after.getTime() - offsetMs) / hourMs) * hourMs + hourMs + offsetMs);
}
