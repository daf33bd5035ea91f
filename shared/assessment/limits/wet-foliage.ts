import { mapColumn } from '../columns.ts';
import { clampHeadroom, type LimitJudge } from '../track.ts';

/** From this wetness (0–1) on leaves count as wet, as for the sensors that the estimate is judged on. */
export const wetFrom = 0.5;

/** Wet foliage, when the plan asks for dry leaves. */
export const judgeWetFoliage: LimitJudge = ({ foliageWetness }, { limits }) => {
  if (limits.foliageDry !== true) return null;
  return { limit: 'wetFoliage', value: foliageWetness, bound: wetFrom, headroom: mapColumn(foliageWetness, (wetness) => clampHeadroom((wetFrom - wetness) / wetFrom)), isHard: true };
};
