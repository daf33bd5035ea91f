/** Published: Beaufort table (NBS, WMO); EPA-454/R-99-005 §6.2 for directions; Yamartino's estimator from memory, its values computed. */
import { describe, expect, it } from 'vitest';
import { beaufortForce } from '../../shared/atmosphere/beaufort.ts';
import { angleBetweenDeg, directionMean } from '../../shared/atmosphere/wind-direction.ts';
import { mphToMs } from '../../shared/units/units.ts';

describe('Beaufort scale (published in m/s and mph)', () => {
  it.each([
    [0, 0, 0.2],
    [1, 0.3, 1.5],
    [2, 1.6, 3.3],
    [3, 3.4, 5.4],
    [4, 5.5, 7.9],
  ])('force %s runs from %s to %s m/s', (force, from, to) => {
    expect(beaufortForce(from)).toBe(force);
    expect(beaufortForce(to)).toBe(force);
  });

  it.each([
    [1, 1, 3],
    [2, 4, 7],
    [3, 8, 12],
    [4, 13, 17.6],
  ])('force %s runs from %s to %s mph', (force, from, to) => {
    expect(beaufortForce(mphToMs(from))).toBe(force);
    expect(beaufortForce(mphToMs(to))).toBe(force);
  });

  it('ends at hurricane force and knows no negative wind', () => {
    expect(beaufortForce(40)).toBe(12);
    expect(beaufortForce(-3)).toBeNaN();
    expect(beaufortForce(NaN)).toBeNaN();
  });
});

describe('unit-vector mean and Yamartino spread (values computed from the formulas)', () => {
  it.each([
    [[350, 10], 0, 10.008],
    [[350, 0, 10], 0, 8.165],
    [[10, 20, 30, 40, 50], 30, 14.149],
    [[300, 330, 0, 30, 60], 0, 43.622],
    [[200, 220, 240, 260], 230, 22.456],
  ])('directions %s', (directions, mean, spread) => {
    const found = directionMean(directions);
    expect(angleBetweenDeg(found.meanFromDeg, mean)).toBeLessThan(0.01);
    expect(found.spreadDeg).toBeCloseTo(spread, 1);
  });

  it('has no mean direction when all sides cancel', () => {
    const found = directionMean([0, 90, 180, 270]);
    expect(found.meanFromDeg).toBeNaN();
    expect(found.spreadDeg).toBeCloseTo(103.92, 1);
  });

  it('measures angles across north', () => {
    expect(angleBetweenDeg(350, 10)).toBe(20);
    expect(angleBetweenDeg(0, 180)).toBe(180);
    expect(angleBetweenDeg(10, 730)).toBe(0);
  });
});
