import { useId } from 'react';
import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import type { Lane } from './geometry.ts';
import { LaneDrawing } from './lane.tsx';
import type { Layout } from './layout.ts';
import { Job, Light, place, windowSpans } from './light.tsx';
import { Sky } from './sky.tsx';

interface DrawingProps {
  answer: AssessmentAnswer;
  lanes: Lane[];
  layout: Layout;
  timeZone: string;
  minutesNeeded: number;
  units: UnitSystem;
  binding: string | null;
}

const stepMs = 300_000;

/** Everything of the ribbon that does not move with the cursor. */
export function RibbonDrawing({ answer, lanes, layout, timeZone, minutesNeeded, units, binding }: DrawingProps) {
  const litBy = useId();
  const begin = Date.parse(answer.steps[0]!.time);
  const along = (instant: string): number => layout.at((Date.parse(instant) - begin) / stepMs);
  const reader = { units, timeZone };
  return (
    <g className="ribbon">
      <clipPath id={litBy}>
        {windowSpans({ answer, layout, along })
          .filter(({ fits }) => fits)
          .map(({ from, to }) => (
            <rect key={from} {...place(layout, from, to, 0, layout.upright ? layout.width : layout.height)} />
          ))}
      </clipPath>
      <Light answer={answer} layout={layout} along={along} />
      <Sky answer={answer} layout={layout} along={along} reader={reader} />
      {lanes.map((lane, index) => (
        <LaneDrawing key={lane.limit} lane={lane} index={index} layout={layout} answer={answer} units={units} binding={lane.limit === binding} litBy={litBy} />
      ))}
      <Job answer={answer} layout={layout} along={along} minutesNeeded={minutesNeeded} reader={reader} />
    </g>
  );
}
