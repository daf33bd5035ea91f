import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import { useT } from '../../lib/messages/use-t.ts';
import { knotPlace, placeLabels, ribbonPath, ringPlaces, textRoom, threadPath, type Lane } from './geometry.ts';
import type { Layout } from './layout.ts';
import { knotText } from './words.ts';

interface LaneProps {
  lane: Lane;
  index: number;
  layout: Layout;
  answer: AssessmentAnswer;
  units: UnitSystem;
  binding: boolean;
  /** Id of the clip that lets the light through. */
  litBy: string;
}

const ringGap = 15;
const ringRadius = 3;

/** One limit: its name, its ribbon, the thread where it is shut, open rings where it cannot be told, and its knots. */
export function LaneDrawing({ lane, index, layout, answer, units, binding, litBy }: LaneProps) {
  const t = useT();
  const ribbon = ribbonPath(lane, layout.at, layout.halfMost);
  const look = binding ? 'ribbon-binding' : lane.kind === 'advice' ? 'ribbon-advice' : 'ribbon-hard';
  return (
    <g>
      <LaneName name={t(`limit.${lane.limit}`)} index={index} layout={layout} look={`${binding ? 'ribbon-name-strong' : ''} ${lane.kind === 'advice' ? 'ribbon-name-advice' : ''}`} />
      <g transform={layout.lane(index)}>
        <path d={ribbon} className={look} />
      </g>
      {/* The clip stands in the drawing's own axes, so it goes around the lane's turn. */}
      <g clipPath={`url(#${litBy})`}>
        <path d={ribbon} transform={layout.lane(index)} className={`${look} ribbon-lit`} />
      </g>
      <g transform={layout.lane(index)}>
        <path d={threadPath(lane, layout.at)} className="ribbon-thread" />
        {ringPlaces(lane, layout.at, ringGap).map((place) => (
          <circle key={place} cx={place.toFixed(1)} r={ringRadius} className="ribbon-ring" />
        ))}
        {lane.knots.map((knot) => (
          <Knot key={knot} place={knotPlace(knot, layout.at)} />
        ))}
      </g>
      <KnotNames lane={lane} index={index} layout={layout} answer={answer} units={units} />
    </g>
  );
}

function LaneName({ name, index, layout, look }: { name: string; index: number; layout: Layout; look: string }) {
  const middle = layout.across(index);
  return (
    <text {...(layout.upright ? { transform: `translate(${middle + 4.5} ${layout.timeFrom - 9}) rotate(-90)` } : { x: layout.timeFrom - 12, y: middle + 5, textAnchor: 'end' })} className={`ribbon-name ${look}`}>
      {name}
    </text>
  );
}

/** A cord around the pinch, its two ends lying on the thread behind. */
const Knot = ({ place }: { place: number }) => (
  <g transform={`translate(${place.toFixed(1)} 0)`} className="ribbon-knot">
    <path d="M2 -1.5C5 -2 6 -5 9.5 -5.5M2 1.5C5 2 6 5 9.5 5.5" className="ribbon-cord" />
    <rect x={-3} y={-7} width={6} height={14} rx={3} />
  </g>
);

const letterPx = 13;
/** A label over a ribbon thinner than this can be read. */
const thin = 0.5;

/** What runs out at a knot, beside it, as far as names do not collide. */
function KnotNames({ lane, index, layout, answer, units }: Pick<LaneProps, 'lane' | 'index' | 'layout' | 'answer' | 'units'>) {
  const t = useT();
  const shut = lane.stretches.filter(({ kind }) => kind === 'closed');
  const texts = lane.knots.map((knot) => knotText(lane.limit, answer, knot, units, t));
  const wishes = lane.knots.map((knot, which) => {
    const end = shut[which]?.to ?? knot;
    const width = textRoom(texts[which]!, letterPx);
    const at = knotPlace(knot, layout.at);
    const under = layout.indexAt(at - width, at - width);
    // In the narrow lanes of a phone a name may only lie along a thread, never across a ribbon.
    const before = !layout.upright && lane.headroom.slice(under, knot).every((headroom) => (headroom ?? 0) < thin);
    return { at, until: end === lane.headroom.length - 1 ? layout.timeTo : layout.at(end + 0.5), width, before };
  });
  const placed = placeLabels(wishes, { from: layout.timeFrom, to: layout.timeTo });
  return placed.map(({ index: which, at, anchor }) => (
    <text
      key={which}
      {...(layout.upright ? { transform: `translate(${layout.across(index) + 5} ${at + 4}) rotate(90)` } : { x: at + (anchor === 'start' ? 4 : 0), y: layout.across(index) - 6 })}
      textAnchor={anchor}
      className="ribbon-small ribbon-knot-name"
    >
      {texts[which]}
    </text>
  ));
}
