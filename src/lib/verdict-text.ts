import type { PlanVerdict } from '../../shared/api/mornings.ts';
import type { Reason } from '../../shared/assessment/answer.ts';
import { retell } from '../../shared/assessment/sentences.ts';
import { stateOf } from '../../shared/look/verdict-sign.ts';
import { clockTime, type Reader } from './time.ts';

export { stateOf };

/** `5:25 to 6:10`; nothing without a window. */
export function windowText(verdict: Pick<PlanVerdict, 'verdict' | 'window'>, reader: Reader): string {
  const { window } = verdict;
  return verdict.verdict === 'go' && window ? `${clockTime(window.start, reader)} to ${clockTime(window.end, reader)}` : '';
}

const leading: readonly Reason['kind'][] = ['notEnough', 'nearestMiss', 'hold', 'binding'];

/** The one sentence that tells why: what is missing, what nearly fitted, what holds, or what binds. */
export function why(verdict: PlanVerdict, { units, timeZone }: Reader): string {
  const sun = { ...verdict.sun, solarNoon: null, sunset: null };
  for (const kind of leading) {
    const reason = verdict.reasons.find((candidate) => candidate.kind === kind);
    if (reason) return retell(reason, { sun }, { units, timeZone });
  }
  return verdict.headline[units];
}

/** `45 min open; 31 needed, and 10 spare.` */
export function minutesText({ window, minutesNeeded, reserveMinutes }: Pick<PlanVerdict, 'window' | 'minutesNeeded' | 'reserveMinutes'>): string {
  const open = window ? `${Math.round(window.minutes)} min open` : 'No minute open';
  return `${open}; ${minutesNeeded} needed${reserveMinutes > 0 ? `, and ${reserveMinutes} spare` : ''}.`;
}
