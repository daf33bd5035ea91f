import { within } from './validity.ts';

/** Sea-level pressure; the paper leaves out the cold and dry corner. */
export const stullValidity = { temperatureC: [-20, 50], relativeHumidityPct: [5, 99] } as const;

/**
 * Wet bulb by Stull's fit [stull2011, eq. 1]. A check only: 0.2–0.6 °C low in dawn air, which can flip a Delta T of 2.
 * @param temperatureC °C @param relativeHumidityPct 5–99 %
 * @returns °C at sea-level pressure; NaN outside the validity
 */
export function wetBulbStullC(temperatureC: number, relativeHumidityPct: number): number {
  const t = temperatureC;
  const rh = relativeHumidityPct;
  if (!within(t, stullValidity.temperatureC) || !within(rh, stullValidity.relativeHumidityPct)) return NaN;
  return t * Math.atan(0.151977 * Math.sqrt(rh + 8.313659)) + Math.atan(t + rh) - Math.atan(rh - 1.676331) + 0.00391838 * rh ** 1.5 * Math.atan(0.023101 * rh) - 4.686035;
}
