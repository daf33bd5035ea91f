/** The one door to time on the server; injected everywhere, so that tests and the demo can set it. */
export interface Clock {
  /** The present instant. */
  now(): Date;
}

/** The machine's own clock. */
export const systemClock: Clock = { now: () => new Date() };

/** A clock that a visitor or a test can set; it runs on at the machine's pace unless it is stopped. */
export class SettableClock implements Clock {
  #offsetMs: number;
  #stoppedAt: Date | null = null;
  readonly #base: Clock;

  /** @param startAt the instant it shows at first @param base the clock that gives it its pace */
  constructor(startAt: Date, base: Clock = systemClock) {
    this.#base = base;
    this.#offsetMs = startAt.getTime() - base.now().getTime();
  }

  now(): Date {
    return this.#stoppedAt ? new Date(this.#stoppedAt) : new Date(this.#base.now().getTime() + this.#offsetMs);
  }

  /** Sets the instant shown; a running clock runs on from it. */
  set(instant: Date): void {
    if (this.#stoppedAt) this.#stoppedAt = new Date(instant);
    else this.#offsetMs = instant.getTime() - this.#base.now().getTime();
  }

  /** Stops the clock at an instant: it then moves only by `set`. */
  stop(at: Date = this.now()): void {
    this.#stoppedAt = new Date(at);
  }
}
