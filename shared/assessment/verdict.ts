import { limitNames, type LimitName } from './answer.ts';
import { byteColumn, column } from './columns.ts';
import { limitJudges } from './limits/index.ts';
import type { PreparedMorning } from './prepare.ts';
import type { PlanToJudge, Track } from './track.ts';
import { stepMinutes } from './morning.ts';
import { betterFit, fitInto, minutesOf, runsOf, type Fit, type StepRun } from './windows.ts';

/** Stands for no track in `leastTrack`. */
const noTrack = 255;

/** A judged plan in compact form: what the answer, its sentences and an ensemble's count are made from. */
export interface Judgement {
  morning: PreparedMorning;
  plan: PlanToJudge;
  neededMinutes: number;
  tracks: Track[];
  /** Least headroom of the hard limits per step; −2 where none is told. */
  least: Float64Array;
  /** Index of the track with the least headroom per step; `noTrack` where none is told. */
  leastTrack: Uint8Array;
  /** 1 where a hard limit cannot be told and none is known to fail. */
  isUntold: Uint8Array;
  runs: StepRun[];
  /** One per run; null where the job does not fit. */
  fits: (Fit | null)[];
  /** The fit that the notice names; see `betterFit`. */
  chosen: Fit | null;
  verdict: 'go' | 'hold';
  enoughToTell: boolean;
  bindingLimit: LimitName | 'time' | 'data' | null;
}

/**
 * Judges a plan on a prepared morning. Cost grows with steps × limits; the morning is shared by all plans.
 * A go needs a run of steps in which every hard limit is known and has headroom ≥ 0, long enough for job and reserve.
 * Too little is known when a hold would turn into a go if every unknown value were good.
 */
export function decide(morning: PreparedMorning, plan: PlanToJudge): Judgement {
  const tracks: Track[] = [];
  for (const name of limitNames) {
    const track = limitJudges[name](morning, plan);
    if (track) tracks.push(track);
  }
  const count = morning.morning.count;
  const least = column(count);
  const leastTrack = byteColumn(count).fill(noTrack);
  const isUntold = byteColumn(count);
  const isOpen = byteColumn(count);
  const hasHardTrack = scan(tracks, least, leastTrack, isUntold);
  for (let step = 0; step < count; step += 1) isOpen[step] = hasHardTrack && isUntold[step] === 0 && least[step]! >= 0 ? 1 : 0;
  const neededMinutes = plan.minutesNeeded + plan.reserveMinutes;
  const runs = runsOf(isOpen);
  const againstAdvice = stepsAgainstAdvice(tracks, count);
  const fits = runs.map((run) => fitInto(run, least, againstAdvice, neededMinutes));
  const chosen = fits.reduce(betterFit, null);
  const enoughToTell = chosen !== null || (hasHardTrack && !couldFit(least, isUntold, neededMinutes));
  const judgement: Judgement = { morning, plan, neededMinutes, tracks, least, leastTrack, isUntold, runs, fits, chosen, verdict: chosen ? 'go' : 'hold', enoughToTell, bindingLimit: null };
  judgement.bindingLimit = bindingOf(judgement);
  return judgement;
}

/** Fills least headroom and unknown steps from the hard limits; false when no limit is hard. */
function scan(tracks: Track[], least: Float64Array, leastTrack: Uint8Array, isUntold: Uint8Array): boolean {
  let hasHard = false;
  least.fill(Infinity);
  for (const [index, track] of tracks.entries()) {
    if (!track.isHard) continue;
    hasHard = true;
    const { headroom } = track;
    for (let step = 0; step < headroom.length; step += 1) {
      const at = headroom[step]!;
      if (Number.isNaN(at)) isUntold[step] = 1;
      else if (at < least[step]!) {
        least[step] = at;
        leastTrack[step] = index;
      }
    }
  }
  for (let step = 0; step < least.length; step += 1) {
    if (least[step] === Infinity) least[step] = -2;
    else if (least[step]! < 0) isUntold[step] = 0;
  }
  return hasHard;
}

