import { randomUUID } from 'node:crypto';
import { webhookEndpoints } from '../../shared/api/notices.ts';
import { audit } from '../accounts/audit.ts';
import { createGuard, RefusedTarget } from '../delivery/net/guard.ts';
import { newWebhookSecret, sealWebhookSecret } from '../delivery/webhook/secrets.ts';
import { signedIn, type Register } from '../http/route.ts';
import { HttpProblem, invalid, notFound } from '../http/problem.ts';
import type { WebhookRow } from '../models/notices.ts';
import { webhookDelivery } from '../notices/fan-out.ts';
import { queueTest } from '../notices/test-notice.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

export function webhookRoutes(register: Register, services: Services, _parts: Parts): void {
  const { models, clock, settings, sequelize } = services;
  const guard = createGuard(settings.permittedHosts);

  async function checkTarget(url: string): Promise<void> {
    await guard.check(url).catch((error: unknown) => {
      throw error instanceof RefusedTarget ? invalid([{ path: 'url', message: `cannot be used: ${error.message}` }]) : error;
    });
  }

  register(webhookEndpoints.list, async ({ params }) => {
    const rows = await models.webhooks.findAll({ where: { farmId: params.farmId }, order: [['createdAt', 'ASC'], ['id', 'ASC']] });
    return { items: rows.map((row) => presentWebhook(row.get({ plain: true }))) };
  });

  register(webhookEndpoints.create, async ({ params, body, caller }) => {
    const who = signedIn(caller);
    await checkTarget(body.url);
    const secret = newWebhookSecret();
    const now = clock.now();
    const row: WebhookRow = {
      id: randomUUID(), farmId: params.farmId, name: body.name, url: body.url, kinds: [...new Set(body.kinds)], secretSealed: sealWebhookSecret(settings.secret, secret), active: true, disabledBecause: null,
      failingSince: null, lastDeliveredAt: null, createdAt: now, updatedAt: now,
    };
    await sequelize.transaction(async (transaction) => {
      await models.webhooks.create(row, { transaction });
      await audit(services, transaction, { farmId: params.farmId, userId: who.userId, what: 'webhook added', subject: body.name, details: { host: new URL(body.url).host } });
    });
    return { ...presentWebhook(row), secret };
  });

  register(webhookEndpoints.update, async ({ params, body, caller }) => {
    const who = signedIn(caller);
    await checkTarget(body.url);
    return sequelize.transaction(async (transaction) => {
      const row = await models.webhooks.findOne({ where: { id: params.id, farmId: params.farmId }, transaction, lock: transaction.LOCK.UPDATE });
      if (!row) throw notFound();
      // Switched on again, its failures are forgotten.
      const switched = body.active ? { disabledBecause: null, failingSince: null } : { disabledBecause: row.active ? 'Switched off by a person.' : row.disabledBecause };
      await row.update({ name: body.name, url: body.url, kinds: [...new Set(body.kinds)], active: body.active, ...switched, updatedAt: clock.now() }, { transaction });
      await audit(services, transaction, { farmId: params.farmId, userId: who.userId, what: 'webhook changed', subject: body.name, details: { host: new URL(body.url).host, active: body.active } });
      return presentWebhook(row.get({ plain: true }));
    });
  });

  register(webhookEndpoints.remove, async ({ params, caller }) => {
    const who = signedIn(caller);
    await sequelize.transaction(async (transaction) => {
      const row = await models.webhooks.findOne({ where: { id: params.id, farmId: params.farmId }, transaction });
      if (!row) throw notFound();
      await row.destroy({ transaction });
      await audit(services, transaction, { farmId: params.farmId, userId: who.userId, what: 'webhook removed', subject: row.name });
    });
    return undefined;
  });

  register(webhookEndpoints.test, async ({ params }) => {
    const webhook = await models.webhooks.findOne({ where: { id: params.id, farmId: params.farmId } });
    if (!webhook) throw notFound();
    if (!webhook.active) throw new HttpProblem(409, 'This webhook is switched off; switch it on, then test it.');
    return { deliveryId: await queueTest(services, params.farmId, (notice, content) => webhookDelivery(services, notice, content, webhook)) };
  });
}

const presentWebhook = ({ id, farmId, name, url, kinds, active, disabledBecause, createdAt, lastDeliveredAt }: WebhookRow) => ({
  id, farmId, name, url, kinds, active, disabledBecause, createdAt: createdAt.toISOString(), lastDeliveredAt: lastDeliveredAt?.toISOString() ?? null,
});
