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
  /** Half-angle within which the wind may come, degrees; 180 = from anywhere, NaN = unknown. */
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
  const hourly = directionsByHour(morning, table);
  for (let step = 0; step < morning.count; step += 1) {
    const grid = step + morning.offsetSteps;
    const hour = Math.floor(grid / stepsPerHour);
    const share = (grid % stepsPerHour) / stepsPerHour;
    const next = share === 0 ? hour : hour + 1;
    const east = (1 - share) * hourly.east[hour]! + share * hourly.east[next]!;
    const north = (1 - share) * hourly.north[hour]! + share * hourly.north[next]!;
    if (east * east + north * north > 1e-12) fromDeg[step] = (Math.atan2(east, north) / radPerDeg + 360) % 360;
    const turnDeg = hourly.turnDeg[hour]!;
    const halfAngle = halfAngleOf(windMs[step]!);
    // Math.max passes an unknown turn on: what direction a wind that blows will have cannot be told.
    halfAngleDeg[step] = halfAngle === 180 ? 180 : Math.min(180, Math.max(halfAngle, turnDeg));
  }
  return { fromDeg, halfAngleDeg };
}

/** Unit vector of each hour's direction, and twice the spread of the turn to the next hour, degrees. */
function directionsByHour(morning: Morning, table: HourTable): { east: Float64Array; north: Float64Array; turnDeg: Float64Array } {
  const hourly = { east: column(morning.hourCount + 1), north: column(morning.hourCount + 1), turnDeg: column(morning.hourCount + 1) };
  for (let hour = 0; hour <= morning.hourCount; hour += 1) {
    const from = table.windFromDeg[hour]!;
    hourly.east[hour] = Math.sin(from * radPerDeg);
    hourly.north[hour] = Math.cos(from * radPerDeg);
    hourly.turnDeg[hour] = 2 * directionMean([from, table.windFromDeg[hour + 1]!]).spreadDeg;
  }
  return hourly;
}
