import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createDatabase, select } from '../../server/database/connection.ts';
import { migrateDown, migrateUp, migrationNames } from '../../server/database/migrate.ts';
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

  it('goes back to a named step and up again', async () => {
    const before = await schema();
    const last = migrationNames().at(-1)!;
    expect(await migrateDown(database.sequelize, last)).toEqual([last]);
    expect(await schema()).not.toEqual(before);
    expect(await migrateUp(database.sequelize)).toEqual([last]);
    expect(await schema()).toEqual(before);
  });

  it('is brought up by one process when several start at once', async () => {
    await migrateDown(database.sequelize);
    const others = [createDatabase(database.url), createDatabase(database.url), createDatabase(database.url)];
    const taken = await Promise.all(others.map(migrateUp));
    expect(taken.flat()).toEqual(migrationNames());
    expect(taken.filter((steps) => steps.length > 0)).toHaveLength(1);
    await Promise.all(others.map((other) => other.close()));
  });

  it('keeps every table in utf8mb4', async () => {
    for (const [table, written] of Object.entries(await schema())) expect(written, table).toMatch(/CHARSET=utf8mb4/);
  });
});
