import { z } from 'zod';
import { clockTimeSchema, editedFrom, farmItemParams, farmParams, idSchema, instantSchema, listQuery, nameSchema, notesSchema, polygonSchema, storedSchema } from './common.ts';
import { endpoint } from './endpoint.ts';
import { unitsSchema } from './accounts.ts';

export const exposureSchema = z.enum(['open', 'sheltered', 'valleyFloor', 'hilltop']);
const latitude = z.number({ error: 'must be a latitude in degrees, such as 44.05' }).min(-90, 'must be at least −90').max(90, 'must be at most 90');
const longitude = z.number({ error: 'must be a longitude in degrees, such as -123.1' }).min(-180, 'must be at least −180').max(180, 'must be at most 180');

/** What a person enters for a farm. The time zone is found from the position. */
export const farmBody = z.object({
  name: nameSchema,
  latitude,
  longitude,
  elevationM: z.number().min(-430, 'must be at least −430 m').max(6000, 'must be at most 6000 m'),
  exposure: exposureSchema.default('open'),
  units: unitsSchema.default('us'),
  /** Local time of the eve notice. */
  eveTime: clockTimeSchema.default('20:00'),
  dawnLeadMinutes: z.number().int().min(0, 'must be at least 0').max(180, 'must be at most 180 minutes').default(30),
});
export const farmSchema = farmBody.extend({ id: idSchema, timeZone: z.string(), version: z.number().int(), archivedAt: instantSchema.nullable(), createdAt: instantSchema, updatedAt: instantSchema });
export type Farm = z.infer<typeof farmSchema>;

export const blockBody = z.object({
  name: nameSchema,
  crop: nameSchema,
  species: z.string().trim().max(120).default(''),
  areaHa: z.number().positive('must be more than 0').max(1000, 'must be at most 1000 ha'),
  trees: z.number().int().min(0).max(1_000_000).nullable().default(null),
  rows: z.number().int().min(0).max(10_000).nullable().default(null),
  polygon: polygonSchema.nullable().default(null),
  notes: notesSchema,
});
export const blockSchema = blockBody.extend(storedSchema.shape);
export type Block = z.infer<typeof blockSchema>;

export const placeKinds = ['hives', 'house', 'water', 'road', 'school'] as const;
export const placeBody = z.object({
  name: nameSchema,
  kind: z.enum(placeKinds),
  /** Bearing from the farm to the place, degrees clockwise from true north. */
  bearingDeg: z.number().min(0, 'must be 0 to 360').max(360, 'must be 0 to 360'),
  distanceM: z.number().min(0, 'must not be negative').max(50_000, 'must be at most 50 km'),
  polygon: polygonSchema.nullable().default(null),
  contactName: z.string().trim().max(120).default(''),
  contactEmail: z.union([z.literal(''), z.email('must be an e-mail address such as name@example.org').max(254)]).default(''),
  notes: notesSchema,
});
export const placeSchema = placeBody.extend(storedSchema.shape);
export type SensitivePlace = z.infer<typeof placeSchema>;

export const sprayerTypes = ['backpackMistBlower', 'backpackSprayer', 'airblast', 'handgun'] as const;
/** Droplet size classes of ASABE S572.3, fine to coarse (from memory). */
export const dropletClasses = ['veryFine', 'fine', 'medium', 'coarse'] as const;
export const sprayerBody = z.object({
  name: nameSchema,
  type: z.enum(sprayerTypes).default('backpackMistBlower'),
  tankL: z.number().positive('must be more than 0').max(5000, 'must be at most 5000 L'),
  dropletClass: z.enum(dropletClasses).default('fine'),
  minutesPerTank: z.number().positive('must be more than 0').max(240, 'must be at most 240 minutes'),
  changeOverMinutes: z.number().min(0, 'must not be negative').max(120, 'must be at most 120 minutes'),
  notes: notesSchema,
});
export const sprayerSchema = sprayerBody.extend(storedSchema.shape);
export type Sprayer = z.infer<typeof sprayerSchema>;

const under = (noun: string) => `/api/farms/:farmId/${noun}`;

/** The five operations that every thing kept by a farm has. */
export function keptEndpoints<B extends z.ZodObject, A extends z.ZodObject>(
  noun: string,
  one: string,
  resource: 'block' | 'sensitivePlace' | 'sprayer' | 'product' | 'plan',
  body: B,
  answer: A,
) {
  const title = one[0]!.toUpperCase() + one.slice(1);
  return {
    list: endpoint({ id: `list${title}s`, method: 'get', path: under(noun), summary: `List the farm's ${noun.replace('-', ' ')}.`, access: { resource, action: 'read' }, params: farmParams, query: listQuery, answer: z.object({ items: z.array(answer) }) }),
    read: endpoint({ id: `read${title}`, method: 'get', path: `${under(noun)}/:id`, summary: `Read one of the farm's ${noun.replace('-', ' ')}.`, access: { resource, action: 'read' }, params: farmItemParams, answer }),
    create: endpoint({ id: `create${title}`, method: 'post', path: under(noun), summary: `Add to the farm's ${noun.replace('-', ' ')}.`, access: { resource, action: 'create' }, params: farmParams, body, answer, status: 201 }),
    update: endpoint({ id: `update${title}`, method: 'put', path: `${under(noun)}/:id`, summary: `Change one of the farm's ${noun.replace('-', ' ')}; 409 when another person changed it since.`, access: { resource, action: 'update' }, params: farmItemParams, body: body.extend(editedFrom.shape), answer }),
    archive: endpoint({ id: `archive${title}`, method: 'patch', path: `${under(noun)}/:id/archived`, summary: `Archive one of the farm's ${noun.replace('-', ' ')}, or bring it back.`, access: { resource, action: 'archive' }, params: farmItemParams, body: z.object({ archived: z.boolean() }), answer }),
  };
}

export const farmEndpoints = {
  createFarm: endpoint({ id: 'createFarm', method: 'post', path: '/api/farms', summary: 'Open a farm; the caller becomes its owner.', access: 'signedIn', body: farmBody, answer: farmSchema, status: 201 }),
  readFarm: endpoint({ id: 'readFarm', method: 'get', path: '/api/farms/:farmId', summary: 'Read the farm.', access: { resource: 'farm', action: 'read' }, params: farmParams, answer: farmSchema }),
  updateFarm: endpoint({ id: 'updateFarm', method: 'put', path: '/api/farms/:farmId', summary: 'Change the farm.', access: { resource: 'farm', action: 'update' }, params: farmParams, body: farmBody.extend(editedFrom.shape), answer: farmSchema }),
  archiveFarm: endpoint({ id: 'archiveFarm', method: 'patch', path: '/api/farms/:farmId/archived', summary: 'Archive the farm, or bring it back; an archived farm gets no notices.', access: { resource: 'farm', action: 'archive' }, params: farmParams, body: z.object({ archived: z.boolean() }), answer: farmSchema }),
  blocks: keptEndpoints('blocks', 'block', 'block', blockBody, blockSchema),
  places: keptEndpoints('sensitive-places', 'sensitivePlace', 'sensitivePlace', placeBody, placeSchema),
  sprayers: keptEndpoints('sprayers', 'sprayer', 'sprayer', sprayerBody, sprayerSchema),
};
