import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { pino } from 'pino';
import type { Sequelize } from 'sequelize';
import { systemClock } from './clock/clock.ts';
import { loadConfig, type Config } from './config.ts';
import { startMariaDb } from './database/mariadb-process.ts';
import { openDatabase } from './database/open-database.ts';
import { listen, type Listening } from './http/listen.ts';
import { createModels } from './models/index.ts';
import { runParts } from './run-parts.ts';
import type { AppSettings } from './services.ts';
import { keptSecret } from './setup/secret-file.ts';
import { SetupError } from './setup/setup-error.mjs';

/** What `npm start` brings along from before the packages were there. */
export interface Launch {
  argv: readonly string[];
  /** The project's folder. */
  root: string;
  /** Aborts when the server is to end. */
  stop: AbortSignal;
  ensureMariaDb: () => Promise<boolean>;
  ensureClient: () => Promise<boolean>;
}

const say = (line: string): void => void process.stdout.write(`${line}\n`);

/** Undone in reverse order, whatever step failed. */
type Undo = (() => Promise<void> | void)[];

async function database(config: Config, launch: Launch, undo: Undo, onLoss: (why: SetupError) => void): Promise<Sequelize> {
  let url = config.databaseUrl;
  if (!url) {
    await launch.ensureMariaDb();
    const own = await startMariaDb({ folder: config.dataFolder, stop: launch.stop });
    undo.push(() => own.stop());
    void own.ended.then(() => onLoss(new SetupError(`The database ended by itself (see ${join(config.dataFolder, 'mariadb.log')}): start again.`)));
    url = own.url;
  }
  const sequelize = await openDatabase(url);
  undo.push(() => sequelize.close());
  return sequelize;
}

/** The address at which this machine itself reaches the server. */
function localAddress(host: string, port: number): string {
  if (host === '0.0.0.0' || host === '::') return `http://localhost:${port}`;
  return `http://${host.includes(':') ? `[${host}]` : host}:${port}`;
}

function settingsOf(config: Config, launch: Launch, local: string): AppSettings {
  return {
    publicUrl: config.publicUrl ?? local,
    production: config.mode === 'production',
    demo: config.mode === 'demo',
    version: (JSON.parse(readFileSync(join(launch.root, 'package.json'), 'utf8')) as { version: string }).version,
    secret: config.secret ? Buffer.from(config.secret, 'base64') : Buffer.from(keptSecret(join(config.dataFolder, 'server-secret'), 32), 'base64url'),
    mailFrom: config.mailFrom,
    contact: config.contact ?? 'mailto:keeper@dawnvane.example',
    permittedHosts: config.permittedHosts,
    clientFolder: join(launch.root, 'dist'),
    uploadsFolder: join(config.dataFolder, 'uploads'),
  };
}

/** Both or neither: the database starts while the client is built, and both have settled before a failure is told. */
async function both<A>(first: Promise<A>, second: Promise<unknown>): Promise<A> {
  const [a, b] = await Promise.allSettled([first, second]);
  if (a.status === 'rejected') throw a.reason;
  if (b.status === 'rejected') throw b.reason;
  return a.value;
}

/**
 * Runs the server until `launch.stop` aborts, then ends what it began: first the door, then the parts, last the database.
 * @throws SetupError when it cannot start or loses its database
 */
export async function serve(launch: Launch): Promise<void> {
  const { stop } = launch;
  const config = loadConfig(process.env, launch.argv, launch.root);
  const undo: Undo = [];
  let lose: (why: SetupError) => void = () => {};
  const lost = new Promise<never>((_resolve, reject) => (lose = reject));
  lost.catch(() => {}); // It counts only while it is waited for.
  const stopped = new Promise<void>((resolve) => stop.addEventListener('abort', () => resolve(), { once: true }));
  try {
    const web: Listening | null = config.roles.includes('web') ? await listen(config.port, config.host) : null;
    if (web) undo.push(() => web.close());
    const sequelize = await both(database(config, launch, undo, lose), web ? launch.ensureClient() : Promise.resolve());
    stop.throwIfAborted();
    const local = localAddress(config.host, web?.port ?? config.port);
    const settings = settingsOf(config, launch, local);
    const log = pino({ level: config.logLevel, base: null });
    const hint = (): void => say('Ending as soon as the parts are up; once more ends at once.');
    stop.addEventListener('abort', hint);
    const parts = await runParts({ settings, clock: systemClock, log, sequelize, models: createModels(sequelize), random: Math.random }, config);
    stop.removeEventListener('abort', hint);
    undo.push(() => parts.stop());
    if (web) {
      web.serve(parts.app);
      undo.push(() => web.close());
    }
    stop.throwIfAborted();
    say(web ? `Dawnvane is ready at ${settings.publicUrl}${settings.publicUrl === local ? '' : ` (listening on ${local})`}` : `Dawnvane is ready (${config.roles.join(', ')})`);
    if (parts.welcome) say(parts.welcome);
    await Promise.race([stopped, lost]);
  } finally {
    for (const step of undo.reverse()) {
      try {
        await step();
      } catch (error) {
        process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
      }
    }
  }
}
