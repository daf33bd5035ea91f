import type { ForecastHour } from '../../shared/assessment/case.ts';
import { unknownHour } from '../../shared/assessment/unknown-hour.ts';
import { datesOf, hourMs, known, type HourlyRecord } from './record.ts';

const radPerDeg = Math.PI / 180;
const fields = (line: string): number[] => line.trim().split(/\s+/).map(Number);

/** Means of the hour ending at a label, one row. */
interface Means {
  endMs: number;
  temperatureC: number | null;
  windMs: number | null;
  fromDeg: number | null;
  humidityPct: number | null;
  cloudPct: number | null;
}

const middle = (a: number | null | undefined, b: number | null | undefined): number | null => (a === null || a === undefined || b === null || b === undefined ? null : (a + b) / 2);

/** Halfway between two directions. */
function middleDirection(a: number | null | undefined, b: number | null | undefined): number | null {
  if (a === null || a === undefined || b === null || b === undefined) return null;
  const east = Math.sin(a * radPerDeg) + Math.sin(b * radPerDeg);
  const north = Math.cos(a * radPerDeg) + Math.cos(b * radPerDeg);
  return (Math.atan2(east, north) / radPerDeg + 360) % 360;
}

/**
 * A mast in AERMOD's surface and profile format. Labels 1–24 end their hour in local standard time, values are means of that hour:
 * the state at a full hour is the mean of the two hours that meet there. The level of 10 m stands for air and wind; no rain,
 * radiation or gusts.
 */
export function mastHours(name: string, surfaceText: string, profileText: string): HourlyRecord {
  const surfaceLines = surfaceText.trim().split(/\r?\n/);
  const place = /([\d.]+)\s*([NS])\s+([\d.]+)\s*([EW])/.exec(surfaceLines[0]!);
  if (!place) throw new Error(`${name}: the first line of the surface file gives no position`);
  const latitude = Number(place[1]) * (place[2] === 'S' ? -1 : 1);
  const longitude = Number(place[3]) * (place[4] === 'W' ? -1 : 1);
  const zoneH = Math.round(longitude / 15);
  const label = (row: number[], hourIndex: number): number => Date.UTC((row[0]! < 50 ? 2000 : 1900) + row[0]!, row[1]! - 1, row[2]!) + (row[hourIndex]! - zoneH) * hourMs;
  const sky = new Map(surfaceLines.slice(1).map((line) => [label(fields(line), 4), fields(line)] as const));
  const means: Means[] = [];
  for (const line of profileText.trim().split(/\r?\n/)) {
    const row = fields(line);
    if (row[4] !== 10) continue;
    const endMs = label(row, 3);
    const above = sky.get(endMs);
    const tenths = known(above?.[24], 0, 10);
    means.push({ endMs, temperatureC: known(row[8], -60, 60), windMs: known(row[7], 0, 90), fromDeg: known(row[6], 0, 360), humidityPct: known(above?.[22], 1, 100), cloudPct: tenths === null ? null : tenths * 10 });
  }
  const at = new Map(means.map((row) => [row.endMs, row]));
  const hours = means.map((before): ForecastHour => {
    const after = at.get(before.endMs + hourMs);
    return {
      ...unknownHour(new Date(before.endMs).toISOString()),
      temperature2mC: middle(before.temperatureC, after?.temperatureC),
      relativeHumidityPct: middle(before.humidityPct, after?.humidityPct),
      windSpeed10mMs: middle(before.windMs, after?.windMs),
      windFromDeg: middleDirection(before.fromDeg, after?.fromDeg),
      cloudCoverPct: middle(before.cloudPct, after?.cloudPct),
    };
  });
  return { name, site: { latitude, longitude, elevationM: 20, timeZone: `Etc/GMT${zoneH <= 0 ? '+' : '-'}${Math.abs(zoneH)}` }, dates: datesOf(hours, zoneH * hourMs), hours };
}
