import type { Sequelize } from 'sequelize';
import type { Units } from '../../shared/api/accounts.ts';
import type { Role } from '../../shared/rules/authorization.ts';
import { instant, instantOrNull, jsonColumn, key, reference, referenceOrNull, table, text } from './table.ts';

export interface UserRow {
  id: string;
  email: string;
  emailConfirmedAt: Date | null;
  passwordHash: string;
  name: string;
  units: Units;
  language: 'en' | 'es';
  createdAt: Date;
  updatedAt: Date;
}
export interface SessionRow {
  idHash: string;
  userId: string;
  expiresAt: Date;
  createdAt: Date;
}
export interface OneTimeTokenRow {
  tokenHash: string;
  userId: string;
  purpose: 'confirm' | 'reset';
  expiresAt: Date;
  usedAt: Date | null;
  createdAt: Date;
}
export interface SettingRow {
  name: string;
  value: unknown;
  updatedAt: Date;
}
export interface MembershipRow {
  id: string;
  farmId: string;
  userId: string;
  role: Role;
  createdAt: Date;
  updatedAt: Date;
}
export interface InvitationRow {
  id: string;
  farmId: string;
  email: string;
  role: Role;
  tokenHash: string;
  invitedBy: string;
  expiresAt: Date;
  acceptedAt: Date | null;
  revokedAt: Date | null;
  createdAt: Date;
}
export interface AuditEntryRow {
  id: string;
  farmId: string | null;
  userId: string | null;
  what: string;
  subject: string;
  details: unknown;
  createdAt: Date;
}

export const accountTables = (sequelize: Sequelize) => ({
  users: table<UserRow>(sequelize, 'users', {
    id: key(), email: text(254), emailConfirmedAt: instantOrNull(), passwordHash: text(), name: text(120), units: text(10), language: text(5), createdAt: instant(), updatedAt: instant(),
  }),
  sessions: table<SessionRow>(sequelize, 'sessions', { idHash: { ...text(64), primaryKey: true }, userId: reference(), expiresAt: instant(), createdAt: instant() }),
  oneTimeTokens: table<OneTimeTokenRow>(sequelize, 'one_time_tokens', {
    tokenHash: { ...text(64), primaryKey: true }, userId: reference(), purpose: text(10), expiresAt: instant(), usedAt: instantOrNull(), createdAt: instant(),
  }),
  settings: table<SettingRow>(sequelize, 'settings', { name: { ...text(80), primaryKey: true }, value: jsonColumn('value'), updatedAt: instant() }),
  memberships: table<MembershipRow>(sequelize, 'memberships', { id: key(), farmId: reference(), userId: reference(), role: text(12), createdAt: instant(), updatedAt: instant() }),
  invitations: table<InvitationRow>(sequelize, 'invitations', {
    id: key(), farmId: reference(), email: text(254), role: text(12), tokenHash: text(64), invitedBy: reference(), expiresAt: instant(), acceptedAt: instantOrNull(), revokedAt: instantOrNull(), createdAt: instant(),
  }),
  auditEntries: table<AuditEntryRow>(sequelize, 'audit_entries', {
    id: key(), farmId: referenceOrNull(), userId: referenceOrNull(), what: text(60), subject: text(200), details: jsonColumn('details'), createdAt: instant(),
  }),
});
