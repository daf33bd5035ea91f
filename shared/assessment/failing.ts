import { firstWetHourMs } from './limits/rain-free.ts';
import { nearestDownwindPlace } from './limits/toward-sensitive-place.ts';
import type { AtLimit, Failing } from './messages.ts';
import { stepMs } from './morning.ts';
import { boundAt, type Track } from './track.ts';
import type { Judgement } from './verdict.ts';

const orNull = (value: number): number | null => (Number.isNaN(value) ? null : value);

/** Start of a step as UTC ISO 8601; the number after the last step gives its end. */
export const isoAt = ({ morning: { morning } }: Judgement, step: number): string => morning.times()[step]!;

const placeAt = (judgement: Judgement, track: Track, step: number): string | null =>
  track.limit === 'towardSensitivePlace' ? (nearestDownwindPlace(judgement.plan, judgement.morning.direction.fromDeg[step]!)?.name ?? null) : null;

/** Value and bound of a limit at a step. */
export const atLimit = (judgement: Judgement, track: Track, step: number): AtLimit => ({
  limit: track.limit,
  value: orNull(track.value[step]!),
  bound: orNull(boundAt(track, step)),
  at: isoAt(judgement, step),
  place: placeAt(judgement, track, step),
});

/** How a limit fails over the morning; null when it never does. */
export function failingOf(judgement: Judgement, track: Track): Failing | null {
  const { headroom, value } = track;
  const count = headroom.length;
  let first = -1;
  let last = -1;
  let fails = 0;
  let worst = -1;
  for (let step = 0; step < count; step += 1) {
    if (!(headroom[step]! < 0)) continue;
    if (first < 0) first = step;
    last = step;
    fails += 1;
    if (worst < 0 || headroom[step]! < headroom[worst]!) worst = step;
  }
  if (first < 0) return null;
  const isRun = last - first + 1 === fails;
  const pattern = fails === count ? 'all' : !isRun ? 'parts' : first === 0 ? 'until' : last === count - 1 ? 'from' : 'between';
  const bound = boundAt(track, worst);
  const rule = judgement.plan.limits.pollinators;
  const { morning } = judgement.morning;
  const rainMs = track.limit === 'rainFree' ? firstWetHourMs(judgement.morning.hours, judgement.plan, morning.startMs + first * stepMs) : null;
  return {
    limit: track.limit,
    pattern,
    fromAt: isoAt(judgement, first),
    untilAt: isoAt(judgement, last + 1),
    worst: orNull(value[worst]!),
    bound: orNull(bound),
    side: value[worst]! < bound ? 'below' : 'above',
    isForbidden: track.limit === 'pollinators' && rule !== undefined && rule.bloom && rule.beeStatement === 'notInBloom',
    place: placeAt(judgement, track, worst),
    rainAt: rainMs === null ? null : new Date(rainMs).toISOString(),
  };
}

/** The hard limit that closes a step most, told as it fails AROUND that step; null outside the morning or where none is known to fail. */
export function closingAt(judgement: Judgement, step: number, side: 'opens' | 'closes'): Failing | null {
  if (step < 0 || step >= judgement.least.length || judgement.isUntold[step] === 1 || judgement.least[step]! >= 0) return null;
  const track = judgement.tracks[judgement.leastTrack[step] ?? -1];
  const failing = track ? failingOf(judgement, track) : null;
  if (!track || !failing || failing.pattern === 'all') return failing;
  // Of a limit that fails in several parts only the part at this edge matters.
  return side === 'opens' ? { ...failing, pattern: 'until', untilAt: isoAt(judgement, step + 1) } : { ...failing, pattern: 'from', fromAt: isoAt(judgement, step), bound: orNull(boundAt(track, step)) };
}
