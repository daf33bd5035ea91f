import { Op, type Transaction } from 'sequelize';
import { execute, inTransaction, select } from '../database/connection.ts';
import type { FarmRow } from '../models/farms.ts';
import type { MomentRow } from '../models/notices.ts';
import type { Services } from '../services.ts';
import { dawnAt, eveAt, nextMoment, nextRefresh } from './moments.ts';

const planned = ['eve', 'dawn', 'refresh'] as const;
type Planned = (typeof planned)[number];
const farmsAtOnce = 500;

/** Gives every farm its next moments: a new farm, one whose place or times were changed, one brought back from the archive. */
export async function planMoments(services: Services): Promise<void> {
  const { sequelize, models, clock, random } = services;
  for (;;) {
    const waiting = await select<{ id: string }>(
      sequelize,
      `SELECT f.id FROM farms f
         LEFT JOIN (SELECT farm_id, MIN(farm_version) AS version, COUNT(*) AS kinds FROM moments WHERE kind <> 'recheck' GROUP BY farm_id) m ON m.farm_id = f.id
        WHERE f.archived_at IS NULL AND (m.farm_id IS NULL OR m.kinds < ${planned.length} OR m.version <> f.version)
        LIMIT ${farmsAtOnce}`,
    );
    if (waiting.length === 0) return;
    const farms = await models.farms.findAll({ where: { id: waiting.map(({ id }) => id) } });
    await inTransaction(
      sequelize,
      async (transaction) => {
        const known = await models.moments.findAll({ where: { farmId: farms.map(({ id }) => id), kind: { [Op.in]: [...planned] } }, transaction, lock: transaction.LOCK.UPDATE });
        const rows = new Map(known.map((row) => [`${row.farmId} ${row.kind}`, row.get({ plain: true })]));
        for (const farm of farms) for (const kind of planned) await plan(services, farm, kind, rows.get(`${farm.id} ${kind}`), clock.now(), transaction);
      },
      random,
    );
    if (waiting.length < farmsAtOnce) return;
  }
}

/** A known moment keeps its morning and moves to that morning's new time; should that have passed, it is due at once. */
async function plan({ sequelize }: Services, farm: FarmRow, kind: Planned, known: MomentRow | undefined, now: Date, transaction: Transaction): Promise<void> {
  if (known && (kind === 'refresh' || !known.morning)) {
    await execute(sequelize, 'UPDATE moments SET farm_version = :version WHERE farm_id = :farmId AND kind = :kind', { version: farm.version, farmId: farm.id, kind }, transaction);
    return;
  }
  const moment = kind === 'refresh' ? { at: nextRefresh(farm.id, now), morning: null } : known?.morning ? { at: (kind === 'eve' ? eveAt : dawnAt)(known.morning, farm), morning: known.morning } : nextMoment(kind, farm, now);
  await execute(
    sequelize,
    `INSERT INTO moments (farm_id, kind, due_at, morning, run_at, tries, farm_version) VALUES (:farmId, :kind, :at, :morning, :at, 0, :version)
     ON DUPLICATE KEY UPDATE due_at = VALUES(due_at), morning = VALUES(morning), run_at = VALUES(run_at), tries = 0, farm_version = VALUES(farm_version)`,
    { farmId: farm.id, kind, at: moment.at, morning: moment.morning, version: farm.version },
    transaction,
  );
}
