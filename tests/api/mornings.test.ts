import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { setupServer } from 'msw/node';
import { createProviderFakes, type ProviderFakes } from '../../mocks/providers/provider-fakes.ts';
import { createProviders } from '../../server/forecasts/create-providers.ts';
import { createAssessor } from '../../server/verdicts/create-assessor.ts';
import { providerSource } from '../../server/verdicts/provider-source.ts';
import type { Daybreak } from '../../shared/api/mornings.ts';
import { createTestApp, type TestApp } from '../support/app.ts';
import { buildFarm, signInAs } from '../support/people.ts';

let app: TestApp;
let fakes: ProviderFakes;
const wire = setupServer();

beforeAll(async () => {
  app = await createTestApp({
    settings: { demo: true },
    parts: (services) => {
      fakes = createProviderFakes({ clock: services.clock, seed: 4 });
      wire.use(...fakes.handlers);
      wire.listen({ onUnhandledRequest: ({ url }, print) => (new URL(url).hostname === '127.0.0.1' ? undefined : print.error()) });
      const providers = createProviders({ clock: services.clock, random: services.random, userAgent: 'Dawnvane test (mailto:test@dawnvane.example)', sleep: async () => undefined, settings: { order: ['openMeteo', 'nws', 'metNorway'] } });
      return { assessor: createAssessor(services, providerSource(providers)) };
    },
  });
});
afterAll(async () => {
  wire.close();
  await app.close();
});

async function farm() {
  const farmId = await buildFarm(app);
  const browser = await signInAs(app, farmId, 'owner');
  const at = (path: string) => `/api/farms/${farmId}${path}`;
  const daybreak = async (): Promise<Daybreak> => (await browser.get(at('/daybreak')).expect(200)).body;
  return { farmId, browser, at, daybreak };
}

describe('Daybreak', () => {
  it('tells the coming morning and the five after it, judged on the usual limits while there is no plan', async () => {
    const { daybreak } = await farm();
    const { mornings, forecast, timeZone } = await daybreak();
    expect(timeZone).toBe('America/Detroit');
    expect(mornings.map((morning) => morning.date)).toEqual(['2026-06-10', '2026-06-11', '2026-06-12', '2026-06-13', '2026-06-14', '2026-06-15']);
    expect(mornings.every(({ verdicts }) => verdicts.length === 1 && verdicts[0]!.planId === null)).toBe(true);
    expect(forecast).toMatchObject({ provider: 'openMeteo', standInBecause: null });
  });

  it('still tells this morning until local noon, and tomorrow after it', async () => {
    const { daybreak } = await farm();
    const now = app.clock.now();
    app.clock.set(new Date('2026-06-10T15:59:00Z'));
    expect((await daybreak()).mornings[0]!.date).toBe('2026-06-10');
    app.clock.set(new Date('2026-06-10T16:01:00Z'));
    expect((await daybreak()).mornings[0]!.date).toBe('2026-06-11');
    app.clock.set(now);
  });

  it('takes a second provider when the first fails, and says so', async () => {
    const { daybreak } = await farm();
    fakes.setMood('openMeteo', 'error500');
    const { forecast } = await daybreak();
    expect(forecast).toMatchObject({ provider: 'nws' });
    expect(forecast!.standInBecause).toMatch(/Open-Meteo/);
    fakes.setMood('openMeteo', 'ok');
  });

  it('never says go on a forecast that nobody confirmed for six hours', async () => {
    const { daybreak } = await farm();
    await daybreak();
    const now = app.clock.now();
    for (const provider of ['openMeteo', 'nws', 'metNorway'] as const) fakes.setMood(provider, 'error500');
    app.clock.set(new Date(now.getTime() + 6 * 3_600_000 + 60_000));
    const late = await daybreak();
    expect(late.stale).toBe(true);
    for (const { verdicts } of late.mornings) for (const verdict of verdicts) expect(verdict).toMatchObject({ verdict: 'hold', enoughToTell: false });
    for (const provider of ['openMeteo', 'nws', 'metNorway'] as const) fakes.setMood(provider, 'ok');
    app.clock.set(now);
  });

  it('is a hold for want of data when no provider ever answered', async () => {
    for (const provider of ['openMeteo', 'nws', 'metNorway'] as const) fakes.setMood(provider, 'error500');
    const { daybreak } = await farm();
    const { forecast, mornings } = await daybreak();
    expect(forecast).toBeNull();
    expect(mornings[0]!.verdicts[0]).toMatchObject({ verdict: 'hold', enoughToTell: false, bindingLimit: 'data' });
    for (const provider of ['openMeteo', 'nws', 'metNorway'] as const) fakes.setMood(provider, 'ok');
  });
});

