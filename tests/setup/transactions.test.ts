import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { execute, inTransaction, select } from '../../server/database/connection.ts';
import { createTestDatabase, type TestDatabase } from '../support/database.ts';

let database: TestDatabase;
beforeAll(async () => {
  database = await createTestDatabase();
  await execute(database.sequelize, 'CREATE TABLE counters (id INT PRIMARY KEY, value INT NOT NULL) ENGINE=InnoDB');
});
afterAll(() => database.drop());

describe('a transaction', () => {
  it('that the database ends for a deadlock is repeated until both have counted', async () => {
    const { sequelize } = database;
    await execute(sequelize, 'INSERT INTO counters (id, value) VALUES (1, 0), (2, 0)');
    let begun = 0;
    let open: () => void = () => {};
    const bothHold = new Promise<void>((resolve) => (open = resolve));
    const count = (first: number, second: number) => {
      let tries = 0;
      return inTransaction(sequelize, async (transaction) => {
        tries += 1;
        await execute(sequelize, 'UPDATE counters SET value = value + 1 WHERE id = :first', { first }, transaction);
        begun += 1;
        if (begun === 2) open();
        if (tries === 1) await bothHold;
        await execute(sequelize, 'UPDATE counters SET value = value + 1 WHERE id = :second', { second }, transaction);
        return tries;
      });
    };
    const tries = await Promise.all([count(1, 2), count(2, 1)]);
    expect(tries.sort()).toEqual([1, 2]);
    expect(await select(sequelize, 'SELECT value FROM counters ORDER BY id')).toEqual([{ value: 2 }, { value: 2 }]);
  });

  it('that fails for another reason is not repeated and leaves nothing', async () => {
    let tries = 0;
    const failing = inTransaction(database.sequelize, async (transaction) => {
      tries += 1;
      await execute(database.sequelize, 'INSERT INTO counters (id, value) VALUES (3, 1)', {}, transaction);
      throw new Error('no');
    });
    await expect(failing).rejects.toThrow('no');
    expect(tries).toBe(1);
    expect(await select(database.sequelize, 'SELECT id FROM counters WHERE id = 3')).toEqual([]);
  });

  it('that the database keeps ending is given up after six tries', async () => {
    let tries = 0;
    const failing = inTransaction(
      database.sequelize,
      async (transaction) => {
        tries += 1;
        await execute(database.sequelize, "SIGNAL SQLSTATE '40001' SET MYSQL_ERRNO = 1213, MESSAGE_TEXT = 'again'", {}, transaction);
      },
      () => 0,
    );
    await expect(failing).rejects.toThrow(/again/);
    expect(tries).toBe(6);
  });
});

describe('a connection', () => {
  it('is in UTC, refuses bad values, and reads only what was committed', async () => {
    const [row] = await select<Record<string, string>>(database.sequelize, 'SELECT @@session.time_zone AS zone, @@session.sql_mode AS mode, @@session.tx_isolation AS isolation, @@character_set_connection AS charset');
    expect(row).toMatchObject({ zone: '+00:00', isolation: 'READ-COMMITTED', charset: 'utf8mb4' });
    expect(row!['mode']).toMatch(/STRICT_ALL_TABLES/);
  });

  it('answers how many rows a statement touched', async () => {
    await execute(database.sequelize, 'INSERT INTO counters (id, value) VALUES (11, 1), (12, 1)');
    expect(await execute(database.sequelize, 'UPDATE counters SET value = 5 WHERE id IN (11, 12)')).toBe(2);
    expect(await execute(database.sequelize, 'DELETE FROM counters WHERE id = 11')).toBe(1);
  });

});
