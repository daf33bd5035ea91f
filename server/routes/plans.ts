import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import { planEndpoints, planProblems, type Plan, type planBody } from '../../shared/api/plans.ts';
import { jobOfPlan } from '../../shared/tank/minutes.ts';
import { keptRoutes, presentStamps } from '../farms/kept.ts';
import type { ProblemItem } from '../http/problem.ts';
import type { Register } from '../http/route.ts';
import type { PlanRow } from '../models/farms.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

type PlanInput = z.infer<typeof planBody>;

const auditedFigures = ['name', 'firstDate', 'lastDate', 'state', 'bloom', 'windMaxMs', 'windMinMs', 'gustMaxMs', 'inversionMax', 'rainFreeHours', 'rainMm', 'rainProbabilityPct', 'foliageDry', 'deltaTMinC', 'deltaTMaxC', 'temperatureMinC', 'temperatureMaxC', 'reserveMinutes'] as const;

export function planRoutes(register: Register, services: Services, { assessor }: Pick<Parts, 'assessor'>): void {
  const { models } = services;

  /** A plan names only things of its own farm that are not archived. */
  async function unknownThings(input: PlanInput, farmId: string, transaction: Transaction): Promise<ProblemItem[]> {
    const present = async (table: 'blocks' | 'products' | 'sprayers', ids: string[]): Promise<Set<string>> => {
      const rows: { id: string }[] = await (models[table] as typeof models.blocks).findAll({ where: { id: ids, farmId, archivedAt: null }, attributes: ['id'], transaction });
      return new Set(rows.map((row) => row.id));
    };
    const [blocks, products, sprayers] = [await present('blocks', input.blockIds), await present('products', input.products.map((entry) => entry.productId)), await present('sprayers', [input.sprayerId])];
    return [
      ...input.blockIds.flatMap((id, index) => (blocks.has(id) ? [] : [{ path: `blockIds.${index}`, message: 'choose a block of this farm that is not archived' }])),
      ...input.products.flatMap((entry, index) => (products.has(entry.productId) ? [] : [{ path: `products.${index}.productId`, message: 'choose a product of this farm that is not archived' }])),
      ...(sprayers.has(input.sprayerId) ? [] : [{ path: 'sprayerId', message: 'choose a sprayer of this farm that is not archived' }]),
    ];
  }

  async function present(rows: PlanRow[], transaction: Transaction | null): Promise<Plan[]> {
    const planId = rows.map((row) => row.id);
    const planBlocks = await models.planBlocks.findAll({ where: { planId }, order: [['position', 'ASC']], transaction });
    const planProducts = await models.planProducts.findAll({ where: { planId }, order: [['position', 'ASC']], transaction });
    const areas = new Map((await models.blocks.findAll({ where: { id: planBlocks.map((entry) => entry.blockId) }, attributes: ['id', 'areaHa'], transaction })).map((block) => [block.id, block.areaHa]));
    const sprayers = new Map((await models.sprayers.findAll({ where: { id: rows.map((row) => row.sprayerId) }, transaction })).map((sprayer) => [sprayer.id, sprayer]));
    return rows.map((row) => {
      const blockIds = planBlocks.filter((entry) => entry.planId === row.id).map((entry) => entry.blockId);
      const areaHa = blockIds.reduce((sum, id) => sum + (areas.get(id) ?? 0), 0);
      const { tanks, minutesNeeded } = jobOfPlan({ areaHa, carrierLHa: row.carrierLHa, sprayer: sprayers.get(row.sprayerId)! });
      return { ...presentStamps(row), blockIds, products: planProducts.filter((entry) => entry.planId === row.id).map(({ productId, rate }) => ({ productId, rate })), areaHa, tanks, minutesNeeded };
    });
  }

  keptRoutes<PlanRow, PlanInput, Plan>(
    register,
    services,
    planEndpoints,
    {
      table: models.plans,
      columns: ({ blockIds: _blocks, products: _products, ...columns }) => columns,
      check: async (input, farmId, transaction) => [...planProblems(input), ...(await unknownThings(input, farmId, transaction))],
      async afterWrite(planId, input, transaction) {
        await models.planBlocks.destroy({ where: { planId }, transaction });
        await models.planProducts.destroy({ where: { planId }, transaction });
        await models.planBlocks.bulkCreate([...new Set(input.blockIds)].map((blockId, position) => ({ planId, blockId, position })), { transaction });
        await models.planProducts.bulkCreate(input.products.map(({ productId, rate }, position) => ({ planId, productId, position, rate })), { transaction });
      },
      audited: auditedFigures,
      present,
    },
    (farmId) => assessor.assessFarm(farmId, { fetch: 'never' }),
  );
}
