import { DateTime } from 'luxon';
import { inTransaction } from '../database/connection.ts';
import { queueDelivery, type NewDelivery } from '../delivery/outbox.ts';
import { notFound } from '../http/problem.ts';
import type { FarmRow } from '../models/farms.ts';
import type { NoticeRow } from '../models/notices.ts';
import type { Services } from '../services.ts';
import { noticeRow } from './record.ts';
import type { NoticeContent } from './texts.ts';

/** A test that has not arrived by then proves nothing. */
const testMinutes = 10;

/**
 * Puts a test notice to one recipient into the outbox.
 * @param deliveryOf makes the delivery of the notice
 * @returns the delivery's id
 */
export function queueTest(services: Services, farmId: string, deliveryOf: (notice: NoticeRow, content: NoticeContent) => NewDelivery & { id: string }): Promise<string> {
  const { models, clock, sequelize, random } = services;
  return inTransaction(
    sequelize,
    async (transaction) => {
      // Locked, so that two tests at once get two numbers.
      const row = await models.farms.findOne({ where: { id: farmId }, lock: transaction.LOCK.UPDATE, transaction });
      if (!row) throw notFound();
      const farm: FarmRow = row.get({ plain: true });
      const now = clock.now();
      const content: NoticeContent = { kind: 'test', farm, morning: DateTime.fromJSDate(now, { zone: farm.timeZone }).toISODate()!, plans: [], turned: [], forecast: null, stale: false, decidedAt: now };
      const notice = await noticeRow(services, transaction, content, farm.units, { dueAt: now, usefulUntil: new Date(now.getTime() + testMinutes * 60_000) });
      await models.notices.create(notice, { transaction });
      const delivery = deliveryOf(notice, content);
      await queueDelivery(services, transaction, { ...delivery, usefulUntil: notice.usefulUntil });
      return delivery.id;
    },
    random,
  );
}
