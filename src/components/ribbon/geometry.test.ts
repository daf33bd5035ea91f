import { describe, expect, it } from 'vitest';
import { halfThickness, knotsOf, ribbonPath, spaced, stretchesOf, type Lane } from './geometry.ts';

const lane = (headroom: (number | null)[]): Lane => {
  const stretches = stretchesOf(headroom);
  return { limit: 'wind', kind: 'hard', headroom, stretches, knots: knotsOf(stretches) };
};

describe('the headroom ribbon', () => {
  it('is as thick as the headroom, and shut at the limit and beyond', () => {
    expect([1, 0.5, 0, -0.7, null].map((headroom) => halfThickness(headroom, 10))).toEqual([10, 5, 0, 0, 0]);
  });

  it('is tied with a knot where it pinches shut, and not where it opens again', () => {
    expect(lane([0.4, 0.1, -0.1, -0.2, 0.3, 0.2, -0.4]).knots).toEqual([2, 6]);
    expect(lane([-0.3, 0.2]).knots).toEqual([0]);
    expect(lane([0.3, 0.2]).knots).toEqual([]);
  });

  it('draws what cannot be told as neither open nor shut', () => {
    expect(stretchesOf([0.2, null, null, -0.1])).toEqual([
      { kind: 'open', from: 0, to: 0 },
      { kind: 'untold', from: 1, to: 2 },
      { kind: 'closed', from: 3, to: 3 },
    ]);
  });

  it('runs out to a point half a step before it shuts', () => {
    expect(ribbonPath(lane([1, -1]), (index) => index * 10, 8)).toBe('M0.0 -8.0L5.0 0L0.0 8.0Z');
  });

  it('leaves out labels that would stand on each other', () => {
    expect(spaced([0, 5, 40, 60, 85], 40)).toEqual([0, 40, 85]);
  });
});
