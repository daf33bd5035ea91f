import { quantile } from '../tank/quantile.ts';
import { grouped } from './group.ts';
import { incidence, incidenceDifference, type Share } from './incidence.ts';

/** Living insects (or trees with the target), before and after, as a mean per tree or a share. */
export interface BeforeAfter {
  before: number;
  after: number;
}

/**
 * Percent control against untreated trees counted at the same time [abbott1925]: (x − y) ÷ x × 100, x living in the check, y in the
 * treated. Holds when both were alike before.
 * @returns percent; negative when the treated fared worse; NaN when nothing lived in the check
 */
export const abbottPct = (checkAfter: number, treatedAfter: number): number => (checkAfter > 0 ? ((checkAfter - treatedAfter) / checkAfter) * 100 : NaN);

/**
 * Percent control when treated and untreated trees differed before, too [hendersonTilton1955, from memory]:
 * (1 − treated after × check before ÷ (treated before × check after)) × 100.
 * @returns percent; negative when the treated fared worse; NaN when a divisor is 0
 */
export function hendersonTiltonPct(treated: BeforeAfter, check: BeforeAfter): number {
  const divisor = treated.before * check.after;
  return divisor > 0 ? (1 - (treated.after * check.before) / divisor) * 100 : NaN;
}

export interface Counted {
  treesChecked: number;
  treesWith: number;
}

export interface Effect {
  /** Incidence after less before; a fall is negative. */
  change: Share;
  /** Percent control; NaN when it cannot be told. */
  controlPct: number;
  /** `hendersonTilton` with untreated trees counted both times; else `reduction`, which takes weather and time for effect. */
  method: 'hendersonTilton' | 'reduction';
  isClear: boolean;
}

/** Effect of a treatment on the incidence in one block, with or without untreated trees beside. @throws RangeError for impossible counts */
export function effectOf(before: Counted, after: Counted, untreated?: { before: Counted; after: Counted }): Effect {
  const share = ({ treesWith, treesChecked }: Counted): Share => incidence(treesWith, treesChecked);
  const [first, second] = [share(before), share(after)];
  const change = incidenceDifference(second, first);
  const isClear = change.low > 0 || change.high < 0;
  const treated = { before: first.share, after: second.share };
  if (untreated) return { change, controlPct: hendersonTiltonPct(treated, { before: share(untreated.before).share, after: share(untreated.after).share }), method: 'hendersonTilton', isClear };
  return { change, controlPct: first.share > 0 ? (1 - second.share / first.share) * 100 : NaN, method: 'reduction', isClear };
}

export interface EffectSummary {
  /** Product name, or group such as `IRAC 4`. */
  key: string;
  /** Treatments with a known effect. */
  count: number;
  /** Middle, and the 10 % and 90 % quantiles, percent. */
  typicalPct: number;
  lowPct: number;
  highPct: number;
}

/** Effects over seasons by product or by group: give one entry for each key that a treatment counts in. Best first. */
export function effectsBy(entries: readonly { key: string; controlPct: number }[]): EffectSummary[] {
  const known = grouped(entries.filter(({ controlPct }) => Number.isFinite(controlPct)), ({ key }) => key);
  return [...known]
    .map(([key, own]) => {
      const values = own.map(({ controlPct }) => controlPct);
      return { key, count: values.length, typicalPct: quantile(values, 0.5), lowPct: quantile(values, 0.1), highPct: quantile(values, 0.9) };
    })
    .toSorted((a, b) => b.typicalPct - a.typicalPct);
}
