import type { Transaction } from 'sequelize';
import { select } from '../database/connection.ts';
import type { Services } from '../services.ts';

/** Since when the newest of these plans' verdicts says go without a break. */
export async function goSince({ sequelize, clock }: Services, farmId: string, morning: string, planKeys: string[], transaction: Transaction): Promise<Date> {
  const [row] = await select<{ since: Date | null }>(
    sequelize,
    `SELECT MAX(first_go.since) AS since
       FROM (SELECT v.plan_key, MIN(v.decided_at) AS since
               FROM verdicts v
              WHERE v.farm_id = :farmId AND v.morning = :morning AND v.plan_key IN (:planKeys) AND v.verdict = 'go'
                AND v.revision > COALESCE((SELECT MAX(held.revision) FROM verdicts held WHERE held.farm_id = v.farm_id AND held.morning = v.morning AND held.plan_key = v.plan_key AND held.verdict = 'hold'), 0)
              GROUP BY v.plan_key) first_go`,
    { farmId, morning, planKeys },
    transaction,
  );
  return row?.since ?? clock.now();
}
