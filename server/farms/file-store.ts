import { createHash, randomUUID } from 'node:crypto';
import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';

/** The one door to uploaded files. A folder here; an object store can stand behind the same door. */
export interface FileStore {
  /** Keeps bytes under a new key. */
  put(bytes: Buffer): Promise<{ key: string; sha256: string }>;
  /** The bytes of a key; null when the store has lost them. */
  get(key: string): Promise<Buffer | null>;
  remove(key: string): Promise<void>;
}

const keyPattern = /^[0-9a-f-]{36}$/;

/** Files in a folder, each under a random name: nothing that a person typed becomes a path. */
export function folderStore(folder: string): FileStore {
  const pathOf = (key: string): string => {
    if (!keyPattern.test(key)) throw new RangeError('not a key of this store');
    return join(folder, key);
  };
  return {
    async put(bytes) {
      const key = randomUUID();
      await mkdir(folder, { recursive: true, mode: 0o700 });
      await writeFile(pathOf(key), bytes, { mode: 0o600, flag: 'wx' });
      return { key, sha256: createHash('sha256').update(bytes).digest('hex') };
    },
    async get(key) {
      try {
        return await readFile(pathOf(key));
      } catch (error) {
        if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
        throw error;
      }
    },
    remove: (key) => rm(pathOf(key), { force: true }),
  };
}
