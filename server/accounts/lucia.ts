import { createHash } from 'node:crypto';
import { Lucia, TimeSpan, type Adapter, type DatabaseSession, type DatabaseUser } from 'lucia';
import { Op } from 'sequelize';
import { select } from '../database/connection.ts';
import type { Services } from '../services.ts';

/** What a session brings along of its person. */
export interface SessionPerson {
  name: string;
  email: string;
}

declare module 'lucia' {
  interface Register {
    Lucia: Lucia<Record<never, never>, SessionPerson>;
    DatabaseUserAttributes: SessionPerson;
  }
}

/** Sessions are looked up by this: the id itself is only ever in the person's cookie. */
export const sessionIdHash = (sessionId: string): string => createHash('sha256').update(sessionId).digest('hex');

interface Joined {
  userId: string;
  expiresAt: Date;
  name: string;
  email: string;
}

/** Lucia's door to our tables; it hands over session ids in clear, and this keeps only their hashes. */
function createAdapter({ models, sequelize, clock }: Services): Adapter {
  const session = (id: string, userId: string, expiresAt: Date): DatabaseSession => ({ id, userId, expiresAt, attributes: {} });
  return {
    async getSessionAndUser(id): Promise<[DatabaseSession | null, DatabaseUser | null]> {
      const [row] = await select<Joined>(
        sequelize,
        'SELECT s.user_id AS userId, s.expires_at AS expiresAt, u.name, u.email FROM sessions s JOIN users u ON u.id = s.user_id WHERE s.id_hash = :idHash',
        { idHash: sessionIdHash(id) },
      );
      if (!row) return [null, null];
      return [session(id, row.userId, new Date(row.expiresAt)), { id: row.userId, attributes: { name: row.name, email: row.email } }];
    },
    async getUserSessions(userId) {
      // By their hashes, for want of the ids: enough to count them.
      return (await models.sessions.findAll({ where: { userId } })).map((row) => session(row.idHash, row.userId, row.expiresAt));
    },
    async setSession({ id, userId, expiresAt }) {
      await models.sessions.create({ idHash: sessionIdHash(id), userId, expiresAt, createdAt: clock.now() });
    },
    async updateSessionExpiration(id, expiresAt) {
      await models.sessions.update({ expiresAt }, { where: { idHash: sessionIdHash(id) } });
    },
    async deleteSession(id) {
      await models.sessions.destroy({ where: { idHash: sessionIdHash(id) } });
    },
    async deleteUserSessions(userId) {
      await models.sessions.destroy({ where: { userId } });
    },
    async deleteExpiredSessions() {
      await models.sessions.destroy({ where: { expiresAt: { [Op.lte]: clock.now() } } });
    },
  };
}

/** Sessions of 30 days, renewed in their second half. Lucia reads the machine's own clock for their expiry, also in the demo. */
export function createLucia(services: Services) {
  return new Lucia(createAdapter(services), {
    sessionExpiresIn: new TimeSpan(30, 'd'),
    sessionCookie: { name: 'dawnvane_session', expires: false, attributes: { secure: services.settings.production, sameSite: 'lax', path: '/' } },
    getUserAttributes: ({ name, email }) => ({ name, email }),
  });
}
