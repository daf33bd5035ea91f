import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';

/** What a fake far end has received, newest first: bounded, and in a file so that a restart of the demo keeps it. */
export class KeptLog<Item> {
  readonly #file: string | null;
  readonly #max: number;
  #items: Item[] = [];

  /** @param file null: in memory only */
  constructor(file: string | null, max = 200) {
    this.#file = file;
    this.#max = max;
    if (file && existsSync(file)) this.#items = readItems<Item>(file);
  }

  get items(): Item[] {
    return [...this.#items];
  }

  add(item: Item): void {
    this.#items = [item, ...this.#items].slice(0, this.#max);
    this.#write();
  }

  clear(): void {
    this.#items = [];
    this.#write();
  }

  #write(): void {
    if (!this.#file) return;
    // Written beside and moved, so that a kill leaves the old file or the new one.
    writeFileSync(`${this.#file}.new`, JSON.stringify(this.#items), { mode: 0o600 });
    renameSync(`${this.#file}.new`, this.#file);
  }
}

function readItems<Item>(file: string): Item[] {
  try {
    const read: unknown = JSON.parse(readFileSync(file, 'utf8'));
    return Array.isArray(read) ? (read as Item[]) : [];
  } catch {
    // A log of a fake is not worth a start that fails.
    return [];
  }
}
