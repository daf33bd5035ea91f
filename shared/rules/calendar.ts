/** Calendar dates as `YYYY-MM-DD`; they compare as texts. Time zones are none of this file's business. */
const dayMs = 86_400_000;

const dateOf = (day: number): string => new Date(day * dayMs).toISOString().slice(0, 10);

/** @throws RangeError when the text is no date */
function dayOf(date: string): number {
  const day = Date.parse(`${date}T00:00:00Z`) / dayMs;
  // Engines read 30 February as 2 March.
  if (!Number.isFinite(day) || dateOf(day) !== date) throw new RangeError(`${date} is not a date such as 2026-05-01.`);
  return day;
}

export const addDays = (date: string, days: number): string => dateOf(dayOf(date) + days);
/** Days from one date to another; negative when the other is earlier. */
export const daysBetween = (from: string, to: string): number => dayOf(to) - dayOf(from);
export const later = (a: string, b: string): string => (a > b ? a : b);
export const earlier = (a: string, b: string): string => (a < b ? a : b);

/** Calendar date some years on; 29 February becomes 1 March in a common year. */
export function addYears(date: string, years: number): string {
  const [year, month, dayOfMonth] = date.split('-').map(Number) as [number, number, number];
  dayOf(date);
  return dateOf(Date.UTC(year + years, month - 1, dayOfMonth) / dayMs);
}
