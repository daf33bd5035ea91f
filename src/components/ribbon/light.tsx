import { useId } from 'react';
import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import { useT } from '../../lib/messages/use-t.ts';
import { clockTime, type Reader } from '../../lib/time.ts';
import { textRoom } from './geometry.ts';
import type { Layout } from './layout.ts';

interface LightProps {
  answer: AssessmentAnswer;
  layout: Layout;
  along: (instant: string) => number;
}

/** Rectangle along and across time, whichever way time runs. */
export const place = ({ upright }: Layout, from: number, to: number, acrossFrom: number, acrossTo: number) =>
  upright ? { x: acrossFrom, y: from, width: acrossTo - acrossFrom, height: Math.max(0, to - from) } : { x: from, y: acrossFrom, width: Math.max(0, to - from), height: acrossTo - acrossFrom };

/** Extents of the windows along time, in the order of the morning, and whether the job fits in. */
export const windowSpans = ({ answer, layout, along }: LightProps): { from: number; to: number; fits: boolean }[] =>
  answer.windows.map(({ start, end, bestStart }) => ({ from: Math.max(layout.timeFrom, along(start)), to: Math.min(layout.timeTo, along(end)), fits: bestStart !== null }));

/** A band of light falls from the sky through every place where all hard limits are open. */
export function Light(props: LightProps) {
  const id = useId();
  const { layout } = props;
  const { upright, skyFrom, skyThickness, lanesTo } = layout;
  return (
    <g>
      <linearGradient id={id} x1={0} y1={0} x2={upright ? 1 : 0} y2={upright ? 0 : 1}>
        <stop offset={0} className="ribbon-light" />
        <stop offset={1} className="ribbon-light-end" />
      </linearGradient>
      {windowSpans(props).map(({ from, to }) => (
        <rect key={from} {...place(layout, from, to, skyFrom + skyThickness, lanesTo + 4)} fill={`url(#${id})`} />
      ))}
    </g>
  );
}

const barThickness = 12;

/** The minutes needed, laid on the light at the best start, and when the window opens and shuts. */
export function Job({ answer, layout, along, minutesNeeded, reader }: LightProps & { minutesNeeded: number; reader: Reader }) {
  const t = useT();
  const window = answer.windows.find(({ bestStart }) => bestStart !== null);
  if (!window?.bestStart) return null;
  const from = along(window.bestStart);
  const end = new Date(Date.parse(window.bestStart) + minutesNeeded * 60_000).toISOString();
  const to = Math.min(layout.timeTo, along(end));
  const text = `${t('ribbon.job', { minutes: Math.round(minutesNeeded), time: clockTime(window.bestStart, reader) })}, ${t('ribbon.open', { from: clockTime(window.start, reader), to: clockTime(window.end, reader) })}`;
  const room = textRoom(text, 13);
  const x = Math.max(layout.timeFrom, Math.min(from, layout.timeTo - room));
  return (
    <g>
      <rect {...place(layout, from, to, layout.jobAt, layout.jobAt + barThickness)} rx={barThickness / 2} className="ribbon-job" />
      <text {...(layout.upright ? { x: layout.lanesTo, y: layout.height - 5, textAnchor: 'end' } : { x, y: layout.jobAt + barThickness + 18 })} className="ribbon-small">
        {text}
      </text>
    </g>
  );
}
