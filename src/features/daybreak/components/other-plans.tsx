import { Link } from 'react-router-dom';
import type { PlanVerdict } from '../../../../shared/api/mornings.ts';
import { VerdictSign } from '../../../components/index.ts';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { stateOf, why, windowText } from '../../../lib/verdict-text.ts';

const words = { go: 'Go', hold: 'Hold', unknown: 'Hold, not enough to tell' } as const;

/** The other plans of the same morning, a line each. */
export function OtherPlans({ verdicts }: { verdicts: PlanVerdict[] }) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  return (
    <ul className="mt-2 divide-y divide-ink/15 border-y border-ink/15">
      {verdicts.map((verdict) => {
        const state = stateOf(verdict);
        return (
          <li key={verdict.planId}>
            <Link to={paths.morning(farmId, verdict.date)} className="flex min-h-touch items-center gap-3 py-1">
              <VerdictSign state={state} size={36} silent />
              <span className="min-w-0">
                <span className="block truncate">
                  <strong>{[words[state], windowText(verdict, reader)].filter(Boolean).join(', ')}</strong> · {verdict.planName}
                </span>
                {state === 'hold' && <span className="block truncate text-sm text-ink-soft">{why(verdict, reader)}</span>}
              </span>
            </Link>
          </li>
        );
      })}
    </ul>
  );
}
