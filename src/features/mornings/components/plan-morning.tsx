import type { Morning } from '../../../../shared/api/mornings.ts';
import { retell } from '../../../../shared/assessment/sentences.ts';
import type { Reason } from '../../../../shared/assessment/answer.ts';
import { Panel, VerdictSign } from '../../../components/index.ts';
import { HeadroomRibbon } from '../../../components/ribbon/headroom-ribbon.tsx';
import { useReader } from '../../../lib/session/session.ts';
import { minutesText, stateOf, windowText } from '../../../lib/verdict-text.ts';

const words = { go: 'Go', hold: 'Hold', unknown: 'Hold, not enough to tell' } as const;

/** What each kind of reason is, in a word before it. */
const kindWords: Record<Reason['kind'], string> = { binding: 'Binds', hold: 'Holds', nearestMiss: 'Nearest miss', notEnough: 'Missing', advice: 'Advice', caution: 'Mind' };

/** One plan on this morning: verdict, ribbon, and every reason. */
export function PlanMorning({ plan: { verdict, answer } }: { plan: Morning['plans'][number] }) {
  const reader = useReader();
  const state = stateOf(verdict);
  return (
    <Panel title={verdict.planName}>
      <div className="mb-4 flex items-center gap-4">
        <VerdictSign state={state} size={64} silent />
        <p>
          <span className="block text-2xl font-bold">{[words[state], windowText(verdict, reader)].filter(Boolean).join(', ')}</span>
          <span className="block">{verdict.headline[reader.units]}</span>
          {state !== 'unknown' && <span className="block text-ink-soft">{minutesText(verdict)}</span>}
        </p>
      </div>
      <HeadroomRibbon answer={answer} timeZone={reader.timeZone} minutesNeeded={verdict.minutesNeeded} units={reader.units} />
      <h3 className="mt-6 mb-2">Why</h3>
      <ul className="space-y-2">
        {answer.reasons.map((reason, index) => (
          <li key={index}>
            <strong>{kindWords[reason.kind]}:</strong> {retell(reason, answer, reader)}
          </li>
        ))}
      </ul>
    </Panel>
  );
}
