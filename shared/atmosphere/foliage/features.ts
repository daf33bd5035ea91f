import type { ForecastHour } from '../../assessment/case.ts';
import { dewPointFromHumidityC } from '../humidity.ts';
import { radiationUnderCloudWm2 } from '../radiation/kasten-czeplak.ts';
import { saturationVapourPressureKpa } from '../saturation-vapour-pressure.ts';
import { evaporationMmPerHour, type FilmConstants } from './film.ts';

/** What the fit weighs; order is the order of the coefficients. */
export const featureNames = ['film', 'thinFilm', 'evaporation', 'depression', 'smallDepression'] as const;
/** Sign that physics gives each weight. */
export const featureSigns = [1, 1, -1, -1, 1] as const;

const hourMs = 3_600_000;
/** Calm where wind is unknown: dries slowest. */
const windWhenUnknownMs = 0.3;
/** Clear where cloud is unknown: most dew. */
const cloudWhenUnknown = 0;
/** A film of this share of the fullest already wets the whole leaf. */
const thinShare = 1 / 8;

/** The film of water on the leaves, carried from hour to hour. */
export interface Moisture {
  filmMm: number;
}

const clip = (value: number, low: number, high: number): number => (value < low ? low : value > high ? high : value);

/**
 * Fills `into` with the features at the start of an hour and carries the film to its end. Where rain or humidity is not known the film
 * counts as full afterwards, so that a gap never dries leaves.
 * @returns false where temperature or humidity is not known or outside of the formulas' validity
 */
export function stepHour(hour: ForecastHour, altitudeDegAt: (epochMs: number) => number, epochMs: number, film: FilmConstants, moisture: Moisture, into: Float64Array): boolean {
  const temperatureC = hour.temperature2mC;
  const dewPointC = temperatureC === null ? null : (hour.dewPoint2mC ?? (hour.relativeHumidityPct === null ? null : dewPointFromHumidityC(temperatureC, hour.relativeHumidityPct)));
  if (temperatureC === null || dewPointC === null || Number.isNaN(dewPointC)) {
    moisture.filmMm = film.rainMostMm;
    return false;
  }
  const cloud = hour.cloudCoverPct === null ? cloudWhenUnknown : hour.cloudCoverPct / 100;
  const sunWm2 = hour.shortwaveWm2 ?? sunOf(altitudeDegAt(epochMs + hourMs / 2), hour.cloudCoverPct);
  const weather = { temperatureC, vapourKpa: saturationVapourPressureKpa(Math.min(dewPointC, temperatureC)), windMs: hour.windSpeed10mMs ?? windWhenUnknownMs, sunWm2, cloud };
  const evaporation = evaporationMmPerHour(weather, film);
  if (Number.isNaN(evaporation)) {
    moisture.filmMm = film.rainMostMm;
    return false;
  }
  const depressionC = Math.max(0, temperatureC - dewPointC);
  const share = Math.min(1, moisture.filmMm / film.mostMm);
  into[0] = share;
  into[1] = Math.min(1, share / thinShare);
  into[2] = clip(evaporation, -0.1, 0.5);
  into[3] = clip(depressionC, 0, 12);
  into[4] = Math.max(0, 1.5 - depressionC);
  moisture.filmMm = filmAfter(moisture.filmMm, hour.precipitationMm, evaporation, film);
  return true;
}

/** Film at the end of an hour, mm. Dew adds up to its own most; rain adds up to the greater one. */
function filmAfter(filmMm: number, rainMm: number | null, evaporationMm: number, film: FilmConstants): number {
  if (rainMm === null) return film.rainMostMm;
  const dewed = evaporationMm < 0 ? Math.max(filmMm, Math.min(film.mostMm, filmMm - evaporationMm)) : filmMm;
  return clip(dewed + rainMm - Math.max(0, evaporationMm), 0, film.rainMostMm);
}

const sunOf = (altitudeDeg: number, cloudPct: number | null): number => (altitudeDeg <= 0 || cloudPct === null ? 0 : radiationUnderCloudWm2(altitudeDeg, cloudPct));
