import { createHash, randomBytes } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { Op } from 'sequelize';
import type { OneTimeTokenRow } from '../models/accounts.ts';
import type { Services } from '../services.ts';

/** A token for a letter, and what of it is kept. */
export function newToken(): { token: string; tokenHash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, tokenHash: hashOfToken(token) };
}
export const hashOfToken = (token: string): string => createHash('sha256').update(token).digest('hex');

const hoursValid = { confirm: 72, reset: 2 } as const;

/** Makes every open token of a purpose good no more. */
export async function endTokens({ models, clock }: Services, userId: string, purpose: OneTimeTokenRow['purpose'], transaction: Transaction): Promise<void> {
  await models.oneTimeTokens.update({ usedAt: clock.now() }, { where: { userId, purpose, usedAt: null }, transaction });
}

/** Makes a token that is good once; earlier ones of the same purpose are good no more. */
export async function issueToken(services: Services, userId: string, purpose: OneTimeTokenRow['purpose'], transaction: Transaction): Promise<{ token: string; expiresAt: Date }> {
  const { models, clock } = services;
  const now = clock.now();
  await endTokens(services, userId, purpose, transaction);
  const { token, tokenHash } = newToken();
  const expiresAt = new Date(now.getTime() + hoursValid[purpose] * 3_600_000);
  await models.oneTimeTokens.create({ tokenHash, userId, purpose, expiresAt, usedAt: null, createdAt: now }, { transaction });
  return { token, expiresAt };
}

/** Uses a token up. Answers whose it is, or null when it is unknown, used or too old; two at once cannot both succeed. */
export async function useToken({ models, clock }: Services, token: string, purpose: OneTimeTokenRow['purpose'], transaction: Transaction): Promise<string | null> {
  const now = clock.now();
  const tokenHash = hashOfToken(token);
  const [used] = await models.oneTimeTokens.update({ usedAt: now }, { where: { tokenHash, purpose, usedAt: null, expiresAt: { [Op.gt]: now } }, transaction });
  if (used !== 1) return null;
  return (await models.oneTimeTokens.findOne({ where: { tokenHash }, transaction }))?.userId ?? null;
}
