import type { PlanVerdict } from '../../shared/api/mornings.ts';
import type { AssessmentAnswer, AssessmentStep } from '../../shared/assessment/answer.ts';
import { bestWindowOf, headlineOf } from '../../shared/assessment/sentences.ts';

/** Every second step of the assessment: 10 minutes. */
const ribbonStride = 2;
const stepMinutes = 5;

/** Least headroom among the hard limits of a step; null when one of them cannot be told. */
export function leastHardHeadroom(step: AssessmentStep): number | null {
  let least: number | null = 1;
  for (const at of Object.values(step.limits)) {
    if (at.kind !== 'hard') continue;
    if (at.headroom === null) return null;
    least = Math.min(least, at.headroom);
  }
  return least;
}

const rounded = (value: number, digits: number): number => Number(value.toFixed(digits));

/** An answer in short: what Daybreak shows and a notice tells. */
export function summaryOf(
  answer: AssessmentAnswer,
  about: { planId: string | null; planName: string; date: string; minutesNeeded: number; reserveMinutes: number; timeZone: string; decidedAt: Date },
): PlanVerdict {
  const { timeZone, decidedAt, ...named } = about;
  const steps = answer.steps.filter((_, index) => index % ribbonStride === 0);
  return {
    ...named,
    verdict: answer.verdict,
    enoughToTell: answer.enoughToTell,
    bindingLimit: answer.bindingLimit,
    headline: { us: headlineOf(answer, { units: 'us', timeZone }), metric: headlineOf(answer, { units: 'metric', timeZone }) },
    reasons: answer.reasons,
    window: chosenWindow(answer),
    sun: { civilDawn: answer.sun.civilDawn, sunrise: answer.sun.sunrise, localNoon: answer.sun.localNoon },
    ribbon: {
      startAt: steps[0]?.time ?? null,
      stepMinutes: ribbonStride * stepMinutes,
      headroom: steps.map((step) => {
        const least = leastHardHeadroom(step);
        return least === null ? null : rounded(least, 2);
      }),
      sunAltitudeDeg: steps.map((step) => rounded(step.sunAltitudeDeg, 1)),
    },
    revision: 0,
    decidedAt: decidedAt.toISOString(),
  };
}

/** The window the job goes into; on a hold, the longest there is. */
function chosenWindow(answer: AssessmentAnswer): PlanVerdict['window'] {
  const fitting = bestWindowOf(answer);
  if (fitting) return fitting;
  return answer.windows.reduce<PlanVerdict['window']>((longest, window) => (longest && longest.minutes >= window.minutes ? longest : window), null);
}
