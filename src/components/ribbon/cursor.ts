/** The time cursor of one ribbon, outside React: a move shifts one group of the drawing and the words that read it, nothing else. */
export interface Cursor {
  /** Step at which it stands. */
  read(): number;
  move(index: number): void;
  subscribe(moved: () => void): () => void;
}

export function createCursor(start: number): Cursor {
  let index = start;
  const listeners = new Set<() => void>();
  return {
    read: () => index,
    move(next) {
      if (next === index) return;
      index = next;
      listeners.forEach((moved) => moved());
    },
    subscribe(moved) {
      listeners.add(moved);
      return () => listeners.delete(moved);
    },
  };
}
