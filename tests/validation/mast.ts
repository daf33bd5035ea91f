import { existsSync, readFileSync } from 'node:fs';
import { dewPointFromHumidityC } from '../../shared/atmosphere/humidity.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { sunAltitudeDeg, sunTimesNear } from '../../shared/sun/sun.ts';

/** The mast in the Hudson valley, 1988, as catalogued beside the data. Its level of 10 m stands for the surface. */
export const mastSite = { latitude: 41.3, longitude: -74, elevationM: 20 } as const;
const utcOffsetMs = 5 * 3_600_000;
const hourMs = 3_600_000;
const folder = '../shared/data/mast_lovett/';
export const mastFile = `${folder}odd_months.PFL`;
export const hasMast = (): boolean => existsSync(mastFile) && existsSync(`${folder}odd_months.SFC`);

export interface MastHour {
  month: number;
  /** Middle of the hour that the means are of. */
  epochMs: number;
  /** Hours from sunrise of the local date to the middle of the hour. */
  fromSunriseH: number;
  /** T(50 m) − T(10 m), °C; NaN when either is missing. */
  differenceC: number;
  /** T(100 m) − T(10 m), °C: stands for a provider's second height. */
  upperDifferenceC: number;
  hour: ForecastHour;
}

const fields = (line: string): number[] => line.trim().split(/\s+/).map(Number);
const known = (value: number | undefined, least: number, most: number): number | null => (value === undefined || !(value > least && value < most) ? null : value);

/** Hours of the mast in order, by month. The mean of an hour is told as the state at its middle. */
export function loadMast(): Map<number, MastHour[]> {
  const surface = new Map(
    readFileSync(`${folder}odd_months.SFC`, 'utf8').trim().split('\n').slice(1).map((line) => {
      const row = fields(line);
      return [[row[1], row[2], row[4]].join(), row] as const;
    }),
  );
  const levels = new Map<string, Map<number, number[]>>();
  for (const line of readFileSync(mastFile, 'utf8').trim().split('\n')) {
    const row = fields(line);
    const key = [row[1], row[2], row[3]].join();
    levels.set(key, (levels.get(key) ?? new Map<number, number[]>()).set(row[4]!, row));
  }
  const rises = new Map<string, number>();
  const months = new Map<number, MastHour[]>();
  for (const [key, heights] of levels) {
    const [month, day, endHour] = key.split(',').map(Number) as [number, number, number];
    const epochMs = Date.UTC(1988, month - 1, day) + endHour * hourMs + utcOffsetMs - hourMs / 2;
    const date = `${month}-${day}`;
    let rise = rises.get(date);
    if (rise === undefined) rises.set(date, (rise = sunTimesNear(Date.UTC(1988, month - 1, day) + 12 * hourMs + utcOffsetMs, mastSite.latitude, mastSite.longitude).sunriseMs ?? NaN));
    const temperature = (heightM: number): number | null => known(heights.get(heightM)?.[8], -60, 60);
    const temperature2mC = temperature(10);
    const sky = surface.get(key);
    const humidity = known(sky?.[22], 0, 101);
    const cloud = known(sky?.[24], -1, 11);
    const less = (heightM: number): number => (temperature(heightM) ?? NaN) - (temperature2mC ?? NaN);
    const hour: ForecastHour = {
      time: new Date(epochMs).toISOString(),
      temperature2mC,
      relativeHumidityPct: humidity,
      dewPoint2mC: temperature2mC === null || humidity === null ? null : dewPointFromHumidityC(temperature2mC, humidity),
      windSpeed10mMs: known(heights.get(10)?.[7], -1, 90),
      windGust10mMs: null,
      windFromDeg: known(heights.get(10)?.[6], -1, 361),
      cloudCoverPct: cloud === null ? null : cloud * 10,
      precipitationMm: null,
      precipitationProbabilityPct: null,
      shortwaveWm2: null,
      temperature80mC: null,
    };
    const made = { month, epochMs, fromSunriseH: (epochMs - rise) / hourMs, differenceC: less(50), upperDifferenceC: less(100), hour };
    months.set(month, [...(months.get(month) ?? []), made]);
  }
  for (const hours of months.values()) hours.sort((a, b) => a.epochMs - b.epochMs);
  return months;
}

export const mastSunAltitudeDegAt = (epochMs: number): number => sunAltitudeDeg(epochMs, mastSite.latitude, mastSite.longitude);

/** The morning that is judged: one hour before to four hours after sunrise. */
export const isMorning = ({ fromSunriseH }: { fromSunriseH: number }): boolean => fromSunriseH >= -1 && fromSunriseH < 4;
