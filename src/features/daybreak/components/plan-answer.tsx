import { Link } from 'react-router-dom';
import type { Daybreak, PlanVerdict } from '../../../../shared/api/mornings.ts';
import { MiniRibbon, VerdictSign } from '../../../components/index.ts';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useMay, useReader } from '../../../lib/session/session.ts';
import { longDate } from '../../../lib/time.ts';
import { minutesText, stateOf, why, windowText } from '../../../lib/verdict-text.ts';
import { nextStep } from '../next-step.ts';
import { NextStepLink } from './next-step-link.tsx';

const stateWords = { go: 'Go', hold: 'Hold', unknown: 'Hold' } as const;

/** The answer for one plan: the sign, the word in big type, why, and what to do next. */
export function PlanAnswer({ daybreak, verdict }: { daybreak: Daybreak; verdict: PlanVerdict }) {
  const { id: farmId } = useFarm();
  const may = useMay();
  const reader = useReader();
  const state = stateOf(verdict);
  const window = windowText(verdict, reader);
  const step = nextStep(daybreak, verdict, reader, { refresh: may('run', 'morning'), plan: may('create', 'plan') });
  return (
    <section aria-label={verdict.planName}>
      <div className="flex items-center gap-4">
        <VerdictSign state={state} size={76} silent />
        <p>
          <span className="answer block">
            {stateWords[state]}
            {window && <span className="sr-only">, </span>}
          </span>
          {window && <span className="block text-2xl font-semibold whitespace-nowrap">{window}</span>}
          {state === 'unknown' && <span className="block text-xl font-semibold">not enough to tell</span>}
        </p>
      </div>
      <p className="mt-2 leading-snug">
        <strong>{verdict.planName}.</strong> {why(verdict, reader)}
      </p>
      {state !== 'unknown' && <p className="leading-snug text-ink-soft">{minutesText(verdict)}</p>}
      <p className="mt-1 leading-snug">{step.text}</p>
      <div className="mt-2 flex items-center gap-4">
        <NextStepLink farmId={farmId} step={step} />
        <Link to={paths.morning(farmId, verdict.date)} aria-label={`The ribbon of ${longDate(verdict.date)}`} className="min-w-0 flex-1">
          <MiniRibbon {...verdict.ribbon} className="h-12 w-full lg:h-16" />
        </Link>
      </div>
    </section>
  );
}
