/** `npm run validate:inversion`: how good the inversion estimate is, on months it was not fitted on and on other records. */
import { extensionRules } from '../../shared/atmosphere/inversion/extension-rules.ts';
import { coefficients } from '../../shared/atmosphere/inversion/coefficients.ts';
import { acrossMonths, rowsOf, type Said } from './fitting.ts';
import { hoursCsv, reliabilityCsv, reliabilitySvg, writeFigure } from './figures.ts';
import { errorInLightWind, hasPairs, underForecastError } from './forecast-error.ts';
import { intervalsByDay, judgedOf, referenceRecipe, rowsWithoutForesight, withInnerChoice, type Interval, type Judged } from './inversion-checks.ts';
import { lowLayerOfField, wellMixedMorning } from './inversion-elsewhere.ts';
import { hasMast, loadMast, type MastHour } from './mast.ts';
import { markdown, reliability, rocArea, scoresOf, type Tenth } from './scores.ts';

const fixed = (value: number, digits = 3): string => (Number.isFinite(value) ? value.toFixed(digits) : '–');
const percent = (value: number): string => (Number.isFinite(value) ? `${Math.round(100 * value)} %` : '–');
const kinds = [
  { name: '> 0.1 °C', above: 0.1, chance: ({ likelihood }: Said) => likelihood },
  { name: '> 1 °C', above: 1, chance: ({ strong }: Said) => strong },
];
const lines: string[] = [];
const say = (text: string): void => {
  lines.push(text);
  console.log(text);
};

function scoreTable(said: readonly Said[]): string {
  const rows = kinds.flatMap(({ name, above, chance }) => {
    const happened = said.map(({ row }) => row.hour.differenceC > above);
    const byLikelihood = scoresOf(said.map(({ likelihood }) => likelihood), happened);
    const scores = scoresOf(said.map(chance), happened);
    const upper = said.filter(({ withAloft }) => withAloft !== null);
    const aloft = scoresOf(upper.map(({ withAloft }) => withAloft!), upper.map(({ row }) => row.hour.differenceC > above));
    return [
      [name, 'ground evidence', scores.hours, percent(scores.share), fixed(byLikelihood.area), fixed(scores.brier), fixed(scores.skill)],
      ...(above < 1 ? [[name, 'with T(100 m) − T(10 m)', aloft.hours, percent(aloft.share), fixed(aloft.area), fixed(aloft.brier), fixed(aloft.skill)]] : []),
    ];
  });
  return markdown(['inversion', 'evidence', 'hours', 'share', 'ROC area', 'Brier', 'skill'], rows);
}

const tenthRow = ({ from, hours, said, happened }: Tenth): string[] => [`${from.toFixed(1)}–${(from + 0.1).toFixed(1)}`, String(hours), fixed(said, 2), fixed(happened, 2), fixed(happened - said, 2)];

function byHourTable(said: readonly Said[]): string {
  return markdown(
    ['from sunrise', 'hours', '> 0.1 °C', 'said', 'ROC area', '> 1 °C', 'said', 'ROC area'],
    [-1, 0, 1, 2, 3].map((from) => {
      const here = said.filter(({ row }) => row.hour.fromSunriseH >= from && row.hour.fromSunriseH < from + 1);
      const cells = kinds.flatMap(({ above, chance }) => {
        const happened = here.map(({ row }) => row.hour.differenceC > above);
        return [percent(happened.filter(Boolean).length / here.length), percent(here.reduce((sum, one) => sum + chance(one), 0) / here.length), fixed(scoresOf(here.map(chance), happened).area, 2)];
      });
      return [`${from}…${from + 1} h`, here.length, ...cells];
    }),
  );
}

function rulesTable(said: readonly Said[], months: ReadonlyMap<number, readonly MastHour[]>): string {
  const facts = said.flatMap((one) => {
    const hours = months.get(one.row.month)!;
    const slot = hours.indexOf(one.row.hour);
    const now = one.row.hour.hour.temperature2mC;
    const wind = one.row.hour.hour.windSpeed10mMs;
    const low = Math.min(...hours.slice(Math.max(0, slot - 12), slot + 1).flatMap(({ hour }) => hour.temperature2mC ?? []));
    return now === null || wind === null ? [] : [{ inverted: one.row.hour.differenceC > 0.1, strong: one.row.hour.differenceC > 1, likelihood: one.likelihood, rule: { riseC: now - low, windMs: wind, fromSunriseH: one.row.hour.fromSunriseH } }];
  });
  const judges = [...extensionRules.map(({ name, holds }) => ({ name, holds: (fact: (typeof facts)[number]) => holds(fact.rule) })), ...[0.5, 0.3].map((limit) => ({ name: `Dawnvane, limit ${percent(limit)}`, holds: (fact: (typeof facts)[number]) => fact.likelihood > limit }))];
  const share = (part: number, whole: number): string => `${part} of ${whole} (${percent(part / whole)})`;
  return markdown(
    ['rule', 'wrong', 'said over, but inverted', 'of these > 1 °C', 'said inverted, but not'],
    judges.map(({ name, holds }) => {
      const missed = facts.filter((fact) => !holds(fact) && fact.inverted);
      const needless = facts.filter((fact) => holds(fact) && !fact.inverted);
      const inverted = facts.filter((fact) => fact.inverted).length;
      return [name, percent((missed.length + needless.length) / facts.length), share(missed.length, inverted), String(missed.filter(({ strong }) => strong).length), share(needless.length, facts.length - inverted)];
    }),
  );
}

