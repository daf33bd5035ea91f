import tzLookup from '@photostructure/tz-lookup';
import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import { farmEndpoints, type Block, type Farm, type farmBody, type SensitivePlace, type Sprayer } from '../../shared/api/farms.ts';
import { audit, differences } from '../accounts/audit.ts';
import { inTransaction } from '../database/connection.ts';
import { changedMeanwhile, keptRoutes, presentStamps } from '../farms/kept.ts';
import { notFound } from '../http/problem.ts';
import { signedIn, type Register } from '../http/route.ts';
import type { BlockRow, FarmRow, SensitivePlaceRow, SprayerRow } from '../models/farms.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

const presentFarm = (row: FarmRow): Farm => presentStamps(row);
const audited = ['name', 'latitude', 'longitude', 'elevationM', 'exposure', 'eveTime', 'dawnLeadMinutes'] as const;

/** IANA zone of a position: its eve and dawn follow from it. */
const timeZoneAt = ({ latitude, longitude }: { latitude: number; longitude: number }): string => tzLookup(latitude, longitude);

export function farmRoutes(register: Register, services: Services, { assessor }: Pick<Parts, 'assessor'>): void {
  const { models, sequelize, clock } = services;
  const reassess = (farmId: string) => assessor.assessFarm(farmId, { fetch: 'ifDue' });

  register(farmEndpoints.createFarm, async ({ body, caller }) => {
    const { userId } = signedIn(caller);
    const farm = await inTransaction(sequelize, async (transaction) => {
      const now = clock.now();
      const row: FarmRow = { ...body, id: randomUUID(), timeZone: timeZoneAt(body), version: 1, archivedAt: null, createdAt: now, updatedAt: now };
      await models.farms.create(row, { transaction });
      await models.memberships.create({ id: randomUUID(), farmId: row.id, userId, role: 'owner', createdAt: now, updatedAt: now }, { transaction });
      await audit(services, transaction, { farmId: row.id, userId, what: 'farm opened', subject: row.name });
      return row;
    });
    await reassess(farm.id);
    return presentFarm(farm);
  });

  register(farmEndpoints.readFarm, async ({ params: { farmId } }) => {
    const row = await models.farms.findByPk(farmId);
    if (!row) throw notFound();
    return presentFarm(row.get({ plain: true }));
  });

  async function change(farmId: string, userId: string, what: string, version: number | undefined, input: Partial<FarmRow> | z.infer<typeof farmBody>): Promise<Farm> {
    return inTransaction(sequelize, async (transaction) => {
      const row = await models.farms.findOne({ where: { id: farmId }, lock: transaction.LOCK.UPDATE, transaction });
      if (!row) throw notFound();
      const before = row.get({ plain: true });
      if (version !== undefined && version !== before.version) throw changedMeanwhile(presentFarm(before), input, before.updatedAt.toISOString());
      const after: FarmRow = { ...before, ...input, version: before.version + 1, updatedAt: clock.now() };
      after.timeZone = timeZoneAt(after);
      await row.update(after, { transaction });
      await audit(services, transaction, { farmId, userId, what, subject: after.name, details: differences(before, after, audited) });
      return presentFarm(after);
    });
  }

  register(farmEndpoints.updateFarm, async ({ params: { farmId }, body: { version, ...input }, caller }) => {
    const farm = await change(farmId, signedIn(caller).userId, 'farm changed', version, input);
    await reassess(farmId);
    return farm;
  });

  register(farmEndpoints.archiveFarm, async ({ params: { farmId }, body: { archived }, caller }) =>
    change(farmId, signedIn(caller).userId, archived ? 'farm archived' : 'farm brought back', undefined, { archivedAt: archived ? clock.now() : null }),
  );

  keptRoutes<BlockRow, BlockRow, Block>(register, services, farmEndpoints.blocks, { table: models.blocks, columns: (input) => input, present: async (rows) => rows.map(presentStamps) }, reassess);
  keptRoutes<SensitivePlaceRow, SensitivePlaceRow, SensitivePlace>(
    register,
    services,
    farmEndpoints.places,
    { table: models.sensitivePlaces, columns: (input) => input, present: async (rows) => rows.map(presentStamps), audited: ['name', 'kind', 'bearingDeg', 'distanceM', 'contactEmail'] },
    reassess,
  );
  keptRoutes<SprayerRow, SprayerRow, Sprayer>(register, services, farmEndpoints.sprayers, { table: models.sprayers, columns: (input) => input, present: async (rows) => rows.map(presentStamps) }, reassess);
}
