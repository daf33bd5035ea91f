import { randomUUID } from 'node:crypto';
import type supertest from 'supertest';
import { hashPassword } from '../../server/accounts/passwords.ts';
import type { Role } from '../../shared/rules/authorization.ts';
import type { TestApp } from './app.ts';

export type Browser = ReturnType<typeof supertest.agent>;
export const password = 'a long enough password';
let hash: Promise<string> | null = null;
let count = 0;

/** A confirmed person with an account; `name` makes the address. */
export async function buildUser({ services: { models, clock } }: TestApp, name = `person ${(count += 1)}`): Promise<{ id: string; email: string; name: string }> {
  hash ??= hashPassword(password);
  const now = clock.now();
  const email = `${name.toLowerCase().replace(/\W+/g, '-')}@example.org`;
  const id = randomUUID();
  await models.users.create({ id, email, emailConfirmedAt: now, passwordHash: await hash, name, units: 'us', language: 'en', createdAt: now, updatedAt: now });
  return { id, email, name };
}

export async function buildFarm({ services: { models, clock } }: TestApp, name = `farm ${(count += 1)}`): Promise<string> {
  const now = clock.now();
  const id = randomUUID();
  await models.farms.create({ id, name, latitude: 44.7, longitude: -85.3, elevationM: 260, exposure: 'open', timeZone: 'America/Detroit', units: 'us', eveTime: '20:00', dawnLeadMinutes: 30, version: 1, archivedAt: null, createdAt: now, updatedAt: now });
  return id;
}

export async function join({ services: { models, clock } }: TestApp, farmId: string, userId: string, role: Role): Promise<string> {
  const id = randomUUID();
  await models.memberships.create({ id, farmId, userId, role, createdAt: clock.now(), updatedAt: clock.now() });
  return id;
}

/** A new person with a role at a farm, signed in in a browser of their own. */
export async function signInAs(app: TestApp, farmId: string, role: Role): Promise<Browser & { userId: string; email: string }> {
  const user = await buildUser(app);
  await join(app, farmId, user.id, role);
  const browser = app.browser();
  await browser.post('/api/account/sign-in').send({ email: user.email, password }).expect(200);
  return Object.assign(browser, { userId: user.id, email: user.email });
}

/** The letters waiting in the outbox for an address, newest last. */
export async function lettersTo({ services: { models } }: TestApp, email: string): Promise<{ subject: string; text: string; link: string }[]> {
  const rows = await models.deliveries.findAll({ where: { channel: 'email', target: email }, order: [['createdAt', 'ASC']] });
  return rows.map((row) => {
    const { subject, text } = row.payload as { subject: string; text: string };
    return { subject, text, link: /https?:\S+/.exec(text)?.[0] ?? '' };
  });
}
export const tokenIn = (link: string): string => new URL(link).searchParams.get('token') ?? '';
