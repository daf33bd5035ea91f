import { execute, inTransaction, select } from '../database/connection.ts';
import type { MomentRow } from '../models/notices.ts';
import type { Services } from '../services.ts';

/** Another scheduler leaves a moment alone for this long after one has taken it up. */
const takenMs = 120_000;

/** One due moment, taken up. */
export type DueMoment = Pick<MomentRow, 'farmId' | 'kind' | 'dueAt' | 'morning' | 'tries'>;

interface Row {
  farm_id: string;
  kind: MomentRow['kind'];
  due_at: Date;
  morning: string | null;
  tries: number;
}

/** Takes up what is due; notices come before the hourly refresh of others. The taking is committed before anything is done. */
export async function takeDue(services: Services, max: number): Promise<DueMoment[]> {
  const { sequelize, clock, random } = services;
  const now = clock.now();
  return inTransaction(
    sequelize,
    async (transaction) => {
      const due: Row[] = [];
      for (const kinds of [['eve', 'dawn', 'recheck'], ['refresh']]) {
        if (due.length >= max) break;
        due.push(
          ...(await select<Row>(
            sequelize,
            `SELECT farm_id, kind, due_at, DATE_FORMAT(morning, '%Y-%m-%d') AS morning, tries FROM moments FORCE INDEX (moments_due) WHERE run_at <= :now AND kind IN (:kinds) ORDER BY run_at, farm_id LIMIT :max FOR UPDATE SKIP LOCKED`,
            { now, kinds, max: max - due.length },
            transaction,
          )),
        );
      }
      for (const kind of new Set(due.map((row) => row.kind))) {
        const farmIds = due.filter((row) => row.kind === kind).map((row) => row.farm_id);
        await execute(sequelize, 'UPDATE moments SET run_at = :until, tries = tries + 1 WHERE kind = :kind AND farm_id IN (:farmIds)', { until: new Date(now.getTime() + takenMs), kind, farmIds }, transaction);
      }
      return due.map((row) => ({ farmId: row.farm_id, kind: row.kind, dueAt: row.due_at, morning: row.morning, tries: row.tries + 1 }));
    },
    random,
  );
}

/** The moment is done: the next of its kind takes its place, unless another scheduler was quicker. */
export async function advance({ sequelize }: Services, done: DueMoment, next: { at: Date; morning: string | null }): Promise<void> {
  await execute(sequelize, 'UPDATE moments SET due_at = :at, morning = :morning, run_at = :at, tries = 0 WHERE farm_id = :farmId AND kind = :kind AND due_at = :dueAt', {
    at: next.at, morning: next.morning, farmId: done.farmId, kind: done.kind, dueAt: done.dueAt,
  });
}

/** The moment could not be done now and is tried again at an instant. */
export async function postpone({ sequelize }: Services, moment: DueMoment, until: Date): Promise<void> {
  await execute(sequelize, 'UPDATE moments SET run_at = :until WHERE farm_id = :farmId AND kind = :kind AND due_at = :dueAt', { until, farmId: moment.farmId, kind: moment.kind, dueAt: moment.dueAt });
}

/** Ends a moment without a next one; with `farm`, all of the farm's moments. */
export async function forget({ sequelize }: Services, moment: DueMoment, scope: 'moment' | 'farm'): Promise<void> {
  if (scope === 'farm') await execute(sequelize, 'DELETE FROM moments WHERE farm_id = :farmId', { farmId: moment.farmId });
  else await execute(sequelize, 'DELETE FROM moments WHERE farm_id = :farmId AND kind = :kind AND due_at = :dueAt', { farmId: moment.farmId, kind: moment.kind, dueAt: moment.dueAt });
}

/** The earliest moment of all farms, one taken up included. */
export async function earliest({ sequelize }: Services): Promise<Date | null> {
  const [row] = await select<{ at: Date | null }>(sequelize, 'SELECT MIN(run_at) AS at FROM moments');
  return row?.at ?? null;
}
