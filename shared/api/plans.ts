import { z } from 'zod';
import { beeKinds, beeStatements } from '../assessment/case.ts';
import { dateSchema, farmItemParams, idSchema, instantSchema, nameSchema, notesSchema, storedSchema } from './common.ts';
import { endpoint } from './endpoint.ts';
import { keptEndpoints } from './farms.ts';

/** Rates as labels state them; amounts are of product, not of mix. */
export const rateUnits = ['flOzPerAcre', 'ozPerAcre', 'lbPerAcre', 'mLPerHa', 'gPerHa', 'lPerHa', 'kgPerHa'] as const;
export type RateUnit = (typeof rateUnits)[number];
export const moaSystems = ['IRAC', 'FRAC', 'HRAC', 'none'] as const;

const optional = (min: number, max: number, unit: string) =>
  z.number().min(min, `must be at least ${min} ${unit}`).max(max, `must be at most ${max} ${unit}`).nullable().default(null);

/** What the grower copied from the label in hand. Nothing here is known to Dawnvane by itself. */
const productFields = z.object({
  name: nameSchema,
  epaRegistrationNumber: z.string().trim().max(40).regex(/^$|^\d{1,6}-\d{1,6}(-\d{1,6})?$/, 'must look like 1234-567, as on the label').default(''),
  activeIngredients: z.string().trim().max(400).default(''),
  moaSystem: z.enum(moaSystems).default('IRAC'),
  moaGroup: z.string().trim().max(20).default(''),
  rateMin: z.number().positive('must be more than 0').max(10_000),
  rateMax: z.number().positive('must be more than 0').max(10_000),
  rateUnit: z.enum(rateUnits),
  carrierMinLHa: optional(0, 10_000, 'L/ha'),
  carrierMaxLHa: optional(0, 10_000, 'L/ha'),
  adjuvantWanted: z.string().trim().max(200).default(''),
  adjuvantForbidden: z.string().trim().max(200).default(''),
  windMaxMs: optional(0.1, 30, 'm/s'),
  windMinMs: optional(0, 10, 'm/s'),
  windHeightM: z.number().min(0.5, 'must be at least 0.5 m').max(20, 'must be at most 20 m').default(2),
  gustMaxMs: optional(0.1, 50, 'm/s'),
  inversionProhibited: z.boolean().default(true),
  rainFreeHours: optional(0, 72, 'hours'),
  temperatureMinC: optional(-40, 60, '°C'),
  temperatureMaxC: optional(-40, 60, '°C'),
  beeStatement: z.enum(beeStatements).default('none'),
  reiHours: optional(0, 24 * 60, 'hours'),
  phiDays: optional(0, 730, 'days'),
  maxApplicationsPerSeason: z.number().int().min(1).max(50).nullable().default(null),
  /** In the unit of the rate, times area: `flOzPerAcre` gives fl oz per acre and season. */
  maxRatePerSeason: optional(0, 100_000, ''),
  minIntervalDays: optional(0, 365, 'days'),
  restrictedUse: z.boolean().default(false),
  notes: notesSchema,
});
export const productBody = productFields;
/** Rules between fields; run beside `productBody` by form and server. */
export function productProblems(product: z.infer<typeof productFields>): { path: string; message: string }[] {
  const problems: { path: string; message: string }[] = [];
  const order = (low: number | null, high: number | null, path: string, message: string) => {
    if (low !== null && high !== null && low > high) problems.push({ path, message });
  };
  order(product.rateMin, product.rateMax, 'rateMax', 'must not be less than the lowest rate');
  order(product.carrierMinLHa, product.carrierMaxLHa, 'carrierMaxLHa', 'must not be less than the lowest carrier volume');
  order(product.windMinMs, product.windMaxMs, 'windMaxMs', 'must not be less than the lowest wind');
  order(product.temperatureMinC, product.temperatureMaxC, 'temperatureMaxC', 'must not be less than the lowest temperature');
  return problems;
}
export const productSchema = productFields.extend({
  ...storedSchema.shape,
  /** Invented for the demo or the starter list: to be replaced by the label in hand. */
  isExample: z.boolean(),
  labelFile: z.object({ name: z.string(), bytes: z.number().int(), uploadedAt: instantSchema }).nullable(),
});
export type Product = z.infer<typeof productSchema>;

