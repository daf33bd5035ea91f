import type { StabilityClass } from './stability-turner.ts';

/**
 * Stability class by the solar radiation / delta-T method [epa454, Table 6-7].
 * @param windMs wind at or near 10 m, m/s
 * @param isDay by day the radiation decides, by night the temperature gradient
 * @param radiationWm2 solar radiation, W/m² (day)
 * @param gradientCPerM temperature difference over height difference, 2 m to 10 m, °C/m (night)
 * @returns 'A'–'F'; null when a needed value is unknown
 */
export function srdtClass(windMs: number, isDay: boolean, radiationWm2: number, gradientCPerM: number): StabilityClass | null {
  if (!(windMs >= 0)) return null;
  if (!isDay) {
    if (Number.isNaN(gradientCPerM)) return null;
    const stable = gradientCPerM >= 0;
    if (windMs < 2) return stable ? 'F' : 'E';
    if (windMs < 2.5) return stable ? 'E' : 'D';
    return 'D';
  }
  if (Number.isNaN(radiationWm2)) return null;
  const column = radiationWm2 >= 925 ? 0 : radiationWm2 >= 675 ? 1 : radiationWm2 >= 175 ? 2 : 3;
  const row = windMs < 2 ? 'AABD' : windMs < 3 ? 'ABCD' : windMs < 5 ? 'BBCD' : windMs < 6 ? 'CCDD' : 'CDDD';
  return row[column] as StabilityClass;
}
