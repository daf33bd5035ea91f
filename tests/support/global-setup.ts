import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { startMariaDb } from '../../server/database/mariadb-process.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the throw-away MariaDB of this run, as a user who may make databases. */
    databaseAdminUrl: string;
  }
}

/** One throw-away MariaDB for the whole run, in a folder and on a port of its own. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const folder = mkdtempSync(join(tmpdir(), 'dawnvane-test-'));
  const database = await startMariaDb({ folder, throwAway: true });
  project.provide('databaseAdminUrl', database.url);
  return async () => {
    await database.stop();
    rmSync(folder, { recursive: true, force: true });
  };
}
