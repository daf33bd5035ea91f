import { Validator } from '@seriousme/openapi-schema-validator';
import { randomUUID } from 'node:crypto';
import { Webhook } from 'standardwebhooks';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { acknowledgementToken } from '../../server/delivery/push/acknowledgement.ts';
import { allEndpoints } from '../../shared/api/index.ts';
import { noticeKinds } from '../../shared/api/notices.ts';
import { DescribedApi, type ApiDescription } from '../support/described-api.ts';
import { farmToPlanOn, typed } from '../support/farm.ts';
import { buildUser, join, lettersTo, password, signInAs, tokenIn } from '../support/people.ts';
import { createWholeApp, type WholeApp } from '../support/whole-app.ts';

let app: WholeApp;
let description: ApiDescription;
let api: DescribedApi;

beforeAll(async () => {
  app = await createWholeApp();
  description = (await app.browser().get('/api/openapi.json').expect(200)).body as ApiDescription;
  api = new DescribedApi(description);
  await walkAccounts();
  await walkFarm();
  await walkDemo();
}, 120_000);
afterAll(() => app.close());

const itemsOf = (answer: { body: Record<string, unknown> }): Record<string, unknown>[] => (answer.body['items'] as Record<string, unknown>[] | undefined) ?? [];
const idOf = (answer: { body: Record<string, unknown> }): string => String(answer.body['id']);

async function walkAccounts(): Promise<void> {
  const email = 'walker@example.org';
  const browser = app.browser();
  await api.call('signUp', browser, { send: { name: 'Wanda Walker', email, password } });
  await api.call('signUp', browser, { send: { name: '', email, password } });
  await api.call('signIn', browser, { send: { email, password: 'not this one' } });
  await api.call('signIn', browser, { send: { email, password } });
  await api.call('resendConfirmation', browser);
  const tokens = (await lettersTo(app, email)).map((letter) => tokenIn(letter.link)).filter(Boolean);
  for (const token of tokens) await api.call('confirmEmail', browser, { send: { token } });
  await api.call('me', browser);
  await api.call('updateMe', browser, { send: { name: 'Wanda', units: 'metric', language: 'en' } });
  await api.call('changePassword', browser, { send: { currentPassword: password, newPassword: 'another long password' } });
  await api.call('requestReset', browser, { send: { email } });
  const reset = (await lettersTo(app, email)).find((letter) => letter.link.includes('/reset'))!;
  await api.call('resetPassword', app.browser(), { send: { token: tokenIn(reset.link), password } });
  await api.call('me', browser);
  await api.call('signIn', browser, { send: { email, password } });
  await api.call('signOut', browser);
}

/** The five operations of one kind of thing, and what they say of one that is not there. */
async function walkKept(one: string, many: string, farmId: string, browser: Parameters<DescribedApi['call']>[1], body: object): Promise<string> {
  const id = idOf(await api.call(`create${one}`, browser, { params: { farmId }, send: body }));
  await api.call(`create${one}`, browser, { params: { farmId }, send: {} });
  await api.call(`list${many}`, browser, { params: { farmId }, query: '?archived=all' });
  await api.call(`read${one}`, browser, { params: { farmId, id } });
  await api.call(`read${one}`, browser, { params: { farmId, id: randomUUID() } });
  await api.call(`update${one}`, browser, { params: { farmId, id }, send: { ...body, version: 1 } });
  await api.call(`update${one}`, browser, { params: { farmId, id }, send: { ...body, version: 1 } });
  await api.call(`archive${one}`, browser, { params: { farmId, id }, send: { archived: true } });
  await api.call(`archive${one}`, browser, { params: { farmId, id }, send: { archived: false } });
  return id;
}

async function walkFarm(): Promise<void> {
  const { farmId, browser, plan } = await farmToPlanOn(app);
  const params = { farmId };
  await api.call('createFarm', browser, { send: typed.farm });
  await api.call('readFarm', browser, { params });
  await api.call('updateFarm', browser, { params, send: { ...typed.farm, version: 1 } });
  await api.call('updateFarm', browser, { params, send: { ...typed.farm, version: 1 } });
  await api.call('archiveFarm', browser, { params, send: { archived: true } });
  await api.call('archiveFarm', browser, { params, send: { archived: false } });
  await walkKept('Block', 'Blocks', farmId, browser, { ...typed.block, polygon: { type: 'Polygon', coordinates: [[[-85.3, 44.7], [-85.2, 44.7], [-85.2, 44.8], [-85.3, 44.7]]] } });
  await walkKept('SensitivePlace', 'SensitivePlaces', farmId, browser, typed.place);
  await walkKept('Sprayer', 'Sprayers', farmId, browser, typed.sprayer);
  const product = await walkKept('Product', 'Products', farmId, browser, typed.product);
  await api.call('uploadLabel', browser, { params: { farmId, id: product }, file: Buffer.from('%PDF-1.4\n%%EOF\n') });
  await api.call('uploadLabel', browser, { params: { farmId, id: product }, file: Buffer.from('no PDF') });
  await api.call('readLabel', browser, { params: { farmId, id: product } });
  await walkKept('Plan', 'Plans', farmId, browser, plan);
  await walkMornings(farmId, browser);
  await walkNotices(farmId, browser);
  await walkHooks(farmId, browser);
  await walkPeople(farmId, browser);
}

