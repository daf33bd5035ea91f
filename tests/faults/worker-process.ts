/** A delivery worker in a process of its own, to be killed. Arguments: address of the database, lease in milliseconds. */
import { pino } from 'pino';
import { systemClock } from '../../server/clock/clock.ts';
import { createDatabase } from '../../server/database/connection.ts';
import { createGuard } from '../../server/delivery/net/guard.ts';
import { loadPushKeys } from '../../server/delivery/push/keys.ts';
import { createPushSender } from '../../server/delivery/push/sender.ts';
import { createDeliveryWorker } from '../../server/delivery/worker.ts';
import { createModels } from '../../server/models/index.ts';
import type { Services } from '../../server/services.ts';
import { faultSettings } from './fault-settings.ts';

const [url, leaseMs] = process.argv.slice(2);
if (!url) throw new Error('The address of the database is missing.');
const sequelize = createDatabase(url);
const services: Services = { settings: faultSettings, clock: systemClock, log: pino({ level: 'silent' }), sequelize, models: createModels(sequelize), random: Math.random };
const worker = createDeliveryWorker(services, [createPushSender(services, await loadPushKeys(services), createGuard(faultSettings.permittedHosts))], { batch: 10, leaseMs: Number(leaseMs ?? 1000), pollMs: 20 });
worker.start();
process.stdout.write('working\n');
