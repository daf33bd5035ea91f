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
  base: -2.5416,
  weights: [
    0.019796, // nightLoss
    -0.0034202, // sunGain
    -0.5456, // wind
    -1.4183, // nightWind
    -0.7054, // comingWind
    -0.025627, // windOnLoss
    -0.35541, // warming2h
    -1.2779, // warmingInSun
    0.060197, // drop
    0.041568, // riseToCome
    -0.17833, // rangeInSun
    0.04618, // humidity
    -0.31939, // sunToCome
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
    2.3221, // rangeInSun
    70.954, // humidity
    0.27135, // sunToCome
  ],
  strong: { base: -2.2804, slope: 0.81073 },
  aloft: { base: 0.6525, perC: 4.9145 },
};
