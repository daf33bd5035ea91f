import supertest from 'supertest';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { loadPushKeys } from '../../server/delivery/push/keys.ts';
import { signInAs } from '../support/people.ts';
import { createAlertApp, type AlertApp } from './support/alert-app.ts';

let app: AlertApp;
beforeAll(async () => {
  app = await createAlertApp({ phones: ['Her phone', 'His phone'] });
});
beforeEach(() => app.reopen());
afterAll(() => app.close());
const url = (rest: string) => `/api/farms/${app.farmId}/${rest}`;
const devicesOf = async (browser: typeof app.owner) => ((await browser.get(url('devices')).expect(200)).body as { items: { id: string; name: string }[] }).items;

describe('devices', () => {
  it('are enabled with one call and renewed by the same call', async () => {
    const first = await app.enablePhone(app.owner);
    expect(await app.enablePhone(app.owner)).toBe(first);
    expect(await devicesOf(app.owner)).toMatchObject([{ name: 'Her phone', pushService: 'push.dawnvane-demo.invalid', lastAcceptedAt: null }]);
  });

  it('are shown to their own person only, and nobody else may test or remove them', async () => {
    const crew = await signInAs(app, app.farmId, 'crew');
    const id = await app.enablePhone(app.owner);
    expect(await devicesOf(crew as typeof app.owner)).toEqual([]);
    await crew.delete(url(`devices/${id}`)).expect(404);
    await crew.post(url(`devices/${id}/test`)).expect(404);
    await app.owner.delete(url(`devices/${id}`)).expect(204);
    expect(await devicesOf(app.owner)).toEqual([]);
  });

  it('belong to whoever enabled the browser last', async () => {
    const crew = await signInAs(app, app.farmId, 'crew');
    await app.enablePhone(app.owner);
    await app.enablePhone(crew);
    expect(await devicesOf(app.owner)).toEqual([]);
    expect(await devicesOf(crew as typeof app.owner)).toHaveLength(1);
  });

  it.each([
    ['an address within', { endpoint: 'https://127.0.0.1/push' }, 'endpoint'],
    ['a plain http address', { endpoint: 'http://push.example.org/x' }, 'endpoint'],
    ['a key that is no point of the curve', { keys: { p256dh: Buffer.concat([Buffer.from([4]), Buffer.alloc(64, 9)]).toString('base64url'), auth: 'BTBZMqHH6r4Tts7J_aSIgg' } }, 'keys.p256dh'],
    ['a secret of the wrong length', { keys: { p256dh: 'BCVxsr7N_eNgVRqvHtD0zTZsEc6-VV-JvLexhqUzORcxaOzi6-AYWXvTBHm4bjyPjs7Vd8pZGH6SRpkNtoIAiw4', auth: 'BTBZMqHH6r4Tts7J_aSIggAA' } }, 'keys.auth'],
  ])('are refused with %s, by the name of the field', async (_what, wrong, path) => {
    const phone = app.fakes.phones[0]!;
    const { body } = await app.owner.post(url('devices')).send({ name: 'x', ...phone.subscribe(app.parts.pushKeys.current.publicKey), ...wrong }).expect(422);
    expect((body as { problems: { path: string }[] }).problems.map((problem) => problem.path)).toEqual([path]);
  });

  it('get a test notice that shows on that device only', async () => {
    const [id] = [await app.enablePhone(app.owner, 0), await app.enablePhone(app.owner, 1)];
    await app.owner.post(url(`devices/${id}/test`)).expect(202);
    await app.owner.post(url(`devices/${id}/test`)).expect(202);
    await app.parts.worker.drain();
    expect(app.fakes.push.received()).toMatchObject([{ title: 'Test notice', device: 'Her phone', urgency: 'high' }, { title: 'Test notice', device: 'Her phone' }]);
    expect((await app.notices()).map((notice) => notice.kind)).toEqual(['test', 'test']);
  });

  it('get the same VAPID key from every server on the database, kept sealed', async () => {
    const [one, other] = await Promise.all([loadPushKeys(app.services), loadPushKeys(app.services)]);
    expect(one.current).toEqual(app.parts.pushKeys.current);
    expect(other.current).toEqual(one.current);
    expect(one.byId(one.current.id)).toEqual(one.current);
    expect(one.byId('unknown')).toBeNull();
    const row = await app.services.models.settings.findByPk('vapidKeys');
    expect(JSON.stringify(row!.value)).not.toContain(one.current.privateKey);
  });
});

describe('what a push tells when it was shown', () => {
  async function pushed() {
    let token = '';
    app.fakes.push.onPush((received) => {
      token = received.token ?? '';
    });
    const id = await app.enablePhone(app.owner);
    await app.owner.post(url(`devices/${id}/test`)).expect(202);
    await app.parts.worker.drain();
    return token;
  }
  /** A service worker sends no cookie of use here. */
  const acknowledge = (token: string, what: string) => supertest(app.app).post('/api/push/acknowledge').send({ token, what });

  it('tells accepted from shown from tapped', async () => {
    const token = await pushed();
    expect(await app.deliveries()).toMatchObject([{ state: 'delivered', shownAt: null, tappedAt: null }]);
    app.clock.set(new Date('2026-06-09T23:01:00Z'));
    await acknowledge(token, 'shown').expect(204);
    app.clock.set(new Date('2026-06-09T23:02:00Z'));
    await acknowledge(token, 'tapped').expect(204);
    await acknowledge(token, 'shown').expect(204);
    expect(await app.deliveries()).toMatchObject([{ shownAt: '2026-06-09T23:01:00.000Z', tappedAt: '2026-06-09T23:02:00.000Z' }]);
    expect(await devicesOf(app.owner)).toMatchObject([{ lastAcceptedAt: '2026-06-09T23:00:00.000Z', lastShownAt: '2026-06-09T23:02:00.000Z' }]);
  });

  it('takes what was tapped for shown', async () => {
    await acknowledge(await pushed(), 'tapped').expect(204);
    expect((await app.deliveries())[0]!.shownAt).not.toBeNull();
  });

  it('is believed only with the token of the push', async () => {
    await pushed();
    await acknowledge('x'.repeat(43), 'shown').expect(404);
    expect((await app.deliveries())[0]!.shownAt).toBeNull();
  });

  it('is also a valid declarative message, for browsers that show it by themselves', async () => {
    let text = '';
    app.fakes.push.onPush((received) => {
      text = received.text;
    });
    await pushed();
    expect(JSON.parse(text)).toMatchObject({ web_push: 8030, mutable: true, notification: { title: 'Test notice', navigate: `http://dawnvane.test/farms/${app.farmId}/mornings/2026-06-09`, lang: 'en' } });
  });
});

