import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { lastLine, runProgram } from './run-program.mjs';
import { SetupError, saysDiskFull } from './setup-error.mjs';

export const mariaDb = [
  { program: 'mariadbd', debianPackage: 'mariadb-server' },
  { program: 'mariadb-install-db', debianPackage: 'mariadb-server' },
];
export const chromium = [{ program: 'chromium', debianPackage: 'chromium' }];

/** Debian keeps servers in /usr/sbin, which the PATH of a plain user lacks. */
function isInstalled(program) {
  return [...(process.env.PATH ?? '').split(delimiter), '/usr/sbin', '/usr/local/sbin', '/usr/bin'].some((folder) => {
    try {
      accessSync(join(folder, program), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}

/** What makes a command run as root: nothing, `sudo -n`, or null when there is no way without a password. */
async function rootPrefix(stop) {
  if (process.getuid?.() === 0) return [];
  if (!isInstalled('sudo')) return null;
  return (await runProgram('sudo', ['-n', 'true'], { stop })).status === 0 ? ['sudo', '-n'] : null;
}

/** Installs Debian packages for programs that are missing, and leaves alone what is there; whether it did. */
export async function ensureSystemPackages(wanted, stop) {
  const missing = wanted.filter(({ program }) => !isInstalled(program));
  if (missing.length === 0) return false;
  const names = [...new Set(missing.map(({ debianPackage }) => debianPackage))];
  const named = names.join(' and ');
  if (!isInstalled('apt-get')) throw new SetupError(`${named} must be installed by hand: this system has no apt-get.`);
  const byHand = `apt-get update && apt-get install -y ${names.join(' ')}`;
  const prefix = await rootPrefix(stop);
  if (prefix === null) throw new SetupError(`${named} must be installed once by an administrator; as root, type: ${byHand}`);
  console.log(`Installing ${named} from Debian's packages …`);
  const quiet = ['-y', '-qq', '-o', 'DPkg::Lock::Timeout=120', '--no-install-recommends'];
  // Only the last step changes the system: it is left to finish even when a stop comes.
  const steps = [
    { args: ['update', '-qq'] },
    { args: ['install', ...quiet, '--download-only', ...names] },
    { args: ['install', ...quiet, ...names], mustFinish: true },
  ];
  for (const { args, mustFinish } of steps) {
    const [command, ...rest] = [...prefix, 'env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', ...args];
    const { status, output } = await runProgram(command, rest, { stop, mustFinish });
    if (status === 0) continue;
    if (saysDiskFull(output) || /don't have enough free space/.test(output)) throw new SetupError(`The disk is full: ${named} could not be installed; make room and start again.`);
    const why = output.split('\n').find((line) => line.startsWith('E: ')) ?? lastLine(output);
    throw new SetupError(`${named} could not be installed (apt-get ${args[0]}: ${why.replace(/^E: /, '').trim()}); as root, type: ${byHand}`);
  }
  return true;
}
