import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { StartError } from './start-error.mjs';

const sources = ['src', 'shared', 'index.html', 'vite.config.ts', 'tailwind.config.ts', 'package-lock.json'];

function hashOf(root) {
  const hash = createHash('sha256');
  const walk = (path) => {
    if (!existsSync(path)) return;
    if (statSync(path).isDirectory()) {
      for (const name of readdirSync(path).sort()) walk(join(path, name));
    } else if (!/\.test\.tsx?$/.test(path)) {
      hash.update(path.slice(root.length)).update(readFileSync(path));
    }
  };
  for (const source of sources) walk(join(root, source));
  return hash.digest('hex');
}

/** Builds the client into dist/ when its sources changed since the last build. Resolves to whether it did. */
export async function ensureClient(root) {
  const stamp = join(root, 'dist', '.sources');
  const wanted = hashOf(root);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return false;
  console.log('Building the client …');
  const output = [];
  const status = await new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [join(root, 'node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn'], { cwd: root, stdio: ['ignore', 'pipe', 'pipe'] });
    child.stdout.on('data', (chunk) => output.push(chunk));
    child.stderr.on('data', (chunk) => output.push(chunk));
    child.once('error', reject);
    child.once('exit', resolve);
  });
  if (status !== 0) throw new StartError(`The client could not be built:\n${Buffer.concat(output).toString().trim()}`);
  writeFileSync(stamp, wanted);
  return true;
}
