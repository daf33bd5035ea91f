import type { DemoParts } from './demo/parts.ts';
import type { PushKeys } from './delivery/push/keys.ts';
import type { Scheduler } from './schedule/scheduler.ts';
import type { DeliveryWorker } from './delivery/worker.ts';
import type { Assessor } from './verdicts/assessor.ts';

/** The running parts that routes reach: each made in server/index.ts, each replaceable in tests. */
export interface Parts {
  assessor: Assessor;
  pushKeys: PushKeys;
  worker: DeliveryWorker;
  scheduler: Scheduler;
  /** Present only while the fakes of the demo run. */
  demo: DemoParts | null;
}
