import type { ForecastHour, Site } from '../../assessment/case.ts';
import { radiationUnderCloudWm2 } from '../radiation/kasten-czeplak.ts';
import { netRadiationIndex, turnerClass } from '../stability-turner.ts';
import type { StabilityClass } from '../stability-turner.ts';
import { weights } from './weights.ts';
import { evidenceOf, type InversionFacts } from './evidence.ts';

export interface InversionInput {
  site: Pick<Site, 'latitude' | 'longitude' | 'elevationM' | 'exposure'>;
  hours: readonly ForecastHour[];
  sunAltitudeDegAt: (epochMs: number) => number;
}

export interface InversionAt {
  /** Chance, 0–1, that air is warmer above than at nozzle height; null when wind or sky is not known. */
  likelihood: number | null;
  stabilityClass: StabilityClass | null;
  /** What was looked at and what it said. */
  readonly evidence: string[];
}

const hourMs = 3_600_000;
/** Hours looked back for the night's sky and wind and for the morning's minimum. */
const nightHours = 12;
const turnerNightBelowDeg = 10;
const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));

/** Radiation the ground gains (+) or loses (−), W/m²: sun absorbed less the loss to a sky of this much cloud. */
function netRadiationWm2(hour: ForecastHour, altitudeDeg: number): number | null {
  const cloud = hour.cloudCoverPct === null ? null : hour.cloudCoverPct / 100;
  const sun = hour.shortwaveWm2 ?? (cloud === null ? null : altitudeDeg <= 0 ? 0 : radiationUnderCloudWm2(altitudeDeg, cloud * 100));
  if (sun === null || Number.isNaN(sun)) return null;
  const loss = weights.clearSkyLossWm2 * (1 - weights.cloudShielding * (cloud ?? weights.cloudWhenUnknown) ** 2);
  return weights.absorbed * sun - loss;
}

interface Prepared extends InversionFacts {
  logit: number;
}

function prepareHour(hours: readonly ForecastHour[], index: number, input: InversionInput): Prepared | null {
  const hour = hours[index]!;
  const at = Date.parse(hour.time);
  const altitudeDeg = input.sunAltitudeDegAt(at);
  const net = netRadiationWm2(hour, altitudeDeg);
  if (net === null || hour.windSpeed10mMs === null) return null;
  const before = hours.slice(Math.max(0, index - nightHours), index + 1).filter((past) => at - Date.parse(past.time) <= nightHours * hourMs);
  const temperatures = before.flatMap((past) => past.temperature2mC ?? []);
  const riseC = hour.temperature2mC === null || temperatures.length < 3 ? null : hour.temperature2mC - Math.min(...temperatures);
  const mean = (values: number[]): number | null => (values.length === 0 ? null : values.reduce((sum, value) => sum + value, 0) / values.length);
  const dark = before.filter((past) => input.sunAltitudeDegAt(Date.parse(past.time)) < 0);
  const nightWindMs = mean(dark.flatMap((past) => past.windSpeed10mMs ?? []));
  const nightCloudPct = mean(dark.flatMap((past) => past.cloudCoverPct ?? []));
  const dewDepressionC = hour.temperature2mC === null || hour.dewPoint2mC === null ? null : Math.max(0, hour.temperature2mC - hour.dewPoint2mC);
  const aloftC = hour.temperature80mC === null || hour.temperature2mC === null ? null : hour.temperature80mC - hour.temperature2mC;
  const clip = (value: number, most: number): number => Math.max(-most, Math.min(most, value));
  const logit =
    weights.base +
    weights.perNetWm2 * clip(net, 400) +
    weights.perWindMs * (hour.windSpeed10mMs - weights.windMiddleMs) +
    (riseC === null ? 0 : weights.perRiseC * Math.min(8, riseC)) +
    (nightWindMs === null ? 0 : weights.perNightWindMs * (nightWindMs - weights.windMiddleMs)) +
    (nightCloudPct === null ? 0 : weights.perNightCloud * (nightCloudPct / 100 - 0.5)) +
    (dewDepressionC === null || altitudeDeg > 15 ? 0 : weights.dew * Math.max(0, 1 - dewDepressionC / 3)) +
    (aloftC === null ? 0 : weights.perAloftC * clip(aloftC, 3)) +
    weights.exposure[input.site.exposure ?? 'open'];
  return { logit, altitudeDeg, windMs: hour.windSpeed10mMs, cloudPct: hour.cloudCoverPct, nightWindMs, nightCloudPct, riseC, dewDepressionC, aloftC };
}

/**
 * How likely a surface inversion is at each instant of a series, from the balance of radiation, the wind, the night behind, the
 * rise above the minimum, dew, and a temperature difference between two heights where one is given.
 * The work is done per hour; between hours the logit is interpolated.
 */
export function prepareInversion(input: InversionInput): { at(epochMs: number): InversionAt } {
  const first = input.hours[0] ? Date.parse(input.hours[0].time) : 0;
  const prepared = new Map<number, Prepared | null>();
  const slots = new Map(input.hours.map((hour, index) => [Math.round((Date.parse(hour.time) - first) / hourMs), index]));
  const hourAt = (slot: number): Prepared | null => {
    const known = prepared.get(slot);
    if (known !== undefined) return known;
    const index = slots.get(slot);
    const made = index === undefined ? null : prepareHour(input.hours, index, input);
    prepared.set(slot, made);
    return made;
  };
  return {
    at(epochMs) {
      const place = (epochMs - first) / hourMs;
      const slot = Math.floor(place);
      const share = place - slot;
      const from = hourAt(slot);
      const to = share === 0 ? from : hourAt(slot + 1);
      const nearest = share < 0.5 ? from : to;
      const likelihood = from && to ? logistic(from.logit + share * (to.logit - from.logit)) : null;
      return {
        likelihood,
        stabilityClass: nearest ? turnerOf(nearest) : null,
        get evidence() {
          return nearest ? evidenceOf(nearest) : [];
        },
      };
    },
  };
}

function turnerOf(facts: InversionFacts): StabilityClass | null {
  if (facts.cloudPct === null) return null;
  // Turner counts the first hour after sunrise as night; about ten degrees of altitude at middle latitudes.
  const isNight = facts.altitudeDeg < turnerNightBelowDeg;
  return turnerClass(facts.windMs, netRadiationIndex(facts.altitudeDeg, Math.round(facts.cloudPct / 10), null, isNight));
}
