import { demoHosts, startDemoFakes, type DemoFakes } from '../../mocks/demo-fakes.ts';
import { createDelivery } from '../../server/delivery/index.ts';
import { loadPushKeys } from '../../server/delivery/push/keys.ts';
import { createProviders, defaultProviderOrder } from '../../server/forecasts/create-providers.ts';
import { createScheduler } from '../../server/schedule/scheduler.ts';
import { createAssessor } from '../../server/verdicts/create-assessor.ts';
import { providerSource } from '../../server/verdicts/provider-source.ts';
import { createTestApp, type TestApp } from './app.ts';

/** Every part of the server as it runs, the far ends faked on the wire, the clock stopped. */
export interface WholeApp extends TestApp {
  fakes: DemoFakes;
}

export async function createWholeApp(): Promise<WholeApp> {
  let started: DemoFakes | null = null;
  const app = await createTestApp({
    settings: { demo: true, permittedHosts: [...demoHosts] },
    async parts(services, clock) {
      const fakes = await startDemoFakes({ clock, dataFolder: null, seed: 1, signIns: [{ name: 'Ada Row', email: 'ada@example.org', password: 'a long enough password', role: 'owner' }] });
      started = fakes;
      const providers = createProviders({ clock, random: services.random, userAgent: 'dawnvane/test (mailto:tests@dawnvane.example)', settings: { order: defaultProviderOrder } });
      const assessor = createAssessor(services, providerSource(providers));
      const pushKeys = await loadPushKeys(services);
      return { demo: fakes, assessor, pushKeys, worker: createDelivery(services, pushKeys, fakes.mail.url, { name: 'worker', leaseClock: clock }), scheduler: createScheduler(services, assessor) };
    },
  });
  const fakes = started!;
  return {
    ...app,
    fakes,
    async close() {
      await app.parts.worker.stop();
      await fakes.stop();
      await app.close();
    },
  };
}
