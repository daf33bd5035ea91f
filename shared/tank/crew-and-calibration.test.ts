import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { calibrationState, walkingPaceMs, type Calibration } from './calibration.ts';
import { crewTime, savings, type CrewPace } from './crew-time.ts';
import { learnedMinutes, learnedPace, type PastRun } from './learned-minutes.ts';
import { jobOfPlan } from './minutes.ts';
import { mixingOrder } from './mixing-order.ts';
import { quantile } from './quantile.ts';

const alone: CrewPace = { sprayMinutesPerTank: 4.5, walkMinutes: 1, pourMinutes: 0.5, swapMinutes: 0.25, mixMinutes: 3, crew: 'alone', packs: 1 };

describe('the time of a crew', () => {
  it('comes to 20–25 minutes for one applicator and one mixer with four packs on just under an acre (common practice, no source)', () => {
    const { minutes, boundBy } = crewTime(4, { ...alone, crew: 'withMixer' });
    expect(minutes).toBe(4 * 4.5 + 3 * 1.5);
    expect(minutes).toBeGreaterThanOrEqual(20);
    expect(minutes).toBeLessThanOrEqual(25);
    expect(boundBy).toBe('applicator');
  });

  it('adds walk, mix and pour to each further filling of one who works alone, as jobOfPlan does with one change-over', () => {
    const job = jobOfPlan({ areaHa: 0.25, carrierLHa: 100, sprayer: { tankL: 10, minutesPerTank: 4.5, changeOverMinutes: 4.5 } });
    expect(Math.ceil(crewTime(2.5, alone).minutes)).toBe(job.minutesNeeded);
  });

  it('is set by the mixer when mixing takes longer than spraying and walking', () => {
    const slow = crewTime(3, { ...alone, crew: 'withMixer', mixMinutes: 8 });
    expect(slow.boundBy).toBe('mixer');
    // First mix from minute 0, ready at 8, poured by 8.5; the second ready at 16.5, poured by 17; half a minute back; sprayed.
    expect(slow.minutes).toBe(17 + 0.5 + 4.5);
  });

  it('has, with one pack, cycles of the longer of (spray + walk) and mix, plus pour, whoever is slower', () => {
    const minutes = fc.integer({ min: 1, max: 40 }).map((quarters) => quarters / 4);
    fc.assert(
      fc.property(minutes, minutes, minutes, minutes, (sprayMinutesPerTank, walkMinutes, pourMinutes, mixMinutes) => {
        const pace: CrewPace = { sprayMinutesPerTank, walkMinutes, pourMinutes, swapMinutes: 0.5, mixMinutes, crew: 'withMixer', packs: 1 };
        const starts = crewTime(6, pace).tanks.map(({ startMinute }) => startMinute);
        // From the second tank on the pipeline runs evenly.
        for (let index = 2; index < starts.length; index += 1) expect(starts[index]! - starts[index - 1]!).toBeCloseTo(Math.max(sprayMinutesPerTank + walkMinutes, mixMinutes) + pourMinutes, 9);
        expect(crewTime(6, pace).minutes).toBeLessThanOrEqual(crewTime(6, { ...pace, crew: 'alone' }).minutes);
      }),
    );
  });

  it('says what a mixer, a second pack and a nearer fill point would save, and leaves out what is there', () => {
    expect(savings(4, alone)).toEqual([
      { change: 'mixer', minutes: 22.5, savedMinutes: 9 },
      { change: 'secondPack', minutes: 21.75, savedMinutes: 9.75 },
      { change: 'nearerFillPoint', minutes: 30, savedMinutes: 1.5 },
    ]);
    expect(savings(4, { ...alone, crew: 'withMixer', packs: 2, walkMinutes: 0 })).toEqual([]);
  });

  it('refuses a time that is none by name', () => {
    expect(() => crewTime(0, alone)).toThrow(/tanks/);
    expect(() => crewTime(2, { ...alone, mixMinutes: -1 })).toThrow(/mixMinutes/);
  });
});

