import type { FilmConstants } from './film.ts';

/** Written by `npm run fit:foliage`; not to be edited by hand. Weights are per unit of the features, in their order. */
export interface FoliageCoefficients {
  madeOf: { data: string; rows: number; date: string };
  film: FilmConstants;
  base: number;
  weights: readonly number[];
}

export const coefficients: FoliageCoefficients = {
  madeOf: { data: 'crop field near Göttingen, May to October 2022 (cercospoRa): leaf wetness sensor at 50 or more', rows: 4224, date: '2026-12-01' },
  film: { mostMm: 0.15, rainMostMm: 0.3, exchangeCalm: 25, exchangePerRootWind: 30, sunShare: 0.5, skyLossWm2: 50 },
  base: 0.23132,
  weights: [
    1.0625, // film
    1.7362, // thinFilm
    -8.2148, // evaporation
    -0.33074, // depression
    1.3752, // smallDepression
  ],
};
