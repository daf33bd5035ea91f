import type { Units } from '../../shared/api/accounts.ts';
import { formatsFor } from '../../shared/assessment/formats.ts';
import { localDateOf } from '../../shared/units/time-zone.ts';

/** How a person reads: their units (which choose the clock, too) and the farm's zone. */
export interface Reader {
  units: Units;
  timeZone: string;
}

/** Formatters are kept, because making one is slow. */
const formatters = new Map<string, Intl.DateTimeFormat>();

function formatter(options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const language = document.documentElement.lang || 'en';
  const key = language + JSON.stringify(options);
  const made = formatters.get(key) ?? new Intl.DateTimeFormat(language === 'en' ? 'en-US' : language, options);
  formatters.set(key, made);
  return made;
}

/** The local calendar date of an instant, `YYYY-MM-DD`. */
export const dateOf = (instant: string, timeZone: string): string => localDateOf(Date.parse(instant), timeZone);

/** Clock time as the sentences of an assessment write it: `5:25`, in the afternoon `2:10 pm`; metric readers get `05:25`. */
export const clockTime = (instant: string, { units, timeZone }: Reader): string => formatsFor({ units, timeZone, date: dateOf(instant, timeZone) }).clock(instant).text;

/** Date and clock time, `Jun 10, 8:00 PM`: for anything that may lie outside a morning. */
export const dateTime = (instant: string, { units, timeZone }: Reader): string => formatter({ month: 'short', day: 'numeric', hour: 'numeric', minute: '2-digit', hour12: units === 'us', timeZone }).format(new Date(instant));

const noon = (date: string): Date => new Date(`${date}T12:00:00Z`);

/** A calendar date in words, `Wednesday, June 10`. */
export const longDate = (date: string): string => formatter({ weekday: 'long', month: 'long', day: 'numeric', timeZone: 'UTC' }).format(noon(date));

/** A calendar date in few letters, `Jun 10`. */
export const shortDate = (date: string): string => formatter({ month: 'short', day: 'numeric', timeZone: 'UTC' }).format(noon(date));

/** The day of the week in few letters, `Wed`. */
export const weekday = (date: string): string => formatter({ weekday: 'short', timeZone: 'UTC' }).format(noon(date));

/** Whole days from one calendar date to another. */
export const daysBetween = (from: string, to: string): number => Math.round((noon(to).getTime() - noon(from).getTime()) / 86_400_000);

/** Minutes from one instant to another; never negative. */
export const minutesBetween = (from: string, to: string): number => Math.max(0, (Date.parse(to) - Date.parse(from)) / 60_000);

/** A span in words: `4 min`, `3 h`, `2 days`. */
export function span(minutes: number): string {
  if (minutes < 1) return 'less than a minute';
  if (minutes < 90) return `${Math.round(minutes)} min`;
  return minutes < 48 * 60 ? `${Math.round(minutes / 60)} h` : `${Math.round(minutes / 1440)} days`;
}
