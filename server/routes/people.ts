import { randomUUID } from 'node:crypto';
import { Op, type Transaction } from 'sequelize';
import { peopleEndpoints, type Member } from '../../shared/api/people.ts';
import { audit } from '../accounts/audit.ts';
import { invitationLetter } from '../accounts/letters.ts';
import { hashOfToken, newToken } from '../accounts/tokens.ts';
import { inTransaction } from '../database/connection.ts';
import { queueLetter } from '../delivery/letters.ts';
import { HttpProblem, invalid, notFound } from '../http/problem.ts';
import { signedIn, type Register } from '../http/route.ts';
import type { InvitationRow, MembershipRow } from '../models/accounts.ts';
import type { Services } from '../services.ts';

const invitationDays = 14;
const auditRowsMax = 200;

const presentInvitation = ({ id, email, role, createdAt, expiresAt }: InvitationRow, invitedBy: string) => ({ id, email, role, invitedBy, createdAt: createdAt.toISOString(), expiresAt: expiresAt.toISOString() });

export function peopleRoutes(register: Register, services: Services): void {
  const { models, sequelize, clock, settings } = services;

  async function namesOf(ids: readonly (string | null)[]): Promise<Map<string, { name: string; email: string }>> {
    const users = await models.users.findAll({ where: { id: [...new Set(ids.filter((id) => id !== null))] }, attributes: ['id', 'name', 'email'] });
    return new Map(users.map(({ id, name, email }) => [id, { name, email }]));
  }

  async function present(memberships: MembershipRow[]): Promise<Member[]> {
    const names = await namesOf(memberships.map((membership) => membership.userId));
    return memberships.map(({ id, userId, role, createdAt }) => ({ id, userId, role, joinedAt: createdAt.toISOString(), name: names.get(userId)?.name ?? '', email: names.get(userId)?.email ?? '' }));
  }

  /** Locks the farm's owners, so that two of them cannot leave at once. */
  async function refuseLastOwner(farmId: string, membershipId: string, transaction: Transaction): Promise<void> {
    const owners = await models.memberships.findAll({ where: { farmId, role: 'owner' }, lock: transaction.LOCK.UPDATE, transaction });
    if (owners.length === 1 && owners[0]!.id === membershipId) throw new HttpProblem(422, 'A farm keeps at least one owner: make another member owner first.', [{ path: 'role', message: 'the last owner stays owner' }]);
  }

  register(peopleEndpoints.list, async ({ params: { farmId } }) => {
    const memberships = await models.memberships.findAll({ where: { farmId }, order: [['createdAt', 'ASC']] });
    const open = await models.invitations.findAll({ where: { farmId, acceptedAt: null, revokedAt: null, expiresAt: { [Op.gt]: clock.now() } }, order: [['createdAt', 'DESC']] });
    const names = await namesOf(open.map((invitation) => invitation.invitedBy));
    return { members: await present(memberships), invitations: open.map((invitation) => presentInvitation(invitation, names.get(invitation.invitedBy)?.name ?? '')) };
  });

  register(peopleEndpoints.invite, async ({ params: { farmId }, body, caller }) => {
    const { userId, name, emailConfirmed } = signedIn(caller);
    if (!emailConfirmed) throw new HttpProblem(403, 'Confirm your own e-mail address first: then letters go out in your name.');
    return inTransaction(sequelize, async (transaction) => {
      const now = clock.now();
      const farm = await models.farms.findByPk(farmId, { transaction, rejectOnEmpty: true });
      const known = await models.users.findOne({ where: { email: body.email }, transaction });
      if (known && (await models.memberships.count({ where: { farmId, userId: known.id }, transaction })) > 0) throw invalid([{ path: 'email', message: 'belongs to a member of this farm already' }]);
      // A new letter replaces an older one: only the newest link opens the door.
      await models.invitations.update({ revokedAt: now }, { where: { farmId, email: body.email, acceptedAt: null, revokedAt: null }, transaction });
      const { token, tokenHash } = newToken();
      const invitation = await models.invitations.create(
        { id: randomUUID(), farmId, email: body.email, role: body.role, tokenHash, invitedBy: userId, expiresAt: new Date(now.getTime() + invitationDays * 86_400_000), acceptedAt: null, revokedAt: null, createdAt: now },
        { transaction },
      );
      await queueLetter(services, transaction, { to: body.email, ...invitationLetter(farm.name, name, body.role, `${settings.publicUrl}/invitation?token=${token}`), key: `invitation ${hashOfToken(token)}`, usefulUntil: invitation.expiresAt });
      await audit(services, transaction, { farmId, userId, what: 'person invited', subject: body.email, details: { role: body.role } });
      return presentInvitation(invitation, name);
    });
  });

  register(peopleEndpoints.revoke, async ({ params: { farmId, id }, caller }) => {
    await inTransaction(sequelize, async (transaction) => {
      const invitation = await models.invitations.findOne({ where: { id, farmId, acceptedAt: null, revokedAt: null }, transaction });
      if (!invitation) throw notFound();
      await invitation.update({ revokedAt: clock.now() }, { transaction });
      await audit(services, transaction, { farmId, userId: signedIn(caller).userId, what: 'invitation taken back', subject: invitation.email });
    });
    return undefined;
  });

  register(peopleEndpoints.changeRole, async ({ params: { farmId, id }, body, caller }) =>
    inTransaction(sequelize, async (transaction) => {
      const membership = await models.memberships.findOne({ where: { id, farmId }, transaction });
      if (!membership) throw notFound();
      if (body.role !== 'owner') await refuseLastOwner(farmId, id, transaction);
      const before = membership.role;
      await membership.update({ role: body.role, updatedAt: clock.now() }, { transaction });
      const [member] = await present([membership.get({ plain: true })]);
      await audit(services, transaction, { farmId, userId: signedIn(caller).userId, what: 'role changed', subject: member!.name, details: { before, after: body.role } });
      return member!;
    }),
  );

  register(peopleEndpoints.remove, async ({ params: { farmId, id }, caller }) => {
    await inTransaction(sequelize, async (transaction) => {
      const membership = await models.memberships.findOne({ where: { id, farmId }, transaction });
      if (!membership) throw notFound();
      await refuseLastOwner(farmId, id, transaction);
      const [member] = await present([membership.get({ plain: true })]);
      await models.devices.destroy({ where: { farmId, userId: membership.userId }, transaction });
      await models.wishes.destroy({ where: { farmId, userId: membership.userId }, transaction });
      await membership.destroy({ transaction });
      await audit(services, transaction, { farmId, userId: signedIn(caller).userId, what: 'person removed', subject: member!.name });
    });
    return undefined;
  });

  register(peopleEndpoints.audit, async ({ params: { farmId } }) => {
    const rows = await models.auditEntries.findAll({ where: { farmId }, order: [['createdAt', 'DESC'], ['id', 'DESC']], limit: auditRowsMax });
    const names = await namesOf(rows.map((row) => row.userId));
    return {
      items: rows.map(({ id, createdAt, userId, what, subject, details }) => ({ id, at: createdAt.toISOString(), who: userId ? (names.get(userId)?.name ?? 'a person no longer here') : 'Dawnvane', what, subject, details: details as Record<string, unknown> })),
    };
  });
}
