import { randomUUID } from 'node:crypto';
import { hostname } from 'node:os';
import type { Clock } from '../clock/clock.ts';
import { select } from '../database/connection.ts';
import type { Services } from '../services.ts';
import { anythingDue, leaseTime, renew, takeBack } from './claims.ts';
import { Lane } from './lane.ts';
import type { Sender } from './sender.ts';
import { Settler } from './settler.ts';
import { Run } from './run.ts';
import { outboxSignal } from './signal.ts';

export interface WorkerOptions {
  /** Names this worker in its claims; unique among all workers of the database. */
  name?: string;
  /** Deliveries of one channel under way at one time, and the most claimed at once. */
  batch?: number;
  /** How long a claim holds without renewal. */
  leaseMs?: number;
  /** Pause before looking again when nothing was due and nothing was announced. */
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

const stuckAfterMs = 60_000;
/** So often `drain` looks again at rows that others have locked. */
const lockedLooksMax = 100;

/** Makes a worker over the channels given; a channel without a sender stays in the outbox for another worker. */
export function createDeliveryWorker(services: Services, senders: Sender[], options: WorkerOptions = {}): DeliveryWorker {
  const { clock, log, random, sequelize } = services;
  const { name = `${hostname().slice(0, 30)}:${randomUUID()}`, batch = 50, leaseMs = 60_000, pollMs = 500 } = options;
  const lease = leaseTime(options.leaseClock);
  const settler = new Settler(services, name, new Map(senders.map((sender) => [sender.channel, sender])));
  const lanes = senders.map((sender) => new Lane(services, sender, settler, { worker: name, batch, leaseMs, lease }));
  const busy = () => lanes.flatMap((lane) => lane.busy);
  let running: { run: Run; loops: Promise<unknown>; unsubscribe: () => void; renewal: ReturnType<typeof setInterval> } | null = null;
  let lastRunAt: Date | null = null;
  let lastRunMs = 0;

  async function pass(lane: Lane): Promise<number> {
    const taken = await lane.pass();
    lastRunAt = clock.now();
    lastRunMs = performance.now();
    return taken;
  }

  /** Leases lapse within seconds of each other: looking for lapsed ones on every pass of one lane is enough. */
  async function runLane(lane: Lane, first: boolean, run: Run): Promise<void> {
    while (!run.stopped) {
      try {
        if (first) await takeBack(services, lease, busy());
        const taken = await pass(lane);
        if (taken === 0) await run.sleep(pollMs * (0.75 + random() / 2));
        else if (lane.busy.length >= batch) await lane.oneDone();
      } catch (error) {
        log.error({ err: error }, 'the outbox could not be read; trying again');
        await run.sleep(Math.max(pollMs, 1000));
      }
    }
  }

  function start(): void {
    if (running) return;
    const run = new Run();
    lastRunMs = performance.now();
    running = {
      run,
      loops: Promise.all(lanes.map((lane, index) => runLane(lane, index === 0, run))),
      renewal: setInterval(() => void renew(services, name, busy(), leaseMs, lease).catch((error: unknown) => log.error({ err: error }, 'leases could not be renewed')), leaseMs / 3),
      unsubscribe: outboxSignal(sequelize).subscribe(() => run.wake()),
    };
  }

  async function stop(): Promise<void> {
    const ended = running;
    running = null;
    if (ended) {
      ended.unsubscribe();
      ended.run.stop();
      await ended.loops;
      await Promise.all(lanes.map((lane) => lane.allDone()));
      clearInterval(ended.renewal);
    }
    await Promise.all(senders.map((sender) => sender.stop()));
  }

  async function drainLane(lane: Lane): Promise<boolean> {
    let any = false;
    for (let locked = 0; locked < lockedLooksMax; ) {
      const taken = await pass(lane);
      any ||= taken > 0 || lane.busy.length > 0;
      if (taken > 0) locked = 0;
      if (lane.busy.length > 0 && (taken === 0 || lane.busy.length >= batch)) await lane.oneDone();
      else if (taken === 0) {
        if (!(await anythingDue(services, lane.channel))) return any;
        // Someone has a lock on it for the moment.
        locked += 1;
        await new Promise((resolve) => setTimeout(resolve, 20));
      }
    }
    return any;
  }

  async function drain(): Promise<void> {
    await takeBack(services, lease, busy());
    while ((await Promise.all(lanes.map(drainLane))).some(Boolean));
  }

  async function status(): Promise<WorkerStatus> {
    const [row] = await select<{ waiting: number }>(sequelize, `SELECT COUNT(*) AS waiting FROM deliveries WHERE state = 'waiting' AND next_attempt_at <= :now`, { now: clock.now() }).catch(() => []);
    const state = !running ? 'stopped' : performance.now() - lastRunMs > stuckAfterMs ? 'stuck' : 'ok';
    return { state, lastRunAt, waiting: row ? Number(row.waiting) : null };
  }

  return { start, stop, drain, status };
}
