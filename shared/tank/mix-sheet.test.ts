import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { rateUnits } from '../api/plans.ts';
import { acresToHa, gallonsPerAcreToLHa, gallonsToL } from '../units/units.ts';
import { mixCost, stockAfter } from './cost.ts';
import { exactly, fromText, type Exact } from './exact.ts';
import { measureUnits, rateParts, substanceOf } from './measures.ts';
import { mixSheet, type MixInput, type MixProduct } from './mix-sheet.ts';

const times = (text: string, count: number): Exact => fromText(text).mul(count);

/** Figures as people type them: up to four decimals. */
const typed = (min: number, max: number) => fc.integer({ min: min * 10_000, max: max * 10_000 }).map((value) => value / 10_000);
const product: fc.Arbitrary<MixProduct> = fc.record({ name: fc.constant('p'), rate: typed(0.01, 5), rateUnit: fc.constantFrom(...rateUnits), step: fc.constantFrom(0.1, 1, 5) }).chain(({ step, ...rest }) =>
  fc
    .constantFrom(...measureUnits.filter((unit) => substanceOf(unit) === substanceOf(rateParts(rest.rateUnit).amount)))
    .map((unit) => ({ ...rest, measure: { unit, step } })),
);
const input: fc.Arbitrary<MixInput> = fc.record({
  areaHa: fc.oneof(typed(0.01, 50), typed(0.1, 100).map(acresToHa)),
  carrierLHa: fc.oneof(typed(50, 2000), typed(6, 200).map(gallonsPerAcreToLHa)),
  tankL: fc.oneof(typed(5, 500), typed(1, 100).map(gallonsToL)),
  products: fc.array(product, { minLength: 1, maxLength: 3 }),
  adjuvants: fc.array(fc.record({ name: fc.constant('a'), percentVv: typed(0.01, 2) }), { maxLength: 2 }),
});

describe('a mix sheet of any plan', () => {
  it('has tanks that sum to the totals exactly: product, adjuvant, water, spray, and what is poured', () => {
    fc.assert(
      fc.property(input, (plan) => {
        const sheet = mixSheet(plan);
        const { exactL } = sheet;
        const sumL = (full: string, last: string) => times(full, sheet.fullTanks).add(fromText(last));
        expect(sumL(exactL.fullTank, exactL.lastTank).equals(fromText(exactL.total))).toBe(true);
        expect(sumL(exactL.waterFullTank, exactL.waterLastTank).equals(fromText(exactL.waterTotal))).toBe(true);
        for (const line of sheet.lines) {
          const exact = times(line.fullTank?.exact ?? '0', sheet.fullTanks).add(fromText(line.lastTank?.exact ?? '0'));
          expect(exact.equals(fromText(line.total.exact))).toBe(true);
          const poured = exactly(line.fullTank?.measured ?? 0).mul(sheet.fullTanks).add(exactly(line.lastTank?.measured ?? 0));
          expect(poured.equals(exactly(line.total.measured))).toBe(true);
        }
      }),
      { numRuns: 300 },
    );
  });

  it('pours whole steps, each within half a step of the dose', () => {
    fc.assert(
      fc.property(input, (plan) => {
        for (const line of mixSheet(plan).lines) {
          for (const amount of [line.fullTank, line.lastTank]) {
            if (!amount) continue;
            const step = exactly(line.measure.step);
            expect(exactly(amount.measured).div(step).d).toBe(1n);
            expect(exactly(amount.measured).sub(fromText(amount.exact)).abs().compare(step.div(2))).toBeLessThanOrEqual(0);
          }
        }
      }),
      { numRuns: 200 },
    );
  });

  it('gives a total of rate × area, whatever the tank', () => {
    fc.assert(
      fc.property(input, (plan) => {
        const sheet = mixSheet({ ...plan, adjuvants: [] });
        const whole = mixSheet({ ...plan, adjuvants: [], tankL: 1_000_000 });
        sheet.lines.forEach((line, index) => expect(line.total.exact).toBe(whole.lines[index]!.total.exact));
      }),
      { numRuns: 200 },
    );
  });
});

