import type { QueryInterface } from 'sequelize';

/** A migration that runs these statements in order. */
export const statements =
  (...sql: string[]) =>
  async ({ context }: { context: QueryInterface }): Promise<void> => {
    for (const statement of sql) await context.sequelize.query(statement);
  };

/** Column of a UUID kept as text. */
export const id = (name: string, nullable: 'NULL' | 'NOT NULL' = 'NOT NULL'): string => `${name} CHAR(36) CHARACTER SET ascii COLLATE ascii_bin ${nullable}`;

/** Columns of every thing that a farm keeps: owner, version, archive and stamps. */
export const kept = (table: string): string => `${id('id')},
    ${id('farm_id')},
    version INT NOT NULL DEFAULT 1,
    archived_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    KEY ${table}_farm (farm_id, archived_at),
    CONSTRAINT ${table}_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE`;

/** A column that holds JSON text and refuses anything else. */
export const json = (table: string, name: string, nullable: 'NULL' | 'NOT NULL' = 'NOT NULL'): string =>
  `${name} LONGTEXT ${nullable}, CONSTRAINT ${table}_${name}_json CHECK (${nullable === 'NULL' ? `${name} IS NULL OR ` : ''}JSON_VALID(${name}))`;
