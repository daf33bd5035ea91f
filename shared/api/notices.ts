import { z } from 'zod';
import { dateSchema, farmItemParams, farmParams, idSchema, instantSchema, nameSchema } from './common.ts';
import { endpoint } from './endpoint.ts';

export const noticeKinds = ['eve', 'dawn', 'turn', 'summary', 'forecastMissing', 'test'] as const;
export type NoticeKind = (typeof noticeKinds)[number];
export const channels = ['push', 'email', 'webhook'] as const;
export type Channel = (typeof channels)[number];
export const deliveryStates = ['waiting', 'claimed', 'delivered', 'dead', 'dropped'] as const;

export const deliverySchema = z.object({
  id: idSchema,
  channel: z.enum(channels),
  /** A person's name and device, an address with its middle hidden, or a webhook's name. */
  recipient: z.string(),
  state: z.enum(deliveryStates),
  attempts: z.number().int(),
  dueAt: instantSchema,
  nextAttemptAt: instantSchema.nullable(),
  acceptedAt: instantSchema.nullable(),
  shownAt: instantSchema.nullable(),
  tappedAt: instantSchema.nullable(),
  lastError: z.string().nullable(),
});
export type Delivery = z.infer<typeof deliverySchema>;

export const noticeSchema = z.object({
  id: idSchema,
  kind: z.enum(noticeKinds),
  date: dateSchema,
  title: z.string(),
  text: z.string(),
  verdict: z.enum(['go', 'hold']).nullable(),
  enoughToTell: z.boolean().nullable(),
  /** Minutes after its moment, when it was told late. */
  lateMinutes: z.number().int(),
  createdAt: instantSchema,
  deliveries: z.array(deliverySchema),
});
export type Notice = z.infer<typeof noticeSchema>;

export const wishesBody = z.object({
  /** Which notices reach this person, by which channel. */
  push: z.array(z.enum(noticeKinds)),
  email: z.array(z.enum(noticeKinds)),
});
export type Wishes = z.infer<typeof wishesBody>;

export const deviceBody = z.object({
  name: nameSchema,
  endpoint: z.url('must be the address that the browser gave').max(1000),
  keys: z.object({ p256dh: z.string().min(80).max(100), auth: z.string().min(20).max(30) }),
});
export const deviceSchema = z.object({ id: idSchema, name: z.string(), pushService: z.string(), createdAt: instantSchema, lastAcceptedAt: instantSchema.nullable(), lastShownAt: instantSchema.nullable() });
export type Device = z.infer<typeof deviceSchema>;

/** Outgoing webhooks speak the open Standard Webhooks specification. */
export const webhookBody = z.object({
  name: nameSchema,
  url: z.url('must be an https address').max(1000).refine((url) => url.startsWith('https://'), 'must be an https address'),
  kinds: z.array(z.enum(noticeKinds)).min(1, 'choose at least one'),
});
export const webhookSchema = webhookBody.extend({ id: idSchema, farmId: idSchema, active: z.boolean(), disabledBecause: z.string().nullable(), createdAt: instantSchema, lastDeliveredAt: instantSchema.nullable() });
export type Webhook = z.infer<typeof webhookSchema>;
const secretAnswer = z.object({ /** Shown once. */ secret: z.string() });

export const inboundSourceBody = z.object({ name: nameSchema });
export const inboundSourceSchema = inboundSourceBody.extend({ id: idSchema, farmId: idSchema, createdAt: instantSchema, lastReceivedAt: instantSchema.nullable(), archivedAt: instantSchema.nullable() });
export type InboundSource = z.infer<typeof inboundSourceSchema>;

const farm = (noun: string) => `/api/farms/:farmId/${noun}`;

