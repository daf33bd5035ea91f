import { randomUUID } from 'node:crypto';
import { UniqueConstraintError, type Transaction } from 'sequelize';
import type { z } from 'zod';
import { accountEndpoints, type Me, type signUpBody } from '../../shared/api/accounts.ts';
import { audit } from '../accounts/audit.ts';
import { inEvenTime } from '../accounts/even-time.ts';
import { confirmLetter, knownAddressLetter, passwordChangedLetter, resetLetter } from '../accounts/letters.ts';
import { hashPassword, passwordMatches } from '../accounts/passwords.ts';
import { closeOtherSessions, closeSession, openSession } from '../accounts/sessions.ts';
import { endTokens, hashOfToken, issueToken, useToken } from '../accounts/tokens.ts';
import { inTransaction } from '../database/connection.ts';
import { queueLetter } from '../delivery/letters.ts';
import { HttpProblem, invalid } from '../http/problem.ts';
import { signedIn, type Register } from '../http/route.ts';
import type { Services } from '../services.ts';

const hour = 3_600_000;
const badToken = () => new HttpProblem(410, 'This link was used already or is too old; ask for a new one.');

/** Who is signed in, and at which farms. */
export async function meOf({ models, settings }: Services, userId: string): Promise<Me> {
  const user = await models.users.findByPk(userId);
  if (!user) throw new HttpProblem(401, 'Sign in, then try again.');
  const memberships = await models.memberships.findAll({ where: { userId }, order: [['createdAt', 'ASC']] });
  const farms = new Map((await models.farms.findAll({ where: { id: memberships.map((membership) => membership.farmId), archivedAt: null } })).map((farm) => [farm.id, farm]));
  return {
    id: user.id,
    email: user.email,
    name: user.name,
    units: user.units,
    language: user.language,
    emailConfirmed: user.emailConfirmedAt !== null,
    farms: memberships.flatMap(({ farmId, role }) => {
      const farm = farms.get(farmId);
      return farm ? [{ id: farmId, name: farm.name, role, timeZone: farm.timeZone }] : [];
    }),
    demo: settings.demo,
  };
}

