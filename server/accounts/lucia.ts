import { createHash } from 'node:crypto';
import { Lucia, TimeSpan, type Adapter, type DatabaseSession, type DatabaseUser } from 'lucia';
import type { Role } from '../../shared/rules/authorization.ts';
import { execute, select } from '../database/connection.ts';
import type { Services } from '../services.ts';

/** What a session brings along of its person. */
export interface SessionPerson {
  name: string;
  email: string;
  emailConfirmed: boolean;
  /** What the person is at each of their farms, by farm id. */
  roles: ReadonlyMap<string, Role>;
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
  emailConfirmedAt: Date | null;
  farmId: string | null;
  role: Role | null;
}

/** Lucia's door to our tables; it hands over session ids in clear, and this keeps only their hashes. */
function createAdapter({ models, sequelize, clock }: Services): Adapter {
  const session = (id: string, userId: string, expiresAt: Date): DatabaseSession => ({ id, userId, expiresAt, attributes: {} });
  return {
    // One question for session, person and rights: every request asks it.
    async getSessionAndUser(id): Promise<[DatabaseSession | null, DatabaseUser | null]> {
      const rows = await select<Joined>(
        sequelize,
        `SELECT s.user_id AS userId, s.expires_at AS expiresAt, u.name, u.email, u.email_confirmed_at AS emailConfirmedAt, m.farm_id AS farmId, m.role
         FROM sessions s JOIN users u ON u.id = s.user_id LEFT JOIN memberships m ON m.user_id = u.id WHERE s.id_hash = :idHash`,
        { idHash: sessionIdHash(id) },
      );
      const [first] = rows;
      if (!first) return [null, null];
      const { userId, expiresAt, name, email, emailConfirmedAt } = first;
      const roles = new Map(rows.flatMap(({ farmId, role }) => (farmId && role ? [[farmId, role] as const] : [])));
      return [session(id, userId, new Date(expiresAt)), { id: userId, attributes: { name, email, emailConfirmed: emailConfirmedAt !== null, roles } }];
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
      // By the machine's clock, as Lucia judges: a demo clock that runs ahead signs nobody out.
      await execute(sequelize, 'DELETE FROM sessions WHERE expires_at <= UTC_TIMESTAMP(3)');
    },
  };
}

/** Sessions of 30 days, renewed in their second half. Lucia reads the machine's own clock for their expiry, also in the demo. */
export function createLucia(services: Services) {
  return new Lucia(createAdapter(services), {
    sessionExpiresIn: new TimeSpan(30, 'd'),
    sessionCookie: { name: 'dawnvane_session', expires: false, attributes: { secure: services.settings.production, sameSite: 'lax', path: '/' } },
    getUserAttributes: (person) => person,
  });
}