export const planStates = ['planned', 'done', 'cancelled'] as const;
export const planBody = z.object({
  name: nameSchema,
  target: z.string().trim().max(120).default(''),
  blockIds: z.array(idSchema).min(1, 'choose at least one block').max(50),
  products: z.array(z.object({ productId: idSchema, rate: z.number().positive('must be more than 0').max(10_000) })).min(1, 'choose at least one product').max(6),
  sprayerId: idSchema,
  carrierLHa: z.number().positive('must be more than 0').max(10_000, 'must be at most 10 000 L/ha'),
  firstDate: dateSchema,
  lastDate: dateSchema,
  /** Minutes kept free after the job, inside the window. */
  reserveMinutes: z.number().int().min(0).max(240).default(10),
  state: z.enum(planStates).default('planned'),
  /** Anything in bloom in or near the blocks, weeds under the trees included. */
  bloom: z.boolean().default(false),
  beeKinds: z.array(z.enum(beeKinds)).min(1, 'choose at least one kind').default([...beeKinds]),
  /** The grower's own limits; where the label is stricter, the label's hold. */
  windMaxMs: optional(0.1, 30, 'm/s'),
  windMinMs: optional(0, 10, 'm/s'),
  gustMaxMs: optional(0.1, 50, 'm/s'),
  inversionMax: optional(0, 1, ''),
  rainFreeHours: optional(0, 72, 'hours'),
  rainMm: z.number().min(0).max(50).default(0.2),
  rainProbabilityPct: z.number().min(0).max(100).default(40),
  foliageDry: z.boolean().default(false),
  deltaTMinC: optional(0, 30, '°C'),
  deltaTMaxC: optional(0, 30, '°C'),
  temperatureMinC: optional(-40, 60, '°C'),
  temperatureMaxC: optional(-40, 60, '°C'),
  notes: notesSchema,
});
/** Rules between fields; run beside `planBody` by form and server. */
export function planProblems(plan: z.infer<typeof planBody>): { path: string; message: string }[] {
  const problems: { path: string; message: string }[] = [];
  if (plan.firstDate > plan.lastDate) problems.push({ path: 'lastDate', message: 'must not be before the first date' });
  if (Date.parse(plan.lastDate) - Date.parse(plan.firstDate) > 92 * 86_400_000) problems.push({ path: 'lastDate', message: 'must be within three months of the first date' });
  if (plan.windMinMs !== null && plan.windMaxMs !== null && plan.windMinMs > plan.windMaxMs) problems.push({ path: 'windMaxMs', message: 'must not be less than the lowest wind' });
  if (new Set(plan.products.map((entry) => entry.productId)).size < plan.products.length) problems.push({ path: 'products', message: 'each product once only' });
  return problems;
}
export const planSchema = planBody.extend({
  ...storedSchema.shape,
  areaHa: z.number(),
  tanks: z.number(),
  minutesNeeded: z.number(),
});
export type Plan = z.infer<typeof planSchema>;

export const productEndpoints = {
  ...keptEndpoints('products', 'product', 'product', productBody, productSchema),
  uploadLabel: endpoint({ id: 'uploadLabel', method: 'post', path: '/api/farms/:farmId/products/:id/label', summary: 'Keep the label (PDF, at most 10 MB) with the product.', access: { resource: 'product', action: 'update' }, params: farmItemParams, bodyKind: 'multipart', answer: productSchema }),
  readLabel: endpoint({ id: 'readLabel', method: 'get', path: '/api/farms/:farmId/products/:id/label', summary: 'Read the label file.', access: { resource: 'product', action: 'read' }, params: farmItemParams, answerKind: 'application/pdf', status: 200 }),
};
export const planEndpoints = keptEndpoints('plans', 'plan', 'plan', planBody, planSchema);
