import { saturationVapourPressureKpa } from './saturation-vapour-pressure.ts';
import { within } from './validity.ts';

/** Over water; a wick often stays liquid a little below freezing, further down the ice bulb would be wanted. */
export const wetBulbValidity = { temperatureC: [-5, 55], pressureKpa: [45, 108] } as const;

/**
 * Wet-bulb temperature by the psychrometer equation with station pressure [ashrae2017, eq. 33], solved by Newton's method.
 * @param temperatureC air temperature in shade, °C
 * @param vapourPressureKpa actual vapour pressure, kPa, at most saturated
 * @param pressureKpa station pressure, kPa
 * @param guessC a near value, when one is known; saves steps
 * @returns °C; NaN outside the validity
 */
export function wetBulbC(temperatureC: number, vapourPressureKpa: number, pressureKpa: number, guessC = NaN): number {
  if (!within(temperatureC, wetBulbValidity.temperatureC) || !within(pressureKpa, wetBulbValidity.pressureKpa) || !(vapourPressureKpa > 0)) return NaN;
  const saturated = saturationVapourPressureKpa(temperatureC);
  if (vapourPressureKpa >= saturated) return temperatureC;
  const ratio = (0.621945 * vapourPressureKpa) / (pressureKpa - vapourPressureKpa);
  // First guess from the plain psychrometer line; one or two steps then reach 1e-4 °C.
  let wet = guessC;
  if (!(wet <= temperatureC)) wet = temperatureC - (saturated - vapourPressureKpa) / ((4098 * saturated) / (temperatureC + 237.3) ** 2 + 0.000662 * pressureKpa);
  if (wet < -35) wet = -35;
  for (let turn = 0; turn < 8; turn += 1) {
    const es = 0.6108 * Math.exp((17.27 * wet) / (wet + 237.3));
    const ws = (0.621945 * es) / (pressureKpa - es);
    const slope = (ws * (1 + ws / 0.621945) * 4098) / (wet + 237.3) ** 2;
    // (2501 − 2.326 Tw) Ws − 1.006 (T − Tw) = W (2501 + 1.86 T − 4.186 Tw)
    const miss = (2501 - 2.326 * wet) * ws - 1.006 * (temperatureC - wet) - ratio * (2501 + 1.86 * temperatureC - 4.186 * wet);
    const step = miss / ((2501 - 2.326 * wet) * slope - 2.326 * ws + 1.006 + 4.186 * ratio);
    wet -= step;
    // Newton's error is about the square of the step times 0.04 per °C: below 1e-4 °C here.
    if (Math.abs(step) < 0.04) return wet;
  }
  return wet;
}

/**
 * Delta T: dry bulb less wet bulb, the evaporation guide of spray work [grdc103].
 * @param temperatureC °C @param vapourPressureKpa kPa @param pressureKpa station pressure, kPa
 * @param guessC a near Delta T, when one is known; saves steps
 * @returns °C, 0 or more; NaN outside the validity of the wet bulb
 */
export const deltaTC = (temperatureC: number, vapourPressureKpa: number, pressureKpa: number, guessC = NaN): number => temperatureC - wetBulbC(temperatureC, vapourPressureKpa, pressureKpa, temperatureC - guessC);
