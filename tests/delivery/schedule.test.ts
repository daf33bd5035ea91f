import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { createScheduler } from '../../server/schedule/scheduler.ts';
import { nextRefresh } from '../../server/schedule/moments.ts';
import { buildFarm } from '../support/people.ts';
import { createAlertApp, type AlertApp } from './support/alert-app.ts';

let app: AlertApp;
beforeAll(async () => {
  app = await createAlertApp();
});
beforeEach(async () => {
  await app.reopen();
  await app.enablePhone(app.owner);
  app.assessor.say({ verdict: 'go', from: '06:10', to: '07:20' });
  await app.parts.scheduler.tick();
});
afterAll(() => app.close());

/** The server is down until then: the clock jumps, and nothing falls due on the way. */
async function downUntil(instant: string): Promise<void> {
  app.clock.set(new Date(instant));
  await app.parts.scheduler.tick();
  await app.parts.worker.drain();
}
const kinds = async () => (await app.notices()).map((notice) => `${notice.kind} ${notice.date}`);

describe('after a stop', () => {
  it('the eve is told late while it helps, with its age', async () => {
    await downUntil('2026-06-10T01:30:00Z');
    expect(await app.notices()).toMatchObject([{ kind: 'eve', date: '2026-06-10', lateMinutes: 90 }]);
    expect(app.fakes.push.received()[0]!.body).toContain('This comes 90 minutes late.');
  });

  it('past dawn only the dawn is told, late: it says all that the eve would have', async () => {
    await downUntil('2026-06-10T10:30:00Z');
    expect(await kinds()).toEqual(['summary 2026-06-10', 'dawn 2026-06-10']);
    expect((await app.notices())[0]!.lateMinutes).toBeGreaterThan(60);
  });

  it('a dawn whose morning is over is dropped', async () => {
    await downUntil('2026-06-10T16:01:00Z');
    expect(await kinds()).toEqual([]);
  });

  it('of many days only what still helps is told, and the days go on as usual', async () => {
    await downUntil('2026-06-16T01:00:00Z');
    expect(await kinds()).toEqual(['eve 2026-06-16']);
    await app.passTo('2026-06-17T01:00:00Z');
    expect(await kinds()).toEqual(['eve 2026-06-17', 'summary 2026-06-16', 'dawn 2026-06-16', 'eve 2026-06-16']);
  });
});

describe('day after day', () => {
  it('each morning is told once by each notice, over the autumn clock change too', async () => {
    await app.reopen('2026-10-30T12:00:00Z');
    await app.passTo('2026-11-03T18:00:00Z');
    const notices = (await app.notices()).filter((notice) => notice.kind === 'eve' || notice.kind === 'dawn');
    expect(notices.map((notice) => `${notice.kind} ${notice.date} ${notice.createdAt.slice(0, 16)}`).reverse()).toEqual([
      'eve 2026-10-31 2026-10-31T00:00', expect.stringMatching(/^dawn 2026-10-31 2026-10-31T11:4/), 'eve 2026-11-01 2026-11-01T00:00', expect.stringMatching(/^dawn 2026-11-01 2026-11-01T11:4/),
      'eve 2026-11-02 2026-11-02T01:00', expect.stringMatching(/^dawn 2026-11-02 2026-11-02T11:5/), 'eve 2026-11-03 2026-11-03T01:00', expect.stringMatching(/^dawn 2026-11-03 2026-11-03T11:5/),
    ]);
  });

  it('the forecast is refreshed every hour at the farm’s own minute', async () => {
    const first = nextRefresh(app.farmId, app.clock.now());
    app.assessor.asked.length = 0;
    await app.passTo(new Date(first.getTime() - 1000).toISOString());
    const refreshes = () => app.assessor.asked.filter(({ options }) => !options.occasion).length;
    expect(refreshes()).toBe(0);
    await app.passTo(new Date(first.getTime() + 3 * 3_600_000).toISOString());
    expect(refreshes()).toBe(4);
  });
});

