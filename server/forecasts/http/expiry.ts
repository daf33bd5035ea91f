/** When the far end made its answer, by its own clock. */
export function answeredAt(headers: Headers, now: Date): Date {
  const date = Date.parse(headers.get('date') ?? '');
  return Number.isFinite(date) ? new Date(date) : now;
}

/**
 * How long an answer stays fresh (RFC 9111 §4.2.1): `max-age` less `Age`, else `Expires` less `Date`. Both are spans,
 * so clocks that disagree do no harm. Null when neither is told or the span is over.
 */
export function expiryOf(headers: Headers, now: Date): Date | null {
  const maxAge = /(?:^|[\s,])max-age=(\d+)/i.exec(headers.get('cache-control') ?? '')?.[1];
  const ageMs = Number(headers.get('age') ?? '0') * 1000 || 0;
  const expires = Date.parse(headers.get('expires') ?? '');
  const spanMs = maxAge !== undefined ? Number(maxAge) * 1000 - ageMs : Number.isFinite(expires) ? expires - answeredAt(headers, now).getTime() : 0;
  return spanMs > 0 ? new Date(now.getTime() + spanMs) : null;
}
