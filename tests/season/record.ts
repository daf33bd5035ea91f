import { readFileSync } from 'node:fs';
import { basename } from 'node:path';
import type { ForecastHour, Site } from '../../shared/assessment/case.ts';
import { fieldHours } from './field-record.ts';
import { mastHours } from './mast-record.ts';
import { typicalYearHours } from './typical-year-record.ts';

/** A long row of observed hours, as a forecast would give them. */
export interface HourlyRecord {
  name: string;
  site: Site;
  /** Local dates with hours, in order. */
  dates: string[];
  hours: ForecastHour[];
}

export const hourMs = 3_600_000;

/** A finite number inside a range, else missing. */
export const known = (value: number | undefined, least: number, most: number): number | null => (value === undefined || !(value >= least && value <= most) ? null : value);

/** Rain that was seen is certain: its chance is told as 0 or 100, so that dry hours can be judged on the record. */
export const seenRain = (precipitationMm: number | null): Pick<ForecastHour, 'precipitationMm' | 'precipitationProbabilityPct'> => ({ precipitationMm, precipitationProbabilityPct: precipitationMm === null ? null : precipitationMm > 0 ? 100 : 0 });

/**
 * Reads an hourly record in one of three formats, told by its first line: a typical year (TMY3 CSV), the surface or profile file
 * of a mast (AERMOD .SFC with its .PFL beside it), or the crop field's CSV.
 * @throws Error when the file is none of them
 */
export function readRecord(path: string): HourlyRecord {
  const text = readFileSync(path, 'latin1');
  const head = text.slice(0, 400);
  const name = basename(path);
  if (head.includes('Date (MM/DD/YYYY)')) return typicalYearHours(name, text);
  if (head.startsWith('Station,Datum')) return fieldHours(name);
  if (/\.(sfc|pfl)$/i.test(path)) {
    const beside = (extension: string): string => readFileSync(path.replace(/\.(sfc|pfl)$/i, (old) => (old === old.toUpperCase() ? extension : extension.toLowerCase())), 'latin1');
    return mastHours(name, beside('.SFC'), beside('.PFL'));
  }
  throw new Error(`${name} is no hourly record that is known here: give a TMY3 file, a mast's .SFC or .PFL, or the crop field's CSV`);
}

/** Local dates, in a zone of fixed offset, of which a record holds at least half a day. */
export function datesOf(hours: readonly ForecastHour[], offsetMs: number): string[] {
  const counts = new Map<string, number>();
  for (const { time } of hours) {
    const date = new Date(Date.parse(time) + offsetMs).toISOString().slice(0, 10);
    counts.set(date, (counts.get(date) ?? 0) + 1);
  }
  return [...counts].filter(([, count]) => count >= 12).map(([date]) => date);
}
