import type { ForecastHour, Site } from '../../assessment/case.ts';
import type { UnitSystem } from '../../units/units.ts';
import { netRadiationIndex, turnerClass } from '../stability-turner.ts';
import type { StabilityClass } from '../stability-turner.ts';
import { coefficients } from './coefficients.ts';
import { evidenceOf, inEnglish, risenDeg, type Evidence, type InversionFacts, type Needed } from './evidence.ts';
import { featuresAt } from './features.ts';
import { logitOf } from './logit.ts';
import { seriesOf, type Series } from './series.ts';
import { exposureLogit, type LearnedSite } from './site.ts';

export interface InversionInput {
  site: Pick<Site, 'latitude' | 'longitude' | 'elevationM' | 'exposure'>;
  hours: readonly ForecastHour[];
  sunAltitudeDegAt: (epochMs: number) => number;
  /** What the grower's own hang tests and two-height readings have taught; see `learnSite`. */
  learned?: LearnedSite | undefined;
  /** Units of the evidence's words; metric unless said. */
  units?: UnitSystem | undefined;
}

export interface InversionAt {
  /** Chance, 0–1, that air is warmer above than at nozzle height; null when wind or sky is not known. */
  readonly likelihood: number | null;
  readonly stabilityClass: StabilityClass | null;
  /** What was looked at and what it said, in English; what is missing when there is no likelihood. Made when it is read. */
  readonly evidence: string[];
  /** The same as keys and figures, for other languages and units; see `inEnglish`. */
  readonly messages: Evidence[];
}

const hourMs = 3_600_000;
const turnerNightBelowDeg = 10;
/** Share of a measured difference's weight that a forecast one gets: models smooth the lowest air. Ours, no source. */
const forecastAloftShare = 0.3;
const aloftMostC = 3;
/** More than a straight line between hours errs. */
const exactWithinDeg = 1;
const longestMorningMs = 6 * hourMs;
const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));

/** Chance of more than 1 °C between 10 and 50 m where that of any inversion has this logit, 0–1. */
const strongChance = (logit: number): number => logistic(coefficients.strong.base + coefficients.strong.slope * logit);

/**
 * How likely a surface inversion is at each instant of a series: features of the ground's radiation balance, the night's cooling,
 * mixing by wind, the morning's warming and humidity, weighed by a logistic regression that was fitted on a mast
 * (`npm run fit:inversion`); then the lie of the land, a second height where one is given, and the place's own readings.
 * The work is done per hour, once it is asked for; between hours the logit is interpolated.
 */
export function prepareInversion(input: InversionInput): { at(epochMs: number): InversionAt } {
  const prepared = new PreparedInversion(input);
  return { at: (epochMs) => prepared.at(epochMs) };
}

/** A series with the hours of it that were asked for worked out. */
class PreparedInversion {
  readonly #input: InversionInput;
  readonly #series: Series;
  readonly #placeLogit: number;
  /** Logit and facts by hour; `undefined` = not asked for yet. */
  readonly #logits: Float64Array;
  readonly #facts: (InversionFacts | null | undefined)[];
  #sunriseMs: number | null = null;
  readonly #features = new Float64Array(coefficients.weights.length);

  constructor(input: InversionInput) {
    this.#input = input;
    this.#series = seriesOf(input.hours);
    this.#placeLogit = exposureLogit[input.site.exposure ?? 'open'] + (input.learned?.logitOffset ?? 0);
    this.#logits = new Float64Array(this.#series.count).fill(NaN);
    this.#facts = new Array<InversionFacts | null | undefined>(this.#series.count).fill(undefined);
  }

