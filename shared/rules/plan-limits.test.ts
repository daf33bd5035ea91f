import { describe, expect, it } from 'vitest';
import { planBody, productBody } from '../api/plans.ts';
import { limitsSchema } from '../assessment/case.ts';
import { limitsOfPlan, usualLimits } from './plan-limits.ts';

const id = '00000000-0000-4000-8000-000000000000';
const plan = (own: Partial<Parameters<typeof limitsOfPlan>[0]> = {}) => ({
  ...planBody.parse({ name: 'p', blockIds: [id], products: [{ productId: id, rate: 1 }], sprayerId: id, carrierLHa: 100, firstDate: '2026-06-01', lastDate: '2026-06-02' }),
  ...own,
});
const label = (figures: Partial<ReturnType<typeof productBody.parse>> = {}) => ({ ...productBody.parse({ name: 'x', rateMin: 1, rateMax: 2, rateUnit: 'lPerHa' }), ...figures });

describe('the limits of a plan', () => {
  it('take the strictest of every label and of the grower', () => {
    const limits = limitsOfPlan(plan({ windMaxMs: 4, rainFreeHours: 2 }), [label({ windMaxMs: 5, rainFreeHours: 6, temperatureMaxC: 30 }), label({ windMaxMs: 4.5, windMinMs: 1, temperatureMaxC: 27 })]);
    expect(limits).toMatchObject({ windMaxMs: 4, windMinMs: 1, rainFreeHours: 6, temperatureMaxC: 27 });
  });

  it('hold in a likely inversion when any label forbids one, and the grower can only be stricter', () => {
    expect(limitsOfPlan(plan(), [label({ inversionProhibited: true })]).inversionMax).toBe(0.5);
    expect(limitsOfPlan(plan({ inversionMax: 0.3 }), [label({ inversionProhibited: true })]).inversionMax).toBe(0.3);
    expect(limitsOfPlan(plan({ inversionMax: 0.9 }), [label({ inversionProhibited: true })]).inversionMax).toBe(0.5);
  });

  it('carry the strictest bee statement of the mix', () => {
    expect(limitsOfPlan(plan({ bloom: true }), [label({ beeStatement: 'none' }), label({ beeStatement: 'notInBloom' }), label({ beeStatement: 'notWhileForaging' })]).pollinators).toMatchObject({ bloom: true, beeStatement: 'notInBloom' });
  });

  it('take wind figures of different heights at the height of the label that binds', () => {
    // By FAO-56 eq. 47, 6 m/s at 10 m is 4.49 m/s at 2 m: stricter than 5 m/s at 2 m.
    expect(limitsOfPlan(plan(), [label({ windMaxMs: 5, windHeightM: 2 }), label({ windMaxMs: 6, windHeightM: 10 })])).toMatchObject({ windMaxMs: 6, windHeightM: 10 });
    expect(limitsOfPlan(plan(), [label({ windMaxMs: 5, windHeightM: 2 }), label({ windMaxMs: 7, windHeightM: 10 })])).toMatchObject({ windMaxMs: 5, windHeightM: 2 });
  });

  it('bring the least wind to the height of the greatest, where the two differ', () => {
    const limits = limitsOfPlan(plan({ windMinMs: 1 }), [label({ windMaxMs: 6, windHeightM: 10 })]);
    expect(limits.windHeightM).toBe(10);
    expect(limits.windMinMs).toBeCloseTo(1 / (4.87 / Math.log(67.8 * 10 - 5.42)), 3);
  });

  it('mean the grower’s own wind at 2 m when no label names a wind', () => {
    expect(limitsOfPlan(plan({ windMaxMs: 4 }), [label({ windHeightM: 10 })])).toMatchObject({ windMaxMs: 4, windHeightM: 2 });
  });

  it('leave out what nobody limits', () => {
    const limits = limitsOfPlan(plan(), [label({ inversionProhibited: false })]);
    expect(limits).not.toHaveProperty('windMaxMs');
    expect(limits).not.toHaveProperty('inversionMax');
    expect(limits).not.toHaveProperty('foliageDry');
  });

  it('are limits that the assessment takes', () => {
    expect(limitsSchema.parse(limitsOfPlan(plan({ foliageDry: true }), [label({ windMaxMs: 4 })]))).toBeTruthy();
    expect(limitsSchema.parse(usualLimits)).toEqual(usualLimits);
  });
});
