/** The assess command through its own door: a process that reads a file or standard input and prints JSON. */
import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Ajv2020 } from 'ajv/dist/2020.js';
import addFormats from 'ajv-formats';
import { afterAll, describe, expect, it } from 'vitest';
import { answerSchema } from '../../shared/assessment/answer.ts';
import { allLimits, fairHours, rawCase } from './cases.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const folder = mkdtempSync(join(tmpdir(), 'assess-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

interface Outcome {
  code: number | null;
  out: string;
  err: string;
}

/** Runs the command as a person does; `npm run` only adds the interpreter. */
function assessCommand(args: string[], input = ''): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'shared/assessment/command.ts', ...args], { cwd: root });
    const outcome: Outcome = { code: null, out: '', err: '' };
    child.stdout.setEncoding('utf8').on('data', (text: string) => (outcome.out += text));
    child.stderr.setEncoding('utf8').on('data', (text: string) => (outcome.err += text));
    child.on('error', reject);
    child.on('close', (code) => resolve({ ...outcome, code }));
    child.stdin.on('error', () => undefined);
    child.stdin.end(input);
  });
}

describe('the assess command', () => {
  it('prints the assessment of a file as JSON', async () => {
    const file = join(folder, 'case.json');
    writeFileSync(file, JSON.stringify(rawCase({ limits: allLimits })));
    const { code, out, err } = await assessCommand([file]);
    expect(err).toBe('');
    expect(code).toBe(0);
    const answer = answerSchema.parse(JSON.parse(out));
    expect(answer.verdict).toBe('go');
    expect(answer.steps[0]!.limits.wind!.value).toBeCloseTo(3.2 * 0.748, 2);
  });

  it('reads standard input without a file, and speaks metric when asked', async () => {
    const { code, out } = await assessCommand(['--units', 'metric'], JSON.stringify(rawCase({ minutesNeeded: 117, hours: fairHours((_, hour) => ({ windSpeed10mMs: hour <= 6 ? 3 : 9, windGust10mMs: 12 })) })));
    expect(code).toBe(0);
    const { verdict, reasons } = answerSchema.parse(JSON.parse(out));
    expect(verdict).toBe('hold');
    expect(reasons[0]!.text).toBe('27 minutes short: wind passes 4.5 m/s at 06:30.');
  });

  it('lists the problems of a bad case by path on standard error and exits 2', async () => {
    const { code, out, err } = await assessCommand([], JSON.stringify(rawCase({ minutesNeeded: -1, hours: fairHours((_, hour) => (hour === 3 ? { windSpeed10mMs: -3 } : {})), limits: { windMaxMs: 2, windMinMs: 3 } })));
    expect(code).toBe(2);
    expect(out).toBe('');
    expect(err).toContain('minutesNeeded: must be at least 0');
    expect(err).toContain('hours.10.windSpeed10mMs: must be at least 0');
  });

  it('exits 2 with a sentence for no JSON, an empty input, a missing file and an unknown option', async () => {
    const outcomes = await Promise.all([assessCommand([], '{oops'), assessCommand([], ''), assessCommand([join(folder, 'none.json')]), assessCommand(['--oops'], '{}'), assessCommand(['--units', 'cubits'], '{}')]);
    for (const { code, out, err } of outcomes) {
      expect(code).toBe(2);
      expect(out).toBe('');
      expect(err.trim()).not.toBe('');
      expect(err).not.toContain('    at ');
    }
  });

  it('answers line by line, in order, and goes on after a bad line', async () => {
    const lines = [rawCase({ minutesNeeded: 30 }), { nothing: true }, rawCase({ minutesNeeded: 600 })].map((value) => JSON.stringify(value));
    lines.splice(2, 0, '{"broken": ', '');
    const { code, out } = await assessCommand(['--lines'], `${lines.join('\n')}\n`);
    expect(code).toBe(0);
    const answers = out.trimEnd().split('\n').map((line) => JSON.parse(line) as { verdict?: string; problems?: { path: string; message: string }[] });
    expect(answers.map(({ verdict, problems }) => verdict ?? problems![0]!.message.slice(0, 11))).toEqual(['go', 'is missing;', 'is not JSON', 'is empty; g', 'hold']);
  });

  it('streams: the first answer comes before the last line is written', async () => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'shared/assessment/command.ts', '--lines'], { cwd: root });
    try {
      const first = new Promise<string>((resolve) => child.stdout.setEncoding('utf8').once('data', resolve));
      child.stdin.write(`${JSON.stringify(rawCase())}\n`);
      expect(await first).toContain('"verdict":"go"');
    } finally {
      const closed = new Promise((resolve) => child.on('close', resolve));
      child.stdin.end();
      await closed;
    }
  });

  it('documents case and answer as JSON Schema, which accepts what the command accepts and prints', async () => {
    const { code, out } = await assessCommand(['--schema']);
    expect(code).toBe(0);
    const { $defs, ...caseJsonSchema } = JSON.parse(out) as Record<string, unknown> & { $defs: { answer: object } };
    const ajv = addFormats.default(new Ajv2020({ strict: false, allErrors: true }));
    const isCase = ajv.compile(caseJsonSchema);
    expect(isCase(rawCase({ limits: allLimits }))).toBe(true);
    expect(isCase(rawCase({ hours: [{ time: '2026-06-10T00:00:00Z', windSpeed10mMs: -3 }] }))).toBe(false);
    const printed = await assessCommand([], JSON.stringify(rawCase({ limits: allLimits })));
    const isAnswer = ajv.compile($defs.answer);
    isAnswer(JSON.parse(printed.out));
    expect(isAnswer.errors).toBeNull();
  });
});
