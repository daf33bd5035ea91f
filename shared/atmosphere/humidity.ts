import { saturationVapourPressureKpa } from './saturation-vapour-pressure.ts';
import { within } from './validity.ts';

export const dewPointValidity = { vapourPressureKpa: [0.019, 19.9] } as const;

/**
 * Dew point from vapour pressure: the inverse of [fao56, eq. 11] (Annex 3, eq. 3-11 in its rounded form, ≤ 0.01 °C apart).
 * @param vapourPressureKpa kPa
 * @returns °C; NaN outside the validity (dew points −40..60 °C)
 */
export function dewPointC(vapourPressureKpa: number): number {
  if (!within(vapourPressureKpa, dewPointValidity.vapourPressureKpa)) return NaN;
  const log = Math.log(vapourPressureKpa / 0.6108);
  return (237.3 * log) / (17.27 - log);
}

/** Dew point from temperature (°C) and relative humidity (above 0 to 100 %), °C. */
export const dewPointFromHumidityC = (temperatureC: number, relativeHumidityPct: number): number => dewPointC((saturationVapourPressureKpa(temperatureC) * relativeHumidityPct) / 100);

/** Relative humidity from temperature and dew point (°C), 0–100 %; a dew point above the temperature counts as saturated. */
export const relativeHumidityPct = (temperatureC: number, dewPointTemperatureC: number): number =>
  Math.min(100, (100 * saturationVapourPressureKpa(dewPointTemperatureC)) / saturationVapourPressureKpa(temperatureC));
