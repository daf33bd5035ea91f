import { within } from '../atmosphere/validity.ts';

const gravityMs2 = 9.81;
/** Water and air at 20 °C and 1013 hPa. */
const densityDifferenceKgM3 = 997;
const airDensityKgM3 = 1.204;
const airViscosityPaS = 1.813e-5;
/** Mean free path of air, m, for the slip correction of the smallest droplets. */
const meanFreePathM = 6.62e-8;

export const beardValidity = { diameterUm: [1, 1070] } as const;
export const stokesValidity = { diameterUm: [1, 60] } as const;

const slip = (diameterM: number): number => 1 + (2.51 * meanFreePathM) / diameterM;

/**
 * Fall speed of a water droplet in still air by Stokes' law [stokes1851]; a limit for small droplets.
 * @param diameterUm µm, 1–60 (20 % too fast at 100 µm)
 * @returns m/s; NaN outside the validity
 */
export function stokesFallSpeedMs(diameterUm: number): number {
  if (!within(diameterUm, stokesValidity.diameterUm)) return NaN;
  const d = diameterUm * 1e-6;
  return (densityDifferenceKgM3 * gravityMs2 * d * d) / (18 * airViscosityPaS);
}

/**
 * Fall speed of a water droplet in still air [beard1976, 19 µm–1.07 mm; below that Stokes with slip].
 * @param diameterUm µm, 1–1070
 * @returns m/s at 20 °C and 1013 hPa; NaN outside the validity
 */
export function fallSpeedMs(diameterUm: number): number {
  if (!within(diameterUm, beardValidity.diameterUm)) return NaN;
  const d = diameterUm * 1e-6;
  if (diameterUm < 19) return stokesFallSpeedMs(diameterUm) * slip(d);
  const x = Math.log((4 * airDensityKgM3 * densityDifferenceKgM3 * gravityMs2 * d ** 3) / (3 * airViscosityPaS ** 2));
  const y = -3.18657 + x * (0.992696 + x * (-1.53193e-3 + x * (-9.87059e-4 + x * (-5.78878e-4 + x * (8.55176e-5 + x * -3.27815e-6)))));
  const reynolds = slip(d) * Math.exp(y);
  return (airViscosityPaS * reynolds) / (airDensityKgM3 * d);
}

/** Measured fall speeds [gunnKinzer1949, from memory]: diameter µm → m/s. */
export const gunnKinzerMs: ReadonlyMap<number, number> = new Map([
  [100, 0.27],
  [200, 0.72],
  [300, 1.17],
  [400, 1.62],
  [500, 2.06],
  [600, 2.47],
  [800, 3.27],
  [1000, 4.03],
]);
