import type { RequestListener } from 'node:http';
import { createApp } from './app.ts';
import type { Config } from './config.ts';
import { createDelivery } from './delivery/index.ts';
import { loadPushKeys } from './delivery/push/keys.ts';
import { createProviders, defaultProviderOrder } from './forecasts/create-providers.ts';
import type { Parts } from './parts.ts';
import { createScheduler } from './schedule/scheduler.ts';
import type { Services } from './services.ts';
import { SetupError } from './setup/setup-error.mjs';
import { createAssessor } from './verdicts/create-assessor.ts';
import { providerSource } from './verdicts/provider-source.ts';

/** The parts of the server at work. */
export interface RunningParts {
  /** The web application; index.ts hands it the port. */
  app: RequestListener;
  /** What the start command prints after the address: in the demo, the sign-ins. */
  welcome: string;
  /** Ends workers, schedules and fakes, and waits for them. */
  stop(): Promise<void>;
}

/** The fakes are reached only here and only in the demo: production never loads them. */
const openDemo = async (services: Services, dataFolder: string) => (await import('../mocks/demo-farm/open-demo.ts')).openDemo(services, dataFolder);

/** Makes the parts that the configuration names and starts them. */
export async function runParts(base: Services, config: Config): Promise<RunningParts> {
  const demo = base.settings.demo ? await openDemo(base, config.dataFolder) : null;
  const services = demo?.services ?? base;
  const smtpUrl = config.smtpUrl ?? demo?.fakes.mail.url;
  if (!smtpUrl) throw new SetupError('SMTP_URL is not set: letters would go nowhere.');
  const { clock, random, log, settings } = services;
  const providers = createProviders({
    clock,
    random,
    userAgent: `Dawnvane/${settings.version} (${settings.contact})`,
    warn: (message) => log.warn(message),
    // The demo's clock is stepped, not waited for: neither are the pauses between two tries of a fake that fails.
    ...(demo ? { sleep: async () => undefined } : {}),
    settings: { order: config.providers ?? defaultProviderOrder },
  });
  const pushKeys = await loadPushKeys(services);
  const assessor = createAssessor(services, providerSource(providers));
  const worker = createDelivery(services, pushKeys, smtpUrl);
  const scheduler = createScheduler(services, assessor);
  const parts: Parts = { assessor, pushKeys, worker, scheduler, demo: demo?.fakes ?? null };
  const app = createApp(services, parts);
  if (demo) {
    const { fillDemo } = await import('../mocks/demo-farm/open-demo.ts');
    await fillDemo(demo, parts);
    demo.fakes.serverIsAt(settings.publicUrl);
  }
  if (config.roles.includes('worker')) worker.start();
  if (config.roles.includes('scheduler')) scheduler.start();
  return {
    app,
    welcome: demo ? welcomeOf(demo.fakes.signIns) : '',
    async stop() {
      await scheduler.stop();
      await worker.stop();
      await demo?.stop();
    },
  };
}

function welcomeOf(signIns: { name: string; email: string; password: string; role: string }[]): string {
  const width = Math.max(...signIns.map(({ email }) => email.length));
  return ['Sign in to the demo farm as:', ...signIns.map(({ email, password, role }) => `  ${email.padEnd(width)}  ${password}  (${role})`)].join('\n');
}
