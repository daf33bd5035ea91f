import { existsSync, readFileSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { createDatabase, execute, select } from '../../server/database/connection.ts';
import { databasePids, launchDawnvane, startDawnvane, temporaryFolder, type StartedDawnvane } from '../support/start-dawnvane.ts';

const minutesMs = 180_000;
const folder = temporaryFolder();
const data = join(folder.path, 'data');
const started: { signal(name: NodeJS.Signals): void; ended: Promise<unknown> }[] = [];

async function start(): Promise<StartedDawnvane> {
  const dawnvane = await startDawnvane({ DAWNVANE_DATA: data });
  started.push(dawnvane);
  expect(dawnvane.address, dawnvane.output()).not.toBeNull();
  return dawnvane;
}

/** The database's address, as a person with the password file would work it out. */
function databaseUrl(): string {
  const [pid] = databasePids(data);
  const port = /--port=(\d+)/.exec(readFileSync(`/proc/${pid}/cmdline`, 'utf8'))![1];
  return `mariadb://dawnvane:${readFileSync(join(data, 'database-password'), 'utf8')}@127.0.0.1:${port}/dawnvane`;
}

afterEach(async () => {
  for (const dawnvane of started.splice(0)) {
    dawnvane.signal('SIGTERM');
    await dawnvane.ended;
  }
});
afterAll(() => folder.remove());

describe('the start command on an empty data folder', { timeout: minutesMs }, () => {
  let first: StartedDawnvane;
  let settingsKept = '';

  beforeAll(async () => {
    first = await start();
  }, minutesMs);

  it('serves the API on the address it prints', async () => {
    const response = await fetch(`${first.address}/api/health`);
    expect(response.status).toBe(200);
    expect(await response.json()).toMatchObject({ status: 'ok', database: 'ok' });
    started.length = 0; // Kept over the following sentences, until it is stopped below.
  });

  it('serves the client, and prints who may sign in to the demo', async () => {
    const page = await fetch(`${first.address}/`);
    expect(page.headers.get('content-type')).toMatch(/text\/html/);
    expect(await page.text()).toMatch(/<div id="root">/);
    expect(first.output()).toMatch(/\(owner\)[^]*\(applicator\)[^]*\(crew\)[^]*\(observer\)/);
  });

  it('keeps passwords and secrets where only its own user reads them', () => {
    expect(statSync(data).mode & 0o777).toBe(0o700);
    for (const name of ['database-password', 'server-secret']) {
      expect(statSync(join(data, name)).mode & 0o777, name).toBe(0o600);
      expect(readFileSync(join(data, name), 'utf8').length, name).toBeGreaterThanOrEqual(32);
    }
    for (const name of readdirSync(data).filter((name) => name.includes('init') || name.endsWith('.new'))) expect.fail(`${name} was left behind`);
  });

  it('lets its database user into its own database only, from this machine only', async () => {
    const sequelize = createDatabase(databaseUrl(), { poolMax: 1 });
    try {
      const grants = (await select<Record<string, string>>(sequelize, 'SHOW GRANTS')).flatMap((row) => Object.values(row));
      expect(grants).toHaveLength(2);
      expect(grants[0]).toMatch(/^GRANT USAGE ON \*\.\* TO `dawnvane`@`127\.0\.0\.1`/);
      expect(grants[1]).toMatch(/ON `dawnvane`\.\* TO/);
      await expect(select(sequelize, 'SELECT user FROM mysql.user')).rejects.toThrow(/denied/);
      const [listening] = await select<{ address: string }>(sequelize, 'SELECT @@bind_address AS address');
      expect(listening!.address).toBe('127.0.0.1');
    } finally {
      await sequelize.close();
    }
  });

  it('refuses a second server on the same data, and leaves the first alone', async () => {
    const second = await startDawnvane({ DAWNVANE_DATA: data });
    expect(await second.ended).toBe(1);
    expect(second.output().trim()).toBe(`Dawnvane already runs on ${data} (process ${first.pid}): end that one, or set DAWNVANE_DATA to another folder.`);
    expect((await fetch(`${first.address}/api/health`)).status).toBe(200);
  });

  it('ends itself and its database on SIGTERM, the database in order', async () => {
    const sequelize = createDatabase(databaseUrl(), { poolMax: 1 });
    settingsKept = `{"kept":"${first.pid}"}`;
    await execute(sequelize, "INSERT INTO settings (name, value, updated_at) VALUES ('kept-over-restart', :settingsKept, '2026-06-01 05:00:00')", { settingsKept });
    await sequelize.close();
    const pids = databasePids(data);
    expect(pids).toHaveLength(1);
    expect(await first.stop()).toBe(0);
    expect(databasePids(data)).toEqual([]);
    expect(existsSync(`/proc/${pids[0]}`)).toBe(false);
    expect(readFileSync(join(data, 'mariadb.log'), 'utf8')).toMatch(/Shutdown complete/);
  });

  it('keeps its data and its secrets over a restart', async () => {
    const secret = readFileSync(join(data, 'server-secret'), 'utf8');
    await start();
    const sequelize = createDatabase(databaseUrl(), { poolMax: 1 });
    const rows = await select<{ value: string }>(sequelize, "SELECT value FROM settings WHERE name = 'kept-over-restart'");
    await sequelize.close();
    expect(rows).toEqual([{ value: settingsKept }]);
    expect(readFileSync(join(data, 'server-secret'), 'utf8')).toBe(secret);
  });

  it('takes the two signals of one Ctrl-C under npm as one, and ends in order', async () => {
    const dawnvane = await start();
    dawnvane.signal('SIGINT');
    dawnvane.signal('SIGINT');
    expect(await dawnvane.ended).toBe(0);
    expect(databasePids(data)).toEqual([]);
    expect(readFileSync(join(data, 'mariadb.log'), 'utf8')).toMatch(/Shutdown complete/);
  });

  it('leaves no database behind when it is stopped while that one is still coming up', async () => {
    const dawnvane = launchDawnvane({ DAWNVANE_DATA: data });
    started.push(dawnvane);
    while (databasePids(data).length === 0) await new Promise((resolve) => setTimeout(resolve, 5));
    dawnvane.signal('SIGTERM');
    expect(await dawnvane.ended).toBe(130);
    expect(dawnvane.output()).not.toMatch(/is ready|Error/);
    expect(databasePids(data)).toEqual([]);
  });

  it('says why, and ends with an error, when its database dies', async () => {
    const dawnvane = await start();
    process.kill(databasePids(data)[0]!, 'SIGKILL');
    expect(await dawnvane.ended).toBe(1);
    expect(dawnvane.output()).toMatch(/The database ended by itself \(see .*mariadb\.log\)/);
  });

  it('runs only the parts it is told to', async () => {
    const dawnvane = await startDawnvane({ DAWNVANE_DATA: data }, ['--role', 'worker,scheduler']);
    started.push(dawnvane);
    expect(dawnvane.output()).toMatch(/is ready \(worker, scheduler\)/);
    expect(dawnvane.address).toBeNull();
  });
});
