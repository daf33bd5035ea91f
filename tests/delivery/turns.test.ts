import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { scriptedAssessor } from './support/scripted-assessor.ts';
import { createAlertApp, type AlertApp } from './support/alert-app.ts';

const minutes = (app: AlertApp, count: number) => app.clock.set(new Date(app.clock.now().getTime() + count * 60_000));
const titles = (app: AlertApp): string[] => app.fakes.push.received().map((push) => push.title).reverse();

// The eve has been told at 20:00 local (00:00 UTC), then time stands still unless a test moves it.
describe('a told verdict that turns', () => {
  let app: AlertApp;
  beforeAll(async () => {
    app = await createAlertApp();
  });
  beforeEach(async () => {
    await app.reopen();
    await app.enablePhone(app.owner);
  });
  afterAll(() => app.close());
  const tellEve = () => app.passTo('2026-06-10T00:00:00Z');

  it('is told at once when it turns to hold, also for the third time in a night', async () => {
    app.assessor.say({ verdict: 'go' });
    await tellEve();
    for (const because of ['wind', 'gusts', 'inversion'] as const) {
      app.assessor.say({ verdict: 'hold', because });
      await app.newForecast();
      expect(app.fakes.push.received()[0]).toMatchObject({ verdict: 'hold', title: `Changed. Hold, ${because}` });
      app.assessor.say({ verdict: 'go' });
      await app.newForecast();
      minutes(app, 61);
      await app.newForecast();
      expect(app.fakes.push.received()[0]).toMatchObject({ verdict: 'go' });
    }
  });

  it('is told at once when it turns to go for the first time', async () => {
    app.assessor.say({ verdict: 'hold' });
    await tellEve();
    app.assessor.say({ verdict: 'go' });
    await app.newForecast();
    expect(titles(app)).toEqual(['Hold, wind', 'Changed. Go, 6:00–7:00']);
  });

  it('waits with a go while the answer flaps, and tells it when it has held', async () => {
    app.assessor.say({ verdict: 'go' });
    await tellEve();
    app.assessor.say({ verdict: 'hold', because: 'gusts' });
    await app.newForecast();
    for (let flap = 0; flap < 4; flap += 1) {
      minutes(app, 3);
      app.assessor.say({ verdict: 'go' });
      await app.newForecast();
      minutes(app, 3);
      app.assessor.say({ verdict: 'hold', because: 'gusts' });
      await app.newForecast();
    }
    expect(titles(app)).toEqual(['Go, 6:00–7:00', 'Changed. Hold, gusts']);
    minutes(app, 3);
    app.assessor.say({ verdict: 'go' });
    await app.newForecast();
    expect(titles(app)).toHaveLength(2);
    const since = app.clock.now().getTime();
    // No forecast comes in between: the schedule itself looks again when the go is ripe.
    await app.passTo(new Date(since + 14 * 60_000).toISOString());
    expect(titles(app)).toHaveLength(2);
    await app.passTo(new Date(since + 15 * 60_000).toISOString());
    expect(titles(app).at(-1)).toBe('Changed. Go, 6:00–7:00');
  });

  it('is told when a go moves so far that its told start works no more, and not for a small shift', async () => {
    app.assessor.say({ verdict: 'go', from: '06:00', to: '07:30', latestStart: '07:00' });
    await tellEve();
    app.assessor.say({ verdict: 'go', from: '05:50', to: '07:10', latestStart: '06:40' });
    await app.newForecast();
    expect(titles(app)).toHaveLength(1);
    app.assessor.say({ verdict: 'go', from: '06:40', to: '07:40', latestStart: '07:10' });
    await app.newForecast();
    expect(titles(app).at(-1)).toBe('New time. Go, 6:40–7:40');
  });

  it('is told no more when its window is over', async () => {
    app.assessor.say({ verdict: 'go', from: '06:00', to: '07:00' });
    await tellEve();
    await app.passTo('2026-06-10T11:01:00Z');
    const before = titles(app).length;
    app.assessor.say({ verdict: 'hold' });
    await app.newForecast();
    expect(titles(app)).toHaveLength(before);
  });

  it('is no turn when only the reason of a hold changes', async () => {
    app.assessor.say({ verdict: 'hold', because: 'wind' });
    await tellEve();
    app.assessor.say({ verdict: 'hold', because: 'rainFree' });
    await app.newForecast();
    expect(titles(app)).toHaveLength(1);
  });

  it('never tells a turn of a morning that was not told yet', async () => {
    app.assessor.say({ verdict: 'go' });
    await app.newForecast();
    app.assessor.say({ verdict: 'hold' });
    await app.newForecast();
    expect(titles(app)).toHaveLength(0);
  });

  it('turns to hold, not enough to tell, when the forecast grows stale', async () => {
    app.assessor.say({ verdict: 'go' });
    await tellEve();
    app.assessor.forecast = 'stale';
    await app.newForecast();
    expect(app.fakes.push.received()[0]).toMatchObject({ title: 'Changed. Hold, not enough to tell', verdict: 'unknown' });
    expect(app.fakes.push.received()[0]!.body).toContain('No fresh forecast');
  });
});

