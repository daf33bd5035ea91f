import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Channel } from '../../shared/api/notices.ts';
import { execute } from '../database/connection.ts';
import type { Services } from '../services.ts';
import type { MailPayload, PushPayload, WebhookPayload } from './payloads.ts';
import { outboxSignal } from './signal.ts';

/** One message to one recipient by one channel, to be put into the outbox. */
export interface NewDelivery {
  id?: string;
  noticeId: string | null;
  farmId: string | null;
  channel: Channel;
  /** Device, webhook or user id; for a letter the address. */
  target: string;
  /** Who that is, for a person to read; no full address. */
  recipient: string;
  /** The same message to the same end has the same key for ever. ASCII, at most 400 characters. */
  key: string;
  /** Messages of one order key reach their end in the order of their sequence; null where order does not matter. */
  order: { key: string; sequence: number } | null;
  payload: PushPayload | MailPayload | WebhookPayload;
  dueAt: Date;
  usefulUntil: Date;
  ackTokenHash: string | null;
}

/**
 * Puts a delivery into the outbox, in the caller's transaction. An older message of the same order that still waits is replaced:
 * it would tell what no longer holds.
 * @returns false when a delivery of this key is there already
 */
export async function queueDelivery({ models, clock, sequelize }: Services, transaction: Transaction, delivery: NewDelivery): Promise<boolean> {
  const { key, order, id, ...kept } = delivery;
  if ((await models.deliveries.count({ where: { deliveryKey: key }, transaction })) > 0) return false;
  const now = clock.now();
  if (order) {
    await execute(
      sequelize,
      `UPDATE deliveries SET state = 'dropped', next_attempt_at = NULL, last_error = '${replacedNote}', updated_at = :now WHERE order_key = :orderKey AND state = 'waiting' AND sequence < :sequence`,
      { now, orderKey: order.key, sequence: order.sequence },
      transaction,
    );
  }
  await models.deliveries.create(
    { ...kept, id: id ?? randomUUID(), deliveryKey: key, orderKey: order?.key ?? null, sequence: order?.sequence ?? 0, state: 'waiting', attempts: 0, nextAttemptAt: now, createdAt: now, updatedAt: now },
    { transaction },
  );
  transaction.afterCommit(() => outboxSignal(sequelize).notify());
  return true;
}

/** Why a waiting message was taken out. */
export const replacedNote = 'Replaced by a newer notice of the same morning.';
export const uselessNote = 'Not sent in time to be of use.';
