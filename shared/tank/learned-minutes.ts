import { quantile } from './quantile.ts';

/** What one past run took, from its field record. */
export interface PastRun {
  /** Local date, `YYYY-MM-DD`. */
  date: string;
  sprayerId: string;
  crew: 'alone' | 'withMixer';
  /** Minutes of each FULL tank; part tanks say little about the pace. */
  tankMinutes: readonly number[];
  /** Minutes from each empty tank to the next start, pauses with a reason taken out. */
  changeOverMinutes: readonly number[];
}

/** Typical value with its spread: low and high are the 10 % and 90 % quantiles over runs. */
export interface Spread {
  typical: number;
  low: number;
  high: number;
}

export interface LearnedPace {
  runs: number;
  minutesPerTank: Spread;
  /** Null when no run had a second tank. */
  changeOverMinutes: Spread | null;
}

/** Fewer runs than this say too little to plan by: the entered figures hold. Common practice, no source. */
export const learnedFromRuns = 3;
/** Only the newest runs count: people and engines change. Common practice, no source. */
export const learnedFromNewest = 20;

const spreadOf = (values: readonly number[]): Spread => ({ typical: quantile(values, 0.5), low: quantile(values, 0.1), high: quantile(values, 0.9) });
const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;

/**
 * The pace that past runs of a sprayer and crew show. One run counts once, by its mean: tanks of one morning are alike.
 * @returns minutes; null below `learnedFromRuns` runs
 */
export function learnedPace(runs: readonly PastRun[], sprayerId: string, crew: PastRun['crew']): LearnedPace | null {
  const own = runs
    .filter((run) => run.sprayerId === sprayerId && run.crew === crew && run.tankMinutes.length > 0)
    .toSorted((a, b) => (a.date < b.date ? 1 : a.date > b.date ? -1 : 0))
    .slice(0, learnedFromNewest);
  if (own.length < learnedFromRuns) return null;
  const changeOvers = own.filter(({ changeOverMinutes }) => changeOverMinutes.length > 0).map(({ changeOverMinutes }) => mean(changeOverMinutes));
  return { runs: own.length, minutesPerTank: spreadOf(own.map(({ tankMinutes }) => mean(tankMinutes))), changeOverMinutes: changeOvers.length > 0 ? spreadOf(changeOvers) : null };
}

/**
 * Minutes of a job at a learned pace, with spread. The window should hold `high`.
 * @param tanks the last as a fraction @param enteredChangeOverMinutes used where no run had a second tank
 */
export function learnedMinutes(tanks: number, pace: LearnedPace, enteredChangeOverMinutes: number): Spread {
  const changes = Math.max(0, Math.ceil(tanks - 1e-9) - 1);
  const at = (pick: keyof Spread): number => tanks * pace.minutesPerTank[pick] + changes * (pace.changeOverMinutes?.[pick] ?? enteredChangeOverMinutes);
  return { typical: at('typical'), low: at('low'), high: at('high') };
}
