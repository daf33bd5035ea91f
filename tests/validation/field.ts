import { existsSync, readFileSync } from 'node:fs';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { dewPointFromHumidityC } from '../../shared/atmosphere/humidity.ts';
import { radiationUnderCloudWm2 } from '../../shared/atmosphere/radiation/kasten-czeplak.ts';
import { sunAltitudeDeg } from '../../shared/sun/sun.ts';

/** Crop field near Göttingen, 2022, as catalogued beside the data. */
export const fieldSite = { latitude: 51.41866, longitude: 9.916, elevationM: 200 } as const;
export const fieldFile = '../shared/data/field_goettingen/weathr.csv';
export const hasField = (): boolean => existsSync(fieldFile);
const hourMs = 3_600_000;
/** Wind at 10 m over that at 2 m above a crop. Logarithmic profile over a roughness of 0.05 m (common practice, no source). */
const windTo10m = Math.log(10 / 0.05) / Math.log(2 / 0.05);

export interface FieldHour {
  /** Middle of the hour that the means are of. */
  epochMs: number;
  month: number;
  /** UTC hour of the label (end of the hour). */
  endHourUtc: number;
  /** Leaf wetness, 0–100; NaN where it was not measured. */
  leafWetnessPct: number;
  /** T(2 m) − T(5 cm), °C; NaN where it was not measured. */
  lowDifferenceC: number;
  windAt2mMs: number;
  hour: ForecastHour;
}

export const fieldSunAltitudeDegAt = (epochMs: number): number => sunAltitudeDeg(epochMs, fieldSite.latitude, fieldSite.longitude);

/**
 * Hours of the field in order. States are told at the middle of the hour that they are means of, and sunlight and rain for the hour
 * from one middle to the next are shared out of the two hours that they fall in, as a forecast's hour would hold them.
 */
export function loadField(): FieldHour[] {
  const lines = readFileSync(fieldFile, 'utf8').trim().split(/\r?\n/);
  const head = lines[0]!.split(',');
  const raw = lines.slice(1).map((line) => {
    const cells = line.split(',');
    return Object.fromEntries(head.map((name, index) => [name, cells[index] === '' || cells[index] === undefined ? NaN : name === 'Datum' ? Date.parse(`${cells[index]}T00:00:00Z`) : Number(cells[index])])) as Record<string, number>;
  });
  const orNull = (value: number | undefined): number | null => (value === undefined || Number.isNaN(value) ? null : value);
  const half = (a: number | undefined, b: number | undefined): number | null => orNull(((a ?? NaN) + (b ?? a ?? NaN)) / 2);
  return raw.map((row, index) => {
    const next = raw[index + 1];
    const epochMs = row.Datum! + row.Stunde! * hourMs - hourMs / 2;
    const temperature2mC = orNull(row.T200);
    const humidity = row.F200! > 0 ? row.F200! : NaN;
    const shortwaveWm2 = half(row.GS200, next?.GS200);
    const isSummer = row.Station === 14;
    const hour: ForecastHour = {
      time: new Date(epochMs).toISOString(),
      temperature2mC,
      relativeHumidityPct: orNull(humidity),
      dewPoint2mC: temperature2mC === null || Number.isNaN(humidity) ? null : dewPointFromHumidityC(temperature2mC, humidity),
      windSpeed10mMs: isSummer ? orNull(row.WG200! * windTo10m) : null,
      windGust10mMs: null,
      windFromDeg: null,
      cloudCoverPct: null,
      precipitationMm: half(row.N100, next?.N100),
      precipitationProbabilityPct: null,
      shortwaveWm2,
      temperature80mC: null,
    };
    return { epochMs, month: new Date(epochMs).getUTCMonth() + 1, endHourUtc: row.Stunde!, leafWetnessPct: isSummer ? row.Blatt! : NaN, lowDifferenceC: row.T200! - (row.T005 ?? NaN), windAt2mMs: isSummer ? row.WG200! : NaN, hour };
  });
}

/** Gives the field's nights the sky of the daylight around them: the share of clear-sky radiation that arrived within 18 hours either way. */
export function withSkyFromDaylight(hours: readonly FieldHour[]): FieldHour[] {
  return hours.map((here, index) => {
    let came = 0;
    let clear = 0;
    for (const other of hours.slice(Math.max(0, index - 18), index + 19)) {
      const most = radiationUnderCloudWm2(fieldSunAltitudeDegAt(other.epochMs + hourMs / 2), 0);
      if (most < 60 || other.hour.shortwaveWm2 === null) continue;
      came += other.hour.shortwaveWm2;
      clear += most;
    }
    const cloudCoverPct = clear === 0 ? null : 100 * Math.min(1, Math.max(0, (1 - came / clear) / 0.75)) ** (1 / 3.4);
    return { ...here, hour: { ...here.hour, cloudCoverPct } };
  });
}
