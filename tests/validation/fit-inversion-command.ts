/** Writes the inversion's coefficients: `npm run fit:inversion -- 2026-12-01` (the date to note in the file). */
import { writeFileSync } from 'node:fs';
import { featureNames } from '../../shared/atmosphere/inversion/features.ts';
import { fitInversion, rowsOf } from './fitting.ts';
import { hasMast, loadMast } from './mast.ts';

const date = process.argv[2];
if (!date || !/^\d{4}-\d{2}-\d{2}$/.test(date)) {
  console.error('Give the date to note in the file: npm run fit:inversion -- YYYY-MM-DD');
  process.exitCode = 2;
} else if (!hasMast()) console.log('skipped: ../shared/data/mast_lovett is not here; the coefficients in the repository stay');
else {
  const rows = rowsOf(loadMast());
  const used = rows.filter(({ features }) => features.every(Number.isFinite));
  const fit = fitInversion(rows);
  const figure = (value: number): number => Number(value.toPrecision(5));
  const listed = (values: readonly number[]): string => featureNames.map((name, f) => `    ${figure(values[f]!)}, // ${name}`).join('\n');
  writeFileSync(
    'shared/atmosphere/inversion/coefficients.ts',
    `/** Written by \`npm run fit:inversion\`; not to be edited by hand. Weights are per unit of the features, in their order. */
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
  madeOf: { data: 'Lovett mast, Hudson valley, 1988, odd months (US EPA AERMOD test case): T(50 m) - T(10 m) > 0.1 °C', rows: ${used.length}, date: '${date}' },
  base: ${figure(fit.base)},
  weights: [
${listed(fit.weights)}
  ],
  means: [
${listed(fit.means)}
  ],
  strong: { base: ${figure(fit.strong.base)}, slope: ${figure(fit.strong.slope)} },
  aloft: { base: ${figure(fit.aloft.base)}, perC: ${figure(fit.aloft.perC)} },
};
`,
  );
  console.log(`fitted on ${used.length} hours of ${new Set(used.map(({ month }) => month)).size} months; ${rows.length - used.length} hours with gaps left out`);
}
