import type { ForecastHour } from './case.ts';

/** An hour of which nothing is known. @param time start of the hour, UTC ISO 8601 */
export const unknownHour = (time: string): ForecastHour => ({
  time,
  temperature2mC: null,
  dewPoint2mC: null,
  relativeHumidityPct: null,
  windSpeed10mMs: null,
  windGust10mMs: null,
  windFromDeg: null,
  cloudCoverPct: null,
  precipitationMm: null,
  precipitationProbabilityPct: null,
  shortwaveWm2: null,
  temperature80mC: null,
});
