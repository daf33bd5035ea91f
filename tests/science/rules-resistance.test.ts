/**
 * IRAC mode of action classification v11.3 (2025): same number is the same group, successive generations should not get the same one
 * (page on modes of action); the examples of actives are from memory. Sequences are derived from these rules.
 */
import { describe, expect, it } from 'vitest';
import { findingMaker } from '../../shared/rules/findings.ts';
import { iracGroups, moaGroupsOf } from '../../shared/rules/moa-groups.ts';
import { checkRotation, checkSeasonRotation, generationOf, groupsUsed, otherGroupsOnShelf, usualGenerations, type Generations, type GroupUse } from '../../shared/rules/resistance.ts';

const find = findingMaker('us');
const use = (date: string, moaGroup: string, own: Partial<GroupUse> = {}): GroupUse => ({ blockId: 'b', date, target: 'spruce spider mite', productName: `of ${moaGroup}`, moaSystem: 'IRAC', moaGroup, ...own });
const then = (first: string, second: string) =>
  checkRotation({ ...use('2026-06-15', second), block: 'North', path: 'products.0' }, [use('2026-05-15', first)], { kind: 'starts', starts: ['2026-05-01', '2026-06-01'] }, find).map(({ key }) => key);

describe('groups over generations (IRAC)', () => {
  it.each([
    ['4A', '4D', ['sameGroupNextGeneration']],
    ['20D', '20B', ['sameGroupNextGeneration']],
    ['23', '29', []],
    ['9B', '29', ['relatedGroup']],
    ['3A + 4A', '4C', ['sameGroupNextGeneration']],
    ['3A', '3A, 4A', ['sameGroupNextGeneration']],
    ['UN', 'UN', ['groupUnknown']],
    ['4A', '', ['groupUnknown']],
  ])('%s and then %s: %j', (first, second, keys) => {
    expect(then(first, second)).toEqual(keys);
  });

  it('may take the same group several times within one generation', () => {
    const generations: Generations = { kind: 'starts', starts: ['2026-05-01', '2026-07-01'] };
    expect(checkRotation({ ...use('2026-06-15', '4A'), block: 'North', path: 'p' }, [use('2026-05-15', '4A')], generations, find)).toEqual([]);
  });

  it('look only at the same block, target and system, and one generation back', () => {
    const planned = { ...use('2026-07-15', '4A'), block: 'North', path: 'p' };
    const generations: Generations = { kind: 'starts', starts: ['2026-05-01', '2026-06-01', '2026-07-01'] };
    const of = (earlier: GroupUse) => checkRotation(planned, [earlier], generations, find);
    expect(of(use('2026-06-15', '4A'))).toHaveLength(1);
    expect(of(use('2026-05-15', '4A'))).toEqual([]);
    expect(of(use('2026-06-15', '4A', { blockId: 'c' }))).toEqual([]);
    expect(of(use('2026-06-15', '4A', { target: 'adelgid' }))).toEqual([]);
    expect(of(use('2026-06-15', '4', { moaSystem: 'FRAC' }))).toEqual([]);
  });

  it('follow a pest of one generation a year from season to season', () => {
    const yearly: Generations = { kind: 'days', days: 365, perYear: 1, from: '01-01' };
    const planned = { ...use('2026-04-20', '4A'), block: 'North', path: 'p' };
    expect(checkRotation(planned, [use('2025-05-10', '4D')], yearly, find)).toHaveLength(1);
    expect(checkRotation(planned, [use('2024-05-10', '4D')], yearly, find)).toEqual([]);
  });

  it('say product, group and date in a sentence', () => {
    const [finding] = checkRotation({ ...use('2026-06-15', '4D'), block: 'North', path: 'products.0' }, [use('2026-05-20', '4A')], usualGenerations, find);
    expect(finding).toMatchObject({ level: 'warn', source: 'practice', cite: 'iracMoa' });
    expect(finding!.text).toBe('of 4D is of group IRAC 4, as was of 4A on North on 2026-05-20, one generation before: successive generations should not get the same group.');
  });
});

