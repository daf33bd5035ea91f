// Plain Node: runs before any package is installed.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { StartError } from './start-error.mjs';

const stampName = '.dawnvane-lock';

/** Installs the locked packages when they are missing or the lock file has changed since. */
export function ensurePackages(root) {
  const lock = join(root, 'package-lock.json');
  const stamp = join(root, 'node_modules', stampName);
  const wanted = createHash('sha256').update(readFileSync(lock)).digest('hex');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return false;
  console.log('Installing the locked packages …');
  const npm = process.env.npm_execpath && process.env.npm_execpath.endsWith('.js') ? [process.execPath, [process.env.npm_execpath]] : ['npm', []];
  const ran = spawnSync(npm[0], [...npm[1], 'ci', '--ignore-scripts', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], { cwd: root, stdio: ['ignore', 'inherit', 'inherit'] });
  if (ran.error || ran.status !== 0) throw new StartError('The packages could not be installed (npm ci failed, see above): check the network and the disk, then start again.');
  writeFileSync(stamp, wanted);
  return true;
}
