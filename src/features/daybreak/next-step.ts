import type { Daybreak, PlanVerdict } from '../../../shared/api/mornings.ts';
import { clockTime, dateOf, daysBetween, longDate, weekday, type Reader } from '../../lib/time.ts';
import { stateOf } from '../../lib/verdict-text.ts';

/** What to do next, in one sentence, and the page that it is done on. */
export interface NextStep {
  text: string;
  /** The morning to open, the page to make a plan, or to ask for a newer forecast. */
  does: { kind: 'morning'; date: string; label: string } | { kind: 'plan'; label: string } | { kind: 'refresh'; label: string };
}

export const hasPassed = (instant: string, now: string): boolean => Date.parse(instant) <= Date.parse(now);

/** `This morning`, `Tomorrow morning`, or the day's name. */
export function morningName(date: string, now: string, timeZone: string): string {
  const days = daysBetween(dateOf(now, timeZone), date);
  if (days === 0) return 'This morning';
  return days === 1 ? 'Tomorrow morning' : longDate(date);
}

function stepOfGo({ window, date, planId }: PlanVerdict, now: string, reader: Reader): NextStep {
  const open = { kind: 'morning', date, label: 'Look at the morning' } as const;
  if (planId === null) return { text: 'No plan covers it yet; these are the usual limits.', does: { kind: 'plan', label: 'Make a plan' } };
  const { bestStart, latestStart, start, end } = window!;
  if (dateOf(now, reader.timeZone) !== date) return { text: 'Set things out tonight. Dawn checks again.', does: open };
  if (hasPassed(end, now)) return { text: `The window closed at ${clockTime(end, reader)}.`, does: open };
  if (latestStart && hasPassed(latestStart, now)) return { text: `Too late to start: the job would not end before ${clockTime(end, reader)}.`, does: open };
  const check = { ...open, label: 'Check on site' };
  if (hasPassed(start, now)) return { text: `The window is open. Measure the wind, then start by ${clockTime(latestStart ?? end, reader)}.`, does: check };
  return { text: `Best start ${clockTime(bestStart ?? start, reader)}, at the latest ${clockTime(latestStart ?? end, reader)}. Measure the wind first.`, does: check };
}

/** The first later morning on which this plan may go. */
export function nextGo({ mornings }: Pick<Daybreak, 'mornings'>, { date, planId }: Pick<PlanVerdict, 'date' | 'planId'>): PlanVerdict | null {
  for (const morning of mornings) {
    if (morning.date <= date) continue;
    const fits = morning.verdicts.find((verdict) => verdict.verdict === 'go' && verdict.planId === planId);
    if (fits) return fits;
  }
  return null;
}

/** @param mayRefresh whether the reader's role may fetch a fresh forecast @param mayPlan whether it may make a plan */
export function nextStep(daybreak: Daybreak, verdict: PlanVerdict, reader: Reader, may: { refresh: boolean; plan: boolean }): NextStep {
  const { now } = daybreak;
  const open = { kind: 'morning', date: verdict.date, label: 'Look at the morning' } as const;
  if (stateOf(verdict) === 'unknown') {
    return may.refresh ? { text: 'Silence is never a go. Ask for a newer forecast.', does: { kind: 'refresh', label: 'Fetch the forecast' } } : { text: 'Silence is never a go. Dawnvane keeps asking for a forecast.', does: open };
  }
  if (verdict.verdict === 'go') {
    const step = stepOfGo(verdict, now, reader);
    return step.does.kind === 'plan' && !may.plan ? { ...step, does: open } : step;
  }
  const better = nextGo(daybreak, verdict);
  if (better) return { text: `${longDate(better.date)} looks better.`, does: { kind: 'morning', date: better.date, label: `Look at ${weekday(better.date)}` } };
  return { text: 'No better morning in sight yet. Dawnvane keeps looking.', does: open };
}