describe('several plans of one morning', () => {
  let app: AlertApp;
  beforeAll(async () => {
    app = await createAlertApp();
  });
  beforeEach(async () => {
    await app.reopen();
    await app.enablePhone(app.owner);
    const { models } = app.services;
    const now = app.clock.now();
    const kept = { farmId: app.farmId, version: 1, archivedAt: null, createdAt: now, updatedAt: now };
    const sprayerId = randomUUID();
    await models.sprayers.create({ ...kept, id: sprayerId, name: 'Blower', type: 'backpackMistBlower', tankL: 14, dropletClass: 'fine', minutesPerTank: 12, changeOverMinutes: 6, notes: '' });
    const planIds = new Map<string, string>();
    for (const name of ['Spruce row', 'Orchard', 'Yard', 'Brook']) {
      const id = randomUUID();
      planIds.set(name, id);
      await models.plans.create({ ...kept, id, name, target: '', sprayerId, carrierLHa: 200, firstDate: '2026-06-01', lastDate: '2026-06-30', reserveMinutes: 10, state: 'planned', bloom: false, beeKinds: ['honeyBee'], windMaxMs: null, windMinMs: null, gustMaxMs: null, inversionMax: null, rainFreeHours: null, rainMm: 0.2, rainProbabilityPct: 40, foliageDry: false, deltaTMinC: null, deltaTMaxC: null, temperatureMinC: null, temperatureMaxC: null, notes: '' });
    }
    // The scripted assessor names plans by their ids.
    const named = scriptedAssessor(app.services, planIds);
    app.assessor.assessFarm = named.assessFarm;
    app.assessor.say = named.say;
  });
  afterAll(() => app.close());

  it('share one notice whose title says which go and why the others hold', async () => {
    app.assessor.say({ plan: 'Orchard', verdict: 'hold', because: 'pollinators' }, { plan: 'Spruce row', verdict: 'go', from: '05:25', to: '06:10' });
    await app.passTo('2026-06-10T00:00:00Z');
    expect(app.fakes.push.received()).toHaveLength(1);
    const [push] = app.fakes.push.received();
    expect(push).toMatchObject({ title: 'Go, 5:25–6:10: Spruce row; Hold, bees at work: Orchard', verdict: 'go' });
    expect(push!.body).toContain('Orchard: Wind passes 10 mph.');
  });

  it('are counted when they are many', async () => {
    app.assessor.say({ plan: 'Orchard', verdict: 'hold', because: 'gusts' }, { plan: 'Spruce row', verdict: 'go', from: '05:25' }, { plan: 'Yard', verdict: 'go', from: '05:40' }, { plan: 'Brook', verdict: 'hold', because: 'inversion' });
    await app.passTo('2026-06-10T00:00:00Z');
    expect(app.fakes.push.received()[0]!.title).toBe('Go for 2 of 4 plans, from 5:25');
  });

  it('turn alone: the title names the plan that turned, the text tells them all', async () => {
    app.assessor.say({ plan: 'Orchard', verdict: 'go' }, { plan: 'Spruce row', verdict: 'go' });
    await app.passTo('2026-06-10T00:00:00Z');
    app.assessor.say({ plan: 'Orchard', verdict: 'go' }, { plan: 'Spruce row', verdict: 'hold', because: 'stillAir' });
    await app.newForecast();
    const [push] = app.fakes.push.received();
    expect(push!.title).toBe('Changed. Hold, still air: Spruce row');
    expect(push!.body).toContain('Orchard: Wind stays under 8 mph.');
  });
});
