/** Brier score with Murphy's decomposition: score = reliability − resolution + uncertainty. */
export interface BrierDecomposition {
  score: number;
  /** 0 = chances come true as often as said. */
  reliability: number;
  /** The more the chances tell days apart, the greater. */
  resolution: number;
  uncertainty: number;
  /** 1 − score / climatology; NaN when the event always or never happens. */
  skill: number;
}

/**
 * Mean squared error of chances [brier1950].
 * @param chances 0–1 @param happened the same events, in the same order
 * @returns 0 (best) to 1; NaN without events
 */
export function brierScore(chances: readonly number[], happened: readonly boolean[]): number {
  if (chances.length === 0 || chances.length !== happened.length) return NaN;
  return chances.reduce((sum, chance, index) => sum + (chance - (happened[index] ? 1 : 0)) ** 2, 0) / chances.length;
}

/**
 * Decomposition over groups of equal chance [murphy1973]. The sum is exact when every chance in a group is the same.
 * @param groups chance said, share of the events in which it happened, and weight (count or share) of the group
 */
export function brierDecomposition(groups: readonly { chance: number; frequency: number; weight: number }[]): BrierDecomposition {
  const total = groups.reduce((sum, { weight }) => sum + weight, 0);
  const base = groups.reduce((sum, { frequency, weight }) => sum + frequency * weight, 0) / total;
  let reliability = 0;
  let resolution = 0;
  for (const { chance, frequency, weight } of groups) {
    reliability += (weight * (chance - frequency) ** 2) / total;
    resolution += (weight * (frequency - base) ** 2) / total;
  }
  const uncertainty = base * (1 - base);
  const score = reliability - resolution + uncertainty;
  return { score, reliability, resolution, uncertainty, skill: uncertainty === 0 ? NaN : 1 - score / uncertainty };
}
