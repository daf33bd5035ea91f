import { useId } from 'react';
import { skyColour } from '../../../shared/look/sky.ts';
import type { AssessmentAnswer, LimitName } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import { clockTime, type Reader } from '../../lib/time.ts';
import { ribbonPath, spaced, threadPath, type Lane } from './geometry.ts';
import type { Layout } from './layout.ts';
import { limitWord, valueText } from './words.ts';

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
  const { steps } = answer;
  const sky = useId();
  const light = useId();
  const begin = Date.parse(steps[0]!.time);
  const along = (instant: string): number => layout.at((Date.parse(instant) - begin) / stepMs);
  const skyStops = steps.filter((_, index) => index % 4 === 0 || index === steps.length - 1);
  const { upright } = layout;
  const rect = (from: number, to: number, acrossFrom: number, acrossTo: number) =>
    upright ? { x: acrossFrom, y: from, width: acrossTo - acrossFrom, height: Math.max(0, to - from) } : { x: from, y: acrossFrom, width: Math.max(0, to - from), height: acrossTo - acrossFrom };
  const clampTime = (place: number): number => Math.max(layout.timeFrom, Math.min(layout.timeTo, place));
  const job = answer.windows.find((window) => window.bestStart !== null)?.bestStart ?? null;

  return (
    <g className="ribbon">
      <defs>
        <linearGradient id={sky} x1={0} y1={0} x2={upright ? 0 : 1} y2={upright ? 1 : 0}>
          {skyStops.map((step) => (
            <stop key={step.time} offset={(Date.parse(step.time) - begin) / Math.max(1, (steps.length - 1) * stepMs)} stopColor={skyColour(step.sunAltitudeDeg)} />
          ))}
        </linearGradient>
        <linearGradient id={light} x1={0} y1={0} x2={upright ? 1 : 0} y2={upright ? 0 : 1}>
          <stop offset={0} className="ribbon-light" stopOpacity={0.95} />
          <stop offset={1} className="ribbon-light" stopOpacity={0.4} />
        </linearGradient>
      </defs>

      {answer.windows.map((window) => (
        <rect key={window.start} {...rect(clampTime(along(window.start)), clampTime(along(window.end)), layout.skyFrom + layout.skyThickness - 1, layout.lanesTo)} fill={`url(#${light})`} />
      ))}
      <Hours answer={answer} layout={layout} along={along} reader={{ units, timeZone }} />
      <rect {...rect(layout.timeFrom, layout.timeTo, layout.skyFrom, layout.skyFrom + layout.skyThickness)} rx={3} fill={`url(#${sky})`} />
      {answer.sun.sunrise && <Sunrise place={along(answer.sun.sunrise)} layout={layout} time={clockTime(answer.sun.sunrise, { units, timeZone })} />}

      {lanes.map((lane, index) => (
        <g key={lane.limit}>
          <LaneName name={limitWord[lane.limit]} index={index} layout={layout} strong={lane.limit === binding} advice={lane.kind === 'advice'} />
          <g transform={layout.lane(index)}>
            <path d={ribbonPath(lane, layout.at, layout.halfMost)} className={lane.limit === binding ? 'ribbon-binding' : lane.kind === 'advice' ? 'ribbon-advice' : 'ribbon-hard'} />
            <path d={threadPath(lane, 'closed', layout.at)} className="ribbon-closed" strokeWidth={1.5} />
            <path d={threadPath(lane, 'untold', layout.at)} className="ribbon-untold" strokeWidth={3} strokeDasharray="1 6" strokeLinecap="round" />
            {lane.knots.map((knot) => (
              <Knot key={knot} place={layout.at(knot === 0 ? 0 : knot - 0.5)} />
            ))}
          </g>
          {!upright && <KnotNames lane={lane} index={index} layout={layout} answer={answer} units={units} />}
        </g>
      ))}

      {job && (
        <g>
          <rect
            {...rect(clampTime(along(job)), clampTime(layout.at((Date.parse(job) + minutesNeeded * 60_000 - begin) / stepMs)), upright ? layout.lanesTo + 1 : layout.lanesTo + 3, upright ? layout.lanesTo + 13 : layout.lanesTo + 17)}
            rx={4}
            className="fill-needle"
          />
          {!upright && (
            <text x={clampTime(along(job))} y={layout.lanesTo + 32} className="ribbon-small" dy={0} textAnchor="start">
              {`${minutesNeeded} min from ${clockTime(job, { units, timeZone })}`}
            </text>
          )}
        </g>
      )}
    </g>
  );
}

