import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, type TestApp } from '../support/app.ts';
import { add, farmToPlanOn, pathsOf, typed } from '../support/farm.ts';

let app: TestApp;
beforeAll(async () => {
  app = await createTestApp({ settings: { demo: true } });
});
afterAll(() => app.close());

describe('a plan', () => {
  it('knows its area, tanks and minutes', async () => {
    const { browser, at, plan } = await farmToPlanOn(app);
    const { body } = await browser.post(at('/plans')).send(plan).expect(201);
    expect(body).toMatchObject({ areaHa: 0.3, minutesNeeded: 3 * 6 + 2 * 3 });
    expect(body.tanks).toBeCloseTo(3, 9);
    expect((await browser.get(at(`/plans/${body.id}`))).body).toMatchObject({ blockIds: plan.blockIds, products: plan.products, firstDate: '2026-06-10' });
  });

  it('takes longer when its sprayer turns out slower', async () => {
    const { browser, at, ids, plan } = await farmToPlanOn(app);
    const { body } = await browser.post(at('/plans')).send(plan).expect(201);
    await browser.put(at(`/sprayers/${ids.sprayer}`)).send({ ...typed.sprayer, minutesPerTank: 8 }).expect(200);
    expect((await browser.get(at(`/plans/${body.id}`))).body.minutesNeeded).toBe(3 * 8 + 2 * 3);
  });

  it('keeps its blocks and products in the order given, each once, and forgets those taken out', async () => {
    const farm = await farmToPlanOn(app);
    const { browser, at, ids, plan } = farm;
    const second = await add(farm, '/blocks', { ...typed.block, name: 'Aspen corner', areaHa: 0.2 });
    const other = await add(farm, '/products', { ...typed.product, name: 'Another' });
    const { body } = await browser.post(at('/plans')).send({ ...plan, blockIds: [second, ids.block, second], products: [{ productId: other, rate: 2 }, ...plan.products] }).expect(201);
    expect(body).toMatchObject({ blockIds: [second, ids.block], products: [{ productId: other, rate: 2 }, { productId: ids.product, rate: 3 }] });
    expect(body.areaHa).toBeCloseTo(0.5, 12);
    const changed = await browser.put(at(`/plans/${body.id}`)).send({ ...plan, blockIds: [second] }).expect(200);
    expect(changed.body).toMatchObject({ blockIds: [second], products: plan.products, areaHa: 0.2 });
  });

  it('names no block or product of another farm, and nothing archived', async () => {
    const { browser, at, ids, plan } = await farmToPlanOn(app);
    const other = await farmToPlanOn(app);
    await browser.patch(at(`/sprayers/${ids.sprayer}/archived`)).send({ archived: true }).expect(200);
    const answer = await browser.post(at('/plans')).send({ ...plan, blockIds: [ids.block, other.ids.block], products: [{ productId: other.ids.product, rate: 3 }] }).expect(422);
    expect(pathsOf(answer)).toEqual(['blockIds.1', 'products.0.productId', 'sprayerId']);
    expect((await browser.get(at('/plans'))).body.items).toEqual([]);
  });

  it('does not go beyond what was entered from the label', async () => {
    const farm = await farmToPlanOn(app);
    const { browser, at, ids, plan } = farm;
    await browser.put(at(`/products/${ids.product}`)).send({ ...typed.product, carrierMinLHa: 150 }).expect(200);
    const answer = await browser.post(at('/plans')).send({ ...plan, products: [{ productId: ids.product, rate: 4.5 }] }).expect(422);
    expect(answer.body.problems).toEqual([
      { path: 'products.0.rate', message: 'must be at most 4, the highest rate entered from the label of Example One' },
      { path: 'carrierLHa', message: 'must be at least 150 L/ha, as entered from the label of Example One' },
    ]);
  });

  it('does not end before it begins, and names a product once', async () => {
    const { browser, at, plan } = await farmToPlanOn(app);
    const answer = await browser.post(at('/plans')).send({ ...plan, lastDate: '2026-06-09', products: [...plan.products, ...plan.products] }).expect(422);
    expect(answer.body.problems).toEqual([
      { path: 'lastDate', message: 'must not be before the first date' },
      { path: 'products', message: 'each product once only' },
    ]);
  });

  it('edited by two people tells the second, with both versions whole', async () => {
    const { browser, at, plan } = await farmToPlanOn(app);
    const { body } = await browser.post(at('/plans')).send(plan).expect(201);
    await browser.put(at(`/plans/${body.id}`)).send({ ...plan, target: 'Scale', version: 1 }).expect(200);
    const conflict = await browser.put(at(`/plans/${body.id}`)).send({ ...plan, target: 'Mites', version: 1 }).expect(409);
    expect(conflict.body).toMatchObject({ theirs: { target: 'Scale', version: 2, blockIds: plan.blockIds }, yours: { target: 'Mites', products: plan.products } });
  });

  it('leaves a trace when one of its limits is changed', async () => {
    const { browser, at, plan } = await farmToPlanOn(app);
    const { body } = await browser.post(at('/plans')).send(plan).expect(201);
    await browser.put(at(`/plans/${body.id}`)).send({ ...plan, windMaxMs: 3 }).expect(200);
    const entry = (await browser.get(at('/audit'))).body.items.find((one: { what: string }) => one.what === 'plan changed');
    expect(entry).toMatchObject({ subject: 'First cover', details: { windMaxMs: { before: null, after: 3 } } });
  });
});
