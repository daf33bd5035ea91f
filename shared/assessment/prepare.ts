import { prepareFoliage } from '../atmosphere/foliage/index.ts';
import { inEnglish } from '../atmosphere/inversion/evidence.ts';
import { prepareInversion } from '../atmosphere/inversion/index.ts';
import type { LearnedSite } from '../atmosphere/inversion/site.ts';
import { stationPressureKpa } from '../atmosphere/pressure.ts';
import { radiationUnderCloudWm2 } from '../atmosphere/radiation/kasten-czeplak.ts';
import { saturationVapourPressureKpa } from '../atmosphere/saturation-vapour-pressure.ts';
import { deltaTC } from '../atmosphere/wet-bulb.ts';
import { windProfileFactor } from '../atmosphere/wind-profile.ts';
import type { UnitSystem } from '../units/units.ts';
import type { AssessmentStep } from './answer.ts';
import type { BeeKind, ForecastHour, Reading, Site } from './case.ts';
import { cautiousHours, hoursAround } from './cautious-hours.ts';
import { column, mapColumn } from './columns.ts';
import { prepareBees, type BeeSteps } from './prepare-bees.ts';
import { prepareDirection, type DirectionSteps } from './prepare-direction.ts';
import { hourMs, tableOf, type HourTable } from './hours.ts';
import { morningOf, stepMs, type Morning } from './morning.ts';
import { learnSiteWindFactor, type SiteWindFactor } from './site-factor.ts';

/** Hours of forecast looked at after local noon: the longest dry spell a plan may ask for. */
const hoursAfterNoon = 73;
/** Given radiation may exceed the clear-sky formula by so much (thin air, cloud edges); beyond it the value contradicts the sun. */
const mostOverClearSky = 1.3;
const stepsPerHour = hourMs / stepMs;

export type InversionStep = AssessmentStep['inversion'];

/**
 * One morning's weather on 5-minute steps, ready to be judged by any number of plans. NaN = unknown.
 * Hourly states are interpolated linearly, wind direction as a vector; rain, its chance and gusts stay hourly.
 */
export interface PreparedMorning {
  morning: Morning;
  hours: HourTable;
  siteFactor: SiteWindFactor | null;
  temperatureC: Float64Array;
  /** Wind at 10 m, with the site's learned factor. */
  windMs: Float64Array;
  /** The same at another height, by the FAO-56 profile [fao56, eq. 47]; made once for all plans of that height. */
  windAtMs(heightM: number): Float64Array;
  /** Gust at 10 m: the hour's greatest, at least the mean wind. A site factor above 1 raises it, one below 1 does not lower it. */
  gustMs: Float64Array;
  direction: DirectionSteps;
  deltaTC: Float64Array;
  radiationWm2: Float64Array;
  /** Steps whose radiation was estimated from the sun's altitude and cloud [kastenCzeplak1980]. */
  radiationIsEstimated: boolean;
  /** Inversion at every step as the forecast shows it, its evidence in a person's units; made once for all plans. */
  inversionSteps(units: UnitSystem): readonly InversionStep[];
  /** As judged: gaps in the forecast are taken for the weather that makes inversions and wet leaves. */
  inversionLikelihood: Float64Array;
  foliageWetness: Float64Array;
  foliageDriesAt(afterMs: number): number | null;
  bees: Readonly<Record<BeeKind, BeeSteps>>;
}

/** What a morning is prepared from. */
export interface Weather {
  site: Site;
  /** Local calendar date, `YYYY-MM-DD`. */
  date: string;
  /** In order, one per hour, start of hour in UTC. */
  hours: readonly ForecastHour[];
  readings?: readonly Reading[];
  /** What hang tests and two-height readings have taught about inversions here. */
  learned?: LearnedSite;
}

