import { featureNames, featureRules, featuresAt } from '../../shared/atmosphere/inversion/features.ts';
import { logitOf } from '../../shared/atmosphere/inversion/logit.ts';
import { seriesOf } from '../../shared/atmosphere/inversion/series.ts';
import type { Coefficients } from '../../shared/atmosphere/inversion/coefficients.ts';
import { fitLogistic, logistic } from './logistic.ts';
import { isMorning, mastSunAltitudeDegAt, type MastHour } from './mast.ts';

export interface FitRow {
  month: number;
  hour: MastHour;
  features: Float64Array;
}

/** Features of every hour that has its truth and its evidence; months are series of their own. */
export function rowsOf(months: ReadonlyMap<number, readonly MastHour[]>): FitRow[] {
  const rows: FitRow[] = [];
  for (const [month, hours] of months) {
    const series = seriesOf(hours.map(({ hour }) => hour));
    for (const [slot, hour] of hours.entries()) {
      const features = new Float64Array(featureNames.length);
      const facts = featuresAt(series, slot, (at) => mastSunAltitudeDegAt(hours[0]!.epochMs + at * 3_600_000), features);
      if (facts === null || Number.isNaN(hour.differenceC)) continue;
      rows.push({ month, hour, features: bounded(features) });
    }
  }
  return rows;
}

/** Features within their limits; NaN = gap, Infinity = outside of the series. */
export const bounded = (features: Float64Array): Float64Array =>
  features.map((value, f) => {
    const { low, high } = featureRules[featureNames[f]!];
    return Number.isFinite(value) ? Math.min(high, Math.max(low, value)) : value;
  });

export interface FitOptions {
  ridge: number;
  /** Importance of an hour outside the morning. */
  otherHours: number;
}
export const fitOptions: FitOptions = { ridge: 0.01, otherHours: 0.6 };

/** Fits the coefficients on rows; rows with a gap are left out. */
export function fitInversion(all: readonly FitRow[], options: FitOptions = fitOptions): Omit<Coefficients, 'madeOf'> {
  const rows = all.filter(({ features }) => features.every(Number.isFinite));
  const importance = rows.map(({ hour }) => (isMorning(hour) ? 1 : options.otherHours));
  const signs = featureNames.map((name) => featureRules[name].sign);
  const { base, weights } = fitLogistic(rows.map(({ features }) => features), rows.map(({ hour }) => hour.differenceC > 0.1), importance, { ridge: options.ridge, signs });
  const total = importance.reduce((sum, value) => sum + value, 0);
  const means = featureNames.map((_, f) => rows.reduce((sum, { features }, r) => sum + importance[r]! * features[f]!, 0) / total);
  const logits = rows.map(({ features }) => weights.reduce((sum, weight, f) => sum + weight * features[f]!, base));
  const strong = fitLogistic(logits.map((logit) => [logit]), rows.map(({ hour }) => hour.differenceC > 1), importance, { ridge: 0 });
  const aloft = fitAloft(rows, logits, importance);
  return { base, weights, means, strong: { base: strong.base, slope: strong.weights[0]! }, aloft };
}

/** A second height beside the other evidence. */
function fitAloft(rows: readonly FitRow[], logits: readonly number[], importance: readonly number[]): Coefficients['aloft'] {
  const usable = rows.flatMap(({ hour }, r) => (Number.isNaN(hour.upperDifferenceC) ? [] : [r]));
  const fit = fitLogistic(
    usable.map((r) => [Math.max(-3, Math.min(3, rows[r]!.hour.upperDifferenceC))]),
    usable.map((r) => rows[r]!.hour.differenceC > 0.1),
    usable.map((r) => importance[r]!),
    { ridge: 0, signs: [1], offsets: usable.map((r) => logits[r]!) },
  );
  return { base: fit.base, perC: fit.weights[0]! };
}

export interface Said {
  row: FitRow;
  /** Chance of more than 0.1 °C, and of more than 1 °C. */
  likelihood: number;
  strong: number;
  /** The same with the difference to the mast's upper level as further evidence. */
  withAloft: number | null;
}

/** What a fit on the other months says of each month's mornings. */
export function acrossMonths(rows: readonly FitRow[], options: FitOptions = fitOptions): Said[] {
  const said: Said[] = [];
  for (const month of new Set(rows.map((row) => row.month))) {
    const fit = fitInversion(rows.filter((row) => row.month !== month), options);
    for (const row of rows) {
      if (row.month !== month || !isMorning(row.hour)) continue;
      const logit = logitOf(fit, row.features);
      const upperC = row.hour.upperDifferenceC;
      said.push({ row, likelihood: logistic(logit), strong: logistic(fit.strong.base + fit.strong.slope * logit), withAloft: Number.isNaN(upperC) ? null : logistic(logit + fit.aloft.base + fit.aloft.perC * Math.max(-3, Math.min(3, upperC))) });
    }
  }
  return said;
}
