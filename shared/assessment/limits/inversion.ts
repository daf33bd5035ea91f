import { mapColumn } from '../columns.ts';
import { clampHeadroom, type LimitJudge } from '../track.ts';

/** Likelihood that air is warmer above than at nozzle height, against the greatest the plan bears. */
export const judgeInversion: LimitJudge = ({ inversionLikelihood }, { limits }) => {
  const max = limits.inversionMax;
  if (max === undefined) return null;
  const headroom = mapColumn(inversionLikelihood, (likelihood) => {
    if (likelihood > max) return clampHeadroom((max - likelihood) / (1 - max));
    return max > 0 ? clampHeadroom((max - likelihood) / max) : likelihood === 0 ? 0 : NaN;
  });
  return { limit: 'inversion', value: inversionLikelihood, bound: max, headroom, isHard: true };
};
