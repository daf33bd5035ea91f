import { systemEndpoints } from '../../shared/api/system.ts';
import { select } from '../database/connection.ts';
import { openApiDocument } from '../http/openapi.ts';
import { ReadyJson, type Register } from '../http/route.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

/** Minutes without any new forecast after which the server says that something is wrong. */
const forecastAgeMinutesMax = 6 * 60;

export function systemRoutes(register: Register, { sequelize, models, clock, settings }: Services, { worker }: Pick<Parts, 'worker'>): void {
  let description: string | null = null;

  register(systemEndpoints.openapi, async () => {
    description ??= JSON.stringify(openApiDocument(settings.version));
    return new ReadyJson(description);
  });

  register(systemEndpoints.health, async () => {
    const now = clock.now();
    const database = await select(sequelize, 'SELECT 1 AS one').then(
      () => 'ok' as const,
      () => 'down' as const,
    );
    const { state, lastRunAt, waiting } = await worker.status();
    const fetchedAt = database === 'ok' ? ((await models.forecasts.max('checkedAt')) as Date | string | null) : null;
    const lastForecast = fetchedAt ? { fetchedAt: new Date(fetchedAt).toISOString(), ageMinutes: Math.round((now.getTime() - new Date(fetchedAt).getTime()) / 60_000) } : null;
    const well = database === 'ok' && state !== 'stuck' && (lastForecast === null || lastForecast.ageMinutes <= forecastAgeMinutesMax);
    return { status: well ? ('ok' as const) : ('degraded' as const), version: settings.version, now: now.toISOString(), database, worker: { state, lastRunAt: lastRunAt?.toISOString() ?? null, waiting }, lastForecast };
  });
}
