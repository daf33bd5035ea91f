import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Services } from '../services.ts';

export interface AuditedChange {
  farmId: string | null;
  userId: string | null;
  /** What was done, as a verb in the past with its object: `role changed`. */
  what: string;
  /** To whom or what, for a person to read. */
  subject: string;
  details?: Record<string, unknown>;
}

/** Notes who changed people, keys or limits, in the transaction of the change itself. */
export async function audit({ models, clock }: Services, transaction: Transaction, { farmId, userId, what, subject, details = {} }: AuditedChange): Promise<void> {
  await models.auditEntries.create({ id: randomUUID(), farmId, userId, what, subject: subject.slice(0, 200), details, createdAt: clock.now() }, { transaction });
}

/** The fields that differ between two states, each with before and after. */
export function differences(before: object, after: object, fields: readonly string[]): Record<string, { before: unknown; after: unknown }> {
  const read = (state: object, field: string): unknown => (state as Record<string, unknown>)[field] ?? null;
  return Object.fromEntries(
    fields.filter((field) => JSON.stringify(read(before, field)) !== JSON.stringify(read(after, field))).map((field) => [field, { before: read(before, field), after: read(after, field) }]),
  );
}
