import { randomUUID } from 'node:crypto';
import type { Express } from 'express';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { allEndpoints } from '../../shared/api/index.ts';
import type { Endpoint } from '../../shared/api/endpoint.ts';
import { authorization, may, roles, type Action, type Resource, type Role } from '../../shared/rules/authorization.ts';
import { createTestApp, type TestApp } from '../support/app.ts';
import { contentsOf, fillFarm, type FilledFarm } from '../support/filled-farm.ts';
import { buildFarm, signInAs, type Browser } from '../support/people.ts';

type Guarded = Endpoint & { access: { resource: Resource; action: Action } };

let app: TestApp;
let farmId: string;
/** Another farm, which none of the people below belongs to, with one of everything. */
let other: FilledFarm;
const browsers = new Map<Role, Browser>();

beforeAll(async () => {
  app = await createTestApp({ settings: { demo: true, permittedHosts: ['localhost'] } });
  farmId = await buildFarm(app);
  other = await fillFarm(app);
  for (const role of roles) browsers.set(role, await signInAs(app, farmId, role));
});
afterAll(() => app.close());

const isGuarded = (endpoint: Endpoint): endpoint is Guarded => typeof endpoint.access === 'object';
const guarded = allEndpoints.filter(isGuarded);
const rows = <E extends Endpoint>(endpoints: readonly E[]): [string, E][] => endpoints.map((endpoint) => [endpoint.id, endpoint]);

const addressOf = (endpoint: Endpoint, farm: string, id: string = randomUUID()): string => endpoint.path.replace(':farmId', farm).replace(':date', '2026-06-10').replace(/:\w+/g, id);
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
    const open = allEndpoints.filter((endpoint) => endpoint.path.includes(':farmId') && !isGuarded(endpoint));
    expect(open.map((endpoint) => endpoint.id)).toEqual([]);
  });

  it('lets an observer change nothing of the farm', () => {
    for (const [resource, actions] of Object.entries(authorization)) {
      if (resource === 'device') continue;
      for (const [action, allowed] of Object.entries(actions)) if (action !== 'read') expect(allowed, `${action} ${resource}`).not.toContain('observer');
    }
  });

  it('keeps people, keys and the trail of changes to owners', () => {
    for (const [resource, action] of [['person', 'create'], ['person', 'update'], ['webhook', 'create'], ['inboundSource', 'create'], ['audit', 'read'], ['farm', 'update']] as const) {
      expect(roles.filter((role) => may(role, action, resource)), `${action} ${resource}`).toEqual(['owner']);
    }
  });
});

describe('without signing in', () => {
  it.each(rows(allEndpoints.filter((endpoint) => isGuarded(endpoint) || endpoint.access === 'signedIn')))('%s answers 401', async (_id, endpoint) => {
    expect((await call(app.browser(), endpoint, farmId)).status).toBe(401);
  });
});

describe.each(roles)('as %s', (role) => {
  it.each(rows(guarded))('%s answers 404 for another farm, whether or not it exists', async (_id, endpoint) => {
    const answers = [await call(browsers.get(role)!, endpoint, other.farmId), await call(browsers.get(role)!, endpoint, randomUUID())];
    expect(answers.map((answer) => answer.status)).toEqual([404, 404]);
    expect(answers[0]!.body.detail).toBe(answers[1]!.body.detail);
  });

  it.each(rows(guarded))('%s is refused or not as the table says', async (_id, endpoint) => {
    const { status } = await call(browsers.get(role)!, endpoint, farmId);
    if (may(role, endpoint.access.action, endpoint.access.resource)) expect(status).not.toBe(403);
    else expect(status).toBe(403);
    expect(status).toBeLessThan(500);
  });
});

describe("another farm's ids in the address of one's own farm", () => {
  const withId = guarded.filter((endpoint) => endpoint.path.includes(':id'));

  it.each(rows(withId))('%s finds nothing, and changes nothing there', async (id, endpoint) => {
    const target = other.targets[id];
    expect(target, `tests/support/filled-farm.ts names no thing that ${id} could be tried on`).toBeDefined();
    const before = await contentsOf(app, other.farmId);
    for (const role of roles.filter((one) => may(one, endpoint.access.action, endpoint.access.resource))) {
      const request = browsers.get(role)![endpoint.method](addressOf(endpoint, farmId, target!.id));
      const answer = await (endpoint.bodyKind === 'multipart' ? request.attach('file', Buffer.from('%PDF-1.4\n'), 'label.pdf') : request.send(endpoint.method === 'get' ? undefined : target!.body));
      expect(answer.status, role).toBe(404);
      expect(JSON.stringify(answer.body)).not.toContain(other.secretWord);
    }
    expect(await contentsOf(app, other.farmId)).toEqual(before);
  });

  it.each(rows(withId.filter((endpoint) => endpoint.access.action !== 'read' && endpoint.access.resource !== 'device')))('but its own owner reaches them: %s', async (id, endpoint) => {
    const fresh = await fillFarm(app);
    const target = fresh.targets[id]!;
    const request = fresh.owner[endpoint.method](addressOf(endpoint, fresh.farmId, target.id));
    const answer = await (endpoint.bodyKind === 'multipart' ? request.attach('file', Buffer.from('%PDF-1.4\n'), 'label.pdf') : request.send(target.body));
    expect(answer.status, JSON.stringify(answer.body)).toBe(endpoint.status);
  });

  it('in the body of a plan are refused by their place in it', async () => {
    const answer = await browsers.get('owner')!.post(`/api/farms/${farmId}/plans`).send(other.planBody).expect(422);
    expect(answer.body.problems.map((problem: { path: string }) => problem.path)).toEqual(['blockIds.0', 'products.0.productId', 'sprayerId']);
    expect(JSON.stringify(answer.body)).not.toContain(other.secretWord);
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
