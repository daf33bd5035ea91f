import type { ForecastHour } from '../../assessment/case.ts';
import { relativeHumidityPct } from '../humidity.ts';

const hourMs = 3_600_000;

/** A forecast as columns on an hourly grid; NaN where a value is not given. */
export interface Series {
  firstMs: number;
  count: number;
  temperatureC: Float64Array;
  humidityPct: Float64Array;
  windMs: Float64Array;
  cloudPct: Float64Array;
  /** Mean over the hour that begins here. */
  shortwaveWm2: Float64Array;
  aloftC: Float64Array;
  hasShortwave: boolean;
  /** Sum and number of the known winds. */
  windSumMs: number;
  windHours: number;
}

/** Lays hours out on a grid from the first to the last; hours left out stay unknown. */
export function seriesOf(hours: readonly ForecastHour[]): Series {
  const firstMs = hours[0] ? Date.parse(hours[0].time) : 0;
  const last = hours.at(-1);
  const count = last ? Math.round((Date.parse(last.time) - firstMs) / hourMs) + 1 : 0;
  const column = (): Float64Array => new Float64Array(count).fill(NaN);
  const series: Series = { firstMs, count, temperatureC: column(), humidityPct: column(), windMs: column(), cloudPct: column(), shortwaveWm2: column(), aloftC: column(), hasShortwave: false, windSumMs: 0, windHours: 0 };
  for (let index = 0; index < hours.length; index += 1) {
    const hour = hours[index]!;
    // Times are parsed only where hours are missing.
    const slot = hours.length === count ? index : Math.round((Date.parse(hour.time) - firstMs) / hourMs);
    const temperatureC = hour.temperature2mC ?? NaN;
    series.temperatureC[slot] = temperatureC;
    series.humidityPct[slot] = hour.relativeHumidityPct ?? (hour.dewPoint2mC === null ? NaN : relativeHumidityPct(temperatureC, hour.dewPoint2mC));
    if (hour.windSpeed10mMs !== null) {
      series.windMs[slot] = hour.windSpeed10mMs;
      series.windSumMs += hour.windSpeed10mMs;
      series.windHours += 1;
    }
    series.cloudPct[slot] = hour.cloudCoverPct ?? NaN;
    if (hour.shortwaveWm2 !== null) {
      series.shortwaveWm2[slot] = hour.shortwaveWm2;
      series.hasShortwave = true;
    }
    series.aloftC[slot] = (hour.temperature80mC ?? NaN) - temperatureC;
  }
  return series;
}