describe('generations by days', () => {
  it('are consecutive within the year and over the turn of the year', () => {
    expect(generationOf('2026-01-31', usualGenerations) - generationOf('2026-01-30', usualGenerations)).toBe(1);
    expect(generationOf('2027-01-01', usualGenerations) - generationOf('2026-12-31', usualGenerations)).toBe(1);
    const fromApril: Generations = { kind: 'days', days: 45, perYear: 3, from: '04-01' };
    expect(['2026-04-01', '2026-05-16', '2026-06-30', '2027-03-31', '2027-04-01'].map((date) => generationOf(date, fromApril) - 2026 * 3)).toEqual([0, 1, 2, 2, 3]);
  });

  it('refuse a length of nothing', () => {
    expect(() => generationOf('2026-01-01', { kind: 'days', days: 0, perYear: 1, from: '01-01' })).toThrow(/days and perYear/);
  });
});

describe('a season thought through', () => {
  it('judges each planned application against those planned before it', () => {
    const generations: Generations = { kind: 'starts', starts: ['2026-05-01', '2026-06-01', '2026-07-01'] };
    const planned = ['2026-07-10 4A', '2026-06-10 23', '2026-05-10 4A'].map((text) => ({ ...use(text.slice(0, 10), text.slice(11)), block: 'North', path: text }));
    expect(checkSeasonRotation(planned, [], generations, find)).toEqual([]);
    const worse = [...planned.slice(0, 1), { ...use('2026-06-10', '4D'), block: 'North', path: 'worse' }, ...planned.slice(2)];
    expect(checkSeasonRotation(worse, [], generations, find).map(({ path }) => path)).toEqual(['worse', '2026-07-10 4A']);
  });

  it('counts groups per block, target and year, a premix in each of its groups', () => {
    expect(groupsUsed([use('2025-05-01', '4A'), use('2026-05-01', '3A+4D'), use('2026-06-01', 'UNM'), use('2026-06-01', '4A', { blockId: 'c' })], 'b', 'Spruce spider mite')).toEqual([
      { group: 'IRAC UNM', byYear: { 2026: 1 }, lastDate: '2026-06-01' },
      { group: 'IRAC 3', byYear: { 2026: 1 }, lastDate: '2026-05-01' },
      { group: 'IRAC 4', byYear: { 2025: 1, 2026: 1 }, lastDate: '2026-05-01' },
    ]);
  });

  it('names what else is on the shelf', () => {
    const shelf = ['4A', '3A + 4A', '23', 'UN', ''].map((moaGroup) => ({ moaSystem: 'IRAC', moaGroup }));
    expect(otherGroupsOnShelf(shelf, ['IRAC 4'])).toEqual([{ moaSystem: 'IRAC', moaGroup: '23' }]);
  });
});

describe('the list of groups (IRAC v11.3, from memory)', () => {
  it.each([
    ['flonicamid', '29'],
    ['bifenazate', '20D'],
    ['acequinocyl', '20B'],
    ['hexythiazox', '10A'],
    ['imidacloprid', '4A'],
    ['spirotetramat', '23'],
    ['bifenthrin', '3A'],
    ['spinosad', '5'],
  ])('%s stands in group %s', (active, code) => {
    expect(Object.entries(iracGroups).filter(([, { examples }]) => examples.includes(active)).map(([group]) => group)).toEqual([code]);
  });

  it('reads entries as people write them', () => {
    expect(moaGroupsOf('IRAC', 'Group 4A').map(({ rotates }) => rotates)).toEqual(['IRAC 4']);
    expect(moaGroupsOf('IRAC', '3a and 4a; 3A').map(({ code }) => code)).toEqual(['3A', '4A']);
    expect(moaGroupsOf('FRAC', 'M05')[0]).toEqual({ system: 'FRAC', code: 'M05', rotates: null });
    expect(moaGroupsOf('none', '4A')).toEqual([]);
  });
});
