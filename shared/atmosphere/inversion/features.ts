import { radiationUnderCloudWm2 } from '../radiation/kasten-czeplak.ts';
import type { InversionFacts } from './evidence.ts';
import type { Series } from './series.ts';

/** Share of sunlight that short grass absorbs: albedo 0.23 [fao56, eq. 38]. */
const absorbed = 0.77;
/** Long-wave loss of the ground under a clear sky, W/m². Common practice, no source. */
const clearSkyLossWm2 = 75;
/** Share of that loss which a full cover of cloud gives back. Common practice, no source. */
const cloudShielding = 0.8;
/** Below this altitude sunlight says nothing about the sky. */
const sunTellsSkyFromDeg = 8;
/** Places whose usual wind at 10 m is above this, m/s, have their wind measured by it: so much of it as `openLandShare` says, up to `usualWindMostMs`. */
const usualWindLeastMs = 2;
const usualWindMostMs = 5;
const openLandShare = 0.5;
/** Fewer known winds than this do not tell what is usual. */
const fewestWindHours = 24;
/** Hours looked back for the night's wind and sky and for the morning's low. */
const nightHours = 12;

/** What the fit may weigh. Order is the order of the coefficients. */
export const featureNames = [
  'nightLoss',
  'sunGain',
  'wind',
  'nightWind',
  'comingWind',
  'windOnLoss',
  'warming2h',
  'warmingInSun',
  'drop',
  'riseToCome',
  'rangeInSun',
  'humidity',
  'sunToCome',
] as const;
export type FeatureName = (typeof featureNames)[number];

/** Limits within which a feature counts, and the sign that physics gives its weight (0 = either). */
export const featureRules: Readonly<Record<FeatureName, { low: number; high: number; sign: -1 | 0 | 1 }>> = {
  nightLoss: { low: 0, high: 80, sign: 1 },
  sunGain: { low: 0, high: 350, sign: -1 },
  wind: { low: -1.7, high: 2.5, sign: -1 },
  nightWind: { low: -1.7, high: 2.5, sign: -1 },
  comingWind: { low: -1.7, high: 2.5, sign: -1 },
  windOnLoss: { low: -110, high: 200, sign: -1 },
  warming2h: { low: -6, high: 6, sign: -1 },
  warmingInSun: { low: 0, high: 4, sign: -1 },
  drop: { low: 0, high: 12, sign: 1 },
  riseToCome: { low: 0, high: 18, sign: 1 },
  rangeInSun: { low: 0, high: 12, sign: 0 },
  humidity: { low: 20, high: 100, sign: 1 },
  sunToCome: { low: 0, high: 0.9, sign: -1 },
};

/** Outside the series: the fit's mean stands in. A gap inside the series is NaN, and the weight's cautious end stands in. */
export const outside = Infinity;

/** Temperature that a gap in the warm part of a day may have hidden above its surroundings, °C. */
const hiddenPeakC = 1;

/** Least of a column from hour `from` to hour `to`, gaps passed over. */
function least(column: Float64Array, from: number, to: number): number {
  let found = Infinity;
  for (let slot = Math.max(0, from); slot <= Math.min(column.length - 1, to); slot += 1) if (column[slot]! < found) found = column[slot]!;
  return found;
}

/** Greatest; `ifGap` is added where a gap may hide a greater one. */
function greatest(column: Float64Array, from: number, to: number, ifGap: number): number {
  let found = -Infinity;
  let gap = false;
  for (let slot = Math.max(0, from); slot <= Math.min(column.length - 1, to); slot += 1) {
    const value = column[slot]!;
    if (Number.isNaN(value)) gap = true;
    else if (value > found) found = value;
  }
  return gap ? found + ifGap : found;
}

/** Mean; gaps read as `gap`. */
function mean(column: Float64Array, from: number, to: number, gap: number): number {
  const start = Math.max(0, from);
  const end = Math.min(column.length - 1, to);
  let sum = 0;
  for (let slot = start; slot <= end; slot += 1) {
    const value = column[slot]!;
    sum += Number.isNaN(value) ? gap : value;
  }
  return sum / (end - start + 1);
}

/** Mean wind of the whole series, m/s; NaN when too few hours tell it. */
function usualWindOf({ windSumMs, windHours }: Series): number {
  return windHours < fewestWindHours ? NaN : windSumMs / windHours;
}

/**
 * Logarithm of a wind in the measure of the place: where air usually moves, an inversion bears more wind than in a sheltered valley.
 * Never falls as this wind rises, nor as all winds rise together.
 */
