// `npm test`: the same set-up as `npm start`, then lint, types, build, unit and API, browser.
// `node tests/run.mjs lint types` runs only the named stages. Last line: `N passed, N failed, N skipped`.
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensureClient } from '../server/setup/build.mjs';
import { ensurePackages } from '../server/setup/packages.mjs';
import { SetupError } from '../server/setup/setup-error.mjs';
import { chromium, ensureSystemPackages, mariaDb } from '../server/setup/system-packages.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const bin = (path) => join(root, 'node_modules', path);
const stageMaxMs = 10 * 60_000;

const totals = { passed: 0, failed: 0, skipped: 0 };
const times = [];
const scratch = mkdtempSync(join(tmpdir(), 'dawnvane-run-'));
const stopping = new AbortController();
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => stopping.abort(new SetupError(`Stopped by ${signal}.`)));

/** Runs a Node program with its words shown; resolves to its exit status, never to 0 when it was ended. */
function node(args) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, args, { cwd: root, stdio: ['ignore', 'inherit', 'inherit'] });
    const end = () => void child.kill('SIGTERM');
    stopping.signal.addEventListener('abort', end, { once: true });
    const late = setTimeout(() => {
      console.error(`Ended after ${stageMaxMs / 60_000} minutes.`);
      end();
    }, stageMaxMs);
    const over = (status) => {
      clearTimeout(late);
      stopping.signal.removeEventListener('abort', end);
      resolve(status ?? 1);
    };
    child.once('error', () => over(1));
    child.once('exit', over);
  });
}

/** A stage that throws counts as one failed check. */
async function stage(name, work) {
  const began = performance.now();
  console.log(`\n── ${name}`);
  try {
    stopping.signal.throwIfAborted();
    await work();
  } catch (error) {
    totals.failed += 1;
    console.error(error instanceof SetupError ? error.message : error);
  }
  const seconds = ((performance.now() - began) / 1000).toFixed(1);
  times.push(`${name} ${seconds} s`);
  console.log(`── ${name}: ${seconds} s`);
}

/** A tool that passes or fails as a whole counts as one check. */
const check = (args) => async () => {
  if ((await node(args)) === 0) totals.passed += 1;
  else totals.failed += 1;
};

/** Counts every test; a file that could not be loaded, or whose set-up failed, counts as failed too. */
const suites = (name, args) => async () => {
  const report = join(scratch, `${name}.json`);
  const status = await node([bin('vitest/vitest.mjs'), 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...args]);
  if (!existsSync(report)) throw new SetupError('The suite ended without a report.');
  const { testResults } = JSON.parse(readFileSync(report, 'utf8'));
  let failed = 0;
  for (const file of testResults) {
    const count = (status) => file.assertionResults.filter((test) => test.status === status).length;
    const fileFailed = count('failed');
    const passed = count('passed');
    totals.passed += passed;
    totals.skipped += file.assertionResults.length - passed - fileFailed;
    failed += fileFailed || (file.status === 'failed' ? 1 : 0);
  }
  // Faults outside any test (an uncaught rejection, no file found) fail the run without failing a test.
  totals.failed += failed || (status === 0 ? 0 : 1);
};

const stages = {
  lint: () => stage('lint', check([bin('eslint/bin/eslint.js'), '.'])),
  types: () => stage('types', check([bin('typescript/bin/tsc'), '--noEmit'])),
  build: () => stage('build', () => ensureClient(root, stopping.signal)),
  unit: () => stage('unit and API', suites('unit', ['--exclude=tests/e2e/**'])),
  browser: () => stage('browser', suites('browser', ['tests/e2e/'])),
};

const named = process.argv.slice(2);
const unknown = named.filter((name) => !(name in stages));
if (unknown.length > 0) {
  console.error(`No stage is called ${unknown.join(', ')}; there are: ${Object.keys(stages).join(', ')}.`);
  totals.failed += 1;
} else {
  await stage('set-up', async () => {
    await ensurePackages(root, stopping.signal);
    await ensureSystemPackages([...mariaDb, ...chromium], stopping.signal);
  });
  if (totals.failed === 0) for (const [name, run] of Object.entries(stages)) if (named.length === 0 || named.includes(name)) await run();
  console.log(`\n${times.join(' · ')}`);
}
rmSync(scratch, { recursive: true, force: true });
console.log(`${totals.passed} passed, ${totals.failed} failed, ${totals.skipped} skipped`);
process.exitCode = totals.failed === 0 ? 0 : 1;
