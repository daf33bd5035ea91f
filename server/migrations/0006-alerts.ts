import type { Migration } from '../database/migrate.ts';
import { id, statements } from '../database/statements.ts';

export const up: Migration = statements(
  // Counts the notices of a farm and morning in the order they were decided, whatever their kind.
  'ALTER TABLE notices ADD COLUMN sequence INT NOT NULL DEFAULT 0 AFTER revision',
  // Deliveries of one order key (recipient, channel, morning) reach their end in the order of their sequence; a newer one replaces an older that still waits.
  `ALTER TABLE deliveries
    ADD COLUMN order_key VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NULL AFTER delivery_key,
    ADD COLUMN sequence INT NOT NULL DEFAULT 0 AFTER order_key,
    ADD KEY deliveries_order (order_key, state, sequence),
    DROP KEY deliveries_due,
    ADD KEY deliveries_due (state, channel, next_attempt_at)`,
  `ALTER TABLE inbound_messages
    ADD COLUMN claimed_until DATETIME(3) NULL AFTER received_at,
    ADD COLUMN tries SMALLINT NOT NULL DEFAULT 0 AFTER claimed_until`,
  // The next moment of each farm and kind. run_at is when to try: the moment itself, later while a scheduler is at it or after a failure.
  `CREATE TABLE moments (
    ${id('farm_id')},
    kind ENUM('eve','dawn','refresh','recheck') NOT NULL,
    due_at DATETIME(3) NOT NULL,
    morning DATE NULL,
    run_at DATETIME(3) NOT NULL,
    tries SMALLINT NOT NULL DEFAULT 0,
    farm_version INT NOT NULL,
    PRIMARY KEY (farm_id, kind),
    KEY moments_due (run_at),
    CONSTRAINT moments_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
);

export const down: Migration = statements(
  'DROP TABLE moments',
  'ALTER TABLE inbound_messages DROP COLUMN claimed_until, DROP COLUMN tries',
  'ALTER TABLE deliveries DROP KEY deliveries_order, DROP COLUMN order_key, DROP COLUMN sequence, DROP KEY deliveries_due, ADD KEY deliveries_due (state, next_attempt_at)',
  'ALTER TABLE notices DROP COLUMN sequence',
);
