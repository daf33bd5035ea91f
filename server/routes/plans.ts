import type { Transaction } from 'sequelize';
import type { z } from 'zod';
import { planEndpoints, planProblems, type Plan, type planBody } from '../../shared/api/plans.ts';
import { labelProblems } from '../../shared/rules/plan-label.ts';
import { jobOfPlan } from '../../shared/tank/minutes.ts';
import { presentStamps } from '../farms/changes.ts';
import { keptRoutes } from '../farms/kept.ts';
import { reassessAfterChange } from '../farms/reassess.ts';
import type { ProblemItem } from '../http/problem.ts';
import type { Register } from '../http/route.ts';
import type { PlanRow } from '../models/farms.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

type PlanInput = z.infer<typeof planBody>;

const auditedFigures = ['name', 'firstDate', 'lastDate', 'state', 'bloom', 'windMaxMs', 'windMinMs', 'gustMaxMs', 'inversionMax', 'rainFreeHours', 'rainMm', 'rainProbabilityPct', 'foliageDry', 'deltaTMinC', 'deltaTMaxC', 'temperatureMinC', 'temperatureMaxC', 'reserveMinutes'] as const;

export function planRoutes(register: Register, services: Services, parts: Pick<Parts, 'assessor'>): void {
  const { models } = services;

  /** A plan names only things of its own farm that are not archived, and keeps to their labels. */
  async function problemsOf(input: PlanInput, farmId: string, transaction: Transaction): Promise<ProblemItem[]> {
    const ours = { farmId, archivedAt: null };
    const blocks = new Set((await models.blocks.findAll({ where: { ...ours, id: input.blockIds }, attributes: ['id'], transaction })).map((row) => row.id));
    const products = new Map((await models.products.findAll({ where: { ...ours, id: input.products.map((entry) => entry.productId) }, transaction })).map((row) => [row.id, row]));
    const sprayer = await models.sprayers.findOne({ where: { ...ours, id: input.sprayerId }, attributes: ['id'], transaction });
    return [
      ...input.blockIds.flatMap((id, index) => (blocks.has(id) ? [] : [{ path: `blockIds.${index}`, message: 'choose a block of this farm that is not archived' }])),
      ...input.products.flatMap((entry, index) => (products.has(entry.productId) ? [] : [{ path: `products.${index}.productId`, message: 'choose a product of this farm that is not archived' }])),
      ...(sprayer ? [] : [{ path: 'sprayerId', message: 'choose a sprayer of this farm that is not archived' }]),
      ...labelProblems(input, products),
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
      check: async (input, farmId, transaction) => [...planProblems(input), ...(await problemsOf(input, farmId, transaction))],
      async afterWrite(planId, input, transaction) {
        await models.planBlocks.destroy({ where: { planId }, transaction });
        await models.planProducts.destroy({ where: { planId }, transaction });
        await models.planBlocks.bulkCreate([...new Set(input.blockIds)].map((blockId, position) => ({ planId, blockId, position })), { transaction });
        await models.planProducts.bulkCreate(input.products.map(({ productId, rate }, position) => ({ planId, productId, position, rate })), { transaction });
      },
      audited: auditedFigures,
      present,
    },
    reassessAfterChange(services, parts),
  );
}
