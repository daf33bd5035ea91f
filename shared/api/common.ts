import { z } from 'zod';

export const idSchema = z.uuid();
/** UTC instant, ISO 8601 with milliseconds. */
export const instantSchema = z.iso.datetime();
export const dateSchema = z.iso.date();
/** Local clock time, `HH:MM`. */
export const clockTimeSchema = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'must be a time such as 20:00');
export const emailSchema = z.email('must be an e-mail address such as name@example.org').max(254).transform((text) => text.toLowerCase());
export const nameSchema = z.string().trim().min(1, 'must not be empty').max(120, 'must be at most 120 characters');
export const notesSchema = z.string().trim().max(4000, 'must be at most 4000 characters').default('');

export const farmParams = z.object({ farmId: idSchema });
export const farmItemParams = z.object({ farmId: idSchema, id: idSchema });

/** One thing wrong with a request: where, and what to do. */
export const problemItemSchema = z.object({ path: z.string(), message: z.string() });

/** RFC 9457 problem details, with every problem of the request listed. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string().optional(),
  instance: z.string().optional(),
  problems: z.array(problemItemSchema).optional(),
});
export type Problem = z.infer<typeof problemSchema>;

/** 409 after two people edited one thing: both versions, who changed it (null: a person no longer here) and when. */
export const conflictSchema = problemSchema.extend({ theirs: z.record(z.string(), z.unknown()), yours: z.record(z.string(), z.unknown()), changedBy: z.string().nullable(), changedAt: instantSchema });
export type Conflict = z.infer<typeof conflictSchema>;

/** What every stored thing of a farm carries. */
export const storedSchema = z.object({
  id: idSchema,
  farmId: idSchema,
  /** Counts changes; send it back with an edit, so that two people editing one thing are told. */
  version: z.number().int(),
  archivedAt: instantSchema.nullable(),
  createdAt: instantSchema,
  updatedAt: instantSchema,
});

/** `version` of the copy an edit was made from; left out, the edit wins without asking. */
export const editedFrom = z.object({ version: z.number().int().optional() });

export const listQuery = z.object({ archived: z.enum(['no', 'yes', 'all']).default('no') });

/** Positions `[longitude, latitude]`, degrees, the last the same as the first. */
const ringSchema = z
  .array(z.tuple([z.number().min(-180).max(180), z.number().min(-90).max(90)]))
  .min(4, 'must have at least three corners')
  .max(500, 'must have at most 499 corners')
  .refine((ring) => ring[0]?.[0] === ring.at(-1)?.[0] && ring[0]?.[1] === ring.at(-1)?.[1], 'must end where it begins');
/** A polygon of GeoJSON (RFC 7946). */
export const polygonSchema = z.object({ type: z.literal('Polygon'), coordinates: z.array(ringSchema).min(1).max(10) });
export type Polygon = z.infer<typeof polygonSchema>;
