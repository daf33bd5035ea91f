import { z } from 'zod';
import { instantSchema } from './common.ts';
import { endpoint } from './endpoint.ts';

export const healthSchema = z.object({
  status: z.enum(['ok', 'degraded']),
  version: z.string(),
  now: instantSchema,
  database: z.enum(['ok', 'down']),
  worker: z.object({ state: z.enum(['ok', 'stopped', 'stuck']), lastRunAt: instantSchema.nullable(), waiting: z.number().int().nullable() }),
  lastForecast: z.object({ fetchedAt: instantSchema, ageMinutes: z.number() }).nullable(),
});

export const demoPushSchema = z.object({
  id: z.string(),
  receivedAt: instantSchema,
  title: z.string(),
  body: z.string(),
  /** Address that a tap opens. */
  url: z.string(),
  tag: z.string().nullable(),
  topic: z.string().nullable(),
  ttlSeconds: z.number(),
  urgency: z.string(),
  verdict: z.enum(['go', 'hold', 'unknown']).nullable(),
  device: z.string(),
});
export const demoMailSchema = z.object({ id: z.string(), receivedAt: instantSchema, from: z.string(), to: z.string(), subject: z.string(), text: z.string(), html: z.string() });
export const demoHookSchema = z.object({ id: z.string(), receivedAt: instantSchema, url: z.string(), messageId: z.string(), timestamp: z.string(), signatureValid: z.boolean(), status: z.number(), body: z.string() });
export const demoClockSchema = z.object({
  now: instantSchema,
  timeZone: z.string(),
  /** Moments worth stepping to, soonest first. */
  next: z.array(z.object({ name: z.enum(['eve', 'dawn', 'windowStart', 'noon', 'nextEvening']), at: instantSchema })),
});
export type DemoClock = z.infer<typeof demoClockSchema>;

export const systemEndpoints = {
  health: endpoint({ id: 'health', method: 'get', path: '/api/health', summary: 'Version, database, worker and the age of the last forecast.', access: 'public', answer: healthSchema }),
  openapi: endpoint({ id: 'openapi', method: 'get', path: '/api/openapi.json', summary: 'This description (OpenAPI 3.1).', access: 'public', answer: z.record(z.string(), z.unknown()) }),
};

export const demoEndpoints = {
  status: endpoint({ id: 'demoStatus', method: 'get', path: '/api/demo', summary: 'Whether the fakes of the demo run, and who may sign in.', access: 'public', answer: z.object({ demo: z.boolean(), signIns: z.array(z.object({ name: z.string(), email: z.string(), password: z.string(), role: z.string() })) }) }),
  readClock: endpoint({ id: 'readDemoClock', method: 'get', path: '/api/demo/clock', summary: 'The demo clock.', access: 'demo', answer: demoClockSchema }),
  setClock: endpoint({ id: 'setDemoClock', method: 'put', path: '/api/demo/clock', summary: 'Step the demo clock forward; everything due until then happens.', access: 'demo', body: z.object({ now: instantSchema }), answer: demoClockSchema }),
  phone: endpoint({ id: 'demoPhone', method: 'get', path: '/api/demo/phone', summary: 'What the demo phone shows.', access: 'demo', answer: z.object({ items: z.array(demoPushSchema) }) }),
  mailbox: endpoint({ id: 'demoMailbox', method: 'get', path: '/api/demo/mailbox', summary: 'What the demo mailbox holds.', access: 'demo', answer: z.object({ items: z.array(demoMailSchema) }) }),
  hookLog: endpoint({ id: 'demoHookLog', method: 'get', path: '/api/demo/hooks', summary: 'What the demo webhook receiver got.', access: 'demo', answer: z.object({ items: z.array(demoHookSchema) }) }),
  mood: endpoint({ id: 'setDemoMood', method: 'put', path: '/api/demo/mood', summary: 'Make the fake provider fail in one of its ways.', access: 'demo', body: z.object({ provider: z.enum(['openMeteo', 'nws', 'metNorway']), mood: z.enum(['ok', 'error500', 'tooMany', 'slow', 'cut', 'stale']) }) }),
};
