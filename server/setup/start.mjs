// `npm start`: everything from a bare machine to a running server, in one process that ends cleanly.
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { ensureClient } from './build.mjs';
import { ensurePackages } from './packages.mjs';
import { ensureSystemPackages, mariaDb } from './system-packages.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
const [major, minor] = process.versions.node.split('.').map(Number);

function fail(error) {
  const known = error?.name === 'SetupError';
  console.error(known ? error.message : error);
  process.exit(known ? error.exitCode : 1);
}

if (major < 20 || (major === 20 && minor < 19)) fail(Object.assign(new Error(`Node.js 20.19 or newer is needed; this is ${process.versions.node}.`), { name: 'SetupError', exitCode: 1 }));

try {
  process.chdir(root);
  ensurePackages(root);
  const { register } = await import('tsx/esm/api');
  register();
  const main = await import(pathToFileURL(join(root, 'server', 'index.ts')).href);
  await main.start({
    argv: process.argv.slice(2),
    ensureMariaDb: () => ensureSystemPackages(mariaDb),
    ensureClient: () => ensureClient(root),
  });
} catch (error) {
  fail(error);
}
