import type { Express } from 'express';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pino } from 'pino';
import supertest from 'supertest';
import { createApp } from '../../server/app.ts';
import { SettableClock } from '../../server/clock/clock.ts';
import { createModels } from '../../server/models/index.ts';
import type { Parts } from '../../server/parts.ts';
import type { AppSettings, Services } from '../../server/services.ts';
import type { Assessor } from '../../server/verdicts/assessor.ts';
import type { Daybreak, Morning } from '../../shared/api/mornings.ts';
import { createTestDatabase } from './database.ts';

export const origin = 'http://dawnvane.test';
/** The instant at which a test opens unless it says otherwise: an evening in June at the test farm. */
export const testOpensAt = new Date('2026-06-09T23:00:00Z');

export interface TestApp {
  app: Express;
  services: Services;
  parts: Parts;
  clock: SettableClock;
  /** A browser of its own: it keeps cookies and sends the Origin of our pages. */
  browser(): ReturnType<typeof supertest.agent>;
  close(): Promise<void>;
}

const noForecast = (farmId: string, clock: SettableClock): Daybreak => ({ farmId, now: clock.now().toISOString(), timeZone: 'America/Detroit', forecast: null, stale: true, mornings: [] });

/** An assessor that judges nothing, for tests about other things. */
function restingAssessor(clock: SettableClock): Assessor {
  return {
    assessFarm: async (farmId) => noForecast(farmId, clock),
    daybreakJson: async (farmId) => JSON.stringify(noForecast(farmId, clock)),
    morning: async (farmId, date): Promise<Morning> => ({ ...noForecast(farmId, clock), date, plans: [], history: [] }),
  };
}

/** The services of a test on an empty database, its clock stopped. */
export async function createTestServices(settings: Partial<AppSettings> = {}): Promise<{ services: Services; clock: SettableClock; close(): Promise<void> }> {
  const database = await createTestDatabase();
  const uploadsFolder = mkdtempSync(join(tmpdir(), 'dawnvane-uploads-'));
  const clock = new SettableClock(testOpensAt);
  clock.stop(testOpensAt);
  const services: Services = {
    settings: {
      publicUrl: origin,
      production: false,
      demo: false,
      version: '0.0.0-test',
      secret: Buffer.alloc(32, 7),
      mailFrom: 'Dawnvane <notices@dawnvane.example>',
      contact: 'mailto:keeper@dawnvane.example',
      permittedHosts: [],
      clientFolder: null,
      uploadsFolder,
      ...settings,
    },
    clock,
    log: pino({ level: 'silent' }),
    sequelize: database.sequelize,
    models: createModels(database.sequelize),
    random: () => 0.5,
  };
  return {
    services,
    clock,
    async close() {
      await database.drop();
      rmSync(uploadsFolder, { recursive: true, force: true });
    },
  };
}

/** The whole HTTP application on an empty database; parts not given rest. */
export async function createTestApp(given: { settings?: Partial<AppSettings>; parts?: (services: Services, clock: SettableClock, resting: Parts) => Partial<Parts> | Promise<Partial<Parts>> } = {}): Promise<TestApp> {
  const { services, clock, close } = await createTestServices(given.settings);
  const resting: Parts = {
    assessor: restingAssessor(clock),
    pushKeys: { current: { id: '0'.repeat(16), publicKey: 'B'.repeat(87), privateKey: 'x' }, byId: () => null },
    worker: { start: () => undefined, stop: async () => undefined, drain: async () => undefined, status: async () => ({ state: 'stopped', lastRunAt: null, waiting: null }) },
    scheduler: { start: () => undefined, stop: async () => undefined, tick: async () => undefined, nextDueAt: async () => null, nudge: () => undefined },
    demo: null,
  };
  const parts: Parts = { ...resting, ...(await given.parts?.(services, clock, resting)) };
  const app = createApp(services, parts);
  return { app, services, parts, clock, browser: () => supertest.agent(app).set('Origin', origin), close };
}

/** The statements that reach the database while some work is done. */
export async function statementsDuring({ services }: TestApp, work: () => Promise<void>): Promise<string[]> {
  const { options } = services.sequelize as unknown as { options: { logging: false | ((sql: string) => void) } };
  const statements: string[] = [];
  options.logging = (sql) => void statements.push(sql);
  try {
    await work();
  } finally {
    options.logging = false;
  }
  return statements;
}
