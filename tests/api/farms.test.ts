import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, type TestApp } from '../support/app.ts';
import { add, ownedFarm, pathsOf, typed } from '../support/farm.ts';
import { buildUser, join, password, signInAs } from '../support/people.ts';

let app: TestApp;
/** What was assessed, newest last, and whether assessing fails. */
const assessed: { farmId: string; fetch: string }[] = [];
let assessingFails = false;

beforeAll(async () => {
  app = await createTestApp({
    settings: { demo: true },
    parts: (_services, _clock, resting) => ({
      assessor: {
        ...resting.assessor,
        assessFarm: async (farmId, options) => {
          assessed.push({ farmId, fetch: options.fetch });
          if (assessingFails) throw new Error('the weather is on strike');
          return resting.assessor.assessFarm(farmId, options);
        },
      },
    }),
  });
});
afterAll(() => app.close());

async function newcomer() {
  const user = await buildUser(app);
  const browser = app.browser();
  await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
  return browser;
}

describe('opening a farm', () => {
  it('makes its opener owner, and finds the time zone from the position', async () => {
    const browser = await newcomer();
    const opened = await browser.post('/api/farms').send(typed.farm).expect(201);
    expect(opened.body).toMatchObject({ ...typed.farm, timeZone: 'America/Detroit', eveTime: '20:00', dawnLeadMinutes: 30 });
    expect((await browser.get('/api/account')).body.farms).toMatchObject([{ id: opened.body.id, role: 'owner' }]);
  });

  it.each([
    ['Oregon', 44.05, -123.1, 'America/Los_Angeles'],
    ['Arizona, which keeps standard time', 33.4, -112.1, 'America/Phoenix'],
    ['Kent', 51.2, 0.6, 'Europe/London'],
    ['Tasmania', -42.9, 147.2, 'Australia/Hobart'],
  ])('in %s finds its zone', async (_where, latitude, longitude, timeZone) => {
    const opened = await (await newcomer()).post('/api/farms').send({ ...typed.farm, latitude, longitude }).expect(201);
    expect(opened.body.timeZone).toBe(timeZone);
  });

  it('names every entry that needs another look, with the remedy', async () => {
    const answer = await (await newcomer()).post('/api/farms').send({ ...typed.farm, latitude: 91, elevationM: 'high', eveTime: '25:00' }).expect(422);
    expect(answer.body.problems).toEqual([
      { path: 'latitude', message: 'must be at most 90' },
      { path: 'elevationM', message: 'must be a number, such as 12.5' },
      { path: 'eveTime', message: 'must be a time such as 20:00' },
    ]);
  });

  it('several times gives a person several farms', async () => {
    const browser = await newcomer();
    for (const name of ['One', 'Two']) await browser.post('/api/farms').send({ ...typed.farm, name }).expect(201);
    expect((await browser.get('/api/account')).body.farms.map((farm: { name: string }) => farm.name).sort()).toEqual(['One', 'Two']);
  });
});

describe('a farm', () => {
  it('that moves over a zone border keeps time by its new place, and gets the weather of it', async () => {
    const { browser, at, farmId } = await ownedFarm(app);
    const { body: before } = await browser.get(at(''));
    const moved = await browser.put(at('')).send({ ...typed.farm, latitude: 45.5, longitude: -122.7, version: before.version }).expect(200);
    expect(moved.body.timeZone).toBe('America/Los_Angeles');
    expect(assessed.at(-1)).toEqual({ farmId, fetch: 'now' });
  });

  it('tells in the trail who moved the times of its notices', async () => {
    const { browser, at } = await ownedFarm(app);
    const { body: farm } = await browser.get(at(''));
    await browser.put(at('')).send({ ...farm, eveTime: '21:30', dawnLeadMinutes: 45 }).expect(200);
    const [entry] = (await browser.get(at('/audit')).expect(200)).body.items;
    expect(entry).toMatchObject({ what: 'farm changed', details: { eveTime: { before: '20:00', after: '21:30' }, dawnLeadMinutes: { before: 30, after: 45 } } });
  });

  it('that is archived leaves the list of farms, and comes back', async () => {
    const { browser, at, farmId } = await ownedFarm(app);
    await browser.patch(at('/archived')).send({ archived: true }).expect(200);
    expect((await browser.get('/api/account')).body.farms).toEqual([]);
    await browser.patch(at('/archived')).send({ archived: false }).expect(200);
    expect((await browser.get('/api/account')).body.farms).toMatchObject([{ id: farmId }]);
  });
});

