import { createHash } from 'node:crypto';
import { connect, createServer } from 'node:net';
import { SetupError } from './setup-error.mjs';

const pause = (ms) => new Promise((resolve) => setTimeout(resolve, ms));

/** An abstract socket: the kernel gives it up when its holder dies, so no claim outlives a crash. Linux only. */
const addressOf = (name) => `\0dawnvane-${createHash('sha256').update(name).digest('hex').slice(0, 32)}`;

/**
 * Claims a name on this machine for this process.
 * @returns a function that gives the claim up, or null when another process holds it
 */
export function claim(name) {
  if (process.platform !== 'linux') return Promise.resolve(() => {});
  return new Promise((resolve, reject) => {
    const server = createServer((socket) => {
      socket.on('error', () => {});
      socket.end(String(process.pid));
    });
    server.once('error', (error) => (error.code === 'EADDRINUSE' ? resolve(null) : reject(error)));
    server.listen({ path: addressOf(name) }, () => {
      server.unref();
      resolve(() => void server.close());
    });
  });
}

/** The process id of the holder of a claim; null when it does not say. */
export function holderOf(name) {
  return new Promise((resolve) => {
    const socket = connect({ path: addressOf(name) });
    let said = '';
    socket.setTimeout(500, () => socket.destroy());
    socket.setEncoding('utf8').on('data', (chunk) => (said += chunk));
    socket.once('error', () => resolve(null));
    socket.once('close', () => resolve(Number(said) || null));
  });
}

const waitMaxMs = 15 * 60_000;

/** Does work in a folder while no other start or test run does such work there; waits for its turn. */
export async function oneAtATime(folder, stop, work) {
  const name = `set-up of ${folder}`;
  let release = await claim(name);
  if (!release) console.log(`Another start is setting up ${folder}; waiting for it …`);
  for (let waitedMs = 0; !release; waitedMs += 250) {
    if (waitedMs >= waitMaxMs) throw new SetupError(`Another start has been setting up ${folder} for ${waitMaxMs / 60_000} minutes (process ${await holderOf(name)}): end it, then start again.`);
    await pause(250);
    stop?.throwIfAborted();
    release = await claim(name);
  }
  try {
    return await work();
  } finally {
    release();
  }
}
