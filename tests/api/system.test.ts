import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { WorkerStatus } from '../../server/delivery/worker.ts';
import { createTestApp, type TestApp } from '../support/app.ts';

let app: TestApp;
let worker: WorkerStatus = { state: 'ok', lastRunAt: null, waiting: 0 };
beforeAll(async () => {
  app = await createTestApp({ parts: (_services, _clock, resting) => ({ worker: { ...resting.worker, status: async () => worker } }) });
});
afterAll(() => app.close());

const health = async () => (await app.browser().get('/api/health').expect(200)).body;

describe('the health of the server', () => {
  it('tells version, database and worker to anyone, and nothing secret', async () => {
    expect(await health()).toEqual({ status: 'ok', version: '0.0.0-test', now: app.clock.now().toISOString(), database: 'ok', worker: { state: 'ok', lastRunAt: null, waiting: 0 }, lastForecast: null });
  });

  it('is not well while deliveries are stuck', async () => {
    worker = { state: 'stuck', lastRunAt: app.clock.now(), waiting: 12 };
    expect(await health()).toMatchObject({ status: 'degraded', worker: { state: 'stuck', waiting: 12, lastRunAt: app.clock.now().toISOString() } });
    worker = { state: 'ok', lastRunAt: null, waiting: 0 };
  });
});

describe('an answer', () => {
  it('forbids scripts and frames from elsewhere, and lets no cache keep what is a person’s', async () => {
    const { headers } = await app.browser().get('/api/health');
    expect(headers['content-security-policy']).toMatch(/default-src 'none'/);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['x-powered-by']).toBeUndefined();
    expect(headers['cache-control']).toBe('private, no-cache');
  });

  it('to an operation that does not exist says so as problem details', async () => {
    const answer = await app.browser().get('/api/nothing-here').expect(404);
    expect(answer.headers['content-type']).toMatch(/application\/problem\+json/);
    expect(answer.body).toMatchObject({ status: 404, title: 'Not found' });
  });
});

describe('a server whose database is gone', () => {
  it('says so instead of failing', async () => {
    const lost = await createTestApp();
    await lost.close();
    const answer = await lost.browser().get('/api/health').expect(200);
    expect(answer.body).toMatchObject({ status: 'degraded', database: 'down' });
  });
});
