import type { Clock } from '../clock/clock.ts';

export interface WorkerOptions {
  /** Names this worker in the claims it makes; unique among all workers of the database. */
  name?: string;
  /** Deliveries under way at one time, and the most claimed at once. */
  batch?: number;
  /** How long a claim holds without renewal. */
  leaseMs?: number;
  /** Pause before looking again when nothing was due. */
  pollMs?: number;
  /** Clock of the leases; the database's own when left out, so that machines whose clocks differ agree. */
  leaseClock?: Clock;
}

export interface WorkerStatus {
  /** `stuck`: it should run but has not looked at the outbox for a minute. */
  state: 'ok' | 'stopped' | 'stuck';
  lastRunAt: Date | null;
  /** Deliveries due now and not yet taken; null when the database does not tell. */
  waiting: number | null;
}

/** Takes deliveries from the outbox and hands them to their channels. Any number may run on one database. */
export interface DeliveryWorker {
  start(): void;
  /** Ends after the deliveries under way. */
  stop(): Promise<void>;
  /** Works until nothing is due at the clock's present instant. */
  drain(): Promise<void>;
  status(): Promise<WorkerStatus>;
}
