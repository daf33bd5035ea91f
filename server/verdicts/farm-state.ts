import { Op, type Transaction } from 'sequelize';
import type { Models } from '../models/index.ts';
import type { BlockRow, FarmRow, PlanRow, ProductRow, SensitivePlaceRow, SprayerRow } from '../models/farms.ts';
import type { ReadingRow } from '../models/weather.ts';
import { notFound } from '../http/problem.ts';

/** A plan with all that its assessment draws on. */
export interface WholePlan {
  plan: PlanRow;
  blocks: BlockRow[];
  products: ProductRow[];
  sprayer: SprayerRow;
}

/** What a farm's mornings are judged on, beside the weather. */
export interface FarmState {
  farm: FarmRow;
  plans: WholePlan[];
  places: SensitivePlaceRow[];
  readings: ReadingRow[];
}

const plain = <T extends object>(rows: { get(options: { plain: true }): T }[]): T[] => rows.map((row) => row.get({ plain: true }));
/** Readings older than this teach nothing about the site as it is. */
const readingDays = 120;

/**
 * Loads a farm with the plans that may run between two local dates (inclusive).
 * @throws HttpProblem 404 when there is no such farm
 */
export async function loadFarmState(models: Models, farmId: string, firstDate: string, lastDate: string, now: Date, transaction: Transaction | null = null): Promise<FarmState> {
  const farmRow = await models.farms.findOne({ where: { id: farmId }, transaction });
  if (!farmRow) throw notFound();
  const farm = farmRow.get({ plain: true });
  const planRows = plain<PlanRow>(
    await models.plans.findAll({ where: { farmId, archivedAt: null, state: 'planned', firstDate: { [Op.lte]: lastDate }, lastDate: { [Op.gte]: firstDate } }, order: [['firstDate', 'ASC'], ['name', 'ASC'], ['id', 'ASC']], transaction }),
  );
  const planIds = planRows.map((plan) => plan.id);
  const [planBlocks, planProducts] = planIds.length
    ? [await models.planBlocks.findAll({ where: { planId: planIds }, order: [['position', 'ASC']], transaction }), await models.planProducts.findAll({ where: { planId: planIds }, order: [['position', 'ASC']], transaction })]
    : [[], []];
  const byId = async <Row extends { id: string }>(load: (ids: string[]) => Promise<Row[]>, ids: string[]) => new Map(ids.length ? (await load([...new Set(ids)])).map((row) => [row.id, row]) : []);
  const blocks = await byId(async (id) => plain<BlockRow>(await models.blocks.findAll({ where: { id, farmId }, transaction })), planBlocks.map((entry) => entry.blockId));
  const products = await byId(async (id) => plain<ProductRow>(await models.products.findAll({ where: { id, farmId }, transaction })), planProducts.map((entry) => entry.productId));
  const sprayers = await byId(async (id) => plain<SprayerRow>(await models.sprayers.findAll({ where: { id, farmId }, transaction })), planRows.map((plan) => plan.sprayerId));
  const places = plain<SensitivePlaceRow>(await models.sensitivePlaces.findAll({ where: { farmId, archivedAt: null }, transaction }));
  const readings = plain<ReadingRow>(
    await models.readings.findAll({ where: { farmId, takenAt: { [Op.between]: [new Date(now.getTime() - readingDays * 86_400_000), now] } }, order: [['takenAt', 'DESC']], limit: 500, transaction }),
  );
  const plans = planRows.flatMap((plan) => {
    const sprayer = sprayers.get(plan.sprayerId);
    if (!sprayer) return [];
    return [
      {
        plan,
        sprayer,
        blocks: planBlocks.filter((entry) => entry.planId === plan.id).flatMap((entry) => blocks.get(entry.blockId) ?? []),
        products: planProducts.filter((entry) => entry.planId === plan.id).flatMap((entry) => products.get(entry.productId) ?? []),
      },
    ];
  });
  return { farm, plans, places, readings };
}