describe('a morning', () => {
  it('tells every limit step by step, and what was told of it before', async () => {
    const { browser, at, daybreak } = await farm();
    const told = (await daybreak()).mornings[0]!.verdicts[0]!;
    const { body } = await browser.get(at('/mornings/2026-06-10')).expect(200);
    expect(body.plans[0].verdict).toMatchObject({ verdict: told.verdict, revision: 1 });
    expect(body.plans[0].answer.steps.length).toBeGreaterThan(60);
    expect(body.history).toMatchObject([{ revision: 1, verdict: told.verdict }]);
  });

  it('counts a revision only when the verdict says something new', async () => {
    const { browser, at, daybreak } = await farm();
    await daybreak();
    await browser.post(at('/daybreak/refresh')).expect(200);
    await browser.post(at('/daybreak/refresh')).expect(200);
    expect((await browser.get(at('/mornings/2026-06-10'))).body.history).toHaveLength(1);
  });
});

describe('a reading on site', () => {
  it('is kept with who took it, and can be taken back', async () => {
    const { browser, at } = await farm();
    const { body } = await browser.post(at('/readings')).send({ takenAt: app.clock.now().toISOString(), windMs: 1.2, windFromDeg: 240, hangTest: 'hung' }).expect(201);
    expect((await browser.get(at('/readings'))).body.items).toMatchObject([{ id: body.id, windMs: 1.2, hangTest: 'hung' }]);
    await browser.delete(at(`/readings/${body.id}`)).expect(204);
    expect((await browser.get(at('/readings'))).body.items).toEqual([]);
  });

  it('is refused from the future, below zero, or with nothing measured', async () => {
    const { browser, at } = await farm();
    const soon = new Date(app.clock.now().getTime() + 3_600_000).toISOString();
    expect((await browser.post(at('/readings')).send({ takenAt: soon, windMs: 1 }).expect(422)).body.problems[0].path).toBe('takenAt');
    expect((await browser.post(at('/readings')).send({ takenAt: app.clock.now().toISOString(), windMs: -3 }).expect(422)).body.problems[0].path).toBe('windMs');
    await browser.post(at('/readings')).send({ takenAt: app.clock.now().toISOString() }).expect(422);
  });
});

describe('a farm that moves', () => {
  it('is not judged on the forecast of where it was', async () => {
    const { browser, at, daybreak } = await farm();
    await daybreak();
    const { body: before } = await browser.get(at('')).expect(200);
    for (const provider of ['openMeteo', 'nws', 'metNorway'] as const) fakes.setMood(provider, 'error500');
    await browser.put(at('')).send({ name: before.name, latitude: 39.1, longitude: -94.6, elevationM: 250 }).expect(200);
    const { forecast, mornings } = await daybreak();
    expect(forecast).toBeNull();
    expect(mornings[0]!.verdicts[0]).toMatchObject({ verdict: 'hold', enoughToTell: false });
    for (const provider of ['openMeteo', 'nws', 'metNorway'] as const) fakes.setMood(provider, 'ok');
  });
});

describe('a farm beyond the polar circle', () => {
  it('is told in winter that there is no daylight to spray in, instead of failing', async () => {
    const { browser, at, daybreak } = await farm();
    const { body: before } = await browser.get(at('')).expect(200);
    const now = app.clock.now();
    app.clock.set(new Date('2026-12-14T18:00:00Z'));
    await browser.put(at('')).send({ name: before.name, latitude: 78.2, longitude: 15.6, elevationM: 10 }).expect(200);
    const [first] = (await daybreak()).mornings;
    expect(first!.verdicts[0]).toMatchObject({ verdict: 'hold', bindingLimit: 'time', sun: { civilDawn: null } });
    expect(first!.verdicts[0]!.headline.us).toMatch(/no daylight/);
    await browser.get(at(`/mornings/${first!.date}`)).expect(200);
    app.clock.set(now);
  });
});
