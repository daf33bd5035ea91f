import { describe, expect, it } from 'vitest';
import { bibliography } from '../bibliography.ts';
import { spotsOf, type SpotCheck } from './spots.ts';
import { exampleThresholds, judge } from './thresholds.ts';
import { trendOf } from './trend.ts';

describe('a walk against the action threshold', () => {
  const threshold = { target: 'twig aphid', measure: 'incidence', value: 0.2, source: 'our own' } as const;
  const walk = (treesWith: number, treesChecked: number) => judge({ treesWith, treesChecked, perTree: [] }, threshold);

  it('says act or wait only when all of the interval does, and else how many more trees', () => {
    expect(walk(30, 60).answer).toBe('act');
    expect(walk(1, 60).answer).toBe('wait');
    const unsure = walk(3, 12);
    expect(unsure.answer).toBe('unsure');
    expect(unsure.sequential).toMatchObject({ decision: 'more' });
    expect(unsure.sequential!.moreIfClean).toBeGreaterThan(0);
  });

  it('takes counts per tree against the published three aphids a tree (Cornell, Michigan State)', () => {
    const aphids = exampleThresholds.find(({ target }) => target === 'balsam twig aphid')!;
    const of = (perTree: number[]) => judge({ treesChecked: perTree.length, treesWith: perTree.filter((count) => count > 0).length, perTree }, aphids).answer;
    expect(of([5, 6, 4, 5, 7, 5, 6, 4, 5, 6, 5, 4, 6, 5, 5])).toBe('act');
    expect(of([0, 1, 0, 0, 2, 0, 1, 0, 0, 0, 1, 0, 0, 1, 0])).toBe('wait');
    expect(of([0, 9, 0, 0, 12, 0, 1, 8, 0, 0, 7, 0, 0, 1, 0])).toBe('unsure');
    expect(() => of([])).toThrow(/perTree/);
  });

  it('has examples with a source only', () => {
    for (const { cite } of exampleThresholds) expect(Object.keys(bibliography)).toContain(cite);
    expect(exampleThresholds.map(({ target, value }) => [target, value])).toEqual([
      ['balsam twig aphid', 3],
      ['spruce spider mite', 10],
    ]);
  });
});

describe('the trend over dates', () => {
  it('is rising or falling only when the interval of the change says so', () => {
    const day = (date: string, treesWith: number, treesChecked = 50) => ({ date, treesWith, treesChecked });
    expect(trendOf([day('2026-05-01', 5), day('2026-05-15', 20)]).direction).toBe('rising');
    expect(trendOf([day('2026-05-15', 5), day('2026-05-01', 20)])).toMatchObject({ direction: 'falling', points: [{ date: '2026-05-01' }, { date: '2026-05-15' }] });
    expect(trendOf([day('2026-05-01', 5), day('2026-05-15', 6)]).direction).toBe('unclear');
    expect(trendOf([day('2026-05-01', 5)])).toMatchObject({ change: null, direction: 'unclear' });
  });

  it('takes the walks of one date together, and leaves out a date without trees', () => {
    const { points } = trendOf([{ date: '2026-05-01', treesChecked: 10, treesWith: 1 }, { date: '2026-05-01', treesChecked: 10, treesWith: 3 }, { date: '2026-05-02', treesChecked: 0, treesWith: 0 }]);
    expect(points).toMatchObject([{ treesChecked: 20, treesWith: 4, share: 0.2 }]);
  });
});

describe('spots on the map', () => {
  const origin = { longitude: -123, latitude: 45 };
  const metresNorth = 1 / 111_194.93;
  const metresEast = metresNorth / Math.cos((45 * Math.PI) / 180);
  const check = (date: string, eastM: number, northM: number, treesWith: number): SpotCheck => ({ date, longitude: origin.longitude + eastM * metresEast, latitude: origin.latitude + northM * metresNorth, treesChecked: 1, treesWith });

  it('recur when a square has the target on two walks', () => {
    const spots = spotsOf([check('2025-05-01', 12, 3, 1), check('2026-05-01', 18, 8, 1), check('2026-05-01', 45, 45, 1), check('2026-05-01', 75, 75, 0)], origin);
    expect(spots).toHaveLength(2);
    expect(spots[0]).toMatchObject({ datesWith: ['2025-05-01', '2026-05-01'], treesChecked: 2, treesWith: 2, recurs: true });
    expect(spots[1]).toMatchObject({ datesWith: ['2026-05-01'], recurs: false });
  });

  it('have their middle in the square of 10 m that the trees stand in', () => {
    const [spot] = spotsOf([check('2026-05-01', 12, 3, 1)], origin);
    expect((spot!.longitude - origin.longitude) / metresEast).toBeCloseTo(15, 3);
    expect((spot!.latitude - origin.latitude) / metresNorth).toBeCloseTo(5, 3);
  });

  it('of two trees on one walk do not recur', () => {
    expect(spotsOf([check('2026-05-01', 12, 3, 1), check('2026-05-01', 13, 3, 1)], origin)[0]).toMatchObject({ recurs: false, treesWith: 2 });
    expect(() => spotsOf([], origin, 0)).toThrow(/squareM/);
  });
});
