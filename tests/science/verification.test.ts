/** Published: Wilks 1995 table 7.3 (as printed in the R package verification); Murphy 1973 for the decomposition. */
import { describe, expect, it } from 'vitest';
import { brierDecomposition, brierScore } from '../../shared/assessment/brier-score.ts';

describe('Brier score', () => {
  it('of a small set, computed by hand, is 0.112', () => {
    expect(brierScore([0.9, 0.7, 0.3, 0.1, 0.6], [true, true, false, false, false])).toBeCloseTo(0.112, 6);
  });

  it("of Wilks's table 7.3 falls apart into reliability, resolution and uncertainty", () => {
    const chances = [0, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1];
    const frequencies = [0.006, 0.019, 0.059, 0.15, 0.277, 0.377, 0.511, 0.587, 0.723, 0.779, 0.934, 0.933];
    const weights = [0.4112, 0.0671, 0.1833, 0.0986, 0.0616, 0.0366, 0.0303, 0.0275, 0.0245, 0.022, 0.017, 0.0203];
    const parts = brierDecomposition(chances.map((chance, index) => ({ chance, frequency: frequencies[index]!, weight: weights[index]! })));
    expect(parts.reliability).toBeCloseTo(0.000828, 6);
    expect(parts.resolution).toBeCloseTo(0.062787, 6);
    expect(parts.uncertainty).toBeCloseTo(0.13542, 5);
    expect(parts.score).toBeCloseTo(0.073461, 6);
    expect(parts.skill).toBeCloseTo(0.4575, 4);
  });

  it('of chances said in groups equals the sum of its parts', () => {
    const chances = [0.2, 0.2, 0.2, 0.8, 0.8];
    const happened = [false, true, false, true, true];
    const parts = brierDecomposition([
      { chance: 0.2, frequency: 1 / 3, weight: 3 },
      { chance: 0.8, frequency: 1, weight: 2 },
    ]);
    expect(brierScore(chances, happened)).toBeCloseTo(parts.score, 12);
  });

  it('is unknown without events', () => {
    expect(brierScore([], [])).toBeNaN();
  });
});
