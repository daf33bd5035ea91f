import { z } from 'zod';
import { beeKinds } from './case.ts';

export const limitNames = ['wind', 'gusts', 'stillAir', 'inversion', 'rainFree', 'wetFoliage', 'pollinators', 'temperature', 'deltaT', 'towardSensitivePlace'] as const;
export type LimitName = (typeof limitNames)[number];

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

/** The answer of one assessment. All instants are UTC ISO 8601. */
export const answerSchema = z.object({
  verdict: z.enum(['go', 'hold']),
  /** False when the verdict is a hold for want of data: "not enough to tell". */
  enoughToTell: z.boolean(),
  bindingLimit: z.enum([...limitNames, 'time', 'data']).nullable(),
  reasons: z.array(reasonSchema),
  windows: z.array(windowSchema),
  sun: sunSchema,
  steps: z.array(stepSchema),
});
export type AssessmentAnswer = z.infer<typeof answerSchema>;
