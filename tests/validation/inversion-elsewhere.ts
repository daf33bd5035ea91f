import { existsSync, readFileSync } from 'node:fs';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { prepareInversion } from '../../shared/atmosphere/inversion/index.ts';
import { sunAltitudeDeg } from '../../shared/sun/sun.ts';
import { fieldSite, fieldSunAltitudeDegAt, hasField, loadField, withSkyFromDaylight } from './field.ts';
import { markdown, scoresOf } from './scores.ts';

const hourMs = 3_600_000;
/** Neither record tells a wind; a steady one takes wind out of the ranking. */
const steadyWindMs = 1.5;

/**
 * Winter and spring of the crop field: T(2 m) − T(5 cm) on mornings, rising sun between −9° and 32°. A layer far below the
 * mast's, no wind, the night's sky guessed from the days around: a hard test of transfer. With the sun well up the sensor at 5 cm still
 * reads colder than that at 2 m on a quarter of the mornings (shade or lag), so dawn is shown apart.
 */
export function lowLayerOfField(): string | null {
  if (!hasField()) return null;
  const hours = withSkyFromDaylight(loadField().filter(({ month, lowDifferenceC }) => month <= 4 && Number.isFinite(lowDifferenceC))).map((one) => ({ ...one, hour: { ...one.hour, windSpeed10mMs: steadyWindMs } }));
  const inversion = prepareInversion({ site: fieldSite, hours: hours.map(({ hour }) => hour), sunAltitudeDegAt: fieldSunAltitudeDegAt });
  const rows: (string | number)[][] = [];
  const mornings = hours.filter(({ epochMs }) => {
    const altitude = fieldSunAltitudeDegAt(epochMs);
    return altitude > -9 && altitude < 32 && fieldSunAltitudeDegAt(epochMs + hourMs) > altitude;
  });
  for (const { name, highestSunDeg } of [{ name: 'dawn, sun below 8°', highestSunDeg: 8 }, { name: 'whole morning, sun below 32°', highestSunDeg: 32 }]) {
    for (const above of [0.5, 1, 2]) {
      const judged = mornings.flatMap((one) => {
        const { likelihood } = inversion.at(one.epochMs);
        return likelihood === null || fieldSunAltitudeDegAt(one.epochMs) > highestSunDeg ? [] : [{ likelihood, happened: one.lowDifferenceC > above }];
      });
      const scores = scoresOf(judged.map(({ likelihood }) => likelihood), judged.map(({ happened }) => happened));
      rows.push([`crop field, January–April, T(2 m) − T(5 cm) > ${above} °C, ${name}`, scores.hours, `${Math.round(100 * scores.share)} %`, scores.area.toFixed(3)]);
    }
  }
  return markdown(['record', 'morning hours', 'share', 'ROC area'], rows);
}

const dayFile = '../shared/data/mast_nrel_m2_day/midc_20181014.txt';

/** One autumn day with a front at a mast in Colorado, well mixed all morning: what is said, beside T(50 m) − T(2 m). */
export function wellMixedMorning(): string | null {
  const day = loadWellMixedDay();
  if (!day) return null;
  const rows = [1, 3, 5].map((windMs) => {
    const inversion = prepareInversion({ site: day.site, hours: day.hours.map((hour) => ({ ...hour, windSpeed10mMs: windMs })), sunAltitudeDegAt: (at) => sunAltitudeDeg(at, day.site.latitude, day.site.longitude) });
    const said = [6, 7, 8, 9, 10].map((hour) => inversion.at(Date.parse('2018-10-14T07:00:00Z') + hour * hourMs).likelihood);
    return [`${windMs} m/s`, ...said.map((likelihood) => (likelihood === null ? '–' : `${Math.round(100 * likelihood)} %`))];
  });
  return `\n${markdown(['well-mixed day, wind taken as', '06 h', '07 h', '08 h', '09 h', '10 h MST'], [...rows, ['T(50 m) − T(2 m), °C', ...[6, 7, 8, 9, 10].map((hour) => day.differenceC[hour]!.toFixed(2))]])}`;
}

/** Hours of that day from its minutes; the sky is taken as overcast, as on a front. */
export function loadWellMixedDay(): { site: { latitude: number; longitude: number; elevationM: number }; hours: ForecastHour[]; differenceC: number[] } | null {
  if (!existsSync(dayFile)) return null;
  const minutes = readFileSync(dayFile, 'utf8').trim().split('\n').slice(1).map((line) => line.split(','));
  const mean = (column: number, from: number, count: number): number => minutes.slice(from, from + count).reduce((sum, row) => sum + Number(row[column]), 0) / minutes.slice(from, from + count).length;
  const hours: ForecastHour[] = [];
  const differenceC: number[] = [];
  for (let hour = 0; hour < 24; hour += 1) {
    const around = Math.max(0, hour * 60 - 5);
    hours.push({ time: new Date(Date.parse('2018-10-14T07:00:00Z') + hour * hourMs).toISOString(), temperature2mC: mean(4, around, 10), dewPoint2mC: null, relativeHumidityPct: null, windSpeed10mMs: null, windGust10mMs: null, windFromDeg: null, cloudCoverPct: 100, precipitationMm: null, precipitationProbabilityPct: null, shortwaveWm2: Math.max(0, mean(2, hour * 60, 60)), temperature80mC: null });
    differenceC.push(mean(5, around, 10) - mean(4, around, 10));
  }
  return { site: { latitude: 39.9107, longitude: -105.2348, elevationM: 1855 }, hours, differenceC };
}
