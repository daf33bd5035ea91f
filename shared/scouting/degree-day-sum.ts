import { degreeDaysSingleSine } from '../atmosphere/degree-days.ts';
import { addDays, daysBetween } from '../rules/calendar.ts';
import type { DegreeDayTarget } from './degree-day-targets.ts';
import { grouped } from './group.ts';

export const degreeDayMethods = ['singleSine', 'hourly'] as const;
export type DegreeDayMethod = (typeof degreeDayMethods)[number];

/** One hour of stored weather, by the farm's local date. */
export interface HourTemperature {
  date: string;
  temperatureC: number;
}

export interface DegreeDay {
  date: string;
  /** NaN when too few hours are known. */
  degreeDaysC: number;
  /** Sum from the start date through this day, unknown days left out. */
  totalC: number;
}

export interface DegreeDaySum {
  days: DegreeDay[];
  totalC: number;
  /** Days of which too little is known; the true sum is then higher. */
  missing: string[];
}

/** A day with fewer hours may have lost its minimum or maximum. Common practice, no source; a day of a clock change has 23. */
export const hoursNeeded = 20;

/** Degree days of one day's hours as the mean of what each hour lies above the base, cut at the upper threshold. @returns °C × days */
export function degreeDaysHourly(temperaturesC: readonly number[], baseC: number, upperC: number = Infinity): number {
  if (temperaturesC.length === 0) return NaN;
  return temperaturesC.reduce((sum, temperatureC) => sum + Math.max(0, Math.min(temperatureC, upperC) - baseC), 0) / temperaturesC.length;
}

/**
 * Degree days from stored hours, day by day, both ends included.
 * Use the method that the target's figures were made with; most insect models use the single sine [baskervilleEmin1969].
 * @throws RangeError when the last day is before the first
 */
export function sumDegreeDays(hours: readonly HourTemperature[], from: string, to: string, { baseC, upperC }: Pick<DegreeDayTarget, 'baseC' | 'upperC'>, method: DegreeDayMethod): DegreeDaySum {
  const length = daysBetween(from, to) + 1;
  if (length < 1) throw new RangeError(`to must not be before from: ${from}, ${to}.`);
  const byDate = grouped(hours.filter(({ temperatureC }) => Number.isFinite(temperatureC)), ({ date }) => date);
  const upper = upperC ?? Infinity;
  let totalC = 0;
  const days = Array.from({ length }, (_, index): DegreeDay => {
    const date = addDays(from, index);
    const temperatures = (byDate.get(date) ?? []).map(({ temperatureC }) => temperatureC);
    if (temperatures.length < hoursNeeded) return { date, degreeDaysC: NaN, totalC };
    const degreeDaysC = method === 'hourly' ? degreeDaysHourly(temperatures, baseC, upper) : degreeDaysSingleSine(Math.min(...temperatures), Math.max(...temperatures), baseC, upper);
    totalC += degreeDaysC;
    return { date, degreeDaysC, totalC };
  });
  return { days, totalC, missing: days.filter(({ degreeDaysC }) => Number.isNaN(degreeDaysC)).map(({ date }) => date) };
}

export interface ScoutAdvice {
  /** `soon`: within a week at the pace of the last days. */
  state: 'before' | 'soon' | 'now' | 'past';
  totalC: number;
  /** Days until the range begins at that pace; null when it has begun, or nothing adds up yet. */
  daysUntil: number | null;
  /** The sum is too low: days are missing. */
  isAtLeast: boolean;
}

/** Days over which the pace is taken, and within which a target counts as soon: the e-mail on the eve of a week. */
export const paceDays = 7;

/** "Scout now" advice for one target. A range to look in, never a day to treat on. */
export function scoutAdvice({ days, totalC, missing }: DegreeDaySum, { fromDegreeDaysC, toDegreeDaysC }: Pick<DegreeDayTarget, 'fromDegreeDaysC' | 'toDegreeDaysC'>): ScoutAdvice {
  const isAtLeast = missing.length > 0;
  if (totalC > toDegreeDaysC) return { state: 'past', totalC, daysUntil: null, isAtLeast };
  if (totalC >= fromDegreeDaysC) return { state: 'now', totalC, daysUntil: null, isAtLeast };
  const recent = days.slice(-paceDays).filter(({ degreeDaysC }) => !Number.isNaN(degreeDaysC));
  const perDay = recent.reduce((sum, { degreeDaysC }) => sum + degreeDaysC, 0) / recent.length;
  const daysUntil = perDay > 0 ? Math.ceil((fromDegreeDaysC - totalC) / perDay) : null;
  return { state: daysUntil !== null && daysUntil <= paceDays ? 'soon' : 'before', totalC, daysUntil, isAtLeast };
}