/** Whole local hours as fine lines, named at the edge. */
function Hours({ answer, layout, along, reader }: { answer: AssessmentAnswer; layout: Layout; along: (instant: string) => number; reader: Reader }) {
  const hours = answer.steps.filter((step) => step.time.slice(14, 16) === '00');
  return hours.map((step) => {
    const place = along(step.time);
    const name = clockTime(step.time, reader);
    return layout.upright ? (
      <g key={step.time}>
        <path d={`M${layout.skyFrom} ${place}H${layout.lanesTo}`} className="ribbon-hour" />
        <text x={layout.skyFrom - 6} y={place + 4} textAnchor="end" className="ribbon-small">
          {name}
        </text>
      </g>
    ) : (
      <g key={step.time}>
        <path d={`M${place} ${layout.skyFrom}V${layout.lanesTo}`} className="ribbon-hour" />
        <text x={place} y={layout.skyFrom - 8} textAnchor="middle" className="ribbon-small">
          {name}
        </text>
      </g>
    );
  });
}

/** A half disc on the sky's edge, with its time. */
function Sunrise({ place, layout, time }: { place: number; layout: Layout; time: string }) {
  const edge = layout.skyFrom + layout.skyThickness;
  return layout.upright ? (
    <g>
      <path d={`M${edge} ${place - 7}a7 7 0 0 0 0 14`} className="ribbon-sun" />
      <title>{`Sunrise ${time}`}</title>
    </g>
  ) : (
    <g>
      <path d={`M${place - 8} ${edge}a8 8 0 0 1 16 0`} className="ribbon-sun" />
      <title>{`Sunrise ${time}`}</title>
    </g>
  );
}

function LaneName({ name, index, layout, strong, advice }: { name: string; index: number; layout: Layout; strong: boolean; advice: boolean }) {
  const className = `ribbon-name ${strong ? 'ribbon-name-strong' : ''} ${advice ? 'ribbon-name-advice' : ''}`;
  const place = layout.across(index);
  return layout.upright ? (
    <text transform={`translate(${place + 4} ${layout.timeFrom - 8}) rotate(-90)`} className={className}>
      {name}
    </text>
  ) : (
    <text x={layout.timeFrom - 10} y={place + 5} textAnchor="end" className={className}>
      {name}
    </text>
  );
}

const Knot = ({ place }: { place: number }) => (
  <g transform={`translate(${place.toFixed(1)} 0)`} className="ribbon-knot">
    <circle r={4.5} />
    <path d="M-3 -3L3 3M-3 3L3 -3" />
  </g>
);

const knotNameRoom = 96;

/** What runs out at a knot, beside it, as far as names do not collide. */
function KnotNames({ lane, index, layout, answer, units }: { lane: Lane; index: number; layout: Layout; answer: AssessmentAnswer; units: UnitSystem }) {
  const named = new Set(spaced(lane.knots.map((knot) => layout.at(knot)), knotNameRoom));
  return lane.knots
    .filter((knot) => named.has(layout.at(knot)))
    .map((knot) => {
      const place = layout.at(knot);
      const text = knotText(lane.limit, answer, knot, units);
      const left = place + knotNameRoom > layout.timeTo;
      return (
        <text key={knot} x={place + (left ? -9 : 9)} y={layout.across(index) - 7} textAnchor={left ? 'end' : 'start'} className="ribbon-small ribbon-knot-name">
          {text}
        </text>
      );
    });
}

function knotText(limit: LimitName, answer: AssessmentAnswer, knot: number, units: UnitSystem): string {
  const at = answer.steps[knot]!.limits[limit]!;
  if (at.limit === null || at.value === null) return limitWord[limit].toLowerCase();
  return `${at.value > at.limit ? 'over' : 'under'} ${valueText(limit, at.limit, units)}`;
}
