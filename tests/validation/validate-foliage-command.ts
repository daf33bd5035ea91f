/** `npm run validate:foliage`: how good the estimate of wet leaves is, each month said by a film and weights chosen without it. */
import { mkdirSync, writeFileSync } from 'node:fs';
import { coefficients } from '../../shared/atmosphere/foliage/coefficients.ts';
import { dryingMornings } from './drying.ts';
import { hasField } from './field.ts';
import { chooseFilm, faultyDays, fitFoliage, foliageHours, foliageRows, isJudged, logitOfRow, type FoliageRow } from './foliage-fitting.ts';
import { logistic } from './logistic.ts';
import { markdown, reliability, rocArea, scoresOf } from './scores.ts';

const hourMs = 3_600_000;
const lines: string[] = [];
const say = (text: string): void => {
  lines.push(text);
  console.log(text);
};
const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length / 2;
  return sorted.length % 2 ? sorted[Math.floor(middle)]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
};

if (!hasField()) say('skipped: ../shared/data/field_goettingen is not here');
else {
  const hours = foliageHours();
  const months = [...new Set(hours.map(({ month }) => month))];
  const said: { row: FoliageRow; logit: number }[] = [];
  for (const month of months) {
    const rows = foliageRows(hours, chooseFilm(hours, month));
    const fit = fitFoliage(rows.filter(({ hour }) => hour.month !== month));
    said.push(...rows.filter(({ hour }) => hour.month === month).map((row) => ({ row, logit: logitOfRow(fit, row.features) })));
  }
  const judged = said.filter(({ row }) => isJudged(row.hour));
  const wet = judged.map(({ row }) => row.isWet);
  const chances = judged.map(({ logit }) => logistic(logit));
  const humidity = judged.map(({ row }) => row.hour.hour.relativeHumidityPct!);
  say(`## Wet leaves, labels 03–10 UTC, May to October (coefficients in use: ${coefficients.madeOf.rows} hours, ${coefficients.madeOf.date})\n`);
  say(`${faultyDays(hours).size} days are left out on which the logger says a humidity of 0 % (from 24 October on the leaf sensor says 100 all day).\n`);
  const rows = [null, ...months].map((month) => {
    const here = judged.flatMap(({ row }, index) => (month === null || row.hour.month === month ? [index] : []));
    const scores = scoresOf(here.map((index) => chances[index]!), here.map((index) => wet[index]!));
    const alone = rocArea(here.map((index) => humidity[index]!), here.map((index) => wet[index]!));
    return [month ?? 'all', scores.hours, `${Math.round(100 * scores.share)} %`, scores.area.toFixed(3), alone.toFixed(3), scores.brier.toFixed(3), scores.skill.toFixed(3)];
  });
  say(markdown(['month', 'hours', 'wet', 'ROC area', 'humidity alone', 'Brier', 'skill'], rows));
  const raw = rawArea(hours);
  say(`\nWith the faulty days in, as far as humidity is above 0: ROC area ${raw.area.toFixed(3)} (humidity alone ${raw.alone.toFixed(3)}), ${raw.hours} hours, weights in use.\n`);
  say('### Reliability\n');
  say(markdown(['said', 'hours', 'mean said', 'happened', 'difference'], reliability(chances, wet).map((tenth) => [`${tenth.from.toFixed(1)}–${(tenth.from + 0.1).toFixed(1)}`, tenth.hours, tenth.said.toFixed(2), tenth.happened.toFixed(2), (tenth.happened - tenth.said).toFixed(2)])));
  const { mornings, neverSaidDry } = dryingMornings(said);
  const errors = mornings.map(({ observedMs, saidMs }) => (saidMs - observedMs) / hourMs);
  say('\n### When leaves dry (mornings wet at 03 that dry by 12 UTC)\n');
  say(markdown(['mornings', 'median error, h', 'mean of said less observed, h', 'within 1 h', 'within 2 h', 'said dry over 1 h too soon', 'not said dry by 12'], [[mornings.length, median(errors.map(Math.abs)).toFixed(2), (errors.reduce((sum, error) => sum + error, 0) / errors.length).toFixed(2), ...[1, 2].map((within) => `${Math.round((100 * errors.filter((error) => Math.abs(error) <= within).length) / errors.length)} %`), `${Math.round((100 * errors.filter((error) => error < -1).length) / errors.length)} %`, neverSaidDry]]));
}
mkdirSync('.data/validation', { recursive: true });
writeFileSync('.data/validation/foliage.md', `${lines.join('\n')}\n`);

/** The record as it is, without leaving out the days of the failed logger. */
function rawArea(hours: ReturnType<typeof foliageHours>): { area: number; alone: number; hours: number } {
  const all = foliageRows(hours, coefficients.film, new Set());
  const judged = all.filter(({ hour }) => isJudged(hour));
  const wet = judged.map(({ isWet }) => isWet);
  return { area: rocArea(judged.map(({ features }) => logitOfRow({ base: coefficients.base, weights: [...coefficients.weights] }, features)), wet), alone: rocArea(judged.map(({ hour }) => hour.hour.relativeHumidityPct!), wet), hours: judged.length };
}
