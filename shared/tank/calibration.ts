import { feetToM, gallonsPerAcreToLHa, millilitresPerFluidOunce, squareFeetPerAcre } from '../units/units.ts';

const squareMetresPerHa = 10_000;
/** The area on which fl oz caught equal gal/ac: there are 128 fl oz in a gallon [ncStateCalibration]. */
export const ounceCourseM2 = (squareFeetPerAcre / 128) * feetToM(1) ** 2;

function positive(values: Record<string, number>): void {
  for (const [name, value] of Object.entries(values)) if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`${name} must be more than 0, not ${value}.`);
}

/**
 * Length of the course of the 1/128-acre method: 340.3 ft² ÷ width of the sprayed strip [ncStateCalibration].
 * @returns metres @throws RangeError when the width is not above 0
 */
export function ounceCourseLengthM(swathM: number): number {
  positive({ swathM });
  return ounceCourseM2 / swathM;
}

/**
 * 1/128-acre method: fl oz caught in the time that the course took are gal/ac [ncStateCalibration].
 * @param caughtMl output caught over `courseSeconds`, or over any other time given as `caughtSeconds`
 * @returns L/ha @throws RangeError naming the value that is not above 0
 */
export function carrierByOunces({ caughtMl, courseSeconds, caughtSeconds = courseSeconds }: { caughtMl: number; courseSeconds: number; caughtSeconds?: number }): number {
  positive({ caughtMl, courseSeconds, caughtSeconds });
  return gallonsPerAcreToLHa(((caughtMl / millilitresPerFluidOunce) * courseSeconds) / caughtSeconds);
}

/**
 * Timed output of a mist blower or any sprayer walked at a steady pace: output ÷ (pace × width of the strip that one pass treats).
 * The output is what leaves the tank at full throttle over a timed run: fill to a mark, run, measure the refill.
 * The boom formula GPA = 5940·GPM/(mph·inches) is the same in other units [albanyCalibration].
 * @param swathM strip treated by one pass: the row spacing when each row is sprayed from both sides by half the passes
 * @returns L/ha @throws RangeError naming the value that is not above 0
 */
export function carrierByTimedOutput({ outputL, seconds, paceMs, swathM }: { outputL: number; seconds: number; paceMs: number; swathM: number }): number {
  positive({ outputL, seconds, paceMs, swathM });
  return (outputL / seconds / (paceMs * swathM)) * squareMetresPerHa;
}

/** Spray used on a measured area, as L/ha. @throws RangeError naming the value that is not above 0 */
export function carrierByArea({ usedL, areaM2 }: { usedL: number; areaM2: number }): number {
  positive({ usedL, areaM2 });
  return (usedL / areaM2) * squareMetresPerHa;
}

/** Trees of one spacing on a hectare. @returns trees/ha @throws RangeError naming the value that is not above 0 */
export function treesPerHa(inRowM: number, betweenRowsM: number): number {
  positive({ inRowM, betweenRowsM });
  return squareMetresPerHa / (inRowM * betweenRowsM);
}

/** Spray used on counted trees of one spacing, as L/ha [ncStateCalibration]. @throws RangeError naming the value that is not above 0 */
export function carrierByTrees({ usedL, trees, inRowM, betweenRowsM }: { usedL: number; trees: number; inRowM: number; betweenRowsM: number }): number {
  positive({ usedL, trees });
  return (usedL / trees) * treesPerHa(inRowM, betweenRowsM);
}

/** Output that a wanted carrier volume asks of both sides together. @returns L/min @throws RangeError naming the value that is not above 0 */
export function outputForCarrierLMin({ carrierLHa, paceMs, swathM }: { carrierLHa: number; paceMs: number; swathM: number }): number {
  positive({ carrierLHa, paceMs, swathM });
  return ((carrierLHa * paceMs * swathM) / squareMetresPerHa) * 60;
}

/** Pace over a measured course, the mean of the runs (spraying, full pack, on the same ground). @returns m/s @throws RangeError without a run */
export function walkingPaceMs(courseM: number, runsSeconds: readonly number[]): number {
  if (runsSeconds.length === 0) throw new RangeError('runsSeconds must hold at least one run.');
  positive({ courseM, ...Object.fromEntries(runsSeconds.map((seconds, index) => [`runsSeconds.${index}`, seconds])) });
  return (courseM * runsSeconds.length) / runsSeconds.reduce((sum, seconds) => sum + seconds, 0);
}

/** Area that one tank covers, ha. @throws RangeError naming the value that is not above 0 */
export function areaPerTankHa(tankL: number, carrierLHa: number): number {
  positive({ tankL, carrierLHa });
  return tankL / carrierLHa;
}

export const calibrationMethods = ['ounces', 'timedOutput', 'area', 'trees'] as const;
export type CalibrationMethod = (typeof calibrationMethods)[number];

/** One dated result. */
export interface Calibration {
  /** Local date, `YYYY-MM-DD`. */
  date: string;
  sprayerId: string;
  /** Nozzle or restrictor setting, as the farm names it. */
  nozzle: string;
  method: CalibrationMethod;
  carrierLHa: number;
  paceMs: number | null;
}

/** Beyond this the sprayer has changed: worn nozzle, another pace, a tired engine. Common practice, no source. */
export const driftWarningPct = 10;

export interface CalibrationState {
  latest: Calibration;
  previous: Calibration | null;
  /** Latest against the one before, %; null without one. */
  driftPct: number | null;
  warns: boolean;
}

/** The calibration that holds for a sprayer and nozzle, and how far it lies from the one before; null when there is none. Of one date the last in the list holds. */
export function calibrationState(results: readonly Calibration[], sprayerId: string, nozzle: string): CalibrationState | null {
  const own = results.filter((result) => result.sprayerId === sprayerId && result.nozzle === nozzle);
  const sorted = own.toSorted((a, b) => (a.date < b.date ? -1 : a.date > b.date ? 1 : 0));
  const latest = sorted.at(-1);
  if (!latest) return null;
  const previous = sorted.at(-2) ?? null;
  const driftPct = previous === null ? null : (latest.carrierLHa / previous.carrierLHa - 1) * 100;
  // A hair's breadth of slack, so that 110 against 100 is 10 % and not 10.000000000000009 %.
  return { latest, previous, driftPct, warns: driftPct !== null && Math.abs(driftPct) > driftWarningPct + 1e-9 };
}

