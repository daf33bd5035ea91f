import { incidence, incidenceDifference, type Share } from './incidence.ts';

export interface DatedCount {
  /** Local date, `YYYY-MM-DD`. */
  date: string;
  treesChecked: number;
  treesWith: number;
}

export interface TrendPoint extends DatedCount, Share {}

export interface Trend {
  points: TrendPoint[];
  /** Last walk less the one before, with its 95 % interval; null with fewer than two walks. */
  change: Share | null;
  /** Said only when the interval leaves 0 out. */
  direction: 'rising' | 'falling' | 'unclear';
}

/** Incidence over dates; walks of one date count as one. @throws RangeError for impossible counts */
export function trendOf(counts: readonly DatedCount[]): Trend {
  const byDate = new Map<string, DatedCount>();
  for (const { date, treesChecked, treesWith } of counts) {
    const day = byDate.get(date) ?? { date, treesChecked: 0, treesWith: 0 };
    byDate.set(date, { date, treesChecked: day.treesChecked + treesChecked, treesWith: day.treesWith + treesWith });
  }
  const points = [...byDate.values()]
    .filter(({ treesChecked }) => treesChecked > 0)
    .toSorted((a, b) => (a.date < b.date ? -1 : 1))
    .map((day) => ({ ...day, ...incidence(day.treesWith, day.treesChecked) }));
  const [before, last] = points.slice(-2);
  if (!before || !last) return { points, change: null, direction: 'unclear' };
  const change = incidenceDifference(last, before);
  return { points, change, direction: change.low > 0 ? 'rising' : change.high < 0 ? 'falling' : 'unclear' };
}
