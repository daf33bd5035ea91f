/** Written by `npm run fit:inversion`; not to be edited by hand. Weights are per unit of the features, in their order. */
export interface Coefficients {
  madeOf: { data: string; rows: number; date: string };
  base: number;
  weights: readonly number[];
  /** Means of the features in the fit: stand in outside of a series. */
  means: readonly number[];
  /** From the logit of more than 0.1 °C to that of more than 1 °C. */
  strong: { base: number; slope: number };
  /** A measured difference to a second height, on top of the other evidence, per °C. */
  aloft: { base: number; perC: number };
}

export const coefficients: Coefficients = {
  madeOf: { data: 'Lovett mast, Hudson valley, 1988, odd months (US EPA AERMOD test case): T(50 m) - T(10 m) > 0.1 °C', rows: 4180, date: '2026-12-01' },
  base: -2.535,
  weights: [
    0.019757, // nightLoss
    -0.0034184, // sunGain
    -0.54753, // wind
    -1.419, // nightWind
    -0.70461, // comingWind
    -0.02559, // windOnLoss
    -0.35468, // warming2h
    -1.2708, // warmingInSun
    0.0598, // drop
    0.041682, // riseToCome
    -0.18251, // rangeInSun
    0.046133, // humidity
    -0.32188, // sunToCome
  ],
  means: [
    24.5, // nightLoss
    81.286, // sunGain
    0.17044, // wind
    0.20417, // nightWind
    0.19086, // comingWind
    3.4537, // windOnLoss
    0.13211, // warming2h
    0.21078, // warmingInSun
    1.1491, // drop
    4.1291, // riseToCome
    2.2967, // rangeInSun
    70.954, // humidity
    0.27135, // sunToCome
  ],
  strong: { base: -2.2799, slope: 0.81056 },
  aloft: { base: 0.65273, perC: 4.9173 },
};
