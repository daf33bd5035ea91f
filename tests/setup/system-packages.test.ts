import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { packagesAreInstalled } from '../../server/setup/packages.mjs';
import { ensureSystemPackages } from '../../server/setup/system-packages.mjs';
import { temporaryFolder } from '../support/start-dawnvane.ts';

const folder = temporaryFolder();
const log = join(folder.path, 'log');
const wanted = [{ program: 'dawnvane-test-program', debianPackage: 'test-package' }];

/** Programs of our own in the way of apt-get and sudo: nothing is installed and nothing leaves this machine. */
function fake(program: string, script: string): void {
  writeFileSync(join(folder.path, program), `#!/bin/sh\necho "${program} $*" >> ${log}\n${script}\n`, { mode: 0o755 });
}
const asUser = (uid: number) => vi.spyOn(process as { getuid(): number }, 'getuid').mockReturnValue(uid);
const path = process.env['PATH'];

beforeEach(() => {
  process.env['PATH'] = `${folder.path}:${path}`;
  writeFileSync(log, '');
  fake('apt-get', 'exit 0');
  fake('sudo', 'shift; exec "$@"');
  vi.spyOn(console, 'log').mockImplementation(() => {});
});
afterEach(() => {
  process.env['PATH'] = path;
  vi.restoreAllMocks();
});
afterAll(() => folder.remove());

describe("Debian's packages", () => {
  it('are left alone when the program is there', async () => {
    expect(await ensureSystemPackages([{ program: 'sh', debianPackage: 'dash' }])).toBe(false);
    expect(readFileSync(log, 'utf8')).toBe('');
  });

  it('are fetched, then installed, by root', async () => {
    asUser(0);
    expect(await ensureSystemPackages(wanted)).toBe(true);
    const lines = readFileSync(log, 'utf8').trim().split('\n');
    expect(lines[0]).toMatch(/^apt-get update/);
    expect(lines[1]).toMatch(/^apt-get install -y .*--download-only test-package$/);
    expect(lines[2]).toMatch(/^apt-get install -y .*test-package$/);
    expect(lines).toHaveLength(3);
  });

  it('are installed through sudo where it asks for no password', async () => {
    asUser(1000);
    expect(await ensureSystemPackages(wanted)).toBe(true);
    expect(readFileSync(log, 'utf8')).toMatch(/^sudo -n true\nsudo -n env DEBIAN_FRONTEND=noninteractive apt-get update/);
  });

  it('are asked of the reader, with what to type, where there is no right', async () => {
    asUser(1000);
    fake('sudo', 'exit 1');
    await expect(ensureSystemPackages(wanted)).rejects.toThrow('test-package must be installed once by an administrator; as root, type: apt-get update && apt-get install -y test-package');
    expect(readFileSync(log, 'utf8')).not.toMatch(/apt-get/);
  });

  it.each([
    ['echo "E: Unable to locate package test-package" >&2; exit 100', /could not be installed \(apt-get update: Unable to locate package test-package\); as root, type:/],
    ["echo \"E: You don't have enough free space in /var/cache/apt/archives/.\" >&2; exit 100", /^The disk is full: test-package could not be installed/],
  ])('that cannot be had give one sentence', async (script, sentence) => {
    asUser(0);
    fake('apt-get', script);
    await expect(ensureSystemPackages(wanted)).rejects.toThrow(sentence);
  });

  it('are waited for when a stop comes in the midst of the installation', async () => {
    asUser(0);
    const stopping = new AbortController();
    fake('apt-get', `case "$*" in *download-only*|*update*) exit 0;; esac; sleep 0.3; echo finished >> ${log}`);
    const outcome = ensureSystemPackages(wanted, stopping.signal).catch((error: unknown) => error);
    while (readFileSync(log, 'utf8').trim().split('\n').length < 3) await new Promise((resolve) => setTimeout(resolve, 10));
    stopping.abort();
    expect(await outcome).toBe(stopping.signal.reason);
    expect(readFileSync(log, 'utf8')).toMatch(/finished\n$/);
  });
});

describe('the locked packages', () => {
  const root = join(folder.path, 'project');
  const lock = { 'node_modules/alpha': { version: '1.0.0' }, 'node_modules/beta': { version: '2.0.0', dev: true }, 'node_modules/other-platform': { version: '3.0.0', optional: true } };
  const write = (installed: Record<string, { version: string }> | null, locked: object = lock): boolean => {
    mkdirSync(join(root, 'node_modules'), { recursive: true });
    writeFileSync(join(root, 'package-lock.json'), JSON.stringify({ packages: { '': {}, ...locked } }));
    writeFileSync(join(root, 'node_modules/.package-lock.json'), JSON.stringify({ packages: installed ?? {} }));
    return packagesAreInstalled(root);
  };
  const alpha = { 'node_modules/alpha': { version: '1.0.0' } };
  const beta = { 'node_modules/beta': { version: '2.0.0' } };

  it('count as installed when all are there as locked, but for optional ones', () => {
    expect(write({ ...alpha, ...beta })).toBe(true);
  });
  it('do not when one is missing, a version differs, or one is there that the lock no longer has', () => {
    expect(write(alpha)).toBe(false);
    expect(write({ ...alpha, 'node_modules/beta': { version: '2.0.1' } })).toBe(false);
    expect(write({ ...alpha, ...beta, 'node_modules/gone': { version: '1.0.0' } })).toBe(false);
    expect(write(null)).toBe(false);
  });
});
