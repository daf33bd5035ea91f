import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Channel } from '../../shared/api/notices.ts';
import type { Clock } from '../clock/clock.ts';
import { execute, inTransaction, select } from '../database/connection.ts';
import type { Services } from '../services.ts';
import { letterPrefix } from './letters.ts';
import { replacedNote, uselessNote } from './outbox.ts';
import type { ClaimedDelivery } from './sender.ts';

/** Tries that a worker's end cut short count up to this; then the message itself is suspected. */
const cutShortMax = 60;
const workerGone = 'The worker ended before the answer came.';

/** SQL of the present moment of leases, and its replacement. */
export interface LeaseTime {
  sql: string;
  values: () => Record<string, Date>;
}
export const leaseTime = (clock: Clock | undefined): LeaseTime => (clock ? { sql: ':leaseNow', values: () => ({ leaseNow: clock.now() }) } : { sql: 'UTC_TIMESTAMP(3)', values: () => ({}) });

/** Blanks the text of a letter that has reached its end. */
export const blanked = `payload = IF(delivery_key LIKE '${letterPrefix}%', '{}', payload)`;

/**
 * Rows of one channel that may be claimed: due, and no older message of their order under way.
 * The index is forced: a scan of the table would lock other channels' rows for a moment, and SKIP LOCKED would hide them from their own lane.
 */
const dueRows = `FROM deliveries d FORCE INDEX (deliveries_due)
          WHERE d.state = 'waiting' AND d.channel = :channel AND d.next_attempt_at <= :now
            AND (d.order_key IS NULL OR NOT EXISTS (SELECT 1 FROM deliveries older WHERE older.order_key = d.order_key AND older.state = 'claimed' AND older.sequence < d.sequence))`;

/** Whether something of a channel could be claimed, were it not locked for the moment by someone else. */
export async function anythingDue({ sequelize, clock }: Services, channel: Channel): Promise<boolean> {
  return (await select(sequelize, `SELECT 1 ${dueRows} LIMIT 1`, { channel, now: clock.now() })).length > 0;
}

interface Row {
  id: string;
  notice_id: string | null;
  farm_id: string | null;
  target: string;
  delivery_key: string;
  order_key: string | null;
  sequence: number;
  payload: string;
  attempts: number;
  due_at: Date;
  useful_until: Date;
  created_at: Date;
}

async function drop(services: Services, rows: Row[], why: string, now: Date, transaction: Transaction): Promise<void> {
  if (rows.length === 0) return;
  await execute(
    services.sequelize,
    `UPDATE deliveries SET state = 'dropped', next_attempt_at = NULL, last_error = :why, ${blanked}, updated_at = :now WHERE id IN (:ids)`,
    { ids: rows.map((row) => row.id), why, now },
    transaction,
  );
  for (const row of rows) services.log.warn({ deliveryId: row.id, noticeId: row.notice_id, dueAt: row.due_at, why }, 'delivery dropped');
}

/**
 * Claims due deliveries of one channel for a worker and writes their attempt, in one short transaction that is committed before
 * anything is sent. What is of no use any more, or replaced, is dropped on the way.
 * Raw SQL: Sequelize leaves SKIP LOCKED out on this dialect.
 * @param busy ids this process is still at, whatever their lease says
 * @returns how many rows were taken from the queue, and those to send
 */
export async function claim(services: Services, worker: string, channel: Channel, max: number, leaseMs: number, lease: LeaseTime, busy: string[]): Promise<{ taken: number; deliveries: ClaimedDelivery[] }> {
  const { sequelize, clock, random } = services;
  const now = clock.now();
  return inTransaction(
    sequelize,
    async (transaction) => {
      const rows = await select<Row>(
        sequelize,
        `SELECT d.id, d.notice_id, d.farm_id, d.target, d.delivery_key, d.order_key, d.sequence, d.payload, d.attempts, d.due_at, d.useful_until, d.created_at
           ${dueRows} ${busy.length > 0 ? 'AND d.id NOT IN (:busy)' : ''}
          ORDER BY d.next_attempt_at, d.id
          LIMIT :max FOR UPDATE SKIP LOCKED`,
        { channel, now, max, busy },
        transaction,
      );
      if (rows.length === 0) return { taken: 0, deliveries: [] };
      const useless = rows.filter((row) => row.useful_until <= now);
      const useful = rows.filter((row) => row.useful_until > now);
      const replacedIds = await replaced(services, useful, transaction);
      const old = useful.filter((row) => replacedIds.has(row.id));
      const sent = useful.filter((row) => !replacedIds.has(row.id));
      await drop(services, useless, uselessNote, now, transaction);
      await drop(services, old, replacedNote, now, transaction);
      if (sent.length > 0) {
        await execute(
          sequelize,
          `UPDATE deliveries SET state = 'claimed', claimed_by = :worker, attempts = attempts + 1, lease_until = DATE_ADD(${lease.sql}, INTERVAL :leaseUs MICROSECOND), updated_at = :now WHERE id IN (:ids)`,
          { worker, leaseUs: leaseMs * 1000, now, ids: sent.map((row) => row.id), ...lease.values() },
          transaction,
        );
        await services.models.deliveryAttempts.bulkCreate(
          sent.map((row) => ({ id: randomUUID(), deliveryId: row.id, attempt: row.attempts + 1, startedAt: now, endedAt: null, outcome: 'started' as const, status: null, detail: null })),
          { transaction },
        );
      }
      return { taken: rows.length, deliveries: sent.map((row) => claimed(row, channel)) };
    },
    random,
  );
}

