/**
 * What a sequential count decides between: incidences that are surely tolerable and surely not, either side of the action threshold,
 * and how often it may err.
 */
export interface SequentialPlan {
  /** Incidence 0 to 1, below the threshold. */
  tolerable: number;
  /** Incidence 0 to 1, above the threshold. */
  intolerable: number;
  /** Chance of treating though the incidence is only tolerable. */
  needlessTreatment: number;
  /** Chance of leaving be an incidence that is intolerable. */
  missedOutbreak: number;
}

export interface StopLines {
  slope: number;
  belowIntercept: number;
  aboveIntercept: number;
}

/** Error rates usual in pest scouting. Common practice, no source. */
export const usualErrors = { needlessTreatment: 0.1, missedOutbreak: 0.1 } as const;
/** A walk ends here in any case: the answer is then "near the threshold". Common practice, no source. */
export const treesAtMost = 200;

/** A plan around an action threshold: 30 % of it to either side, kept within 0 and 1. Common practice, no source. @param threshold incidence, between 0 and 1 */
export function planAround(threshold: number): SequentialPlan {
  if (!(threshold > 0 && threshold < 1)) throw new RangeError(`threshold must be between 0 and 1, not ${threshold}.`);
  return { tolerable: threshold * 0.7, intolerable: Math.min(threshold * 1.3, (1 + threshold) / 2), ...usualErrors };
}

/**
 * Stop lines of Wald's sequential test of a share [wald1947; as restated in binns2000, §5.4]: below or on slope·n + belowIntercept the
 * incidence is tolerable, above or on slope·n + aboveIntercept it is not, in between look at more trees.
 * @throws RangeError for shares or errors that are not in order
 */
export function stopLines({ tolerable, intolerable, needlessTreatment, missedOutbreak }: SequentialPlan): StopLines {
  if (!(tolerable > 0 && tolerable < intolerable && intolerable < 1)) throw new RangeError(`tolerable and intolerable must be 0 < ${tolerable} < ${intolerable} < 1.`);
  if (!(needlessTreatment > 0 && missedOutbreak > 0 && needlessTreatment + missedOutbreak < 1)) throw new RangeError('needlessTreatment and missedOutbreak must be above 0 and below 1 together.');
  const k = Math.log((intolerable * (1 - tolerable)) / (tolerable * (1 - intolerable)));
  return {
    slope: Math.log((1 - tolerable) / (1 - intolerable)) / k,
    belowIntercept: -Math.log((1 - needlessTreatment) / missedOutbreak) / k,
    aboveIntercept: Math.log((1 - missedOutbreak) / needlessTreatment) / k,
  };
}

export interface SequentialAnswer {
  decision: 'below' | 'above' | 'more' | 'near';
  /** Further trees that decide "below" if none of them has it; 0 once decided. */
  moreIfClean: number;
  /** Further trees that decide "above" if all of them have it; 0 once decided. */
  moreIfInfested: number;
  /** Further trees at the incidence found so far; null when that runs between the lines for ever, or nothing was checked. */
  moreAtThisIncidence: number | null;
}

/**
 * What the trees so far say, and how many more it takes to be sure.
 * @throws RangeError for impossible counts
 */
export function sequentialAnswer(treesWith: number, treesChecked: number, plan: SequentialPlan, atMost: number = treesAtMost): SequentialAnswer {
  if (!Number.isInteger(treesWith) || !Number.isInteger(treesChecked) || treesWith < 0 || treesWith > treesChecked) throw new RangeError(`treesWith must be a whole number from 0 to the trees checked, not ${treesWith} of ${treesChecked}.`);
  const { slope, belowIntercept, aboveIntercept } = stopLines(plan);
  const decided = (decision: SequentialAnswer['decision']): SequentialAnswer => ({ decision, moreIfClean: 0, moreIfInfested: 0, moreAtThisIncidence: 0 });
  const expected = slope * treesChecked;
  if (treesWith <= expected + belowIntercept) return decided('below');
  if (treesWith >= expected + aboveIntercept) return decided('above');
  if (treesChecked >= atMost) return decided('near');
  const share = treesChecked === 0 ? slope : treesWith / treesChecked;
  const line = share < slope ? belowIntercept : aboveIntercept;
  const treesInAll = share === slope ? Infinity : line / (share - slope);
  return {
    decision: 'more',
    moreIfClean: Math.ceil((treesWith - belowIntercept) / slope - treesChecked),
    moreIfInfested: Math.ceil((expected + aboveIntercept - treesWith) / (1 - slope)),
    moreAtThisIncidence: Number.isFinite(treesInAll) ? Math.ceil(treesInAll - treesChecked) : null,
  };
}