describe('minutes learned from past runs', () => {
  const run = (date: string, tank: number, changeOver: number | null): PastRun => ({ date, sprayerId: 's', crew: 'withMixer', tankMinutes: [tank, tank], changeOverMinutes: changeOver === null ? [] : [changeOver] });
  const runs = [run('2026-04-01', 4, 2), run('2026-05-01', 5, 2), run('2026-06-01', 6, 1)];

  it('are the middle of the runs with their spread, and feed the minutes of a job', () => {
    const pace = learnedPace(runs, 's', 'withMixer')!;
    expect(pace).toMatchObject({ runs: 3, minutesPerTank: { typical: 5 }, changeOverMinutes: { typical: 2 } });
    expect(learnedMinutes(2.5, pace, 9).typical).toBe(2.5 * 5 + 2 * 2);
    expect(learnedMinutes(2.5, pace, 9).high).toBeGreaterThan(16.5);
  });

  it('are not learned from two runs, another sprayer or another crew', () => {
    expect(learnedPace(runs.slice(1), 's', 'withMixer')).toBeNull();
    expect(learnedPace(runs, 't', 'withMixer')).toBeNull();
    expect(learnedPace(runs, 's', 'alone')).toBeNull();
  });

  it('use the entered change-over while every run had one tank', () => {
    const pace = learnedPace([run('2026-04-01', 4, null), run('2026-05-01', 5, null), run('2026-06-01', 6, null)], 's', 'withMixer')!;
    expect(learnedMinutes(2, pace, 3).typical).toBe(13);
  });

  it('take quantiles as R does by default (type 7; values of R from memory): 10 % of 1…9 is 1.8', () => {
    expect(quantile([9, 8, 7, 6, 5, 4, 3, 2, 1], 0.1)).toBeCloseTo(1.8, 12);
    expect(quantile([1, 2, 3, 4], 0.5)).toBe(2.5);
    expect(quantile([], 0.5)).toBeNaN();
  });
});

describe('calibrations of a sprayer', () => {
  const result = (date: string, carrierLHa: number, nozzle = '2'): Calibration => ({ date, sprayerId: 's', nozzle, method: 'timedOutput', carrierLHa, paceMs: 0.9 });

  it('hold by the newest, and warn past 10 % from the one before', () => {
    expect(calibrationState([result('2026-05-01', 110), result('2026-03-01', 100)], 's', '2')).toMatchObject({ latest: { carrierLHa: 110 }, previous: { carrierLHa: 100 }, warns: false });
    expect(calibrationState([result('2026-03-01', 100), result('2026-05-01', 111)], 's', '2')).toMatchObject({ warns: true });
    expect(calibrationState([result('2026-03-01', 100), result('2026-05-01', 89)], 's', '2')).toMatchObject({ warns: true });
  });

  it('are not compared over nozzles', () => {
    expect(calibrationState([result('2026-03-01', 100), result('2026-05-01', 200, '3')], 's', '3')).toMatchObject({ previous: null, driftPct: null, warns: false });
    expect(calibrationState([], 's', '3')).toBeNull();
  });

  it('know the pace as course over time', () => {
    expect(walkingPaceMs(30, [30, 34, 36])).toBeCloseTo(0.9, 12);
    expect(() => walkingPaceMs(30, [])).toThrow(/at least one run/);
    expect(() => walkingPaceMs(30, [20, 0])).toThrow(/runsSeconds\.1/);
  });
});

describe('the order of mixing', () => {
  const item = (formulation: Parameters<typeof mixingOrder>[0][number]['formulation']) => ({ formulation });

  it('puts dry before suspension before emulsion before solution before adjuvant, with water first and last', () => {
    const { steps, tooManyPartners } = mixingOrder([item('adjuvant'), item('SL'), item('EC'), item('SC'), item('WG')]);
    expect(steps.flatMap((step) => (step.kind === 'add' ? [step.item.formulation] : []))).toEqual(['WG', 'SC', 'EC', 'SL', 'adjuvant']);
    expect(steps[0]).toEqual({ kind: 'halfFill' });
    expect(steps.at(-1)).toEqual({ kind: 'topUp' });
    expect(tooManyPartners).toBe(true);
  });

  it('names what it cannot place, and puts it before the adjuvants', () => {
    const { steps, unknown, tooManyPartners } = mixingOrder([item('adjuvant'), item(null), item('WP')]);
    expect(steps.flatMap((step) => (step.kind === 'add' ? [step.item.formulation] : []))).toEqual(['WP', null, 'adjuvant']);
    expect(unknown).toEqual([item(null)]);
    expect(tooManyPartners).toBe(false);
  });
});
