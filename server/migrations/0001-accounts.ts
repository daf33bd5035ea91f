import type { Migration } from '../database/migrate.ts';
import { statements } from '../database/statements.ts';

export const up: Migration = statements(
  `CREATE TABLE users (
    id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    email VARCHAR(254) NOT NULL,
    email_confirmed_at DATETIME(3) NULL,
    password_hash VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    name VARCHAR(120) NOT NULL,
    units ENUM('us','metric') NOT NULL DEFAULT 'us',
    language ENUM('en','es') NOT NULL DEFAULT 'en',
    created_at DATETIME(3) NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    CONSTRAINT users_email_unique UNIQUE (email)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  // Only a SHA-256 of the session id is kept: a stolen table opens no session.
  `CREATE TABLE sessions (
    id_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    user_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    expires_at DATETIME(3) NOT NULL,
    created_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id_hash),
    KEY sessions_user (user_id),
    KEY sessions_expiry (expires_at),
    CONSTRAINT sessions_user_fk FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  `CREATE TABLE one_time_tokens (
    token_hash CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    user_id CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    purpose ENUM('confirm','reset') NOT NULL,
    expires_at DATETIME(3) NOT NULL,
    used_at DATETIME(3) NULL,
    created_at DATETIME(3) NOT NULL,
    PRIMARY KEY (token_hash),
    KEY one_time_tokens_user (user_id, purpose),
    CONSTRAINT one_time_tokens_user_fk FOREIGN KEY (user_id) REFERENCES users (id) ON DELETE CASCADE
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  `CREATE TABLE settings (
    name VARCHAR(80) NOT NULL,
    value LONGTEXT NOT NULL,
    updated_at DATETIME(3) NOT NULL,
    PRIMARY KEY (name),
    CONSTRAINT settings_value_json CHECK (JSON_VALID(value))
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
);

export const down: Migration = statements('DROP TABLE settings', 'DROP TABLE one_time_tokens', 'DROP TABLE sessions', 'DROP TABLE users');
