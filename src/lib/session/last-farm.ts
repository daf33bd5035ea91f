const storageKey = 'dawnvane.lastFarm';

/** The farm last looked at in this browser; storage may be shut off. */
export function readLastFarm(): string | null {
  try {
    return localStorage.getItem(storageKey);
  } catch {
    return null;
  }
}

export function rememberFarm(farmId: string): void {
  try {
    localStorage.setItem(storageKey, farmId);
  } catch {
    // Without storage the first farm is taken.
  }
}