describe.each([
  ['/blocks', typed.block, { trees: 120 }],
  ['/sensitive-places', typed.place, { distanceM: 90 }],
  ['/sprayers', typed.sprayer, { tankL: 12 }],
  ['/products', typed.product, { rainFreeHours: 4 }],
])('what a farm keeps under %s', (noun, body, change) => {
  it('can be added, read, changed, archived and brought back', async () => {
    const { browser, at } = await ownedFarm(app);
    const { body: added } = await browser.post(at(noun)).send(body).expect(201);
    expect(added).toMatchObject({ ...body, version: 1, archivedAt: null });
    await browser.put(at(`${noun}/${added.id}`)).send({ ...body, ...change }).expect(200);
    expect((await browser.get(at(`${noun}/${added.id}`))).body).toMatchObject({ ...change, version: 2 });
    const archived = await browser.patch(at(`${noun}/${added.id}/archived`)).send({ archived: true }).expect(200);
    expect(archived.body.archivedAt).not.toBeNull();
    expect((await browser.get(at(noun))).body.items).toEqual([]);
    expect((await browser.get(at(`${noun}?archived=yes`))).body.items).toHaveLength(1);
    expect((await browser.get(at(`${noun}?archived=all`))).body.items).toHaveLength(1);
    await browser.patch(at(`${noun}/${added.id}/archived`)).send({ archived: false }).expect(200);
    expect((await browser.get(at(noun))).body.items).toHaveLength(1);
    expect((await browser.get(at(`${noun}?archived=yes`))).body.items).toEqual([]);
  });

  it('is not to be found, changed or archived from another farm', async () => {
    const id = await add(await ownedFarm(app), noun, body);
    const other = await ownedFarm(app);
    await other.browser.get(other.at(`${noun}/${id}`)).expect(404);
    await other.browser.put(other.at(`${noun}/${id}`)).send(body).expect(404);
    await other.browser.patch(other.at(`${noun}/${id}/archived`)).send({ archived: true }).expect(404);
  });

  it('is judged anew at once, from the forecast at hand', async () => {
    const farm = await ownedFarm(app);
    await add(farm, noun, body);
    expect(assessed.at(-1)).toEqual({ farmId: farm.farmId, fetch: 'never' });
  });
});

describe('a change', () => {
  it('made by two people at one time tells the second of the first by name, and loses neither version', async () => {
    const farm = await ownedFarm(app);
    const { browser, at } = farm;
    const id = await add(farm, '/blocks', typed.block);
    const other = await signInAs(app, farm.farmId, 'applicator');
    const { name } = (await other.get('/api/account')).body;
    await other.put(at(`/blocks/${id}`)).send({ ...typed.block, name: 'Theirs', version: 1 }).expect(200);
    const conflict = await browser.put(at(`/blocks/${id}`)).send({ ...typed.block, name: 'Mine', version: 1 }).expect(409);
    expect(conflict.body).toMatchObject({ theirs: { name: 'Theirs', version: 2 }, yours: { name: 'Mine' }, changedBy: name, changedAt: app.clock.now().toISOString() });
    expect(conflict.body.detail).toContain(name);
    expect((await browser.get(at(`/blocks/${id}`))).body.name).toBe('Theirs');
  });

  it('is stored even when the farm cannot be judged after it', async () => {
    const farm = await ownedFarm(app);
    assessingFails = true;
    try {
      const id = await add(farm, '/blocks', typed.block);
      await farm.browser.get(farm.at(`/blocks/${id}`)).expect(200);
    } finally {
      assessingFails = false;
    }
  });

  it('keeps a drawn block as GeoJSON, and refuses an open ring', async () => {
    const { browser, at } = await ownedFarm(app);
    const ring = [[-85.3, 44.7], [-85.299, 44.7], [-85.299, 44.701], [-85.3, 44.7]];
    const { body } = await browser.post(at('/blocks')).send({ ...typed.block, polygon: { type: 'Polygon', coordinates: [ring] } }).expect(201);
    expect((await browser.get(at(`/blocks/${body.id}`))).body.polygon).toEqual({ type: 'Polygon', coordinates: [ring] });
    const open = await browser.post(at('/blocks')).send({ ...typed.block, polygon: { type: 'Polygon', coordinates: [[...ring.slice(0, 3), [-85.3, 44.71]]] } }).expect(422);
    expect(pathsOf(open)).toEqual(['polygon.coordinates.0']);
  });

  it('in another form than JSON, or in broken JSON, is refused by its kind', async () => {
    const { browser, at } = await ownedFarm(app);
    expect((await browser.post(at('/blocks')).type('form').send('name=x')).status).toBe(415);
    expect((await browser.post(at('/blocks')).type('json').send('{"name":')).status).toBe(400);
  });

  it('by someone who left the farm is told as by a person no longer named', async () => {
    const farm = await ownedFarm(app);
    const user = await buildUser(app);
    await join(app, farm.farmId, user.id, 'applicator');
    const id = await add(farm, '/blocks', typed.block);
    const leaving = app.browser();
    await leaving.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
    await leaving.put(farm.at(`/blocks/${id}`)).send({ ...typed.block, name: 'Last act' }).expect(200);
    await app.services.models.users.destroy({ where: { id: user.id } });
    const conflict = await farm.browser.put(farm.at(`/blocks/${id}`)).send({ ...typed.block, version: 1 }).expect(409);
    expect(conflict.body.changedBy).toBeNull();
  });
});
