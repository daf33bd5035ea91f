import type { PlanVerdict } from '../../shared/api/mornings.ts';

/** What a notice told about one plan: enough to see later whether it still holds. */
export interface ToldPlan {
  /** The plan's id, or `usual` for the farm's usual limits. */
  planKey: string;
  planName: string;
  verdict: 'go' | 'hold';
  enoughToTell: boolean;
  bindingLimit: PlanVerdict['bindingLimit'];
  window: PlanVerdict['window'];
  headline: { us: string; metric: string };
}

export const toldPlan = (verdict: PlanVerdict): ToldPlan => ({
  planKey: verdict.planId ?? 'usual',
  planName: verdict.planName,
  verdict: verdict.verdict,
  enoughToTell: verdict.enoughToTell,
  bindingLimit: verdict.bindingLimit,
  window: verdict.window,
  headline: verdict.headline,
});

/** `unknown`: a hold for want of data. */
export type Sign = 'go' | 'hold' | 'unknown';

export const signOf = (plans: readonly ToldPlan[]): Sign => (plans.some((plan) => plan.verdict === 'go') ? 'go' : plans.length > 0 && plans.some((plan) => plan.enoughToTell) ? 'hold' : 'unknown');

/** How a told verdict no longer holds: `moved` is a go whose told start does not work any more. */
export interface Turn {
  plan: ToldPlan;
  to: 'hold' | 'go' | 'moved';
}

const at = (instant: string): number => Date.parse(instant);

/**
 * Which told verdicts have turned, and still matter at this instant: a go until its window ends, a hold until the new window's latest
 * start has passed. A plan that was not told is no turn; the next notice tells it.
 */
export function turnsOf(told: readonly ToldPlan[], present: readonly ToldPlan[], now: Date): Turn[] {
  const before = new Map(told.map((plan) => [plan.planKey, plan]));
  return present.flatMap<Turn>((plan) => {
    const last = before.get(plan.planKey);
    if (!last) return [];
    if (last.verdict === 'go') {
      if (last.window && at(last.window.end) <= now.getTime()) return [];
      if (plan.verdict === 'hold') return [{ plan, to: 'hold' }];
      return startStillWorks(last, plan) ? [] : [{ plan, to: 'moved' }];
    }
    if (plan.verdict === 'hold') return [];
    const latest = plan.window?.latestStart ?? plan.window?.end;
    return latest && at(latest) > now.getTime() ? [{ plan, to: 'go' }] : [];
  });
}

/** Whether someone who starts when they were told to start is inside the present window. */
function startStillWorks(told: ToldPlan, present: ToldPlan): boolean {
  const start = told.window?.bestStart;
  const window = present.window;
  if (!start || !window?.latestStart) return true;
  return at(window.start) <= at(start) && at(start) <= at(window.latestStart);
}

/** When a notice on these plans helps no more: at the end of the last window of a go, else at local noon. */
export function usefulUntil(plans: readonly ToldPlan[], localNoon: Date): Date {
  const ends = plans.flatMap((plan) => (plan.verdict === 'go' && plan.window ? [at(plan.window.end)] : []));
  // A hold beside a go is worth knowing until the morning is over.
  return ends.length > 0 && ends.length === plans.length ? new Date(Math.min(Math.max(...ends), localNoon.getTime())) : localNoon;
}

/** Minutes that a go must have held before it is told, by how often the morning has turned already. A hold never waits. */
export function dwellMinutes(turnsTold: number): number {
  return Math.min(60, 15 * turnsTold);
}
