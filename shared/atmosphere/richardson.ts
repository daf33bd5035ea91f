const gravityMs2 = 9.81;
const dryLapseCPerM = 0.0098;

/** Above about this gradient Richardson number turbulence dies out; the literature spans 0.2–1.0 [amsGlossary]. */
export const criticalRichardson = 0.25;

/**
 * Bulk Richardson number of a layer [amsGlossary]: Ri = (g/θ) Δθ Δz / (Δu)², with θ ≈ T + 0.0098 z.
 * @param lower temperature °C, wind m/s and height m at the foot @param upper the same at the top
 * @returns above 0 stable, about 0 neutral, below 0 unstable; NaN when both winds are equal or the heights are not in order
 */
export function bulkRichardson(lower: { temperatureC: number; windMs: number; heightM: number }, upper: { temperatureC: number; windMs: number; heightM: number }): number {
  const depth = upper.heightM - lower.heightM;
  const shear = upper.windMs - lower.windMs;
  if (!(depth > 0) || shear === 0) return NaN;
  const potential = (layer: typeof lower): number => layer.temperatureC + 273.15 + dryLapseCPerM * layer.heightM;
  const rise = potential(upper) - potential(lower);
  const mean = (potential(upper) + potential(lower)) / 2;
  return ((gravityMs2 / mean) * rise * depth) / (shear * shear);
}
