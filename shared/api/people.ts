import { z } from 'zod';
import { roles } from '../rules/authorization.ts';
import { emailSchema, farmItemParams, farmParams, idSchema, instantSchema } from './common.ts';
import { endpoint } from './endpoint.ts';

const roleSchema = z.enum(roles);
export const memberSchema = z.object({ id: idSchema, userId: idSchema, name: z.string(), email: z.string(), role: roleSchema, joinedAt: instantSchema });
export type Member = z.infer<typeof memberSchema>;
export const invitationBody = z.object({ email: emailSchema, role: roleSchema });
export const invitationSchema = z.object({ id: idSchema, email: z.string(), role: roleSchema, invitedBy: z.string(), createdAt: instantSchema, expiresAt: instantSchema });
export type Invitation = z.infer<typeof invitationSchema>;
export const auditEntrySchema = z.object({ id: idSchema, at: instantSchema, who: z.string(), what: z.string(), subject: z.string(), details: z.record(z.string(), z.unknown()) });
export type AuditEntry = z.infer<typeof auditEntrySchema>;
const access = (action: 'read' | 'create' | 'update' | 'archive') => ({ resource: 'person', action }) as const;

export const peopleEndpoints = {
  list: endpoint({ id: 'listPeople', method: 'get', path: '/api/farms/:farmId/people', summary: 'Members of the farm, and invitations still open.', access: access('read'), params: farmParams, answer: z.object({ members: z.array(memberSchema), invitations: z.array(invitationSchema) }) }),
  invite: endpoint({ id: 'invitePerson', method: 'post', path: '/api/farms/:farmId/invitations', summary: 'Invite by e-mail with a role.', access: access('create'), rateLimit: 'mail', params: farmParams, body: invitationBody, answer: invitationSchema, status: 201 }),
  revoke: endpoint({ id: 'revokeInvitation', method: 'delete', path: '/api/farms/:farmId/invitations/:id', summary: 'Take an open invitation back.', access: access('archive'), params: farmItemParams }),
  changeRole: endpoint({ id: 'changeRole', method: 'put', path: '/api/farms/:farmId/people/:id', summary: "Change a member's role; a farm keeps at least one owner.", access: access('update'), params: farmItemParams, body: z.object({ role: roleSchema }), answer: memberSchema }),
  remove: endpoint({ id: 'removePerson', method: 'delete', path: '/api/farms/:farmId/people/:id', summary: 'Remove a member; a farm keeps at least one owner.', access: access('archive'), params: farmItemParams }),
  audit: endpoint({ id: 'listAudit', method: 'get', path: '/api/farms/:farmId/audit', summary: 'What changed people, keys and limits, newest first.', access: { resource: 'audit', action: 'read' }, params: farmParams, answer: z.object({ items: z.array(auditEntrySchema) }) }),
};