  at(epochMs: number): InversionAt {
    const place = (epochMs - this.#series.firstMs) / hourMs;
    const slot = Math.floor(place);
    const share = place - slot;
    const from = this.#logitOf(slot);
    const logit = share === 0 ? from : from + share * (this.#logitOf(slot + 1) - from);
    return new Readout(this, epochMs, Number.isNaN(logit) ? null : logistic(logit));
  }

  /** Facts of the hour nearest to an instant. */
  nearestFacts(epochMs: number): InversionFacts | null {
    const slot = Math.round((epochMs - this.#series.firstMs) / hourMs);
    this.#logitOf(slot);
    return this.#facts[slot] ?? null;
  }

  evidenceAt(epochMs: number, likelihood: number | null): Evidence[] {
    const slot = Math.round((epochMs - this.#series.firstMs) / hourMs);
    const nearest = this.nearestFacts(epochMs);
    if (likelihood === null || nearest === null) return [{ key: 'needs', params: { missing: this.#missingAt(epochMs) } }];
    const { learned } = this.#input;
    const altitudeDeg = this.#altitudeDegAt(epochMs);
    const facts = { ...nearest, altitudeDeg };
    return evidenceOf({ facts, sunUpMinutes: altitudeDeg < risenDeg ? null : this.#sunUpMinutes(epochMs), strongChance: strongChance(this.#logits[slot]!), site: learned && learned.readings > 0 ? learned : null });
  }

  get units(): UnitSystem {
    return this.#input.units ?? 'metric';
  }

  /** Between the hours' own altitudes; exact only about sunrise, where words turn on it. */
  #altitudeDegAt(epochMs: number): number {
    const place = (epochMs - this.#series.firstMs) / hourMs;
    const slot = Math.floor(place);
    const from = this.#facts[slot]!.altitudeDeg;
    const to = place === slot ? from : this.#facts[slot + 1]!.altitudeDeg;
    const altitudeDeg = from + (place - slot) * (to - from);
    return Math.abs(altitudeDeg - risenDeg) < exactWithinDeg ? this.#input.sunAltitudeDegAt(epochMs) : altitudeDeg;
  }

  /** Whole minutes since sunrise; the sunrise found last serves the rest of its morning. */
  #sunUpMinutes(epochMs: number): number | null {
    if (this.#sunriseMs === null || epochMs < this.#sunriseMs || epochMs > this.#sunriseMs + longestMorningMs) this.#sunriseMs = sunriseBefore(epochMs, this.#input.sunAltitudeDegAt);
    return this.#sunriseMs === null ? null : Math.round((epochMs - this.#sunriseMs) / 60_000);
  }

  /** What keeps the hours around an instant from being judged. */
  #missingAt(epochMs: number): Needed {
    const place = (epochMs - this.#series.firstMs) / hourMs;
    for (const slot of new Set([Math.floor(place), Math.ceil(place)])) {
      if (slot < 0 || slot >= this.#series.count) return 'hours';
      if (this.#facts[slot] === null) return Number.isNaN(this.#series.windMs[slot]!) ? 'wind' : 'sky';
    }
    return 'hours';
  }

  #logitOf(slot: number): number {
    if (slot < 0 || slot >= this.#series.count) return NaN;
    if (this.#facts[slot] === undefined) this.#make(slot);
    return this.#logits[slot]!;
  }

  #make(slot: number): void {
    const facts = featuresAt(this.#series, slot, (at) => this.#input.sunAltitudeDegAt(this.#series.firstMs + at * hourMs), this.#features);
    this.#facts[slot] = facts;
    if (facts === null) return;
    const { aloftC } = facts;
    const aloft = aloftC === null ? 0 : forecastAloftShare * (coefficients.aloft.base + coefficients.aloft.perC * Math.max(-aloftMostC, Math.min(aloftMostC, aloftC)));
    this.#logits[slot] = logitOf(coefficients, this.#features) + aloft + this.#placeLogit;
  }
}

/** One instant. What is seldom read is made only then. */
class Readout implements InversionAt {
  readonly #prepared: PreparedInversion;
  readonly #epochMs: number;

  constructor(
    prepared: PreparedInversion,
    epochMs: number,
    readonly likelihood: number | null,
  ) {
    this.#prepared = prepared;
    this.#epochMs = epochMs;
  }

  get stabilityClass(): StabilityClass | null {
    const facts = this.#prepared.nearestFacts(this.#epochMs);
    return facts ? turnerOf(facts) : null;
  }

  get messages(): Evidence[] {
    return this.#prepared.evidenceAt(this.#epochMs, this.likelihood);
  }

  get evidence(): string[] {
    return this.messages.map((message) => inEnglish(message, this.#prepared.units));
  }
}

/** When the sun last passed its rising altitude, epoch ms; null when it is down, or rose longer ago than a morning lasts. */
function sunriseBefore(epochMs: number, sunAltitudeDegAt: (epochMs: number) => number): number | null {
  if (sunAltitudeDegAt(epochMs) < risenDeg) return null;
  let up = epochMs;
  let down = epochMs - hourMs;
  while (sunAltitudeDegAt(down) >= risenDeg) {
    up = down;
    down -= hourMs;
    if (down < epochMs - longestMorningMs) return null;
  }
  while (up - down > 10_000) {
    const middle = (up + down) / 2;
    if (sunAltitudeDegAt(middle) >= risenDeg) up = middle;
    else down = middle;
  }
  return up;
}

function turnerOf(facts: InversionFacts): StabilityClass | null {
  // Turner counts the first hour after sunrise as night; about ten degrees of altitude at middle latitudes.
  const isNight = facts.altitudeDeg < turnerNightBelowDeg;
  return turnerClass(facts.windMs, netRadiationIndex(facts.altitudeDeg, Math.round(facts.cloudPct / 10), null, isNight));
}
