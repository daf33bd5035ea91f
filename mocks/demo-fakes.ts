import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { setupServer } from 'msw/node';
import type { SettableClock } from '../server/clock/clock.ts';
import type { DemoParts } from '../server/demo/parts.ts';
import { startMailSink, type MailSink } from './mail-sink/mail-sink.ts';
import { createProviderFakes, type ProviderFakes } from './providers/provider-fakes.ts';
import { DemoPhone } from './push-service/phone.ts';
import { createPushService, type PushServiceFake } from './push-service/push-service.ts';
import { createWebhookReceiver, type WebhookReceiver } from './webhook-receiver/webhook-receiver.ts';

/** Hosts of the fakes; they resolve nowhere, so the server must be told to permit them. */
export const demoHosts = ['push.dawnvane-demo.invalid', 'hooks.dawnvane-demo.invalid'] as const;

export interface DemoFakes extends DemoParts {
  /** One phone for each name given; `subscribe` gives what a browser would hand over. */
  phones: DemoPhone[];
  providers: ProviderFakes;
  push: PushServiceFake;
  mail: MailSink;
  webhook: WebhookReceiver;
  /** Tells the phones where the server is, so that they acknowledge what they show, as a service worker does. */
  serverIsAt(origin: string): void;
}

export interface DemoFakesOptions {
  clock: SettableClock;
  /** Where the fakes keep their keys and what they received; null: in memory only. */
  dataFolder: string | null;
  /** Decides the weather: the same seed gives the same days. */
  seed: number;
  /** Height of the demo farm above the sea, m. */
  elevationM?: number;
  signIns?: DemoParts['signIns'];
  phoneNames?: string[];
}

const loopback = /^(localhost|127\.0\.0\.1|\[::1\]|dawnvane\.test)$/;

/** Starts the fakes of every far end: forecast providers, push service with phones, mail relay, webhook receiver. Other calls leave the process only to loopback. */
export async function startDemoFakes({ clock, dataFolder, seed, elevationM = 210, signIns = [], phoneNames = ['Demo phone'] }: DemoFakesOptions): Promise<DemoFakes> {
  const folder = dataFolder === null ? null : join(dataFolder, 'demo');
  if (folder) mkdirSync(folder, { recursive: true, mode: 0o700 });
  const file = (name: string): string | null => (folder ? join(folder, name) : null);
  const phones = phoneNames.map((name, index) => new DemoPhone(name, file(`phone-${index}.json`)));
  const providers = createProviderFakes({ clock, seed, elevationM });
  const push = createPushService({ clock, phones, logFile: file('pushes.json') });
  const webhook = createWebhookReceiver({ clock, logFile: file('hooks.json'), secretFile: file('webhook-secret') });
  const mail = await startMailSink({ clock, logFile: file('mails.json') });
  const server = setupServer(...providers.handlers, ...push.handlers, ...webhook.handlers);
  server.listen({
    onUnhandledRequest(request, print) {
      if (!loopback.test(new URL(request.url).hostname)) print.error();
    },
  });
  let origin: string | null = null;
  push.onPush(({ token }) => {
    if (!origin || !token) return;
    // Like a phone without a net, a failure here changes nothing.
    void fetch(`${origin}/api/push/acknowledge`, { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify({ token, what: 'shown' }) }).catch(() => undefined);
  });
  return {
    clock,
    signIns,
    phones,
    providers,
    push,
    mail,
    webhook,
    pushes: push.shown,
    mails: () => mail.mails().map(({ id, receivedAt, from, to, subject, text, html }) => ({ id, receivedAt, from, to, subject, text, html })),
    hooks: webhook.hooks,
    setMood: (provider, mood) => providers.setMood(provider, mood),
    serverIsAt: (address) => {
      origin = address;
    },
    async stop() {
      server.close();
      await mail.stop();
    },
  };
}
