import { existsSync, readFileSync } from 'node:fs';
import { extensionRules } from '../../shared/atmosphere/inversion/extension-rules.ts';
import { logitOf } from '../../shared/atmosphere/inversion/logit.ts';
import { fitInversion, rowsOf } from './fitting.ts';
import { logistic } from './logistic.ts';
import { isMorning, type MastHour } from './mast.ts';
import { randomFrom } from './random.ts';
import { rocArea, scoresOf } from './scores.ts';

const pairsFile = '../shared/data/forecast_pairs_meps/pairs_meps_det_54-62N.csv';
export const hasPairs = (): boolean => existsSync(pairsFile);

export interface ErrorSize {
  pairs: number;
  windBiasMs: number;
  windSpreadMs: number;
  temperatureSpreadC: number;
}

/**
 * Error of a 2.5 km model at leads 9–24 h in hours with an observed wind of 3 m/s or less. One Nordic winter situation, and choosing by
 * the observed wind makes the model look windier than it is on the whole: a size to try, not the error of any one farm.
 */
export function errorInLightWind(): ErrorSize {
  const [head, ...lines] = readFileSync(pairsFile, 'utf8').trim().split('\n').map((line) => line.split(','));
  const column = (name: string): number => head!.indexOf(name);
  const value = (row: readonly string[], name: string): number => (row[column(name)] ? Number(row[column(name)]) : NaN);
  const errors = lines
    .filter((row) => value(row, 'lead_h') >= 9 && value(row, 'lead_h') <= 24 && value(row, 'obs_ff_ms') <= 3)
    .map((row) => ({ wind: value(row, 'fc_s10m_ms') - value(row, 'obs_ff_ms'), temperature: value(row, 'fc_t2m_c') - value(row, 'obs_t_c') }))
    .filter(({ wind, temperature }) => Number.isFinite(wind + temperature));
  const mean = (values: readonly number[]): number => values.reduce((sum, one) => sum + one, 0) / values.length;
  const spread = (values: readonly number[]): number => Math.sqrt(mean(values.map((one) => (one - mean(values)) ** 2)));
  const winds = errors.map(({ wind }) => wind);
  return { pairs: errors.length, windBiasMs: mean(winds), windSpreadMs: spread(winds), temperatureSpreadC: spread(errors.map(({ temperature }) => temperature)) };
}

/** Shares of each error laid on the mast's own hours. */
export interface Disturbance {
  name: string;
  windBias: number;
  windSpread: number;
  temperatureSpread: number;
  cloudSpreadPct: number;
}

export const disturbances: readonly Disturbance[] = [
  { name: 'none: as measured', windBias: 0, windSpread: 0, temperatureSpread: 0, cloudSpreadPct: 0 },
  { name: 'temperature', windBias: 0, windSpread: 0, temperatureSpread: 1, cloudSpreadPct: 0 },
  { name: 'cloud, 30 points', windBias: 0, windSpread: 0, temperatureSpread: 0, cloudSpreadPct: 30 },
  { name: 'half the wind error', windBias: 0, windSpread: 0.5, temperatureSpread: 0, cloudSpreadPct: 0 },
  { name: 'the wind error', windBias: 0, windSpread: 1, temperatureSpread: 0, cloudSpreadPct: 0 },
  { name: 'all three', windBias: 0, windSpread: 1, temperatureSpread: 1, cloudSpreadPct: 30 },
  { name: 'all three, and the wind bias', windBias: 1, windSpread: 1, temperatureSpread: 1, cloudSpreadPct: 30 },
];

const draws = 10;
/** Errors of neighbouring hours go together; our assumption, no source. */
const carried = 0.9;

function disturbed(hours: readonly MastHour[], by: Disturbance, size: ErrorSize, normal: () => number): MastHour[] {
  let wind = normal();
  let temperature = normal();
  let cloud = normal();
  const next = (error: number): number => carried * error + Math.sqrt(1 - carried ** 2) * normal();
  return hours.map((one) => {
    [wind, temperature, cloud] = [next(wind), next(temperature), next(cloud)];
    const { windSpeed10mMs, temperature2mC, cloudCoverPct } = one.hour;
    const hour = {
      ...one.hour,
      windSpeed10mMs: windSpeed10mMs === null ? null : Math.max(0, windSpeed10mMs + by.windBias * size.windBiasMs + by.windSpread * size.windSpreadMs * wind),
      temperature2mC: temperature2mC === null ? null : temperature2mC + by.temperatureSpread * size.temperatureSpreadC * temperature,
      cloudCoverPct: cloudCoverPct === null ? null : Math.min(100, Math.max(0, cloudCoverPct + by.cloudSpreadPct * cloud)),
    };
    return { ...one, hour };
  });
}

export interface DisturbedScores {
  name: string;
  area: number;
  skill: number;
  strongArea: number;
  /** Share of hours on the wrong side: the estimate at one half, and the rule "wind over 3 mph or 3 °F above the low". */
  wrong: number;
  ruleWrong: number;
}

/** What fits on the measured other months say of each month when its hours bear a forecast's error; means of several draws. */
export function underForecastError(months: ReadonlyMap<number, readonly MastHour[]>, size: ErrorSize): DisturbedScores[] {
  const rows = rowsOf(months);
  const fits = new Map([...months.keys()].map((month) => [month, fitInversion(rows.filter((row) => row.month !== month))]));
  const rule = extensionRules.at(-1)!;
  return disturbances.map((by) => {
    const { normal } = randomFrom(7);
    const sum = { area: 0, skill: 0, strongArea: 0, wrong: 0, ruleWrong: 0 };
    for (let draw = 0; draw < draws; draw += 1) {
      const now = new Map([...months].map(([month, hours]) => [month, disturbed(hours, by, size, normal)]));
      const mornings = rowsOf(now).filter(({ hour }) => isMorning(hour));
      const chances = mornings.map(({ month, features }) => logistic(logitOf(fits.get(month)!, features)));
      const happened = mornings.map(({ hour }) => hour.differenceC > 0.1);
      const { area, skill } = scoresOf(chances, happened);
      const ruleSaid = mornings.map(({ month, hour }) => {
        const hours = now.get(month)!;
        const slot = hours.indexOf(hour);
        const low = Math.min(...hours.slice(Math.max(0, slot - 12), slot + 1).flatMap((one) => one.hour.temperature2mC ?? []));
        return hour.hour.temperature2mC === null ? null : rule.holds({ riseC: hour.hour.temperature2mC - low, windMs: hour.hour.windSpeed10mMs!, fromSunriseH: hour.fromSunriseH });
      });
      sum.area += area / draws;
      sum.skill += skill / draws;
      sum.strongArea += rocArea(chances, mornings.map(({ hour }) => hour.differenceC > 1)) / draws;
      sum.wrong += chances.filter((chance, r) => chance > 0.5 !== happened[r]).length / chances.length / draws;
      sum.ruleWrong += ruleSaid.filter((said, r) => said !== null && said !== happened[r]).length / ruleSaid.filter((said) => said !== null).length / draws;
    }
    return { name: by.name, ...sum };
  });
}
