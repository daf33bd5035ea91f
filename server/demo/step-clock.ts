import type { SettableClock } from '../clock/clock.ts';
import type { DeliveryWorker } from '../delivery/worker.ts';
import type { Scheduler } from '../schedule/scheduler.ts';

/** Moments looked at on the way; ten days of one farm need some 270. */
const stopsMax = 2000;

/**
 * Steps the demo clock forward, halting at each moment on the way at which something falls due, so that all happens in its order and
 * at its time, as if the hours had gone by.
 */
export async function stepClock(clock: SettableClock, scheduler: Scheduler, worker: DeliveryWorker, to: Date): Promise<void> {
  const settle = async () => {
    await scheduler.tick();
    await worker.drain();
  };
  await settle();
  for (let stops = 0; stops < stopsMax; stops += 1) {
    const next = await scheduler.nextDueAt();
    if (!next || next > to) break;
    if (next > clock.now()) clock.set(next);
    await settle();
  }
  if (to > clock.now()) clock.set(to);
  await settle();
}
