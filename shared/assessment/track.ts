import type { LimitName } from './answer.ts';
import type { AssessmentCase } from './case.ts';
import type { PreparedMorning } from './prepare.ts';

/** What is judged on a prepared morning: everything of a case but the weather. */
export type PlanToJudge = Pick<AssessmentCase, 'minutesNeeded' | 'reserveMinutes' | 'limits'> & Partial<Pick<AssessmentCase, 'sensitivePlaces' | 'sprayer'>>;

/** One limit over the steps of a morning. NaN = cannot be told. */
export interface Track {
  limit: LimitName;
  /** Value and bound in the limit's own unit (m/s, 0–1, hours, °C, degrees). */
  value: Float64Array;
  bound: number | Float64Array;
  /** −1..1: 1 at ease, 0 at the limit, negative beyond. */
  headroom: Float64Array;
  /** Hard limits hold; advice is shown. */
  isHard: boolean;
}

/** Judges one limit; null when the plan leaves it out. */
export type LimitJudge = (morning: PreparedMorning, plan: PlanToJudge) => Track | null;

export const boundAt = (track: Track, step: number): number => (typeof track.bound === 'number' ? track.bound : track.bound[step]!);

/** Holds a headroom inside −1..1 and passes unknown (NaN) on. */
export const clampHeadroom = (headroom: number): number => (headroom > 1 ? 1 : headroom < -1 ? -1 : headroom);

/** Headroom under a greatest value, in shares of it. */
export const below = (value: number, max: number): number => clampHeadroom(max > 0 ? (max - value) / max : value > 0 ? -1 : 0);

/** Headroom over a least value, in shares of it; a least value of 0 is always at ease. */
export const above = (value: number, min: number): number => (min > 0 ? clampHeadroom((value - min) / min) : value >= min ? 1 : NaN);

/** Headroom within a range of which either end may be open; `ease` is the distance from an end that counts as at ease. */
export function between(value: number, min: number | undefined, max: number | undefined, ease: number): { headroom: number; bound: number } {
  if (Number.isNaN(value)) return { headroom: NaN, bound: max ?? min ?? NaN };
  const span = min !== undefined && max !== undefined ? Math.min(ease, (max - min) / 2) : ease;
  const scale = span > 0 ? span : ease;
  const low = min === undefined ? Infinity : (value - min) / scale;
  const high = max === undefined ? Infinity : (max - value) / scale;
  return low < high ? { headroom: clampHeadroom(low), bound: min ?? NaN } : { headroom: clampHeadroom(high), bound: max ?? min ?? NaN };
}
