/** What stands around an assessment: the next better morning, an ensemble, the check on site, the bibliography. */
import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { assess, chanceOf, checkOnSite, nextBetterMorning, prepareEnsemble, type OnSite } from '../../shared/assessment/index.ts';
import { bibliography } from '../../shared/bibliography.ts';
import { whyUnknown } from '../../shared/atmosphere/validity.ts';
import { pressureValidity } from '../../shared/atmosphere/pressure.ts';
import { caseOf, date, fairHours, site } from './cases.ts';

const windAll = (speed: number) => fairHours(() => ({ windSpeed10mMs: speed, windGust10mMs: speed * 1.5 }));
const limits = { windMaxMs: 4.4704, windHeightM: 2, rainMm: 0.2, rainProbabilityPct: 40 };

describe('the next better morning', () => {
  const short = assess(caseOf({ limits, minutesNeeded: 120, hours: fairHours((_, hour) => ({ windSpeed10mMs: hour <= 6 ? 3 : 9, windGust10mMs: 12 })) }));
  const shut = assess(caseOf({ limits, hours: windAll(9) }));
  const open = assess(caseOf({ limits, hours: windAll(3) }));
  const dark = assess(caseOf({ limits, hours: [] }));

  it('is the first go', () => {
    expect(nextBetterMorning(shut, [{ date: '2026-06-11', answer: shut }, { date: '2026-06-12', answer: open }, { date: '2026-06-13', answer: open }])).toMatchObject({ date: '2026-06-12', looks: 'go' });
  });

  it('without a go is the one that comes closer', () => {
    expect(nextBetterMorning(shut, [{ date: '2026-06-11', answer: shut }, { date: '2026-06-12', answer: short }])).toEqual({ date: '2026-06-12', looks: 'closer', longestWindowMinutes: 100 });
  });

  it('is none when all are as bad or not known', () => {
    expect(nextBetterMorning(short, [{ date: '2026-06-11', answer: shut }, { date: '2026-06-12', answer: dark }])).toBeNull();
    expect(nextBetterMorning(shut, [])).toBeNull();
  });
});

describe('an ensemble', () => {
  it('gives the share of its members in which the same plan fits, with the count', () => {
    const members = prepareEnsemble(site, date, [...Array.from({ length: 7 }, () => windAll(3)), ...Array.from({ length: 3 }, () => windAll(9))]);
    expect(chanceOf(members, { minutesNeeded: 60, reserveMinutes: 10, limits })).toEqual({ fit: 7, members: 10, share: 0.7 });
  });

  it('leaves members out that cannot be told, and gives no share without any', () => {
    const members = prepareEnsemble(site, date, [windAll(3), fairHours(() => ({ windSpeed10mMs: null }))]);
    const plan = { minutesNeeded: 60, reserveMinutes: 10, limits };
    expect(chanceOf(members, plan)).toEqual({ fit: 1, members: 1, share: 1 });
    expect(chanceOf(members.slice(1), plan)).toEqual({ fit: 0, members: 0, share: null });
  });

  it('says of each member what the assessment of it alone says', () => {
    const rows = Array.from({ length: 20 }, (_, member) => fairHours((_at, hour) => ({ windSpeed10mMs: 2 + ((member * 5 + Math.abs(hour)) % 9), windGust10mMs: 14 })));
    const plan = { minutesNeeded: 45, reserveMinutes: 0, limits };
    const alone = rows.filter((hours) => assess(caseOf({ hours, ...plan })).verdict === 'go').length;
    expect(chanceOf(prepareEnsemble(site, date, rows), plan).fit).toBe(alone);
  });
});

describe('the check on site', () => {
  const plan = { minutesNeeded: 60, reserveMinutes: 10, limits: { ...limits, windMinMs: 1.3, inversionMax: 0.5, foliageDry: true, temperatureMaxC: 29 }, sensitivePlaces: [{ name: 'House', bearingDeg: 90, distanceM: 50 }] };
  const good: OnSite = { windMs: 2.5, windHeightM: 2, windFromDeg: 0, temperatureC: 15, hangTest: 'mixed', foliageWet: false, someoneNear: false, beesFlying: false };

  it('lets a go stand when all is as it should be', () => {
    expect(checkOnSite('go', plan, good)).toEqual({ verdict: 'go', findings: [] });
  });

  it('never turns a hold into a go', () => {
    expect(checkOnSite('hold', plan, good).verdict).toBe('hold');
  });

  it.each([
    [{ windMs: 6 }, 'windOver'],
    [{ windMs: 0.5 }, 'windUnder'],
    [{ windMs: null }, 'windUnknown'],
    [{ hangTest: 'hung' }, 'airHangs'],
    [{ hangTest: null }, 'hangTestMissing'],
    [{ foliageWet: true }, 'foliageWet'],
    [{ foliageWet: null }, 'foliageWet'],
    [{ someoneNear: true }, 'someoneNear'],
    [{ someoneNear: null }, 'peopleUnchecked'],
    [{ temperatureC: 31 }, 'temperatureOut'],
    [{ windFromDeg: 270 }, 'towardPlace'],
    [{ windFromDeg: null }, 'towardPlace'],
  ] as const)('turns a go into a hold on %o', (change, finding) => {
    const { verdict, findings } = checkOnSite('go', plan, { ...good, ...change });
    expect(verdict).toBe('hold');
    expect(findings).toContain(finding);
  });

  it('holds for flying bees where the label minds them in bloom', () => {
    const inBloom = { ...plan, limits: { ...plan.limits, pollinators: { kinds: ['honeyBee' as const], bloom: true, beeStatement: 'notWhileForaging' as const } } };
    expect(checkOnSite('go', inBloom, { ...good, beesFlying: true }).findings).toEqual(['beesFlying']);
  });

  it('brings a reading at another height to that of the label', () => {
    expect(checkOnSite('go', plan, { ...good, windMs: 5.5, windHeightM: 10 }).verdict).toBe('go');
    expect(checkOnSite('go', plan, { ...good, windMs: 5.5, windHeightM: 2 }).findings).toContain('windOver');
  });
});

describe('the bibliography', () => {
  const files = readdirSync('shared', { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.ts') && !name.endsWith('.test.ts') && !name.endsWith('bibliography.ts'));
  const text = files.map((name) => readFileSync(`shared/${name}`, 'utf8')).join('\n');

  it('holds every source that the formulas cite', () => {
    const cited = [...text.matchAll(/\[([a-z]+[A-Za-z]*\d{2,4}[A-Za-z]*|matthews|windError|amsGlossary|beaufort|noaaSolar|naturalistNote|bomDeltaT|asabeS572)[,;\]]/g)].map((match) => match[1]!);
    expect(cited.length).toBeGreaterThan(40);
    expect([...new Set(cited)].filter((key) => !(key in bibliography))).toEqual([]);
  });

  it('says of each source how it came to us', () => {
    for (const { who, year, title, where, standing } of Object.values(bibliography)) {
      expect(['seen', 'memory', 'ours']).toContain(standing);
      expect(who && title && where).not.toBe('');
      expect(year).toBeGreaterThan(1800);
    }
  });
});

describe('a formula outside its validity', () => {
  it('says which input is outside and where the edge lies', () => {
    expect(whyUnknown(pressureValidity, { elevationM: 9000 })).toBe('elevationM 9000 is above 6000, where the formula does not hold');
    expect(whyUnknown(pressureValidity, { elevationM: null })).toBe('elevationM is not known');
    expect(whyUnknown(pressureValidity, { elevationM: 100 })).toBeNull();
  });
});
