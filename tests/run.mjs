// `npm test`: the same set-up as `npm start`, then lint, types, unit + API, build, browser. Last line: `N passed, N failed, N skipped`.
import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, existsSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensurePackages } from '../server/setup/packages.mjs';
import { chromium, ensureSystemPackages, mariaDb } from '../server/setup/system-packages.mjs';
import { ensureClient } from '../server/setup/build.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
process.chdir(root);
const scratch = mkdtempSync(join(tmpdir(), 'dawnvane-run-'));
const totals = { passed: 0, failed: 0, skipped: 0 };
const bin = (path) => join(root, 'node_modules', path);

function node(args) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, args, { cwd: root, stdio: ['ignore', 'inherit', 'inherit'], env: { ...process.env, NODE_ENV: 'test' } });
    child.once('error', () => resolve(1));
    child.once('exit', (status) => resolve(status ?? 1));
  });
}

async function stage(name, work) {
  const began = performance.now();
  console.log(`\n── ${name}`);
  try {
    await work();
  } catch (error) {
    totals.failed += 1;
    console.error(error?.name === 'SetupError' ? error.message : error);
  }
  console.log(`── ${name}: ${((performance.now() - began) / 1000).toFixed(1)} s`);
}

/** A tool that passes or fails as a whole counts as one check. */
const check = (args) => async () => {
  if ((await node(args)) === 0) totals.passed += 1;
  else totals.failed += 1;
};

/** Counts every test; a suite that could not even be loaded counts as failed. */
const suites = (name, args) => async () => {
  const report = join(scratch, `${name}.json`);
  const status = await node([bin('vitest/vitest.mjs'), 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...args]);
  if (!existsSync(report)) {
    totals.failed += 1;
    return;
  }
  const result = JSON.parse(readFileSync(report, 'utf8'));
  const unloaded = result.testResults.filter((file) => file.status === 'failed' && file.assertionResults.every((test) => test.status !== 'failed')).length;
  const failed = result.numFailedTests + unloaded;
  totals.passed += result.numPassedTests;
  totals.failed += failed || (status === 0 ? 0 : 1);
  totals.skipped += result.numPendingTests + result.numTodoTests;
};

const only = process.argv.slice(2);
const wanted = (name) => only.length === 0 || only.includes(name);

await stage('set-up', async () => {
  ensurePackages(root);
  ensureSystemPackages([...mariaDb, ...chromium]);
});
if (totals.failed === 0) {
  if (wanted('lint')) await stage('lint', check([bin('eslint/bin/eslint.js'), '.']));
  if (wanted('types')) await stage('types', check([bin('typescript/bin/tsc'), '--noEmit']));
  if (wanted('unit')) await stage('unit and API', suites('unit', ['--exclude=tests/e2e/**']));
  if (wanted('browser')) {
    await stage('build', () => ensureClient(root));
    await stage('browser', suites('browser', ['tests/e2e/']));
  }
}
rmSync(scratch, { recursive: true, force: true });
console.log(`\n${totals.passed} passed, ${totals.failed} failed, ${totals.skipped} skipped`);
process.exitCode = totals.failed === 0 ? 0 : 1;
