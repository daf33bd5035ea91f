// Plain Node: runs before any package is installed.
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { oneAtATime } from './only-one.mjs';
import { lastLine, runProgram } from './run-program.mjs';
import { SetupError, saysDiskFull } from './setup-error.mjs';

const packagesIn = (file) => JSON.parse(readFileSync(file, 'utf8')).packages;

/**
 * Whether node_modules holds what the lock file says, by the list that npm writes there as its last act.
 * Optional packages of other platforms may be missing.
 */
export function packagesAreInstalled(root) {
  const written = join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(written)) return false;
  const installed = packagesIn(written);
  const locked = packagesIn(join(root, 'package-lock.json'));
  const asLocked = Object.entries(installed).every(([path, { version }]) => locked[path]?.version === version);
  const complete = Object.entries(locked).every(([path, { optional, devOptional }]) => path === '' || optional || devOptional || path in installed);
  return asLocked && complete;
}

function sentence(output) {
  if (saysDiskFull(output)) return 'The disk is full: the packages could not be installed; make room and start again.';
  if (/EACCES|EPERM|EROFS/.test(output)) return 'No right to write the packages into node_modules: start as the user who owns this folder.';
  if (/ENOTFOUND|ECONNREFUSED|ECONNRESET|ETIMEDOUT|EAI_AGAIN|network/i.test(output)) return 'The package registry cannot be reached: check the network and npm\'s registry setting, then start again.';
  const told = output.split('\n').filter((line) => /^npm error (?!A complete log|code )/.test(line));
  return `The packages could not be installed (npm ci: ${lastLine(told.slice(0, 1).join('') || output).replace(/^npm error /, '')}).`;
}

/** Installs the locked packages when node_modules is missing or differs from the lock file; whether it did. */
export async function ensurePackages(root, stop) {
  if (packagesAreInstalled(root)) return false;
  return oneAtATime(root, stop, async () => {
    if (packagesAreInstalled(root)) return false;
    console.log('Installing the locked packages …');
    const npm = process.env.npm_execpath?.endsWith('.js') ? [process.execPath, process.env.npm_execpath] : ['npm'];
    const [command, ...first] = npm;
    try {
      const { status, output } = await runProgram(command, [...first, 'ci', '--ignore-scripts', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], { cwd: root, stop });
      if (status !== 0) throw new SetupError(sentence(output));
    } catch (error) {
      if (error.code === 'ENOENT') throw new SetupError('npm is missing: install Node.js with npm, then start again.');
      throw error;
    }
    return true;
  });
}
