import supertest from 'supertest';
import { Webhook } from 'standardwebhooks';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { signInAs } from '../support/people.ts';
import { createAlertApp, type AlertApp } from './support/alert-app.ts';

const hour = (time: string) => ({
  time, temperature2mC: 12, dewPoint2mC: 8, relativeHumidityPct: 76, windSpeed10mMs: 2, windGust10mMs: 4, windFromDeg: 250, cloudCoverPct: 40, precipitationMm: 0, precipitationProbabilityPct: 5, shortwaveWm2: 0, temperature80mC: 12,
});
const series = { type: 'forecast.hours', data: { model: 'barn', issuedAt: '2026-06-09T22:00:00.000Z', hours: [hour('2026-06-10T09:00:00Z'), hour('2026-06-10T10:00:00Z')] } };

describe('an inbound forecast webhook', () => {
  let app: AlertApp;
  let source: { id: string; secret: string };
  beforeAll(async () => {
    app = await createAlertApp();
  });
  beforeEach(async () => {
    await app.reopen();
    source = (await app.owner.post(`/api/farms/${app.farmId}/inbound-sources`).send({ name: 'Weather box' }).expect(201)).body as typeof source;
  });
  afterAll(() => app.close());

  /** Sends as the machine at the other end would: no cookie, no Origin. */
  function send(body: unknown, how: { id?: string; at?: Date; secret?: string; sourceId?: string; text?: string } = {}) {
    const text = how.text ?? JSON.stringify(body);
    const id = how.id ?? 'msg_1';
    const at = how.at ?? app.clock.now();
    return supertest(app.app)
      .post(`/api/hooks/forecast/${how.sourceId ?? source.id}`)
      .set({ 'content-type': 'application/json', 'webhook-id': id, 'webhook-timestamp': String(Math.floor(at.getTime() / 1000)), 'webhook-signature': new Webhook(how.secret ?? source.secret).sign(id, at, text) })
      .send(text);
  }

  it('is answered 202 at once and acted upon by the schedule', async () => {
    await send(series).expect(202, { received: 'msg_1' });
    expect(app.assessor.asked).toEqual([]);
    await app.parts.scheduler.tick();
    expect(app.assessor.asked.map(({ farmId, options }) => ({ farmId, options }))).toEqual([{ farmId: app.farmId, options: { fetch: 'never', handed: { model: 'barn', issuedAt: new Date('2026-06-09T22:00:00Z'), hours: series.data.hours } } }]);
  });

  it('that only says that a new issue is out makes the server fetch it', async () => {
    await send({ type: 'forecast.issued' }).expect(202);
    await app.parts.scheduler.tick();
    expect(app.assessor.asked.map(({ options }) => options)).toEqual([{ fetch: 'now' }]);
  });

  it('that turns a told verdict sends the turn', async () => {
    await app.enablePhone(app.owner);
    app.assessor.say({ verdict: 'go' });
    await app.passTo('2026-06-10T00:00:00Z');
    app.assessor.say({ verdict: 'hold', because: 'inversion' });
    await send(series, { id: 'msg_turn' }).expect(202);
    await app.parts.scheduler.tick();
    await app.parts.worker.drain();
    expect(app.fakes.push.received()[0]).toMatchObject({ title: 'Changed. Hold, inversion' });
  });

  it('that comes twice is answered the same and acted upon once, also when both come at once', async () => {
    await Promise.all([send(series).expect(202), send(series).expect(202), send(series).expect(202)]);
    await app.parts.scheduler.tick();
    await send(series).expect(202, { received: 'msg_1' });
    await app.parts.scheduler.tick();
    expect(app.assessor.asked).toHaveLength(1);
  });

  it('caught and sent again later is refused', async () => {
    const caught = app.clock.now();
    app.clock.set(new Date(caught.getTime() + 301_000));
    await send(series, { id: 'msg_caught', at: caught }).expect(401);
    await app.parts.scheduler.tick();
    expect(app.assessor.asked.filter(({ options }) => options.handed)).toEqual([]);
  });

  it('with a wrong signature, for an unknown source, or for one that was archived is refused alike', async () => {
    const wrong = await send(series, { secret: `whsec_${Buffer.alloc(32, 1).toString('base64')}` }).expect(401);
    const unknown = await send(series, { sourceId: '00000000-0000-4000-8000-000000000000' }).expect(401);
    await app.owner.delete(`/api/farms/${app.farmId}/inbound-sources/${source.id}`).expect(204);
    const archived = await send(series).expect(401);
    for (const answer of [unknown, archived]) expect((answer.body as { detail: string }).detail).toBe((wrong.body as { detail: string }).detail);
    expect(await app.services.models.inboundMessages.count()).toBe(0);
  });

  it('is checked on its bytes: blanks and letters beyond ASCII count', async () => {
    await send(null, { text: '{ "type": "forecast.issued",  "note": "Żółte Pole" }' }).expect(202);
  });

  it('with a body that is wrong names each problem, and may be sent again under the same id', async () => {
    const problem = await send({ ...series, data: { ...series.data, hours: [{ ...hour('2026-06-10T09:00:00Z'), windSpeed10mMs: 'strong' }] } }).expect(422);
    expect((problem.body as { problems: { path: string }[] }).problems.map(({ path }) => path)).toContain('data.hours.0.windSpeed10mMs');
    await send(null, { text: 'not json' }).expect(400);
    await send(series).expect(202);
  });

  it('that was overtaken by a newer issue changes nothing', async () => {
    await app.services.models.forecasts.create({ id: '00000000-0000-4000-8000-00000000000f', farmId: app.farmId, provider: 'webhook', model: null, issuedAt: new Date('2026-06-09T22:30:00Z'), fetchedAt: app.clock.now(), expiresAt: null, checkedAt: app.clock.now(), placeLatitude: 44.7, placeLongitude: -85.3, placeElevationM: null, etag: null, lastModified: null, standInBecause: null, hours: [], createdAt: app.clock.now() });
    await send(series).expect(202);
    await app.parts.scheduler.tick();
    expect(app.assessor.asked).toEqual([]);
    expect((await app.services.models.inboundMessages.findOne({ where: { messageId: 'msg_1' } }))?.outcome).toBe('older than the forecast at hand; kept out');
  });

  it('whose assessment fails is tried again, and given up with a word after five tries', async () => {
    app.assessor.failures.push(...Array.from({ length: 5 }, () => new Error('database away')));
    await send(series).expect(202);
    for (let tries = 0; tries < 8; tries += 1) {
      await app.parts.scheduler.tick();
      app.clock.set(new Date(app.clock.now().getTime() + 200_000));
    }
    const message = await app.services.models.inboundMessages.findOne({ where: { messageId: 'msg_1' } });
    expect(message?.tries).toBe(5);
    expect(message?.outcome).toContain('given up');
    app.assessor.failures.length = 0;
  });

  it('shows its secret once, keeps it sealed, and notes who admitted the source', async () => {
    expect(source.secret).toMatch(/^whsec_[A-Za-z0-9+/]{43}=$/);
    const { body } = await app.owner.get(`/api/farms/${app.farmId}/inbound-sources`).expect(200);
    expect(JSON.stringify(body)).not.toContain(source.secret);
    const row = await app.services.models.inboundSources.findByPk(source.id);
    expect(row!.secretSealed).not.toContain(source.secret.slice(6, 20));
    const audit = await app.owner.get(`/api/farms/${app.farmId}/audit`).expect(200);
    expect(JSON.stringify(audit.body)).toContain('Weather box');
  });

  it('is set up by owners only', async () => {
    const applicator = await signInAs(app, app.farmId, 'applicator');
    await applicator.get(`/api/farms/${app.farmId}/inbound-sources`).expect(403);
    await applicator.post(`/api/farms/${app.farmId}/inbound-sources`).send({ name: 'x' }).expect(403);
  });
});
