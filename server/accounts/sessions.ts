import type { Request, Response } from 'express';
import { Op } from 'sequelize';
import type { Services } from '../services.ts';
import { createLucia, sessionIdHash } from './lucia.ts';

const kept = new WeakMap<Services, ReturnType<typeof createLucia>>();

function luciaOf(services: Services): ReturnType<typeof createLucia> {
  const lucia = kept.get(services) ?? createLucia(services);
  kept.set(services, lucia);
  return lucia;
}

/** Who a request's cookie stands for; null when nobody. Renews the cookie when its session was renewed. */
export async function sessionOf(request: Request, response: Response, services: Services): Promise<{ userId: string; sessionId: string; name: string; email: string } | null> {
  const lucia = luciaOf(services);
  const id = lucia.readSessionCookie(request.headers.cookie ?? '');
  if (!id) return null;
  const { session, user } = await lucia.validateSession(id);
  if (!session) {
    response.append('Set-Cookie', lucia.createBlankSessionCookie().serialize());
    return null;
  }
  if (session.fresh) response.append('Set-Cookie', lucia.createSessionCookie(session.id).serialize());
  return { userId: user.id, sessionId: session.id, name: user.name, email: user.email };
}

/** Opens a session and sets its cookie. */
export async function openSession(services: Services, userId: string, response: Response): Promise<void> {
  const lucia = luciaOf(services);
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
export async function closeOtherSessions({ models }: Services, userId: string, exceptSessionId: string | null): Promise<void> {
  await models.sessions.destroy({ where: { userId, ...(exceptSessionId ? { idHash: { [Op.ne]: sessionIdHash(exceptSessionId) } } : {}) } });
}
