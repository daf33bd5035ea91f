import { useSyncExternalStore } from 'react';
import type { AssessmentStep, SprayWindow } from '../../../shared/assessment/answer.ts';
import { useT } from '../../lib/messages/use-t.ts';
import { clockTime, type Reader } from '../../lib/time.ts';
import type { Cursor } from './cursor.ts';
import type { Lane } from './geometry.ts';
import { momentText, standing, valueText } from './words.ts';

interface ReadingProps {
  steps: AssessmentStep[];
  cursor: Cursor;
  reader: Reader;
}

function useStep({ steps, cursor }: Pick<ReadingProps, 'steps' | 'cursor'>): AssessmentStep {
  const index = useSyncExternalStore(cursor.subscribe, cursor.read, cursor.read);
  return steps[Math.min(index, steps.length - 1)]!;
}

/** The moment under the cursor in big type, and the limit that is tightest there. The slider says the same aloud. */
export function RibbonMoment({ windows, ...props }: ReadingProps & { windows: SprayWindow[] }) {
  const t = useT();
  const step = useStep(props);
  const { state, tightest } = momentText(step, windows, props.reader.units, t);
  return (
    <p className="ribbon-moment" aria-hidden="true">
      <span className="ribbon-clock">{clockTime(step.time, props.reader)}</span>
      <span className="leading-tight">
        <strong className="block">{state}</strong>
        <span className="block text-sm text-ink-soft">{tightest}</span>
      </span>
    </p>
  );
}

/** Every limit at the moment under the cursor. */
export function RibbonReading({ lanes, binding, ...props }: ReadingProps & { lanes: Lane[]; binding: string | null }) {
  const t = useT();
  const step = useStep(props);
  return (
    <dl aria-hidden="true">
      {lanes.map(({ limit }) => {
        const at = step.limits[limit];
        return (
          at && (
            <div key={limit} className="ribbon-row">
              <dt className={limit === binding ? 'font-bold' : ''}>{t(`limit.${limit}`)}</dt>
              <dd className="text-right font-semibold">{at.value === null ? '—' : valueText(limit, at.value, props.reader.units, t)}</dd>
              <dd className={`text-right text-sm ${at.headroom !== null && at.headroom < 0 ? 'font-bold' : 'text-ink-soft'}`}>{standing(at, t)}</dd>
            </div>
          )
        );
      })}
    </dl>
  );
}
