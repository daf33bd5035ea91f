/** Times as people read them, always in the farm's own zone. Formatters are kept, because making one is slow. */
const formatters = new Map<string, Intl.DateTimeFormat>();

function formatter(language: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = language + JSON.stringify(options);
  let made = formatters.get(key);
  if (!made) {
    made = new Intl.DateTimeFormat(language, options);
    formatters.set(key, made);
  }
  return made;
}

const language = (): string => document.documentElement.lang || 'en';

/** Whether this language reads a clock of twelve hours. */
const twelveHours = (): boolean => formatter(language() === 'en' ? 'en-US' : language(), { hour: 'numeric' }).resolvedOptions().hour12 === true;

/** Local clock time without am or pm, `5:25`: for mornings, where no one can mistake it. */
export function clockTime(instant: string, timeZone: string): string {
  const parts = formatter('en-US', { hour: 'numeric', minute: '2-digit', hour12: false, hourCycle: 'h23', timeZone }).formatToParts(new Date(instant));
  const of = (type: string): string => parts.find((part) => part.type === type)?.value ?? '';
  return `${Number(of('hour'))}:${of('minute')}`;
}

/** Date and clock time, `Jun 10, 8:00 PM`: for anything that may lie outside a morning. */
export function dateTime(instant: string, timeZone: string): string {
  return formatter(language() === 'en' ? 'en-US' : language(), { month: 'short', day: 'numeric', hour: 'numeric', minute: '2-digit', hour12: twelveHours(), timeZone }).format(new Date(instant));
}

/** The local calendar date of an instant, `YYYY-MM-DD`. */
export function localDate(instant: string, timeZone: string): string {
  return formatter('en-CA', { year: 'numeric', month: '2-digit', day: '2-digit', timeZone }).format(new Date(instant));
}

const day = (date: string): Date => new Date(`${date}T12:00:00Z`);

/** A calendar date in words, `Wednesday, June 10`. */
export function longDate(date: string): string {
  return formatter(language() === 'en' ? 'en-US' : language(), { weekday: 'long', month: 'long', day: 'numeric', timeZone: 'UTC' }).format(day(date));
}

/** A calendar date in few letters, `Jun 10`. */
export function shortDate(date: string): string {
  return formatter(language() === 'en' ? 'en-US' : language(), { month: 'short', day: 'numeric', timeZone: 'UTC' }).format(day(date));
}

/** The day of the week in three letters. */
export function weekday(date: string): string {
  return formatter(language() === 'en' ? 'en-US' : language(), { weekday: 'short', timeZone: 'UTC' }).format(day(date));
}

/** Whole days from one calendar date to another. */
export function daysBetween(from: string, to: string): number {
  return Math.round((day(to).getTime() - day(from).getTime()) / 86_400_000);
}

/** A span in words: `4 min`, `3 h`, `2 days`. */
export function span(minutes: number): string {
  if (minutes < 1) return 'less than a minute';
  if (minutes < 90) return `${Math.round(minutes)} min`;
  if (minutes < 48 * 60) return `${Math.round(minutes / 60)} h`;
  return `${Math.round(minutes / 1440)} days`;
}

/** Minutes from one instant to another; never negative. */
export const minutesBetween = (from: string, to: string): number => Math.max(0, (Date.parse(to) - Date.parse(from)) / 60_000);
