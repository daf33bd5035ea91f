import { DateTime } from 'luxon';

/** How many mornings are assessed: the coming one and the five after it. */
export const morningsAhead = 6;

/** Local dates of the coming morning (today until local noon, else tomorrow) and of those after it. */
export function comingMornings(now: Date, timeZone: string, count = morningsAhead): string[] {
  const local = DateTime.fromJSDate(now, { zone: timeZone });
  const first = local.hour < 12 ? local.startOf('day') : local.startOf('day').plus({ days: 1 });
  return Array.from({ length: count }, (_, index) => first.plus({ days: index }).toISODate()!);
}

/** Local noon of a date: the end of its morning. */
export const localNoon = (date: string, timeZone: string): Date => DateTime.fromISO(`${date}T12:00:00`, { zone: timeZone }).toJSDate();
