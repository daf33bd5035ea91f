import { memo, useId, useMemo, useState, type KeyboardEvent, type PointerEvent } from 'react';
import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import { clockTime } from '../../lib/time.ts';
import { useMediaQuery } from '../../lib/use-media-query.ts';
import { RibbonDrawing } from './drawing.tsx';
import { lanesOf } from './geometry.ts';
import { layoutOf, type Layout } from './layout.ts';
import { RibbonReading } from './reading.tsx';
import { RibbonTable } from './table.tsx';
import { limitAtText } from './words.ts';

interface HeadroomRibbonProps {
  answer: AssessmentAnswer;
  timeZone: string;
  minutesNeeded: number;
  units: UnitSystem;
}

const StillDrawing = memo(RibbonDrawing);
const stepMinutes = 5;

/** Moves of the cursor by key, in steps. */
const keyMoves: Record<string, number> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1, PageDown: 6, PageUp: -6 };

/**
 * The sign of a morning: one ribbon per limit, as thick as its headroom, under the sky of that morning. Where all hard limits
 * are open a band of light falls through, with the minutes needed laid on it. A time cursor reads every value.
 */
export function HeadroomRibbon({ answer, timeZone, minutesNeeded, units }: HeadroomRibbonProps) {
  const { steps } = answer;
  const upright = !useMediaQuery('(min-width: 48rem)');
  const [onlyBinding, setOnlyBinding] = useState(false);
  const [asTable, setAsTable] = useState(false);
  const allLanes = useMemo(() => lanesOf(steps), [steps]);
  const binding = allLanes.some(({ limit }) => limit === answer.bindingLimit) ? answer.bindingLimit : null;
  const lanes = useMemo(() => (onlyBinding && binding ? allLanes.filter(({ limit }) => limit === binding) : allLanes), [allLanes, onlyBinding, binding]);
  const layout = useMemo(() => layoutOf({ steps: steps.length, lanes: lanes.length, upright }), [steps.length, lanes.length, upright]);
  const [cursor, setCursor] = useState(() => firstCursor(answer));
  const key = useId();
  if (steps.length === 0 || allLanes.length === 0) return <p>There is nothing to draw for this morning yet.</p>;
  const index = Math.min(cursor, steps.length - 1);
  const step = steps[index]!;

  return (
    <div>
      <div className="mb-3 flex flex-wrap gap-2">
        {binding && (
          <button type="button" className="ribbon-choice" aria-pressed={onlyBinding} onClick={() => setOnlyBinding(!onlyBinding)}>
            Only what binds
          </button>
        )}
        <button type="button" className="ribbon-choice" aria-pressed={asTable} onClick={() => setAsTable(!asTable)}>
          As a table
        </button>
      </div>
      {asTable ? (
        <RibbonTable answer={answer} lanes={lanes} timeZone={timeZone} units={units} />
      ) : (
        <div className={upright ? '' : 'grid grid-cols-[1fr_17rem] gap-6'}>
          <Scrubber layout={layout} steps={steps.length} index={index} move={setCursor} label="Time of the morning" value={sentenceAt(answer, index, timeZone, units)} describedBy={key}>
            <StillDrawing answer={answer} lanes={lanes} layout={layout} timeZone={timeZone} minutesNeeded={minutesNeeded} units={units} binding={binding} />
            <g transform={layout.cursor(index)} className="pointer-events-none">
              <path d={layout.cursorPath} className="stroke-ink" strokeWidth={1.5} />
              <circle {...layout.cursorGrip} r={7} className="fill-ink stroke-paper-raised" strokeWidth={2} />
            </g>
          </Scrubber>
          <RibbonReading step={step} lanes={lanes} timeZone={timeZone} units={units} binding={binding} />
        </div>
      )}
      <p id={key} className="mt-3 text-sm text-ink-soft">
        The thicker a ribbon, the more room there is before its limit; a knot marks where it runs out. The band of light is the spray window. Drag, or use the arrow keys, to read any moment.
      </p>
    </div>
  );
}

/** The cursor starts where the job would: at the best start, else at the first window, else at sunrise. */
function firstCursor({ windows, steps, sun }: AssessmentAnswer): number {
  const at = windows.find((window) => window.bestStart)?.bestStart ?? windows[0]?.start ?? sun.sunrise;
  const found = at === null || at === undefined ? -1 : steps.findIndex((step) => step.time >= at);
  return found === -1 ? 0 : found;
}

/** What a screen reader says of a moment: whole sentences, what binds first. */
function sentenceAt(answer: AssessmentAnswer, index: number, timeZone: string, units: UnitSystem): string {
  const step = answer.steps[index]!;
  const told = Object.entries(step.limits) as [Parameters<typeof limitAtText>[0], Parameters<typeof limitAtText>[1]][];
  const byRoom = told.sort(([, one], [, two]) => (one.headroom ?? -2) - (two.headroom ?? -2));
  return `${clockTime(step.time, { units, timeZone })}. ${byRoom.map(([limit, at]) => `${limitAtText(limit, at, units)}.`).join(' ')}`;
}

interface ScrubberProps {
  layout: Layout;
  steps: number;
  index: number;
  move: (index: number) => void;
  label: string;
  value: string;
  describedBy: string;
  children: React.ReactNode;
}

/** The drawing as a slider over time: pointer, touch and keys move one cursor. */
function Scrubber({ layout, steps, index, move, label, value, describedBy, children }: ScrubberProps) {
  const fromPointer = (event: PointerEvent<SVGSVGElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    move(layout.indexAt((event.clientX - box.left) / box.width, (event.clientY - box.top) / box.height));
  };
  const onKeyDown = (event: KeyboardEvent) => {
    const next = event.key === 'Home' ? 0 : event.key === 'End' ? steps - 1 : event.key in keyMoves ? index + keyMoves[event.key]! : null;
    if (next === null) return;
    event.preventDefault();
    move(Math.max(0, Math.min(steps - 1, next)));
  };
  return (
    <svg
      viewBox={layout.viewBox}
      className={`w-full select-none ${layout.upright ? 'touch-none' : 'touch-pan-y'}`}
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-orientation={layout.upright ? 'vertical' : 'horizontal'}
      aria-valuemin={0}
      aria-valuemax={(steps - 1) * stepMinutes}
      aria-valuenow={index * stepMinutes}
      aria-valuetext={value}
      aria-describedby={describedBy}
      onKeyDown={onKeyDown}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        fromPointer(event);
      }}
      onPointerMove={(event) => event.buttons > 0 && fromPointer(event)}
    >
      {children}
    </svg>
  );
}
