import { skyColour } from '../../../shared/look/sky.ts';
import { stretchesOf, ribbonPath, ringPlaces, threadPath, type Lane } from './geometry.ts';

interface MiniRibbonProps {
  /** Least hard headroom per step; null where it cannot be told. */
  headroom: (number | null)[];
  sunAltitudeDeg: number[];
  /** Gives its height and width; it fills both. */
  className?: string;
}

const width = 160;
const height = 36;
const sky = 8;
const rings = 20;

/** A whole morning in one small ribbon: the tightest hard limit at each moment, under its sky. For lists; the words stand beside it. */
export function MiniRibbon({ headroom, sunAltitudeDeg, className = '' }: MiniRibbonProps) {
  if (headroom.length < 2) return null;
  const at = (index: number): number => (index / (headroom.length - 1)) * width;
  const stretches = stretchesOf(headroom);
  const lane: Lane = { limit: 'wind', kind: 'hard', headroom, stretches, knots: [] };
  const wideStep = width / sunAltitudeDeg.length;
  return (
    <svg viewBox={`0 0 ${width} ${height}`} preserveAspectRatio="none" className={`ribbon ribbon-mini ${className}`} aria-hidden="true">
      {sunAltitudeDeg.map((altitude, index) => (
        <rect key={index} x={index * wideStep} width={wideStep + 0.5} height={sky} fill={skyColour(altitude)} />
      ))}
      {stretches
        .filter(({ kind }) => kind === 'open')
        .map(({ from, to }) => {
          const [begin, end] = [Math.max(0, at(from - 0.5)), Math.min(width, at(to + 0.5))];
          return <rect key={from} x={begin} y={sky} width={end - begin} height={height - sky} className="ribbon-light" />;
        })}
      <g transform={`translate(0 ${sky + (height - sky) / 2})`}>
        <path d={ribbonPath(lane, at, (height - sky) / 2 - 2)} className="ribbon-hard ribbon-lit" />
        <path d={threadPath(lane, at)} className="ribbon-thread" />
        {/* A line of no length with round ends is a dot, however the drawing is stretched. */}
        {ringPlaces(lane, at, rings).map((place) => (
          <path key={place} d={`M${place.toFixed(1)} 0h0.01`} className="ribbon-dot" />
        ))}
      </g>
    </svg>
  );
}
