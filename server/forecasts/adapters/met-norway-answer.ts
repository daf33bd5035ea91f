import { z } from 'zod';
import type { ForecastHour } from '../../../shared/assessment/case.ts';
import { hourFields, hourMs, HourTable, type HourField } from '../hours.ts';
import type { Place } from '../provider.ts';
import { conversionFrom } from '../units.ts';

const details = z.record(z.string(), z.number());
const period = z.object({ details: details.optional() }).optional();
export const metSchema = z.object({
  geometry: z.object({ coordinates: z.array(z.number()).min(2) }),
  properties: z.object({
    meta: z.object({ updated_at: z.iso.datetime({ offset: true }), units: z.record(z.string(), z.string()) }),
    timeseries: z
      .array(z.object({ time: z.iso.datetime({ offset: true }), data: z.object({ instant: z.object({ details: details.optional() }), next_1_hours: period, next_6_hours: period }) }))
      .min(1),
  }),
});
export type MetAnswer = z.infer<typeof metSchema>;

/** States that hold at the entry's time. */
const instants: Record<string, HourField> = {
  air_temperature: 'temperature2mC',
  dew_point_temperature: 'dewPoint2mC',
  relative_humidity: 'relativeHumidityPct',
  wind_speed: 'windSpeed10mMs',
  wind_from_direction: 'windFromDeg',
  cloud_area_fraction: 'cloudCoverPct',
};
const gust = 'wind_speed_of_gust';
const amount = 'precipitation_amount';
const probability = 'probability_of_precipitation';

/** The grid place that the answer is for: longitude comes first, as in all GeoJSON. */
export function metPlace(answer: MetAnswer): Place {
  const [longitude = 0, latitude = 0, elevationM = null] = answer.geometry.coordinates;
  return { latitude, longitude, elevationM };
}

/**
 * Brings the series to canonical hours. `next_1_hours` and `next_6_hours` look FORWARD from the entry's time, so an
 * hourly amount is the canonical hour as it is. A six-hour amount is spread evenly, a six-hour probability (the chance
 * anywhere in the block) repeated, and both only where no hourly value stands; the states between six-hourly entries
 * stay unknown. Gusts and probabilities are told in the Nordic area only.
 */
export function metHours(answer: MetAnswer): ForecastHour[] {
  const { meta, timeseries } = answer.properties;
  const table = new HourTable();
  const convert = (key: string, field: HourField, value: number | undefined): number | null => {
    const conversion = conversionFrom(hourFields[field].quantity, meta.units[key]);
    return value === undefined || !conversion ? null : conversion(value);
  };
  const entries = timeseries.map(({ time, data }) => ({ startMs: Date.parse(time), data }));
  const gusts = new Map(entries.map(({ startMs, data }) => [startMs, convert(gust, 'windGust10mMs', data.instant.details?.[gust])]));
  for (const { startMs, data } of entries) {
    for (const [key, field] of Object.entries(instants)) table.put(startMs, field, convert(key, field, data.instant.details?.[key]));
    // Which way a gust's hour runs is not told: the greater of both ends is taken, and neither alone.
    const [here, next] = [gusts.get(startMs) ?? null, gusts.get(startMs + hourMs) ?? null];
    table.put(startMs, 'windGust10mMs', here === null || next === null ? null : Math.max(here, next));
    const hourly = data.next_1_hours?.details;
    if (hourly?.[amount] !== undefined) table.put(startMs, 'precipitationMm', convert(amount, 'precipitationMm', hourly[amount]));
    if (hourly?.[probability] !== undefined) table.put(startMs, 'precipitationProbabilityPct', convert(probability, 'precipitationProbabilityPct', hourly[probability]));
  }
  for (const { startMs, data } of entries) {
    if (data.next_1_hours || !data.next_6_hours) continue;
    const total = convert(amount, 'precipitationMm', data.next_6_hours.details?.[amount]);
    const chance = convert(probability, 'precipitationProbabilityPct', data.next_6_hours.details?.[probability]);
    for (let hour = startMs; hour < startMs + 6 * hourMs; hour += hourMs) {
      if (total !== null && !table.has(hour, 'precipitationMm')) table.put(hour, 'precipitationMm', total / 6);
      if (chance !== null && !table.has(hour, 'precipitationProbabilityPct')) table.put(hour, 'precipitationProbabilityPct', chance);
    }
  }
  return table.toHours();
}
