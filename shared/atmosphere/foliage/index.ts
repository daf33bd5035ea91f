import type { ForecastHour, Site } from '../../assessment/case.ts';
import { coefficients } from './coefficients.ts';
import { featureNames, stepHour, type Moisture } from './features.ts';

export interface FoliageInput {
  site: Pick<Site, 'latitude' | 'longitude' | 'elevationM'>;
  hours: readonly ForecastHour[];
  sunAltitudeDegAt: (epochMs: number) => number;
}

const hourMs = 3_600_000;
const longestLookMs = 24 * hourMs;
/** From this likelihood on, leaves count as wet. */
export const wetFrom = 0.5;
const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));
const logitWetFrom = Math.log(wetFrom / (1 - wetFrom));

/**
 * How likely leaves are wet at each instant: a film of water that rain fills and that the energy balance of a leaf feeds with dew or
 * dries off, and how near the air is to its dew point, weighed by a logistic regression fitted on a leaf-wetness record
 * (`npm run fit:foliage`). Unknown where temperature or humidity is; between hours the logit is interpolated.
 */
export function prepareFoliage({ hours, sunAltitudeDegAt }: FoliageInput): { at(epochMs: number): { wetness: number | null }; driesAt(afterEpochMs: number): number | null } {
  const firstMs = hours[0] ? Date.parse(hours[0].time) : 0;
  /** Logits by hour of the grid, made in order as they are asked for; NaN = unknown. */
  const logits: number[] = [];
  const features = new Float64Array(featureNames.length);
  const moisture: Moisture = { filmMm: 0 };
  const last = hours.at(-1);
  const isWhole = last !== undefined && Math.round((Date.parse(last.time) - firstMs) / hourMs) === hours.length - 1;
  let next = 0;

  const takeNext = (): void => {
    const hour = hours[next]!;
    const slot = isWhole ? next : Math.round((Date.parse(hour.time) - firstMs) / hourMs);
    next += 1;
    // What fell or dried in hours left out is not known: leaves count as wet after them.
    if (slot > logits.length) moisture.filmMm = coefficients.film.rainMostMm;
    while (logits.length < slot) logits.push(NaN);
    const isKnown = stepHour(hour, sunAltitudeDegAt, firstMs + slot * hourMs, coefficients.film, moisture, features);
    let logit = NaN;
    if (isKnown) {
      logit = coefficients.base;
      for (let f = 0; f < features.length; f += 1) logit += coefficients.weights[f]! * features[f]!;
    }
    logits.push(logit);
  };

  const logitOfHour = (slot: number): number => {
    while (logits.length <= slot && next < hours.length) takeNext();
    return logits[slot] ?? NaN;
  };

  const logitAt = (epochMs: number): number => {
    const place = (epochMs - firstMs) / hourMs;
    const slot = Math.floor(place);
    const share = place - slot;
    const from = logitOfHour(slot);
    return share === 0 ? from : from + share * (logitOfHour(slot + 1) - from);
  };

  return {
    at(epochMs) {
      const logit = logitAt(epochMs);
      return { wetness: Number.isNaN(logit) ? null : logistic(logit) };
    },
    /** First instant from `afterEpochMs` on when leaves count as dry, epoch ms; null when that is not known or not within a day. */
    driesAt(afterEpochMs) {
      let at = afterEpochMs;
      let logit = logitAt(at);
      while (!Number.isNaN(logit) && at < afterEpochMs + longestLookMs) {
        if (logit < logitWetFrom) return at;
        const slot = Math.floor((at - firstMs) / hourMs) + 1;
        const hourEndMs = firstMs + slot * hourMs;
        const end = logitOfHour(slot);
        // Within an hour the logit runs straight: its crossing is where it falls dry.
        if (end < logitWetFrom) return Math.ceil(at + ((hourEndMs - at) * (logit - logitWetFrom)) / (logit - end)) + 1;
        at = hourEndMs;
        logit = end;
      }
      return null;
    },
  };
}
