import { z } from 'zod';
import { meSchema } from '../../shared/api/accounts.ts';
import { conflictSchema, polygonSchema, problemItemSchema, problemSchema } from '../../shared/api/common.ts';
import { blockSchema, farmSchema, placeSchema, sprayerSchema } from '../../shared/api/farms.ts';
import { daybreakSchema, forecastFactsSchema, morningSchema, planVerdictSchema, readingSchema } from '../../shared/api/mornings.ts';
import { noticeEventSchema } from '../../shared/api/notice-event.ts';
import { deliverySchema, deviceSchema, inboundForecastSchema, inboundSourceSchema, noticeSchema, webhookSchema, wishesBody } from '../../shared/api/notices.ts';
import { auditEntrySchema, invitationSchema, memberSchema } from '../../shared/api/people.ts';
import { planSchema, productSchema } from '../../shared/api/plans.ts';
import { healthSchema } from '../../shared/api/system.ts';
import { answerSchema } from '../../shared/assessment/answer.ts';
import { hourSchema } from '../../shared/assessment/case.ts';

export type Json = Record<string, unknown>;

/** Things that answers are made of, by the name that readers of the description see. */
const answers = {
  Problem: problemSchema, Conflict: conflictSchema, ProblemItem: problemItemSchema, Me: meSchema, Farm: farmSchema, Block: blockSchema, SensitivePlace: placeSchema, Sprayer: sprayerSchema, Product: productSchema, Plan: planSchema,
  Polygon: polygonSchema, Daybreak: daybreakSchema, Morning: morningSchema, PlanVerdict: planVerdictSchema, ForecastFacts: forecastFactsSchema, Assessment: answerSchema, Reading: readingSchema, Notice: noticeSchema,
  Delivery: deliverySchema, Device: deviceSchema, Wishes: wishesBody, Webhook: webhookSchema, InboundSource: inboundSourceSchema, Member: memberSchema, Invitation: invitationSchema, AuditEntry: auditEntrySchema, NoticeEvent: noticeEventSchema, Health: healthSchema,
} satisfies Record<string, z.ZodType>;

/** Things that requests are made of, where more than one operation or reader wants them by name. */
const requests = { InboundForecast: inboundForecastSchema, ForecastHour: hourSchema } satisfies Record<string, z.ZodType>;

function registryOf(named: Record<string, z.ZodType>) {
  const registry = z.registry<{ id?: string }>();
  for (const [id, schema] of Object.entries(named)) registry.add(schema, { id });
  return registry;
}
const registries = { output: registryOf(answers), input: registryOf(requests) };

const isObject = (value: unknown): value is Json => typeof value === 'object' && value !== null;

/** Refers to named schemas where OpenAPI keeps them. */
function referring(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(referring);
  if (!isObject(value)) return value;
  return Object.fromEntries(Object.entries(value).map(([key, part]) => [key, key === '$ref' && typeof part === 'string' ? part.replace('#/$defs/', '#/components/schemas/') : referring(part)]));
}

/** The schemas of one description, as they are met. */
export class SchemaBook {
  readonly schemas: Json = {};

  /** JSON Schema 2020-12 of what is read (`input`: before defaults) or sent (`output`); named schemas become references. */
  of(schema: z.ZodType, io: 'input' | 'output'): Json {
    const { $schema: _dialect, $defs = {}, id: _id, ...rest } = z.toJSONSchema(schema, { io, metadata: registries[io], unrepresentable: 'any', target: 'draft-2020-12' }) as Json;
    for (const [name, { id: _own, ...definition }] of Object.entries($defs as Record<string, Json>)) this.schemas[name] ??= referring(definition);
    const name = registries[io].get(schema)?.id;
    if (!name) return referring(rest) as Json;
    this.schemas[name] ??= referring(rest);
    return { $ref: `#/components/schemas/${name}` };
  }
}