function windInMeasure(windMs: number, usualMs: number): number {
  const usual = Math.min(usualWindMostMs, Math.max(usualWindLeastMs, Number.isNaN(usualMs) ? 0 : usualMs, windMs * openLandShare));
  return Math.log(0.2 + windMs * (usualWindLeastMs / usual) ** openLandShare);
}

/** Cloud, 0–1, at an hour: as given, or by day from the share of the clear-sky radiation that arrives [kastenCzeplak1980]; NaN when neither tells. */
function cloudAt(series: Series, slot: number, altitudeDeg: number): number {
  const given = series.cloudPct[slot]!;
  if (!Number.isNaN(given)) return given / 100;
  if (altitudeDeg < sunTellsSkyFromDeg) return NaN;
  const clearness = series.shortwaveWm2[slot]! / radiationUnderCloudWm2(altitudeDeg, 0);
  return Math.min(1, Math.max(0, (1 - clearness) / 0.75)) ** (1 / 3.4);
}

/** Sunlight at an instant, W/m²: the hour before and the hour after together where given, else by sun and cloud. A gap in a given layer counts as dark. */
function sunAt(series: Series, slot: number, altitudeDeg: number, cloud: number): number {
  if (!series.hasShortwave) return altitudeDeg <= 0 ? 0 : radiationUnderCloudWm2(altitudeDeg, cloud * 100);
  const after = series.shortwaveWm2[slot]!;
  const before = slot > 0 ? series.shortwaveWm2[slot - 1]! : after;
  return Number.isNaN(after) || Number.isNaN(before) ? 0 : (after + before) / 2;
}

/**
 * Fills `into` with the features of one hour and returns its facts; null when wind or sky is not known.
 * Every wind feature rises with the wind; every one is relative to the place's own wind, minimum or range.
 */
export function featuresAt(series: Series, slot: number, altitudeDegAt: (slot: number) => number, into: Float64Array): InversionFacts | null {
  const altitudeDeg = altitudeDegAt(slot);
  const cloud = cloudAt(series, slot, altitudeDeg);
  const windMs = series.windMs[slot]!;
  if (Number.isNaN(cloud) || Number.isNaN(windMs)) return null;
  const netWm2 = absorbed * sunAt(series, slot, altitudeDeg, cloud) - clearSkyLossWm2 * (1 - cloudShielding * cloud * cloud);
  const t = series.temperatureC;
  const now = t[slot]!;
  const usual = usualWindOf(series);
  const nightWindMs = mean(series.windMs, slot - nightHours, slot, 0);
  const nightCloudPct = mean(series.cloudPct, slot - nightHours, slot, 0);
  const riseC = slot < 3 ? outside : now - least(t, slot - nightHours, slot);
  const hasDay = slot >= 6;
  const hasMorrow = slot + 6 < series.count;
  const sine = sineOf(altitudeDeg);
  const wind = windInMeasure(windMs, usual);
  const loss = Math.max(0, -netWm2);

  into[0] = loss;
  into[1] = Math.max(0, netWm2);
  into[2] = wind;
  into[3] = windInMeasure(nightWindMs, usual);
  into[4] = windInMeasure(mean(series.windMs, slot, slot + 3, 0), usual);
  into[5] = wind * loss;
  into[6] = slot < 2 ? outside : now - t[slot - 2]!;
  into[7] = slot < 1 ? outside : warmingOf(now, t[slot - 1]!) * sine;
  into[8] = hasDay ? Math.max(0, greatest(t, slot - 18, slot, hiddenPeakC) - now - 6) : outside;
  into[9] = hasMorrow ? greatest(t, slot, slot + 12, hiddenPeakC) - now : outside;
  into[10] = hasDay && hasMorrow ? (greatest(t, slot - 11, slot + 12, 0) - least(t, slot - 11, slot + 12)) * sine : outside;
  into[11] = series.humidityPct[slot]!;
  into[12] = sineOf(altitudeDegAt(slot + 2));
  return {
    altitudeDeg,
    windMs,
    cloudPct: cloud * 100,
    nightWindMs,
    nightCloudPct,
    riseC: riseC === outside || Number.isNaN(riseC) ? null : riseC,
    humidityPct: Number.isNaN(series.humidityPct[slot]!) ? null : series.humidityPct[slot]!,
    aloftC: Number.isNaN(series.aloftC[slot]!) ? null : series.aloftC[slot]!,
  };
}

/** NaN stays NaN. */
const warmingOf = (now: number, before: number): number => Math.max(0, now - before);

const sineOf = (altitudeDeg: number): number => Math.max(0, Math.sin((altitudeDeg * Math.PI) / 180));
