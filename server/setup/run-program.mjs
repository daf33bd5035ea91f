import { spawn } from 'node:child_process';

const keptChars = 64_000;

/**
 * Runs a program to its end and keeps the last of its words.
 * `stop` (an AbortSignal) ends it; with `mustFinish` it is left to finish and only then is the stop heeded.
 * @throws the reason of `stop` when that came; an error of `spawn` (ENOENT …) as it is
 */
export function runProgram(command, args, { cwd, env = process.env, stop, mustFinish = false } = {}) {
  stop?.throwIfAborted();
  return new Promise((resolve, reject) => {
    // A group of its own keeps Ctrl-C at the terminal away from a program that must finish.
    const child = spawn(command, args, { cwd, env, stdio: ['ignore', 'pipe', 'pipe'], detached: mustFinish });
    let output = '';
    const keep = (chunk) => {
      output = (output + chunk).slice(-keptChars);
    };
    child.stdout.setEncoding('utf8').on('data', keep);
    child.stderr.setEncoding('utf8').on('data', keep);
    const end = () => void child.kill('SIGTERM');
    if (!mustFinish) stop?.addEventListener('abort', end, { once: true });
    const over = (settle, value) => {
      stop?.removeEventListener('abort', end);
      if (stop?.aborted) reject(stop.reason);
      else settle(value);
    };
    child.once('error', (error) => over(reject, error));
    child.once('close', (status, signal) => over(resolve, { status, signal, output }));
  });
}

/** The last line that says something, for one sentence to the user. */
export const lastLine = (output) => output.trim().split('\n').map((line) => line.trim()).filter(Boolean).at(-1) ?? 'it gave no reason';
