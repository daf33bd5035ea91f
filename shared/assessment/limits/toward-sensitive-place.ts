import { angleBetweenDeg } from '../../atmosphere/wind-direction.ts';
import { driftReachPerWindS, usualReleaseHeightM } from '../../droplets/drift-reach.ts';
import type { DropletClass } from '../../droplets/classes.ts';
import { column } from '../columns.ts';
import { clampHeadroom, type LimitJudge, type PlanToJudge } from '../track.ts';

/** With the wind unknown a place is only out of reach beyond the reach of this wind. */
const strongestWindMs = 30;

const reaches = new Map<string, number>();

/** Drift reach per m/s of 10 m wind for the plan's sprayer; a mist blower's fine droplets when none is named. */
export function reachOf(plan: PlanToJudge): number {
  const dropletClass: DropletClass = plan.sprayer?.dropletClass ?? 'fine';
  const releaseHeightM = plan.sprayer?.releaseHeightM ?? usualReleaseHeightM;
  const key = `${dropletClass} ${releaseHeightM}`;
  let reach = reaches.get(key);
  if (reach === undefined) {
    if (reaches.size > 500) reaches.clear();
    reaches.set(key, (reach = driftReachPerWindS(dropletClass, releaseHeightM)));
  }
  return reach;
}

/**
 * Wind toward a sensitive place. A place closes a step (hard) when it lies BOTH within the drift reach of the finer droplets at that
 * wind AND downwind within the direction's half-angle; a place out of reach or aside leaves the step open. With an unknown direction
 * a place in reach cannot be told. A caution with assumptions (`drift-reach.ts`), never a safe distance.
 *
 * `value` is the angle between the place's bearing and straight downwind, `bound` the half-angle it must exceed (0 for a place out of
 * reach), both degrees, of the place with the least headroom.
 */
export const judgeTowardSensitivePlace: LimitJudge = ({ morning, windMs, direction }, plan) => {
  const places = plan.sensitivePlaces ?? [];
  if (places.length === 0) return null;
  const perWind = reachOf(plan);
  const value = column(morning.count);
  const bound = column(morning.count);
  const headroom = column(morning.count);
  for (let step = 0; step < morning.count; step += 1) {
    const wind = windMs[step]!;
    const reachM = perWind * wind;
    const halfAngle = direction.halfAngleDeg[step]!;
    const downwindDeg = direction.fromDeg[step]! + 180;
    let least = Infinity;
    for (const { bearingDeg, distanceM } of places) {
      const apart = distanceM === 0 || halfAngle === 180 ? 0 : angleBetweenDeg(bearingDeg, downwindDeg);
      const isOut = distanceM > perWind * strongestWindMs || distanceM > reachM;
      const at = placeHeadroom(distanceM, isOut, reachM, apart, halfAngle);
      // A place that cannot be told comes before any open one, and after any that surely closes the step.
      const rank = Number.isNaN(at) ? -1e-9 : at;
      if (rank >= least) continue;
      least = rank;
      headroom[step] = at;
      value[step] = Number.isNaN(at) ? NaN : apart;
      bound[step] = isOut ? 0 : halfAngle;
    }
  }
  return { limit: 'towardSensitivePlace', value, bound, headroom, isHard: true };
};

/** Headroom of one place: by distance when it is out of reach, else by the angle off straight downwind; NaN = cannot be told. */
function placeHeadroom(distanceM: number, isOut: boolean, reachM: number, apartDeg: number, halfAngleDeg: number): number {
  if (distanceM === 0) return -1;
  const byAngle = clampHeadroom((apartDeg - halfAngleDeg) / Math.max(1, apartDeg > halfAngleDeg ? 180 - halfAngleDeg : halfAngleDeg));
  const byDistance = clampHeadroom((distanceM - reachM) / Math.max(1, reachM));
  // Out of reach is open whatever the direction, and whatever the wind when it is beyond the strongest.
  if (isOut) return Number.isNaN(byDistance) ? 1 : byAngle > byDistance ? byAngle : byDistance;
  if (Number.isNaN(byAngle) || Number.isNaN(byDistance)) return NaN;
  return byAngle > 0 ? byAngle : Math.min(-0.01, Math.max(byAngle, byDistance));
}

/** The place of the plan that closes or most nearly closes a step: its name; null without places. */
export function nearestDownwindPlace(plan: PlanToJudge, windFromDeg: number): { name: string; distanceM: number } | null {
  let best: { name: string; distanceM: number } | null = null;
  let least = Infinity;
  for (const { name, bearingDeg, distanceM } of plan.sensitivePlaces ?? []) {
    const apart = Number.isNaN(windFromDeg) ? distanceM : angleBetweenDeg(bearingDeg, windFromDeg + 180);
    if (apart >= least) continue;
    least = apart;
    best = { name, distanceM };
  }
  return best;
}
