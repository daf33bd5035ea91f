import { randomBytes } from 'node:crypto';
import type { Sequelize } from 'sequelize';
import { inject } from 'vitest';
import { createDatabase, execute } from '../../server/database/connection.ts';
import { migrateUp } from '../../server/database/migrate.ts';

export interface TestDatabase {
  sequelize: Sequelize;
  url: string;
  /** Closes the connections and removes the database. */
  drop(): Promise<void>;
}

/** An empty, migrated database for one test file. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const adminUrl = inject('databaseAdminUrl');
  const name = `test_${randomBytes(6).toString('hex')}`;
  const admin = createDatabase(adminUrl, { poolMax: 1 });
  await execute(admin, `CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
  const url = adminUrl.replace(/\/[^/]*$/, `/${name}`);
  const sequelize = createDatabase(url);
  await migrateUp(sequelize);
  return {
    sequelize,
    url,
    async drop() {
      await sequelize.close();
      await execute(admin, `DROP DATABASE \`${name}\``);
      await admin.close();
    },
  };
}
