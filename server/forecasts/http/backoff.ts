/** Bounds of the waits between tries, in milliseconds. */
export interface Backoff {
  baseMs: number;
  capMs: number;
}

/**
 * Exponential back-off with full jitter: uniform in [0, min(cap, base · 2ⁿ)], so that many askers do not come back together.
 * @param attempt 0 after the first failure @param random uniform in [0, 1)
 */
export const fullJitterMs = (attempt: number, { baseMs, capMs }: Backoff, random: () => number): number => random() * Math.min(capMs, baseMs * 2 ** attempt);
