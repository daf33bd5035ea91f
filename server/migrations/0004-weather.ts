import type { Migration } from '../database/migrate.ts';
import { id, json, statements } from '../database/statements.ts';

export const up: Migration = statements(
  // One row per issue as issued: rows are added, never overwritten.
  `CREATE TABLE forecasts (
    ${id('id')},
    ${id('farm_id')},
    provider ENUM('openMeteo','nws','metNorway','webhook') NOT NULL,
    model VARCHAR(120) NULL,
    issued_at DATETIME(3) NULL,
    fetched_at DATETIME(3) NOT NULL,
    expires_at DATETIME(3) NULL,
    -- Last time the provider was asked and had nothing newer.
    checked_at DATETIME(3) NOT NULL,
    place_latitude DOUBLE NOT NULL,
    place_longitude DOUBLE NOT NULL,
    place_elevation_m DOUBLE NULL,
    etag VARCHAR(300) NULL,
    last_modified VARCHAR(80) NULL,
    stand_in_because VARCHAR(300) NULL,
    ${json('forecasts', 'hours')},
    created_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    KEY forecasts_newest (farm_id, fetched_at),
    CONSTRAINT forecasts_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  `CREATE TABLE readings (
    ${id('id')},
    ${id('farm_id')},
    source VARCHAR(60) NOT NULL,
    ${id('taken_by', 'NULL')},
    taken_at DATETIME(3) NOT NULL,
    wind_ms DOUBLE NULL,
    wind_height_m DOUBLE NOT NULL DEFAULT 2,
    wind_from_deg DOUBLE NULL,
    temperature_c DOUBLE NULL,
    relative_humidity_pct DOUBLE NULL,
    hang_test ENUM('mixed','hung','blew') NULL,
    note VARCHAR(500) NOT NULL DEFAULT '',
    created_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    KEY readings_newest (farm_id, taken_at),
    CONSTRAINT readings_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE,
    CONSTRAINT readings_person_fk FOREIGN KEY (taken_by) REFERENCES users (id) ON DELETE SET NULL,
    CONSTRAINT readings_wind CHECK (wind_ms IS NULL OR wind_ms >= 0)
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  // One row per verdict told for a plan and morning: a change adds a revision.
  `CREATE TABLE verdicts (
    ${id('id')},
    ${id('farm_id')},
    ${id('plan_id', 'NULL')},
    plan_key CHAR(36) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
    morning DATE NOT NULL,
    revision INT NOT NULL,
    verdict ENUM('go','hold') NOT NULL,
    enough_to_tell TINYINT(1) NOT NULL,
    binding_limit VARCHAR(40) NULL,
    ${id('forecast_id', 'NULL')},
    ${json('verdicts', 'summary')},
    decided_at DATETIME(3) NOT NULL,
    PRIMARY KEY (id),
    CONSTRAINT verdicts_revision UNIQUE (farm_id, morning, plan_key, revision),
    CONSTRAINT verdicts_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE,
    CONSTRAINT verdicts_plan_fk FOREIGN KEY (plan_id) REFERENCES plans (id) ON DELETE CASCADE,
    CONSTRAINT verdicts_forecast_fk FOREIGN KEY (forecast_id) REFERENCES forecasts (id) ON DELETE SET NULL
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
  // The newest assessment of every farm, ready to be served: Daybreak in one read.
  `CREATE TABLE daybreaks (
    ${id('farm_id')},
    ${id('forecast_id', 'NULL')},
    ${json('daybreaks', 'body')},
    assessed_at DATETIME(3) NOT NULL,
    -- After this instant the body no longer holds: the forecast is stale or the morning is over.
    valid_until DATETIME(3) NOT NULL,
    PRIMARY KEY (farm_id),
    CONSTRAINT daybreaks_farm_fk FOREIGN KEY (farm_id) REFERENCES farms (id) ON DELETE CASCADE,
    CONSTRAINT daybreaks_forecast_fk FOREIGN KEY (forecast_id) REFERENCES forecasts (id) ON DELETE SET NULL
  ) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4`,
);

export const down: Migration = statements('DROP TABLE daybreaks', 'DROP TABLE verdicts', 'DROP TABLE readings', 'DROP TABLE forecasts');
