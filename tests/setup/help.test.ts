import { execFileSync } from 'node:child_process';
import { cpSync, existsSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, expect, it } from 'vitest';
import variables from '../../server/setup/variables.json' with { type: 'json' };
import { temporaryFolder } from '../support/start-dawnvane.ts';

const folder = temporaryFolder();
afterAll(() => folder.remove());

it('tells how to start, each variable with its default, before any package is installed', () => {
  cpSync(fileURLToPath(new URL('../../server/setup', import.meta.url)), join(folder.path, 'server/setup'), { recursive: true });
  const text = execFileSync(process.execPath, [join(folder.path, 'server/setup/start.mjs'), '--help'], { encoding: 'utf8' });
  for (const [name, { help }] of Object.entries(variables)) expect(text).toContain(`${name.padEnd(18)}  ${help}`);
  expect(text).toMatch(/PORT .*\(default: 4390\)/);
  expect(existsSync(join(folder.path, 'node_modules'))).toBe(false);
  expect(existsSync(join(folder.path, '.data'))).toBe(false);
});
