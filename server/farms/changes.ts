import type { Transaction } from 'sequelize';
import { HttpProblem } from '../http/problem.ts';
import type { Services } from '../services.ts';

/** The stamps of a stored thing, as the database keeps them. */
export interface Stamped {
  archivedAt: Date | null;
  createdAt: Date;
  updatedAt: Date;
  updatedBy: string | null;
}

/** Instants as text, the rest as it is; who changed it stays inside. */
export function presentStamps<Row extends Stamped>(row: Row): Omit<Row, keyof Stamped> & { archivedAt: string | null; createdAt: string; updatedAt: string } {
  const { archivedAt, createdAt, updatedAt, updatedBy: _inside, ...rest } = row;
  return { ...rest, archivedAt: archivedAt?.toISOString() ?? null, createdAt: createdAt.toISOString(), updatedAt: updatedAt.toISOString() };
}

/**
 * Another person changed the thing since: 409 with both versions, who and when, so that nothing is lost.
 * @param theirs the thing as it is stored, presented @param yours what was sent
 */
export async function changedMeanwhile({ models }: Services, stored: Stamped, theirs: unknown, yours: unknown, transaction: Transaction): Promise<HttpProblem> {
  const changedBy = stored.updatedBy ? ((await models.users.findByPk(stored.updatedBy, { attributes: ['name'], transaction }))?.name ?? null) : null;
  return new HttpProblem(409, `${changedBy ?? 'Someone'} changed this since you opened it; compare the two versions and save again.`, undefined, { theirs, yours, changedBy, changedAt: stored.updatedAt.toISOString() });
}
