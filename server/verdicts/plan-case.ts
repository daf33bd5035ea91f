import type { AssessmentCase, ForecastHour, Reading, Site } from '../../shared/assessment/case.ts';
import { limitsOfPlan, usualLimits, usualMinutesNeeded } from '../../shared/rules/plan-limits.ts';
import { jobOfPlan } from '../../shared/tank/minutes.ts';
import type { FarmRow, SensitivePlaceRow } from '../models/farms.ts';
import type { ReadingRow } from '../models/weather.ts';
import type { WholePlan } from './farm-state.ts';

/** What is judged on a prepared morning: everything of a case but the weather. */
export type JudgedPlan = Pick<AssessmentCase, 'minutesNeeded' | 'reserveMinutes' | 'limits' | 'sensitivePlaces'>;

export const siteOf = (farm: FarmRow): Site => ({ latitude: farm.latitude, longitude: farm.longitude, elevationM: farm.elevationM, timeZone: farm.timeZone, exposure: farm.exposure });

export const placesOf = (places: SensitivePlaceRow[]): AssessmentCase['sensitivePlaces'] => places.map(({ name, bearingDeg, distanceM }) => ({ name, bearingDeg, distanceM }));

/** Farm readings as the assessment takes them, oldest first. */
export const readingsOf = (readings: ReadingRow[]): Reading[] =>
  [...readings]
    .sort((a, b) => a.takenAt.getTime() - b.takenAt.getTime())
    .map((reading) => ({
      time: reading.takenAt.toISOString(),
      windSpeedMs: reading.windMs,
      windHeightM: reading.windHeightM,
      windFromDeg: reading.windFromDeg,
      temperatureC: reading.temperatureC,
      relativeHumidityPct: reading.relativeHumidityPct,
    }));

/** A plan's limits, the strictest of label and grower, and the minutes its job takes. */
export function judgedPlan(whole: WholePlan, places: SensitivePlaceRow[]): JudgedPlan {
  const areaHa = whole.blocks.reduce((sum, block) => sum + block.areaHa, 0);
  const { minutesNeeded } = jobOfPlan({ areaHa, carrierLHa: whole.plan.carrierLHa, sprayer: whole.sprayer });
  return { minutesNeeded, reserveMinutes: whole.plan.reserveMinutes, limits: limitsOfPlan(whole.plan, whole.products), sensitivePlaces: placesOf(places) };
}

/** A morning without a plan is judged on the usual limits of the trade, for a job of the usual length. */
export const usualPlan = (places: SensitivePlaceRow[]): JudgedPlan => ({ minutesNeeded: usualMinutesNeeded, reserveMinutes: 0, limits: usualLimits, sensitivePlaces: placesOf(places) });

/**
 * The plan as this forecast can judge it: where a provider tells no chance of rain at all, dry hours are judged by the amount
 * alone, and the assessment says so. A single missing hour stays what it is: unknown.
 */
export function asForecastTells(plan: JudgedPlan, hours: readonly ForecastHour[]): JudgedPlan {
  const silent = hours.length > 0 && hours.every((hour) => hour.precipitationProbabilityPct === null) && hours.some((hour) => hour.precipitationMm !== null);
  return silent ? { ...plan, limits: { ...plan.limits, rainProbabilityPct: null } } : plan;
}
