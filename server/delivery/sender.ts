import type { Transaction } from 'sequelize';
import type { Channel } from '../../shared/api/notices.ts';

/** A delivery as the worker hands it to its channel. */
export interface ClaimedDelivery {
  id: string;
  noticeId: string | null;
  farmId: string | null;
  channel: Channel;
  target: string;
  deliveryKey: string;
  payload: unknown;
  /** Counts this try too: 1 at the first. */
  attempts: number;
  dueAt: Date;
  usefulUntil: Date;
  createdAt: Date;
}

/** What came of one try. `detail` is for a person: clipped, without secrets. */
export type Outcome =
  /** The far end took it. */
  | { kind: 'accepted'; status: number | null; detail: string | null }
  /** May succeed later; not before `retryAfterSeconds` when the far end said so. */
  | { kind: 'retry'; status: number | null; detail: string; retryAfterSeconds: number | null }
  /** The recipient is there no more: nothing will succeed. */
  | { kind: 'gone'; status: number | null; detail: string }
  /** This message is not taken, now or later. */
  | { kind: 'refused'; status: number | null; detail: string };

export interface Settled {
  delivery: ClaimedDelivery;
  outcome: Outcome;
}

/** One channel. It knows how to reach a far end; it knows nothing of weather, queues or leases. */
export interface Sender {
  channel: Channel;
  /** Loads what a batch needs in one go and gives the function that tries one delivery. The function never throws. */
  prepare(deliveries: ClaimedDelivery[]): Promise<(delivery: ClaimedDelivery) => Promise<Outcome>>;
  /** The channel's own book-keeping (a device gone, a webhook failing), in the transaction that marks the deliveries. */
  settle(transaction: Transaction, settled: Settled[]): Promise<void>;
  stop(): Promise<void>;
}

/** The length a detail may have in the log. */
export const detailMax = 500;
export const clipped = (text: string, max = detailMax): string => (text.length <= max ? text : `${text.slice(0, max - 1)}…`);

/** Reads `Retry-After` (RFC 9110 §10.2.3): seconds or a date. Null when absent or not understood. */
export function retryAfterSeconds(header: string | null | undefined, now: Date): number | null {
  if (!header) return null;
  const text = header.trim();
  if (/^\d+$/.test(text)) return Number(text);
  const at = Date.parse(text);
  return Number.isNaN(at) ? null : Math.max(0, Math.ceil((at - now.getTime()) / 1000));
}
