import { describe, expect, it } from 'vitest';
import { labelProblems } from './plan-label.ts';

const label = { name: 'Example One', rateMax: 4, carrierMinLHa: 50, carrierMaxLHa: 200 };
const judged = (rate: number, carrierLHa: number, figures: Partial<typeof label> | { carrierMinLHa: null } = {}) => labelProblems({ products: [{ productId: 'one', rate }], carrierLHa }, new Map([['one', { ...label, ...figures }]]));

describe('a plan beside its labels', () => {
  it('may use the highest rate and no more', () => {
    expect(judged(4, 100)).toEqual([]);
    expect(judged(4.01, 100)).toEqual([{ path: 'products.0.rate', message: 'must be at most 4, the highest rate entered from the label of Example One' }]);
  });

  it('may use less than the lowest rate', () => {
    expect(judged(0.1, 100)).toEqual([]);
  });

  it('keeps to the carrier volume, each end by name', () => {
    expect(judged(1, 50)).toEqual([]);
    expect(judged(1, 200)).toEqual([]);
    expect(judged(1, 49)).toMatchObject([{ path: 'carrierLHa', message: expect.stringContaining('at least 50 L/ha') as string }]);
    expect(judged(1, 201)).toMatchObject([{ path: 'carrierLHa', message: expect.stringContaining('at most 200 L/ha') as string }]);
  });

  it('is not held to a figure that nobody entered', () => {
    expect(judged(1, 1, { carrierMinLHa: null })).toEqual([]);
  });
});