async function walkMornings(farmId: string, browser: Parameters<DescribedApi['call']>[1]): Promise<void> {
  const params = { farmId };
  const reading = await api.call('createReading', browser, { params, send: { takenAt: app.clock.now().toISOString(), windMs: 1.5, windFromDeg: 200, hangTest: 'mixed' } });
  await api.call('createReading', browser, { params, send: { takenAt: app.clock.now().toISOString() } });
  await api.call('listReadings', browser, { params });
  await api.call('refreshForecast', browser, { params });
  await api.call('daybreak', browser, { params });
  await api.call('readMorning', browser, { params: { farmId, date: '2026-06-10' } });
  await api.call('deleteReading', browser, { params: { farmId, id: idOf(reading) } });
}

async function walkNotices(farmId: string, browser: Parameters<DescribedApi['call']>[1]): Promise<void> {
  const { models, settings } = app.services;
  const params = { farmId };
  await api.call('readWishes', browser, { params });
  await api.call('updateWishes', browser, { params, send: { push: ['eve', 'dawn', 'turn'], email: ['summary'] } });
  const key = await api.call('pushKey', browser);
  const device = idOf(await api.call('createDevice', browser, { params, send: { name: 'Phone', ...app.fakes.phones[0]!.subscribe(String(key.body['publicKey'])) } }));
  await api.call('createDevice', browser, { params, send: { name: 'Phone', endpoint: 'http://127.0.0.1/', keys: {} } });
  await api.call('listDevices', browser, { params });
  const test = await api.call('testDevice', browser, { params: { farmId, id: device } });
  const delivery = String(test.body['deliveryId']);
  await app.parts.worker.drain();
  await api.call('acknowledgePush', browser, { send: { token: acknowledgementToken(settings.secret, delivery), what: 'shown' } });
  await api.call('listNotices', browser, { params });
  await api.call('replayDelivery', browser, { params: { farmId, id: delivery } });
  await models.deliveries.update({ state: 'dead' }, { where: { id: delivery } });
  await api.call('replayDelivery', browser, { params: { farmId, id: delivery } });
  await api.call('deleteDevice', browser, { params: { farmId, id: device } });
}

async function walkHooks(farmId: string, browser: Parameters<DescribedApi['call']>[1]): Promise<void> {
  const params = { farmId };
  const send = { name: 'Barn board', url: app.fakes.webhook.url, kinds: [...noticeKinds] };
  const webhook = idOf(await api.call('createWebhook', browser, { params, send }));
  await api.call('createWebhook', browser, { params, send: { ...send, url: 'https://127.0.0.1/' } });
  await api.call('listWebhooks', browser, { params });
  await api.call('testWebhook', browser, { params: { farmId, id: webhook } });
  await app.parts.worker.drain();
  await api.call('updateWebhook', browser, { params: { farmId, id: webhook }, send: { ...send, active: false } });
  await api.call('testWebhook', browser, { params: { farmId, id: webhook } });
  await api.call('deleteWebhook', browser, { params: { farmId, id: webhook } });
  const source = await api.call('createInboundSource', browser, { params, send: { name: 'Valley mast' } });
  await api.call('listInboundSources', browser, { params });
  const body = JSON.stringify({ type: 'forecast.issued' });
  const now = app.clock.now();
  const signature = new Webhook(String(source.body['secret'])).sign('msg_1', now, body);
  const headers = { 'content-type': 'application/json', 'webhook-id': 'msg_1', 'webhook-timestamp': String(Math.floor(now.getTime() / 1000)), 'webhook-signature': signature };
  await api.call('receiveForecast', app.browser(), { params: { source: idOf(source) }, send: body, headers });
  await api.call('receiveForecast', app.browser(), { params: { source: idOf(source) }, send: body, headers: { ...headers, 'webhook-signature': 'v1,bm90aGluZw==' } });
  await api.call('archiveInboundSource', browser, { params: { farmId, id: idOf(source) } });
}

