import { inTransaction, select } from '../database/connection.ts';
import { HttpProblem, notFound } from '../http/problem.ts';
import type { DeliveryRow } from '../models/notices.ts';
import type { Services } from '../services.ts';
import { outboxSignal } from './signal.ts';

/**
 * Puts a dead delivery back into the outbox, under the same key.
 * @throws HttpProblem 404 unknown, 409 when it is not dead, of no use any more, or replaced by a newer notice
 */
export async function replayDelivery({ models, sequelize, clock, random }: Services, farmId: string, id: string): Promise<DeliveryRow> {
  return inTransaction(
    sequelize,
    async (transaction) => {
      const row = await models.deliveries.findOne({ where: { id, farmId }, transaction, lock: transaction.LOCK.UPDATE });
      if (!row) throw notFound();
      const now = clock.now();
      if (row.state !== 'dead') throw new HttpProblem(409, 'Only a delivery that was given up can be tried again; this one is not.');
      if (row.usefulUntil <= now) throw new HttpProblem(409, 'This notice is of no use any more: its morning is over.');
      if (row.orderKey !== null) {
        const [newer] = await select(sequelize, `SELECT 1 FROM deliveries WHERE order_key = :orderKey AND sequence > :sequence AND state <> 'dropped' LIMIT 1`, { orderKey: row.orderKey, sequence: row.sequence }, transaction);
        if (newer) throw new HttpProblem(409, 'A newer notice of the same morning has taken the place of this one.');
      }
      await row.update({ state: 'waiting', nextAttemptAt: now, updatedAt: now }, { transaction });
      transaction.afterCommit(() => outboxSignal(sequelize).notify());
      return row.get({ plain: true });
    },
    random,
  );
}
