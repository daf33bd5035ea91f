/**
 * Ranges at base 50 °F: Cornell IPM 2019-20, Michigan State 2015 and 2024, Penn State, Rutgers (read). Daily values: tests of the R
 * package TrenchR (read); the hourly sum is held against the single sine (computed).
 */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { degreeDaysSingleSine } from '../../shared/atmosphere/degree-days.ts';
import { bibliography } from '../../shared/bibliography.ts';
import { degreeDaysHourly, scoutAdvice, sumDegreeDays, type HourTemperature } from '../../shared/scouting/degree-day-sum.ts';
import { exampleTargets } from '../../shared/scouting/degree-day-targets.ts';

/** Hours of a day that runs as a sine from its minimum to its maximum. */
const sineDay = (date: string, minC: number, maxC: number, hours = 24): HourTemperature[] => Array.from({ length: hours }, (_, hour) => ({ date, temperatureC: (minC + maxC) / 2 - ((maxC - minC) / 2) * Math.cos((hour / 24) * 2 * Math.PI) }));

describe('targets to edit', () => {
  it.each([
    ['balsam twig aphid', 'egg hatch', 30, 100],
    ['balsam twig aphid', 'stem mothers, treatment window', 100, 150],
    ['spruce spider mite', 'egg hatch', 50, 121],
    ['spruce spider mite', 'autumn', 2375, 2806],
    ['Cooley spruce gall adelgid', 'foliar spring window', 25, 120],
    ['Cooley spruce gall adelgid', 'autumn, on spruce', 1850, 1950],
    ['Cooley spruce gall adelgid', 'autumn, on Douglas-fir', 1500, 1775],
    ['eastern spruce gall adelgid', 'stem mothers', 22, 170],
    ['white pine weevil', 'adults', 7, 58],
    ['European pine sawfly', 'egg hatch', 35, 135],
    ['pine needle scale', 'second generation', 1290, 1917],
  ])('%s, %s: %i to %i degree days over 50 °F', (target, event, from, to) => {
    const found = exampleTargets.find((example) => example.target === target && example.event === event)!;
    expect(found.fromDegreeDaysC * 1.8).toBeCloseTo(from, 9);
    expect(found.toDegreeDaysC * 1.8).toBeCloseTo(to, 9);
    expect(found.baseC).toBeCloseTo(10, 12);
  });

  it('name their source, and no start date or target that was not found', () => {
    for (const { cite, source, startsOn, target } of exampleTargets) {
      expect(Object.keys(bibliography)).toContain(cite);
      expect(source).not.toBe('');
      expect(startsOn).toBeNull();
      expect(target).not.toMatch(/midge|cinara/i);
    }
    expect(exampleTargets).toHaveLength(11);
  });
});

describe('degree days summed from stored hours', () => {
  it('add up TrenchR’s single-sine days over 12 °C, cut at 33 °C: 0.47, 0, 12.94', () => {
    const hours = [...sineDay('2026-04-01', 7, 14), ...sineDay('2026-04-02', 7, 10), ...sineDay('2026-04-03', 13, 40)];
    const { days, totalC, missing } = sumDegreeDays(hours, '2026-04-01', '2026-04-03', { baseC: 12, upperC: 33 }, 'singleSine');
    [0.47, 0, 12.94].forEach((wanted, index) => expect(Math.abs(days[index]!.degreeDaysC - wanted)).toBeLessThan(0.006));
    expect(totalC).toBeCloseTo(13.41, 1);
    expect(missing).toEqual([]);
  });

  it('by the hour come within 0.2 of the sine on a day that runs as a sine', () => {
    fc.assert(
      fc.property(fc.double({ min: -5, max: 20, noNaN: true }), fc.double({ min: 0, max: 20, noNaN: true }), (minC, span) => {
        const temperatures = sineDay('2026-04-01', minC, minC + span).map(({ temperatureC }) => temperatureC);
        expect(Math.abs(degreeDaysHourly(temperatures, 10) - degreeDaysSingleSine(minC, minC + span, 10))).toBeLessThan(0.2);
      }),
    );
  });

  it('by the hour of a steady day are what lies above the base, cut at the top', () => {
    expect(degreeDaysHourly(Array<number>(24).fill(15), 10)).toBe(5);
    expect(degreeDaysHourly(Array<number>(24).fill(40), 10, 30)).toBe(20);
    expect(degreeDaysHourly([], 10)).toBeNaN();
  });

  it('name the days of which too little is known, and leave them out', () => {
    const hours = [...sineDay('2026-04-01', 10, 20), ...sineDay('2026-04-02', 10, 20, 19), ...sineDay('2026-04-04', 10, 20, 23)];
    const sum = sumDegreeDays(hours, '2026-04-01', '2026-04-04', { baseC: 10, upperC: null }, 'singleSine');
    expect(sum.missing).toEqual(['2026-04-02', '2026-04-03']);
    expect(sum.totalC).toBeCloseTo(10, 1);
    expect(() => sumDegreeDays([], '2026-04-02', '2026-04-01', { baseC: 10, upperC: null }, 'hourly')).toThrow(/before from/);
  });
});

describe('advice to scout', () => {
  const range = { fromDegreeDaysC: 20, toDegreeDaysC: 30 };
  const after = (count: number, perDay: number) => {
    const days = Array.from({ length: count }, (_, index) => ({ date: `2026-04-${String(index + 1).padStart(2, '0')}`, degreeDaysC: perDay, totalC: (index + 1) * perDay }));
    return { days, totalC: count * perDay, missing: [] };
  };

  it('comes a week ahead, holds through the range, and ends after it', () => {
    expect(scoutAdvice(after(10, 1), range)).toEqual({ state: 'before', totalC: 10, daysUntil: 10, isAtLeast: false });
    expect(scoutAdvice(after(13, 1), range)).toMatchObject({ state: 'soon', daysUntil: 7 });
    expect(scoutAdvice(after(20, 1), range)).toMatchObject({ state: 'now', daysUntil: null });
    expect(scoutAdvice(after(30, 1), range).state).toBe('now');
    expect(scoutAdvice(after(31, 1), range).state).toBe('past');
  });

  it('knows no day while nothing adds up, and says when days are missing', () => {
    expect(scoutAdvice(after(10, 0), range)).toMatchObject({ state: 'before', daysUntil: null });
    expect(scoutAdvice({ ...after(20, 1), missing: ['2026-04-03'] }, range).isAtLeast).toBe(true);
  });
});
