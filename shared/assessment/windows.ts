import { column } from './columns.ts';
import { stepMinutes } from './morning.ts';

/** A run of open steps: step numbers, the end excluded. */
export interface StepRun {
  from: number;
  to: number;
}

/** How a job goes into a run; minutes count from the start of the morning's first step. */
export interface Fit extends StepRun {
  /**
   * Of the starts with room enough (`roomEnough`, or the most there is) over job and reserve, the one that runs least into what is
   * only advice (bees out, say), and of those the earliest: the morning never gets calmer or emptier of bees. Minutes.
   */
  bestStartMin: number;
  latestStartMin: number;
  /** Least headroom over job and reserve from the best start. */
  headroom: number;
  /** Steps of the job, from the best start, that pass a limit which is only advice. */
  stepsAgainstAdvice: number;
}

/** Runs of steps for which `isOpen` is 1. */
export function runsOf(isOpen: Uint8Array): StepRun[] {
  const runs: StepRun[] = [];
  let from = -1;
  for (let step = 0; step <= isOpen.length; step += 1) {
    if (isOpen[step] === 1) {
      if (from < 0) from = step;
    } else if (from >= 0) {
      runs.push({ from, to: step });
      from = -1;
    }
  }
  return runs;
}

export const minutesOf = (run: StepRun): number => (run.to - run.from) * stepMinutes;

/** Least headroom that a start should have before others count; more is better only up to here. */
const roomEnough = 0.15;

/** Least headroom over the job for each start of a run, by a sliding window with a queue of rising candidates. */
function lowestByStart(run: StepRun, least: Float64Array, covered: number): Float64Array {
  const lowest = column(run.to - run.from - covered + 1);
  const queue: number[] = [];
  let head = 0;
  for (let step = run.from; step < run.to; step += 1) {
    while (queue.length > head && least[queue[queue.length - 1]!]! >= least[step]!) queue.pop();
    queue.push(step);
    const start = step - covered + 1;
    if (start < run.from) continue;
    while (queue[head]! < start) head += 1;
    lowest[start - run.from] = least[queue[head]!]!;
  }
  return lowest;
}

/**
 * Fits a job into a run.
 * @param least least headroom of the hard limits per step @param againstAdvice per step 1 where a limit that is only advice is passed
 * @param neededMinutes job and reserve together
 * @returns null when the run is too short
 */
export function fitInto(run: StepRun, least: Float64Array, againstAdvice: Uint8Array, neededMinutes: number): Fit | null {
  if (minutesOf(run) < neededMinutes) return null;
  const covered = Math.max(1, Math.ceil(neededMinutes / stepMinutes));
  const lowest = lowestByStart(run, least, covered);
  let most = -Infinity;
  for (const headroom of lowest) most = Math.max(most, headroom);
  const enough = Math.min(most, roomEnough);
  let against = 0;
  for (let step = run.from; step < run.from + covered; step += 1) against += againstAdvice[step]!;
  let best = -1;
  let fewest = Infinity;
  for (let index = 0; index < lowest.length; index += 1) {
    if (lowest[index]! >= enough && against < fewest) {
      best = index;
      fewest = against;
    }
    against += (againstAdvice[run.from + index + covered] ?? 0) - againstAdvice[run.from + index]!;
  }
  return { ...run, bestStartMin: (run.from + best) * stepMinutes, latestStartMin: run.to * stepMinutes - neededMinutes, headroom: lowest[best]!, stepsAgainstAdvice: fewest };
}

/** The better of two fits: room enough first, then least against advice, then the earlier. */
export function betterFit(one: Fit | null, other: Fit | null): Fit | null {
  if (!one || !other) return one ?? other;
  const room = Math.min(other.headroom, roomEnough) - Math.min(one.headroom, roomEnough);
  if (room !== 0) return room > 0 ? other : one;
  return other.stepsAgainstAdvice < one.stepsAgainstAdvice ? other : one;
}
