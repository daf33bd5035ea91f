import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import supertest from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fillDemo, openDemo, type OpenedDemo } from '../../mocks/demo-farm/open-demo.ts';
import { createApp } from '../../server/app.ts';
import { createDelivery } from '../../server/delivery/index.ts';
import { loadPushKeys } from '../../server/delivery/push/keys.ts';
import { createProviders, defaultProviderOrder } from '../../server/forecasts/create-providers.ts';
import type { Parts } from '../../server/parts.ts';
import { createScheduler } from '../../server/schedule/scheduler.ts';
import { createAssessor } from '../../server/verdicts/create-assessor.ts';
import { providerSource } from '../../server/verdicts/provider-source.ts';
import type { demoEndpoints } from '../../shared/api/system.ts';
import type { AnswerOf } from '../../shared/api/endpoint.ts';
import { createTestApp, createTestServices, origin } from '../support/app.ts';

type Answer<Name extends keyof typeof demoEndpoints> = AnswerOf<(typeof demoEndpoints)[Name]>;

// Everything real but the far ends: weather by the fakes of the providers, verdicts by the assessor, all on the demo farm.
describe('the demo, stepped by its clock', () => {
  let base: Awaited<ReturnType<typeof createTestServices>>;
  let demo: OpenedDemo;
  let parts: Parts;
  let api: ReturnType<typeof supertest.agent>;
  const folder = mkdtempSync(join(tmpdir(), 'dawnvane-demo-'));

  beforeAll(async () => {
    base = await createTestServices({ demo: true });
    demo = await openDemo(base.services, folder);
    const { services, fakes } = demo;
    const pushKeys = await loadPushKeys(services);
    const { clock, random } = services;
    const assessor = createAssessor(services, providerSource(createProviders({ clock, random, userAgent: 'Dawnvane/test (mailto:keeper@dawnvane.example)', sleep: async () => undefined, settings: { order: defaultProviderOrder } })));
    parts = { assessor, pushKeys, worker: createDelivery(services, pushKeys, fakes.mail.url), scheduler: createScheduler(services, assessor), demo: fakes };
    api = supertest.agent(createApp(services, parts)).set('Origin', origin);
    await fillDemo(demo, parts);
  }, 120_000);
  afterAll(async () => {
    await parts.worker.stop();
    await demo.stop();
    await base.close();
    rmSync(folder, { recursive: true, force: true });
  });
  const read = async <T>(path: string) => (await api.get(`/api/demo${path}`).expect(200)).body as T;
  const stepTo = async (name: Answer<'readClock'>['next'][number]['name']) => {
    const { next } = await read<Answer<'readClock'>>('/clock');
    const stop = next.find((one) => one.name === name);
    return (await api.put('/api/demo/clock').send({ now: stop!.at }).expect(200)).body as Answer<'setClock'>;
  };

  it('opens in the evening, with the coming moments named in their order', async () => {
    const { now, timeZone, next } = await read<Answer<'readClock'>>('/clock');
    expect(timeZone).toBe('America/Detroit');
    expect(new Date(now).getTime()).toBeGreaterThanOrEqual(Date.parse('2026-06-09T23:00:00Z'));
    expect(next.map(({ at }) => at)).toEqual([...next.map(({ at }) => at)].sort());
    expect(next[0]).toEqual({ name: 'eve', at: '2026-06-10T00:00:00.000Z' });
    expect(next.map(({ name }) => name)).toContain('dawn');
  });

  it('has a past: a notice each evening and each dawn, a summary each morning, all delivered', async () => {
    const notices = await demo.services.models.notices.findAll({ where: { kind: ['eve', 'dawn', 'summary'] } });
    for (const kind of ['eve', 'dawn', 'summary']) expect(notices.filter((notice) => notice.kind === kind).length).toBeGreaterThanOrEqual(8);
    expect(await demo.services.models.deliveries.count({ where: { state: ['waiting', 'claimed', 'dead'] } })).toBe(0);
  });

  it('brings the push of the eve to the phone, with a signed webhook beside it', async () => {
    await stepTo('eve');
    const { items } = await read<Answer<'phone'>>('/phone');
    expect(items[0]).toMatchObject({ device: 'Demo phone', tag: expect.stringContaining('2026-06-10') as string });
    expect(items[0]!.title).toMatch(/^(Go|Hold)/);
    const hooks = (await read<Answer<'hookLog'>>('/hooks')).items;
    expect(hooks[0]).toMatchObject({ signatureValid: true, status: 200 });
  });

  it('brings dawn’s push and the partner’s summary', async () => {
    const { now } = await stepTo('dawn');
    expect(new Date(now).getTime()).toBeGreaterThan(Date.parse('2026-06-10T09:00:00Z'));
    const { items } = await read<Answer<'phone'>>('/phone');
    expect(items[0]).toMatchObject({ urgency: 'high', url: expect.stringMatching(/\/mornings\/2026-06-10$/) as string });
    const mails = (await read<Answer<'mailbox'>>('/mailbox')).items;
    expect(mails[0]).toMatchObject({ subject: expect.stringMatching(/^This morning: /) as string, to: 'teo@quillbrook.example' });
  });

  it('refuses to go back, or to leap for weeks', async () => {
    const { now } = await read<Answer<'readClock'>>('/clock');
    await api.put('/api/demo/clock').send({ now: new Date(Date.parse(now) - 60_000).toISOString() }).expect(422);
    await api.put('/api/demo/clock').send({ now: new Date(Date.parse(now) + 30 * 86_400_000).toISOString() }).expect(422);
  });

  it('says hold, not enough to tell, and mails the owner when no provider answers for a day', async () => {
    for (const provider of ['openMeteo', 'nws', 'metNorway']) await api.put('/api/demo/mood').send({ provider, mood: 'error500' }).expect(204);
    const { now } = await read<Answer<'readClock'>>('/clock');
    await api.put('/api/demo/clock').send({ now: new Date(Date.parse(now) + 36 * 3_600_000).toISOString() }).expect(200);
    const { items } = await read<Answer<'phone'>>('/phone');
    expect(items[0]).toMatchObject({ verdict: 'unknown', title: expect.stringContaining('not enough to tell') as string });
    expect((await read<Answer<'mailbox'>>('/mailbox')).items.some(({ subject, to }) => subject.startsWith('No fresh forecast') && to === 'marit@quillbrook.example')).toBe(true);
  }, 120_000);

  it('tells who may sign in', async () => {
    expect(await read<Answer<'status'>>('')).toMatchObject({ demo: true, signIns: expect.arrayContaining([expect.objectContaining({ role: 'owner' })]) as unknown });
  });
});

describe('without the demo', () => {
  it('its pages do not exist', async () => {
    const app = await createTestApp();
    for (const path of ['/clock', '/phone', '/mailbox', '/hooks']) await app.browser().get(`/api/demo${path}`).expect(404);
    await app.browser().put('/api/demo/mood').send({ provider: 'nws', mood: 'ok' }).expect(404);
    await app.browser().get('/api/demo').expect(200, { demo: false, signIns: [] });
    await app.close();
  });
});
