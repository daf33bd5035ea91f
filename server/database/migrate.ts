import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import type { QueryInterface, Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { SetupError } from '../setup/setup-error.mjs';
import { select } from './connection.ts';

/** One step of the schema, up or down. */
export type Migration = (run: { context: QueryInterface }) => Promise<void>;

const folder = fileURLToPath(new URL('../migrations', import.meta.url));
const turnWaitSeconds = 120;

/** Names of all steps, in the order they are taken. */
export const migrationNames = (): string[] =>
  readdirSync(folder)
    .filter((name) => /^\d{4}-.*(?<!\.test)\.ts$/.test(name))
    .sort();

const storageOf = (sequelize: Sequelize): SequelizeStorage => new SequelizeStorage({ sequelize, tableName: 'schema_steps' });

function runner(sequelize: Sequelize): Umzug<QueryInterface> {
  const load = (name: string) => import(pathToFileURL(join(folder, name)).href) as Promise<{ up: Migration; down: Migration }>;
  return new Umzug({
    migrations: migrationNames().map((name) => ({ name, up: async (run) => (await load(name)).up(run), down: async (run) => (await load(name)).down(run) })),
    context: sequelize.getQueryInterface(),
    storage: storageOf(sequelize),
    logger: undefined,
  });
}

/** Several processes may start on one database: one takes the steps, the others wait and find them taken. */
function inTurn<T>(sequelize: Sequelize, work: () => Promise<T>): Promise<T> {
  return sequelize.transaction(async (transaction) => {
    const name = "CONCAT('dawnvane-schema-', DATABASE())";
    const [row] = await select<{ got: number | null }>(sequelize, `SELECT GET_LOCK(${name}, ${turnWaitSeconds}) AS got`, {}, transaction);
    if (Number(row?.got) !== 1) throw new SetupError(`Another process has been changing the database's schema for ${turnWaitSeconds} s: wait for it or end it, then start again.`);
    try {
      return await work();
    } finally {
      await select(sequelize, `SELECT RELEASE_LOCK(${name}) AS released`, {}, transaction);
    }
  });
}

/**
 * Brings the schema up to the newest step; answers the names of the steps taken.
 * @throws SetupError when the database holds steps that this version does not know
 */
export const migrateUp = (sequelize: Sequelize): Promise<string[]> =>
  inTurn(sequelize, async () => {
    const known = new Set(migrationNames());
    const unknown = (await storageOf(sequelize).executed()).filter((name) => !known.has(name));
    if (unknown.length > 0) throw new SetupError(`The database was written by a newer version of Dawnvane (step ${unknown[0]}): start that version, or set DAWNVANE_DATA to another folder.`);
    return (await runner(sequelize).up()).map((step) => step.name);
  });

/** Takes steps back, newest first: all of them, or down to and including the named one. Answers their names. */
export const migrateDown = (sequelize: Sequelize, to: string | 0 = 0): Promise<string[]> => inTurn(sequelize, async () => (await runner(sequelize).down({ to })).map((step) => step.name));
