import type { Channel } from '../../shared/api/notices.ts';
import type { Services } from '../services.ts';
import { claim, type LeaseTime } from './claims.ts';
import { clipped, type ClaimedDelivery, type Outcome, type Sender } from './sender.ts';
import type { Settler } from './settler.ts';

/** The road of one channel: so many deliveries under way at once, so that a slow channel holds up no other. */
export class Lane {
  readonly #services: Services;
  readonly #sender: Sender;
  readonly #settler: Settler;
  readonly #settings: { worker: string; batch: number; leaseMs: number; lease: LeaseTime };
  readonly #underWay = new Map<string, Promise<void>>();
  #claiming: Promise<unknown> = Promise.resolve();

  constructor(services: Services, sender: Sender, settler: Settler, settings: { worker: string; batch: number; leaseMs: number; lease: LeaseTime }) {
    this.#services = services;
    this.#sender = sender;
    this.#settler = settler;
    this.#settings = settings;
  }

  get channel(): Channel {
    return this.#sender.channel;
  }

  get busy(): string[] {
    return [...this.#underWay.keys()];
  }

  /** Claims what fits and begins to send it. @returns how many rows were taken from the queue */
  pass(): Promise<number> {
    const turn = this.#claiming.then(() => this.#pass());
    this.#claiming = turn.catch(() => undefined);
    return turn;
  }

  async #pass(): Promise<number> {
    const { worker, batch, leaseMs, lease } = this.#settings;
    const room = batch - this.#underWay.size;
    if (room <= 0) return 0;
    const { taken, deliveries } = await claim(this.#services, worker, this.#sender.channel, room, leaseMs, lease, this.busy);
    if (deliveries.length === 0) return taken;
    const attempt = await this.#prepared(deliveries);
    for (const delivery of deliveries) {
      const work = this.#send(delivery, attempt).finally(() => this.#underWay.delete(delivery.id));
      this.#underWay.set(delivery.id, work);
    }
    return taken;
  }

  async #prepared(deliveries: ClaimedDelivery[]): Promise<(delivery: ClaimedDelivery) => Promise<Outcome>> {
    try {
      return await this.#sender.prepare(deliveries);
    } catch (error) {
      this.#services.log.error({ err: error, channel: this.#sender.channel }, 'deliveries could not be prepared');
      return async () => ({ kind: 'retry', status: null, detail: 'What the delivery needs could not be read.', retryAfterSeconds: null });
    }
  }

  async #send(delivery: ClaimedDelivery, attempt: (delivery: ClaimedDelivery) => Promise<Outcome>): Promise<void> {
    const outcome = await inTime(attempt(delivery)).catch((error: unknown): Outcome => {
      this.#services.log.error({ err: error, deliveryId: delivery.id }, 'a channel failed in a way it does not know');
      return { kind: 'retry', status: null, detail: clipped(error instanceof Error ? error.message : 'Unknown failure.'), retryAfterSeconds: null };
    });
    if (outcome.kind === 'accepted') this.#services.log.info({ deliveryId: delivery.id, noticeId: delivery.noticeId, channel: delivery.channel, attempt: delivery.attempts, status: outcome.status }, 'delivered');
    await this.#settler.add({ delivery, outcome });
  }

  /** Resolves when one of the deliveries under way is done; at once when there is none. */
  async oneDone(): Promise<void> {
    if (this.#underWay.size > 0) await Promise.race(this.#underWay.values());
  }

  async allDone(): Promise<void> {
    await this.#claiming;
    await Promise.all(this.#underWay.values());
  }
}

/** Longer than every channel's own time-outs: a call that hangs for ever must not keep its claim for ever. */
const hangMs = 120_000;

async function inTime(attempt: Promise<Outcome>): Promise<Outcome> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const hung = new Promise<Outcome>((resolve) => {
    timer = setTimeout(() => resolve({ kind: 'retry', status: null, detail: 'The call hung and was given up.', retryAfterSeconds: null }), hangMs);
  });
  try {
    return await Promise.race([attempt, hung]);
  } finally {
    clearTimeout(timer);
  }
}
