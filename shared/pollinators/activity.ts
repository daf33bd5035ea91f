import type { BeeKind } from '../assessment/case.ts';
import { beeThresholds, likelyActivity, possibleActivity, type Ramp } from './thresholds.ts';

const rise = (value: number, [none, full]: Ramp): number => (value <= none ? 0 : value >= full ? 1 : (value - none) / (full - none));

/** Conditions at flower height; NaN = unknown. */
export interface BeeConditions {
  temperatureC: number;
  radiationWm2: number;
  /** Wind at about 2 m, m/s. */
  windMs: number;
  /** Rain of the hour, mm. */
  rainMm: number;
  sunAltitudeDeg: number;
}

/**
 * Activity of one kind of bee, 0 (not expected) to 1 (nothing in the weather holds them back): the scarcest condition rules.
 * Thresholds and sources: `thresholds.ts`. An unknown wind or rain is taken as no hindrance; an unknown temperature or light makes
 * the activity unknown (NaN), unless another condition rules flight out by itself.
 */
export function beeActivity(kind: BeeKind, at: BeeConditions): number {
  const { temperatureC, radiationWm2, sunAltitudeDeg, windMs, rainMm } = beeThresholds[kind];
  let least = 1;
  if (at.rainMm >= rainMm) return 0;
  if (windMs !== null && at.windMs > windMs[0]) least = 1 - rise(at.windMs, windMs);
  const warmth = rise(at.temperatureC, temperatureC);
  const light = radiationWm2 === null ? rise(at.sunAltitudeDeg, sunAltitudeDeg) : rise(at.radiationWm2, radiationWm2);
  if (least === 0 || warmth === 0 || light === 0) return 0;
  return Number.isNaN(warmth) || Number.isNaN(light) ? NaN : Math.min(least, warmth, light);
}

/** Start and end of flight with a band: cautious (`possible…`) and likely; null where it does not happen or cannot be told. */
export interface ActivityBand {
  possibleFromMs: number | null;
  likelyFromMs: number | null;
  likelyUntilMs: number | null;
  possibleUntilMs: number | null;
}

/**
 * Band of start and end of activity over a series of steps.
 * @param timeMs start of each step, epoch ms @param activity 0–1 per step, NaN = unknown @param stepMs length of a step
 */
export function activityBand(timeMs: ArrayLike<number>, activity: ArrayLike<number>, stepMs: number): ActivityBand {
  const edges = (least: number): [number | null, number | null] => {
    let from: number | null = null;
    let until: number | null = null;
    for (let index = 0; index < activity.length; index += 1) {
      if (!((activity[index] ?? NaN) >= least)) continue;
      from ??= timeMs[index] ?? null;
      until = (timeMs[index] ?? NaN) + stepMs;
    }
    return [from, until];
  };
  const [possibleFromMs, possibleUntilMs] = edges(possibleActivity);
  const [likelyFromMs, likelyUntilMs] = edges(likelyActivity);
  return { possibleFromMs, likelyFromMs, likelyUntilMs, possibleUntilMs };
}
