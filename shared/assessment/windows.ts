import { stepMinutes } from './morning.ts';

/** A run of open steps: step numbers, the end excluded. */
export interface StepRun {
  from: number;
  to: number;
}

/** How a job goes into a run; minutes count from the start of the morning's first step. */
export interface Fit extends StepRun {
  /** Start with the greatest least headroom over job and reserve, the earliest of equals; minutes. */
  bestStartMin: number;
  latestStartMin: number;
  /** Least headroom over job and reserve from the best start. */
  headroom: number;
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

/**
 * Fits a job into a run.
 * @param least least headroom of the hard limits per step @param neededMinutes job and reserve together
 * @returns null when the run is too short
 */
export function fitInto(run: StepRun, least: Float64Array, neededMinutes: number): Fit | null {
  if (minutesOf(run) < neededMinutes) return null;
  const covered = Math.max(1, Math.ceil(neededMinutes / stepMinutes));
  // Sliding least over `covered` steps, with a queue of rising candidates.
  const queue: number[] = [];
  let head = 0;
  let best = -Infinity;
  let bestStep = run.from;
  for (let step = run.from; step < run.to; step += 1) {
    while (queue.length > head && least[queue[queue.length - 1]!]! >= least[step]!) queue.pop();
    if (head > queue.length) head = queue.length;
    queue.push(step);
    const start = step - covered + 1;
    if (start < run.from) continue;
    while (queue[head]! < start) head += 1;
    const lowest = least[queue[head]!]!;
    if (lowest > best) {
      best = lowest;
      bestStep = start;
    }
  }
  return { ...run, bestStartMin: bestStep * stepMinutes, latestStartMin: run.to * stepMinutes - neededMinutes, headroom: best };
}
