import type { Transaction } from 'sequelize';
import type { Services } from '../services.ts';
import { maskedAddress } from './mask.ts';
import { queueDelivery } from './outbox.ts';

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

/**
 * Puts a letter into the outbox, in the caller's transaction: it goes out if and only if that commits.
 * Its text is blanked once it is delivered or given up, because it may carry tokens.
 * @returns false when a letter of this key is there already
 */
export function queueLetter(services: Services, transaction: Transaction, letter: Letter): Promise<boolean> {
  const { to, subject, text, html, key, usefulUntil } = letter;
  return queueDelivery(services, transaction, {
    noticeId: null, farmId: null, channel: 'email', target: to, recipient: maskedAddress(to), key: `${letterPrefix}${key}`, order: null,
    payload: { subject, text, html, thread: null, lateNote: null }, dueAt: services.clock.now(), usefulUntil, ackTokenHash: null,
  });
}

/** Begins the delivery key of a letter. */
export const letterPrefix = 'letter:';
