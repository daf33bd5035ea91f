import { memo, useCallback, useId, useMemo, useState } from 'react';
import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import { useT } from '../../lib/messages/use-t.ts';
import { useMediaQuery } from '../../lib/use-media-query.ts';
import { useWidth } from '../../lib/use-width.ts';
import { createCursor } from './cursor.ts';
import { RibbonDrawing } from './drawing.tsx';
import { lanesOf } from './geometry.ts';
import { KnotList } from './knot-list.tsx';
import { layoutOf } from './layout.ts';
import { RibbonMoment, RibbonReading } from './reading.tsx';
import { Scrubber } from './scrubber.tsx';
import { RibbonTable } from './table.tsx';
import { sentenceAt } from './words.ts';

interface HeadroomRibbonProps {
  answer: AssessmentAnswer;
  timeZone: string;
  minutesNeeded: number;
  units: UnitSystem;
}

const StillDrawing = memo(RibbonDrawing);
/** Until its room is measured. */
const usualWidthPx = 640;

/**
 * The sign of a morning: one ribbon per limit, as thick as its headroom, under the sky of that morning. Where all hard limits
 * are open a band of light falls through, with the minutes needed laid on it. A time cursor reads every value.
 */
export function HeadroomRibbon({ answer, timeZone, minutesNeeded, units }: HeadroomRibbonProps) {
  const t = useT();
  const { steps, windows } = answer;
  const upright = !useMediaQuery('(min-width: 48rem)');
  const [room, widthPx] = useWidth<HTMLDivElement>(usualWidthPx);
  const [onlyBinding, setOnlyBinding] = useState(false);
  const [asTable, setAsTable] = useState(false);
  const [cursor] = useState(() => createCursor(firstCursor(answer)));
  const help = useId();
  const allLanes = useMemo(() => lanesOf(steps), [steps]);
  const binding = allLanes.some(({ limit }) => limit === answer.bindingLimit) ? answer.bindingLimit : null;
  const lanes = useMemo(() => (onlyBinding && binding ? allLanes.filter(({ limit }) => limit === binding) : allLanes), [allLanes, onlyBinding, binding]);
  const layout = useMemo(() => layoutOf({ steps: steps.length, lanes: lanes.length, upright, widthPx }), [steps.length, lanes.length, upright, widthPx]);
  const reader = useMemo(() => ({ units, timeZone }), [units, timeZone]);
  const sentence = useCallback((index: number) => sentenceAt(steps[index]!, windows, reader, t), [steps, windows, reader, t]);
  const showTable = useCallback(() => setAsTable(true), []);
  if (steps.length === 0 || allLanes.length === 0) return <p>{t('ribbon.nothing')}</p>;

  return (
    <div>
      <div className="mb-2 flex flex-wrap gap-2">
        {binding && (
          <button type="button" className="ribbon-choice" aria-pressed={onlyBinding} onClick={() => setOnlyBinding(!onlyBinding)}>
            {t('ribbon.onlyBinding')}
          </button>
        )}
        <button type="button" className="ribbon-choice" aria-pressed={asTable} onClick={() => setAsTable(!asTable)}>
          {t('ribbon.asTable')}
        </button>
      </div>
      {asTable ? (
        <RibbonTable answer={answer} lanes={lanes} reader={reader} />
      ) : (
        <>
          <div className="ribbon-stage">
            <RibbonMoment steps={steps} windows={windows} cursor={cursor} reader={reader} />
            <div ref={room} className="ribbon-room">
              <Scrubber layout={layout} steps={steps.length} cursor={cursor} label={t('ribbon.cursor')} sentence={sentence} describedBy={help} onTable={showTable}>
                <StillDrawing answer={answer} lanes={lanes} layout={layout} timeZone={timeZone} minutesNeeded={minutesNeeded} units={units} binding={binding} />
              </Scrubber>
            </div>
            <RibbonReading steps={steps} cursor={cursor} reader={reader} lanes={lanes} binding={binding} />
          </div>
          <KnotList answer={answer} lanes={lanes} cursor={cursor} reader={reader} />
        </>
      )}
      <p id={help} className="mt-3 text-sm text-ink-soft">
        {t('ribbon.help')}
      </p>
      <details className="mt-1">
        <summary className="inline-flex min-h-touch items-center text-sm underline underline-offset-4">{t('ribbon.keyTitle')}</summary>
        <dl className="grid gap-x-8 gap-y-2 text-sm sm:grid-cols-2">
          {allLanes.map(({ limit }) => (
            <div key={limit}>
              <dt className="font-semibold">{t(`limit.${limit}`)}</dt>
              <dd className="text-ink-soft">{t(`key.${limit}`)}</dd>
            </div>
          ))}
        </dl>
      </details>
    </div>
  );
}

/** The cursor starts where the job would: at the best start, else at the first window, else at sunrise. */
function firstCursor({ windows, steps, sun }: AssessmentAnswer): number {
  const at = windows.find((window) => window.bestStart)?.bestStart ?? windows[0]?.start ?? sun.sunrise;
  const found = at === null || at === undefined ? -1 : steps.findIndex((step) => step.time >= at);
  return found === -1 ? 0 : found;
}
