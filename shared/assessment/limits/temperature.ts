import { mapColumn } from '../columns.ts';
import { between, nearerEnd, type LimitJudge, type Range } from '../track.ts';

/** Degrees from a bound that count as at ease: ours, no source. */
const easeC = 5;
const easeDeltaTC = 2;

function judgeRange(limit: 'temperature' | 'deltaT', values: Float64Array, range: Range): ReturnType<LimitJudge> {
  if (range.min === undefined && range.max === undefined) return null;
  return { limit, value: values, bound: (step) => nearerEnd(values[step]!, range), headroom: mapColumn(values, (value) => between(value, range)), isHard: true };
}

/** Air temperature against the label's range. */
export const judgeTemperature: LimitJudge = ({ temperatureC }, { limits }) => judgeRange('temperature', temperatureC, { min: limits.temperatureMinC, max: limits.temperatureMaxC, ease: easeC });

/** Delta T against the plan's range; without one it is not judged, and only told as advice. */
export const judgeDeltaT: LimitJudge = ({ deltaTC }, { limits }) => judgeRange('deltaT', deltaTC, { min: limits.deltaTMinC, max: limits.deltaTMaxC, ease: easeDeltaTC });
