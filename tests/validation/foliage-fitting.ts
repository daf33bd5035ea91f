import { featureNames, featureSigns, stepHour, type Moisture } from '../../shared/atmosphere/foliage/features.ts';
import type { FilmConstants } from '../../shared/atmosphere/foliage/film.ts';
import { fieldSunAltitudeDegAt, loadField, withSkyFromDaylight, type FieldHour } from './field.ts';
import { fitLogistic, logistic, type LogisticFit } from './logistic.ts';

const dayMs = 86_400_000;
const halfHourMs = 1_800_000;

export interface FoliageRow {
  hour: FieldHour;
  isWet: boolean;
  features: Float64Array;
}

/** Day of the label that an hour of the record bears. */
export const labelDay = ({ epochMs }: FieldHour): number => Math.floor((epochMs + halfHourMs - 1) / dayMs);
/** The hours that the estimate is judged on: labels 03 to 10 UTC. */
export const isJudged = ({ endHourUtc }: FieldHour): boolean => endHourUtc >= 3 && endHourUtc <= 10;

/** Hours with leaf wetness, May to October, with the sky guessed from daylight. */
export function foliageHours(): FieldHour[] {
  return withSkyFromDaylight(loadField().filter(({ month }) => month >= 5 && month <= 10));
}

/**
 * Days on which the logger failed: a relative humidity of 0 % is no weather. On each of them the leaf sensor says 100 in all hours,
 * by noon of sunny days too.
 */
export const faultyDays = (hours: readonly FieldHour[]): Set<number> => new Set(hours.filter(({ hour }) => hour.relativeHumidityPct === null).map(labelDay));

/** Features and truth of each hour that has both, with this film run through the whole season. */
export function foliageRows(hours: readonly FieldHour[], film: FilmConstants, faulty: ReadonlySet<number> = faultyDays(hours)): FoliageRow[] {
  const moisture: Moisture = { filmMm: 0 };
  return hours.flatMap((hour) => {
    const features = new Float64Array(featureNames.length);
    const isKnown = stepHour(hour.hour, fieldSunAltitudeDegAt, hour.epochMs, film, moisture, features);
    return isKnown && !Number.isNaN(hour.leafWetnessPct) && !faulty.has(labelDay(hour)) ? [{ hour, isWet: hour.leafWetnessPct >= 50, features }] : [];
  });
}

const otherHours = 0.3;
const ridge = 0.001;

export const fitFoliage = (rows: readonly FoliageRow[]): LogisticFit =>
  fitLogistic(rows.map(({ features }) => features), rows.map(({ isWet }) => isWet), rows.map(({ hour }) => (isJudged(hour) ? 1 : otherHours)), { ridge, signs: featureSigns });

export const logitOfRow = (fit: LogisticFit, features: Float64Array): number => fit.weights.reduce((sum, weight, f) => sum + weight * features[f]!, fit.base);

/** Each month said by a fit of the weights on the other months. */
export function foliageAcrossMonths(rows: readonly FoliageRow[]): { row: FoliageRow; logit: number }[] {
  return [...new Set(rows.map(({ hour }) => hour.month))].flatMap((month) => {
    const fit = fitFoliage(rows.filter(({ hour }) => hour.month !== month));
    return rows.filter(({ hour }) => hour.month === month).map((row) => ({ row, logit: logitOfRow(fit, row.features) }));
  });
}

/** Mean surprise of the judged hours, each month unseen; the smaller the better. */
export function surprise(said: readonly { row: FoliageRow; logit: number }[]): number {
  const judged = said.filter(({ row }) => isJudged(row.hour));
  return judged.reduce((sum, { row, logit }) => sum - Math.log(Math.max(1e-6, logistic(row.isWet ? logit : -logit))), 0) / judged.length;
}

/** Set, not chosen: few mornings of the record follow rain, and a tree holds more of it than the record's low crop. */
const rainMostMm = 0.3;

/** Values of the film that physics allows, tried one after the other. */
export const filmChoices: Readonly<Record<keyof FilmConstants, readonly number[]>> = {
  mostMm: [0.06, 0.08, 0.1, 0.15, 0.2],
  rainMostMm: [rainMostMm],
  exchangeCalm: [10, 15, 20, 25, 30],
  exchangePerRootWind: [10, 15, 20, 25, 30],
  sunShare: [0.15, 0.2, 0.25, 0.35, 0.5],
  skyLossWm2: [30, 40, 50, 60, 70],
};

/** Best film by turns over its constants; `months` leaves months out. */
export function chooseFilm(hours: readonly FieldHour[], without: number | null = null): FilmConstants {
  const cost = (film: FilmConstants): number => surprise(foliageAcrossMonths(foliageRows(hours, film).filter(({ hour }) => hour.month !== without)));
  let best: FilmConstants = { mostMm: 0.1, rainMostMm, exchangeCalm: 20, exchangePerRootWind: 20, sunShare: 0.25, skyLossWm2: 50 };
  let least = cost(best);
  for (let turn = 0; turn < 2; turn += 1) {
    for (const name of Object.keys(filmChoices) as (keyof FilmConstants)[]) {
      for (const value of filmChoices[name]) {
        if (value === best[name]) continue;
        const film = { ...best, [name]: value };
        const found = cost(film);
        if (found < least) [best, least] = [film, found];
      }
    }
  }
  return best;
}
