import { useId } from 'react';
import { skyColour } from '../../../shared/look/sky.ts';
import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import { useT } from '../../lib/messages/use-t.ts';
import { clockTime, type Reader } from '../../lib/time.ts';
import { textRoom } from './geometry.ts';
import type { Layout } from './layout.ts';

interface SkyProps {
  answer: AssessmentAnswer;
  layout: Layout;
  /** Place along time of an instant. */
  along: (instant: string) => number;
  reader: Reader;
}

/** Every fourth step is enough for a smooth gradient. */
const stopEvery = 4;

/** The sky over the morning, coloured by the real height of the sun, with sunrise marked and the hours named. */
export function Sky({ answer: { steps, sun }, layout, along, reader }: SkyProps) {
  const id = useId();
  const { upright, timeFrom, timeTo, skyFrom, skyThickness } = layout;
  const length = timeTo - timeFrom;
  const stops = steps.filter((_, index) => index % stopEvery === 0 || index === steps.length - 1);
  const sunrise = sun.sunrise === null ? null : along(sun.sunrise);
  return (
    <g>
      <linearGradient id={id} x1={0} y1={0} x2={upright ? 0 : 1} y2={upright ? 1 : 0}>
        {stops.map((step) => (
          <stop key={step.time} offset={(along(step.time) - timeFrom) / length} stopColor={skyColour(step.sunAltitudeDeg)} />
        ))}
      </linearGradient>
      <Hours answer={{ steps }} layout={layout} along={along} reader={reader} />
      <rect {...(upright ? { x: skyFrom, y: timeFrom, width: skyThickness, height: length } : { x: timeFrom, y: skyFrom, width: length, height: skyThickness })} rx={4} fill={`url(#${id})`} className="ribbon-sky" />
      {sunrise !== null && sunrise >= timeFrom && sunrise <= timeTo && <Sunrise place={sunrise} layout={layout} time={clockTime(sun.sunrise!, reader)} />}
    </g>
  );
}

/** Whole local hours as fine lines, named at the edge. */
function Hours({ answer, layout, along, reader }: Omit<SkyProps, 'answer'> & { answer: Pick<AssessmentAnswer, 'steps'> }) {
  const { upright, skyFrom, skyThickness, lanesTo } = layout;
  return answer.steps
    .filter(({ time }) => clockTime(time, reader).includes(':00'))
    .map(({ time }) => {
      const place = along(time);
      return (
        <g key={time}>
          <path d={upright ? `M${skyFrom + skyThickness} ${place}H${lanesTo}` : `M${place} ${skyFrom + skyThickness}V${lanesTo}`} className="ribbon-hour" />
          <text {...(upright ? { x: skyFrom - 7, y: place + 4, textAnchor: 'end' } : { x: place, y: skyFrom - 7, textAnchor: 'middle' })} className="ribbon-small">
            {clockTime(time, reader)}
          </text>
        </g>
      );
    });
}

const sunRadius = 7;

/** A half disc on the edge of the sky, with its time where there is room. */
function Sunrise({ place, layout, time }: { place: number; layout: Layout; time: string }) {
  const t = useT();
  const { upright, skyFrom, skyThickness, timeTo } = layout;
  const edge = skyFrom + skyThickness;
  const text = t('ribbon.sunrise', { time });
  const middle = skyFrom + skyThickness / 2 + 4;
  const fits = !upright && place + 20 + textRoom(text, 13) < timeTo;
  return (
    <g>
      <path d={upright ? `M${edge} ${place - sunRadius}a${sunRadius} ${sunRadius} 0 0 0 0 ${2 * sunRadius}` : `M${place - sunRadius} ${edge}a${sunRadius} ${sunRadius} 0 0 1 ${2 * sunRadius} 0`} className="ribbon-sunrise" />
      {fits ? (
        <text x={place + 18} y={middle} className="ribbon-small ribbon-on-sky">
          {text}
        </text>
      ) : (
        <title>{text}</title>
      )}
    </g>
  );
}
