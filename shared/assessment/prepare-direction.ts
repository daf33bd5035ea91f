import { directionMean } from '../atmosphere/wind-direction.ts';
import { column } from './columns.ts';
import type { HourTable } from './hours.ts';
import type { Morning } from './morning.ts';

const radPerDeg = Math.PI / 180;
const stepsPerHour = 12;

/** Below this wind the direction means nothing: every side counts as downwind. */
const idleMs = 1;
/** From this wind on the direction is as good as forecasts get. */
const steadyMs = 3;
/** Half-angle around the forecast direction in steady wind: the far end of the published mean error of 22–50° [windError], rounded. */
const steadyHalfAngleDeg = 45;
const lightHalfAngleDeg = 90;

export interface DirectionSteps {
  /** Direction the wind comes from, degrees; NaN = unknown. */
  fromDeg: Float64Array;
  /** Half-angle within which the wind may come, degrees; 180 = from anywhere. */
  halfAngleDeg: Float64Array;
}

/** The lighter the wind, the less its direction is known: 180° when idle, 90° falling to 45° between 1 and 3 m/s (our margin around [windError]). */
export function halfAngleOf(windMs: number): number {
  if (windMs < idleMs) return 180;
  if (windMs >= steadyMs) return steadyHalfAngleDeg;
  return lightHalfAngleDeg + ((steadyHalfAngleDeg - lightHalfAngleDeg) * (windMs - idleMs)) / (steadyMs - idleMs);
}

/** Wind direction on the steps as a unit vector between the hours, with a half-angle that covers the turn from hour to hour. */
export function prepareDirection(morning: Morning, table: HourTable, windMs: Float64Array): DirectionSteps {
  const fromDeg = column(morning.count).fill(NaN);
  const halfAngleDeg = column(morning.count);
  let hourOfTurn = -1;
  let turnDeg = 0;
  for (let step = 0; step < morning.count; step += 1) {
    const grid = step + morning.offsetSteps;
    const hour = Math.floor(grid / stepsPerHour);
    const share = (grid % stepsPerHour) / stepsPerHour;
    const a = table.windFromDeg[hour]!;
    const b = share === 0 ? a : table.windFromDeg[hour + 1]!;
    if (hour !== hourOfTurn) {
      hourOfTurn = hour;
      turnDeg = 2 * directionMean([a, table.windFromDeg[hour + 1]!]).spreadDeg;
    }
    const east = (1 - share) * Math.sin(a * radPerDeg) + share * Math.sin(b * radPerDeg);
    const north = (1 - share) * Math.cos(a * radPerDeg) + share * Math.cos(b * radPerDeg);
    if (Math.hypot(east, north) > 1e-6) fromDeg[step] = (Math.atan2(east, north) / radPerDeg + 360) % 360;
    halfAngleDeg[step] = Math.min(180, Math.max(halfAngleOf(windMs[step]!), Number.isNaN(turnDeg) ? 180 : turnDeg));
  }
  return { fromDeg, halfAngleDeg };
}
