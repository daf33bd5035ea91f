import { spawn } from 'node:child_process';
import { readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { freePort } from '../../server/database/mariadb-process.ts';
import { programEnvironment } from '../../server/database/mariadb-folder.ts';
import { databasePids, production, startDawnvane, temporaryFolder } from '../support/start-dawnvane.ts';

const minutesMs = 180_000;
const folder = temporaryFolder();
const data = join(folder.path, 'data');
const pause = (ms: number) => new Promise((resolve) => setTimeout(resolve, ms));

/** A MariaDB on the data folder, started by hand as a run of ours or as a stranger, once it holds the folder's lock. */
async function startByHand(whose: 'ours' | 'a stranger'): Promise<{ pid: number; ended: Promise<void> }> {
  const log = join(folder.path, `${whose}.log`);
  const child = spawn(
    'mariadbd',
    ['--no-defaults', `--user=${process.getuid!() === 0 ? 'root' : ''}`, `--datadir=${data}/mariadb`, `--port=${await freePort()}`, '--bind-address=127.0.0.1', `--socket=${folder.path}/hand.sock`, `--log-error=${log}`, '--innodb-log-file-size=32M', ...(whose === 'ours' ? [`--init-file=${data}/mariadb-init.sql`] : [])].filter((word) => word !== '--user='),
    { env: programEnvironment(), stdio: 'ignore' },
  );
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  const words = (): string => {
    try {
      return readFileSync(log, 'utf8');
    } catch {
      return '';
    }
  };
  while (!/ready for connections/.test(words()) && child.exitCode === null) await pause(25);
  expect(child.exitCode, words()).toBeNull();
  return { pid: child.pid!, ended };
}

beforeAll(async () => {
  const first = await startDawnvane({ ...production, DAWNVANE_DATA: data });
  expect(await first.stop(), first.output()).toBe(0);
}, minutesMs);
afterAll(() => folder.remove());

describe('after a crash', { timeout: minutesMs }, () => {
  it('the database of a server that was killed outright ends in order by itself, and the next start is ready', async () => {
    const killed = await startDawnvane({ ...production, DAWNVANE_DATA: data });
    killed.signal('SIGKILL');
    await killed.ended;
    while (databasePids(data).length > 0) await pause(25);
    expect(readFileSync(join(data, 'mariadb.log'), 'utf8')).toMatch(/Shutdown complete/);
    const next = await startDawnvane({ ...production, DAWNVANE_DATA: data });
    expect(next.address, next.output()).not.toBeNull();
    expect(await next.stop()).toBe(0);
  });

  it('a database of ours that was left behind is ended, and a fresh one serves', async () => {
    writeFileSync(join(data, 'mariadb-init.sql'), '');
    const left = await startByHand('ours');
    const next = await startDawnvane({ ...production, DAWNVANE_DATA: data });
    expect(next.address, next.output()).not.toBeNull();
    await left.ended;
    expect(databasePids(data)).not.toContain(left.pid);
    expect(await next.stop()).toBe(0);
  });

  it("a stranger's database on our folder is left alone and named", async () => {
    const stranger = await startByHand('a stranger');
    const next = await startDawnvane({ ...production, DAWNVANE_DATA: data });
    expect(await next.ended).toBe(1);
    expect(next.output().trim()).toBe(`Another MariaDB is using ${data}/mariadb: end that one, or set DAWNVANE_DATA to another folder.`);
    expect(() => process.kill(stranger.pid, 0)).not.toThrow();
    process.kill(stranger.pid, 'SIGTERM');
    await stranger.ended;
  });

  it('half a database of an interrupted first start is laid out again', async () => {
    rmSync(join(data, 'mariadb.new'), { recursive: true, force: true });
    renameSync(join(data, 'mariadb'), join(data, 'mariadb.new'));
    rmSync(join(data, 'mariadb.new', 'ibdata1'));
    const next = await startDawnvane({ ...production, DAWNVANE_DATA: data });
    expect(next.address, next.output()).not.toBeNull();
    expect(await next.stop()).toBe(0);
  });
});
