import { noticeEndpoints, type Wishes } from '../../shared/api/notices.ts';
import { createGuard } from '../delivery/net/guard.ts';
import { acknowledgementHash } from '../delivery/push/acknowledgement.ts';
import { enableDevice } from '../delivery/push/devices.ts';
import { replayDelivery } from '../delivery/replay.ts';
import { signedIn, type Register } from '../http/route.ts';
import { notFound } from '../http/problem.ts';
import type { DeviceRow } from '../models/notices.ts';
import { pushDelivery } from '../notices/fan-out.ts';
import { listNotices, presentDelivery } from '../notices/list.ts';
import { queueTest } from '../notices/test-notice.ts';
import { defaultWishes } from '../notices/wishes.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

export function noticeRoutes(register: Register, services: Services, { pushKeys }: Parts): void {
  const { models, clock, settings } = services;
  const guard = createGuard(settings.permittedHosts);

  register(noticeEndpoints.listNotices, async ({ params, query }) => ({ items: await listNotices(services, params.farmId, { limit: query.limit, before: query.before ? new Date(query.before) : null }) }));

  register(noticeEndpoints.replayDelivery, async ({ params }) => presentDelivery(await replayDelivery(services, params.farmId, params.id)));

  register(noticeEndpoints.readWishes, async ({ params, caller }) => {
    const who = signedIn(caller);
    const row = await models.wishes.findOne({ where: { farmId: params.farmId, userId: who.userId } });
    return row?.body ?? defaultWishes(who.role!);
  });

  register(noticeEndpoints.updateWishes, async ({ params, body, caller }) => {
    const wishes: Wishes = { push: [...new Set(body.push)], email: [...new Set(body.email)] };
    await models.wishes.upsert({ farmId: params.farmId, userId: signedIn(caller).userId, body: wishes, updatedAt: clock.now() });
    return wishes;
  });

  register(noticeEndpoints.pushKey, async () => ({ publicKey: pushKeys.current.publicKey }));

  register(noticeEndpoints.listDevices, async ({ params, caller }) => {
    const rows = await models.devices.findAll({ where: { farmId: params.farmId, userId: signedIn(caller).userId, goneAt: null }, order: [['createdAt', 'ASC'], ['id', 'ASC']] });
    return { items: rows.map(presentDevice) };
  });

  register(noticeEndpoints.createDevice, async ({ params, body, caller }) => presentDevice(await enableDevice(services, pushKeys, guard, { farmId: params.farmId, userId: signedIn(caller).userId }, body)));

  register(noticeEndpoints.deleteDevice, async ({ params, caller }) => {
    const removed = await models.devices.destroy({ where: { id: params.id, farmId: params.farmId, userId: signedIn(caller).userId } });
    if (removed === 0) throw notFound();
    return undefined;
  });

  register(noticeEndpoints.testDevice, async ({ params, caller }) => {
    const who = signedIn(caller);
    const device = await models.devices.findOne({ where: { id: params.id, farmId: params.farmId, userId: who.userId, goneAt: null } });
    const person = await models.users.findByPk(who.userId);
    if (!device || !person) throw notFound();
    return { deliveryId: await queueTest(services, params.farmId, (notice, content) => pushDelivery(services, notice, content, person, device)) };
  });

  register(noticeEndpoints.acknowledge, async ({ body }) => {
    const delivery = await models.deliveries.findOne({ where: { ackTokenHash: acknowledgementHash(body.token) }, attributes: ['id', 'target', 'shownAt', 'tappedAt'] });
    if (!delivery) throw notFound('This push is not known here.');
    const now = clock.now();
    // What was tapped was shown; the first word of each counts.
    await delivery.update({ shownAt: delivery.shownAt ?? now, tappedAt: body.what === 'tapped' ? (delivery.tappedAt ?? now) : delivery.tappedAt });
    await models.devices.update({ lastShownAt: now }, { where: { id: delivery.target } });
    return undefined;
  });
}

const presentDevice = ({ id, name, endpoint, createdAt, lastAcceptedAt, lastShownAt }: DeviceRow) => ({
  id, name, pushService: new URL(endpoint).hostname, createdAt: createdAt.toISOString(), lastAcceptedAt: lastAcceptedAt?.toISOString() ?? null, lastShownAt: lastShownAt?.toISOString() ?? null,
});
