import { execFileSync, spawn, type ChildProcess } from 'node:child_process';
import { createHash, randomUUID } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { Agent } from 'node:https';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { pino } from 'pino';
import webPush from 'web-push';
import { DemoPhone } from '../../mocks/push-service/phone.ts';
import { systemClock } from '../../server/clock/clock.ts';
import { createDatabase } from '../../server/database/connection.ts';
import { startMariaDb } from '../../server/database/mariadb-process.ts';
import { migrateUp } from '../../server/database/migrate.ts';
import { createGuard } from '../../server/delivery/net/guard.ts';
import { loadPushKeys, type PushKeys } from '../../server/delivery/push/keys.ts';
import { createPushSender } from '../../server/delivery/push/sender.ts';
import { createDeliveryWorker } from '../../server/delivery/worker.ts';
import { createModels } from '../../server/models/index.ts';
import type { DeliveryRow } from '../../server/models/notices.ts';
import type { Services } from '../../server/services.ts';
import { faultSettings } from '../faults/fault-settings.ts';
import type { BenchLine } from './line.ts';

const messages = 10_000;
const plainMessages = 2000;
const concurrency = 50;
const host = 'localhost';

interface FarEnd {
  url: string;
  ca: string;
  stop(): void;
}

/** A self-signed certificate is made anew for each run; nothing of it is kept. */
async function startFarEnd(folder: string): Promise<FarEnd> {
  const [key, certificate] = [join(folder, 'key.pem'), join(folder, 'certificate.pem')];
  execFileSync('openssl', ['req', '-x509', '-newkey', 'ec', '-pkeyopt', 'ec_paramgen_curve:P-256', '-nodes', '-days', '2', '-subj', `/CN=${host}`, '-addext', `subjectAltName=DNS:${host}`, '-keyout', key, '-out', certificate], { stdio: 'ignore' });
  const child: ChildProcess = spawn(process.execPath, ['--import', 'tsx', fileURLToPath(new URL('./push-far-end.ts', import.meta.url)), key, certificate], { stdio: ['ignore', 'pipe', 'inherit'] });
  const port = await new Promise<string>((resolve) => child.stdout!.once('data', (chunk: Buffer) => resolve(chunk.toString().trim())));
  return { url: `https://${host}:${port}/push`, ca: readFileSync(certificate, 'utf8'), stop: () => child.kill() };
}

interface Measured {
  perSecond: number;
  cpuMs: number;
}

async function measured(count: number, work: () => Promise<void>): Promise<Measured> {
  const cpu = process.cpuUsage();
  const start = performance.now();
  await work();
  const seconds = (performance.now() - start) / 1000;
  const { user, system } = process.cpuUsage(cpu);
  return { perSecond: count / seconds, cpuMs: (user + system) / 1000 / count };
}

const body = { title: 'Go, 5:25–6:10: Spruce row', body: 'Tomorrow, Wed, Jun 10, North Fork. Wind stays under 8 mph until 6:50. Measure wind and look around before you start.', path: '/farms/x/mornings/2026-06-10', tag: 'morning', topic: 'topic', urgency: 'high', kind: 'dawn', sign: 'go', language: 'en', lateNote: 'Late {minutes}' };

/** The loop a user would write: the library's own call for each message, as many at a time as ours. */
async function plainLoop(end: FarEnd, phone: DemoPhone, keys: PushKeys): Promise<void> {
  const { keys: subscriptionKeys } = phone.subscribe(keys.current.publicKey);
  const agent = new Agent({ ca: end.ca });
  const text = JSON.stringify({ web_push: 8030, notification: body });
  let sent = 0;
  await Promise.all(
    Array.from({ length: concurrency }, async () => {
      while (sent < plainMessages) {
        sent += 1;
        await webPush.sendNotification({ endpoint: end.url, keys: subscriptionKeys }, text, { TTL: 3600, agent, vapidDetails: { subject: 'mailto:bench@dawnvane.example', publicKey: keys.current.publicKey, privateKey: keys.current.privateKey } });
      }
    }),
  );
}

