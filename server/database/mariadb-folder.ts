import { execFile } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, readdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { userInfo } from 'node:os';
import { basename, dirname, join } from 'node:path';
import { SetupError, saysDiskFull, sentenceOf } from '../setup/setup-error.mjs';
import { lastLine } from './mariadb-reasons.ts';

/** Stands inside a data folder that we laid out; a folder without it is another MariaDB's. */
const marker = 'laid-out-by-dawnvane';

/** Debian keeps servers in /usr/sbin, which the PATH of a plain user lacks. Nothing else of our environment is MariaDB's business. */
export const programEnvironment = (): NodeJS.ProcessEnv => ({ PATH: `${process.env['PATH'] ?? ''}:/usr/sbin:/usr/bin:/usr/local/sbin`, HOME: process.env['HOME'] ?? '/', LANG: 'C.UTF-8', TZ: 'UTC' });

/** A small redo log: a start or a copy need not carry Debian's 96 MB. */
export const redoLog = '--innodb-log-file-size=32M';

/**
 * Lays out the data folder of our MariaDB unless that was done before.
 * @throws SetupError when something else lies there, the disk is full, or a right is missing
 */
export async function layOut(dataFolder: string): Promise<void> {
  try {
    if (existsSync(join(dataFolder, marker))) return;
    if (existsSync(dataFolder) && readdirSync(dataFolder).length > 0) throw new SetupError(`${dataFolder} holds a database that Dawnvane did not make: move it away, or set DAWNVANE_DATA to another folder.`);
    // Laid out beside and then renamed: an interrupted start leaves no half a database.
    const fresh = `${dataFolder}.new`;
    rmSync(fresh, { recursive: true, force: true });
    mkdirSync(fresh, { mode: 0o700 });
    await install(fresh);
    writeFileSync(join(fresh, marker), '');
    rmSync(dataFolder, { recursive: true, force: true });
    renameSync(fresh, dataFolder);
  } catch (error) {
    throw sentenceOf(error, `lay out the database in ${dirname(dataFolder)}`);
  }
}

function installOnce(folder: string): Promise<void> {
  const { username } = userInfo();
  // root may come in through the socket only, and only as the system's user.
  // The script stumbles over spaces in a path: it gets the folder's own name and is run beside it.
  const args = ['--no-defaults', `--datadir=./${basename(folder)}`, `--user=${username}`, '--auth-root-authentication-method=socket', `--auth-root-socket-user=${username}`, '--skip-test-db', redoLog];
  return new Promise((resolve, reject) => {
    execFile('mariadb-install-db', args, { cwd: dirname(folder), env: programEnvironment(), maxBuffer: 16 * 1024 * 1024 }, (error, stdout, stderr) => {
      if (!error) {
        resolve();
        return;
      }
      rmSync(folder, { recursive: true, force: true });
      const output = `${stdout}\n${stderr}`;
      if (error.code === 'ENOENT') reject(notInstalled());
      else if (saysDiskFull(output)) reject(new SetupError('The disk is full: the database could not be laid out; make room and start again.'));
      else if (/Permission denied|Errcode: 13/i.test(output)) reject(new SetupError(`No right to lay out the database in ${folder}: start as a user who may write there, or set DAWNVANE_DATA to another folder.`));
      else reject(new SetupError(`The database could not be laid out in ${folder}: ${lastLine(output.split('\n').filter((line) => /error|cannot|fatal/i.test(line) && !/Aborting/.test(line)).join('\n') || output)}`, passingExitCode));
    });
  });
}

/** Marks a failure that names no lasting cause. */
const passingExitCode = 75;

/** Lays the folder out; a failure without a lasting cause (many databases starting at one time) is tried once more. */
async function install(folder: string): Promise<void> {
  try {
    await installOnce(folder);
  } catch (error) {
    if (!(error instanceof SetupError) || error.exitCode !== passingExitCode) throw error;
    await new Promise((resolve) => setTimeout(resolve, 1000));
    await installOnce(folder);
  }
}

export const notInstalled = (): SetupError => new SetupError('MariaDB is not installed; as root, type: apt-get update && apt-get install -y mariadb-server');

/** Process ids of a MariaDB that an earlier run of ours left behind on this data folder (Linux). */
export function leftOvers(dataFolder: string, initFile: string): number[] {
  if (!existsSync('/proc/self/cmdline')) return [];
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .filter((name) => {
      try {
        const words = readFileSync(`/proc/${name}/cmdline`, 'utf8').split('\0');
        return words.includes(`--datadir=${dataFolder}`) && words.includes(`--init-file=${initFile}`);
      } catch {
        return false; // It ended in between.
      }
    })
    .map(Number);
}
