import type { Transaction } from 'sequelize';
import { execute } from '../database/connection.ts';
import type { FarmRow } from '../models/farms.ts';
import type { Services } from '../services.ts';

/** Asks for another look at a farm at an instant, in the caller's transaction: the soonest one asked for counts. */
export async function scheduleRecheck({ sequelize }: Services, transaction: Transaction, farm: Pick<FarmRow, 'id' | 'version'>, morning: string, at: Date): Promise<void> {
  await execute(
    sequelize,
    `INSERT INTO moments (farm_id, kind, due_at, morning, run_at, tries, farm_version) VALUES (:farmId, 'recheck', :at, :morning, :at, 0, :version)
     ON DUPLICATE KEY UPDATE due_at = LEAST(due_at, VALUES(due_at)), run_at = LEAST(run_at, VALUES(run_at)), morning = VALUES(morning)`,
    { farmId: farm.id, morning, at, version: farm.version },
    transaction,
  );
}