describe('a mix sheet', () => {
  const plan: MixInput = { areaHa: 0.25, carrierLHa: 100, tankL: 10, products: [{ name: 'Example One', rate: 0.5, rateUnit: 'lPerHa' }] };

  it('shows what rounding does, per tank and to the rate', () => {
    const [line] = mixSheet({ ...plan, products: [{ name: 'Example One', rate: 0.033, rateUnit: 'lPerHa', measure: { unit: 'mL', step: 5 } }] }).lines;
    expect(line!.fullTank).toMatchObject({ value: 3.3, measured: 5, tooCoarse: true });
    expect(line!.fullTank!.roundingPct).toBeCloseTo(51.5, 1);
    // Two full tanks of 5 mL and a half tank of 1.65 mL, for which a 5 mL cup has no mark.
    expect(line).toMatchObject({ lastTank: { value: 1.65, measured: 0 }, total: { measured: 10 }, rateAsMeasured: 0.04 });
  });

  it('takes the liquids off the water, and the solids not', () => {
    const liquid = mixSheet({ ...plan, products: [{ name: 'a', rate: 10, rateUnit: 'lPerHa' }] });
    expect(liquid.water).toEqual({ fullTankL: 9, lastTankL: 4.5, totalL: 22.5 });
    expect(mixSheet({ ...plan, products: [{ name: 'a', rate: 10, rateUnit: 'kgPerHa' }] }).water.totalL).toBe(25);
  });

  it('has no full tank when all fits into a part of one', () => {
    const sheet = mixSheet({ ...plan, areaHa: 0.05 });
    expect(sheet).toMatchObject({ fullTanks: 0, fills: 1, lastTankL: 5, water: { fullTankL: null } });
    expect(sheet.lines[0]).toMatchObject({ fullTank: null, lastTank: { value: 25, measured: 25 } });
  });

  it('refuses by name: no area, no rate, a liquid weighed, more product than spray', () => {
    expect(() => mixSheet({ ...plan, areaHa: 0 })).toThrow(/areaHa must be more than 0/);
    expect(() => mixSheet({ ...plan, products: [{ name: 'a', rate: 0, rateUnit: 'lPerHa' }] })).toThrow(/products\.0\.rate/);
    expect(() => mixSheet({ ...plan, products: [{ name: 'a', rate: 1, rateUnit: 'lPerHa', measure: { unit: 'g', step: 1 } }] })).toThrow(/volume, the other a weight/);
    expect(() => mixSheet({ ...plan, products: [{ name: 'a', rate: 101, rateUnit: 'lPerHa' }] })).toThrow(/carrierLHa/);
    expect(() => mixSheet({ ...plan, adjuvants: [{ name: 'a', percentVv: 101 }] })).toThrow(/adjuvants\.0\.percentVv/);
  });

  it('costs what is poured, per tank, acre, hectare and plan, and says what has no price', () => {
    const sheet = mixSheet({ ...plan, adjuvants: [{ name: 'Spreader', percentVv: 0.25 }] });
    // 125 mL at 80 a litre: 50 mL in each full tank, 25 in the half one.
    expect(mixCost(sheet, new Map([['Example One', { amount: 80, per: 'L' }]]))).toEqual({ perFullTank: 4, lastTank: 2, plan: 10, perHa: 40, perAcre: 16.19, unpriced: ['Spreader'] });
    expect(() => mixCost(sheet, new Map([['Example One', { amount: -1, per: 'L' }]]))).toThrow(/price of Example One/);
  });

  it('tells the stock after, never below nothing', () => {
    const [line] = mixSheet(plan).lines;
    expect(stockAfter({ amount: 1, unit: 'L' }, line!)).toEqual({ unit: 'L', used: 0.125, after: 0.875, short: 0 });
    expect(stockAfter({ amount: 100, unit: 'mL' }, line!)).toEqual({ unit: 'mL', used: 125, after: 0, short: 25 });
  });
});

describe('an exact number', () => {
  it('is what was typed: 0.1 is a tenth, 1e-7 a ten-millionth', () => {
    expect(exactly(0.1).toFraction()).toBe('1/10');
    expect(exactly(1e-7).toFraction()).toBe('1/10000000');
    expect(exactly(1.5e21).toFraction()).toBe('1500000000000000000000');
    expect(exactly(-2.5).toFraction()).toBe('-5/2');
    expect(() => exactly(NaN, 'rate')).toThrow(/rate must be a number/);
  });
});
