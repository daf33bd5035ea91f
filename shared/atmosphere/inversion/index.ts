import type { ForecastHour, Site } from '../../assessment/case.ts';
import { netRadiationIndex, turnerClass } from '../stability-turner.ts';
import type { StabilityClass } from '../stability-turner.ts';
import { coefficients } from './coefficients.ts';
import { evidenceOf, type InversionFacts } from './evidence.ts';
import { featuresAt } from './features.ts';
import { logitOf } from './logit.ts';
import { seriesOf } from './series.ts';
import { exposureLogit, type LearnedSite } from './site.ts';

export interface InversionInput {
  site: Pick<Site, 'latitude' | 'longitude' | 'elevationM' | 'exposure'>;
  hours: readonly ForecastHour[];
  sunAltitudeDegAt: (epochMs: number) => number;
  /** What the grower's own hang tests and two-height readings have taught; see `learnSite`. */
  learned?: LearnedSite;
}

export interface InversionAt {
  /** Chance, 0–1, that air is warmer above than at nozzle height; null when wind or sky is not known. */
  likelihood: number | null;
  stabilityClass: StabilityClass | null;
  /** What was looked at and what it said. */
  readonly evidence: string[];
}

const hourMs = 3_600_000;
const turnerNightBelowDeg = 10;
/** Share of a measured difference's weight that a forecast one gets: models smooth the lowest air. Ours, no source. */
const forecastAloftShare = 0.3;
const aloftMostC = 3;
const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));

/** Chance of more than 1 °C between 10 and 50 m where that of any inversion has this logit, 0–1. */
const strongChance = (logit: number): number => logistic(coefficients.strong.base + coefficients.strong.slope * logit);

interface PreparedHour {
  logit: number;
  facts: InversionFacts;
}

/**
 * How likely a surface inversion is at each instant of a series: features of the ground's radiation balance, the night's cooling,
 * mixing by wind, the morning's warming and humidity, weighed by a logistic regression that was fitted on a mast
 * (`npm run fit:inversion`); then the lie of the land, a second height where one is given, and the place's own readings.
 * The work is done per hour, once it is asked for; between hours the logit is interpolated.
 */
export function prepareInversion(input: InversionInput): { at(epochMs: number): InversionAt } {
  const series = seriesOf(input.hours);
  const altitudeDegAt = (slot: number): number => input.sunAltitudeDegAt(series.firstMs + slot * hourMs);
  const placeLogit = exposureLogit[input.site.exposure ?? 'open'] + (input.learned?.logitOffset ?? 0);
  const siteWords = input.learned && input.learned.readings > 0 ? input.learned.words : null;
  const features = new Float64Array(coefficients.weights.length);
  const prepared = new Map<number, PreparedHour | null>();
  const make = (slot: number): PreparedHour | null => {
    const facts = slot < 0 || slot >= series.count ? null : featuresAt(series, slot, altitudeDegAt, features);
    if (facts === null) return null;
    const { aloftC } = facts;
    const aloft = aloftC === null ? 0 : forecastAloftShare * (coefficients.aloft.base + coefficients.aloft.perC * Math.max(-aloftMostC, Math.min(aloftMostC, aloftC)));
    return { logit: logitOf(coefficients, features) + aloft + placeLogit, facts };
  };
  const hourAt = (slot: number): PreparedHour | null => {
    let known = prepared.get(slot);
    if (known === undefined) prepared.set(slot, (known = make(slot)));
    return known;
  };
  return {
    at(epochMs) {
      const place = (epochMs - series.firstMs) / hourMs;
      const slot = Math.floor(place);
      const share = place - slot;
      const from = hourAt(slot);
      const to = share === 0 ? from : hourAt(slot + 1);
      const nearest = share < 0.5 ? from : to;
      return {
        likelihood: from && to ? logistic(from.logit + share * (to.logit - from.logit)) : null,
        stabilityClass: nearest ? turnerOf(nearest.facts) : null,
        get evidence() {
          return nearest ? evidenceOf(nearest.facts, strongChance(nearest.logit), siteWords) : [];
        },
      };
    },
  };
}

function turnerOf(facts: InversionFacts): StabilityClass | null {
  // Turner counts the first hour after sunrise as night; about ten degrees of altitude at middle latitudes.
  const isNight = facts.altitudeDeg < turnerNightBelowDeg;
  return turnerClass(facts.windMs, netRadiationIndex(facts.altitudeDeg, Math.round(facts.cloudPct / 10), null, isNight));
}
