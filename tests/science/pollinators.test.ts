/** Thresholds: Vicens & Bosch 2000 and others as cited in shared/pollinators/thresholds.ts; the vectors are derived from them. */
import { describe, expect, it } from 'vitest';
import { activityBand, beeActivity } from '../../shared/pollinators/activity.ts';
import { beeThresholds, likelyActivity, possibleActivity } from '../../shared/pollinators/thresholds.ts';
import { bibliography } from '../../shared/bibliography.ts';
import { beeKinds } from '../../shared/assessment/case.ts';

const at = (temperatureC: number, radiationWm2: number, windMs = 1, rainMm = 0) => ({ temperatureC, radiationWm2, windMs, rainMm, sunAltitudeDeg: 20 });

describe('bee activity', () => {
  it('is none at 7 °C at a clear dawn for every kind', () => {
    for (const kind of beeKinds) expect(beeActivity(kind, { ...at(7, 30), sunAltitudeDeg: 4 })).toBe(0);
  });

  it('at 11 °C and 250 W/m² is partial for honey bees and more for mason and bumble bees (Vicens & Bosch 2000)', () => {
    const honey = beeActivity('honeyBee', at(11, 250));
    expect(honey).toBeGreaterThanOrEqual(possibleActivity);
    expect(honey).toBeLessThan(likelyActivity);
    expect(beeActivity('masonBee', at(11, 250))).toBeGreaterThan(honey);
    expect(beeActivity('bumbleBee', at(11, 250))).toBeGreaterThan(honey);
  });

  it('is full from 14 °C and 300 W/m² for honey bees, from 12 °C and 200 W/m² for mason bees (Vicens & Bosch 2000)', () => {
    expect(beeActivity('honeyBee', at(14, 300))).toBe(1);
    expect(beeActivity('masonBee', at(12, 200))).toBe(1);
  });

  it('at 15 °C and 400 W/m² is likely in a breeze and less in 30 km/h of wind', () => {
    expect(beeActivity('honeyBee', at(15, 400, 8 / 3.6))).toBeGreaterThanOrEqual(likelyActivity);
    expect(beeActivity('honeyBee', at(15, 400, 30 / 3.6))).toBeLessThan(likelyActivity);
  });

  it('ends for honey bees in strong wind and rain, while mason bees fly on in both (Vicens & Bosch 2000)', () => {
    expect(beeActivity('honeyBee', at(18, 500, 10))).toBe(0);
    expect(beeActivity('honeyBee', at(18, 500, 1, 1))).toBe(0);
    expect(beeActivity('masonBee', at(18, 500, 10, 1))).toBe(1);
  });

  it('is possible for bumble bees from civil dawn on when it is warm', () => {
    expect(beeActivity('bumbleBee', { ...at(14, 0), sunAltitudeDeg: -3 })).toBeGreaterThanOrEqual(possibleActivity);
    expect(beeActivity('honeyBee', { ...at(14, 0), sunAltitudeDeg: -3 })).toBe(0);
  });

  it('is unknown without a temperature, unless the dark rules flight out', () => {
    expect(beeActivity('honeyBee', at(NaN, 300))).toBeNaN();
    expect(beeActivity('honeyBee', at(NaN, 0))).toBe(0);
    expect(beeActivity('honeyBee', at(15, NaN))).toBeNaN();
  });

  it('takes an unknown wind or rain for no hindrance', () => {
    expect(beeActivity('honeyBee', at(15, 400, NaN, NaN))).toBe(1);
  });

  it('names sources that stand in the bibliography', () => {
    for (const kind of beeKinds) for (const key of beeThresholds[kind].sources) expect(Object.keys(bibliography)).toContain(key);
  });
});

describe('start and end of activity', () => {
  it('carry a band from possible to likely', () => {
    const times = [0, 5, 10, 15, 20].map((minute) => minute * 60_000);
    expect(activityBand(times, [0, 0.2, 0.6, 0.3, 0], 300_000)).toEqual({ possibleFromMs: 300_000, likelyFromMs: 600_000, likelyUntilMs: 900_000, possibleUntilMs: 1_200_000 });
  });

  it('are none on a cold morning', () => {
    expect(activityBand([0], [0], 300_000)).toEqual({ possibleFromMs: null, likelyFromMs: null, likelyUntilMs: null, possibleUntilMs: null });
  });
});
