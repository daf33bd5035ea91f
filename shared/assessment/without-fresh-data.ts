import type { AssessmentAnswer, Reason } from './answer.ts';

const stale: Reason = { limit: 'data', kind: 'notEnough', at: null, text: 'Not enough to tell: no fresh forecast is to be had.', key: 'data.stale', params: {} };

/**
 * The same morning when its forecast is too old to trust: always a hold, not enough to tell. What the old forecast showed stays to
 * be looked at, with no start in it.
 */
export function withoutFreshData(answer: AssessmentAnswer): AssessmentAnswer {
  return {
    ...answer,
    verdict: 'hold',
    enoughToTell: false,
    bindingLimit: 'data',
    reasons: [stale, ...answer.reasons.filter(({ kind }) => kind === 'hold' || kind === 'caution' || kind === 'notEnough')],
    windows: answer.windows.map((window) => ({ ...window, bestStart: null, latestStart: null })),
  };
}
