import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { maskedAddress } from './mask.ts';
import { outboxSignal } from './signal.ts';
import type { Services } from '../services.ts';

/** A letter outside any notice: a confirmation, a reset, an invitation. */
export interface Letter {
  to: string;
  subject: string;
  text: string;
  html: string;
  /** Names the letter for ever: a second one with the same key is not sent. Visible ASCII, at most 300 characters. */
  key: string;
  /** After this instant the letter helps no more and is dropped. */
  usefulUntil: Date;
}

/** What a waiting letter keeps; blanked once it is delivered or given up, because it may carry tokens. */
export interface LetterPayload {
  letter: { subject: string; text: string; html: string };
}

/**
 * Puts a letter into the outbox, in the caller's transaction: it goes out if and only if that commits.
 * @returns false when a letter of this key is there already
 */
export async function queueLetter({ models, clock, sequelize }: Services, transaction: Transaction, letter: Letter): Promise<boolean> {
  const deliveryKey = `letter:${letter.key}`;
  if ((await models.deliveries.count({ where: { deliveryKey }, transaction })) > 0) return false;
  const now = clock.now();
  const payload: LetterPayload = { letter: { subject: letter.subject, text: letter.text, html: letter.html } };
  await models.deliveries.create(
    {
      id: randomUUID(), noticeId: null, farmId: null, channel: 'email', target: letter.to, recipient: maskedAddress(letter.to), deliveryKey, state: 'waiting', payload,
      attempts: 0, dueAt: now, nextAttemptAt: now, usefulUntil: letter.usefulUntil, createdAt: now, updatedAt: now,
    },
    { transaction },
  );
  transaction.afterCommit(() => outboxSignal(sequelize).notify());
  return true;
}
