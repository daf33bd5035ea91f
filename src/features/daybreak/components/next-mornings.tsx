import { Link } from 'react-router-dom';
import type { Daybreak, PlanVerdict } from '../../../../shared/api/mornings.ts';
import { MiniRibbon, VerdictSign } from '../../../components/index.ts';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { shortDate, weekday } from '../../../lib/time.ts';
import { stateOf, why, windowText } from '../../../lib/verdict-text.ts';

const words = { go: 'Go', hold: 'Hold', unknown: 'Untold' } as const;

/** The plan that stands for a morning among several: one that may go, else the first. */
export const leadOf = (verdicts: PlanVerdict[]): PlanVerdict | undefined => verdicts.find(({ verdict }) => verdict === 'go') ?? verdicts.find(({ enoughToTell }) => enoughToTell) ?? verdicts[0];

/** The mornings after the coming one, as small ribbons to pick the best one from. */
export function NextMornings({ mornings }: Pick<Daybreak, 'mornings'>) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  return (
    <ol className="grid grid-cols-5 gap-1 sm:gap-3 lg:grid-cols-1 lg:gap-0 lg:divide-y lg:divide-ink/15 lg:border-y lg:border-ink/15">
      {mornings.map(({ date, verdicts }) => {
        const verdict = leadOf(verdicts);
        if (!verdict) return null;
        const state = stateOf(verdict);
        return (
          <li key={date}>
            <Link to={paths.morning(farmId, date)} className="grid justify-items-center rounded-lg px-1 py-1 hover:bg-paper-sunk lg:grid-cols-[2.5rem_2.5rem_1fr] lg:items-center lg:justify-items-start lg:gap-x-3 lg:px-2 lg:py-3">
              <span className="text-sm font-semibold lg:row-span-2 lg:text-base">
                {weekday(date)}
                <span className="sr-only">, {shortDate(date)}: </span>
              </span>
              <span className="lg:row-span-2">
                <VerdictSign state={state} size={30} silent />
              </span>
              <span className="text-sm lg:sr-only">{words[state]}</span>
              <span className="sr-only text-sm leading-snug lg:not-sr-only lg:line-clamp-2">{windowText(verdict, reader) || why(verdict, reader)}</span>
              <MiniRibbon {...verdict.ribbon} className="mt-1 h-8 w-full lg:col-start-3 lg:h-7" />
            </Link>
          </li>
        );
      })}
    </ol>
  );
}
