import { productEndpoints, productProblems, type Product } from '../../shared/api/plans.ts';
import { audit } from '../accounts/audit.ts';
import { inTransaction } from '../database/connection.ts';
import { folderStore } from '../farms/file-store.ts';
import { presentStamps } from '../farms/changes.ts';
import { keptRoutes } from '../farms/kept.ts';
import { reassessAfterChange } from '../farms/reassess.ts';
import { HttpProblem, invalid, notFound } from '../http/problem.ts';
import { alreadySent, signedIn, type Register } from '../http/route.ts';
import type { ProductRow } from '../models/farms.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

/** Everything of a product that can move a verdict or a legal figure. */
const auditedFigures = [
  'name', 'epaRegistrationNumber', 'rateMin', 'rateMax', 'rateUnit', 'carrierMinLHa', 'carrierMaxLHa', 'windMaxMs', 'windMinMs', 'windHeightM', 'gustMaxMs', 'inversionProhibited', 'rainFreeHours',
  'temperatureMinC', 'temperatureMaxC', 'beeStatement', 'reiHours', 'phiDays', 'maxApplicationsPerSeason', 'maxRatePerSeason', 'minIntervalDays', 'restrictedUse',
] as const;

const pdfMark = Buffer.from('%PDF-');

/** A name that is safe in a header and on a disk; it is only shown, never used as a path. */
const safeName = (name: string): string =>
  name
    .normalize('NFKC')
    .replace(/[^\p{L}\p{N} ._-]+/gu, '_')
    .slice(-150) || 'label.pdf';

export function productRoutes(register: Register, services: Services, parts: Pick<Parts, 'assessor'>): void {
  const { models, sequelize, clock, settings } = services;
  const store = folderStore(settings.uploadsFolder);

  async function present(rows: ProductRow[]): Promise<Product[]> {
    const files = new Map((await models.labelFiles.findAll({ where: { productId: rows.map((row) => row.id) } })).map((file) => [file.productId, file]));
    return rows.map((row) => {
      const file = files.get(row.id);
      return { ...presentStamps(row), labelFile: file ? { name: file.fileName, bytes: file.bytes, uploadedAt: file.uploadedAt.toISOString() } : null };
    });
  }

  keptRoutes<ProductRow, ProductRow, Product>(
    register,
    services,
    productEndpoints,
    { table: models.products, columns: (input) => input, check: async (input) => productProblems(input), audited: auditedFigures, defaults: { isExample: false }, present },
    reassessAfterChange(services, parts),
  );

  register(productEndpoints.uploadLabel, async ({ params: { farmId, id }, request, caller }) => {
    const file = request.file;
    if (!file) throw invalid([{ path: 'file', message: 'choose the label as a PDF file' }]);
    if (!file.buffer.subarray(0, pdfMark.length).equals(pdfMark)) throw new HttpProblem(415, 'This is not a PDF file: save or scan the label as PDF.', [{ path: 'file', message: 'is not a PDF file' }]);
    const product = await models.products.findOne({ where: { id, farmId } });
    if (!product) throw notFound();
    const { key, sha256 } = await store.put(file.buffer);
    // The browser sends names as UTF-8; the form parser reads them as Latin-1.
    const fileName = safeName(Buffer.from(file.originalname, 'latin1').toString('utf8'));
    const replaced = await inTransaction(sequelize, async (transaction) => {
      // Two uploads at once: the second waits and replaces the first, and no file is left behind.
      await models.products.findOne({ where: { id, farmId }, attributes: ['id'], lock: transaction.LOCK.UPDATE, transaction });
      const before = await models.labelFiles.findOne({ where: { productId: id }, transaction });
      await models.labelFiles.upsert({ productId: id, fileName, storageKey: key, bytes: file.size, sha256, uploadedAt: clock.now() }, { transaction });
      await audit(services, transaction, { farmId, userId: signedIn(caller).userId, what: 'label uploaded', subject: product.name, details: { fileName, sha256 } });
      return before?.storageKey ?? null;
    }).catch(async (error: unknown) => {
      await store.remove(key);
      throw error;
    });
    if (replaced) await store.remove(replaced);
    return (await present([product.get({ plain: true })]))[0]!;
  });

  register(productEndpoints.readLabel, async ({ params: { farmId, id }, response }) => {
    const product = await models.products.findOne({ where: { id, farmId } });
    const file = product && (await models.labelFiles.findByPk(id));
    if (!file) throw notFound('No label is kept with this product yet.');
    const bytes = await store.get(file.storageKey);
    if (!bytes) throw notFound('The label file is gone from its store: upload it again.');
    response.attachment(file.fileName).type('application/pdf').setHeader('Content-Security-Policy', 'sandbox');
    response.send(bytes);
    return alreadySent;
  });
}
