import { mapColumn } from '../columns.ts';
import { above, below, type LimitJudge } from '../track.ts';

/** Mean wind against the label's greatest, at the label's height [fao56, eq. 47]. */
export const judgeWind: LimitJudge = (morning, plan) => {
  const max = plan.limits.windMaxMs;
  if (max === undefined) return null;
  const value = morning.windAtMs(plan.limits.windHeightM);
  return { limit: 'wind', value, bound: max, headroom: mapColumn(value, (wind) => below(wind, max)), isHard: true };
};

/** Mean wind against the least: dead-calm dawn air is inversion air. */
export const judgeStillAir: LimitJudge = (morning, plan) => {
  const min = plan.limits.windMinMs;
  if (min === undefined) return null;
  const value = morning.windAtMs(plan.limits.windHeightM);
  return { limit: 'stillAir', value, bound: min, headroom: mapColumn(value, (wind) => above(wind, min)), isHard: true };
};

/**
 * The hour's greatest gust as forecast at 10 m. It is not brought down to the label's height: gusts come down from above
 * [panofskyDutton1984] and the mean profile would flatter them.
 */
export const judgeGusts: LimitJudge = ({ gustMs }, { limits }) => {
  const max = limits.gustMaxMs;
  if (max === undefined) return null;
  return { limit: 'gusts', value: gustMs, bound: max, headroom: mapColumn(gustMs, (gust) => below(gust, max)), isHard: true };
};
