import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { pauseMs, schedules } from '../../server/delivery/backoff.ts';
import { createAlertApp, type AlertApp } from './support/alert-app.ts';

const eve = '2026-06-10T00:00:00Z';

describe('when a far end is in trouble', () => {
  let app: AlertApp;
  beforeAll(async () => {
    app = await createAlertApp();
  });
  beforeEach(() => app.reopen());
  afterAll(() => app.close());
  const after = async (seconds: number) => {
    app.clock.set(new Date(app.clock.now().getTime() + seconds * 1000));
    await app.parts.worker.drain();
  };
  const state = async () => (await app.deliveries()).map(({ channel, state, attempts }) => `${channel} ${state} ${attempts}`);

  it('tries a push again after an error of the service, and it arrives once', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status: 500, body: 'trouble' }, 2);
    await app.passTo(eve);
    expect(await app.deliveries()).toMatchObject([{ state: 'waiting', attempts: 1, lastError: 'The push service answered 500: trouble.', acceptedAt: null }]);
    await after(2);
    expect(await state()).toEqual(['push waiting 2']);
    await after(4);
    expect(await app.deliveries()).toMatchObject([{ state: 'delivered', attempts: 3, lastError: null }]);
    expect(app.fakes.push.received()).toHaveLength(1);
  });

  it('tries again after a broken connection', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ broken: true });
    await app.passTo(eve);
    expect(await state()).toEqual(['push waiting 1']);
    await after(2);
    expect(await state()).toEqual(['push delivered 2']);
  });

  it('keeps every attempt with its answer', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status: 503 });
    await app.passTo(eve);
    await after(2);
    const attempts = await app.services.models.deliveryAttempts.findAll({ order: [['attempt', 'ASC']] });
    expect(attempts.map(({ attempt, outcome, status }) => ({ attempt, outcome, status }))).toEqual([
      { attempt: 1, outcome: 'retry', status: 503 },
      { attempt: 2, outcome: 'accepted', status: 201 },
    ]);
  });

  it('comes back no sooner than a busy push service asks', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status: 429, headers: { 'Retry-After': '120' } });
    await app.passTo(eve);
    await after(119);
    expect(await state()).toEqual(['push waiting 1']);
    await after(1);
    expect(await state()).toEqual(['push delivered 2']);
  });

  it.each([404, 410])('removes a device whose subscription is gone (%i) and sends it nothing more', async (status) => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status });
    await app.passTo(eve);
    expect(await state()).toEqual(['push dead 1']);
    expect((await app.owner.get(`/api/farms/${app.farmId}/devices`)).body).toEqual({ items: [] });
    await app.passTo('2026-06-10T09:40:00Z');
    expect((await app.deliveries()).filter(({ kind }) => kind === 'dawn')).toEqual([]);
  });

  it('removes a device subscribed under a key that is not ours any more', async () => {
    await app.enablePhone(app.owner);
    app.fakes.phones[0]!.subscribe('BA1Hxzyi1RUM1b5wjxsn7nGxAszw2u61m164i3MrAIxHF6YK5h4SDYic-dRuU_RCPCfA5aq9ojSwk5Y2EmClBPs');
    await app.services.models.devices.update({ endpoint: `https://push.dawnvane-demo.invalid/send/${app.fakes.phones[0]!.id}` }, { where: {} });
    await app.passTo(eve);
    expect(await app.deliveries()).toMatchObject([{ state: 'dead', lastError: expect.stringContaining('VapidPkHashMismatch') as string }]);
    expect((await app.owner.get(`/api/farms/${app.farmId}/devices`)).body).toEqual({ items: [] });
  });

  it('sends a shorter form when a service finds the push too large', async () => {
    await app.enablePhone(app.owner);
    app.assessor.say({ verdict: 'go' });
    app.fakes.push.faults.add({ status: 413 });
    await app.passTo(eve);
    const [push] = app.fakes.push.received();
    expect(push!.title).toBe('Go, 6:00–7:00');
    expect(push!.body.length).toBeLessThanOrEqual(80);
    expect(await state()).toEqual(['push delivered 1']);
  });

  it('gives up on a push that the service refuses for what it is', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status: 400, body: 'BadTopic' });
    await app.passTo(eve);
    expect(await state()).toEqual(['push dead 1']);
  });

  it('never lets an old go overtake a newer hold: the hold takes the place of the go that waits', async () => {
    await app.enablePhone(app.owner);
    app.assessor.say({ verdict: 'go' });
    app.fakes.push.faults.add({ status: 503, headers: { 'Retry-After': '60' } });
    await app.passTo(eve);
    app.assessor.say({ verdict: 'hold', because: 'gusts' });
    await app.newForecast();
    await after(3600);
    expect(app.fakes.push.received().map((push) => push.verdict)).toEqual(['hold']);
    expect((await app.deliveries()).find(({ kind }) => kind === 'eve')).toMatchObject({ state: 'dropped', lastError: 'Replaced by a newer notice of the same morning.' });
  });

  it('holds a newer notice back while an older one is on its way, and drops the older if that fails', async () => {
    await app.enablePhone(app.owner);
    app.assessor.say({ verdict: 'go' });
    // The eve is claimed by a worker and on its way.
    await app.parts.scheduler.tick();
    app.clock.set(new Date(eve));
    await app.parts.scheduler.tick();
    await app.services.models.deliveries.update({ state: 'claimed', claimedBy: 'another worker', attempts: 1, leaseUntil: new Date(Date.parse(eve) + 60_000) }, { where: { state: 'waiting' } });
    app.assessor.say({ verdict: 'hold' });
    await app.newForecast();
    expect(app.fakes.push.received()).toEqual([]);
    // That worker is gone for good: its claim lapses.
    await after(61);
    expect(app.fakes.push.received().map((push) => push.verdict)).toEqual(['hold']);
    expect((await app.deliveries()).find(({ kind }) => kind === 'eve')).toMatchObject({ state: 'dropped' });
  });

  it('drops what was not sent in time to be of use, and says so', async () => {
    await app.enablePhone(app.owner);
    app.assessor.say({ verdict: 'go', from: '06:00', to: '06:30' });
    app.fakes.push.faults.add({ status: 503, headers: { 'Retry-After': '90000' } });
    await app.passTo(eve);
    await after(11 * 3600);
    expect(await app.deliveries()).toMatchObject([{ state: 'dropped', lastError: 'Not sent in time to be of use.', nextAttemptAt: null }]);
  });

  it('tells the age of a notice that goes out late', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status: 503, headers: { 'Retry-After': '1500' } });
    await app.passTo(eve);
    await after(1500);
    expect(app.fakes.push.received()[0]!.body).toContain('This comes 25 minutes late.');
  });

  it('gives a dead delivery another try when a person asks for it', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status: 400, body: 'odd' });
    await app.passTo(eve);
    const [dead] = await app.deliveries();
    const replayed = await app.owner.post(`/api/farms/${app.farmId}/deliveries/${dead!.id}/replay`).expect(200);
    expect(replayed.body).toMatchObject({ id: dead!.id, state: 'waiting' });
    await app.parts.worker.drain();
    expect(await state()).toEqual(['push delivered 2']);
    await app.owner.post(`/api/farms/${app.farmId}/deliveries/${dead!.id}/replay`).expect(409);
  });

  it('replays no verdict that is over or replaced', async () => {
    await app.enablePhone(app.owner);
    app.fakes.push.faults.add({ status: 400 });
    await app.passTo(eve);
    const [dead] = await app.deliveries();
    app.assessor.say({ verdict: 'go' });
    await app.newForecast();
    const replaced = await app.owner.post(`/api/farms/${app.farmId}/deliveries/${dead!.id}/replay`).expect(409);
    expect((replaced.body as { detail: string }).detail).toContain('newer notice');
    app.clock.set(new Date('2026-06-10T17:00:00Z'));
    const over = await app.owner.post(`/api/farms/${app.farmId}/deliveries/${dead!.id}/replay`).expect(409);
    expect((over.body as { detail: string }).detail).toContain('of no use');
  });

  describe('a webhook', () => {
    it('is signed anew at each try, under the same id and with the same bytes', async () => {
      await app.addWebhook();
      app.fakes.webhook.faults.add({ status: 500 });
      await app.passTo(eve);
      await after(6);
      const [second, first] = app.fakes.webhook.hooks();
      expect(second).toMatchObject({ messageId: first!.messageId, body: first!.body, signatureValid: true, status: 200 });
      expect(first!.signatureValid).toBe(true);
      expect(Number(second!.timestamp) - Number(first!.timestamp)).toBe(6);
    });

    it('that answers 410 is switched off, and says why', async () => {
      await app.addWebhook();
      app.fakes.webhook.faults.add({ status: 410 });
      await app.passTo(eve);
      const { body } = await app.owner.get(`/api/farms/${app.farmId}/webhooks`).expect(200);
      expect(body).toMatchObject({ items: [{ active: false, disabledBecause: 'The receiver answered 410 Gone.' }] });
      expect(await state()).toEqual(['webhook dead 1']);
    });

    it('counts a redirect as a failure', async () => {
      await app.addWebhook();
      app.fakes.webhook.faults.add({ status: 302, headers: { Location: 'https://hooks.dawnvane-demo.invalid/other' } });
      await app.passTo(eve);
      expect(await state()).toEqual(['webhook waiting 1']);
      expect(app.fakes.webhook.hooks()).toHaveLength(1);
    });

    it('that fails for five days is switched off', async () => {
      const id = await app.addWebhook();
      app.fakes.webhook.faults.add({ status: 500, body: 'down' }, 1000);
      await app.passTo(eve);
      expect((await app.services.models.webhooks.findByPk(id))?.failingSince).toEqual(new Date(eve));
      for (let day = 1; day <= 5; day += 1) await app.passTo(new Date(Date.parse(eve) + day * 86_400_000 + 60_000).toISOString());
      const webhook = await app.services.models.webhooks.findByPk(id);
      expect(webhook).toMatchObject({ active: false, disabledBecause: 'Nothing could be delivered for 5 days. The receiver answered 500: down' });
    });

    it('keeps the beginning of a long answer only', async () => {
      await app.addWebhook();
      app.fakes.webhook.faults.add({ status: 500, body: 'x'.repeat(100_000) });
      await app.passTo(eve);
      expect((await app.deliveries())[0]!.lastError!.length).toBeLessThanOrEqual(500);
    });
  });

  describe('the mail relay', () => {
    const wish = () => app.owner.put(`/api/farms/${app.farmId}/wishes`).send({ push: [], email: ['eve'] }).expect(200);

    it('that asks to come back gets the mail later, once, under the same Message-ID', async () => {
      await wish();
      app.fakes.mail.failNext({ code: 451 });
      await app.passTo(eve);
      expect(await state()).toEqual(['email waiting 1']);
      await after(299);
      expect(await state()).toEqual(['email waiting 1']);
      await after(1);
      expect(await state()).toEqual(['email delivered 2']);
      expect(app.fakes.mail.mails()).toHaveLength(1);
    });

    it('that refuses the address for good is not asked again', async () => {
      await wish();
      app.fakes.mail.failNext({ code: 550, text: 'no such mailbox' });
      await app.passTo(eve);
      expect(await app.deliveries()).toMatchObject([{ state: 'dead', attempts: 1, lastError: expect.stringContaining('no such mailbox') as string }]);
    });

    it('that takes the mail and then drops the line gets it again, so that its reader knows it as the same', async () => {
      await wish();
      app.fakes.mail.failNext({ dropAfterTaking: true });
      await app.passTo(eve);
      await after(60);
      const mails = app.fakes.mail.mails();
      expect(mails).toHaveLength(2);
      expect(mails[0]!.messageId).toBe(mails[1]!.messageId);
      expect(await state()).toEqual(['email delivered 2']);
    });

    it('gets nothing for a member who left, or whose address is not confirmed', async () => {
      await wish();
      await app.services.models.users.update({ emailConfirmedAt: null }, { where: { id: app.owner.userId } });
      await app.passTo(eve);
      expect(await app.deliveries()).toEqual([]);
      await app.services.models.users.update({ emailConfirmedAt: app.clock.now() }, { where: { id: app.owner.userId } });
    });
  });
});