/** Interpolates an hourly state onto the steps; unknown wherever one of the two hours is. */
function onSteps(morning: Morning, hourly: Float64Array, factor = 1): Float64Array {
  const steps = column(morning.count);
  for (let step = 0; step < morning.count; step += 1) {
    const grid = step + morning.offsetSteps;
    const hour = Math.floor(grid / stepsPerHour);
    const share = (grid % stepsPerHour) / stepsPerHour;
    const from = hourly[hour]!;
    steps[step] = factor * (share === 0 ? from : from + (hourly[hour + 1]! - from) * share);
  }
  return steps;
}

/**
 * Prepares a morning once for all plans: sun, steps, interpolation, derived weather.
 * @param morning the layout of the date, when it is at hand already (ensemble members share it)
 * @throws RangeError for an unknown zone; shapes and ranges are checked by `parseCase` before
 */
export function prepareMorning(weather: Weather, morning: Morning = morningOf(weather.site, weather.date)): PreparedMorning {
  const { hours } = weather;
  const table = tableOf(hours, morning.firstHourMs, morning.hourCount + hoursAfterNoon);
  const siteFactor = learnSiteWindFactor(hours, weather.readings ?? []);
  const temperatureC = onSteps(morning, table.temperatureC);
  const windMs = onSteps(morning, table.windMs, siteFactor?.factor ?? 1);
  const sky = radiationOnSteps(morning, table);
  const night = nightOnSteps(morning, hoursAround(hours, morning.startMs), weather.learned);
  return {
    morning,
    hours: table,
    siteFactor,
    temperatureC,
    windMs,
    windAtMs: windAtHeights(windMs),
    gustMs: gustsOnSteps(morning, table, windMs, siteFactor),
    direction: prepareDirection(morning, table, windMs),
    deltaTC: deltaTOnSteps(morning, table, temperatureC),
    radiationWm2: sky.radiationWm2,
    radiationIsEstimated: sky.isEstimated,
    ...night,
    bees: prepareBees(morning, table, { temperatureC, windMs, radiationWm2: sky.radiationWm2, brightestWm2: sky.brightestWm2 }),
  };
}

function windAtHeights(windMs: Float64Array): (heightM: number) => Float64Array {
  const known = new Map<number, Float64Array>();
  return (heightM) => {
    let wind = known.get(heightM);
    if (!wind) {
      const factor = windProfileFactor(10, heightM);
      known.set(heightM, (wind = mapColumn(windMs, (speedMs) => speedMs * factor)));
    }
    return wind;
  };
}

type Night = Pick<PreparedMorning, 'inversionSteps' | 'inversionLikelihood' | 'foliageWetness' | 'foliageDriesAt'>;

/** Inversion and wet leaves on the steps; where the forecast has gaps the judged values are those of the worst weather in the gaps. */
function nightOnSteps(morning: Morning, hours: readonly ForecastHour[], learned: LearnedSite | undefined): Night {
  const { site, sunAltitudeDegAt } = morning;
  const inversion = prepareInversion({ site, hours, sunAltitudeDegAt, learned });
  const foliage = prepareFoliage({ site, hours, sunAltitudeDegAt });
  const inversionLikelihood = onTimes(morning, (ms) => inversion.at(ms).likelihood);
  const foliageWetness = onTimes(morning, (ms) => foliage.at(ms).wetness);
  const filled = cautiousHours(hours, sunAltitudeDegAt);
  if (filled) {
    const worstInversion = prepareInversion({ site, hours: filled, sunAltitudeDegAt, learned });
    const worstFoliage = prepareFoliage({ site, hours: filled, sunAltitudeDegAt });
    raise(inversionLikelihood, onTimes(morning, (ms) => worstInversion.at(ms).likelihood));
    raise(foliageWetness, onTimes(morning, (ms) => worstFoliage.at(ms).wetness));
  }
  const steps: Partial<Record<UnitSystem, InversionStep[]>> = {};
  const stepsIn = (units: UnitSystem): InversionStep[] =>
    Array.from(morning.stepStartsMs(), (ms) => {
      const { likelihood, stabilityClass, messages } = inversion.at(ms);
      return { likelihood, stabilityClass, evidence: messages.map((message) => inEnglish(message, units)) };
    });
  return { inversionSteps: (units) => (steps[units] ??= stepsIn(units)), inversionLikelihood, foliageWetness, foliageDriesAt: (afterMs) => foliage.driesAt(afterMs) };
}

