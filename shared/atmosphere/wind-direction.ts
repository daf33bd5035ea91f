const degPerRad = 180 / Math.PI;

/** Smallest angle between two bearings, 0–180°. */
export function angleBetweenDeg(aDeg: number, bDeg: number): number {
  const turn = Math.abs(aDeg - bDeg) % 360;
  return turn > 180 ? 360 - turn : turn;
}

export interface DirectionMean {
  /** Mean direction the wind comes FROM, 0–360° clockwise from north; NaN when the directions cancel. */
  meanFromDeg: number;
  /** Length of the mean unit vector, 0–1: 1 = all from one side. */
  resultant: number;
  /** Spread (standard deviation) of direction by Yamartino's estimator, degrees. */
  spreadDeg: number;
}

/**
 * Unit-vector mean of wind directions and Yamartino's spread [epa454, §6.2.2; yamartino1984].
 * @param fromDeg directions the wind comes from, degrees; unknown ones left out by the caller
 */
export function directionMean(fromDeg: readonly number[]): DirectionMean {
  if (fromDeg.length === 0) return { meanFromDeg: NaN, resultant: NaN, spreadDeg: NaN };
  let east = 0;
  let north = 0;
  for (const deg of fromDeg) {
    east += Math.sin(deg / degPerRad);
    north += Math.cos(deg / degPerRad);
  }
  east /= fromDeg.length;
  north /= fromDeg.length;
  const resultant = Math.hypot(east, north);
  const meanFromDeg = resultant < 1e-9 ? NaN : (Math.atan2(east, north) * degPerRad + 360) % 360;
  const epsilon = Math.sqrt(Math.max(0, 1 - resultant * resultant));
  const spreadDeg = Math.asin(Math.min(1, epsilon)) * (1 + (2 / Math.sqrt(3) - 1) * epsilon ** 3) * degPerRad;
  return { meanFromDeg, resultant, spreadDeg };
}
