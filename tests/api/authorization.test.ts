import { randomUUID } from 'node:crypto';
import type { Express } from 'express';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { allEndpoints } from '../../shared/api/index.ts';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import { authorization, may, roles, type Role } from '../../shared/rules/authorization.ts';
import { createTestApp, type TestApp } from '../support/app.ts';
import { buildFarm, signInAs, type Browser } from '../support/people.ts';

let app: TestApp;
let farmId: string;
let otherFarmId: string;
const browsers = new Map<Role, Browser>();

beforeAll(async () => {
  app = await createTestApp({ settings: { demo: true } });
  farmId = await buildFarm(app);
  otherFarmId = await buildFarm(app);
  for (const role of roles) browsers.set(role, await signInAs(app, farmId, role));
});
afterAll(() => app.close());

const guarded = allEndpoints.filter((endpoint): endpoint is Endpoint & { access: { resource: keyof typeof authorization; action: 'read' } } => typeof endpoint.access === 'object');

const addressOf = (endpoint: Endpoint, farm: string): string => endpoint.path.replace(':farmId', farm).replace(':date', '2026-06-10').replace(/:\w+/g, randomUUID());
const call = (browser: Browser, endpoint: Endpoint, farm: string) => browser[endpoint.method](addressOf(endpoint, farm)).send(endpoint.method === 'get' ? undefined : {});

/** Every route that Express really has, as `method path`. */
function registeredRoutes(express: Express): string[] {
  const layers = (express as unknown as { router: { stack: { route?: { path: string; methods: Record<string, boolean> } }[] } }).router.stack;
  return layers.flatMap(({ route }) => (route && route.path.startsWith('/api') ? Object.keys(route.methods).map((method) => `${method} ${route.path}`) : []));
}

describe('the table of rights', () => {
  it('has a line for every route of the server, and the server a route for every line', () => {
    expect(registeredRoutes(app.app).sort()).toEqual(allEndpoints.map((endpoint) => `${endpoint.method} ${endpoint.path}`).sort());
  });

  it('asks a right of every route that names a farm', () => {
    const open = allEndpoints.filter((endpoint) => endpoint.path.includes(':farmId') && typeof endpoint.access !== 'object');
    expect(open.map((endpoint) => endpoint.id)).toEqual([]);
  });

  it('lets an observer change nothing of the farm', () => {
    for (const [resource, actions] of Object.entries(authorization)) {
      if (resource === 'device') continue;
      for (const [action, allowed] of Object.entries(actions)) if (action !== 'read') expect(allowed, `${action} ${resource}`).not.toContain('observer');
    }
  });
});

describe('without signing in', () => {
  it.each(allEndpoints.filter((endpoint) => typeof endpoint.access === 'object' || endpoint.access === 'signedIn').map((endpoint) => [endpoint.id, endpoint] as const))('%s answers 401', async (_id, endpoint) => {
    expect((await call(app.browser(), endpoint, farmId)).status).toBe(401);
  });
});

describe.each(roles)('as %s', (role) => {
  it.each(guarded.map((endpoint) => [endpoint.id, endpoint] as const))("%s answers 404 for another farm's id", async (_id, endpoint) => {
    expect((await call(browsers.get(role)!, endpoint, otherFarmId)).status).toBe(404);
  });

  it.each(guarded.map((endpoint) => [endpoint.id, endpoint] as const))('%s is refused or not as the table says', async (_id, endpoint) => {
    const { status } = await call(browsers.get(role)!, endpoint, farmId);
    if (may(role, endpoint.access.action, endpoint.access.resource)) expect(status).not.toBe(403);
    else expect(status).toBe(403);
    expect(status).toBeLessThan(500);
  });
});

describe('in production', () => {
  it('the demo does not exist', async () => {
    const plain = await createTestApp({ settings: { demo: false } });
    try {
      for (const endpoint of allEndpoints.filter((one) => one.access === 'demo')) expect((await call(plain.browser(), endpoint, farmId)).status, endpoint.id).toBe(404);
    } finally {
      await plain.close();
    }
  });
});
