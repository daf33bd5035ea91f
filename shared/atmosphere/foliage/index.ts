import type { ForecastHour, Site } from '../../assessment/case.ts';

export interface FoliageInput {
  site: Pick<Site, 'latitude' | 'longitude' | 'elevationM'>;
  hours: readonly ForecastHour[];
  sunAltitudeDegAt: (epochMs: number) => number;
}

const hourMs = 3_600_000;
/** From this likelihood on, leaves count as wet. */
export const wetFrom = 0.5;
const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));

/** Water film on a leaf, mm: about what stays after rain. Common practice, no source. */
const filmMostMm = 0.2;

/** Evaporation from a wet leaf, mm per hour, by the drying power of air and the sun on it: after Dalton, coefficients by hand. */
const dryingMmPerHour = (depressionC: number, windMs: number, shortwaveWm2: number): number => 0.012 * depressionC * (1 + 0.5 * windMs) + 0.00035 * shortwaveWm2;

/**
 * How likely leaves are wet at each instant: dew when the air is near its dew point, rain that has not dried off yet.
 * Unknown where temperature or dew point is.
 */
export function prepareFoliage({ hours, sunAltitudeDegAt }: FoliageInput): { at(epochMs: number): { wetness: number | null }; driesAt(afterEpochMs: number): number | null } {
  const first = hours[0] ? Date.parse(hours[0].time) : 0;
  const logits = new Map<number, number | null>();
  let filmMm: number | null = 0;
  for (const hour of hours) {
    const slot = Math.round((Date.parse(hour.time) - first) / hourMs);
    const depressionC = hour.temperature2mC === null || hour.dewPoint2mC === null ? null : Math.max(0, hour.temperature2mC - hour.dewPoint2mC);
    const windMs = hour.windSpeed10mMs ?? 1;
    const sunWm2 = hour.shortwaveWm2 ?? Math.max(0, 600 * Math.sin((sunAltitudeDegAt(first + slot * hourMs) * Math.PI) / 180));
    logits.set(slot, depressionC === null || filmMm === null ? null : 2.4 - 1.35 * depressionC - 0.25 * windMs - 0.004 * sunWm2 + 22 * filmMm);
    if (depressionC === null) filmMm = hour.precipitationMm === null ? null : Math.min(filmMostMm, hour.precipitationMm);
    else {
      const dewMm = depressionC < 0.8 && sunWm2 < 20 ? 0.02 : 0;
      filmMm = Math.max(0, Math.min(filmMostMm, (filmMm ?? 0) + (hour.precipitationMm ?? 0) + dewMm - dryingMmPerHour(depressionC, windMs, sunWm2)));
    }
  }
  const logitAt = (epochMs: number): number | null => {
    const place = (epochMs - first) / hourMs;
    const slot = Math.floor(place);
    const share = place - slot;
    const from = logits.get(slot) ?? null;
    const to = share === 0 ? from : (logits.get(slot + 1) ?? null);
    return from === null || to === null ? null : from + share * (to - from);
  };
  const stepMs = 300_000;
  return {
    at(epochMs) {
      const logit = logitAt(epochMs);
      return { wetness: logit === null ? null : logistic(logit) };
    },
    driesAt(afterEpochMs) {
      for (let at = afterEpochMs; at < afterEpochMs + 24 * hourMs; at += stepMs) {
        const logit = logitAt(at);
        if (logit === null) return null;
        if (logit < Math.log(wetFrom / (1 - wetFrom))) return at;
      }
      return null;
    },
  };
}
