/**
 * Reads `Retry-After`: whole seconds, or an HTTP date (RFC 9110 §10.2.3).
 * @param answeredAt the far end's own time, so that a date is taken by its clock and not by ours
 * @returns milliseconds to wait, never negative; null when absent or unreadable
 */
export function retryAfterMs(header: string | null, answeredAt: Date): number | null {
  if (header === null) return null;
  const text = header.trim();
  if (/^\d+$/.test(text)) return Number(text) * 1000;
  // A date names its weekday or month; Date.parse alone would take “-5” for a year.
  const until = /[a-z]{3}/i.test(text) ? Date.parse(text) : Number.NaN;
  return Number.isFinite(until) ? Math.max(0, until - answeredAt.getTime()) : null;
}
