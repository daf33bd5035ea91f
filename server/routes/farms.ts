import tzLookup from '@photostructure/tz-lookup';
import { randomUUID } from 'node:crypto';
import type { z } from 'zod';
import { farmEndpoints, type Block, type Farm, type farmBody, type SensitivePlace, type Sprayer } from '../../shared/api/farms.ts';
import { audit, differences } from '../accounts/audit.ts';
import { inTransaction } from '../database/connection.ts';
import { changedMeanwhile, presentStamps } from '../farms/changes.ts';
import { keptRoutes } from '../farms/kept.ts';
import { reassessAfterChange } from '../farms/reassess.ts';
import { notFound } from '../http/problem.ts';
import { signedIn, type Register } from '../http/route.ts';
import type { BlockRow, FarmRow, SensitivePlaceRow, SprayerRow } from '../models/farms.ts';
import { snapshot } from '../models/table.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

const presentFarm = (row: FarmRow): Farm => presentStamps(row);
const audited = ['name', 'latitude', 'longitude', 'elevationM', 'exposure', 'eveTime', 'dawnLeadMinutes'] as const;
const place = ['latitude', 'longitude', 'elevationM'] as const;

/** IANA zone of a position: its eve and dawn follow from it. */
const timeZoneAt = ({ latitude, longitude }: { latitude: number; longitude: number }): string => tzLookup(latitude, longitude);

export function farmRoutes(register: Register, services: Services, parts: Pick<Parts, 'assessor'>): void {
  const { models, sequelize, clock } = services;
  const reassess = reassessAfterChange(services, parts);
  /** A new or moved farm needs the weather of its place, not of where it was. */
  const reassessPlace = reassessAfterChange(services, parts, 'now');

  register(farmEndpoints.createFarm, async ({ body, caller }) => {
    const { userId } = signedIn(caller);
    const farm = await inTransaction(sequelize, async (transaction) => {
      const now = clock.now();
      const row: FarmRow = { ...body, id: randomUUID(), timeZone: timeZoneAt(body), version: 1, archivedAt: null, createdAt: now, updatedAt: now, updatedBy: userId };
      await models.farms.create(row, { transaction });
      await models.memberships.create({ id: randomUUID(), farmId: row.id, userId, role: 'owner', createdAt: now, updatedAt: now }, { transaction });
      await audit(services, transaction, { farmId: row.id, userId, what: 'farm opened', subject: row.name });
      return row;
    });
    await reassessPlace(farm.id);
    return presentFarm(farm);
  });

  register(farmEndpoints.readFarm, async ({ params: { farmId } }) => {
    const row = await models.farms.findByPk(farmId);
    if (!row) throw notFound();
    return presentFarm(snapshot<FarmRow>(row));
  });

  /** Changes the farm in one transaction; answers what it was and what it is. */
  async function change(farmId: string, userId: string, what: string, version: number | undefined, input: Partial<FarmRow> | z.infer<typeof farmBody>): Promise<{ before: FarmRow; after: FarmRow }> {
    return inTransaction(sequelize, async (transaction) => {
      const row = await models.farms.findOne({ where: { id: farmId }, lock: transaction.LOCK.UPDATE, transaction });
      if (!row) throw notFound();
      const before = snapshot<FarmRow>(row);
      if (version !== undefined && version !== before.version) throw await changedMeanwhile(services, before, presentFarm(before), input, transaction);
      const after: FarmRow = { ...before, ...input, version: before.version + 1, updatedAt: clock.now(), updatedBy: userId };
      after.timeZone = timeZoneAt(after);
      await row.update(after, { transaction });
      await audit(services, transaction, { farmId, userId, what, subject: after.name, details: differences(before, after, audited) });
      return { before, after };
    });
  }

  register(farmEndpoints.updateFarm, async ({ params: { farmId }, body: { version, ...input }, caller }) => {
    const { before, after } = await change(farmId, signedIn(caller).userId, 'farm changed', version, input);
    await (place.some((field) => before[field] !== after[field]) ? reassessPlace : reassess)(farmId);
    return presentFarm(after);
  });

  register(farmEndpoints.archiveFarm, async ({ params: { farmId }, body: { archived }, caller }) => {
    const { after } = await change(farmId, signedIn(caller).userId, archived ? 'farm archived' : 'farm brought back', undefined, { archivedAt: archived ? clock.now() : null });
    if (!archived) await reassessPlace(farmId);
    return presentFarm(after);
  });

  keptRoutes<BlockRow, BlockRow, Block>(register, services, farmEndpoints.blocks, { table: models.blocks, columns: (input) => input, present: async (rows) => rows.map(presentStamps) }, reassess);
  keptRoutes<SensitivePlaceRow, SensitivePlaceRow, SensitivePlace>(
    register,
    services,
    farmEndpoints.places,
    { table: models.sensitivePlaces, columns: (input) => input, present: async (rows) => rows.map(presentStamps), audited: ['name', 'kind', 'bearingDeg', 'distanceM', 'contactName', 'contactEmail'] },
    reassess,
  );
  keptRoutes<SprayerRow, SprayerRow, Sprayer>(register, services, farmEndpoints.sprayers, { table: models.sprayers, columns: (input) => input, present: async (rows) => rows.map(presentStamps) }, reassess);
}
