import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, type TestApp } from '../support/app.ts';
import { buildFarm, buildUser, password, signInAs } from '../support/people.ts';

let app: TestApp;
beforeAll(async () => {
  app = await createTestApp({ settings: { demo: true } });
});
afterAll(() => app.close());

const farm = { name: 'Larch End', latitude: 44.7, longitude: -85.3, elevationM: 260 };
const block = { name: 'North rows', crop: 'Apple', areaHa: 0.3 };
const sprayer = { name: 'Pack', tankL: 10, minutesPerTank: 6, changeOverMinutes: 3 };
const product = { name: 'Example One', rateMin: 2, rateMax: 4, rateUnit: 'flOzPerAcre' };

async function owner() {
  const farmId = await buildFarm(app);
  return { farmId, browser: await signInAs(app, farmId, 'owner'), at: (path: string) => `/api/farms/${farmId}${path}` };
}

async function withPlanParts() {
  const { farmId, browser, at } = await owner();
  const made = async (noun: string, body: object) => (await browser.post(at(noun)).send(body).expect(201)).body.id as string;
  const ids = { block: await made('/blocks', block), sprayer: await made('/sprayers', sprayer), product: await made('/products', product) };
  const plan = { name: 'First cover', blockIds: [ids.block], products: [{ productId: ids.product, rate: 3 }], sprayerId: ids.sprayer, carrierLHa: 100, firstDate: '2026-06-10', lastDate: '2026-06-14' };
  return { farmId, browser, at, ids, plan };
}

describe('opening a farm', () => {
  it('makes its opener owner, and finds the time zone from the position', async () => {
    const user = await buildUser(app);
    const browser = app.browser();
    await browser.post('/api/account/sign-in').send({ email: user.email, password });
    const opened = await browser.post('/api/farms').send(farm).expect(201);
    expect(opened.body).toMatchObject({ ...farm, timeZone: 'America/Detroit', eveTime: '20:00', dawnLeadMinutes: 30 });
    expect((await browser.get('/api/account')).body.farms).toMatchObject([{ id: opened.body.id, role: 'owner' }]);
  });

  it('names a position that is nowhere', async () => {
    const { browser } = await owner();
    const answer = await browser.post('/api/farms').send({ ...farm, latitude: 91, eveTime: '25:00' }).expect(422);
    expect(answer.body.problems).toEqual([
      { path: 'latitude', message: 'must be at most 90' },
      { path: 'eveTime', message: 'must be a time such as 20:00' },
    ]);
  });
});

describe('what a farm keeps', () => {
  it('can be added, read, changed, archived and brought back', async () => {
    const { browser, at } = await owner();
    const { body: added } = await browser.post(at('/blocks')).send(block).expect(201);
    expect(added).toMatchObject({ ...block, version: 1, archivedAt: null });
    await browser.put(at(`/blocks/${added.id}`)).send({ ...block, trees: 120 }).expect(200);
    expect((await browser.get(at(`/blocks/${added.id}`))).body).toMatchObject({ trees: 120, version: 2 });
    await browser.patch(at(`/blocks/${added.id}/archived`)).send({ archived: true }).expect(200);
    expect((await browser.get(at('/blocks'))).body.items).toEqual([]);
    expect((await browser.get(at('/blocks?archived=yes'))).body.items).toHaveLength(1);
    await browser.patch(at(`/blocks/${added.id}/archived`)).send({ archived: false }).expect(200);
    expect((await browser.get(at('/blocks'))).body.items).toHaveLength(1);
  });

  it('tells two people who edit one thing of each other, and loses neither version', async () => {
    const { browser, at } = await owner();
    const { body: added } = await browser.post(at('/blocks')).send(block).expect(201);
    await browser.put(at(`/blocks/${added.id}`)).send({ ...block, name: 'Hers', version: 1 }).expect(200);
    const conflict = await browser.put(at(`/blocks/${added.id}`)).send({ ...block, name: 'His', version: 1 }).expect(409);
    expect(conflict.body).toMatchObject({ theirs: { name: 'Hers', version: 2 }, yours: { name: 'His' } });
  });

  it('keeps a drawn block as GeoJSON', async () => {
    const { browser, at } = await owner();
    const polygon = { type: 'Polygon', coordinates: [[[-85.3, 44.7], [-85.299, 44.7], [-85.299, 44.701], [-85.3, 44.7]]] };
    const { body } = await browser.post(at('/blocks')).send({ ...block, polygon }).expect(201);
    expect((await browser.get(at(`/blocks/${body.id}`))).body.polygon).toEqual(polygon);
  });

  it('is not to be found from another farm', async () => {
    const one = await owner();
    const two = await owner();
    const { body } = await one.browser.post(one.at('/blocks')).send(block).expect(201);
    await two.browser.get(two.at(`/blocks/${body.id}`)).expect(404);
    await two.browser.put(two.at(`/blocks/${body.id}`)).send(block).expect(404);
  });
});