/** Which of these have a newer sibling that was not itself given up. */
async function replaced({ sequelize }: Services, rows: Row[], transaction: Transaction): Promise<Set<string>> {
  const ordered = rows.filter((row) => row.order_key !== null);
  if (ordered.length === 0) return new Set();
  const newest = new Map(
    (
      await select<{ order_key: string; newest: number }>(
        sequelize,
        `SELECT order_key, MAX(sequence) AS newest FROM deliveries WHERE order_key IN (:keys) AND state <> 'dropped' GROUP BY order_key`,
        { keys: ordered.map((row) => row.order_key) },
        transaction,
      )
    ).map((row) => [row.order_key, Number(row.newest)]),
  );
  return new Set(ordered.filter((row) => (newest.get(row.order_key!) ?? 0) > row.sequence).map((row) => row.id));
}

function claimed(row: Row, channel: Channel): ClaimedDelivery {
  return {
    id: row.id, noticeId: row.notice_id, farmId: row.farm_id, channel, target: row.target, deliveryKey: row.delivery_key, payload: JSON.parse(row.payload) as unknown,
    attempts: row.attempts + 1, dueAt: row.due_at, usefulUntil: row.useful_until, createdAt: row.created_at,
  };
}

/** Renews the claims that this worker is still at. */
export async function renew({ sequelize }: Services, worker: string, ids: string[], leaseMs: number, lease: LeaseTime): Promise<void> {
  if (ids.length === 0) return;
  await execute(sequelize, `UPDATE deliveries SET lease_until = DATE_ADD(${lease.sql}, INTERVAL :leaseUs MICROSECOND) WHERE id IN (:ids) AND claimed_by = :worker AND state = 'claimed'`, {
    worker, ids, leaseUs: leaseMs * 1000, ...lease.values(),
  });
}

/** Puts back what a worker that is no more had claimed. @returns how many */
export async function takeBack(services: Services, lease: LeaseTime, busy: string[]): Promise<number> {
  const { sequelize, clock, random, log } = services;
  const now = clock.now();
  return inTransaction(
    sequelize,
    async (transaction) => {
      const rows = await select<{ id: string }>(
        sequelize,
        `SELECT id FROM deliveries FORCE INDEX (deliveries_lease) WHERE state = 'claimed' AND lease_until < ${lease.sql} ${busy.length > 0 ? 'AND id NOT IN (:busy)' : ''} LIMIT 200 FOR UPDATE SKIP LOCKED`,
        { busy, ...lease.values() },
        transaction,
      );
      if (rows.length === 0) return 0;
      const ids = rows.map((row) => row.id);
      await execute(
        sequelize,
        `UPDATE deliveries SET state = IF(attempts >= ${cutShortMax}, 'dead', 'waiting'), next_attempt_at = IF(attempts >= ${cutShortMax}, NULL, :now), claimed_by = NULL, lease_until = NULL, last_error = '${workerGone}', updated_at = :now WHERE id IN (:ids)`,
        { ids, now },
        transaction,
      );
      await execute(sequelize, `UPDATE delivery_attempts SET ended_at = :now, outcome = 'retry', detail = '${workerGone}' WHERE delivery_id IN (:ids) AND outcome = 'started'`, { ids, now }, transaction);
      log.warn({ deliveryIds: ids }, 'took back claims of a worker that ended');
      return ids.length;
    },
    random,
  );
}