async function walkPeople(farmId: string, browser: Parameters<DescribedApi['call']>[1]): Promise<void> {
  const params = { farmId };
  const guest = await buildUser(app, 'Gus Guest');
  await api.call('invitePerson', browser, { params, send: { email: guest.email, role: 'crew' } });
  const [letter] = await lettersTo(app, guest.email);
  const guestBrowser = app.browser();
  await guestBrowser.post('/api/account/sign-in').send({ email: guest.email, password }).expect(200);
  const spare = await api.call('invitePerson', browser, { params, send: { email: 'spare@example.org', role: 'observer' } });
  await api.call('listPeople', browser, { params });
  await api.call('revokeInvitation', browser, { params: { farmId, id: idOf(spare) } });
  await api.call('acceptInvitation', guestBrowser, { send: { token: tokenIn(letter!.link) } });
  await api.call('acceptInvitation', guestBrowser, { send: { token: tokenIn(letter!.link) } });
  const membership = await join(app, farmId, (await buildUser(app)).id, 'applicator');
  await api.call('changeRole', browser, { params: { farmId, id: membership }, send: { role: 'observer' } });
  await api.call('changeRole', guestBrowser, { params: { farmId, id: membership }, send: { role: 'owner' } });
  await api.call('removePerson', browser, { params: { farmId, id: membership } });
  await api.call('listAudit', browser, { params });
  // Another farm's ids answer as described, too.
  const stranger = await signInAs(app, (await farmToPlanOn(app)).farmId, 'owner');
  await api.call('listPeople', stranger, { params });
}

async function walkDemo(): Promise<void> {
  const browser = app.browser();
  await api.call('health', browser);
  await api.call('openapi', browser);
  await api.call('demoStatus', browser);
  await api.call('readDemoClock', browser);
  // Over an eve and a dawn, so that phone, mailbox and hook log hold something.
  await api.call('setDemoClock', browser, { send: { now: new Date(app.clock.now().getTime() + 13 * 3_600_000).toISOString() } });
  await api.call('setDemoClock', browser, { send: { now: '2020-01-01T00:00:00Z' } });
  await api.call('demoPhone', browser);
  await api.call('demoMailbox', browser);
  await api.call('demoHookLog', browser);
  await api.call('setDemoMood', browser, { send: { provider: 'nws', mood: 'ok' } });
}

describe('the description of the API', () => {
  it('is OpenAPI 3.1 by the published schema of the OpenAPI Initiative', async () => {
    const result = await new Validator().validate(structuredClone(description) as unknown as Record<string, unknown>);
    expect(result.errors ?? []).toEqual([]);
    expect(result.valid).toBe(true);
    expect(description.openapi).toMatch(/^3\.1\./);
  });

  it('names every operation once', () => {
    const ids = Object.values(description.paths).flatMap((path) => Object.values(path).map((operation) => operation.operationId));
    expect([...ids].sort()).toEqual(allEndpoints.map((endpoint) => endpoint.id).sort());
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('resolves every reference it makes', () => {
    const text = JSON.stringify(description);
    const names = Object.keys((description as unknown as { components: { schemas: object } }).components.schemas);
    for (const [, name] of text.matchAll(/"\$ref":"#\/components\/schemas\/([^"]+)"/g)) expect(names).toContain(name);
    expect(text).not.toContain('$defs');
  });
});

describe('every operation', () => {
  it.each(allEndpoints.map((endpoint) => [endpoint.id, endpoint.status] as const))('%s answers as described', (id, status) => {
    const outcome = api.outcomes.get(id);
    expect(outcome?.unlike).toEqual([]);
    expect(outcome?.statuses).toContain(status);
  });

  it('was checked by a check that can fail', async () => {
    const wrong = structuredClone(description);
    const me = wrong.paths['/api/account']!['get'] as unknown as { responses: Record<string, { content: Record<string, { schema: object }> }> };
    me.responses['200']!.content['application/json']!.schema = { type: 'object', required: ['shoeSize'] };
    const strict = new DescribedApi(wrong);
    await strict.call('me', await signInAs(app, (await farmToPlanOn(app)).farmId, 'owner'));
    expect(strict.outcomes.get('me')!.unlike[0]).toContain('shoeSize');
  });
});

describe('what the walk has seen', () => {
  it('was no list without entries, and a morning with its steps', () => {
    const lists = [...api.outcomes].filter(([, { successes }]) => successes.some((body) => Array.isArray(body['items'])));
    expect(lists.length).toBeGreaterThan(10);
    for (const [id, { successes }] of lists) expect(Math.max(...successes.map((body) => itemsOf({ body }).length)), id).toBeGreaterThan(0);
    const [morning] = api.outcomes.get('readMorning')!.successes as { plans: { answer: { steps: unknown[] } }[] }[];
    expect(morning!.plans[0]!.answer.steps.length).toBeGreaterThan(50);
  });

  it('and every event of an outgoing webhook was as described', async () => {
    const events = (await app.services.models.deliveries.findAll({ where: { channel: 'webhook' } })).map((row) => row.payload);
    expect(events.length).toBeGreaterThan(0);
    const validate = api.validatorAt('webhooks', 'notice', 'post', 'requestBody', 'content', 'application/json', 'schema');
    for (const event of events) expect(validate(event) ? [] : validate.errors).toEqual([]);
  });
});