describe('a product', () => {
  it('is refused when its figures contradict each other, each by its field', async () => {
    const { browser, at } = await owner();
    const answer = await browser.post(at('/products')).send({ ...product, rateMax: 1, windMinMs: 5, windMaxMs: 2 }).expect(422);
    expect(answer.body.problems.map((problem: { path: string }) => problem.path)).toEqual(['rateMax', 'windMaxMs']);
  });

  it('keeps its label as uploaded, and hands it out as a file', async () => {
    const { browser, at } = await owner();
    const { body } = await browser.post(at('/products')).send(product).expect(201);
    const pdf = Buffer.from('%PDF-1.4\n1 0 obj\nendobj\n%%EOF\n');
    const kept = await browser.post(at(`/products/${body.id}/label`)).attach('file', pdf, 'my label.pdf').expect(200);
    expect(kept.body.labelFile).toMatchObject({ name: 'my label.pdf', bytes: pdf.length });
    const read = await browser.get(at(`/products/${body.id}/label`)).buffer().parse((response, done) => {
      const chunks: Buffer[] = [];
      response.on('data', (chunk: Buffer) => chunks.push(chunk)).on('end', () => done(null, Buffer.concat(chunks)));
    });
    expect(read.body.equals(pdf)).toBe(true);
    expect(read.headers['content-disposition']).toMatch(/attachment/);
    expect(read.headers['x-content-type-options']).toBe('nosniff');
  });

  it('refuses a label that is no PDF whatever it calls itself', async () => {
    const { browser, at } = await owner();
    const { body } = await browser.post(at('/products')).send(product).expect(201);
    const answer = await browser.post(at(`/products/${body.id}/label`)).attach('file', Buffer.from('<html>'), { filename: 'label.pdf', contentType: 'application/pdf' }).expect(415);
    expect(answer.body.problems).toEqual([{ path: 'file', message: 'is not a PDF file' }]);
  });

  it('leaves a trace when a figure of its label is changed', async () => {
    const { browser, at } = await owner();
    const { body } = await browser.post(at('/products')).send(product).expect(201);
    await browser.put(at(`/products/${body.id}`)).send({ ...product, windMaxMs: 4 }).expect(200);
    const { items } = (await browser.get(at('/audit'))).body;
    expect(items.find((entry: { what: string }) => entry.what === 'product changed')).toMatchObject({ subject: product.name, details: { windMaxMs: { before: null, after: 4 } } });
  });
});

describe('a plan', () => {
  it('knows its area, tanks and minutes', async () => {
    const { browser, at, plan } = await withPlanParts();
    const { body } = await browser.post(at('/plans')).send(plan).expect(201);
    expect(body).toMatchObject({ areaHa: 0.3, minutesNeeded: 3 * 6 + 2 * 3 });
    expect(body.tanks).toBeCloseTo(3, 9);
    expect((await browser.get(at(`/plans/${body.id}`))).body).toMatchObject({ blockIds: plan.blockIds, products: plan.products, firstDate: '2026-06-10' });
  });

  it('names no block of another farm and no archived sprayer', async () => {
    const { browser, at, ids, plan } = await withPlanParts();
    const other = await withPlanParts();
    await browser.patch(at(`/sprayers/${ids.sprayer}/archived`)).send({ archived: true }).expect(200);
    const answer = await browser.post(at('/plans')).send({ ...plan, blockIds: [other.ids.block] }).expect(422);
    expect(answer.body.problems.map((problem: { path: string }) => problem.path)).toEqual(['blockIds.0', 'sprayerId']);
  });

  it('does not end before it begins', async () => {
    const { browser, at, plan } = await withPlanParts();
    const answer = await browser.post(at('/plans')).send({ ...plan, lastDate: '2026-06-09' }).expect(422);
    expect(answer.body.problems).toEqual([{ path: 'lastDate', message: 'must not be before the first date' }]);
  });
});
