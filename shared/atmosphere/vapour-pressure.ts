import { saturationVapourPressureKpa } from './saturation-vapour-pressure.ts';

/** Psychrometer coefficients by ventilation, 1/°C [fao56, eq. 16]. */
export const psychrometerCoefficients = { aspirated: 0.000662, natural: 0.0008, still: 0.0012 } as const;

/** Vapour pressure from dew point, kPa [fao56, eq. 14]. */
export const vapourPressureFromDewPointKpa = (dewPointC: number): number => saturationVapourPressureKpa(dewPointC);

/**
 * Vapour pressure from a psychrometer [fao56, eqs. 15 and 16].
 * @param dryC dry bulb, °C @param wetC wet bulb, °C @param pressureKpa station pressure, kPa
 * @param coefficient by ventilation, 1/°C
 * @returns kPa
 */
export const vapourPressureFromPsychrometerKpa = (dryC: number, wetC: number, pressureKpa: number, coefficient: number = psychrometerCoefficients.aspirated): number =>
  saturationVapourPressureKpa(wetC) - coefficient * pressureKpa * (dryC - wetC);

/** Vapour pressure from relative humidity (0–100 %) at one temperature, kPa [fao56, eq. 10]. */
export const vapourPressureFromHumidityKpa = (temperatureC: number, relativeHumidityPct: number): number => (saturationVapourPressureKpa(temperatureC) * relativeHumidityPct) / 100;

/** Mean vapour pressure of a day from its extremes of temperature and humidity, kPa [fao56, eq. 17]. */
export const meanVapourPressureKpa = (minC: number, maxHumidityPct: number, maxC: number, minHumidityPct: number): number =>
  (vapourPressureFromHumidityKpa(minC, maxHumidityPct) + vapourPressureFromHumidityKpa(maxC, minHumidityPct)) / 2;