/** Steps in which a limit that does not hold is passed all the same. */
function stepsAgainstAdvice(tracks: readonly Track[], count: number): Uint8Array {
  const against = byteColumn(count);
  for (const track of tracks) {
    if (track.isHard) continue;
    for (let step = 0; step < count; step += 1) if (track.headroom[step]! < 0) against[step] = 1;
  }
  return against;
}

/** True when the job would fit if every unknown step were open. */
function couldFit(least: Float64Array, isUntold: Uint8Array, neededMinutes: number): boolean {
  const isPossible = byteColumn(least.length);
  let unknowns = 0;
  for (let step = 0; step < least.length; step += 1) {
    unknowns += isUntold[step]!;
    isPossible[step] = isUntold[step] === 1 || least[step]! >= 0 ? 1 : 0;
  }
  return unknowns > 0 && runsOf(isPossible).some((run) => minutesOf(run) >= neededMinutes);
}

/**
 * The limit with the least headroom: over job and reserve on a go; on a hold at the morning's best step, unless the longest window
 * is closed by a limit, or one fails in every step, which then binds.
 */
function bindingOf({ chosen, enoughToTell, tracks, least, leastTrack, isUntold, runs, neededMinutes, morning }: Judgement): Judgement['bindingLimit'] {
  if (!enoughToTell) return 'data';
  const nameOf = (step: number): Judgement['bindingLimit'] => (isUntold[step] === 1 ? 'data' : (tracks[leastTrack[step] ?? -1]?.limit ?? null));
  if (chosen) {
    const from = Math.round(chosen.bestStartMin / stepMinutes);
    const to = Math.min(chosen.to, from + Math.max(1, Math.ceil(neededMinutes / stepMinutes)));
    return nameOf(lowestStep(least, from, to));
  }
  if (morning.morning.count * stepMinutes < neededMinutes || morning.morning.count === 0) return 'time';
  const longest = longestRun(runs);
  if (longest) {
    // What closes the window binds; a close that cannot be told leaves it to what opened the window.
    const edges = [longest.to, longest.from - 1].filter((step) => step >= 0 && step < least.length);
    if (edges.length === 0) return 'time';
    return nameOf(edges.find((step) => isUntold[step] === 0) ?? edges[0]!);
  }
  return shutTrack(tracks)?.limit ?? nameOf(highestToldStep(least, isUntold));
}

/** Of the hard limits that fail in every step, the one that comes least near; null when none does. */
export function shutTrack(tracks: readonly Track[]): Track | null {
  let shut: Track | null = null;
  let nearest = 0;
  for (const track of tracks) {
    if (!track.isHard) continue;
    let best = -Infinity;
    // An unknown step may be an open one.
    for (const headroom of track.headroom) best = Math.max(best, Number.isNaN(headroom) ? 1 : headroom);
    if (best < nearest) {
      nearest = best;
      shut = track;
    }
  }
  return shut;
}

export const longestRun = (runs: readonly StepRun[]): StepRun | null => runs.reduce<StepRun | null>((longest, run) => (longest && longest.to - longest.from >= run.to - run.from ? longest : run), null);

export function lowestStep(least: Float64Array, from: number, to: number): number {
  let lowest = from;
  for (let step = from + 1; step < to; step += 1) if (least[step]! < least[lowest]!) lowest = step;
  return lowest;
}

/** The step that comes nearest to open among those that are known to be closed; any step when none is. */
function highestToldStep(least: Float64Array, isUntold: Uint8Array): number {
  let highest = -1;
  for (let step = 0; step < least.length; step += 1) if (isUntold[step] === 0 && (highest < 0 || least[step]! > least[highest]!)) highest = step;
  return Math.max(0, highest);
}

export function highestStep(least: Float64Array): number {
  let highest = 0;
  for (let step = 1; step < least.length; step += 1) if (least[step]! > least[highest]!) highest = step;
  return highest;
}
