import type { ForecastHour } from '../../shared/assessment/case.ts';
import { unknownHour } from '../../shared/assessment/unknown-hour.ts';
import type { Quantity } from './units.ts';

export const hourMs = 3_600_000;
/** The longest series kept: 17 days, what one assessment takes. */
export const longestHours = 24 * 17;

export type HourField = Exclude<keyof ForecastHour, 'time'>;

/** Which quantity each field holds, and the range beyond which a value is a fault and no weather. */
export const hourFields: Record<HourField, { quantity: Quantity; min: number; max: number }> = {
  temperature2mC: { quantity: 'temperatureC', min: -60, max: 60 },
  dewPoint2mC: { quantity: 'temperatureC', min: -80, max: 50 },
  relativeHumidityPct: { quantity: 'percent', min: 0, max: 100 },
  windSpeed10mMs: { quantity: 'speedMs', min: 0, max: 100 },
  windGust10mMs: { quantity: 'speedMs', min: 0, max: 150 },
  windFromDeg: { quantity: 'bearingDeg', min: 0, max: 360 },
  cloudCoverPct: { quantity: 'percent', min: 0, max: 100 },
  precipitationMm: { quantity: 'depthMm', min: 0, max: 500 },
  precipitationProbabilityPct: { quantity: 'percent', min: 0, max: 100 },
  shortwaveWm2: { quantity: 'irradianceWm2', min: 0, max: 1500 },
  temperature80mC: { quantity: 'temperatureC', min: -60, max: 60 },
};

/** Overshoot that comes of a model's rounding and is drawn back to the range: 100.4 % humidity, −0.3 W/m² at night. */
const overshoot: Partial<Record<HourField, number>> = { relativeHumidityPct: 5, cloudCoverPct: 1, shortwaveWm2: 5 };

/** A value in canonical units, or null when it is none or impossible. */
export function possible(field: HourField, value: number | null | undefined): number | null {
  if (value === null || value === undefined || !Number.isFinite(value)) return null;
  // Bearings are told in the circle, 360 as well as 0 for north.
  if (field === 'windFromDeg') return Math.round((((value % 360) + 360) % 360) * 1000) / 1000;
  const { min, max } = hourFields[field];
  const slack = overshoot[field] ?? 0;
  if (value < min - slack || value > max + slack) return null;
  return Math.round(Math.min(max, Math.max(min, value)) * 1000) / 1000;
}

/** Canonical UTC text of an instant on the hour. */
export const hourText = (startMs: number): string => `${new Date(startMs).toISOString().slice(0, 19)}Z`;

/** Gathers values into canonical hours; what nobody puts stays null. */
export class HourTable {
  readonly #hours = new Map<number, ForecastHour>();

  /** Puts a value of canonical unit into the hour that starts at `startMs`; makes the hour when there is none. Times off the hour are no hour of ours. */
  put(startMs: number, field: HourField, value: number | null | undefined): void {
    if (startMs % hourMs !== 0) return;
    let hour = this.#hours.get(startMs);
    if (!hour) this.#hours.set(startMs, (hour = unknownHour(hourText(startMs))));
    hour[field] = possible(field, value);
  }

  has(startMs: number, field: HourField): boolean {
    return (this.#hours.get(startMs)?.[field] ?? null) !== null;
  }

  /** In order of time, at most `longestHours`. */
  toHours(): ForecastHour[] {
    return [...this.#hours].sort(([a], [b]) => a - b).slice(0, longestHours).map(([, hour]) => hour);
  }
}

/** Whether a series says anything at all about wind and temperature: without them there is no forecast, whatever the status said. */
export const saysSomething = (hours: readonly ForecastHour[]): boolean => hours.some((hour) => hour.windSpeed10mMs !== null) && hours.some((hour) => hour.temperature2mC !== null);
