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
  bound: number | Float64Array | ((step: number) => number);
  /** −1..1: 1 at ease, 0 at the limit, negative beyond. */
  headroom: Float64Array;
  /** Hard limits hold; advice is shown. */
  isHard: boolean;
}

/** Judges one limit; null when the plan leaves it out. */
export type LimitJudge = (morning: PreparedMorning, plan: PlanToJudge) => Track | null;

export const boundAt = (track: Track, step: number): number => (typeof track.bound === 'number' ? track.bound : typeof track.bound === 'function' ? track.bound(step) : track.bound[step]!);

/** Holds a headroom inside −1..1 and passes unknown (NaN) on. */
export const clampHeadroom = (headroom: number): number => (headroom > 1 ? 1 : headroom < -1 ? -1 : headroom);

/** Headroom under a greatest value, in shares of it. */
export const below = (value: number, max: number): number => clampHeadroom(max > 0 ? (max - value) / max : value > 0 ? -1 : 0);

/** Headroom over a least value, in shares of it; a least value of 0 is always at ease. */
export const above = (value: number, min: number): number => (min > 0 ? clampHeadroom((value - min) / min) : value >= min ? 1 : NaN);

/** A range of which either end may be open, with what counts as at ease from its ends. */
export interface Range {
  min: number | undefined;
  max: number | undefined;
  /** Distance from an end at which headroom is 1, in a range wide enough for it. */
  ease: number;
}

/** Headroom to the nearer end of a range; unknown for an unknown value. */
export function between(value: number, { min, max, ease }: Range): number {
  if (Number.isNaN(value)) return NaN;
  const span = min !== undefined && max !== undefined ? Math.min(ease, (max - min) / 2) : ease;
  const scale = span > 0 ? span : ease;
  const low = min === undefined ? Infinity : (value - min) / scale;
  const high = max === undefined ? Infinity : (max - value) / scale;
  return clampHeadroom(low < high ? low : high);
}

/** The end of a range that a value is nearer to, or beyond. */
export const nearerEnd = (value: number, { min, max }: Range): number => (min === undefined || (max !== undefined && !(value - min < max - value)) ? max! : min);
