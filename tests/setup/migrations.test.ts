import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { select } from '../../server/database/connection.ts';
import { migrateDown, migrateUp } from '../../server/database/migrate.ts';
import { createTestDatabase, type TestDatabase } from '../support/database.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await createTestDatabase();
});
afterAll(() => database.drop());

/** Every table but the list of steps, as the database itself writes it down. */
async function schema(): Promise<Record<string, string>> {
  const tables = await select<{ name: string }>(database.sequelize, 'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() ORDER BY table_name');
  const written: Record<string, string> = {};
  for (const { name } of tables) {
    if (name === 'schema_steps') continue;
    const [row] = await select<Record<string, string>>(database.sequelize, `SHOW CREATE TABLE \`${name}\``);
    written[name] = row!['Create Table']!;
  }
  return written;
}

describe('the schema', () => {
  it('goes all the way down, leaving nothing, and up again to the same', async () => {
    const before = await schema();
    expect(Object.keys(before)).toContain('deliveries');
    await migrateDown(database.sequelize);
    expect(await schema()).toEqual({});
    await migrateUp(database.sequelize);
    expect(await schema()).toEqual(before);
  });

  it('keeps every table in utf8mb4', async () => {
    for (const [table, written] of Object.entries(await schema())) expect(written, table).toMatch(/CHARSET=utf8mb4/);
  });
});
