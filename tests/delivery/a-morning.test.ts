import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { signInAs } from '../support/people.ts';
import { createAlertApp, type AlertApp } from './support/alert-app.ts';

// The test farm lies in the zone America/Detroit (UTC−4 in June); its eve is at 20:00, sunrise on June 10 about 05:56, dawn notice 30 minutes before.
describe('one morning at a farm, from the eve to a turn', () => {
  let app: AlertApp;
  let crew: Awaited<ReturnType<typeof signInAs>>;

  beforeAll(async () => {
    app = await createAlertApp({ opensAt: '2026-06-09T23:00:00Z' });
    crew = await signInAs(app, app.farmId, 'crew');
    await app.enablePhone(app.owner);
    const { body } = await app.owner.post(`/api/farms/${app.farmId}/webhooks`).send({ name: 'Barn board', url: `${app.fakes.webhook.url}`, kinds: ['eve', 'dawn', 'turn'] }).expect(201);
    app.fakes.webhook.trust((body as { secret: string }).secret);
  });
  afterAll(() => app.close());

  it('tells the verdict of tomorrow at the eve, on the phone and to the webhook', async () => {
    app.assessor.say({ verdict: 'go', from: '06:10', to: '07:20', latestStart: '06:40' });
    await app.passTo('2026-06-09T23:59:00Z');
    expect(app.fakes.push.received()).toHaveLength(0);
    await app.passTo('2026-06-10T00:00:00Z');
    const [push] = app.fakes.push.received();
    expect(push).toMatchObject({ title: 'Go, 6:10–7:20', verdict: 'go', urgency: 'normal', device: 'Demo phone', receivedAt: '2026-06-10T00:00:00.000Z' });
    expect(push!.body).toContain('Tomorrow, Wed, Jun 10, North Fork. Wind stays under 8 mph.');
    expect(push!.url).toBe(`http://dawnvane.test/farms/${app.farmId}/mornings/2026-06-10`);
    const [hook] = app.fakes.webhook.hooks();
    expect(hook).toMatchObject({ signatureValid: true, status: 200 });
    expect(JSON.parse(hook!.body)).toMatchObject({ type: 'notice.eve', data: { farmId: app.farmId, date: '2026-06-10', verdict: 'go', sequence: 1 } });
  });

  it('lets the push die when the window ends', () => {
    const [push] = app.fakes.push.received();
    expect(push!.ttlSeconds).toBe((Date.parse('2026-06-10T11:20:00Z') - Date.parse('2026-06-10T00:00:00Z')) / 1000);
  });

  it('says nothing through the night while the verdict stays', async () => {
    await app.passTo('2026-06-10T09:20:00Z');
    expect(app.fakes.push.received()).toHaveLength(1);
    expect(app.fakes.mail.mails()).toHaveLength(0);
  });

  it('tells it again at dawn on the freshest data, urgently, and mails the summary to the crew', async () => {
    await app.passTo('2026-06-10T09:30:00Z');
    const [push] = app.fakes.push.received();
    expect(push).toMatchObject({ title: 'Go, 6:10–7:20', urgency: 'high' });
    expect(Date.parse(push!.receivedAt)).toBeGreaterThan(Date.parse('2026-06-10T09:20:00Z'));
    expect(app.assessor.asked.at(-1)?.options).toMatchObject({ fetch: 'now', occasion: { kind: 'dawn', morning: '2026-06-10' } });
    const mails = app.fakes.mail.mails();
    expect(mails).toHaveLength(1);
    expect(mails[0]).toMatchObject({ to: crew.email, subject: 'This morning: Go, 6:10–7:20' });
    expect(mails[0]!.text).toContain('The label is the law');
    expect(mails[0]!.html).toContain('color-scheme');
  });

  it('puts the newer notice in the place of the older one on the phone', () => {
    const [dawn, eve] = app.fakes.push.received();
    expect(dawn!.tag).toBe(eve!.tag);
    expect(dawn!.topic).toBe(eve!.topic);
    expect(app.fakes.push.shown()).toHaveLength(1);
  });

  it('tells a turn to hold at once, on every channel wished for', async () => {
    app.assessor.say({ verdict: 'hold', because: 'gusts' });
    await app.newForecast();
    expect(app.fakes.push.received()[0]).toMatchObject({ title: 'Changed. Hold, gusts', verdict: 'hold', urgency: 'high' });
    expect(app.fakes.mail.mails()[0]).toMatchObject({ to: crew.email, subject: 'Changed. Hold, gusts' });
    expect(JSON.parse(app.fakes.webhook.hooks()[0]!.body)).toMatchObject({ type: 'notice.turn', data: { verdict: 'hold', sequence: 4 } });
  });

  it('threads the mails of one morning for their reader', () => {
    const [turn, summary] = app.fakes.mail.mails();
    expect(turn!.references).toEqual(summary!.references);
    expect(turn!.messageId).not.toBe(summary!.messageId);
  });

  it('tells nothing twice when the same verdict comes again', async () => {
    await app.newForecast();
    await app.passTo('2026-06-10T10:30:00Z');
    expect(app.fakes.push.received()).toHaveLength(3);
    expect(app.fakes.mail.mails()).toHaveLength(2);
    expect(app.fakes.webhook.hooks()).toHaveLength(3);
  });

  it('lists the notices with their deliveries, newest first, addresses hidden', async () => {
    const { body } = await app.owner.get(`/api/farms/${app.farmId}/notices`).expect(200);
    const items = (body as { items: { kind: string; deliveries: { state: string; recipient: string; acceptedAt: string | null }[] }[] }).items;
    expect(items.map((item) => item.kind)).toEqual(['turn', 'summary', 'dawn', 'eve']);
    expect(items.flatMap((item) => item.deliveries).every((delivery) => delivery.state === 'delivered' && delivery.acceptedAt !== null)).toBe(true);
    expect(JSON.stringify(items)).not.toContain(crew.email);
  });
});
