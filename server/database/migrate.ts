import { readdirSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { join } from 'node:path';
import type { QueryInterface, Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';

/** One step of the schema, up or down. */
export type Migration = (run: { context: QueryInterface }) => Promise<void>;

const folder = fileURLToPath(new URL('../migrations', import.meta.url));

function runner(sequelize: Sequelize): Umzug<QueryInterface> {
  const load = (name: string) => import(pathToFileURL(join(folder, name)).href) as Promise<{ up: Migration; down: Migration }>;
  return new Umzug({
    migrations: readdirSync(folder)
      .filter((name) => /^\d{4}-.*\.ts$/.test(name) && !name.endsWith('.test.ts'))
      .sort()
      .map((name) => ({ name, up: async (run) => (await load(name)).up(run), down: async (run) => (await load(name)).down(run) })),
    context: sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize, tableName: 'schema_steps' }),
    logger: undefined,
  });
}

/** Brings the schema up to the newest step; answers the names of the steps taken. */
export const migrateUp = async (sequelize: Sequelize): Promise<string[]> => (await runner(sequelize).up()).map((step) => step.name);

/** Takes every step back. */
export const migrateDown = async (sequelize: Sequelize): Promise<string[]> => (await runner(sequelize).down({ to: 0 })).map((step) => step.name);