/** How far the headline may be trusted: the same hours judged in stricter ways, and the catalogue's recipe beside it. */
function checksTable(months: ReadonlyMap<number, readonly MastHour[]>, said: readonly Said[]): string {
  const headline = said.map(({ row, likelihood }) => ({ hour: row.hour, likelihood }));
  const line = (name: string, judged: readonly Judged[]): (string | number)[] => {
    const chances = judged.map(({ likelihood }) => likelihood);
    const { hours, area, skill } = scoresOf(chances, judged.map(({ hour }) => hour.differenceC > 0.1));
    return [name, hours, fixed(area), fixed(skill), fixed(rocArea(chances, judged.map(({ hour }) => hour.differenceC > 1)))];
  };
  const within = ({ low, high }: Interval): string => `${fixed(low)} to ${fixed(high)}`;
  const { area, skill, strongArea, days } = intervalsByDay(headline);
  return markdown(['judged how', 'hours', 'ROC area > 0.1 °C', 'skill', 'ROC area > 1 °C'], [
    line('as above', headline),
    [`95 % interval, drawing ${days} whole days`, '', within(area), within(skill), within(strongArea)],
    line('nothing after the judged hour seen', judgedOf(rowsWithoutForesight(months))),
    line('ridge and importance too chosen without the month', withInnerChoice(rowsOf(months))),
    line('the reference recipe on these months (0.88 and 0.41 on the months held back)', referenceRecipe(months)),
  ]);
}

function forecastErrorTable(months: ReadonlyMap<number, readonly MastHour[]>): string {
  const size = errorInLightWind();
  const rows = underForecastError(months, size).map(({ name, area, skill, strongArea, wrong, ruleWrong }) => [name, fixed(area), fixed(skill), fixed(strongArea), percent(wrong), percent(ruleWrong)]);
  return `Size from ${size.pairs} pairs in light wind, leads 9–24 h: wind spread ${fixed(size.windSpreadMs, 2)} m/s, bias ${fixed(size.windBiasMs, 2)} m/s, temperature spread ${fixed(size.temperatureSpreadC, 2)} °C.\n\n${markdown(['error laid on the measured hours', 'ROC area > 0.1 °C', 'skill', 'ROC area > 1 °C', 'wrong at 50 %', 'wrong by "wind or 3 °F"'], rows)}`;
}

if (hasMast()) {
  const months = loadMast();
  const said = acrossMonths(rowsOf(months));
  say(`## Inversion at the mast, each month said by a fit on the other five (coefficients in use: ${coefficients.madeOf.rows} hours, ${coefficients.madeOf.date})\n`);
  say(scoreTable(said));
  say(`\n### By month, > 0.1 °C\n`);
  say(markdown(['month', 'hours', 'share', 'ROC area', 'Brier', 'skill', 'ROC area > 1 °C'], [...months.keys()].map((month) => {
    const here = said.filter(({ row }) => row.month === month);
    const scores = scoresOf(here.map(({ likelihood }) => likelihood), here.map(({ row }) => row.hour.differenceC > 0.1));
    return [month, scores.hours, percent(scores.share), fixed(scores.area), fixed(scores.brier), fixed(scores.skill), fixed(scoresOf(here.map(({ likelihood }) => likelihood), here.map(({ row }) => row.hour.differenceC > 1)).area)];
  })));
  for (const { name, above, chance } of kinds) {
    say(`\n### Reliability, ${name}\n`);
    const tenths = reliability(said.map(chance), said.map(({ row }) => row.hour.differenceC > above));
    say(markdown(['said', 'hours', 'mean said', 'happened', 'difference'], tenths.map(tenthRow)));
    writeFigure(`inversion-reliability-${above}.csv`, reliabilityCsv(tenths));
    writeFigure(`inversion-reliability-${above}.svg`, reliabilitySvg(`Inversion ${name}`, tenths));
    writeFigure(`inversion-hours-${above}.csv`, hoursCsv(said.map((one) => ({ at: one.row.hour.hour.time, said: chance(one), happened: one.row.hour.differenceC > above }))));
  }
  say('\n### By hour from sunrise\n');
  say(byHourTable(said));
  say('\n### How far to trust it\n');
  say(checksTable(months, said));
  say('\n### With a forecast\'s error on wind, temperature and cloud (all else above is on measured values)\n');
  say(hasPairs() ? forecastErrorTable(months) : 'skipped: ../shared/data/forecast_pairs_meps is not here');
  say('\n### Published rules of thumb on the same hours, > 0.1 °C\n');
  say(rulesTable(said, months));
} else say('skipped: ../shared/data/mast_lovett is not here');

say('\n## Other records in the folder\n');
say(lowLayerOfField() ?? 'skipped: ../shared/data/field_goettingen is not here');
say(wellMixedMorning() ?? 'skipped: ../shared/data/mast_nrel_m2_day is not here');
writeFigure('inversion.md', `${lines.join('\n')}\n`);
