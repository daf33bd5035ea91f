import { z } from 'zod';
import { hourSchema } from '../assessment/case.ts';
import { instantSchema } from './common.ts';

/** Body of an inbound forecast message. */
export const inboundForecastSchema = z.discriminatedUnion('type', [
  /** Word only: fetch the newest from the farm's provider. */
  z.object({ type: z.literal('forecast.issued'), timestamp: instantSchema.optional() }),
  /** The series itself, in canonical hours. */
  z.object({
    type: z.literal('forecast.hours'),
    timestamp: instantSchema.optional(),
    data: z.object({ model: z.string().max(120).nullable().default(null), issuedAt: instantSchema.nullable().default(null), hours: z.array(hourSchema).min(1).max(24 * 17) }),
  }),
]);
export type InboundForecast = z.infer<typeof inboundForecastSchema>;
