/** One run of a background loop, from start to stop: pauses that can be cut short. */
export class Run {
  #stopped = false;
  readonly #sleepers = new Set<() => void>();

  get stopped(): boolean {
    return this.#stopped;
  }

  /** Ends every pause under way. */
  wake(): void {
    for (const sleeper of [...this.#sleepers]) sleeper();
  }

  stop(): void {
    this.#stopped = true;
    this.wake();
  }

  /** Waits, unless the run is stopped or woken first. */
  sleep(ms: number): Promise<void> {
    if (this.#stopped) return Promise.resolve();
    return new Promise((resolve) => {
      const done = () => {
        clearTimeout(timer);
        this.#sleepers.delete(done);
        resolve();
      };
      const timer = setTimeout(done, ms);
      this.#sleepers.add(done);
    });
  }
}
