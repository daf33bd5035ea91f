/** Single sine: Baskerville & Emin 1969 (formula from memory); values of the R TrenchR tests (published) and computed ones. */
import { describe, expect, it } from 'vitest';
import { degreeDaysSingleSine } from '../../shared/atmosphere/degree-days.ts';

describe('degree days by single sine', () => {
  it.each([
    [7, 14, 0.47],
    [7, 10, 0],
    [13, 14, 1.5],
    [13, 40, 12.94],
    [7, 40, 10.94],
  ])('TrenchR (published): %s to %s °C over 12, cut at 33 °C, gives %s', (min, max, wanted) => {
    expect(Math.abs(degreeDaysSingleSine(min, max, 12, 33) - wanted)).toBeLessThan(0.006);
  });

  it('a day wholly above the cutoff counts the span of the thresholds (horizontal cutoff, 21)', () => {
    expect(degreeDaysSingleSine(35, 40, 12, 33)).toBeCloseTo(21, 9);
  });

  it.each([
    [40, 60, 3.1831],
    [45, 65, 6.09],
    [30, 70, 6.3662],
    [48, 52, 0.6366],
    [35, 55, 1.09],
    [44, 58, 2.7509],
    [50, 70, 10],
    [55, 75, 15],
    [30, 48, 0],
  ])('computed, base 50 °F: %s to %s °F gives %s', (min, max, wanted) => {
    expect(degreeDaysSingleSine(min, max, 50)).toBeCloseTo(wanted, 3);
  });

  it('computed with the cutoff at 86 °F: 60 to 95 °F gives 25.5086', () => {
    expect(degreeDaysSingleSine(60, 95, 50, 86)).toBeCloseTo(25.5086, 3);
  });

  it('is unknown when the maximum lies below the minimum', () => {
    expect(degreeDaysSingleSine(10, 5, 7)).toBeNaN();
  });
});
