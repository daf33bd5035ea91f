import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { oneAtATime } from './only-one.mjs';
import { runProgram } from './run-program.mjs';
import { SetupError, saysDiskFull, sentenceOf } from './setup-error.mjs';

const sources = ['src', 'shared', 'index.html', 'vite.config.ts', 'tailwind.config.ts', 'tsconfig.json', 'package-lock.json'];

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

function sentence(output, root) {
  if (saysDiskFull(output)) return 'The disk is full: the client could not be built; make room and start again.';
  if (/EACCES|EPERM|EROFS/.test(output)) return `No right to build the client in ${root}: start once as the user who owns that folder.`;
  return `The client could not be built:\n${output.trim()}`;
}

/** Builds the client into dist/ when its sources changed since the last build; whether it did. */
export async function ensureClient(root, stop) {
  const stamp = join(root, 'dist', '.sources');
  const wanted = hashOf(root);
  const isBuilt = () => existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted;
  if (isBuilt()) return false;
  return oneAtATime(root, stop, async () => {
    if (isBuilt()) return false;
    console.log('Building the client …');
    // Whatever mode the caller is in, people get React's production build.
    const env = { ...process.env, NODE_ENV: 'production' };
    const { status, output } = await runProgram(process.execPath, [join(root, 'node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn'], { cwd: root, env, stop });
    if (status !== 0) throw new SetupError(sentence(output, root));
    try {
      writeFileSync(stamp, wanted);
    } catch (error) {
      throw sentenceOf(error, `write ${stamp}`);
    }
    return true;
  });
}
