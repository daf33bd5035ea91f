/** `npm run validate:foliage`: how good the estimate of wet leaves is, each month said by a film and weights chosen without it. */
import { coefficients } from '../../shared/atmosphere/foliage/coefficients.ts';
import { dryingMornings } from './drying.ts';
import { hasField, type FieldHour } from './field.ts';
import { hoursCsv, reliabilityCsv, reliabilitySvg, writeFigure } from './figures.ts';
import { chooseFilm, faultyDays, fitFoliage, foliageHours, foliageRows, isJudged, logitOfRow, type FoliageRow } from './foliage-fitting.ts';
import { logistic } from './logistic.ts';
import { markdown, reliability, rocArea, scoresOf } from './scores.ts';

const hourMs = 3_600_000;
interface Said {
  row: FoliageRow;
  logit: number;
}
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
  const said: Said[] = [];
  const onAllDays: Said[] = [];
  for (const month of months) {
    const film = chooseFilm(hours, month);
    const rows = foliageRows(hours, film);
    const fit = fitFoliage(rows.filter(({ hour }) => hour.month !== month));
    const saidOf = (from: readonly FoliageRow[]): Said[] => from.filter(({ hour }) => hour.month === month).map((row) => ({ row, logit: logitOfRow(fit, row.features) }));
    said.push(...saidOf(rows));
    onAllDays.push(...saidOf(foliageRows(hours, film, new Set())));
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
  say(allDaysWords(onAllDays, hours.filter((hour) => isJudged(hour) && !Number.isNaN(hour.leafWetnessPct))));
  const tenths = reliability(chances, wet);
  writeFigure('foliage-reliability.csv', reliabilityCsv(tenths));
  writeFigure('foliage-reliability.svg', reliabilitySvg('Wet leaves, 03–10 UTC', tenths));
  writeFigure('foliage-hours.csv', hoursCsv(judged.map(({ row }, index) => ({ at: row.hour.hour.time, said: chances[index]!, happened: row.isWet }))));
  say('### Reliability\n');
  say(markdown(['said', 'hours', 'mean said', 'happened', 'difference'], tenths.map((tenth) => [`${tenth.from.toFixed(1)}–${(tenth.from + 0.1).toFixed(1)}`, tenth.hours, tenth.said.toFixed(2), tenth.happened.toFixed(2), (tenth.happened - tenth.said).toFixed(2)])));
  const { mornings, neverSaidDry } = dryingMornings(said);
  const errors = mornings.map(({ observedMs, saidMs }) => (saidMs - observedMs) / hourMs);
  say('\n### When leaves dry (mornings wet at 03 that dry by 12 UTC)\n');
  say(markdown(['mornings', 'median error, h', 'mean of said less observed, h', 'within 1 h', 'within 2 h', 'said dry over 1 h too soon', 'not said dry by 12'], [[mornings.length, median(errors.map(Math.abs)).toFixed(2), (errors.reduce((sum, error) => sum + error, 0) / errors.length).toFixed(2), ...[1, 2].map((within) => `${Math.round((100 * errors.filter((error) => Math.abs(error) <= within).length) / errors.length)} %`), `${Math.round((100 * errors.filter((error) => error < -1).length) / errors.length)} %`, neverSaidDry]]));
}
writeFigure('foliage.md', `${lines.join('\n')}\n`);

/** The record as it is, without leaving out the days of the failed logger: the set on which the catalogue's figures stand. */
function allDaysWords(all: readonly Said[], record: readonly FieldHour[]): string {
  const judged = all.filter(({ row }) => isJudged(row.hour));
  const wet = judged.map(({ row }) => row.isWet);
  const area = rocArea(judged.map(({ logit }) => logit), wet);
  const alone = rocArea(judged.map(({ row }) => row.hour.hour.relativeHumidityPct!), wet);
  const answered = new Set(judged.map(({ row }) => row.hour.epochMs));
  const silent = record.filter(({ epochMs }) => !answered.has(epochMs));
  const withSilent = [...wet, ...silent.map(({ leafWetnessPct }) => leafWetnessPct >= 50)];
  const asSaid = (silence: number): string => rocArea([...judged.map(({ logit }) => logit), ...silent.map(() => silence)], withSilent).toFixed(3);
  return `\nWith those days in, months unseen as above: ROC area ${area.toFixed(3)} (humidity alone ${alone.toFixed(3)}), ${judged.length} hours. For the other ${silent.length} of the record (humidity under 1 % or no temperature) nothing is said, which holds a morning: counted as said wet, the area is ${asSaid(Infinity)}; counted as said dry, ${asSaid(-Infinity)}.\n`;
}
