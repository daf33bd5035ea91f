import { saturationVapourPressureKpa } from '../saturation-vapour-pressure.ts';

/** Size of the leaf's water store and of its exchange with the air; fitted by `npm run fit:foliage` within bounds that physics sets. */
export interface FilmConstants {
  /** Water that wets leaves all over, mm: the most that dew leaves on them. */
  mostMm: number;
  /** Most water that stays on leaves after rain, mm. */
  rainMostMm: number;
  /** Heat exchange of both sides of a leaf with the air, W/m²/K: in calm air, and per root of the wind at 2 m (m/s). */
  exchangeCalm: number;
  exchangePerRootWind: number;
  /** Share of the sun that the leaves in the stand take up. */
  sunShare: number;
  /** Net long-wave loss of leaves under a clear sky, W/m²; cloud gives most of it back. */
  skyLossWm2: number;
}

/** Latent heat of one millimetre of water in an hour, W/m² [fao56, eq. 20: 2.45 MJ/kg]. */
const wm2PerMmHour = 2.45e6 / 3600;
/** Psychrometric constant near sea level, kPa/K [fao56, eq. 8]. */
const psychrometricKpaK = 0.066;
/** Share of the sky loss that full cloud gives back. Common practice, no source. */
const cloudShielding = 0.8;
/** Wind at 2 m over that at 10 m: logarithmic profile over roughness 0.05 m. */
export const windShareAt2m = Math.log(2 / 0.05) / Math.log(10 / 0.05);

export interface FilmWeather {
  temperatureC: number;
  /** Vapour pressure of the air, kPa. */
  vapourKpa: number;
  windMs: number;
  sunWm2: number;
  /** 0–1. */
  cloud: number;
}

/** Evaporation (+) from wet leaves or dew (−) on them, mm per hour: the combination equation with leaf exchange [monteith1965]. */
export function evaporationMmPerHour({ temperatureC, vapourKpa, windMs, sunWm2, cloud }: FilmWeather, film: FilmConstants): number {
  const saturationKpa = saturationVapourPressureKpa(temperatureC);
  // Slope of the saturation curve [fao56, eq. 13].
  const slopeKpaK = (4098 * saturationKpa) / (temperatureC + 237.3) ** 2;
  const netWm2 = film.sunShare * sunWm2 - film.skyLossWm2 * (1 - cloudShielding * cloud * cloud);
  const exchange = film.exchangeCalm + film.exchangePerRootWind * Math.sqrt(windMs * windShareAt2m);
  return (slopeKpaK * netWm2 + exchange * (saturationKpa - vapourKpa)) / (slopeKpaK + psychrometricKpaK) / wm2PerMmHour;
}
