/** The Magnus form serves −40..60 °C over (supercooled) water. */
const leastC = -40;
const mostC = 60;
export const saturationValidity = { temperatureC: [leastC, mostC] } as const;

/**
 * Saturation vapour pressure over water [fao56, eq. 11].
 * @param temperatureC air (or wet-bulb, or dew-point) temperature, °C
 * @returns kPa; NaN outside the validity
 */
export function saturationVapourPressureKpa(temperatureC: number): number {
  if (!(temperatureC >= leastC && temperatureC <= mostC)) return NaN;
  return 0.6108 * Math.exp((17.27 * temperatureC) / (temperatureC + 237.3));
}

/** Mean of a day's saturation vapour pressure from its extremes, kPa [fao56, eq. 12]. */
export const meanSaturationVapourPressureKpa = (maxC: number, minC: number): number => (saturationVapourPressureKpa(maxC) + saturationVapourPressureKpa(minC)) / 2;

/** Slope of the saturation curve, kPa/°C [fao56, eq. 13]. */
export const saturationSlopeKpaC = (temperatureC: number): number => (4098 * saturationVapourPressureKpa(temperatureC)) / (temperatureC + 237.3) ** 2;
