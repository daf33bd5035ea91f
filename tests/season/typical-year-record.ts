import type { ForecastHour } from '../../shared/assessment/case.ts';
import { unknownHour } from '../../shared/assessment/unknown-hour.ts';
import { datesOf, hourMs, known, seenRain, type HourlyRecord } from './record.ts';

/** Any year will do for a year made of months of several; this one has no leap day, as the record has none. */
const year = 2001;

/** Rain by WMO present-weather code (50–59 drizzle, 60–69 rain, 70–79 snow, 80–99 showers and storms), mm: usual amounts, no source. */
function rainOfCode(code: number): number | null {
  if (!Number.isFinite(code)) return null;
  if (code < 50) return 0;
  return code < 60 ? 0.2 : code < 95 ? 1 : 3;
}

/**
 * A typical year in TMY3 format. Labels end their hour in local standard time: states hold at the label, radiation over the hour
 * before it. The record's rain amounts are not plausible, so rain is taken from the present weather. No gusts.
 */
export function typicalYearHours(name: string, text: string): HourlyRecord {
  const lines = text.trim().split(/\r?\n/);
  const [, , , zoneH, latitude, longitude, elevationM] = lines[0]!.split(',').map(Number) as number[];
  const names = lines[1]!.split(',');
  const rows = lines.slice(2).map((line) => line.split(','));
  const column = (title: string): ((row: string[] | undefined) => number | undefined) => {
    const index = names.findIndex((candidate) => candidate.startsWith(title));
    return (row) => (row === undefined || row[index] === undefined || row[index] === '' ? undefined : Number(row[index]));
  };
  const [temperature, dewPoint, humidity, wind, direction, cloud, radiation, weather] = ['Dry-bulb (C)', 'Dew-point (C)', 'RHum (%)', 'Wspd (m/s)', 'Wdir (degrees)', 'TotCld (tenths)', 'GHI (W/m^2)', 'PresWth (METAR'].map(column) as ((row: string[] | undefined) => number | undefined)[];
  const offsetMs = zoneH! * hourMs;
  const hours = rows.map((row, index): ForecastHour => {
    const [month, day] = row[0]!.split('/').map(Number) as [number, number];
    const tenths = known(cloud!(row), 0, 10);
    return {
      ...unknownHour(new Date(Date.UTC(year, month - 1, day) + Number(row[1]!.slice(0, 2)) * hourMs - offsetMs).toISOString()),
      temperature2mC: known(temperature!(row), -60, 60),
      dewPoint2mC: known(dewPoint!(row), -80, 50),
      relativeHumidityPct: known(humidity!(row), 0, 100),
      windSpeed10mMs: known(wind!(row), 0, 100),
      windFromDeg: known(direction!(row), 0, 360),
      cloudCoverPct: tenths === null ? null : tenths * 10,
      shortwaveWm2: known(radiation!(rows[index + 1]), 0, 1500),
      ...seenRain(rainOfCode(weather!(rows[index + 1]) ?? NaN)),
    };
  });
  return { name, site: { latitude: latitude!, longitude: longitude!, elevationM: elevationM!, timeZone: `Etc/GMT${zoneH! <= 0 ? '+' : '-'}${Math.abs(zoneH!)}` }, dates: datesOf(hours, offsetMs), hours };
}
