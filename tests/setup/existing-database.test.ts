import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, inject, it } from 'vitest';
import { createDatabase, execute, select } from '../../server/database/connection.ts';
import { freePort } from '../../server/database/mariadb-process.ts';
import { databasePids, production, startDawnvane, temporaryFolder } from '../support/start-dawnvane.ts';

const minutesMs = 180_000;
const folder = temporaryFolder();
const data = join(folder.path, 'data');
const admin = createDatabase(inject('databaseAdminUrl'), { poolMax: 1 });
const name = `existing_${randomBytes(4).toString('hex')}`;
const url = new URL(inject('databaseAdminUrl').replace(/[^/]*$/, name));

beforeAll(async () => {
  await execute(admin, `CREATE DATABASE ${name}`);
});
afterAll(async () => {
  await execute(admin, `DROP DATABASE ${name}`);
  await admin.close();
  folder.remove();
});

const withChange = (change: (copy: URL) => void): string => {
  const copy = new URL(url);
  change(copy);
  return copy.href;
};

describe('DATABASE_URL', { timeout: minutesMs }, () => {
  it('makes the start command use that database and start none of its own', async () => {
    const dawnvane = await startDawnvane({ ...production, DAWNVANE_DATA: data, DATABASE_URL: url.href });
    expect(dawnvane.address, dawnvane.output()).not.toBeNull();
    expect(databasePids(data)).toEqual([]);
    const tables = await select<{ name: string }>(admin, 'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = :name', { name });
    expect(tables.map((table) => table.name)).toContain('users');
    expect(await dawnvane.stop()).toBe(0);
  });

  it.each([
    ['a wrong password', withChange((copy) => (copy.password = 'not-the-password')), /refuses the user or the password.*DATABASE_URL/],
    ['a database that is not there', withChange((copy) => (copy.pathname = '/nowhere_at_all')), /has no such database: create it, or correct DATABASE_URL/],
  ])('with %s gives one sentence without the password', async (_what, wrong, sentence) => {
    const dawnvane = await startDawnvane({ ...production, DAWNVANE_DATA: data, DATABASE_URL: wrong });
    expect(await dawnvane.ended).toBe(1);
    expect(dawnvane.output().trim()).toMatch(sentence);
    expect(dawnvane.output().trim().split('\n')).toHaveLength(1);
    expect(dawnvane.output()).not.toContain(new URL(wrong).password);
  });

  it('where nothing answers gives one sentence', async () => {
    const port = await freePort();
    const dawnvane = await startDawnvane({ ...production, DAWNVANE_DATA: data, DATABASE_URL: withChange((copy) => (copy.port = String(port))) });
    expect(await dawnvane.ended).toBe(1);
    expect(dawnvane.output().trim()).toBe(`No database answers at 127.0.0.1:${port}/${name}: start it, or correct DATABASE_URL.`);
  });

  it('of a newer version is refused', async () => {
    const newer = createDatabase(url.href, { poolMax: 1 });
    await execute(newer, "INSERT INTO schema_steps (name) VALUES ('9999-from-the-future.ts')");
    const dawnvane = await startDawnvane({ ...production, DAWNVANE_DATA: data, DATABASE_URL: url.href });
    expect(await dawnvane.ended).toBe(1);
    expect(dawnvane.output()).toMatch(/written by a newer version of Dawnvane \(step 9999-from-the-future\.ts\)/);
    await newer.close();
  });
});
