import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import type { Server } from 'node:http';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import type { Sequelize } from 'sequelize';
import { systemClock } from './clock/clock.ts';
import { helpText, loadConfig, type Config } from './config.ts';
import { createDatabase } from './database/connection.ts';
import { startMariaDb, type MariaDbProcess } from './database/mariadb-process.ts';
import { migrateUp } from './database/migrate.ts';
import { createModels } from './models/index.ts';
import { runParts, type RunningParts } from './run-parts.ts';
import type { Services } from './services.ts';
import { SetupError, sentenceOf } from './setup/setup-error.ts';

const root = fileURLToPath(new URL('..', import.meta.url));

/** What `npm start` brings along from before the packages were there. */
export interface Launch {
  argv: string[];
  ensureMariaDb: () => boolean;
  ensureClient: () => Promise<boolean>;
}

const say = (line: string): void => void process.stdout.write(`${line}\n`);

/** One server per data folder: a second one would end the first one's database. */
function claimFolder(folder: string): () => void {
  const file = join(folder, 'server.pid');
  try {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
    const pid = existsSync(file) ? Number(readFileSync(file, 'utf8')) : 0;
    if (pid > 1 && pid !== process.pid && existsSync(`/proc/${pid}/cmdline`) && /start\.mjs/.test(readFileSync(`/proc/${pid}/cmdline`, 'utf8'))) {
      throw new SetupError(`Dawnvane already runs on ${folder} (process ${pid}): end that one, or set DAWNVANE_DATA to another folder.`);
    }
    writeFileSync(file, String(process.pid), { mode: 0o600 });
  } catch (error) {
    throw sentenceOf(error, `write to the data folder ${folder}`);
  }
  return () => rmSync(file, { force: true });
}

/** The server's secret: given in production, made once and kept in the data folder for the demo. */
function secretOf(config: Config): Buffer {
  if (config.secret) return Buffer.from(config.secret, 'base64');
  const file = join(config.dataFolder, 'server-secret');
  if (!existsSync(file)) writeFileSync(file, randomBytes(32).toString('base64'), { mode: 0o600 });
  return Buffer.from(readFileSync(file, 'utf8'), 'base64');
}

async function openDatabase(config: Config, launch: Launch): Promise<{ sequelize: Sequelize; own: MariaDbProcess | null }> {
  if (!config.databaseUrl) launch.ensureMariaDb();
  const own = config.databaseUrl ? null : await startMariaDb({ folder: config.dataFolder });
  const sequelize = createDatabase(config.databaseUrl ?? own!.url);
  try {
    await migrateUp(sequelize);
  } catch (error) {
    await sequelize.close();
    await own?.stop();
    const reason = error instanceof Error ? error.message : String(error);
    throw new SetupError(`The database ${own ? 'of this folder' : 'at DATABASE_URL'} cannot be brought to this version's schema: ${reason}`);
  }
  return { sequelize, own };
}

function listen(server: Server, config: Config): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) => {
      if (error.code === 'EADDRINUSE') reject(new SetupError(`Port ${config.port} is taken by another program: end it, or choose another with PORT=…`));
      else if (error.code === 'EACCES') reject(new SetupError(`No right to listen on port ${config.port}: choose one above 1023 with PORT=…`));
      else reject(sentenceOf(error, `listen on ${config.host}:${config.port}`));
    });
    server.listen(config.port, config.host, () => {
      const address = server.address();
      resolve(typeof address === 'object' && address ? address.port : config.port);
    });
  });
}

/** From configuration to a running server; ends everything it began on SIGINT and SIGTERM. */
export async function start(launch: Launch): Promise<void> {
  if (launch.argv.includes('--help')) {
    say(helpText());
    return;
  }
  const config = loadConfig(process.env, launch.argv, root);
  const release = claimFolder(config.dataFolder);
  const undo: (() => Promise<void> | void)[] = [release];
  let ending = false;
  const end = async (exitCode: number): Promise<never> => {
    if (ending) process.exit(130);
    ending = true;
    for (const step of undo.reverse()) {
      try {
        await step();
      } catch (error) {
        process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
      }
    }
    process.exit(exitCode);
  };
  process.on('SIGINT', () => void end(0));
  process.on('SIGTERM', () => void end(0));
  try {
    // The database starts while the client is built; both are waited for before anything is decided.
    const [database, client] = await Promise.allSettled([openDatabase(config, launch), config.roles.includes('web') ? launch.ensureClient() : Promise.resolve(false)]);
    if (database.status === 'rejected') throw database.reason;
    const { sequelize, own } = database.value;
    if (own) undo.push(() => own.stop());
    undo.push(() => sequelize.close());
    if (client.status === 'rejected') throw client.reason;
    const log = pino({ level: config.logLevel, base: null });
    const services: Services = {
      settings: {
        publicUrl: config.publicUrl ?? `http://${config.host}:${config.port}`,
        production: config.mode === 'production',
        demo: config.mode === 'demo',
        version: (JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as { version: string }).version,
        secret: secretOf(config),
        mailFrom: config.mailFrom,
        contact: config.contact ?? 'mailto:keeper@dawnvane.example',
        permittedHosts: config.permittedHosts,
        clientFolder: join(root, 'dist'),
        uploadsFolder: join(config.dataFolder, 'uploads'),
      },
      clock: systemClock,
      log,
      sequelize,
      models: createModels(sequelize),
      random: Math.random,
    };
    const running: RunningParts = await runParts(services, config, (server) => listen(server, config));
    undo.push(() => running.stop());
    say(running.welcome);
  } catch (error) {
    const known = error as SetupError;
    process.stderr.write(`${known.name === 'SetupError' ? known.message : ((error as Error).stack ?? String(error))}\n`);
    await end(known.name === 'SetupError' ? known.exitCode : 1);
  }
}
