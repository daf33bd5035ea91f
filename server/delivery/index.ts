import type { Services } from '../services.ts';
import { createMailSender, smtpFromUrl } from './email/sender.ts';
import { createGuard } from './net/guard.ts';
import type { PushKeys } from './push/keys.ts';
import { createPushSender } from './push/sender.ts';
import { createWebhookSender } from './webhook/sender.ts';
import { createDeliveryWorker, type DeliveryWorker, type WorkerOptions } from './worker.ts';

/**
 * The worker with every channel.
 * @param smtpUrl `smtp://` or `smtps://` address of the mail relay
 */
export function createDelivery(services: Services, keys: PushKeys, smtpUrl: string, options: WorkerOptions = {}): DeliveryWorker {
  const guard = createGuard(services.settings.permittedHosts);
  const senders = [createPushSender(services, keys, guard), createMailSender(services, smtpFromUrl(smtpUrl)), createWebhookSender(services, guard)];
  const worker = createDeliveryWorker(services, senders, options);
  return { ...worker, stop: async () => { await worker.stop(); await guard.stop(); } };
}
