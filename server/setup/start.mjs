// `npm start`: everything from a bare machine to a running server, in one process that ends cleanly.
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { ensureClient } from './build.mjs';
import { dataFolderOf, openDataFolder } from './data-folder.mjs';
import { helpText } from './help.mjs';
import { ensurePackages } from './packages.mjs';
import { SetupError } from './setup-error.mjs';
import { ensureSystemPackages, mariaDb } from './system-packages.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..');
const argv = process.argv.slice(2);
/** At a terminal, one Ctrl-C arrives twice: from the terminal and passed on by npm. */
const sameKeyPressMs = 1000;

const stopping = new AbortController();
let stopAskedAt = 0;
function askToStop() {
  if (stopping.signal.aborted && performance.now() - stopAskedAt > sameKeyPressMs) process.exit(130);
  if (!stopping.signal.aborted) stopAskedAt = performance.now();
  stopping.abort();
}
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, askToStop);
// npm, or the shell between, may die without passing anything on: then nobody is left who wants this server.
if (process.env.npm_lifecycle_event) {
  const parent = process.ppid;
  setInterval(() => process.ppid !== parent && askToStop(), 1000).unref();
}

let exitCode = 0;
function tell(error) {
  const known = error instanceof SetupError;
  console.error(known ? error.message : error);
  exitCode = known ? error.exitCode : 1;
}
// A fault nobody caught: tell it and end in order, so that the database is not left behind.
for (const fault of ['uncaughtException', 'unhandledRejection']) {
  process.on(fault, (error) => {
    tell(error);
    askToStop();
  });
}

async function main() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) throw new SetupError(`Node.js 20.19 or newer is needed; this is ${process.versions.node}.`);
  if (argv.includes('--help') || argv.includes('-h')) {
    console.log(helpText());
    return;
  }
  process.chdir(root);
  const release = await openDataFolder(dataFolderOf(process.env, root));
  await ensurePackages(root, stopping.signal);
  const { register } = await import('tsx/esm/api');
  register();
  const { serve } = await import(pathToFileURL(join(root, 'server', 'index.ts')).href);
  await serve({
    argv,
    root,
    stop: stopping.signal,
    ensureMariaDb: () => ensureSystemPackages(mariaDb, stopping.signal),
    ensureClient: () => ensureClient(root, stopping.signal),
  });
  release();
}

try {
  await main();
} catch (error) {
  if (error === stopping.signal.reason) exitCode ||= 130;
  else tell(error);
}
process.exit(exitCode);
