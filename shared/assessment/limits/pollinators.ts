import { leastActivityInBloom, possibleActivity } from '../../pollinators/thresholds.ts';
import { column, mapColumn } from '../columns.ts';
import { below, type LimitJudge } from '../track.ts';

/**
 * Bees, by the label's statement and what is in bloom:
 * - `notInBloom` and bloom: a hard hold whatever the hour; the residue outlasts the morning.
 * - `notWhileForaging` and bloom: hard; once any of the kinds may be flying the rest of the morning is closed.
 * - otherwise advice.
 * In bloom the weather alone never says "no bees" (at least `leastActivityInBloom`).
 */
export const judgePollinators: LimitJudge = ({ morning, bees }, { limits }) => {
  const rule = limits.pollinators;
  if (!rule) return null;
  const isHard = rule.bloom && rule.beeStatement !== 'none';
  const isForbidden = rule.bloom && rule.beeStatement === 'notInBloom';
  const value = column(morning.count).fill(rule.bloom ? leastActivityInBloom : 0);
  for (const kind of rule.kinds) {
    const activity = bees[kind].judged;
    // Math.max passes NaN on: one kind that cannot be told leaves the greatest untold.
    for (let step = 0; step < morning.count; step += 1) value[step] = Math.max(value[step]!, activity[step]!);
  }
  if (isHard && !isForbidden) keepStarted(value);
  const bound = isForbidden ? 0 : possibleActivity;
  const headroom = isForbidden ? column(morning.count).fill(-1) : mapColumn(value, (activity) => (activity >= possibleActivity ? startedHeadroom(activity) : below(activity, possibleActivity)));
  return { limit: 'pollinators', value, bound, headroom, isHard };
};

/** The window must END before activity starts: a lull later in the morning does not open it again. */
function keepStarted(value: Float64Array): void {
  let greatest = 0;
  for (let step = 0; step < value.length; step += 1) {
    const activity = value[step]!;
    if (Number.isNaN(activity) && greatest < possibleActivity) greatest = NaN;
    if (activity >= possibleActivity && !(greatest > activity)) greatest = activity;
    else if (activity > greatest) greatest = activity;
    value[step] = greatest;
  }
}

/** Below zero as soon as bees may be flying. */
const startedHeadroom = (activity: number): number => -Math.min(1, Math.max(0.01, (activity - possibleActivity) / (1 - possibleActivity)));
