/** Writes the coefficients of leaf wetness: `npm run fit:foliage -- 2026-12-01` (the date to note in the file). */
import { writeFileSync } from 'node:fs';
import { featureNames } from '../../shared/atmosphere/foliage/features.ts';
import { hasField } from './field.ts';
import { chooseFilm, fitFoliage, foliageHours, foliageRows } from './foliage-fitting.ts';

const date = process.argv[2];
if (!date || !/^\d{4}-\d{2}-\d{2}$/.test(date)) {
  console.error('Give the date to note in the file: npm run fit:foliage -- YYYY-MM-DD');
  process.exitCode = 2;
} else if (!hasField()) console.log('skipped: ../shared/data/field_goettingen is not here; the coefficients in the repository stay');
else {
  const hours = foliageHours();
  const film = chooseFilm(hours);
  const rows = foliageRows(hours, film);
  const fit = fitFoliage(rows);
  const figure = (value: number): number => Number(value.toPrecision(5));
  writeFileSync(
    'shared/atmosphere/foliage/coefficients.ts',
    `import type { FilmConstants } from './film.ts';

/** Written by \`npm run fit:foliage\`; not to be edited by hand. Weights are per unit of the features, in their order. */
export interface FoliageCoefficients {
  madeOf: { data: string; rows: number; date: string };
  film: FilmConstants;
  base: number;
  weights: readonly number[];
}

export const coefficients: FoliageCoefficients = {
  madeOf: { data: 'crop field near Göttingen, May to October 2022 (cercospoRa): leaf wetness sensor at 50 or more', rows: ${rows.length}, date: '${date}' },
  film: { ${Object.entries(film).map(([name, value]) => `${name}: ${value}`).join(', ')} },
  base: ${figure(fit.base)},
  weights: [
${featureNames.map((name, f) => `    ${figure(fit.weights[f]!)}, // ${name}`).join('\n')}
  ],
};
`,
  );
  console.log(`fitted on ${rows.length} hours`);
}
