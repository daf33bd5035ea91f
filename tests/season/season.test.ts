/** Whole seasons of observed hours: a typical year (NREL TMY3), a mast (US EPA AERMOD case) and a crop field (cercospoRa), from public repositories. */
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readAnswer, caseFromForecast } from '../../server/forecasts/case-from-forecast.ts';
import { assess, headlineOf } from '../../shared/assessment/index.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { parseCase } from '../../shared/assessment/problems.ts';
import { readRecord } from './record.ts';
import { byMonth, caseOfDate, judgeSeason, usualPlan } from './season.ts';

const folder = '../shared/data';
const noData = 'the data folder is not here';
const records = [
  ['a typical year of Greensboro NC', 'tmy3_greensboro/723170TYA.CSV', 365],
  ['half a year at the mast of Lovett NY', 'mast_lovett/odd_months.SFC', 180],
  ['eleven months of a crop field near Göttingen', 'field_goettingen/weathr.csv', 330],
] as const;

/** A small seeded generator (Lehmer), so that a failure repeats. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 48_271) % 2_147_483_647) / 2_147_483_647;
}

describe.each(records)('%s', (_name, file, days) => {
  const path = `${folder}/${file}`;

  it('is assessed on every morning, each an answer with its reason', (context) => {
    if (!existsSync(path)) return context.skip(noData);
    const record = readRecord(path);
    const mornings = judgeSeason(record);
    expect(mornings.length).toBeGreaterThanOrEqual(days);
    for (const { answer } of mornings) {
      expect(answer.reasons.length).toBeGreaterThan(0);
      expect(answer.steps.length).toBeGreaterThan(20);
      expect(headlineOf(answer, { units: 'us', timeZone: record.site.timeZone })).toMatch(answer.verdict === 'go' ? /^Go: start at / : /^Hold: .+\.$/);
    }
    const rows = byMonth(mornings);
    for (const { mornings: all, fit, notEnough, boundBy } of rows) expect([...boundBy.values()].reduce((sum, count) => sum + count, fit + notEnough)).toBe(all);
    expect(rows.reduce((sum, { fit }) => sum + fit, 0)).toBeGreaterThan(20);
  });

  it('makes cases that the parser accepts', (context) => {
    if (!existsSync(path)) return context.skip(noData);
    const record = readRecord(path);
    for (const date of record.dates.filter((_, index) => index % 20 === 0)) {
      const parsed = parseCase(JSON.parse(JSON.stringify(caseOfDate(record, date, usualPlan(record)))));
      expect(parsed.ok, parsed.ok ? '' : JSON.stringify(parsed.problems[0])).toBe(true);
    }
  });

  it('with 5 % of its values removed at random turns no hold into a go', (context) => {
    if (!existsSync(path)) return context.skip(noData);
    const record = readRecord(path);
    const plan = usualPlan(record);
    const random = seeded(20261201);
    const torn = record.hours.map((hour) => Object.fromEntries(Object.entries(hour).map(([field, value]) => [field, field !== 'time' && random() < 0.05 ? null : value])) as unknown as ForecastHour);
    const turned: string[] = [];
    let lost = 0;
    for (const date of record.dates) {
      const whole = assess(caseOfDate(record, date, plan)).verdict;
      const verdict = assess(caseOfDate(record, date, plan, torn)).verdict;
      if (whole === 'hold' && verdict === 'go') turned.push(date);
      if (whole === 'go' && verdict === 'hold') lost += 1;
    }
    expect(turned).toEqual([]);
    expect(lost).toBeGreaterThan(0);
  });
});

describe('a real answer of each provider', () => {
  const limits = { windMaxMs: 4.47, windMinMs: 0.67, inversionMax: 0.5, rainFreeHours: 4, foliageDry: true };
  it.for([
    ['nws', 'nws/detailed_forecast.json', '2022-02-05', 'America/New_York'],
    ['metNorway', 'metno/lat51.5lon-0.1altitude25_complete.json', '2020-07-21', 'Europe/London'],
    ['openMeteo', 'open_meteo/forecast_height_levels.json', '2026-10-04', 'Europe/London'],
  ] as const)('(%s) is assessed to an answer with a reason', ([provider, file, date, timeZone], context) => {
    const path = `${folder}/${file}`;
    if (!existsSync(path)) return context.skip(noData);
    const body = JSON.parse(readFileSync(path, 'utf8')) as { data?: unknown };
    const { place, hours } = readAnswer(provider, body.data ?? body);
    const answer = assess(caseFromForecast(hours, { site: { ...place, elevationM: place.elevationM ?? 0, timeZone }, date, minutesNeeded: 30, limits }));
    expect(['go', 'hold']).toContain(answer.verdict);
    expect(answer.reasons.length).toBeGreaterThan(0);
    // London's answer tells no chance of rain, the shortened one no wind: neither may be taken for good.
    if (provider !== 'nws') expect(answer.verdict).toBe('hold');
  });
});

describe('npm run season', () => {
  const run = (...args: string[]) => spawnSync(process.execPath, ['--import', 'tsx', 'tests/season/season-command.ts', ...args], { encoding: 'utf8' });

  it('prints a row for each month and one for all', (context) => {
    const path = `${folder}/tmy3_greensboro/723170TYA.CSV`;
    if (!existsSync(path)) return context.skip(noData);
    const { status, stdout } = run(path);
    expect(status).toBe(0);
    expect(stdout.match(/^\d{4}-\d\d .*$/gm)).toHaveLength(12);
    expect(stdout).toMatch(/^all +365 /m);
  });

  it('says what it takes when it is given nothing, or a file that is no record', () => {
    expect(run()).toMatchObject({ status: 2 });
    const { status, stderr } = run('package.json');
    expect(status).toBe(2);
    expect(stderr).toContain('is no hourly record');
  });
});
