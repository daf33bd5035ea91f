import type { Migration } from '../database/migrate.ts';
import { id, statements } from '../database/statements.ts';

export const up: Migration = statements(
  `CREATE TABLE farms (
    ${id('id')},
    name VARCHAR(120) NOT NULL,
    latitude DOUBLE NOT NULL,
    longitude DOUBLE NOT NULL,
    elevation_m DOUBLE NOT NULL,
    exposure ENUM('open','sheltered','valleyFloor','hilltop') NOT NULL DEFAULT 'open',
    time_zone VARCHAR(64) NOT NULL,
    units ENUM('us','metric') NOT NULL DEFAULT 'us',
    eve_time CHAR(5) CHARACTER SET ascii NOT NULL DEFAULT '20:00',
    dawn_lead_minutes SMALLINT NOT NULL DEFAULT 30,
    version INT NOT NULL DEFAULT 1,
    archived_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    CONSTRAINT farms_latitude CHECK (latitude BETWEEN -90 AND 90),
    CONSTRAINT farms_longitude CHECK (longitude BETWEEN -180 AND 180),
    CONSTRAINT farms_eve_time CHECK (eve_time REGEXP '^([01][0-9]|2[0-3]):[0-5][0-9]$'),
    CONSTRAINT farms_dawn_lead CHECK (dawn_lead_minutes BETWEEN 0 AND 180)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  `CREATE TABLE memberships (
    ${id('id')},
    ${id('farm_id')},
    ${id('user_id')},
    role ENUM('owner','applicator','crew','observer') NOT NULL,
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    CONSTRAINT memberships_once UNIQUE (farm_id, user_id),
    KEY memberships_user (user_id),
    CONSTRAINT memberships_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE,
    CONSTRAINT memberships_user_fk FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  `CREATE TABLE invitations (
    ${id('id')},
    ${id('farm_id')},
    email VARCHAR(254) NOT NULL,
    role ENUM('owner','applicator','crew','observer') NOT NULL,
    token_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    ${id('invited_by')},
    expires_at DATETIME(3) NOT NULL,
    accepted_at DATETIME(3) NULL,
    revoked_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    CONSTRAINT invitations_token UNIQUE (token_hash),
    KEY invitations_farm (farm_id),
    CONSTRAINT invitations_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE,
    CONSTRAINT invitations_user_fk FOREIGN KEY (invited_by) REFERENCES users (id) ON DELETE CASCADE
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  // Append-only: who changed people, keys and limits.
  `CREATE TABLE audit_entries (
    ${id('id')},
    ${id('farm_id', 'NULL')},
    ${id('user_id', 'NULL')},
    what VARCHAR(60) NOT NULL,
    subject VARCHAR(200) NOT NULL,
    details LONGTEXT NOT NULL,
    created_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    KEY audit_entries_farm (farm_id, created_at),
    CONSTRAINT audit_entries_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE,
    CONSTRAINT audit_entries_user_fk FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE SET NULL,
    CONSTRAINT audit_entries_details_json CHECK (JSON_VALID(details))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
);

export const down: Migration = statements('DROP TABLE audit_entries', 'DROP TABLE invitations', 'DROP TABLE memberships', 'DROP TABLE farms');
