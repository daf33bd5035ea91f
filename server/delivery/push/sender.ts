import { Op } from 'sequelize';
import webPush from 'web-push';
import type { DeviceRow } from '../../models/notices.ts';
import type { Services } from '../../services.ts';
import type { Guard } from '../net/guard.ts';
import { failureOutcome } from '../net/failure.ts';
import type { PushPayload } from '../payloads.ts';
import { clipped, retryAfterSeconds, type ClaimedDelivery, type Outcome, type Sender, type Settled } from '../sender.ts';
import { acknowledgementToken } from './acknowledgement.ts';
import type { PushKeys } from './keys.ts';
import { pushMessage } from './message.ts';
import { VapidTokens } from './token.ts';

const timeoutMs = 10_000;
/** Answers of a service that means the subscription, not the message: it was made under another key. */
const subscriptionLost = /VapidPkHashMismatch|UnauthorizedRegistration/;

/** Web Push: RFC 8030 (transport), 8291 (encryption), 8292 (VAPID). */
export function createPushSender(services: Services, keys: PushKeys, guard: Guard): Sender {
  const { models, settings, clock } = services;
  const tokens = new VapidTokens(clock, settings.contact);

  async function post(delivery: ClaimedDelivery, device: DeviceRow, short: boolean): Promise<Response> {
    const payload = delivery.payload as PushPayload;
    const now = clock.now();
    const key = keys.byId(device.vapidKeyId)!;
    const text = pushMessage(payload, { origin: settings.publicUrl, token: acknowledgementToken(settings.secret, delivery.id), dueAt: delivery.dueAt, now, short });
    const { cipherText } = webPush.encrypt(device.p256dh, device.auth, text, 'aes128gcm');
    return guard.fetch(device.endpoint, {
      headers: {
        Authorization: tokens.header(new URL(device.endpoint).origin, key),
        'Content-Type': 'application/octet-stream',
        'Content-Encoding': 'aes128gcm',
        // The message dies with what it tells: a push of this morning must not come tomorrow.
        TTL: String(Math.max(0, Math.floor((delivery.usefulUntil.getTime() - now.getTime()) / 1000))),
        Urgency: payload.urgency,
        Topic: payload.topic,
      },
      body: new Uint8Array(cipherText),
      timeoutMs,
    });
  }

  async function answer(response: Response): Promise<Outcome> {
    const { status } = response;
    const told = clipped((await response.text().catch(() => '')).trim(), 300);
    const detail = `The push service answered ${status}${told ? `: ${told}` : ''}.`;
    if (status >= 200 && status < 300) return { kind: 'accepted', status, detail: null };
    if (status === 404 || status === 410 || (status === 400 && subscriptionLost.test(told))) return { kind: 'gone', status, detail };
    if (status === 429 || status >= 500) return { kind: 'retry', status, detail, retryAfterSeconds: retryAfterSeconds(response.headers.get('retry-after'), clock.now()) };
    if (status === 401 || status === 403) {
      // Ours to put right (key, clock, contact address) and true for every device: keep trying while it helps.
      services.log.error({ status, told }, 'the push service refuses the VAPID token');
      return { kind: 'retry', status, detail, retryAfterSeconds: null };
    }
    return { kind: 'refused', status, detail };
  }

  async function send(delivery: ClaimedDelivery, device: DeviceRow | undefined): Promise<Outcome> {
    if (!device) return { kind: 'gone', status: null, detail: 'This device was removed.' };
    if (!keys.byId(device.vapidKeyId)) return { kind: 'gone', status: null, detail: 'This device was enabled under a key that the server has no more; enable it again.' };
    try {
      const response = await post(delivery, device, false);
      if (response.status !== 413) return await answer(response);
      void response.body?.cancel().catch(() => undefined);
      return await answer(await post(delivery, device, true));
    } catch (error) {
      return failureOutcome(error);
    }
  }

  return {
    channel: 'push',
    async prepare(deliveries) {
      const rows = await models.devices.findAll({ where: { id: [...new Set(deliveries.map(({ target }) => target))], goneAt: null } });
      const devices = new Map(rows.map((row) => [row.id, row.get({ plain: true })]));
      return (delivery) => send(delivery, devices.get(delivery.target));
    },
    async settle(transaction, settled) {
      const now = clock.now();
      const targets = (kind: Outcome['kind']) => settled.filter((one: Settled) => one.outcome.kind === kind).map(({ delivery }) => delivery.target);
      const accepted = targets('accepted');
      const gone = targets('gone');
      if (accepted.length > 0) await models.devices.update({ lastAcceptedAt: now }, { where: { id: { [Op.in]: accepted } }, transaction });
      if (gone.length > 0) await models.devices.update({ goneAt: now }, { where: { id: { [Op.in]: gone }, goneAt: null }, transaction });
    },
    stop: async () => undefined,
  };
}