describe('the pauses between tries', () => {
  it('grow with full jitter up to a bound for push and e-mail', () => {
    const longest = (channel: 'push' | 'email') => [1, 2, 3, 4, 20].map((tries) => pauseMs(channel, tries, 0.999999, null)! / 1000).map(Math.round);
    expect(longest('push')).toEqual([2, 4, 8, 16, 300]);
    expect(longest('email')).toEqual([20, 40, 80, 160, 1800]);
    expect(pauseMs('push', 5, 0, null)).toBe(0);
  });

  it('follow the example schedule of Standard Webhooks for webhooks: ten tries over more than three days', () => {
    const pauses = Array.from({ length: 9 }, (_, index) => pauseMs('webhook', index + 1, 0.999999, null)! / 1000);
    expect(pauses.map(Math.round)).toEqual([5, 300, 1800, 7200, 18_000, 36_000, 50_400, 72_000, 86_400]);
    expect(pauses.reduce((sum, pause) => sum + pause, 0) / 3600).toBeGreaterThan(72);
    expect(pauseMs('webhook', 10, 0.5, null)).toBeNull();
  });

  it('are never shorter than the far end asks, and end after the last try', () => {
    expect(pauseMs('push', 1, 0.5, 90)).toBe(90_000);
    for (const channel of ['push', 'email', 'webhook'] as const) expect(pauseMs(channel, schedules[channel].triesMax, 0.5, 5)).toBeNull();
  });
});
