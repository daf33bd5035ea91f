import { describe, expect, it } from 'vitest';
import { jobOfPlan } from './minutes.ts';

const sprayer = { tankL: 10, minutesPerTank: 6, changeOverMinutes: 3 };

describe('the minutes of a job', () => {
  it('are the spraying of each tank and a change-over between each two', () => {
    expect(jobOfPlan({ areaHa: 0.3, carrierLHa: 100, sprayer })).toEqual({ areaHa: 0.3, volumeL: 30, tanks: 3, fills: 3, minutesNeeded: 3 * 6 + 2 * 3 });
  });

  it('count a part tank by its part, but its filling whole', () => {
    const job = jobOfPlan({ areaHa: 0.25, carrierLHa: 100, sprayer });
    expect(job.tanks).toBeCloseTo(2.5, 12);
    expect(job.fills).toBe(3);
    expect(job.minutesNeeded).toBe(21);
  });

  it('need no change-over for a single tank', () => {
    expect(jobOfPlan({ areaHa: 0.1, carrierLHa: 100, sprayer }).minutesNeeded).toBe(6);
  });

  it('refuse a sprayer without a tank by name', () => {
    expect(() => jobOfPlan({ areaHa: 1, carrierLHa: 100, sprayer: { ...sprayer, tankL: 0 } })).toThrow(/tankL/);
  });

  it('come to 20–25 minutes for a thousand trees on just under an acre in four 3-gallon packs (common practice, no source)', () => {
    const gallonL = 3.785411784;
    const acreHa = 0.40468564224;
    const pack = { tankL: 3 * gallonL, minutesPerTank: 4.5, changeOverMinutes: 1.5 };
    const job = jobOfPlan({ areaHa: acreHa, carrierLHa: (12 * gallonL) / acreHa, sprayer: pack });
    expect(job.tanks).toBeCloseTo(4, 9);
    expect(job.minutesNeeded).toBeGreaterThanOrEqual(20);
    expect(job.minutesNeeded).toBeLessThanOrEqual(25);
  });
});
