/** Clock arithmetic in an IANA zone by the platform's own zone data (Intl). Instants are epoch milliseconds, UTC. */

const hourMs = 3_600_000;
const minuteMs = 60_000;
/** Every change of offset in the zone data since 1900 falls on a multiple of this. */
const bucketMs = 15 * minuteMs;

const formatters = new Map<string, Intl.DateTimeFormat | null>();
const offsets = new Map<string, Map<number, number>>();

function formatterOf(timeZone: string): Intl.DateTimeFormat | null {
  const kept = formatters.get(timeZone);
  if (kept !== undefined) return kept;
  let made: Intl.DateTimeFormat | null = null;
  try {
    made = new Intl.DateTimeFormat('en-US', { timeZone, calendar: 'iso8601', numberingSystem: 'latn', hourCycle: 'h23', year: 'numeric', month: 'numeric', day: 'numeric', hour: 'numeric', minute: 'numeric', second: 'numeric', era: 'short' });
  } catch {
    made = null;
  }
  // Strangers may send any text as a zone; the store stays small.
  if (formatters.size > 1000) formatters.clear();
  formatters.set(timeZone, made);
  return made;
}

/** True for the name of an IANA zone such as `America/Los_Angeles`; false for bare offsets. */
export const isTimeZone = (name: string): boolean => /^[A-Za-z][A-Za-z0-9_+\-/]*$/.test(name) && formatterOf(name) !== null;

function readOffsetMinutes(epochMs: number, timeZone: string): number {
  const formatter = formatterOf(timeZone);
  if (!formatter) throw new RangeError(`time zone ${JSON.stringify(timeZone)} is not known`);
  const parts: Record<string, number> = {};
  for (const { type, value } of formatter.formatToParts(epochMs)) parts[type] = Number(value);
  const wall = Date.UTC(parts['year'] ?? 0, (parts['month'] ?? 1) - 1, parts['day'] ?? 1, parts['hour'] ?? 0, parts['minute'] ?? 0, parts['second'] ?? 0);
  return (wall - Math.floor(epochMs / 1000) * 1000) / minuteMs;
}

/**
 * Minutes that local clocks are ahead of UTC.
 * @throws RangeError for an unknown zone
 */
export function zoneOffsetMinutes(epochMs: number, timeZone: string): number {
  let ofZone = offsets.get(timeZone);
  if (!ofZone) {
    if (offsets.size > 1000) offsets.clear();
    offsets.set(timeZone, (ofZone = new Map<number, number>()));
  }
  const bucket = Math.floor(epochMs / bucketMs);
  let offset = ofZone.get(bucket);
  if (offset === undefined) {
    if (ofZone.size > 5000) ofZone.clear();
    ofZone.set(bucket, (offset = readOffsetMinutes(bucket * bucketMs, timeZone)));
  }
  return offset;
}

/** Local calendar date of an instant, `YYYY-MM-DD`. */
export const localDateOf = (epochMs: number, timeZone: string): string => new Date(epochMs + zoneOffsetMinutes(epochMs, timeZone) * minuteMs).toISOString().slice(0, 10);

/** Minutes since local midnight by the clock, 0–1439. */
export function localMinutesOf(epochMs: number, timeZone: string): number {
  const minutes = Math.floor(epochMs / minuteMs) + Math.round(zoneOffsetMinutes(epochMs, timeZone));
  return ((minutes % 1440) + 1440) % 1440;
}

/**
 * Instant at which local clocks show a time on a date. A time skipped in spring counts on into summer time; of a time
 * shown twice in autumn the first is taken.
 * @param date `YYYY-MM-DD` @param minutesOfDay 0–1439
 */
export function localInstantMs(date: string, minutesOfDay: number, timeZone: string): number {
  const wall = Date.parse(`${date}T00:00:00Z`) + minutesOfDay * minuteMs;
  const before = zoneOffsetMinutes(wall - 24 * hourMs, timeZone);
  const after = zoneOffsetMinutes(wall + 24 * hourMs, timeZone);
  for (const offset of before === after ? [before] : [before, after]) {
    const instant = wall - offset * minuteMs;
    if (zoneOffsetMinutes(instant, timeZone) === offset) return instant;
  }
  return wall - before * minuteMs;
}
