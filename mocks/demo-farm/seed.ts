import { randomUUID } from 'node:crypto';
import { DateTime } from 'luxon';
import { farmBody, blockBody, placeBody, sprayerBody } from '../../shared/api/farms.ts';
import { planBody, productBody } from '../../shared/api/plans.ts';
import { hashPassword } from '../../server/accounts/passwords.ts';
import type { Services } from '../../server/services.ts';
import { demoBlocks, demoFarm, demoPassword, demoPeople, demoPlaces, demoPlans, demoProducts, demoSprayers, demoTimeZone } from './facts.ts';

/** Ids that the rest of the demo needs. */
export interface SeededFarm {
  farmId: string;
  userIds: Map<string, string>;
}

const stamped = (at: Date) => ({ version: 1, archivedAt: null, createdAt: at, updatedAt: at });

/**
 * Writes the demo farm into an empty database, as of an instant.
 * @returns null when there are people already: a demo is seeded once
 */
export async function seedDemoFarm({ models, sequelize }: Services, opensAt: Date): Promise<SeededFarm | null> {
  if ((await models.users.count()) > 0) return null;
  const since = DateTime.fromJSDate(opensAt).minus({ days: 40 }).toJSDate();
  const passwordHash = await hashPassword(demoPassword);
  return sequelize.transaction(async (transaction) => {
    const userIds = new Map<string, string>();
    for (const person of demoPeople) {
      const id = randomUUID();
      userIds.set(person.email, id);
      await models.users.create({ id, email: person.email, emailConfirmedAt: since, passwordHash, name: person.name, units: person.units, language: 'en', createdAt: since, updatedAt: since }, { transaction });
    }
    const farmId = randomUUID();
    await models.farms.create({ id: farmId, ...farmBody.parse(demoFarm), timeZone: demoTimeZone, ...stamped(since) }, { transaction });
    for (const person of demoPeople) {
      await models.memberships.create({ id: randomUUID(), farmId, userId: userIds.get(person.email)!, role: person.role, createdAt: since, updatedAt: since }, { transaction });
    }
    const kept = () => ({ id: randomUUID(), farmId, ...stamped(since) });
    const idsOf = async <Facts extends object, Name extends string>(facts: Record<Name, Facts>, create: (facts: Facts) => Promise<string>): Promise<Record<Name, string>> => {
      const ids: Partial<Record<Name, string>> = {};
      for (const name of Object.keys(facts) as Name[]) ids[name] = await create(facts[name]);
      return ids as Record<Name, string>;
    };
    const blocks = await idsOf(demoBlocks, async (facts) => (await models.blocks.create({ ...kept(), ...blockBody.parse(facts) }, { transaction })).id);
    const sprayers = await idsOf(demoSprayers, async (facts) => (await models.sprayers.create({ ...kept(), ...sprayerBody.parse(facts) }, { transaction })).id);
    const products = await idsOf(demoProducts, async (facts) => (await models.products.create({ ...kept(), ...productBody.parse(facts), isExample: true }, { transaction })).id);
    for (const place of demoPlaces) await models.sensitivePlaces.create({ ...kept(), ...placeBody.parse(place) }, { transaction });
    const today = DateTime.fromJSDate(opensAt, { zone: demoTimeZone }).startOf('day');
    for (const { blocks: names, mix, sprayer, from, to, ...facts } of demoPlans) {
      const { blockIds, products: rates, ...row } = planBody.parse({
        ...facts,
        blockIds: names.map((name) => blocks[name]),
        products: mix.map(([name, rate]) => ({ productId: products[name], rate })),
        sprayerId: sprayers[sprayer],
        firstDate: today.plus({ days: from }).toISODate(),
        lastDate: today.plus({ days: to }).toISODate(),
      });
      const plan = await models.plans.create({ ...kept(), ...row }, { transaction });
      await models.planBlocks.bulkCreate(blockIds.map((blockId, position) => ({ planId: plan.id, blockId, position })), { transaction });
      await models.planProducts.bulkCreate(rates.map(({ productId, rate }, position) => ({ planId: plan.id, productId, position, rate })), { transaction });
    }
    return { farmId, userIds };
  });
}
