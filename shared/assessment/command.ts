/**
 * `npm run --silent assess -- [CASE.json] [--lines] [--schema] [--units us|metric]`
 * Reads a case from a file or standard input and prints the assessment as JSON; see DEVELOPERS.md.
 */
import { createReadStream } from 'node:fs';
import { parseArgs } from 'node:util';
import { z } from 'zod';
import { answerSchema } from './answer.ts';
import { caseSchema } from './case.ts';
import { linesOf } from './command-lines.ts';
import { answerText, problem } from './command-answer.ts';
import type { CaseProblem } from './problems.ts';
import type { AnswerOptions } from './answer-of.ts';

const usage = `usage: npm run --silent assess -- [CASE.json] [--lines] [--units us|metric]
       npm run --silent assess -- --schema
Without a file the case is read from standard input. --lines reads one case a line and prints one answer a line.`;

/** Bytes of one case; more is no case. */
const mostBytes = 8_000_000;

/** Writes and waits while the reader is slow. */
async function write(text: string): Promise<void> {
  if (process.stdout.write(text)) return;
  await new Promise<void>((resolve) => process.stdout.once('drain', resolve));
}

function fail(problems: readonly CaseProblem[]): void {
  for (const { path, message } of problems) process.stderr.write(`${path === '' ? '(whole input)' : path}: ${message}\n`);
  process.exitCode = 2;
}

async function run(): Promise<void> {
  const { values, positionals } = parseArgs({
    allowPositionals: true,
    options: { lines: { type: 'boolean', default: false }, schema: { type: 'boolean', default: false }, units: { type: 'string', default: 'us' }, help: { type: 'boolean', default: false } },
  });
  if (values.help) return write(`${usage}\n`);
  if (values.schema) {
    const schemas = { case: z.toJSONSchema(caseSchema, { io: 'input' }), answer: z.toJSONSchema(answerSchema) };
    return write(`${JSON.stringify({ $schema: 'https://json-schema.org/draft/2020-12/schema', title: 'Dawnvane assessment', ...schemas.case, $defs: { answer: schemas.answer } }, null, 2)}\n`);
  }
  if (values.units !== 'us' && values.units !== 'metric') throw new TypeError('--units takes us or metric');
  if (positionals.length > 1) throw new TypeError('give one file');
  const options: AnswerOptions = { units: values.units };
  const input = positionals[0] === undefined || positionals[0] === '-' ? process.stdin : createReadStream(positionals[0]);
  if (values.lines) {
    for await (const line of linesOf(input, mostBytes)) {
      const { answer } = line === null ? problem(`is longer than ${mostBytes} bytes`) : answerText(line, options);
      await write(`${JSON.stringify(answer)}\n`);
    }
    return;
  }
  const chunks: Buffer[] = [];
  let bytes = 0;
  for await (const chunk of input as AsyncIterable<Buffer>) {
    bytes += chunk.length;
    if (bytes > mostBytes) return fail([{ path: '', message: `is longer than ${mostBytes} bytes` }]);
    chunks.push(chunk);
  }
  const { answer, problems } = answerText(Buffer.concat(chunks).toString('utf8'), options);
  if (problems) return fail(problems);
  await write(`${JSON.stringify(answer, null, 2)}\n`);
}

// A reader that closes early (head, less) is no error.
process.stdout.on('error', (error: NodeJS.ErrnoException) => process.exit(error.code === 'EPIPE' ? 0 : 1));

run().catch((error: unknown) => {
  const code = (error as NodeJS.ErrnoException).code ?? '';
  const message = error instanceof Error ? error.message : String(error);
  process.stderr.write(code.startsWith('ERR_PARSE_ARGS') || error instanceof TypeError ? `${message}\n${usage}\n` : `(whole input): ${message}\n`);
  process.exitCode = 2;
});