function onTimes(morning: Morning, at: (epochMs: number) => number | null): Float64Array {
  const values = column(morning.count);
  for (let step = 0; step < morning.count; step += 1) values[step] = at(morning.startMs + step * stepMs) ?? NaN;
  return values;
}

/** Raises known values to others; what was unknown stays so. */
function raise(values: Float64Array, to: Float64Array): void {
  for (let step = 0; step < values.length; step += 1) if (to[step]! > values[step]!) values[step] = to[step]!;
}

function gustsOnSteps(morning: Morning, table: HourTable, windMs: Float64Array, siteFactor: SiteWindFactor | null): Float64Array {
  const raise = Math.max(1, siteFactor?.factor ?? 1);
  const gusts = column(morning.count);
  for (let step = 0; step < morning.count; step += 1) {
    const gust = table.gustOfMs[Math.floor((step + morning.offsetSteps) / stepsPerHour)]! * raise;
    // Math.max gives NaN when either is unknown: a gust cannot be told without the wind that it is checked against.
    gusts[step] = Math.max(gust, windMs[step]!);
  }
  return gusts;
}

function deltaTOnSteps(morning: Morning, table: HourTable, temperatureC: Float64Array): Float64Array {
  const pressureKpa = stationPressureKpa(morning.site.elevationM);
  const dewPoint = onSteps(morning, table.dewPointC);
  const deltaT = column(morning.count);
  let depression = NaN;
  for (let step = 0; step < morning.count; step += 1) {
    // Five minutes change little: the step before gives the first guess.
    depression = deltaTC(temperatureC[step]!, saturationVapourPressureKpa(dewPoint[step]!), pressureKpa, depression);
    deltaT[step] = depression;
  }
  return deltaT;
}

interface Sky {
  radiationWm2: Float64Array;
  /** The given radiation, or the most that the sun allows where none is given. */
  brightestWm2: Float64Array;
  isEstimated: boolean;
}

/** An hour's mean radiation is spread over its steps in proportion to the clear-sky radiation, so that the hour's sum stays. */
function radiationOnSteps(morning: Morning, table: HourTable): Sky {
  const cloud = onSteps(morning, table.cloudPct);
  const clearness = column(morning.hourCount);
  for (let hour = 0; hour < morning.hourCount; hour += 1) clearness[hour] = clearnessOf(table, hour, morning.clearSkyOfHourWm2[hour]!);
  const radiationWm2 = column(morning.count);
  const brightestWm2 = column(morning.count);
  let isEstimated = false;
  for (let step = 0; step < morning.count; step += 1) {
    const hour = Math.floor((step + morning.offsetSteps) / stepsPerHour);
    const clear = morning.clearSkyWm2[step]!;
    const known = clearness[hour]! * clear;
    if (!Number.isNaN(known)) {
      radiationWm2[step] = known;
      brightestWm2[step] = known;
      continue;
    }
    radiationWm2[step] = radiationUnderCloudWm2(morning.sunAltitudeDeg[step]!, cloud[step]!);
    brightestWm2[step] = mostOverClearSky * clear;
    if (clear > 5) isEstimated = true;
  }
  return { radiationWm2, brightestWm2, isEstimated };
}

/** Share of the clear-sky radiation in an hour; NaN when it is unknown or contradicts the sun. */
function clearnessOf(table: HourTable, hour: number, clearWm2: number): number {
  const given = table.radiationOfWm2[hour]!;
  if (clearWm2 < 1 && given > 60) {
    table.contradictions.add('sunlightAtNight');
    return NaN;
  }
  if (given > mostOverClearSky * clearWm2 + 150) {
    table.contradictions.add('sunlightTooStrong');
    return NaN;
  }
  if (clearWm2 < 1) return Number.isNaN(given) ? NaN : 1;
  return Math.min(mostOverClearSky, given / clearWm2);
}
