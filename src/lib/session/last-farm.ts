import type { Me } from '../../../shared/api/accounts.ts';

const storageKey = 'dawnvane.lastFarm';

/** The farm last looked at in this browser; storage may be shut off. */
function readLastFarm(): string | null {
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

/** The farm last looked at, if one still belongs to it; else the first. */
export function lastFarmOf({ farms }: Me): Me['farms'][number] | undefined {
  const last = readLastFarm();
  return farms.find(({ id }) => id === last) ?? farms[0];
}
