import express from 'express';
import type { RequestListener } from 'node:http';
import { join } from 'node:path';
import type { Config } from './config.ts';
import { select } from './database/connection.ts';
import type { Services } from './services.ts';

/** The parts of the server at work. */
export interface RunningParts {
  /** The web application; index.ts hands it the port. */
  app: RequestListener;
  /** What the start command prints after the address: in the demo, the sign-ins. */
  welcome: string;
  /** Ends workers, schedules and fakes, and waits for them. */
  stop(): Promise<void>;
}

/** Makes the parts that the configuration names and starts them. */
export async function runParts({ settings, sequelize, clock }: Services, _config: Config): Promise<RunningParts> {
  const app = express();
  app.disable('x-powered-by');
  app.get('/api/health', async (_request, response) => {
    const [row] = await select<{ one: number }>(sequelize, 'SELECT 1 AS one');
    response.json({ status: 'ok', version: settings.version, now: clock.now().toISOString(), database: row ? 'ok' : 'down' });
  });
  if (settings.clientFolder) app.use(express.static(join(settings.clientFolder)));
  return { app, welcome: '', stop: async () => {} };
}
