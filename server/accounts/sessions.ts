import type { Request, Response } from 'express';
import { Op, type Transaction } from 'sequelize';
import type { Services } from '../services.ts';
import { createLucia, sessionIdHash, type SessionPerson } from './lucia.ts';

/** Who a request's cookie stands for. */
export interface SignedIn extends SessionPerson {
  userId: string;
  sessionId: string;
}

const kept = new WeakMap<Services, ReturnType<typeof createLucia>>();

function luciaOf(services: Services): ReturnType<typeof createLucia> {
  const lucia = kept.get(services) ?? createLucia(services);
  kept.set(services, lucia);
  return lucia;
}

/** Who a request's cookie stands for; null when nobody. Renews the cookie when its session was renewed. */
export async function sessionOf(request: Request, response: Response, services: Services): Promise<SignedIn | null> {
  const lucia = luciaOf(services);
  const id = lucia.readSessionCookie(request.headers.cookie ?? '');
  if (!id) return null;
  const { session, user } = await lucia.validateSession(id);
  if (!session) {
    response.append('Set-Cookie', lucia.createBlankSessionCookie().serialize());
    return null;
  }
  if (session.fresh) response.append('Set-Cookie', lucia.createSessionCookie(session.id).serialize());
  const { id: userId, name, email, emailConfirmed, roles } = user;
  return { userId, sessionId: session.id, name, email, emailConfirmed, roles };
}

/** Opens a session and sets its cookie; clears away sessions that have run out, anyone's. */
export async function openSession(services: Services, userId: string, response: Response): Promise<void> {
  const lucia = luciaOf(services);
  await lucia.deleteExpiredSessions();
  const session = await lucia.createSession(userId, {});
  response.append('Set-Cookie', lucia.createSessionCookie(session.id).serialize());
}

/** Ends one session and clears its cookie. */
export async function closeSession(services: Services, sessionId: string, response: Response): Promise<void> {
  const lucia = luciaOf(services);
  await lucia.invalidateSession(sessionId);
  response.append('Set-Cookie', lucia.createBlankSessionCookie().serialize());
}

/** Ends every session of a person but the one named; all of them when none is. */
export async function closeOtherSessions({ models }: Services, userId: string, exceptSessionId: string | null, transaction: Transaction): Promise<void> {
  await models.sessions.destroy({ where: { userId, ...(exceptSessionId ? { idHash: { [Op.ne]: sessionIdHash(exceptSessionId) } } : {}) }, transaction });
}
