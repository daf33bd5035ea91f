import type { Migration } from '../database/migrate.ts';
import { id, statements } from '../database/statements.ts';

// Who changed a thing last: two people who edit one thing are told of each other by name.
const tables = ['farms', 'blocks', 'sensitive_places', 'sprayers', 'products', 'plans'];

export const up: Migration = statements(
  ...tables.map(
    (table) =>
      `ALTER TABLE ${table} ADD COLUMN ${id('updated_by', 'NULL')} AFTER updated_at, ADD KEY ${table}_updated_by (updated_by), ADD CONSTRAINT ${table}_updated_by_fk FOREIGN KEY (updated_by) REFERENCES users (id) ON DELETE SET NULL`,
  ),
);

export const down: Migration = statements(...tables.map((table) => `ALTER TABLE ${table} DROP FOREIGN KEY ${table}_updated_by_fk, DROP KEY ${table}_updated_by, DROP COLUMN updated_by`));