export function accountRoutes(register: Register, services: Services): void {
  const { models, sequelize, clock, settings } = services;
  const page = (path: string, token?: string) => `${settings.publicUrl}${path}${token ? `?token=${token}` : ''}`;

  async function sendConfirmation(userId: string, name: string, email: string, transaction: Transaction): Promise<void> {
    const { token, expiresAt } = await issueToken(services, userId, 'confirm', transaction);
    await queueLetter(services, transaction, { to: email, ...confirmLetter(name, page('/confirm', token)), key: `confirm ${hashOfToken(token)}`, usefulUntil: expiresAt });
  }

  /** Opens the account, or tells the owner of a known address by letter. */
  const openAccount = ({ email, name, units, language }: z.infer<typeof signUpBody>, passwordHash: string): Promise<void> =>
    inTransaction(sequelize, async (transaction) => {
      const now = clock.now();
      const known = await models.users.findOne({ where: { email }, transaction });
      if (known) {
        const letter = knownAddressLetter(known.name, page('/sign-in'));
        await queueLetter(services, transaction, { to: known.email, ...letter, key: `known ${known.id} ${Math.floor(now.getTime() / hour)}`, usefulUntil: new Date(now.getTime() + 24 * hour) });
        return;
      }
      const id = randomUUID();
      await models.users.create({ id, email, emailConfirmedAt: null, passwordHash, name, units, language, createdAt: now, updatedAt: now }, { transaction });
      await sendConfirmation(id, name, email, transaction);
    });

  register(accountEndpoints.signUp, async ({ body }) => {
    const opening = async () => {
      const passwordHash = await hashPassword(body.password);
      try {
        await openAccount(body, passwordHash);
      } catch (error) {
        // The same address at the same moment: the other one opened the account, this one is told so by letter.
        if (!(error instanceof UniqueConstraintError)) throw error;
        await openAccount(body, passwordHash);
      }
    };
    await inEvenTime(opening());
    return undefined;
  });

  register(accountEndpoints.resendConfirmation, async ({ caller }) => {
    const { userId, name, email, emailConfirmed } = signedIn(caller);
    if (!emailConfirmed) await inTransaction(sequelize, (transaction) => sendConfirmation(userId, name, email, transaction));
    return undefined;
  });

  register(accountEndpoints.confirmEmail, async ({ body }) => {
    await inTransaction(sequelize, async (transaction) => {
      const userId = await useToken(services, body.token, 'confirm', transaction);
      if (!userId) throw badToken();
      await models.users.update({ emailConfirmedAt: clock.now(), updatedAt: clock.now() }, { where: { id: userId }, transaction });
    });
    return undefined;
  });

  register(accountEndpoints.signIn, async ({ body, response }) => {
    const user = await models.users.findOne({ where: { email: body.email } });
    if (!(await passwordMatches(user?.passwordHash ?? null, body.password)) || !user) throw new HttpProblem(401, 'Address or password is not right.');
    await openSession(services, user.id, response);
    return meOf(services, user.id);
  });

  register(accountEndpoints.signOut, async ({ caller, response }) => {
    await closeSession(services, signedIn(caller).sessionId, response);
    return undefined;
  });

  register(accountEndpoints.me, async ({ caller }) => meOf(services, signedIn(caller).userId));

  register(accountEndpoints.updateMe, async ({ caller, body }) => {
    const { userId } = signedIn(caller);
    await models.users.update({ ...body, updatedAt: clock.now() }, { where: { id: userId } });
    return meOf(services, userId);
  });

  register(accountEndpoints.changePassword, async ({ caller, body }) => {
    const { userId, sessionId } = signedIn(caller);
    const user = await models.users.findByPk(userId, { rejectOnEmpty: true });
    if (!(await passwordMatches(user.passwordHash, body.currentPassword))) throw invalid([{ path: 'currentPassword', message: 'is not your present password' }]);
    const passwordHash = await hashPassword(body.newPassword);
    await inTransaction(sequelize, (transaction) => setPassword(userId, passwordHash, 'password changed', sessionId, transaction));
    return undefined;
  });

  register(accountEndpoints.requestReset, async ({ body }) => {
    await inEvenTime(
      inTransaction(sequelize, async (transaction) => {
        const user = await models.users.findOne({ where: { email: body.email }, transaction });
        if (!user) return;
        const { token, expiresAt } = await issueToken(services, user.id, 'reset', transaction);
        await queueLetter(services, transaction, { to: user.email, ...resetLetter(user.name, page('/reset', token)), key: `reset ${hashOfToken(token)}`, usefulUntil: expiresAt });
      }),
    );
    return undefined;
  });

  register(accountEndpoints.resetPassword, async ({ body }) => {
    const passwordHash = await hashPassword(body.password);
    await inTransaction(sequelize, async (transaction) => {
      const userId = await useToken(services, body.token, 'reset', transaction);
      if (!userId) throw badToken();
      await setPassword(userId, passwordHash, 'password reset', null, transaction);
      // Whoever can read the letters owns the address.
      await models.users.update({ emailConfirmedAt: clock.now() }, { where: { id: userId, emailConfirmedAt: null }, transaction });
    });
    return undefined;
  });

  register(accountEndpoints.acceptInvitation, async ({ body, caller }) => {
    const { userId, email, name } = signedIn(caller);
    await inTransaction(sequelize, async (transaction) => {
      const now = clock.now();
      const invitation = await models.invitations.findOne({ where: { tokenHash: hashOfToken(body.token) }, lock: transaction.LOCK.UPDATE, transaction });
      if (!invitation || invitation.acceptedAt || invitation.revokedAt || invitation.expiresAt <= now) throw badToken();
      if (invitation.email !== email) throw new HttpProblem(403, 'This invitation is for another address: sign in with the address it was sent to.');
      const already = await models.memberships.findOne({ where: { farmId: invitation.farmId, userId }, transaction });
      if (!already) await models.memberships.create({ id: randomUUID(), farmId: invitation.farmId, userId, role: invitation.role, createdAt: now, updatedAt: now }, { transaction });
      await invitation.update({ acceptedAt: now }, { transaction });
      // The token came by e-mail to this address: that confirms it.
      await models.users.update({ emailConfirmedAt: now }, { where: { id: userId, emailConfirmedAt: null }, transaction });
      await audit(services, transaction, { farmId: invitation.farmId, userId, what: 'invitation accepted', subject: name, details: { role: invitation.role } });
    });
    return meOf(services, userId);
  });

  /** Sets a password, ends every other session and every open reset, and tells the person by letter: all or nothing. */
  async function setPassword(userId: string, passwordHash: string, what: string, exceptSessionId: string | null, transaction: Transaction): Promise<void> {
    const now = clock.now();
    const user = await models.users.findByPk(userId, { transaction, rejectOnEmpty: true });
    await user.update({ passwordHash, updatedAt: now }, { transaction });
    await endTokens(services, userId, 'reset', transaction);
    await closeOtherSessions(services, userId, exceptSessionId, transaction);
    await audit(services, transaction, { farmId: null, userId, what, subject: user.name });
    await queueLetter(services, transaction, { to: user.email, ...passwordChangedLetter(user.name, page('/forgot')), key: `password ${userId} ${randomUUID()}`, usefulUntil: new Date(now.getTime() + 24 * hour) });
  }
}
