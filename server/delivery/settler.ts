import type { Transaction } from 'sequelize';
import type { Channel } from '../../shared/api/notices.ts';
import { execute, inTransaction } from '../database/connection.ts';
import type { Services } from '../services.ts';
import { pauseMs } from './backoff.ts';
import { blanked } from './claims.ts';
import { clipped, type Sender, type Settled } from './sender.ts';

/** Pause before results that the database did not take are written again. */
const againMs = 500;

interface Waiting extends Settled {
  written: () => void;
}

/**
 * Writes what came of the tries. While one write is under way the results that come in gather for the next, so that a busy worker
 * writes many at once and an idle one waits for nothing.
 */
export class Settler {
  readonly #services: Services;
  readonly #worker: string;
  readonly #senders: ReadonlyMap<Channel, Sender>;
  #gathered: Waiting[] = [];
  #writing = false;

  constructor(services: Services, worker: string, senders: ReadonlyMap<Channel, Sender>) {
    this.#services = services;
    this.#worker = worker;
    this.#senders = senders;
  }

  /** Resolves when the result is in the database. */
  add(settled: Settled): Promise<void> {
    return new Promise((written) => {
      this.#gathered.push({ ...settled, written });
      if (!this.#writing) void this.#write();
    });
  }

  async #write(): Promise<void> {
    this.#writing = true;
    while (this.#gathered.length > 0) {
      const batch = this.#gathered.splice(0, 200);
      try {
        await inTransaction(this.#services.sequelize, (transaction) => this.#settle(batch, transaction), this.#services.random);
        for (const { written } of batch) written();
      } catch (error) {
        // The claim's lease is renewed meanwhile; should it lapse, the message is sent again under the same key.
        this.#services.log.error({ err: error, deliveries: batch.length }, 'results of deliveries could not be written; trying again');
        this.#gathered.unshift(...batch);
        await new Promise((resolve) => setTimeout(resolve, againMs));
      }
    }
    this.#writing = false;
  }

  async #settle(batch: Settled[], transaction: Transaction): Promise<void> {
    const { sequelize, clock } = this.#services;
    const now = clock.now();
    const mine = `claimed_by = :worker AND state = 'claimed'`;
    const released = 'claimed_by = NULL, lease_until = NULL, updated_at = :now';
    const accepted = batch.filter(({ outcome }) => outcome.kind === 'accepted');
    if (accepted.length > 0) {
      await execute(
        sequelize,
        `UPDATE deliveries SET state = 'delivered', accepted_at = :now, next_attempt_at = NULL, last_error = NULL, ${blanked}, ${released} WHERE id IN (:ids) AND ${mine}`,
        { now, worker: this.#worker, ids: accepted.map(({ delivery }) => delivery.id) },
        transaction,
      );
    }
    for (const { delivery, outcome } of batch) {
      if (outcome.kind === 'accepted') continue;
      const next = this.#next({ delivery, outcome }, now);
      await execute(
        sequelize,
        `UPDATE deliveries SET state = :state, next_attempt_at = :next, last_error = :detail, ${next ? '' : `${blanked},`} ${released} WHERE id = :id AND ${mine}`,
        { now, worker: this.#worker, id: delivery.id, state: next ? 'waiting' : 'dead', next, detail: clipped(outcome.detail) },
        transaction,
      );
      this.#services.log[next ? 'warn' : 'error']({ deliveryId: delivery.id, noticeId: delivery.noticeId, channel: delivery.channel, attempt: delivery.attempts, status: outcome.status, detail: outcome.detail, next }, next ? 'delivery to be tried again' : 'delivery given up');
    }
    for (const group of byAnswer(batch)) {
      const { outcome } = group[0]!;
      await execute(
        sequelize,
        `UPDATE delivery_attempts SET ended_at = :now, outcome = :outcome, status = :status, detail = :detail WHERE delivery_id IN (:ids) AND outcome = 'started'`,
        { now, outcome: outcome.kind, status: outcome.status, detail: outcome.detail === null ? null : clipped(outcome.detail), ids: group.map(({ delivery }) => delivery.id) },
        transaction,
      );
    }
    for (const [channel, sender] of this.#senders) {
      const own = batch.filter(({ delivery }) => delivery.channel === channel);
      if (own.length > 0) await sender.settle(transaction, own);
    }
  }

  /** When to try again; null when no more. Never after the message is of use: then it is looked at once more, and dropped. */
  #next({ delivery, outcome }: Settled, now: Date): Date | null {
    if (outcome.kind !== 'retry') return null;
    const pause = pauseMs(delivery.channel, delivery.attempts, this.#services.random(), outcome.retryAfterSeconds);
    if (pause === null) return null;
    return new Date(Math.min(now.getTime() + pause, Math.max(delivery.usefulUntil.getTime(), now.getTime())));
  }
}

/** Groups of results with the same answer, so that each is one statement. */
function byAnswer(batch: Settled[]): Settled[][] {
  const groups = new Map<string, Settled[]>();
  for (const settled of batch) {
    const key = JSON.stringify([settled.outcome.kind, settled.outcome.status, settled.outcome.detail]);
    const group = groups.get(key);
    if (group) group.push(settled);
    else groups.set(key, [settled]);
  }
  return [...groups.values()];
}
