import type { SourceKey } from '../bibliography.ts';
import { incidence, meanPerTree } from './incidence.ts';
import { planAround, sequentialAnswer, type SequentialAnswer } from './sequential.ts';

export const thresholdMeasures = ['incidence', 'countPerTree', 'ratingPerTree'] as const;
export type ThresholdMeasure = (typeof thresholdMeasures)[number];

/** The grower's own figure for a target: at or above it, act. */
export interface ActionThreshold {
  target: string;
  measure: ThresholdMeasure;
  /** Incidence 0 to 1; count or 0–5 rating as a mean per tree. */
  value: number;
  /** Where the grower has it from. */
  source: string;
}

export interface ExampleThreshold extends ActionThreshold {
  cite: SourceKey;
  /** How the count is made. */
  method: string;
}

/** Examples to edit. Many targets have no numeric threshold (Cornell says so of Christmas trees): none is made up here. */
export const exampleThresholds: readonly ExampleThreshold[] = [
  { target: 'balsam twig aphid', measure: 'countPerTree', value: 3, source: 'Cornell IPM; Michigan State 2024; North Carolina State', cite: 'msuTrees2024', method: 'Beat 10 in of a branch over white paper on each of 15 similar trees, after egg hatch and before bud break. Decide in the year of sale and the year before.' },
  { target: 'spruce spider mite', measure: 'countPerTree', value: 10, source: 'Cornell IPM; Penn State', cite: 'pennStateTrees', method: 'Tap a branch over white paper, one branch to a tree, inner and last year’s damaged trees too. Fast orange mites are predators: leave them out.' },
];

export interface Judgement {
  answer: 'act' | 'wait' | 'unsure';
  /** The figure found, with its 95 % interval, in the threshold's own measure. */
  found: number;
  low: number;
  high: number;
  /** Only for incidence: how many more trees to be sure. */
  sequential: SequentialAnswer | null;
}

/** What one walk found of one target on one block. */
export interface Walked {
  treesChecked: number;
  treesWith: number;
  /** Counts or ratings of each checked tree, zeros included; empty when only presence was noted. */
  perTree: readonly number[];
}

/**
 * A walk against an action threshold: `act` when all of the interval is at or above it, `wait` when all is below, else `unsure`:
 * look at more trees. @throws RangeError for impossible counts, or a threshold on counts with none noted
 */
export function judge({ treesChecked, treesWith, perTree }: Walked, { measure, value }: ActionThreshold): Judgement {
  const answerOf = (low: number, high: number): Judgement['answer'] => (low >= value ? 'act' : high < value ? 'wait' : 'unsure');
  if (measure === 'incidence') {
    const { share, low, high } = incidence(treesWith, treesChecked);
    return { answer: answerOf(low, high), found: share, low, high, sequential: sequentialAnswer(treesWith, treesChecked, planAround(value)) };
  }
  if (perTree.length === 0) throw new RangeError('perTree must hold a count or rating for each tree: the threshold is one per tree.');
  const { mean, low, high } = meanPerTree(perTree);
  return { answer: answerOf(low, high), found: mean, low, high, sequential: null };
}