export const noticeEndpoints = {
  listNotices: endpoint({ id: 'listNotices', method: 'get', path: farm('notices'), summary: 'Notices with their deliveries, newest first.', access: { resource: 'notice', action: 'read' }, params: farmParams, query: z.object({ limit: z.coerce.number().int().min(1).max(200).default(50), before: instantSchema.optional() }), answer: z.object({ items: z.array(noticeSchema) }) }),
  replayDelivery: endpoint({ id: 'replayDelivery', method: 'post', path: farm('deliveries/:id/replay'), summary: 'Try a dead delivery again.', access: { resource: 'notice', action: 'run' }, params: farmItemParams, answer: deliverySchema }),
  readWishes: endpoint({ id: 'readWishes', method: 'get', path: farm('wishes'), summary: 'Which notices reach me, and how.', access: { resource: 'device', action: 'read' }, params: farmParams, answer: wishesBody }),
  updateWishes: endpoint({ id: 'updateWishes', method: 'put', path: farm('wishes'), summary: 'Choose which notices reach me, and how.', access: { resource: 'device', action: 'update' }, params: farmParams, body: wishesBody, answer: wishesBody }),
  pushKey: endpoint({ id: 'pushKey', method: 'get', path: '/api/push/key', summary: "The server's VAPID public key (RFC 8292).", access: 'signedIn', answer: z.object({ publicKey: z.string() }) }),
  listDevices: endpoint({ id: 'listDevices', method: 'get', path: farm('devices'), summary: 'My phones and browsers that get a push.', access: { resource: 'device', action: 'read' }, params: farmParams, answer: z.object({ items: z.array(deviceSchema) }) }),
  createDevice: endpoint({ id: 'createDevice', method: 'post', path: farm('devices'), summary: 'Enable this device; an endpoint known already is renewed.', access: { resource: 'device', action: 'create' }, params: farmParams, body: deviceBody, answer: deviceSchema, status: 201 }),
  deleteDevice: endpoint({ id: 'deleteDevice', method: 'delete', path: farm('devices/:id'), summary: 'Send no more push to this device of mine.', access: { resource: 'device', action: 'archive' }, params: farmItemParams }),
  testDevice: endpoint({ id: 'testDevice', method: 'post', path: farm('devices/:id/test'), summary: 'Send a test notice to this device of mine.', access: { resource: 'device', action: 'run' }, params: farmItemParams, answer: z.object({ deliveryId: idSchema }), status: 202 }),
  acknowledge: endpoint({ id: 'acknowledgePush', method: 'post', path: '/api/push/acknowledge', summary: 'The service worker tells that a push was shown or tapped; the token of the push names it.', access: 'public', body: z.object({ token: z.string().min(20).max(200), what: z.enum(['shown', 'tapped']) }) }),
};

export const webhookEndpoints = {
  list: endpoint({ id: 'listWebhooks', method: 'get', path: farm('webhooks'), summary: "The farm's outgoing webhooks.", access: { resource: 'webhook', action: 'read' }, params: farmParams, answer: z.object({ items: z.array(webhookSchema) }) }),
  create: endpoint({ id: 'createWebhook', method: 'post', path: farm('webhooks'), summary: 'Add an outgoing webhook; its secret is shown once.', access: { resource: 'webhook', action: 'create' }, params: farmParams, body: webhookBody, answer: webhookSchema.extend(secretAnswer.shape), status: 201 }),
  update: endpoint({ id: 'updateWebhook', method: 'put', path: farm('webhooks/:id'), summary: 'Change an outgoing webhook, or switch it on again.', access: { resource: 'webhook', action: 'update' }, params: farmItemParams, body: webhookBody.extend({ active: z.boolean() }), answer: webhookSchema }),
  remove: endpoint({ id: 'deleteWebhook', method: 'delete', path: farm('webhooks/:id'), summary: 'Remove an outgoing webhook.', access: { resource: 'webhook', action: 'archive' }, params: farmItemParams }),
  test: endpoint({ id: 'testWebhook', method: 'post', path: farm('webhooks/:id/test'), summary: 'Send a test event.', access: { resource: 'webhook', action: 'run' }, params: farmItemParams, answer: z.object({ deliveryId: idSchema }), status: 202 }),
};

export const hookEndpoints = {
  listSources: endpoint({ id: 'listInboundSources', method: 'get', path: farm('inbound-sources'), summary: 'Who may send forecasts or readings to this farm.', access: { resource: 'inboundSource', action: 'read' }, params: farmParams, answer: z.object({ items: z.array(inboundSourceSchema) }) }),
  createSource: endpoint({ id: 'createInboundSource', method: 'post', path: farm('inbound-sources'), summary: 'Admit a sender; its secret is shown once.', access: { resource: 'inboundSource', action: 'create' }, params: farmParams, body: inboundSourceBody, answer: inboundSourceSchema.extend(secretAnswer.shape), status: 201 }),
  archiveSource: endpoint({ id: 'archiveInboundSource', method: 'delete', path: farm('inbound-sources/:id'), summary: 'Admit this sender no longer.', access: { resource: 'inboundSource', action: 'archive' }, params: farmItemParams }),
  receiveForecast: endpoint({ id: 'receiveForecast', method: 'post', path: '/api/hooks/forecast/:source', summary: 'A signed message: a full hourly series, or word that a new issue is out.', access: 'signature', params: z.object({ source: idSchema }), bodyKind: 'raw', answer: z.object({ received: z.string() }), status: 202 }),
};

/** Body of the inbound forecast webhook, checked after its signature. */
export { inboundForecastSchema } from './inbound-forecast.ts';
