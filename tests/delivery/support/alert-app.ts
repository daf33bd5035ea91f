import { createDelivery } from '../../../server/delivery/index.ts';
import { loadPushKeys } from '../../../server/delivery/push/keys.ts';
import { createScheduler } from '../../../server/schedule/scheduler.ts';
import { stepClock } from '../../../server/demo/step-clock.ts';
import { demoHosts, startDemoFakes, type DemoFakes } from '../../../mocks/demo-fakes.ts';
import { createTestApp, type TestApp } from '../../support/app.ts';
import type { Delivery, Notice } from '../../../shared/api/notices.ts';
import { buildFarm, join, signInAs, type Browser } from '../../support/people.ts';
import { scriptedAssessor, type ScriptedAssessor } from './scripted-assessor.ts';

/** The whole alert server on an empty database, its far ends faked on the wire, its verdicts scripted. */
export interface AlertApp extends TestApp {
  fakes: DemoFakes;
  assessor: ScriptedAssessor;
  farmId: string;
  owner: Browser & { userId: string; email: string };
  /** Lets time pass, with everything that falls due on the way. */
  passTo(instant: string): Promise<void>;
  /** Assesses the farm anew, as when a forecast comes in, and delivers what follows. */
  newForecast(): Promise<void>;
  /** Enables the demo phone for a person, as the page does. */
  enablePhone(browser: Browser, index?: number): Promise<string>;
  /** Adds the demo receiver as an outgoing webhook of the farm. @returns its id */
  addWebhook(kinds?: string[]): Promise<string>;
  /** The notices page: newest first. */
  notices(): Promise<Notice[]>;
  deliveries(): Promise<(Delivery & { kind: string })[]>;
  /** A new farm in place of the old one, nothing told or received yet, the clock at its first instant: the state before each test. */
  reopen(at?: string): Promise<void>;
}

/** @param opensAt the stopped clock's first instant @param phones names of the demo phones */
export async function createAlertApp({ opensAt = '2026-06-09T23:00:00Z', phones = ['Demo phone'] }: { opensAt?: string; phones?: string[] } = {}): Promise<AlertApp> {
  let fakes: DemoFakes | null = null;
  let assessor: ScriptedAssessor | null = null;
  const app = await createTestApp({
    settings: { permittedHosts: [...demoHosts], demo: true },
    async parts(services) {
      const clock = services.clock as TestApp['clock'];
      clock.set(new Date(opensAt));
      fakes = await startDemoFakes({ clock, dataFolder: null, seed: 1, phoneNames: phones });
      assessor = scriptedAssessor(services);
      const pushKeys = await loadPushKeys(services);
      return { demo: fakes, assessor, pushKeys, worker: createDelivery(services, pushKeys, fakes.mail.url, { name: 'worker', leaseClock: clock }), scheduler: createScheduler(services, assessor) };
    },
  });
  const owner = await signInAs(app, await buildFarm(app, 'North Fork'), 'owner');
  const { worker, scheduler } = app.parts;
  const alert: AlertApp = {
    ...app,
    fakes: fakes!,
    assessor: assessor!,
    farmId: '',
    owner,
    async reopen(at = opensAt) {
      await app.services.models.farms.destroy({ where: {} });
      app.clock.set(new Date(at));
      alert.farmId = await buildFarm(app, 'North Fork');
      await join(app, alert.farmId, owner.userId, 'owner');
      for (const end of [fakes!.push, fakes!.mail, fakes!.webhook]) end.clear();
      fakes!.push.faults.clear();
      fakes!.webhook.faults.clear();
      assessor!.say({ verdict: 'hold', because: 'wind' });
      assessor!.forecast = 'fresh';
      assessor!.asked.length = 0;
    },
    passTo: (instant) => stepClock(app.clock, scheduler, worker, new Date(instant)),
    async newForecast() {
      await assessor!.assessFarm(alert.farmId, { fetch: 'never' });
      await worker.drain();
    },
    async enablePhone(browser, index = 0) {
      const phone = fakes!.phones[index]!;
      const { body: key } = await browser.get('/api/push/key').expect(200);
      const { body } = await browser.post(`/api/farms/${alert.farmId}/devices`).send({ name: phone.name, ...phone.subscribe((key as { publicKey: string }).publicKey) }).expect(201);
      return (body as { id: string }).id;
    },
    async addWebhook(kinds = ['eve', 'dawn', 'turn', 'test']) {
      const { body } = await owner.post(`/api/farms/${alert.farmId}/webhooks`).send({ name: 'Barn board', url: fakes!.webhook.url, kinds }).expect(201);
      const { id, secret } = body as { id: string; secret: string };
      fakes!.webhook.trust(secret);
      return id;
    },
    async notices() {
      const { body } = await owner.get(`/api/farms/${alert.farmId}/notices`).expect(200);
      return (body as { items: Notice[] }).items;
    },
    async deliveries() {
      return (await alert.notices()).flatMap((notice) => notice.deliveries.map((delivery) => ({ ...delivery, kind: notice.kind })));
    },
    async close() {
      await worker.stop();
      await fakes!.stop();
      await app.close();
    },
  };
  await alert.reopen();
  return alert;
}
