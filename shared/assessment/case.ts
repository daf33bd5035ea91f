import { z } from 'zod';
import { dropletClasses } from '../droplets/classes.ts';
import { releaseHeightValidity, usualReleaseHeightM } from '../droplets/drift-reach.ts';
import { crossFieldProblems } from './case-rules.ts';

/** A finite number that may be absent: null means "not known", never zero. */
const known = (min: number, max: number) => z.number().min(min).max(max).nullable().default(null);

/** UTC instant on the hour, e.g. `2026-06-10T11:00:00Z`. */
const hourStart = z.iso
  .datetime({ offset: false })
  .refine((text) => Number.isFinite(Date.parse(text)) && Date.parse(text) % 3_600_000 === 0, 'must be the start of an hour in UTC, such as 2026-06-10T11:00:00Z');

/**
 * The canonical hour: what every provider's answer is brought to.
 * `time` is the START of the hour in UTC. State values (temperature, humidity, wind, cloud) hold AT `time`;
 * `precipitationMm`, `precipitationProbabilityPct`, `windGust10mMs` (maximum) and `shortwaveWm2` (mean) hold over [time, time + 1 h).
 */
export const hourSchema = z.strictObject({
  time: hourStart,
  temperature2mC: known(-60, 60),
  dewPoint2mC: known(-80, 50),
  relativeHumidityPct: known(0, 100),
  windSpeed10mMs: known(0, 100),
  windGust10mMs: known(0, 150),
  windFromDeg: known(0, 360),
  cloudCoverPct: known(0, 100),
  precipitationMm: known(0, 500),
  precipitationProbabilityPct: known(0, 100),
  shortwaveWm2: known(0, 1500),
  temperature80mC: known(-60, 60),
});
export type ForecastHour = z.infer<typeof hourSchema>;

export const siteSchema = z.strictObject({
  latitude: z.number().min(-90).max(90),
  longitude: z.number().min(-180).max(180),
  elevationM: z.number().min(-430).max(6000),
  /** IANA zone name. */
  timeZone: z.string().min(1).max(64),
  /** How the place lies; valley floors hold inversions longer, hilltops lose them sooner. */
  exposure: z.enum(['open', 'sheltered', 'valleyFloor', 'hilltop']).optional(),
});
export type Site = z.infer<typeof siteSchema>;

export const beeKinds = ['honeyBee', 'bumbleBee', 'masonBee'] as const;
export type BeeKind = (typeof beeKinds)[number];
export const beeStatements = ['none', 'notWhileForaging', 'notInBloom'] as const;

export const limitsSchema = z.strictObject({
  windMaxMs: z.number().positive().max(30).optional(),
  /** Still air: dead-calm dawn air is inversion air. */
  windMinMs: z.number().min(0).max(10).optional(),
  gustMaxMs: z.number().positive().max(50).optional(),
  /** Height at which the label means its wind figures. */
  windHeightM: z.number().min(0.5).max(20).default(2),
  /** Greatest inversion likelihood borne, 0–1. */
  inversionMax: z.number().min(0).max(1).optional(),
  rainFreeHours: z.number().min(0).max(72).optional(),
  /** An hour with at least this much rain ends the dry spell. */
  rainMm: z.number().min(0).max(50).default(0.2),
  /** An hour with at least this chance of rain ends the dry spell; null = judged on the amount alone (a provider that tells no chance). */
  rainProbabilityPct: z.number().min(0).max(100).nullable().default(40),
  /** Greatest chance of any rain in all the dry hours together, on the cautious end 1 − Π(1 − p). */
  rainChanceMaxPct: z.number().min(0).max(100).optional(),
  foliageDry: z.boolean().optional(),
  pollinators: z
    .strictObject({
      kinds: z.array(z.enum(beeKinds)).min(1),
      bloom: z.boolean(),
      beeStatement: z.enum(beeStatements),
    })
    .optional(),
  temperatureMinC: z.number().min(-40).max(60).optional(),
  temperatureMaxC: z.number().min(-40).max(60).optional(),
  deltaTMinC: z.number().min(0).max(30).optional(),
  deltaTMaxC: z.number().min(0).max(30).optional(),
});
export type Limits = z.infer<typeof limitsSchema>;

export const sensitivePlaceSchema = z.strictObject({
  name: z.string().min(1).max(120),
  /** Bearing FROM the block TO the place, degrees clockwise from north. */
  bearingDeg: z.number().min(0).max(360),
  distanceM: z.number().min(0).max(50_000),
});

/** One measurement made on the farm; a reading on site beats any forecast. */
export const readingSchema = z.strictObject({
  time: z.iso.datetime({ offset: false }),
  windSpeedMs: known(0, 100),
  windHeightM: z.number().min(0.5).max(20).default(2),
  windFromDeg: known(0, 360),
  temperatureC: known(-60, 60),
  relativeHumidityPct: known(0, 100),
});
export type Reading = z.infer<typeof readingSchema>;

/** What carries the spray; decides how far the finer droplets may go. */
export const caseSprayerSchema = z.strictObject({
  dropletClass: z.enum(dropletClasses).default('fine'),
  /** Top of the spray above ground. */
  releaseHeightM: z.number().min(releaseHeightValidity.releaseHeightM[0]).max(releaseHeightValidity.releaseHeightM[1]).default(usualReleaseHeightM),
});

const caseFields = z.strictObject({
  site: siteSchema,
  /** Local calendar date of the morning in the site's zone. */
  date: z.iso.date(),
  minutesNeeded: z.number().min(0).max(720),
  reserveMinutes: z.number().min(0).max(240).default(0),
  limits: limitsSchema,
  sensitivePlaces: z.array(sensitivePlaceSchema).max(100).default([]),
  /** In order, one per hour, none doubled. Gaps are allowed and count as unknown. */
  hours: z.array(hourSchema).max(24 * 17),
  readings: z.array(readingSchema).max(2000).default([]),
  /** Left out: the fine droplets of a backpack mist blower. */
  sprayer: caseSprayerSchema.optional(),
});

/** Everything that one assessment needs: the contract of `npm run assess`. */
export const caseSchema = caseFields.superRefine((theCase, context) => {
  for (const { path, message } of crossFieldProblems(theCase)) context.addIssue({ code: 'custom', path, message });
});
export type AssessmentCase = z.infer<typeof caseSchema>;
