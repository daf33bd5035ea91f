import { Op } from 'sequelize';
import { Webhook } from 'standardwebhooks';
import type { WebhookRow } from '../../models/notices.ts';
import type { Services } from '../../services.ts';
import { failureOutcome } from '../net/failure.ts';
import type { Guard } from '../net/guard.ts';
import { clipped, retryAfterSeconds, type ClaimedDelivery, type Outcome, type Sender } from '../sender.ts';
import { unsealWebhookSecret } from './secrets.ts';

const timeoutMs = 15_000;
/** Of an answer's body this much is read; the log keeps less. */
const answerBytesMax = 4096;
/** A webhook that has failed for this long is switched off. */
const failingDaysMax = 5;

/** Identifier of the message: the same at every try, so that the receiver can tell a repeat (`webhook-id`). */
export const messageIdOf = (deliveryId: string): string => `msg_${deliveryId.replaceAll('-', '')}`;

/** Outgoing webhooks after the Standard Webhooks specification 1.0.0. */
export function createWebhookSender(services: Services, guard: Guard): Sender {
  const { models, settings, clock } = services;

  async function send(delivery: ClaimedDelivery, webhook: WebhookRow | undefined): Promise<Outcome> {
    if (!webhook) return { kind: 'refused', status: null, detail: 'The webhook is switched off or was removed.' };
    const now = clock.now();
    const id = messageIdOf(delivery.id);
    const body = JSON.stringify(delivery.payload);
    try {
      const signature = new Webhook(unsealWebhookSecret(settings.secret, webhook.secretSealed)).sign(id, now, body);
      const response = await guard.fetch(webhook.url, {
        headers: {
          'content-type': 'application/json; charset=utf-8',
          'user-agent': `Dawnvane/${settings.version}`,
          'webhook-id': id,
          'webhook-timestamp': String(Math.floor(now.getTime() / 1000)),
          'webhook-signature': signature,
        },
        body,
        timeoutMs,
      });
      return await answer(response);
    } catch (error) {
      return failureOutcome(error);
    }
  }

  async function answer(response: Response): Promise<Outcome> {
    const { status } = response;
    const told = await beginning(response);
    if (status >= 200 && status < 300) return { kind: 'accepted', status, detail: told || null };
    const detail = clipped(`The receiver answered ${status}${told ? `: ${told}` : ''}`);
    if (status === 410) return { kind: 'gone', status, detail };
    // A redirect is not followed: it could lead anywhere.
    return { kind: 'retry', status, detail, retryAfterSeconds: retryAfterSeconds(response.headers.get('retry-after'), clock.now()) };
  }

  return {
    channel: 'webhook',
    async prepare(deliveries) {
      const rows = await models.webhooks.findAll({ where: { id: [...new Set(deliveries.map(({ target }) => target))], active: true } });
      const webhooks = new Map(rows.map((row) => [row.id, row.get({ plain: true })]));
      return (delivery) => send(delivery, webhooks.get(delivery.target));
    },
    async settle(transaction, settled) {
      const now = clock.now();
      const failedSince = new Date(now.getTime() - failingDaysMax * 86_400_000);
      for (const [target, outcomes] of lastPerTarget(settled)) {
        const row = { where: { id: target }, transaction };
        if (outcomes.kind === 'accepted') await models.webhooks.update({ lastDeliveredAt: now, failingSince: null }, row);
        else if (outcomes.kind === 'gone') await models.webhooks.update({ active: false, disabledBecause: 'The receiver answered 410 Gone.', updatedAt: now }, row);
        else {
          await models.webhooks.update({ failingSince: now }, { where: { id: target, active: true, failingSince: null }, transaction });
          await models.webhooks.update(
            { active: false, disabledBecause: clipped(`Nothing could be delivered for ${failingDaysMax} days. ${outcomes.detail}`, 300), updatedAt: now },
            { where: { id: target, active: true, failingSince: { [Op.lte]: failedSince } }, transaction },
          );
        }
      }
    },
    stop: async () => undefined,
  };
}

/** The last outcome of each webhook in a batch. */
const lastPerTarget = (settled: { delivery: ClaimedDelivery; outcome: Outcome }[]): Map<string, Outcome> => new Map(settled.map(({ delivery, outcome }) => [delivery.target, outcome]));

/** The beginning of an answer's body; the rest is not read. */
async function beginning(response: Response): Promise<string> {
  const reader = response.body?.getReader();
  if (!reader) return '';
  const chunks: Uint8Array[] = [];
  let bytes = 0;
  try {
    while (bytes < answerBytesMax) {
      const { done, value } = await reader.read();
      if (done) break;
      chunks.push(value);
      bytes += value.byteLength;
    }
  } catch {
    // The status is told already; a body that breaks off changes nothing.
  } finally {
    // Not waited for: a far end that goes on sending must not hold the delivery.
    void reader.cancel().catch(() => undefined);
  }
  return clipped(Buffer.concat(chunks).subarray(0, answerBytesMax).toString('utf8').trim(), 300);
}
