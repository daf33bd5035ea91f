import { spawn, type ChildProcess } from 'node:child_process';
import { createHash, randomUUID } from 'node:crypto';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import { systemClock } from '../../server/clock/clock.ts';
import { createDatabase, inTransaction } from '../../server/database/connection.ts';
import { createGuard } from '../../server/delivery/net/guard.ts';
import { queueDelivery } from '../../server/delivery/outbox.ts';
import { loadPushKeys } from '../../server/delivery/push/keys.ts';
import { createPushSender } from '../../server/delivery/push/sender.ts';
import { createDeliveryWorker } from '../../server/delivery/worker.ts';
import { createModels } from '../../server/models/index.ts';
import type { Services } from '../../server/services.ts';
import { faultSettings } from './fault-settings.ts';
import { PushEnd } from './push-end.ts';

export interface KillReport {
  queued: number;
  kills: number;
  /** Notices that reached the device at least once. */
  sent: number;
  lost: number;
  /** Messages that came again after a kill. */
  repeats: number;
  /** Repeats that the device would show as a second notice: another tag, topic or token under the same title. */
  shownTwice: number;
  /** Rows that are not marked as delivered in the end. */
  unsettled: number;
}

const leaseMs = 800;
const program = fileURLToPath(new URL('./worker-process.ts', import.meta.url));

async function startWorker(url: string): Promise<ChildProcess> {
  const child = spawn(process.execPath, ['--import', 'tsx', program, url, String(leaseMs)], { stdio: ['ignore', 'pipe', 'ignore'] });
  await new Promise<void>((resolve, reject) => {
    child.stdout!.once('data', () => resolve());
    child.once('exit', (code) => reject(new Error(`The worker ended by itself (${code}).`)));
  });
  return child;
}

async function kill(child: ChildProcess): Promise<void> {
  const ended = new Promise((resolve) => child.once('exit', resolve));
  child.kill('SIGKILL');
  await ended;
}

/** A small repeatable generator (mulberry32), so that a run can be told again. */
function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

async function prepare(services: Services, endpoint: string, end: PushEnd, count: number): Promise<void> {
  const { models, sequelize } = services;
  const now = systemClock.now();
  const keys = await loadPushKeys(services);
  const { keys: subscription } = end.phone.subscribe(keys.current.publicKey);
  const [farmId, userId, deviceId] = [randomUUID(), randomUUID(), randomUUID()] as const;
  await models.farms.create({ id: farmId, name: 'Faults', latitude: 44, longitude: -85, elevationM: 200, exposure: 'open', timeZone: 'America/Detroit', units: 'us', eveTime: '20:00', dawnLeadMinutes: 30, version: 1, archivedAt: null, createdAt: now, updatedAt: now });
  await models.users.create({ id: userId, email: 'fault@example.org', emailConfirmedAt: now, passwordHash: 'x', name: 'F', units: 'us', language: 'en', createdAt: now, updatedAt: now });
  await models.devices.create({ id: deviceId, farmId, userId, name: 'phone', endpoint, endpointHash: createHash('sha256').update(endpoint).digest('hex'), ...subscription, vapidKeyId: keys.current.id, createdAt: now, lastAcceptedAt: null, lastShownAt: null, goneAt: null });
  await inTransaction(sequelize, async (transaction) => {
    for (let index = 0; index < count; index += 1) {
      const tag = `notice-${index}`;
      await queueDelivery(services, transaction, {
        noticeId: null, farmId, channel: 'push', target: deviceId, recipient: 'F, phone', key: tag, order: { key: tag, sequence: 1 }, dueAt: now, usefulUntil: new Date(now.getTime() + 3_600_000), ackTokenHash: null,
        payload: { title: tag, body: '', path: '/', tag, topic: createHash('sha256').update(tag).digest('base64url').slice(0, 32), urgency: 'high', kind: 'dawn', sign: 'go', language: 'en', lateNote: '' },
      });
    }
  });
}

/**
 * Queues notices, lets worker processes send them and kills each (`kill -9`) at a random instant; then a last worker finishes.
 * @param url an empty, migrated database
 */
export async function killWorkers(url: string, { notices, kills, seed }: { notices: number; kills: number; seed: number }): Promise<KillReport> {
  const random = generator(seed);
  const sequelize = createDatabase(url);
  const services: Services = { settings: faultSettings, clock: systemClock, log: pino({ level: 'silent' }), sequelize, models: createModels(sequelize), random };
  const end = new PushEnd(15);
  try {
    await prepare(services, await end.listen(), end, notices);
    let killed = 0;
    while (killed < kills) {
      const child = await startWorker(url);
      // Somewhere in the next few messages, and a random moment after the last of them.
      const left = notices - new Set(end.arrivals.map(({ tag }) => tag)).size;
      await Promise.race([end.arrived(end.arrivals.length + 1 + Math.floor((random() * left) / (kills - killed + 1))), new Promise((resolve) => setTimeout(resolve, 5000))]);
      await new Promise((resolve) => setTimeout(resolve, random() * 30));
      await kill(child);
      killed += 1;
    }
    const guard = createGuard(faultSettings.permittedHosts);
    const worker = createDeliveryWorker(services, [createPushSender(services, await loadPushKeys(services), guard)], { batch: 10, leaseMs, pollMs: 20 });
    worker.start();
    for (let looks = 0; looks < 600 && (await services.models.deliveries.count({ where: { state: ['waiting', 'claimed'] } })) > 0; looks += 1) await new Promise((resolve) => setTimeout(resolve, 50));
    await worker.stop();
    await guard.stop();
    return { ...tally(end, notices), kills: killed, unsettled: notices - (await services.models.deliveries.count({ where: { state: 'delivered' } })) };
  } finally {
    await end.close();
    await sequelize.close();
  }
}

function tally(end: PushEnd, notices: number): Pick<KillReport, 'queued' | 'sent' | 'lost' | 'repeats' | 'shownTwice'> {
  const byTitle = new Map<string, Set<string>>();
  for (const { title, tag, topic, token } of end.arrivals) byTitle.set(title, (byTitle.get(title) ?? new Set()).add(`${tag} ${topic} ${token}`));
  const shownTwice = [...byTitle.values()].filter((identities) => identities.size > 1).length;
  return { queued: notices, sent: byTitle.size, lost: notices - byTitle.size, repeats: end.arrivals.length - byTitle.size, shownTwice };
}