async function queue(services: Services, end: FarEnd, phone: DemoPhone, keys: PushKeys): Promise<void> {
  const { models } = services;
  const now = systemClock.now();
  const { keys: subscriptionKeys } = phone.subscribe(keys.current.publicKey);
  const [farmId, userId, deviceId] = [randomUUID(), randomUUID(), randomUUID()] as const;
  await models.farms.create({ id: farmId, name: 'Bench', latitude: 44, longitude: -85, elevationM: 200, exposure: 'open', timeZone: 'America/Detroit', units: 'us', eveTime: '20:00', dawnLeadMinutes: 30, version: 1, archivedAt: null, createdAt: now, updatedAt: now });
  await models.users.create({ id: userId, email: 'bench@example.org', emailConfirmedAt: now, passwordHash: 'x', name: 'B', units: 'us', language: 'en', createdAt: now, updatedAt: now });
  await models.devices.create({ id: deviceId, farmId, userId, name: 'phone', endpoint: end.url, endpointHash: createHash('sha256').update(end.url).digest('hex'), ...subscriptionKeys, vapidKeyId: keys.current.id, createdAt: now, lastAcceptedAt: null, lastShownAt: null, goneAt: null });
  const rows: Partial<DeliveryRow>[] = Array.from({ length: messages }, (_, index) => ({
    id: randomUUID(), noticeId: null, farmId, channel: 'push', target: deviceId, recipient: 'B, phone', deliveryKey: `bench-${index}`, orderKey: `bench-${index}`, sequence: 1, state: 'waiting', payload: body, attempts: 0, dueAt: now, nextAttemptAt: now,
    usefulUntil: new Date(now.getTime() + 3_600_000), createdAt: now, updatedAt: now,
  }));
  for (let from = 0; from < rows.length; from += 1000) await models.deliveries.bulkCreate(rows.slice(from, from + 1000));
}

/** 10,000 pushes from claim to mark, over the database, beside the plain loop without one, in one run. */
export async function run(): Promise<BenchLine[]> {
  const folder = mkdtempSync(join(tmpdir(), 'dawnvane-bench-'));
  const end = await startFarEnd(folder);
  const database = await startMariaDb({ folder: join(folder, 'database'), throwAway: true });
  const sequelize = createDatabase(database.url);
  try {
    await migrateUp(sequelize);
    const services: Services = { settings: { ...faultSettings, permittedHosts: [host] }, clock: systemClock, log: pino({ level: 'silent' }), sequelize, models: createModels(sequelize), random: Math.random };
    const keys = await loadPushKeys(services);
    const phone = new DemoPhone('bench', null);
    await queue(services, end, phone, keys);
    const guard = createGuard([host], undefined, end.ca);
    const worker = createDeliveryWorker(services, [createPushSender(services, keys, guard)], { batch: concurrency });
    const memoryBefore = process.memoryUsage().rss;
    const ours = await measured(messages, () => worker.drain());
    const memoryMb = (process.memoryUsage().rss - memoryBefore) / 1_048_576;
    const delivered = await services.models.deliveries.count({ where: { state: 'delivered' } });
    if (delivered !== messages) throw new Error(`Only ${delivered} of ${messages} were delivered.`);
    await guard.stop();
    const plain = await measured(plainMessages, () => plainLoop(end, phone, keys));
    const ratio = ours.perSecond / plain.perSecond;
    const cpuRatio = plain.cpuMs / ours.cpuMs;
    return [
      { name: 'pushes, claim to mark', value: ours.perSecond, unit: '/s', baseline: { name: 'plain web-push loop', value: plain.perSecond }, ratio, goal: '≥ 3 × the plain loop', met: ratio >= 3 },
      { name: 'processor time of a push', value: ours.cpuMs, unit: 'ms', baseline: { name: 'plain web-push loop', value: plain.cpuMs }, ratio: cpuRatio, goal: '≥ 3 × less than the plain loop', met: cpuRatio >= 3 },
      { name: `memory gained over ${messages} pushes`, value: memoryMb, unit: 'MB' },
    ];
  } finally {
    await sequelize.close();
    await database.stop();
    end.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}
