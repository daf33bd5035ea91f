/** A push as it waits in the outbox; the channel adds addresses, token and lateness when it sends. */
export interface PushPayload {
  title: string;
  body: string;
  /** Path that a tap opens. */
  path: string;
  /** A newer notification of the same tag replaces the older one on the device. */
  tag: string;
  /** A newer message of the same topic replaces one that the push service still holds (RFC 8030 §5.4). */
  topic: string;
  urgency: 'normal' | 'high';
  /** What kind of notice, for the pages and the service worker. */
  kind: string;
  sign: 'go' | 'hold' | 'unknown' | null;
  language: string;
  /** Said when it is sent late; `{minutes}` is filled in. */
  lateNote: string;
}

/** An e-mail as it waits in the outbox. */
export interface MailPayload {
  subject: string;
  text: string;
  /** `lateMark` in it is replaced by the note on lateness, or by nothing. */
  html: string;
  /** Letters of one thread are shown together; null: stands alone. */
  thread: string | null;
  lateNote: string | null;
}
export const lateMark = '<!--late-->';

/** The event an outgoing webhook carries, whole: its bytes are the same at every try. */
export interface WebhookPayload {
  /** Dotted name, such as `notice.dawn`. */
  type: string;
  /** UTC instant of the event. */
  timestamp: string;
  data: Record<string, unknown>;
}

/** Minutes after which a message counts as late. */
const lateFromMinutes = 3;

/** The note on lateness, or null when the message is in time. */
export function lateness(note: string | null, dueAt: Date, now: Date): string | null {
  const minutes = Math.floor((now.getTime() - dueAt.getTime()) / 60_000);
  return note !== null && minutes >= lateFromMinutes ? note.replace('{minutes}', String(minutes)) : null;
}
