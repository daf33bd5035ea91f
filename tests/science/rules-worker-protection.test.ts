/**
 * 40 CFR 170 (Worker Protection Standard) and its exclusion zone, 89 FR 80767, effective 3 December 2024: distances as read; times of
 * display, signs and supplies partly from memory (see shared/rules/reentry.ts). Interval spread: a citrus list of UC IPM, as formats.
 */
import { describe, expect, it } from 'vitest';
import { hoursOf, reentryOf, workerProtectionTimes, zoneStatement } from '../../shared/rules/reentry.ts';

const feet = (metres: number) => metres / 0.3048;

describe('the end of re-entry', () => {
  it('is the longest interval of the mix, counted from the recorded stop', () => {
    expect(reentryOf('2026-05-12T13:40:00Z', [{ name: 'a', reiHours: 4 }, { name: 'b', reiHours: 24 }, { name: 'c', reiHours: 12 }])).toEqual({ endsAt: '2026-05-13T13:40:00.000Z', hours: 24, governedBy: ['b'], missing: [] });
  });

  it('is not told while one interval of the mix is not known', () => {
    expect(reentryOf('2026-05-12T13:40:00Z', [{ name: 'a', reiHours: 4 }, { name: 'b', reiHours: null }])).toEqual({ endsAt: null, hours: 4, governedBy: ['a'], missing: ['b'] });
  });

  it('knows intervals in days as on labels: 3, 5 and 14 days are 72, 120 and 336 hours (UC IPM list)', () => {
    expect([3, 5, 14].map((value) => hoursOf({ value, unit: 'days' }))).toEqual([72, 120, 336]);
    expect(hoursOf({ value: 4, unit: 'hours' })).toBe(4);
  });

  it('wants a stop', () => {
    expect(() => reentryOf('', [])).toThrow(/stoppedAt/);
  });
});

describe('times of the Worker Protection Standard', () => {
  it('count display from the end of the application and the end of re-entry, and keep two years', () => {
    expect(workerProtectionTimes('2026-05-12T12:00:00Z', '2026-05-13T00:00:00Z')).toEqual({
      displayBy: '2026-05-13T12:00:00.000Z',
      displayUntil: '2026-06-12T00:00:00.000Z',
      keepUntil: '2028-05-13T00:00:00.000Z',
      signsNeeded: false,
      signsDownBy: '2026-05-16T00:00:00.000Z',
      decontaminationUntil: '2026-06-12T00:00:00.000Z',
    });
  });

  it('want signs above 48 hours, and supplies for a week when the interval is 4 hours', () => {
    expect(workerProtectionTimes('2026-05-12T12:00:00Z', '2026-05-14T12:00:00Z').signsNeeded).toBe(false);
    expect(workerProtectionTimes('2026-05-12T12:00:00Z', '2026-05-14T13:00:00Z').signsNeeded).toBe(true);
    expect(workerProtectionTimes('2026-05-12T12:00:00Z', '2026-05-12T16:00:00Z').decontaminationUntil).toBe('2026-05-19T16:00:00.000Z');
    expect(() => workerProtectionTimes('2026-05-12T12:00:00Z', '2026-05-12T11:00:00Z')).toThrow(/must not be before/);
  });
});

describe('the application exclusion zone (40 CFR 170.405)', () => {
  it.each([
    ['a mist blower', true, 'fine', 1, 100],
    ['a hand wand with fine droplets', false, 'fine', 0.5, 100],
    ['a boom with medium droplets 24 in up', false, 'medium', 24 * 0.0254, 25],
    ['medium droplets 10 in up', false, 'medium', 10 * 0.0254, 0],
  ] as const)('of %s is told with its rule, its date and that it must be checked again', (_, airPropelled, dropletClass, releaseHeightM, radiusFt) => {
    const statement = zoneStatement({ airPropelled, dropletClass, releaseHeightM });
    expect(feet(statement.radiusM)).toBeCloseTo(radiusFt, 9);
    expect(statement).toMatchObject({ rule: '40 CFR 170.405', asOf: '2024-12-03', mustBeRechecked: true });
  });
});
