import { z } from 'zod';
import { limitNames, windowSchema } from '../assessment/answer.ts';
import { dateSchema, idSchema, instantSchema } from './common.ts';
import { noticeKinds } from './notices.ts';

const verdictSchema = z.enum(['go', 'hold']);

/** Body of an outgoing webhook: one notice, signed after Standard Webhooks. */
export const noticeEventSchema = z.object({
  type: z.enum(noticeKinds.map((kind) => `notice.${kind}` as const)),
  timestamp: instantSchema,
  data: z.object({
    noticeId: idSchema,
    farmId: idSchema,
    farmName: z.string(),
    /** Local date of the morning. */
    date: dateSchema,
    timeZone: z.string(),
    /** Higher is newer, within one farm and date. */
    sequence: z.number().int(),
    title: z.string(),
    verdict: verdictSchema.nullable(),
    enoughToTell: z.boolean().nullable(),
    dueAt: instantSchema,
    usefulUntil: instantSchema,
    plans: z.array(
      z.object({
        planId: idSchema.nullable(),
        planName: z.string(),
        verdict: verdictSchema,
        enoughToTell: z.boolean(),
        bindingLimit: z.enum([...limitNames, 'time', 'data']).nullable(),
        window: windowSchema.nullable(),
        headline: z.string(),
      }),
    ),
    /** Page of the morning. */
    url: z.url(),
  }),
});
export type NoticeEvent = z.infer<typeof noticeEventSchema>;
