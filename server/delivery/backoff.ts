import type { Channel } from '../../shared/api/notices.ts';

/** How often a channel is tried, and how long it waits in between. */
interface Schedule {
  /** Longest pause before the 2nd, 3rd … try, seconds; the last one repeats. */
  pausesS: readonly number[];
  /** Part of the pause that is sure; the rest is drawn (0 = full jitter). */
  sureShare: number;
  triesMax: number;
}

const minute = 60;
const hour = 3600;
const doubling = (first: number, max: number): number[] => {
  const pauses = [first];
  while (pauses.at(-1)! < max) pauses.push(Math.min(max, pauses.at(-1)! * 2));
  return pauses;
};

/** Push and e-mail: exponential with full jitter. Webhooks: the example schedule of Standard Webhooks 1.0.0 ("Delivery retries"), ten tries over three days. */
export const schedules: Readonly<Record<Channel, Schedule>> = {
  push: { pausesS: doubling(2, 5 * minute), sureShare: 0, triesMax: 40 },
  email: { pausesS: doubling(20, 30 * minute), sureShare: 0, triesMax: 25 },
  webhook: { pausesS: [5, 5 * minute, 30 * minute, 2 * hour, 5 * hour, 10 * hour, 14 * hour, 20 * hour, 24 * hour], sureShare: 0.8, triesMax: 10 },
};

/**
 * Milliseconds to wait after the `attempts`-th failed try; null when it was the last.
 * @param random uniform in [0, 1) @param retryAfterSeconds what the far end asked for; never cut short
 */
export function pauseMs(channel: Channel, attempts: number, random: number, retryAfterSeconds: number | null): number | null {
  const { pausesS, sureShare, triesMax } = schedules[channel];
  if (attempts >= triesMax) return null;
  const longest = pausesS[Math.min(attempts, pausesS.length) - 1]!;
  const drawn = longest * (sureShare + (1 - sureShare) * random);
  return Math.round(1000 * Math.max(drawn, retryAfterSeconds ?? 0));
}
