import { createHash, randomUUID } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { DateTime } from 'luxon';
import { stepClock } from '../../server/demo/step-clock.ts';
import { sealWebhookSecret } from '../../server/delivery/webhook/secrets.ts';
import type { Parts } from '../../server/parts.ts';
import type { Services } from '../../server/services.ts';
import { demoHosts, startDemoFakes, type DemoFakes } from '../demo-fakes.ts';
import { keptClock } from './demo-clock.ts';
import { demoFarm, demoPassword, demoPeople, demoTimeZone } from './facts.ts';
import { seedDemoFarm, type SeededFarm } from './seed.ts';

/** The evening on which the demo opens, an hour before the eve notice. */
export const demoOpensAt = DateTime.fromISO('2026-06-09T19:00:00', { zone: demoTimeZone }).toJSDate();
/** Days lived through before it opens, so that every page has a past. */
const daysBefore = 9;
/** Decides the weather of the demo. */
export const demoSeed = 18;

export interface OpenedDemo {
  /** The services with the demo's clock and hosts. */
  services: Services;
  fakes: DemoFakes;
  stop(): Promise<void>;
}

/** Starts the fakes and the demo clock; the services returned are those that everything else is made of. */
export async function openDemo(base: Services, dataFolder: string): Promise<OpenedDemo> {
  mkdirSync(join(dataFolder, 'demo'), { recursive: true, mode: 0o700 });
  const { clock, stop } = keptClock(join(dataFolder, 'demo', 'clock.json'), DateTime.fromJSDate(demoOpensAt).minus({ days: daysBefore }).toJSDate());
  const services: Services = { ...base, clock, settings: { ...base.settings, permittedHosts: [...base.settings.permittedHosts, ...demoHosts] } };
  const signIns = demoPeople.map(({ name, email, role }) => ({ name, email, role, password: demoPassword }));
  const fakes = await startDemoFakes({ clock, dataFolder, seed: demoSeed, elevationM: demoFarm.elevationM, signIns });
  return {
    services,
    fakes,
    async stop() {
      stop();
      await fakes.stop();
    },
  };
}

/** The phone, the webhook and some wind readings of the demo farm. */
async function equip({ models, settings, clock }: Services, { farmId, userIds }: SeededFarm, { phones, webhook }: DemoFakes, { pushKeys }: Pick<Parts, 'pushKeys'>): Promise<void> {
  const now = clock.now();
  const owner = userIds.get(demoPeople[0]!.email)!;
  const subscription = phones[0]!.subscribe(pushKeys.current.publicKey);
  await models.devices.create({
    id: randomUUID(), farmId, userId: owner, name: 'Demo phone', endpoint: subscription.endpoint, endpointHash: createHash('sha256').update(subscription.endpoint).digest('hex'),
    p256dh: subscription.keys.p256dh, auth: subscription.keys.auth, vapidKeyId: pushKeys.current.id, createdAt: now, lastAcceptedAt: null, lastShownAt: null, goneAt: null,
  });
  await models.webhooks.create({
    id: randomUUID(), farmId, name: 'Barn lamp', url: webhook.url, kinds: ['eve', 'dawn', 'turn'], secretSealed: sealWebhookSecret(settings.secret, webhook.secret), active: true, disabledBecause: null, failingSince: null, lastDeliveredAt: null, createdAt: now, updatedAt: now,
  });
}

const filledSetting = 'demoFilled';

/**
 * On the first start: the farm, and the days until the demo opens, lived through by the real server. What a stop interrupted is
 * taken up again at the next start; a demo once filled is left alone.
 */
export async function fillDemo(opened: OpenedDemo, parts: Pick<Parts, 'pushKeys' | 'scheduler' | 'worker'>): Promise<void> {
  const { services, fakes } = opened;
  const { models, log, clock } = services;
  if (await models.settings.findByPk(filledSetting)) return;
  const seeded = (await seedDemoFarm(services, demoOpensAt)) ?? (await seededBefore(services));
  if (!seeded) return;
  if ((await models.devices.count()) === 0) await equip(services, seeded, fakes, parts);
  const { level } = log;
  log.level = 'warn';
  try {
    await stepClock(fakes.clock, parts.scheduler, parts.worker, demoOpensAt);
  } finally {
    log.level = level;
  }
  await models.settings.create({ name: filledSetting, value: true, updatedAt: clock.now() });
}

/** The demo farm of an earlier, interrupted start. */
async function seededBefore({ models }: Services): Promise<SeededFarm | null> {
  const farm = await models.farms.findOne({ where: { name: demoFarm.name } });
  if (!farm) return null;
  const users = await models.users.findAll({ where: { email: demoPeople.map(({ email }) => email) } });
  return { farmId: farm.id, userIds: new Map(users.map(({ id, email }) => [email, id])) };
}
