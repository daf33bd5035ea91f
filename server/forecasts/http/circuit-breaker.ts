import type { Clock } from '../../clock/clock.ts';

export interface BreakerSettings {
  /** Failed questions in a row that open it. */
  failures: number;
  /** First rest; doubled after each failed probe, up to `longestRestMs`. */
  restMs: number;
  longestRestMs: number;
}

/**
 * Spares a provider that is down, and us the waiting: closed → open after some failures in a row → after a rest one
 * single probe (half-open) → closed again, or a longer rest. Own code because the known packages read the wall clock.
 */
export class CircuitBreaker {
  readonly #clock: Clock;
  readonly #settings: BreakerSettings;
  #failures = 0;
  #rests = 0;
  #openedAtMs = 0;
  #openUntilMs = 0;
  #probing = false;

  constructor(clock: Clock, settings: BreakerSettings) {
    this.#clock = clock;
    this.#settings = settings;
  }

  /** Milliseconds until a question is let through; 0 when it is now. Letting one through in the half-open state takes the probe's place. */
  enter(): number {
    const now = this.#clock.now().getTime();
    if (this.#openUntilMs === 0) return 0;
    // A clock set back before the opening (a demo, a repair) must not keep the provider shut for long.
    if (now >= this.#openedAtMs && now < this.#openUntilMs) return this.#openUntilMs - now;
    if (this.#probing) return this.#settings.restMs;
    this.#probing = true;
    return 0;
  }

  /** The question was answered. */
  succeeded(): void {
    this.#failures = 0;
    this.#rests = 0;
    this.#openUntilMs = 0;
    this.#probing = false;
  }

  /** The question failed for good. @param restMs a wait that the provider itself asked for */
  failed(restMs: number | null = null): void {
    const probe = this.#probing;
    this.#probing = false;
    this.#failures += 1;
    if (!probe && this.#failures < this.#settings.failures && restMs === null) return;
    const own = Math.min(this.#settings.longestRestMs, this.#settings.restMs * 2 ** this.#rests);
    this.#rests += 1;
    this.#openedAtMs = this.#clock.now().getTime();
    this.#openUntilMs = this.#openedAtMs + Math.min(this.#settings.longestRestMs, restMs ?? own);
  }

  /** The asker went away before an answer: neither success nor failure. */
  abandoned(): void {
    this.#probing = false;
  }
}
