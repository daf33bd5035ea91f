import { randomUUID } from 'node:crypto';
import { select } from '../../server/database/connection.ts';
import { noticeKinds } from '../../shared/api/notices.ts';
import type { TestApp } from './app.ts';
import { add, farmToPlanOn, typed, type OwnedFarm } from './farm.ts';
import { buildUser, join } from './people.ts';

export interface FilledFarm {
  farmId: string;
  owner: OwnedFarm['browser'];
  /** Stands in every name of this farm: an answer that holds it has leaked. */
  secretWord: string;
  planBody: object;
  /** By operation: the id of a thing that it can be tried on, and a body that would be taken. */
  targets: Record<string, { id: string; body?: object }>;
}

/** A farm with one of everything that an address can name. */
export async function fillFarm(app: TestApp): Promise<FilledFarm> {
  const { models, clock } = app.services;
  const farm = await farmToPlanOn(app);
  const { farmId, browser, ids, plan } = farm;
  const secretWord = `Hollow ${farmId.slice(0, 8)}`;
  const bodies = { Block: { ...typed.block, name: secretWord }, SensitivePlace: { ...typed.place, name: secretWord }, Sprayer: { ...typed.sprayer, name: secretWord }, Product: { ...typed.product, name: secretWord }, Plan: { ...plan, name: secretWord } };
  await browser.put(farm.at(`/blocks/${ids.block}`)).send(bodies.Block).expect(200);
  await browser.put(farm.at(`/sprayers/${ids.sprayer}`)).send(bodies.Sprayer).expect(200);
  await browser.put(farm.at(`/products/${ids.product}`)).send(bodies.Product).expect(200);
  await browser.post(farm.at(`/products/${ids.product}/label`)).attach('file', Buffer.from('%PDF-1.4\n'), 'label.pdf').expect(200);
  const kept = { Block: ids.block, SensitivePlace: await add(farm, '/sensitive-places', bodies.SensitivePlace), Sprayer: ids.sprayer, Product: ids.product, Plan: await add(farm, '/plans', bodies.Plan) };

  const now = clock.now();
  const member = await buildUser(app);
  const membership = await join(app, farmId, member.id, 'crew');
  const invitation = randomUUID();
  await models.invitations.create({ id: invitation, farmId, email: `${invitation}@example.org`, role: 'crew', tokenHash: invitation.replaceAll('-', ''), invitedBy: browser.userId, expiresAt: new Date(now.getTime() + 86_400_000), acceptedAt: null, revokedAt: null, createdAt: now });
  const reading = await add(farm, '/readings', { takenAt: now.toISOString(), windMs: 1, note: secretWord });
  const source = await add(farm, '/inbound-sources', { name: secretWord });
  const device = randomUUID();
  await models.devices.create({ id: device, farmId, userId: browser.userId, name: secretWord, endpoint: 'https://push.example.org/x', endpointHash: device.replaceAll('-', ''), p256dh: 'x', auth: 'x', vapidKeyId: 'x', createdAt: now, lastAcceptedAt: null, lastShownAt: null, goneAt: null });
  const webhook = randomUUID();
  const webhookBody = { name: secretWord, url: 'https://localhost/', kinds: [...noticeKinds], active: true };
  await models.webhooks.create({ ...webhookBody, id: webhook, farmId, secretSealed: 'x', disabledBecause: null, failingSince: null, lastDeliveredAt: null, createdAt: now, updatedAt: now });
  const test = await browser.post(farm.at(`/webhooks/${webhook}/test`)).expect(202);
  const delivery = String((test.body as { deliveryId: string }).deliveryId);
  await models.deliveries.update({ state: 'dead' }, { where: { id: delivery } });

  const targets: FilledFarm['targets'] = {
    uploadLabel: { id: kept.Product },
    readLabel: { id: kept.Product },
    deleteReading: { id: reading },
    replayDelivery: { id: delivery },
    deleteDevice: { id: device },
    testDevice: { id: device },
    updateWebhook: { id: webhook, body: webhookBody },
    deleteWebhook: { id: webhook },
    testWebhook: { id: webhook },
    archiveInboundSource: { id: source },
    revokeInvitation: { id: invitation },
    changeRole: { id: membership, body: { role: 'observer' } },
    removePerson: { id: membership },
  };
  for (const [one, id] of Object.entries(kept)) {
    targets[`read${one}`] = { id };
    targets[`update${one}`] = { id, body: bodies[one as keyof typeof bodies] };
    targets[`archive${one}`] = { id, body: { archived: true } };
  }
  return { farmId, owner: browser, secretWord, planBody: plan, targets };
}

const tables = ['farms', 'blocks', 'sensitive_places', 'sprayers', 'products', 'plans', 'memberships', 'invitations', 'audit_entries', 'readings', 'notices', 'deliveries', 'devices', 'wishes', 'webhooks', 'inbound_sources'];

/** Everything stored of a farm, row by row. */
export async function contentsOf({ services: { sequelize } }: TestApp, farmId: string): Promise<Record<string, object[]>> {
  const found = await Promise.all(tables.map(async (table) => [table, await select(sequelize, `SELECT * FROM ${table} WHERE ${table === 'farms' ? 'id' : 'farm_id'} = :farmId ORDER BY 1, 2`, { farmId })] as const));
  return Object.fromEntries(found);
}
