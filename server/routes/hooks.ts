import { randomUUID } from 'node:crypto';
import { hookEndpoints } from '../../shared/api/notices.ts';
import { audit } from '../accounts/audit.ts';
import { newWebhookSecret, sealWebhookSecret } from '../delivery/webhook/secrets.ts';
import { receiveForecast } from '../hooks/receive.ts';
import { signedIn, type Register } from '../http/route.ts';
import { HttpProblem, notFound } from '../http/problem.ts';
import type { InboundSourceRow } from '../models/notices.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

export function hookRoutes(register: Register, services: Services, { scheduler }: Parts): void {
  const { models, clock, settings, sequelize } = services;

  register(hookEndpoints.listSources, async ({ params }) => {
    const rows = await models.inboundSources.findAll({ where: { farmId: params.farmId }, order: [['createdAt', 'ASC'], ['id', 'ASC']] });
    return { items: rows.map((row) => presentSource(row.get({ plain: true }))) };
  });

  register(hookEndpoints.createSource, async ({ params, body, caller }) => {
    const who = signedIn(caller);
    const secret = newWebhookSecret();
    const row: InboundSourceRow = { id: randomUUID(), farmId: params.farmId, name: body.name, secretSealed: sealWebhookSecret(settings.secret, secret), lastReceivedAt: null, archivedAt: null, createdAt: clock.now() };
    await sequelize.transaction(async (transaction) => {
      await models.inboundSources.create(row, { transaction });
      await audit(services, transaction, { farmId: params.farmId, userId: who.userId, what: 'inbound source admitted', subject: body.name });
    });
    return { ...presentSource(row), secret };
  });

  register(hookEndpoints.archiveSource, async ({ params, caller }) => {
    const who = signedIn(caller);
    await sequelize.transaction(async (transaction) => {
      const row = await models.inboundSources.findOne({ where: { id: params.id, farmId: params.farmId }, transaction });
      if (!row) throw notFound();
      if (row.archivedAt) return;
      await row.update({ archivedAt: clock.now() }, { transaction });
      await audit(services, transaction, { farmId: params.farmId, userId: who.userId, what: 'inbound source removed', subject: row.name });
    });
    return undefined;
  });

  register(hookEndpoints.receiveForecast, async ({ params, request }) => {
    const body: unknown = request.body;
    if (!Buffer.isBuffer(body)) throw new HttpProblem(400, 'Send a JSON body.');
    const { id, isNew } = await receiveForecast(services, params.source, (name) => request.get(name), body);
    if (isNew) scheduler.nudge();
    return { received: id };
  });
}

const presentSource = ({ id, farmId, name, createdAt, lastReceivedAt, archivedAt }: InboundSourceRow) => ({
  id, farmId, name, createdAt: createdAt.toISOString(), lastReceivedAt: lastReceivedAt?.toISOString() ?? null, archivedAt: archivedAt?.toISOString() ?? null,
});
