import { randomUUID } from 'node:crypto';
import { morningEndpoints } from '../../shared/api/mornings.ts';
import { ReadyJson, signedIn, type Register } from '../http/route.ts';
import { invalid, notFound } from '../http/problem.ts';
import type { ReadingRow } from '../models/weather.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

/** A phone's clock may run this far ahead of ours before its reading is refused. */
const aheadMinutes = 10;

export function morningRoutes(register: Register, { models, clock }: Services, { assessor }: Parts): void {
  register(morningEndpoints.daybreak, async ({ params }) => new ReadyJson(await assessor.daybreakJson(params.farmId)));

  register(morningEndpoints.refresh, async ({ params }) => assessor.assessFarm(params.farmId, { fetch: 'now' }));

  register(morningEndpoints.readMorning, async ({ params }) => assessor.morning(params.farmId, params.date));

  register(morningEndpoints.listReadings, async ({ params }) => {
    const rows = await models.readings.findAll({ where: { farmId: params.farmId }, order: [['takenAt', 'DESC']], limit: 200 });
    const names = new Map((await models.users.findAll({ where: { id: [...new Set(rows.flatMap((row) => row.takenBy ?? []))] }, attributes: ['id', 'name'] })).map((user) => [user.id, user.name]));
    return { items: rows.map((row) => presentReading(row.get({ plain: true }), row.takenBy ? (names.get(row.takenBy) ?? null) : null)) };
  });

  register(morningEndpoints.createReading, async ({ params, body, caller }) => {
    const who = signedIn(caller);
    const now = clock.now();
    const takenAt = new Date(body.takenAt);
    if (takenAt.getTime() > now.getTime() + aheadMinutes * 60_000) throw invalid([{ path: 'takenAt', message: 'must not lie in the future; check the clock of this device' }]);
    if (body.windMs === null && body.temperatureC === null && body.relativeHumidityPct === null && body.hangTest === null) {
      throw invalid([{ path: 'windMs', message: 'enter at least one measurement: wind, temperature, humidity or a hang test' }]);
    }
    const row: ReadingRow = { id: randomUUID(), farmId: params.farmId, source: 'person', takenBy: who.userId, ...body, takenAt, createdAt: now };
    await models.readings.create(row);
    await assessor.assessFarm(params.farmId, { fetch: 'never' });
    return presentReading(row, who.name);
  });

  register(morningEndpoints.deleteReading, async ({ params }) => {
    const removed = await models.readings.destroy({ where: { id: params.id, farmId: params.farmId } });
    if (removed === 0) throw notFound();
    await assessor.assessFarm(params.farmId, { fetch: 'never' });
    return undefined;
  });
}

function presentReading(row: ReadingRow, takenBy: string | null) {
  const { takenAt, createdAt, ...rest } = row;
  return { ...rest, takenBy, takenAt: takenAt.toISOString(), createdAt: createdAt.toISOString() };
}
