import { z } from 'zod';
import { answerSchema, limitNames, reasonSchema, windowSchema } from '../assessment/answer.ts';
import { dateSchema, farmItemParams, farmParams, idSchema, instantSchema } from './common.ts';
import { endpoint } from './endpoint.ts';

export const providerIds = ['openMeteo', 'nws', 'metNorway', 'webhook'] as const;

/** Where the weather of an assessment came from, and how old it is. */
export const forecastFactsSchema = z.object({
  id: idSchema,
  provider: z.enum(providerIds),
  providerName: z.string(),
  attribution: z.string(),
  model: z.string().nullable(),
  issuedAt: instantSchema.nullable(),
  fetchedAt: instantSchema,
  /** Set when this provider stands in for the farm's first one: why that one gave nothing. */
  standInBecause: z.string().nullable(),
});
export type ForecastFacts = z.infer<typeof forecastFactsSchema>;

/** One plan on one morning, in short: what Daybreak shows, and what a notice tells. */
export const planVerdictSchema = z.object({
  /** Null: no plan covers this morning, so the farm's usual limits were taken. */
  planId: idSchema.nullable(),
  planName: z.string(),
  date: dateSchema,
  verdict: z.enum(['go', 'hold']),
  enoughToTell: z.boolean(),
  bindingLimit: z.enum([...limitNames, 'time', 'data']).nullable(),
  /** One sentence in US units and one in metric. */
  headline: z.object({ us: z.string(), metric: z.string() }),
  reasons: z.array(reasonSchema),
  window: windowSchema.nullable(),
  minutesNeeded: z.number(),
  reserveMinutes: z.number(),
  sun: z.object({ civilDawn: instantSchema.nullable(), sunrise: instantSchema.nullable(), localNoon: instantSchema }),
  /** Least hard headroom and sun altitude at every second step (10 minutes), from civil dawn on: a small ribbon. */
  ribbon: z.object({ startAt: instantSchema.nullable(), stepMinutes: z.number(), headroom: z.array(z.number().nullable()), sunAltitudeDeg: z.array(z.number()) }),
  /** Counts the verdicts told for this plan and morning. */
  revision: z.number().int(),
  decidedAt: instantSchema,
});
export type PlanVerdict = z.infer<typeof planVerdictSchema>;

export const daybreakSchema = z.object({
  farmId: idSchema,
  now: instantSchema,
  timeZone: z.string(),
  forecast: forecastFactsSchema.nullable(),
  /** True when the newest forecast is too old to say go. */
  stale: z.boolean(),
  mornings: z.array(z.object({ date: dateSchema, verdicts: z.array(planVerdictSchema) })),
});
export type Daybreak = z.infer<typeof daybreakSchema>;

export const morningSchema = z.object({
  farmId: idSchema,
  date: dateSchema,
  now: instantSchema,
  timeZone: z.string(),
  forecast: forecastFactsSchema.nullable(),
  stale: z.boolean(),
  plans: z.array(z.object({ verdict: planVerdictSchema, answer: answerSchema, /** The case it was judged on, for what-if. */ case: z.unknown() })),
  history: z.array(z.object({ planId: idSchema.nullable(), revision: z.number().int(), verdict: z.enum(['go', 'hold']), headline: z.object({ us: z.string(), metric: z.string() }), decidedAt: instantSchema })),
});
export type Morning = z.infer<typeof morningSchema>;

export const readingBody = z.object({
  takenAt: instantSchema,
  windMs: z.number().min(0, 'must not be negative').max(60, 'must be at most 60 m/s').nullable().default(null),
  windHeightM: z.number().min(0.5).max(20).default(2),
  windFromDeg: z.number().min(0).max(360).nullable().default(null),
  temperatureC: z.number().min(-60).max(60).nullable().default(null),
  relativeHumidityPct: z.number().min(0).max(100).nullable().default(null),
  /** What smoke or dust did: rose and mixed, hung in a layer, or blew away. */
  hangTest: z.enum(['mixed', 'hung', 'blew']).nullable().default(null),
  note: z.string().trim().max(500).default(''),
});
export const readingSchema = readingBody.extend({ id: idSchema, farmId: idSchema, source: z.string(), takenBy: z.string().nullable(), createdAt: instantSchema });
export type StationReading = z.infer<typeof readingSchema>;

export const morningEndpoints = {
  daybreak: endpoint({ id: 'daybreak', method: 'get', path: '/api/farms/:farmId/daybreak', summary: 'The coming morning and the five after it.', access: { resource: 'morning', action: 'read' }, params: farmParams, answer: daybreakSchema }),
  readMorning: endpoint({ id: 'readMorning', method: 'get', path: '/api/farms/:farmId/mornings/:date', summary: 'One morning step by step, with every limit.', access: { resource: 'morning', action: 'read' }, params: farmParams.extend({ date: dateSchema }), answer: morningSchema }),
  refresh: endpoint({ id: 'refreshForecast', method: 'post', path: '/api/farms/:farmId/daybreak/refresh', summary: 'Fetch the newest forecast and assess anew.', access: { resource: 'morning', action: 'run' }, params: farmParams, answer: daybreakSchema }),
  listReadings: endpoint({ id: 'listReadings', method: 'get', path: '/api/farms/:farmId/readings', summary: 'Measurements made on the farm, newest first.', access: { resource: 'reading', action: 'read' }, params: farmParams, answer: z.object({ items: z.array(readingSchema) }) }),
  createReading: endpoint({ id: 'createReading', method: 'post', path: '/api/farms/:farmId/readings', summary: 'Add a measurement made on the farm.', access: { resource: 'reading', action: 'create' }, params: farmParams, body: readingBody, answer: readingSchema, status: 201 }),
  deleteReading: endpoint({ id: 'deleteReading', method: 'delete', path: '/api/farms/:farmId/readings/:id', summary: 'Take back a measurement entered in error.', access: { resource: 'reading', action: 'archive' }, params: farmItemParams }),
};