describe('two schedulers on one database', () => {
  it('tell each notice once', async () => {
    const other = createScheduler(app.services, app.assessor);
    app.clock.set(new Date('2026-06-10T00:00:00Z'));
    await Promise.all([app.parts.scheduler.tick(), other.tick(), app.parts.scheduler.tick(), other.tick()]);
    expect(await kinds()).toEqual(['eve 2026-06-10']);
    app.clock.set(new Date('2026-06-10T09:40:00Z'));
    await Promise.all([other.tick(), app.parts.scheduler.tick()]);
    await app.parts.worker.drain();
    expect(await kinds()).toEqual(['summary 2026-06-10', 'dawn 2026-06-10', 'eve 2026-06-10']);
    expect(app.fakes.push.received()).toHaveLength(1);
  });

  it('repeat no notice when one of them is asked for the same moment again', async () => {
    const occasion = { kind: 'eve' as const, morning: '2026-06-10', dueAt: new Date('2026-06-10T00:00:00Z') };
    app.clock.set(new Date('2026-06-10T00:00:00Z'));
    await Promise.all([1, 2, 3].map(() => app.assessor.assessFarm(app.farmId, { fetch: 'ifDue', occasion })));
    expect(await kinds()).toEqual(['eve 2026-06-10']);
  });
});

describe('when an assessment fails', () => {
  it('the notice is tried again until it is told', async () => {
    app.assessor.failures.push(new Error('database away'), new Error('database away'));
    await downUntil('2026-06-10T00:00:00Z');
    expect(await kinds()).toEqual([]);
    await app.passTo('2026-06-10T00:02:00Z');
    expect(await kinds()).toEqual(['eve 2026-06-10']);
    expect(app.assessor.failures).toEqual([]);
  });

  it('other farms get their notices all the same', async () => {
    const other = await buildFarm(app, 'Other farm');
    await app.parts.scheduler.tick();
    const assess = app.assessor.assessFarm;
    app.assessor.assessFarm = (farmId, options) => (farmId === app.farmId ? Promise.reject(new Error('broken plan')) : assess(farmId, options));
    await downUntil('2026-06-10T00:00:00Z');
    app.assessor.assessFarm = assess;
    expect(await app.services.models.notices.count({ where: { farmId: other, kind: 'eve' } })).toBe(1);
  });
});

describe('a farm that changes', () => {
  const change = (values: Partial<{ eveTime: string; timeZone: string; archivedAt: Date | null; dawnLeadMinutes: number }>) =>
    app.services.models.farms.findByPk(app.farmId).then((farm) => farm!.update({ ...values, version: farm!.version + 1 }));

  it('is told at its new eve time from now on', async () => {
    await change({ eveTime: '21:30' });
    await app.passTo('2026-06-10T01:29:00Z');
    expect(await kinds()).toEqual([]);
    await app.passTo('2026-06-10T01:30:00Z');
    expect(await kinds()).toEqual(['eve 2026-06-10']);
  });

  it('whose new eve time has passed today is told at once, not a day later', async () => {
    app.clock.set(new Date('2026-06-09T23:30:00Z'));
    await change({ eveTime: '19:00' });
    await app.parts.scheduler.tick();
    expect(await kinds()).toEqual(['eve 2026-06-10']);
  });

  it('is told nothing while it is archived, and again when it is back', async () => {
    await change({ archivedAt: app.clock.now() });
    await app.passTo('2026-06-10T10:00:00Z');
    expect(await kinds()).toEqual([]);
    expect(await app.services.models.moments.count({ where: { kind: ['eve', 'dawn'] } })).toBe(0);
    await change({ archivedAt: null });
    await app.passTo('2026-06-11T00:00:00Z');
    expect(await kinds()).toEqual(['eve 2026-06-11']);
  });
});

describe('without a fresh forecast', () => {
  it('the owner is told by mail two hours before the eve, once, and the eve says hold and why', async () => {
    app.assessor.forecast = 'none';
    await app.passTo('2026-06-10T09:40:00Z');
    const missing = (await app.notices()).filter((notice) => notice.kind === 'forecastMissing');
    expect(missing).toMatchObject([{ date: '2026-06-10', verdict: null, deliveries: [{ channel: 'email', state: 'delivered' }] }]);
    const mail = app.fakes.mail.mails().at(-1)!;
    expect(mail).toMatchObject({ to: app.owner.email, subject: 'No fresh forecast for Wed, Jun 10' });
    expect(mail.text).toContain('every answer is hold');
    for (const push of app.fakes.push.received()) expect(push).toMatchObject({ title: 'Hold, not enough to tell', verdict: 'unknown' });
    expect(app.fakes.push.received().length).toBeGreaterThanOrEqual(2);
  });

  it('nothing is said in the middle of the day, when there is time', async () => {
    await app.reopen('2026-06-10T17:00:00Z');
    app.assessor.forecast = 'stale';
    await app.passTo('2026-06-10T21:30:00Z');
    expect(await app.notices()).toEqual([]);
  });
});
