import type { Logger } from 'pino';
import type { Sequelize } from 'sequelize';
import type { Clock } from './clock/clock.ts';
import type { Models } from './models/index.ts';

/** What of the configuration the application itself needs. */
export interface AppSettings {
  /** Origin that people and letters use, without a slash at the end. */
  publicUrl: string;
  production: boolean;
  /** True while the fakes of the demo run. */
  demo: boolean;
  version: string;
  /** 32 bytes or more: seals secrets at rest and signs links. */
  secret: Buffer;
  mailFrom: string;
  /** `mailto:` or https address for VAPID and User-Agent. */
  contact: string;
  /** Host names of outgoing webhooks and push services that skip the address check: test targets only. */
  permittedHosts: readonly string[];
  /** Built client, or null when only the API is served. */
  clientFolder: string | null;
  /** Where uploads are kept. */
  uploadsFolder: string;
}

/** The common ground of every part of the server; made once at start and handed down. */
export interface Services {
  settings: AppSettings;
  clock: Clock;
  log: Logger;
  sequelize: Sequelize;
  models: Models;
  /** Uniform in [0, 1); injected so that a simulation can repeat itself. */
  random: () => number;
}
