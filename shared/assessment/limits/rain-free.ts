import { byteColumn, column } from '../columns.ts';
import { hourMs, type HourTable } from '../hours.ts';
import { stepMinutes } from '../morning.ts';
import { clampHeadroom, type LimitJudge, type PlanToJudge } from '../track.ts';

const stepsPerHour = 60 / stepMinutes;
const stepH = stepMinutes / 60;

/** What an hour does to a dry spell. */
const dry = 0;
const wet = 1;
const unknown = 2;

/** An hour is wet when its amount or its chance reaches the plan's threshold; unknown when a missing one could make it wet. */
function hourStates(hours: HourTable, { limits }: PlanToJudge): Uint8Array {
  const { rainMm, rainProbabilityPct } = limits;
  const states = byteColumn(hours.count);
  for (let hour = 0; hour < hours.count; hour += 1) {
    const amount = hours.rainOfMm[hour]!;
    const chance = rainProbabilityPct === null ? 0 : hours.rainChanceOfPct[hour]!;
    if ((amount > 0 && amount >= rainMm) || (chance > 0 && rainProbabilityPct !== null && chance >= rainProbabilityPct)) states[hour] = wet;
    else states[hour] = Number.isNaN(amount) || Number.isNaN(chance) ? unknown : dry;
  }
  return states;
}

/** Chance of any rain in a span of hours on the cautious end, 1 − Π(1 − p), percent; NaN when a chance is missing. */
export function rainChanceBandPct(hours: HourTable, fromHour: number, count: number): { leastPct: number; mostPct: number } {
  let most = 0;
  let none = 1;
  for (let hour = fromHour; hour < fromHour + count; hour += 1) {
    const chance = hours.rainChanceOfPct[hour] ?? NaN;
    most = Math.max(most, chance);
    none *= 1 - chance / 100;
  }
  return { leastPct: most, mostPct: 100 * (1 - none) };
}

/**
 * Dry hours after the end of each step against the hours the plan needs. The first hour whose amount or chance of rain reaches the
 * plan's thresholds ends the spell. A spell that the forecast does not cover cannot be told. In a window the last step counts, so
 * the hours run from the end of the window.
 */
export const judgeRainFree: LimitJudge = ({ morning, hours }, plan) => {
  const needed = plan.limits.rainFreeHours;
  if (needed === undefined) return null;
  const states = hourStates(hours, plan);
  // From each hour on: hours until the first that is not dry, and what that one is.
  const until = column(hours.count + 1);
  const endedBy = byteColumn(hours.count + 1).fill(unknown);
  for (let hour = hours.count - 1; hour >= 0; hour -= 1) {
    if (states[hour] === dry) {
      until[hour] = until[hour + 1]! + 1;
      endedBy[hour] = endedBy[hour + 1]!;
    } else endedBy[hour] = states[hour]!;
  }
  const value = column(morning.count);
  const headroom = column(morning.count);
  const mostPct = plan.limits.rainChanceMaxPct;
  for (let step = 0; step < morning.count; step += 1) {
    const grid = step + morning.offsetSteps;
    const hour = Math.floor(grid / stepsPerHour);
    const spell = until[hour]! - (grid % stepsPerHour) / stepsPerHour - stepH;
    const isWetNow = states[hour] === wet;
    const told = isWetNow ? 0 : Math.max(0, spell);
    const isOpen = endedBy[hour] === unknown && !isWetNow;
    value[step] = isOpen && (told < needed || states[hour] === unknown) ? NaN : told;
    headroom[step] = isWetNow ? -1 : needed > 0 ? clampHeadroom((value[step]! - needed) / needed) : value[step]! >= 0 ? 1 : NaN;
    if (mostPct !== undefined && !(headroom[step]! < 0)) headroom[step] = Math.min(headroom[step]!, chanceHeadroom(hours, hour, grid, needed, mostPct));
  }
  return { limit: 'rainFree', value, bound: needed, headroom, isHard: true };
};

function chanceHeadroom(hours: HourTable, hour: number, grid: number, neededH: number, mostPct: number): number {
  const intoHourH = (grid % stepsPerHour) / stepsPerHour + stepH;
  const { mostPct: chancePct } = rainChanceBandPct(hours, hour, Math.ceil(intoHourH + neededH));
  if (chancePct > mostPct) return clampHeadroom((mostPct - chancePct) / Math.max(1, 100 - mostPct));
  return mostPct > 0 ? clampHeadroom((mostPct - chancePct) / mostPct) : chancePct === 0 ? 0 : NaN;
}

/** Start of the first wet hour at or after an instant, epoch ms; null when none is forecast. */
export function firstWetHourMs(hours: HourTable, plan: PlanToJudge, fromMs: number): number | null {
  const states = hourStates(hours, plan);
  for (let hour = Math.max(0, Math.floor((fromMs - hours.startMs) / hourMs)); hour < hours.count; hour += 1) if (states[hour] === wet) return hours.startMs + hour * hourMs;
  return null;
}
