import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { halfThickness, knotsOf, placeLabels, ribbonPath, ringPlaces, stretchesOf, threadPath, type Lane } from './geometry.ts';

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

  it('marks what cannot be told with open rings, spread over that stretch and nowhere else', () => {
    const places = ringPlaces(lane([0.2, null, null, null, 0.4]), (index) => index * 20, 15);
    expect(places).toHaveLength(4);
    expect(Math.min(...places)).toBeGreaterThan(10);
    expect(Math.max(...places)).toBeLessThan(70);
  });

  it('lets the thread of a shut stretch reach to where the ribbon opens again', () => {
    expect(threadPath(lane([0.4, -0.1, -0.2, 0.3]), (index) => index * 10)).toBe('M5.0 0H25.0');
  });
});

describe('the names of knots', () => {
  const whole = { from: 0, to: 500 };

  it('lie along the thread behind the knot', () => {
    expect(placeLabels([{ at: 100, until: 500, width: 80, before: true }], whole)).toEqual([{ index: 0, at: 109, anchor: 'start' }]);
  });

  it('stand before the knot where the thread is too short', () => {
    expect(placeLabels([{ at: 440, until: 500, width: 80, before: true }], whole)).toEqual([{ index: 0, at: 431, anchor: 'end' }]);
  });

  it('lie across no thick ribbon', () => {
    expect(placeLabels([{ at: 440, until: 500, width: 80, before: false }], whole)).toEqual([]);
  });

  it('are left out where there is room on neither side', () => {
    expect(placeLabels([{ at: 40, until: 60, width: 80, before: true }], whole)).toEqual([]);
  });

  it('never stand on each other or leave the lane, wherever the knots are tied', () => {
    fc.assert(
      fc.property(fc.uniqueArray(fc.integer({ min: 0, max: 100 }), { maxLength: 8 }), fc.integer({ min: 10, max: 160 }), (places, width) => {
        const knots = places.toSorted((one, two) => one - two).map((place) => place * 5);
        const wishes = knots.map((at, index) => ({ at, until: (at + (knots[index + 1] ?? 500)) / 2, width, before: true }));
        const spans = placeLabels(wishes, whole).map(({ at, anchor }) => (anchor === 'start' ? [at, at + width] : [at - width, at]) as [number, number]);
        spans.forEach(([from, to], index) => {
          expect(from).toBeGreaterThanOrEqual(whole.from);
          expect(to).toBeLessThanOrEqual(whole.to);
          if (index > 0) expect(from).toBeGreaterThanOrEqual(spans[index - 1]![1]);
        });
      }),
    );
  });
});
