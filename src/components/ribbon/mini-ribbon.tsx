import { skyColour } from '../../../shared/look/sky.ts';
import { stretchesOf, ribbonPath, threadPath } from './geometry.ts';

interface MiniRibbonProps {
  /** Least hard headroom per step; null where it cannot be told. */
  headroom: (number | null)[];
  sunAltitudeDeg: number[];
  className?: string;
}

const width = 160;
const height = 36;
const sky = 7;

/** A whole morning in one small ribbon: the tightest hard limit at each moment, under its sky. For lists; the words stand beside it. */
export function MiniRibbon({ headroom, sunAltitudeDeg, className = '' }: MiniRibbonProps) {
  if (headroom.length < 2) return null;
  const at = (index: number): number => ((index + 0.5) / headroom.length) * width;
  const lane = { limit: 'wind', kind: 'hard', headroom, stretches: stretchesOf(headroom), knots: [] } as const;
  const drawn = { ...lane, stretches: [...lane.stretches], knots: [], headroom: [...headroom] };
  const wideStep = width / sunAltitudeDeg.length;
  return (
    <svg viewBox={`0 0 ${width} ${height}`} preserveAspectRatio="none" className={`ribbon ${className}`} aria-hidden="true">
      {sunAltitudeDeg.map((altitude, index) => (
        <rect key={index} x={index * wideStep} width={wideStep + 0.5} height={sky} fill={skyColour(altitude)} />
      ))}
      {drawn.stretches
        .filter(({ kind }) => kind === 'open')
        .map(({ from, to }) => (
          <rect key={from} x={at(from - 0.5)} y={sky} width={at(to + 0.5) - at(from - 0.5)} height={height - sky} className="ribbon-light" opacity={0.6} />
        ))}
      <g transform={`translate(0 ${sky + (height - sky) / 2})`}>
        <path d={ribbonPath(drawn, at, (height - sky) / 2 - 3)} className="ribbon-hard" />
        <path d={threadPath(drawn, 'closed', at)} className="ribbon-closed" strokeWidth={1.5} />
        <path d={threadPath(drawn, 'untold', at)} className="ribbon-untold" strokeWidth={3} strokeDasharray="1 6" strokeLinecap="round" />
      </g>
    </svg>
  );
}
