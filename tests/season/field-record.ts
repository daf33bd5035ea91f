import type { ForecastHour } from '../../shared/assessment/case.ts';
import { loadField, withSkyFromDaylight, fieldSite } from '../validation/field.ts';
import { datesOf, hourMs, seenRain, type HourlyRecord } from './record.ts';

const middle = (a: number | null | undefined, b: number | null | undefined): number | null => (a === null || a === undefined || b === null || b === undefined ? null : (a + b) / 2);

/**
 * The crop field, with the sky of its nights from the daylight around them. Its hours are means: the state at a full hour is the
 * mean of the two hours that meet there. No direction and no gusts; wind from May on.
 */
export function fieldHours(name: string): HourlyRecord {
  const means = withSkyFromDaylight(loadField());
  const hours = means.slice(0, -1).map(({ epochMs, hour: before }, index): ForecastHour => {
    const after = means[index + 1]!.hour;
    return {
      ...before,
      time: new Date(epochMs + hourMs / 2).toISOString(),
      temperature2mC: middle(before.temperature2mC, after.temperature2mC),
      dewPoint2mC: null,
      relativeHumidityPct: middle(before.relativeHumidityPct, after.relativeHumidityPct),
      windSpeed10mMs: middle(before.windSpeed10mMs, after.windSpeed10mMs),
      cloudCoverPct: middle(before.cloudCoverPct, after.cloudCoverPct),
      shortwaveWm2: middle(before.shortwaveWm2, after.shortwaveWm2),
      ...seenRain(middle(before.precipitationMm, after.precipitationMm)),
    };
  });
  return { name, site: { ...fieldSite, timeZone: 'Europe/Berlin' }, dates: datesOf(hours, hourMs), hours };
}
