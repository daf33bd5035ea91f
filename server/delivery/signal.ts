import type { Sequelize } from 'sequelize';

/** Tells the worker of the same process that something was put into the outbox; a worker elsewhere finds it by looking. */
export class OutboxSignal {
  readonly #listeners = new Set<() => void>();

  notify(): void {
    for (const listener of this.#listeners) listener();
  }

  /** @returns a function that ends the subscription */
  subscribe(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }
}

const signals = new WeakMap<Sequelize, OutboxSignal>();

/** The signal of one database connection. */
export function outboxSignal(sequelize: Sequelize): OutboxSignal {
  const known = signals.get(sequelize);
  if (known) return known;
  const made = new OutboxSignal();
  signals.set(sequelize, made);
  return made;
}
