import { spawnSync } from 'node:child_process';
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { StartError } from './start-error.mjs';

/** Where MariaDB's server and Chromium may be, beside the PATH of a plain user. */
const folders = [...(process.env.PATH ?? '').split(delimiter), '/usr/sbin', '/usr/bin', '/usr/local/bin'];

export function isInstalled(program) {
  return folders.some((folder) => {
    try {
      accessSync(join(folder, program), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}

function rootPrefix() {
  if (process.getuid?.() === 0) return [];
  const sudo = spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' });
  return sudo.status === 0 ? ['sudo', '-n'] : null;
}

/** Installs Debian packages for programs that are missing; what is there is left alone. */
export function ensureSystemPackages(wanted) {
  const missing = wanted.filter(({ program }) => !isInstalled(program));
  if (missing.length === 0) return false;
  const names = missing.map(({ debianPackage }) => debianPackage);
  const byHand = `apt-get update && apt-get install -y ${names.join(' ')}`;
  if (!isInstalled('apt-get')) throw new StartError(`${names.join(' and ')} must be installed by hand: this system has no apt-get.`);
  const prefix = rootPrefix();
  if (prefix === null) throw new StartError(`${names.join(' and ')} must be installed once by an administrator; type: sudo sh -c '${byHand}'`);
  console.log(`Installing ${names.join(' and ')} from Debian's packages …`);
  for (const args of [
    ['apt-get', 'update', '-qq'],
    ['apt-get', 'install', '-y', '-qq', '--no-install-recommends', ...names],
  ]) {
    const [command, ...rest] = [...prefix, ...(prefix.length ? ['env', 'DEBIAN_FRONTEND=noninteractive'] : []), ...args];
    const ran = spawnSync(command, rest, { env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 });
    if (ran.status !== 0) {
      const why = `${ran.stderr ?? ''}\n${ran.stdout ?? ''}`;
      if (/No space left/i.test(why)) throw new StartError(`The disk is full: ${names.join(' and ')} could not be installed; make room and start again.`);
      throw new StartError(`${names.join(' and ')} could not be installed (${args.join(' ')} failed: ${(ran.stderr ?? ran.error?.message ?? '').trim().split('\n').at(-1)}); type: ${byHand}`);
    }
  }
  return true;
}

export const mariaDb = [
  { program: 'mariadbd', debianPackage: 'mariadb-server' },
  { program: 'mariadb-install-db', debianPackage: 'mariadb-server' },
];
export const chromium = [{ program: 'chromium', debianPackage: 'chromium' }];