describe('wishes', () => {
  it('begin with what suits the role', async () => {
    const wishes = async (role: 'applicator' | 'crew' | 'observer') => (await (await signInAs(app, app.farmId, role)).get(url('wishes')).expect(200)).body as unknown;
    expect((await app.owner.get(url('wishes'))).body).toEqual({ push: ['eve', 'dawn', 'turn'], email: ['forecastMissing'] });
    expect(await wishes('applicator')).toEqual({ push: ['eve', 'dawn', 'turn'], email: [] });
    expect(await wishes('crew')).toEqual({ push: [], email: ['summary', 'turn'] });
    expect(await wishes('observer')).toEqual({ push: [], email: [] });
  });

  it('decide what comes by which channel', async () => {
    await app.enablePhone(app.owner);
    await app.owner.put(url('wishes')).send({ push: [], email: ['eve', 'eve'] }).expect(200, { push: [], email: ['eve'] });
    await app.passTo('2026-06-10T00:00:00Z');
    expect((await app.deliveries()).map(({ channel }) => channel)).toEqual(['email']);
  });

  it('of kinds that do not exist are refused', async () => {
    await app.owner.put(url('wishes')).send({ push: ['gossip'], email: [] }).expect(422);
  });
});

describe('each in their own units', () => {
  it('tells metric to one and US units to another', async () => {
    const metric = await signInAs(app, app.farmId, 'applicator');
    await app.services.models.users.update({ units: 'metric' }, { where: { id: metric.userId } });
    await app.enablePhone(app.owner, 0);
    await app.enablePhone(metric, 1);
    app.assessor.say({ verdict: 'go' });
    await app.passTo('2026-06-10T00:00:00Z');
    const bodies = Object.fromEntries(app.fakes.push.received().map((push) => [push.device, push.body]));
    expect(bodies['Her phone']).toContain('under 8 mph');
    expect(bodies['His phone']).toContain('under 3.6 m/s');
  });
});

describe('outgoing webhooks', () => {
  it('show their secret once and keep it sealed', async () => {
    const { body } = await app.owner.post(url('webhooks')).send({ name: 'Barn', url: app.fakes.webhook.url, kinds: ['dawn'] }).expect(201);
    const { id, secret } = body as { id: string; secret: string };
    expect(secret).toMatch(/^whsec_/);
    expect(JSON.stringify((await app.owner.get(url('webhooks'))).body)).not.toContain(secret);
    expect((await app.services.models.webhooks.findByPk(id))!.secretSealed).not.toContain(secret.slice(6, 20));
  });

  it.each(['https://127.0.0.1/x', 'https://[::1]/', 'https://169.254.169.254/latest', 'https://localhost/x'])('may not lead within: %s', async (target) => {
    const { body } = await app.owner.post(url('webhooks')).send({ name: 'x', url: target, kinds: ['dawn'] }).expect(422);
    expect(body).toMatchObject({ problems: [{ path: 'url' }] });
  });

  it('can be tested, changed, switched off and on, and removed; each change is noted', async () => {
    const id = await app.addWebhook();
    await app.owner.post(url(`webhooks/${id}/test`)).expect(202);
    await app.parts.worker.drain();
    expect(app.fakes.webhook.hooks()[0]).toMatchObject({ signatureValid: true });
    expect(JSON.parse(app.fakes.webhook.hooks()[0]!.body)).toMatchObject({ type: 'notice.test', data: { verdict: null } });
    const changed = { name: 'Barn', url: app.fakes.webhook.url, kinds: ['turn'] };
    await app.owner.put(url(`webhooks/${id}`)).send({ ...changed, active: false }).expect(200);
    await app.owner.post(url(`webhooks/${id}/test`)).expect(409);
    expect((await app.owner.put(url(`webhooks/${id}`)).send({ ...changed, active: true }).expect(200)).body).toMatchObject({ active: true, disabledBecause: null, kinds: ['turn'] });
    await app.owner.delete(url(`webhooks/${id}`)).expect(204);
    await app.owner.delete(url(`webhooks/${id}`)).expect(404);
    const what = JSON.stringify((await app.owner.get(url('audit')).expect(200)).body);
    for (const change of ['webhook added', 'webhook changed', 'webhook removed']) expect(what).toContain(change);
  });

  it('get only the kinds they asked for', async () => {
    await app.addWebhook(['turn']);
    await app.passTo('2026-06-10T00:00:00Z');
    expect(app.fakes.webhook.hooks()).toEqual([]);
  });
});
