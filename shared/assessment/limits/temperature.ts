import { column } from '../columns.ts';
import { between, type LimitJudge } from '../track.ts';

/** Degrees from a bound that count as at ease: ours, no source. */
const easeC = 5;
const easeDeltaTC = 2;

function judgeRange(limit: 'temperature' | 'deltaT', values: Float64Array, min: number | undefined, max: number | undefined, ease: number): ReturnType<LimitJudge> {
  if (min === undefined && max === undefined) return null;
  const headroom = column(values.length);
  const bound = column(values.length);
  for (let step = 0; step < values.length; step += 1) {
    const at = between(values[step]!, min, max, ease);
    headroom[step] = at.headroom;
    bound[step] = at.bound;
  }
  return { limit, value: values, bound, headroom, isHard: true };
}

/** Air temperature against the label's range. */
export const judgeTemperature: LimitJudge = ({ temperatureC }, { limits }) => judgeRange('temperature', temperatureC, limits.temperatureMinC, limits.temperatureMaxC, easeC);

/** Delta T against the plan's range; without one it is not judged, and only told as advice. */
export const judgeDeltaT: LimitJudge = ({ deltaTC }, { limits }) => judgeRange('deltaT', deltaTC, limits.deltaTMinC, limits.deltaTMaxC, easeDeltaTC);
