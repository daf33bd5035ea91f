import { createHash } from 'node:crypto';
import { lateMark, lateness, type MailPayload } from '../payloads.ts';
import type { ClaimedDelivery } from '../sender.ts';

/** An e-mail ready for the transport. */
export interface ReadyMail {
  messageId: string;
  references: string | null;
  subject: string;
  text: string;
  html: string;
}

const hashed = (text: string): string => createHash('sha256').update(text).digest('hex').slice(0, 32);
const oneLine = (text: string): string => text.replace(/[\r\n]+/g, ' ');

export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);

/**
 * The same delivery always has the same Message-ID (RFC 5322 §3.6.4), so a mail sent twice after a broken connection is known as one;
 * mails of one thread refer to the same root.
 * @param host domain of the identifiers
 */
export function readyMail(delivery: Pick<ClaimedDelivery, 'deliveryKey' | 'payload' | 'dueAt'>, host: string, now: Date): ReadyMail {
  const { subject, text, html, thread, lateNote } = delivery.payload as MailPayload;
  const late = lateness(lateNote, delivery.dueAt, now);
  return {
    messageId: `<${hashed(delivery.deliveryKey)}@${host}>`,
    references: thread === null ? null : `<${hashed(`thread ${thread}`)}@${host}>`,
    subject: oneLine(subject),
    text: late ? `${late}\n\n${text}` : text,
    html: html.replace(lateMark, late ? `<p><strong>${escapeHtml(late)}</strong></p>` : ''),
  };
}
