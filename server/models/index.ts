import type { Sequelize } from 'sequelize';
import { accountTables } from './accounts.ts';
import { farmTables } from './farms.ts';
import { noticeTables } from './notices.ts';
import { weatherTables } from './weather.ts';

/** Every table of one connection. */
export const createModels = (sequelize: Sequelize) => ({ ...accountTables(sequelize), ...farmTables(sequelize), ...weatherTables(sequelize), ...noticeTables(sequelize) });
export type Models = ReturnType<typeof createModels>;
