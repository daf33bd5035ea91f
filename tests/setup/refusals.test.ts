import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { startDawnvane, temporaryFolder } from '../support/start-dawnvane.ts';

const minutesMs = 180_000;
const folder = temporaryFolder();
afterAll(() => folder.remove());

/** Starts, expects the start to fail, and answers what it said. */
async function refusal(variables: Record<string, string>, exitCode = 1): Promise<string> {
  const dawnvane = await startDawnvane(variables);
  if (dawnvane.address) await dawnvane.stop();
  expect(await dawnvane.ended, dawnvane.output()).toBe(exitCode);
  return dawnvane.output().trim();
}

describe('the start command says in one sentence why it cannot start', { timeout: minutesMs }, () => {
  it('when the port is taken, before it begins anything', async () => {
    const taken = createServer();
    await new Promise<void>((resolve) => taken.listen(0, '127.0.0.1', () => resolve()));
    const { port } = taken.address() as AddressInfo;
    const data = join(folder.path, 'port');
    expect(await refusal({ DAWNVANE_DATA: data, PORT: String(port) })).toBe(`Port ${port} on 127.0.0.1 is taken by another program: end that one, or choose another port with PORT=… (0 takes a free one).`);
    expect(existsSync(join(data, 'mariadb'))).toBe(false);
    await new Promise((resolve) => taken.close(resolve));
  });

  it('when the address is not of this machine (192.0.2.0/24 is for documentation, RFC 5737)', async () => {
    expect(await refusal({ DAWNVANE_DATA: join(folder.path, 'host'), HOST: '192.0.2.1' })).toBe('192.0.2.1 is no address of this machine: correct HOST.');
  });

  it('when production lacks its secrets: the whole list, exit code 2', async () => {
    const said = (await refusal({ DAWNVANE_DATA: join(folder.path, 'production'), DAWNVANE_MODE: 'production' }, 2)).split('\n');
    expect(said[0]).toBe('The configuration needs another look:');
    expect(said.slice(1).map((line) => line.trim().split(' ')[1])).toEqual(['DAWNVANE_SECRET', 'PUBLIC_URL', 'FORECAST_PROVIDERS', 'CONTACT', 'SMTP_URL', 'MAIL_FROM']);
  });

  it("when the data folder is another program's", async () => {
    const foreign = join(folder.path, 'foreign');
    mkdirSync(foreign);
    writeFileSync(join(foreign, 'ibdata1'), 'precious');
    expect(await refusal({ DAWNVANE_DATA: foreign })).toBe(`${foreign} holds things that are not Dawnvane's (ibdata1): set DAWNVANE_DATA to an empty or new folder.`);
  });

  it('when a database that it did not make lies where its own would be', async () => {
    const data = join(folder.path, 'other-database');
    await refusal({ DAWNVANE_DATA: data, HOST: '192.0.2.1' }); // Makes the folder ours.
    mkdirSync(join(data, 'mariadb'));
    writeFileSync(join(data, 'mariadb', 'ibdata1'), 'precious');
    expect(await refusal({ DAWNVANE_DATA: data })).toBe(`${data}/mariadb holds a database that Dawnvane did not make: move it away, or set DAWNVANE_DATA to another folder.`);
  });

  it('when it may not write to the data folder', async () => {
    // Nobody, not even root, may make folders in /sys.
    expect(await refusal({ DAWNVANE_DATA: '/sys/dawnvane' })).toMatch(/^(No right|The file system is read-only).*\/sys\/dawnvane.*DAWNVANE_DATA to (another folder|a folder that can be written)\.$/);
  });

  it('when a file stands where the data folder should be', async () => {
    const file = join(folder.path, 'a-file');
    writeFileSync(file, '');
    expect(await refusal({ DAWNVANE_DATA: file })).toMatch(/^A file stands where a folder is needed: .*a-file/);
  });

  it('when the disk is full', async (context) => {
    const small = join(folder.path, 'small');
    mkdirSync(small);
    const mounted = spawnSync('mount', ['-t', 'tmpfs', '-o', 'size=20m', 'tmpfs', small]);
    if (mounted.status !== 0) context.skip('A small file system cannot be mounted here.');
    try {
      expect(await refusal({ DAWNVANE_DATA: join(small, 'data') })).toMatch(/^The disk is full: .*make room and start again\.$/);
      expect(spawnSync('dd', ['if=/dev/zero', `of=${small}/rest`, 'bs=64k', 'count=1000']).status).not.toBe(0);
      expect(await refusal({ DAWNVANE_DATA: join(small, 'more') })).toMatch(/^The disk is full: .*make room and start again\.$/);
    } finally {
      spawnSync('umount', [small]);
    }
  });
});
