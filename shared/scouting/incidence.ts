/** Two-sided standard normal quantiles. */
const z = { 0.8: 1.2815515655446004, 0.9: 1.6448536269514722, 0.95: 1.959963984540054, 0.99: 2.5758293035489004 } as const;
export type Confidence = keyof typeof z;

/** A share with its interval, all 0 to 1. */
export interface Share {
  share: number;
  low: number;
  high: number;
}

/** @throws RangeError when more trees have it than were checked, or a count is no whole number from 0 on */
function checkCounts(treesWith: number, treesChecked: number): void {
  for (const [name, value] of Object.entries({ treesWith, treesChecked })) if (!Number.isInteger(value) || value < 0) throw new RangeError(`${name} must be a whole number from 0 on, not ${value}.`);
  if (treesWith > treesChecked) throw new RangeError(`treesWith must be at most the ${treesChecked} trees checked, not ${treesWith}.`);
}

/**
 * Incidence: share of the checked trees that have the target, with its Wilson score interval [wilson1927; newcombe1998, method 3].
 * Holds for trees picked without looking; trees of one spot are alike and say less.
 * @returns of no trees: anything from 0 to 1, `share` NaN @throws RangeError for impossible counts
 */
export function incidence(treesWith: number, treesChecked: number, confidence: Confidence = 0.95): Share {
  checkCounts(treesWith, treesChecked);
  if (treesChecked === 0) return { share: NaN, low: 0, high: 1 };
  const n = treesChecked;
  const share = treesWith / n;
  const z2 = z[confidence] ** 2;
  const middle = (2 * treesWith + z2) / (2 * (n + z2));
  const half = (z[confidence] * Math.sqrt(z2 + 4 * treesWith * (1 - share))) / (2 * (n + z2));
  return { share, low: treesWith === 0 ? 0 : Math.max(0, middle - half), high: treesWith === n ? 1 : Math.min(1, middle + half) };
}

/**
 * Difference of two incidences, first less second, with its interval from the two Wilson intervals
 * (Newcombe 1998, Stat. Med. 17:873-890, method 10, from memory).
 * @returns −1 to 1; `share` is the difference
 */
export function incidenceDifference(first: Share, second: Share): Share {
  const share = first.share - second.share;
  return {
    share,
    low: share - Math.hypot(first.share - first.low, second.high - second.share),
    high: share + Math.hypot(first.high - first.share, second.share - second.low),
  };
}

/**
 * Mean of counts or ratings per tree with a normal interval of its standard error (common practice; rough below about ten trees,
 * and counts of insects are lumpy). @returns of one tree or none: `low` 0 and `high` Infinity
 */
export function meanPerTree(counts: readonly number[], confidence: Confidence = 0.95): { mean: number; low: number; high: number } {
  const n = counts.length;
  const mean = counts.reduce((sum, count) => sum + count, 0) / n;
  if (n < 2) return { mean, low: 0, high: Infinity };
  const variance = counts.reduce((sum, count) => sum + (count - mean) ** 2, 0) / (n - 1);
  const half = z[confidence] * Math.sqrt(variance / n);
  return { mean, low: Math.max(0, mean - half), high: mean + half };
}
