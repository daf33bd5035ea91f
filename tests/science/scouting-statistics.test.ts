/**
 * Wilson interval: Newcombe 1998 (Stat. Med. 17:857-872, table I, method 3; values from memory) and the examples in the read-me of the
 * package wilson-score-interval (read). Difference: Newcombe 1998 (17:873-890, table II, method 10; from memory). Sequential test:
 * NIST/SEMATECH e-Handbook §6.2.6 (from memory). Percent control: Abbott 1925 (read), Henderson & Tilton 1955 (formula from memory,
 * examples of two trial calculators, read).
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { abbottPct, effectOf, effectsBy, hendersonTiltonPct } from '../../shared/scouting/effect.ts';
import { incidence, incidenceDifference, meanPerTree } from '../../shared/scouting/incidence.ts';
import { planAround, sequentialAnswer, stopLines } from '../../shared/scouting/sequential.ts';

describe('incidence with its Wilson interval', () => {
  it.each([
    [81, 263, 0.2553, 0.3662],
    [15, 148, 0.0624, 0.1605],
    [0, 20, 0, 0.1611],
    [1, 29, 0.0061, 0.1718],
  ])('Newcombe 1998 (from memory): %i of %i is %f to %f', (treesWith, treesChecked, low, high) => {
    const found = incidence(treesWith, treesChecked);
    expect(found.share).toBe(treesWith / treesChecked);
    expect(found.low).toBeCloseTo(low, 4);
    expect(found.high).toBeCloseTo(high, 4);
  });

  it.each([
    [430, 474, 0.87768, 0.93012],
    [392, 436, 0.86723, 0.92396],
    [10, 14, 0.4535, 0.88279],
  ])('read-me of wilson-score-interval: %i of %i is %f to %f', (treesWith, treesChecked, low, high) => {
    expect(incidence(treesWith, treesChecked).low).toBeCloseTo(low, 4);
    expect(incidence(treesWith, treesChecked).high).toBeCloseTo(high, 4);
  });

  it('holds the share, mirrors, narrows with trees and widens with confidence', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 500 }).chain((n) => fc.tuple(fc.integer({ min: 0, max: n }), fc.constant(n))), ([treesWith, n]) => {
        const { share, low, high } = incidence(treesWith, n);
        expect(low).toBeLessThanOrEqual(share + 1e-12);
        expect(high).toBeGreaterThanOrEqual(share - 1e-12);
        const mirror = incidence(n - treesWith, n);
        expect(mirror.low).toBeCloseTo(1 - high, 9);
        const wider = incidence(treesWith, n, 0.99);
        expect(wider.high - wider.low).toBeGreaterThanOrEqual(high - low);
        const more = incidence(treesWith * 4, n * 4);
        expect(more.high - more.low).toBeLessThan(high - low);
      }),
    );
  });

  it('says nothing of no trees, and refuses more finds than trees', () => {
    expect(incidence(0, 0)).toEqual({ share: NaN, low: 0, high: 1 });
    expect(() => incidence(3, 2)).toThrow(/treesWith must be at most the 2/);
    expect(() => incidence(0.5, 2)).toThrow(/treesWith must be a whole number/);
  });

  it('differs by 0.0524 to 0.3339 between 56 of 70 and 48 of 80 (Newcombe 1998, method 10, from memory)', () => {
    const { share, low, high } = incidenceDifference(incidence(56, 70), incidence(48, 80));
    expect(share).toBeCloseTo(0.2, 12);
    expect(low).toBeCloseTo(0.0524, 4);
    expect(high).toBeCloseTo(0.3339, 4);
  });

  it('takes counts by their mean and standard error (computed: 2, 4, 6, 8 are 5 ± 2.53)', () => {
    const { mean, low, high } = meanPerTree([2, 4, 6, 8]);
    expect(mean).toBe(5);
    expect(high - mean).toBeCloseTo(1.959964 * Math.sqrt(20 / 3 / 4), 5);
    expect(low).toBeCloseTo(2.47, 2);
    expect(meanPerTree([4])).toEqual({ mean: 4, low: 0, high: Infinity });
  });
});

describe('how many more trees to be sure (Wald)', () => {
  const handbook = { tolerable: 0.01, intolerable: 0.1, needlessTreatment: 0.05, missedOutbreak: 0.1 };

  it('has the lines −0.939 + 0.0397 n and 1.205 + 0.0397 n of the handbook’s example', () => {
    const lines = stopLines(handbook);
    expect(lines.belowIntercept).toBeCloseTo(-0.939, 3);
    expect(lines.aboveIntercept).toBeCloseTo(1.205, 3);
    expect(lines.slope).toBeCloseTo(0.0397, 4);
  });

  it('can first say "below" at 24 clean trees, and "above" at two finds, as the handbook’s table', () => {
    expect(sequentialAnswer(0, 23, handbook).decision).toBe('more');
    expect(sequentialAnswer(0, 24, handbook).decision).toBe('below');
    expect(sequentialAnswer(1, 2, handbook).decision).toBe('more');
    expect(sequentialAnswer(2, 2, handbook).decision).toBe('above');
    expect(sequentialAnswer(0, 0, handbook)).toEqual({ decision: 'more', moreIfClean: 24, moreIfInfested: 2, moreAtThisIncidence: null });
  });

  it('counts the trees still to check so that exactly they decide', () => {
    const plan = fc.record({ threshold: fc.double({ min: 0.05, max: 0.9, noNaN: true }), n: fc.integer({ min: 0, max: 60 }), part: fc.double({ min: 0, max: 1, noNaN: true }) });
    fc.assert(
      fc.property(plan, ({ threshold, n, part }) => {
        const around = planAround(threshold);
        const treesWith = Math.round(n * part);
        const now = sequentialAnswer(treesWith, n, around, Infinity);
        if (now.decision !== 'more') return;
        expect(sequentialAnswer(treesWith, n + now.moreIfClean, around, Infinity).decision).toBe('below');
        expect(sequentialAnswer(treesWith, n + now.moreIfClean - 1, around, Infinity).decision).toBe('more');
        expect(sequentialAnswer(treesWith + now.moreIfInfested, n + now.moreIfInfested, around, Infinity).decision).toBe('above');
        expect(sequentialAnswer(treesWith + now.moreIfInfested - 1, n + now.moreIfInfested - 1, around, Infinity).decision).toBe('more');
      }),
    );
  });

  it('ends a walk near the threshold at a limit, and refuses a plan out of order', () => {
    expect(sequentialAnswer(20, 200, planAround(0.1)).decision).toBe('near');
    expect(() => stopLines({ ...handbook, tolerable: 0.2 })).toThrow(/0 < 0.2 < 0.1/);
    expect(() => planAround(0)).toThrow(/threshold/);
  });
});

describe('effect', () => {
  it('is 96 % where half lived in the check and 2 % in the treated (the case of Abbott 1925)', () => {
    expect(abbottPct(50, 2)).toBe(96);
    expect(abbottPct(0, 2)).toBeNaN();
  });

  it.each([
    [30, 6, 28, 26, 78.46],
    [50, 5, 40, 60, 93.33],
  ])('Henderson-Tilton (calculators): treated %f to %f, check %f to %f is %f percent', (treatedBefore, treatedAfter, checkBefore, checkAfter, pct) => {
    expect(hendersonTiltonPct({ before: treatedBefore, after: treatedAfter }, { before: checkBefore, after: checkAfter })).toBeCloseTo(pct, 2);
  });

  it('with the check unchanged is the plain reduction, and with treated and check alike before is Abbott’s', () => {
    const counts = fc.integer({ min: 1, max: 1000 });
    fc.assert(
      fc.property(counts, counts, counts, (before, after, check) => {
        expect(hendersonTiltonPct({ before, after }, { before: check, after: check })).toBeCloseTo((1 - after / before) * 100, 9);
        expect(hendersonTiltonPct({ before, after }, { before, after: check })).toBeCloseTo(abbottPct(check, after), 9);
      }),
    );
  });

  it('without untreated trees is called a reduction, with its interval', () => {
    expect(effectOf({ treesChecked: 50, treesWith: 25 }, { treesChecked: 50, treesWith: 5 })).toMatchObject({ controlPct: 80, method: 'reduction', isClear: true });
    expect(effectOf({ treesChecked: 5, treesWith: 3 }, { treesChecked: 5, treesWith: 2 }).isClear).toBe(false);
    const { controlPct, method } = effectOf({ treesChecked: 50, treesWith: 30 }, { treesChecked: 50, treesWith: 6 }, { before: { treesChecked: 50, treesWith: 28 }, after: { treesChecked: 50, treesWith: 26 } });
    expect(method).toBe('hendersonTilton');
    expect(controlPct).toBeCloseTo(78.46, 2);
  });

  it('is summed up per product and group over seasons, best first', () => {
    expect(effectsBy([{ key: 'IRAC 4', controlPct: 60 }, { key: 'IRAC 23', controlPct: 90 }, { key: 'IRAC 4', controlPct: 80 }, { key: 'IRAC 4', controlPct: NaN }])).toMatchObject([
      { key: 'IRAC 23', count: 1, typicalPct: 90 },
      { key: 'IRAC 4', count: 2, typicalPct: 70 },
    ]);
  });
});
