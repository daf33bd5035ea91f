import { readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createTestApp, type TestApp } from '../support/app.ts';
import { add, ownedFarm, pathsOf, typed, type OwnedFarm } from '../support/farm.ts';

let app: TestApp;
beforeAll(async () => {
  app = await createTestApp({ settings: { demo: true } });
});
afterAll(() => app.close());

const pdf = Buffer.from('%PDF-1.4\n1 0 obj\nendobj\n%%EOF\n');

async function withProduct() {
  const farm = await ownedFarm(app);
  const id = await add(farm, '/products', typed.product);
  return { farm, id, label: `/products/${id}/label` };
}
const upload = ({ browser, at }: OwnedFarm, path: string, bytes: Buffer, filename = 'label.pdf') => browser.post(at(path)).attach('file', bytes, { filename, contentType: 'application/pdf' });
const download = ({ browser, at }: OwnedFarm, path: string) =>
  browser.get(at(path)).buffer().parse((response, done) => {
    const chunks: Buffer[] = [];
    response.on('data', (chunk: Buffer) => chunks.push(chunk)).on('end', () => done(null, Buffer.concat(chunks)));
  });

describe('a product', () => {
  it('is refused when its figures contradict each other, each by its field', async () => {
    const { browser, at } = await ownedFarm(app);
    const answer = await browser.post(at('/products')).send({ ...typed.product, rateMax: 1, windMinMs: 5, windMaxMs: 2, epaRegistrationNumber: 'twelve' }).expect(422);
    expect(pathsOf(answer)).toEqual(['epaRegistrationNumber']);
    const figures = await browser.post(at('/products')).send({ ...typed.product, rateMax: 1, windMinMs: 5, windMaxMs: 2 }).expect(422);
    expect(pathsOf(figures)).toEqual(['rateMax', 'windMaxMs']);
  });

  it('of a person’s own is never marked as an example', async () => {
    const { browser, at } = await ownedFarm(app);
    const { body } = await browser.post(at('/products')).send({ ...typed.product, isExample: true }).expect(201);
    expect(body.isExample).toBe(false);
  });

  it('leaves a trace when a figure of its label is changed, and none when only its notes are', async () => {
    const { farm, id } = await withProduct();
    const { browser, at } = farm;
    await browser.put(at(`/products/${id}`)).send({ ...typed.product, notes: 'smells of pine' }).expect(200);
    await browser.put(at(`/products/${id}`)).send({ ...typed.product, windMaxMs: 4 }).expect(200);
    const changes = (await browser.get(at('/audit'))).body.items.filter((entry: { what: string }) => entry.what === 'product changed');
    expect(changes).toMatchObject([{ subject: typed.product.name, details: { windMaxMs: { before: null, after: 4 } } }]);
  });
});

describe('a label', () => {
  it('is kept as uploaded, and handed out as a file that no browser runs', async () => {
    const { farm, label } = await withProduct();
    const kept = await upload(farm, label, pdf, 'my label.pdf').expect(200);
    expect(kept.body.labelFile).toMatchObject({ name: 'my label.pdf', bytes: pdf.length });
    const read = await download(farm, label).expect(200);
    expect(read.body.equals(pdf)).toBe(true);
    expect(read.headers).toMatchObject({ 'content-type': 'application/pdf', 'x-content-type-options': 'nosniff', 'content-security-policy': 'sandbox' });
    expect(read.headers['content-disposition']).toMatch(/^attachment; filename="my label\.pdf"/);
  });

  it('keeps its name in any script, but nothing of a path', async () => {
    const { farm, label } = await withProduct();
    const kept = await upload(farm, label, pdf, '../../etc/Étiquette «1».pdf').expect(200);
    expect(kept.body.labelFile.name).toBe('Étiquette _1_.pdf');
  });

  it('replaces the one before, whose file goes', async () => {
    const { farm, label } = await withProduct();
    const before = readdirSync(app.services.settings.uploadsFolder).length;
    await upload(farm, label, pdf).expect(200);
    const newer = Buffer.concat([pdf, Buffer.from('%newer\n')]);
    await upload(farm, label, newer).expect(200);
    expect((await download(farm, label)).body.equals(newer)).toBe(true);
    expect(readdirSync(app.services.settings.uploadsFolder)).toHaveLength(before + 1);
  });

  it('that is no PDF is refused whatever it calls itself, and nothing of it is kept', async () => {
    const { farm, id, label } = await withProduct();
    const before = readdirSync(app.services.settings.uploadsFolder).length;
    const answer = await upload(farm, label, Buffer.from('<html>%PDF-1.4')).expect(415);
    expect(answer.body.problems).toEqual([{ path: 'file', message: 'is not a PDF file' }]);
    expect(readdirSync(app.services.settings.uploadsFolder)).toHaveLength(before);
    expect((await farm.browser.get(farm.at(`/products/${id}`))).body.labelFile).toBeNull();
  });

  it('larger than 10 MB is refused', async () => {
    const { farm, label } = await withProduct();
    await upload(farm, label, Buffer.concat([pdf, Buffer.alloc(10 * 1024 * 1024)])).expect(413);
  });

  it('left out of the form is asked for', async () => {
    const { farm, label } = await withProduct();
    expect(pathsOf(await farm.browser.post(farm.at(label)).field('note', 'x').expect(422))).toEqual(['file']);
  });

  it('of another farm’s product is neither read nor replaced', async () => {
    const { farm, label } = await withProduct();
    await upload(farm, label, pdf).expect(200);
    const other = await ownedFarm(app);
    await other.browser.get(other.at(label)).expect(404);
    await upload(other, label, pdf).expect(404);
  });

  it('that its store has lost is asked for again', async () => {
    const { farm, label } = await withProduct();
    const { uploadsFolder } = app.services.settings;
    const before = new Set(readdirSync(uploadsFolder));
    await upload(farm, label, pdf).expect(200);
    for (const name of readdirSync(uploadsFolder)) if (!before.has(name)) rmSync(join(uploadsFolder, name));
    expect((await farm.browser.get(farm.at(label)).expect(404)).body.detail).toMatch(/upload it again/);
  });
});
