import { z } from 'zod';
import { beeKinds } from './case.ts';
import { limitNames, type LimitName } from './limit-names.ts';

export { limitNames, type LimitName };

/** `hard`: label, law or the grower's own; it holds. `advice`: shown, does not hold. */
export const limitKindSchema = z.enum(['hard', 'advice']);

export const limitAtStepSchema = z.object({
  /** In the limit's own unit (m/s, 0–1, hours, °C, degrees); null when it cannot be told. */
  value: z.number().nullable(),
  limit: z.number().nullable(),
  /** 1 = at ease, 0 = at the limit, negative = beyond; null = cannot be told. */
  headroom: z.number().min(-1).max(1).nullable(),
  kind: limitKindSchema,
});
export type LimitAtStep = z.infer<typeof limitAtStepSchema>;

export const reasonSchema = z.object({
  limit: z.enum([...limitNames, 'time', 'data']),
  kind: z.enum(['binding', 'hold', 'nearestMiss', 'notEnough', 'advice', 'caution']),
  /** UTC instant the reason speaks of, when it speaks of one. */
  at: z.string().nullable(),
  text: z.string(),
  /** Name of the sentence and what it is filled with (SI units, UTC instants), for saying it in other units or another language. */
  key: z.string().optional(),
  params: z.record(z.string(), z.unknown()).optional(),
});
export type Reason = z.infer<typeof reasonSchema>;

export const windowSchema = z.object({
  start: z.string(),
  end: z.string(),
  minutes: z.number(),
  /** Best and latest start inside the window, null when the job does not fit. */
  bestStart: z.string().nullable(),
  latestStart: z.string().nullable(),
});
export type SprayWindow = z.infer<typeof windowSchema>;

export const stepSchema = z.object({
  time: z.string(),
  sunAltitudeDeg: z.number(),
  limits: z.partialRecord(z.enum(limitNames), limitAtStepSchema),
  inversion: z.object({
    likelihood: z.number().min(0).max(1).nullable(),
    stabilityClass: z.enum(['A', 'B', 'C', 'D', 'E', 'F', 'G']).nullable(),
    evidence: z.array(z.string()),
  }),
  pollinators: z.partialRecord(z.enum(beeKinds), z.number().min(0).max(1).nullable()),
});
export type AssessmentStep = z.infer<typeof stepSchema>;

export const sunSchema = z.object({
  civilDawn: z.string().nullable(),
  sunrise: z.string().nullable(),
  solarNoon: z.string().nullable(),
  sunset: z.string().nullable(),
  localNoon: z.string(),
});

/** Start and end of flight of one kind within the morning: cautious (`possible…`) and likely; null where it does not happen. */
export const beeBandSchema = z.object({
  possibleFrom: z.string().nullable(),
  likelyFrom: z.string().nullable(),
  likelyUntil: z.string().nullable(),
  possibleUntil: z.string().nullable(),
});

/** The answer of one assessment. All instants are UTC ISO 8601. */
export const answerSchema = z.object({
  verdict: z.enum(['go', 'hold']),
  /** False when the verdict is a hold for want of data: "not enough to tell". */
  enoughToTell: z.boolean(),
  bindingLimit: z.enum([...limitNames, 'time', 'data']).nullable(),
  reasons: z.array(reasonSchema),
  windows: z.array(windowSchema),
  sun: sunSchema,
  /** By kind of bee, for the kinds the plan asks about. */
  beeActivity: z.partialRecord(z.enum(beeKinds), beeBandSchema).optional(),
  /** Wind here over the forecast's wind, learned from the farm's own readings; null below 5 usable ones. */
  siteWindFactor: z.object({ factor: z.number(), readings: z.number() }).nullable().optional(),
  steps: z.array(stepSchema),
});
export type AssessmentAnswer = z.infer<typeof answerSchema>;
