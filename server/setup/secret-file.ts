import { randomBytes } from 'node:crypto';
import { chmodSync, existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';

/** Writes a file that only this user reads, whole or not at all. */
export function writePrivately(path: string, content: string): void {
  const fresh = `${path}.new`;
  rmSync(fresh, { force: true });
  try {
    writeFileSync(fresh, content, { mode: 0o600, flag: 'wx', flush: true });
    renameSync(fresh, path);
  } catch (error) {
    rmSync(fresh, { force: true });
    throw error;
  }
}

/**
 * A secret that is made once and kept in a file of mode 0600.
 * @returns the secret as base64url text of `byteCount` random bytes
 */
export function keptSecret(path: string, byteCount: number): string {
  const kept = existsSync(path) ? readFileSync(path, 'utf8').trim() : '';
  if (kept === '') writePrivately(path, randomBytes(byteCount).toString('base64url'));
  else chmodSync(path, 0o600);
  return kept || readFileSync(path, 'utf8').trim();
}
