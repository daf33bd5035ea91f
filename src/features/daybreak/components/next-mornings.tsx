import { Link } from 'react-router-dom';
import type { Daybreak, PlanVerdict } from '../../../../shared/api/mornings.ts';
import { MiniRibbon, VerdictSign } from '../../../components/index.ts';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { longDate, weekday, type Reader } from '../../../lib/time.ts';
import { stateOf, windowText } from '../../../lib/verdict-text.ts';

const words = { go: 'go', hold: 'hold', unknown: 'not enough to tell' } as const;
const shortWords = { go: 'Go', hold: 'Hold', unknown: '?' } as const;

/** The plan that stands for a morning among several: one that may go, else the first. */
export const leadOf = (verdicts: PlanVerdict[]): PlanVerdict | undefined => verdicts.find(({ verdict }) => verdict === 'go') ?? verdicts.find(({ enoughToTell }) => enoughToTell) ?? verdicts[0];

const spoken = (verdict: PlanVerdict, reader: Reader): string => `${longDate(verdict.date)}: ${[words[stateOf(verdict)], windowText(verdict, reader)].filter(Boolean).join(', ')}`;

/** The mornings after the coming one, as small ribbons to pick the best one from. */
export function NextMornings({ mornings }: Pick<Daybreak, 'mornings'>) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  return (
    <ol className="grid grid-cols-5 gap-1 sm:gap-3">
      {mornings.map(({ date, verdicts }) => {
        const verdict = leadOf(verdicts);
        if (!verdict) return null;
        const state = stateOf(verdict);
        return (
          <li key={date}>
            <Link to={paths.morning(farmId, date)} aria-label={spoken(verdict, reader)} className="flex flex-col items-center rounded-lg px-1 py-1 hover:bg-paper-sunk">
              <span className="text-sm font-semibold">{weekday(date)}</span>
              <VerdictSign state={state} size={30} silent />
              <span className="text-sm">{shortWords[state]}</span>
              <MiniRibbon {...verdict.ribbon} className="mt-1 h-8 w-full lg:h-12" />
            </Link>
          </li>
        );
      })}
    </ol>
  );
}
