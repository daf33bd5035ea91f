import { z } from 'zod';
import type { ForecastHour } from '../../../shared/assessment/case.ts';
import { hourFields, hourMs, HourTable, type HourField } from '../hours.ts';
import type { Place } from '../provider.ts';
import { conversionFrom } from '../units.ts';

/**
 * Hourly variables of Open-Meteo and the fields they fill. Its stamps run two ways: states hold AT the stamp, while
 * sums, maxima and means describe the hour that ENDS there, so these belong to the canonical hour one earlier.
 */
const variables: Record<string, { field: HourField; over: 'instant' | 'precedingHour' }> = {
  temperature_2m: { field: 'temperature2mC', over: 'instant' },
  dew_point_2m: { field: 'dewPoint2mC', over: 'instant' },
  relative_humidity_2m: { field: 'relativeHumidityPct', over: 'instant' },
  wind_speed_10m: { field: 'windSpeed10mMs', over: 'instant' },
  wind_direction_10m: { field: 'windFromDeg', over: 'instant' },
  wind_gusts_10m: { field: 'windGust10mMs', over: 'precedingHour' },
  cloud_cover: { field: 'cloudCoverPct', over: 'instant' },
  precipitation: { field: 'precipitationMm', over: 'precedingHour' },
  precipitation_probability: { field: 'precipitationProbabilityPct', over: 'precedingHour' },
  shortwave_radiation: { field: 'shortwaveWm2', over: 'precedingHour' },
  temperature_80m: { field: 'temperature80mC', over: 'instant' },
};
export const hourlyVariables = Object.keys(variables);

const numbersOrNull = z.array(z.number().nullable());
export const openMeteoSchema = z.object({
  latitude: z.number(),
  longitude: z.number(),
  elevation: z.number().optional(),
  utc_offset_seconds: z.number().default(0),
  hourly_units: z.record(z.string(), z.string()),
  hourly: z.object({ time: z.array(z.union([z.number(), z.string()])).min(1) }).catchall(numbersOrNull),
});
export type OpenMeteoAnswer = z.infer<typeof openMeteoSchema>;

/** The grid place that the answer is for. */
export const placeOf = (answer: OpenMeteoAnswer): Place => ({ latitude: answer.latitude, longitude: answer.longitude, elevationM: answer.elevation ?? null });

/** Stamps as epoch milliseconds: unix seconds are UTC; ISO text is naive local time, `utc_offset_seconds` ahead of UTC. */
function stampsMs(answer: OpenMeteoAnswer): number[] {
  return answer.hourly.time.map((stamp) => (typeof stamp === 'number' ? stamp * 1000 : Date.parse(`${stamp}Z`) - answer.utc_offset_seconds * 1000));
}

/**
 * One series in canonical hours. A variable that is absent, or whose unit is unknown, stays null.
 * @param suffix `''` for a forecast or the control run, `_member01` … for the members of an ensemble
 */
export function canonicalHours(answer: OpenMeteoAnswer, suffix = ''): ForecastHour[] {
  const table = new HourTable();
  const stamps = stampsMs(answer);
  const wanted = new Set(stamps);
  for (const [variable, { field, over }] of Object.entries(variables)) {
    const values = answer.hourly[`${variable}${suffix}`];
    const convert = conversionFrom(hourFields[field].quantity, answer.hourly_units[`${variable}${suffix}`]);
    stamps.forEach((stamp, index) => {
      const startMs = over === 'instant' ? stamp : stamp - hourMs;
      // The hour before the first stamp would hold sums and no states.
      if (!wanted.has(startMs)) return;
      const value = values?.[index];
      table.put(startMs, field, typeof value === 'number' && convert ? convert(value) : null);
    });
  }
  return table.toHours();
}

/** Suffixes of the members that an ensemble answer holds, the control run (no suffix) first. */
export function memberSuffixes(answer: OpenMeteoAnswer): string[] {
  const found = new Set<string>();
  for (const key of Object.keys(answer.hourly)) {
    const member = /_member\d+$/.exec(key)?.[0];
    if (member) found.add(member);
  }
  return ['', ...[...found].sort((a, b) => Number(a.slice(7)) - Number(b.slice(7)))];
}

/**
 * In one member rain falls or does not, so the probability is 0 or 100; the provider's own probability is the share of
 * runs above 0.1 mm, and the same bound is taken here. An unknown amount leaves the probability unknown.
 */
export const withCertainRain = (hours: readonly ForecastHour[]): ForecastHour[] =>
  hours.map((hour) => ({ ...hour, precipitationProbabilityPct: hour.precipitationMm === null ? null : hour.precipitationMm > 0.1 ? 100 : 0 }));

/** Error bodies read `{ error: true, reason }`; the limits are per minute, hour and day and come without `Retry-After`. */
export function explainRefusal(body: unknown): { reason: string | null; retryAfterMs: number | null } {
  const told = z.object({ reason: z.string() }).safeParse(body);
  if (!told.success) return { reason: null, retryAfterMs: null };
  const { reason } = told.data;
  const span = /^(minutely|hourly|daily)/i.exec(reason)?.[1]?.toLowerCase();
  return { reason, retryAfterMs: span === 'minutely' ? 60_000 : span === 'hourly' ? hourMs : span === 'daily' ? 6 * hourMs : null };
}
