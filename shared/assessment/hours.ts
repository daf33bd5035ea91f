import { dewPointFromHumidityC, relativeHumidityPct } from '../atmosphere/humidity.ts';
import type { ForecastHour } from './case.ts';
import { column } from './columns.ts';

export const hourMs = 3_600_000;

/** Values that contradict each other are set aside as unknown; these are the kinds of it. */
export const contradictions = ['dewPointAboveTemperature', 'humidityAgainstDewPoint', 'gustBelowWind', 'sunlightAtNight', 'sunlightTooStrong'] as const;
export type Contradiction = (typeof contradictions)[number];

/** Hours on a dense grid, one entry per hour from `startMs`; NaN = unknown. State values hold AT the hour, `…Of` values over it. */
export interface HourTable {
  startMs: number;
  count: number;
  temperatureC: Float64Array;
  dewPointC: Float64Array;
  windMs: Float64Array;
  windFromDeg: Float64Array;
  cloudPct: Float64Array;
  gustOfMs: Float64Array;
  rainOfMm: Float64Array;
  rainChanceOfPct: Float64Array;
  radiationOfWm2: Float64Array;
  contradictions: Set<Contradiction>;
  /** True when no hour of the table holds any value. */
  isEmpty: boolean;
}

/** Tolerances of the cross-checks, from the rounding and the different moments that providers use: ours, no source. */
const dewPointSlackC = 0.5;
const humiditySlackPct = 15;
const gustSlackMs = 0.5;

const known = (value: number | null): number => value ?? NaN;

/**
 * Lays forecast hours on a dense grid and sets contradictory values aside.
 * @param hours in order, start of hour in UTC @param startMs start of the grid, on the hour, epoch ms @param count hours of the grid
 */
export function tableOf(hours: readonly ForecastHour[], startMs: number, count: number): HourTable {
  const table: HourTable = {
    startMs,
    count,
    temperatureC: column(count).fill(NaN),
    dewPointC: column(count).fill(NaN),
    windMs: column(count).fill(NaN),
    windFromDeg: column(count).fill(NaN),
    cloudPct: column(count).fill(NaN),
    gustOfMs: column(count).fill(NaN),
    rainOfMm: column(count).fill(NaN),
    rainChanceOfPct: column(count).fill(NaN),
    radiationOfWm2: column(count).fill(NaN),
    contradictions: new Set(),
    isEmpty: true,
  };
  const first = firstAtOrAfter(hours, startMs);
  for (let index = first; index < hours.length; index += 1) {
    const hour = hours[index]!;
    const at = (hourStartMs(hour.time) - startMs) / hourMs;
    if (at >= count) break;
    fill(table, at, hour);
  }
  return table;
}

let dayText = '';
let dayMs = 0;

/**
 * Start of an hour, epoch ms. Hours come in order, so the day is parsed once for all of its hours.
 * @param time UTC ISO 8601 on the hour, as the schema of hours demands
 */
export function hourStartMs(time: string): number {
  if (!time.startsWith(dayText) || dayText === '') {
    dayText = time.slice(0, 11);
    dayMs = Date.parse(`${dayText}00:00:00Z`);
  }
  return dayMs + ((time.charCodeAt(11) - 48) * 10 + time.charCodeAt(12) - 48) * hourMs;
}

/** Index of the first hour not before an instant; hours are in order. */
function firstAtOrAfter(hours: readonly ForecastHour[], instantMs: number): number {
  let low = 0;
  let high = hours.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (hourStartMs(hours[middle]!.time) < instantMs) low = middle + 1;
    else high = middle;
  }
  return low;
}

function fill(table: HourTable, at: number, hour: ForecastHour): void {
  table.isEmpty = false;
  const temperature = known(hour.temperature2mC);
  const wind = known(hour.windSpeed10mMs);
  const gust = known(hour.windGust10mMs);
  table.temperatureC[at] = temperature;
  table.dewPointC[at] = dewPointOf(table, temperature, known(hour.dewPoint2mC), known(hour.relativeHumidityPct));
  table.windMs[at] = wind;
  table.windFromDeg[at] = known(hour.windFromDeg);
  table.cloudPct[at] = known(hour.cloudCoverPct);
  table.rainOfMm[at] = known(hour.precipitationMm);
  table.rainChanceOfPct[at] = known(hour.precipitationProbabilityPct);
  table.radiationOfWm2[at] = known(hour.shortwaveWm2);
  if (gust < 0.8 * wind - gustSlackMs) table.contradictions.add('gustBelowWind');
  else table.gustOfMs[at] = gust;
}

/** Dew point as given, else from temperature and humidity; the kind of contradiction where the two disagree. */
function settledDewPoint(temperatureC: number, dewPointC: number, humidityPct: number): number | Contradiction {
  if (Number.isNaN(dewPointC)) return humidityPct > 0 ? dewPointFromHumidityC(temperatureC, humidityPct) : NaN;
  if (dewPointC > temperatureC + dewPointSlackC) return 'dewPointAboveTemperature';
  return Math.abs(relativeHumidityPct(temperatureC, dewPointC) - humidityPct) > humiditySlackPct ? 'humidityAgainstDewPoint' : dewPointC;
}

function dewPointOf(table: HourTable, temperatureC: number, dewPointC: number, humidityPct: number): number {
  const settled = settledDewPoint(temperatureC, dewPointC, humidityPct);
  if (typeof settled === 'number') return settled;
  table.contradictions.add(settled);
  return NaN;
}

/** The hour with dew point and humidity brought together: each from the other where one is missing, both unknown where they disagree. */
export function withHumidity(hour: ForecastHour): ForecastHour {
  const { temperature2mC, dewPoint2mC, relativeHumidityPct: humidityPct } = hour;
  if (temperature2mC === null) return hour;
  const settled = settledDewPoint(temperature2mC, known(dewPoint2mC), known(humidityPct));
  if (typeof settled !== 'number') return { ...hour, dewPoint2mC: null, relativeHumidityPct: null };
  if (Number.isNaN(settled) || (dewPoint2mC !== null && humidityPct !== null)) return hour;
  return { ...hour, dewPoint2mC: settled, relativeHumidityPct: humidityPct ?? relativeHumidityPct(temperature2mC, settled) };
}
