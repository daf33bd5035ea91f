import { featureNames, featuresAt, type FeatureName } from '../../shared/atmosphere/inversion/features.ts';
import { logitOf } from '../../shared/atmosphere/inversion/logit.ts';
import { seriesOf } from '../../shared/atmosphere/inversion/series.ts';
import { acrossMonths, bounded, fitInversion, fitOptions, type FitOptions, type FitRow } from './fitting.ts';
import { fitLogistic, logistic } from './logistic.ts';
import { isMorning, mastSunAltitudeDegAt, type MastHour } from './mast.ts';
import { randomFrom } from './random.ts';
import { rocArea, scoresOf } from './scores.ts';

const hourMs = 3_600_000;
type Months = ReadonlyMap<number, readonly MastHour[]>;

/** One judged hour and what was said of it. */
export interface Judged {
  hour: MastHour;
  likelihood: number;
}

/** Features that look at hours after the one judged. */
const ahead: readonly FeatureName[] = ['comingWind', 'riseToCome', 'rangeInSun'];
/** How far back the evidence of a judged hour reaches when nothing after it may be seen. */
const hoursBack = 48;

/** Rows as a forecast that ends at the judged hour would give them: nothing after it is seen, nor the month's usual wind. */
export function rowsWithoutForesight(months: Months): FitRow[] {
  const none = new Set(ahead.map((name) => featureNames.indexOf(name)));
  const rows: FitRow[] = [];
  for (const [month, hours] of months) {
    for (const [slot, hour] of hours.entries()) {
      const from = Math.max(0, slot - hoursBack);
      const features = new Float64Array(featureNames.length);
      const series = seriesOf(hours.slice(from, slot + 1).map((one) => one.hour));
      const facts = featuresAt(series, slot - from, (at) => mastSunAltitudeDegAt(hours[from]!.epochMs + at * hourMs), features);
      if (facts === null || Number.isNaN(hour.differenceC)) continue;
      rows.push({ month, hour, features: bounded(features).map((value, f) => (none.has(f) ? 0 : value)) });
    }
  }
  return rows;
}

export const judgedOf = (rows: readonly FitRow[]): Judged[] => acrossMonths(rows).map(({ row, likelihood }) => ({ hour: row.hour, likelihood }));

/**
 * The catalogue's reference recipe on the same months: plain regression on sun altitude, cloud, wind, net radiation, rise above the
 * minimum, the night's wind and cloud and the last hour's warming. On the months held back the catalogue gives it 0.88 and 0.41, so
 * what it reaches here tells how much easier these months are.
 */
export function referenceRecipe(months: Months): Judged[] {
  const rows = [...months].flatMap(([month, hours]) => {
    const series = seriesOf(hours.map(({ hour }) => hour));
    return hours.flatMap((hour, slot) => {
      const features = new Float64Array(featureNames.length);
      const facts = featuresAt(series, slot, (at) => mastSunAltitudeDegAt(hours[0]!.epochMs + at * hourMs), features);
      if (facts === null || facts.riseC === null || slot < 1 || Number.isNaN(hour.differenceC) || !isMorning(hour)) return [];
      const warmingC = series.temperatureC[slot]! - series.temperatureC[slot - 1]!;
      const netWm2 = features[1]! - features[0]!;
      return Number.isFinite(warmingC) ? [{ month, hour, evidence: [facts.altitudeDeg, facts.cloudPct, facts.windMs, netWm2, facts.riseC, facts.nightWindMs, facts.nightCloudPct, warmingC] }] : [];
    });
  });
  return [...months.keys()].flatMap((month) => {
    const others = rows.filter((row) => row.month !== month);
    const fit = fitLogistic(others.map(({ evidence }) => evidence), others.map(({ hour }) => hour.differenceC > 0.1), others.map(() => 1), { ridge: 1e-4 });
    return rows.filter((row) => row.month === month).map(({ hour, evidence }) => ({ hour, likelihood: logistic(fit.weights.reduce((sum, weight, f) => sum + weight * evidence[f]!, fit.base)) }));
  });
}

const choices: readonly FitOptions[] = [0.001, 0.003, 0.01, 0.03].flatMap((ridge) => [0.1, 0.3, 0.6, 1].map((otherHours) => ({ ridge, otherHours })));

/** Mean surprise of the mornings of `month`, said by a fit on `others`. */
function surpriseOf(month: readonly FitRow[], others: readonly FitRow[], options: FitOptions): number {
  const fit = fitInversion(others, options);
  return month.filter(({ hour }) => isMorning(hour)).reduce((sum, { hour, features }) => sum - Math.log(logistic((hour.differenceC > 0.1 ? 1 : -1) * logitOf(fit, features))), 0);
}

/** As judged, but ridge and the importance of other hours too are chosen without the judged month. */
export function withInnerChoice(rows: readonly FitRow[]): Judged[] {
  const months = [...new Set(rows.map(({ month }) => month))];
  return months.flatMap((month) => {
    const others = rows.filter((row) => row.month !== month);
    let best = fitOptions;
    let least = Infinity;
    for (const options of choices) {
      const cost = months.filter((one) => one !== month).reduce((sum, one) => sum + surpriseOf(others.filter((row) => row.month === one), others.filter((row) => row.month !== one), options), 0);
      if (cost < least) [least, best] = [cost, options];
    }
    const fit = fitInversion(others, best);
    return rows.filter((row) => row.month === month && isMorning(row.hour)).map(({ hour, features }) => ({ hour, likelihood: logistic(logitOf(fit, features)) }));
  });
}

export interface Interval {
  low: number;
  high: number;
}

/** 95 % intervals from 1,000 draws of whole days: hours of one morning are no independent witnesses. */
export function intervalsByDay(judged: readonly Judged[]): { area: Interval; skill: Interval; strongArea: Interval; days: number } {
  const byDay = new Map<number, Judged[]>();
  for (const one of judged) {
    const day = Math.floor((one.hour.epochMs - 5 * hourMs) / (24 * hourMs));
    byDay.set(day, [...(byDay.get(day) ?? []), one]);
  }
  const days = [...byDay.values()];
  const { uniform } = randomFrom(12345);
  const draws = Array.from({ length: 1000 }, () => {
    const drawn = days.flatMap(() => days[Math.floor(uniform() * days.length)]!);
    const chances = drawn.map(({ likelihood }) => likelihood);
    const { area, skill } = scoresOf(chances, drawn.map(({ hour }) => hour.differenceC > 0.1));
    return { area, skill, strongArea: rocArea(chances, drawn.map(({ hour }) => hour.differenceC > 1)) };
  });
  const interval = (key: 'area' | 'skill' | 'strongArea'): Interval => {
    const sorted = draws.map((draw) => draw[key]).sort((a, b) => a - b);
    return { low: sorted[25]!, high: sorted[974]! };
  };
  return { area: interval('area'), skill: interval('skill'), strongArea: interval('strongArea'), days: days.length };
}

