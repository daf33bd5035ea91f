/** Heat above one threshold by a sine through the day's extremes [baskervilleEmin1969]. */
function sineAbove(minC: number, maxC: number, thresholdC: number): number {
  if (maxC <= thresholdC) return 0;
  const mean = (maxC + minC) / 2;
  if (minC >= thresholdC) return mean - thresholdC;
  const amplitude = (maxC - minC) / 2;
  const theta = Math.asin((thresholdC - mean) / amplitude);
  return ((mean - thresholdC) * (Math.PI / 2 - theta) + amplitude * Math.cos(theta)) / Math.PI;
}

/**
 * Degree days of one day by the single sine, with a horizontal upper cutoff [baskervilleEmin1969; Zalom et al. 1983].
 * Temperatures and thresholds in one unit, °C or °F; the answer is in that unit × days.
 * @param min day's minimum @param max day's maximum, not below `min`
 * @param base lower threshold @param upper upper threshold; left out = none
 * @returns 0 or more; NaN when a value is unknown or max < min
 */
export function degreeDaysSingleSine(min: number, max: number, base: number, upper = Infinity): number {
  if (!(max >= min) || Number.isNaN(base)) return NaN;
  return sineAbove(min, max, base) - (upper === Infinity ? 0 : sineAbove(min, max, upper));
}
