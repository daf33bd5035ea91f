import { lateness, type PushPayload } from '../payloads.ts';

/** Longest text that fits one push of 4096 bytes: 86 bytes header, 1 delimiter, 16 tag (RFC 8291 §4, RFC 8188). */
export const plaintextBytesMax = 3993;
/** Services are asked to take 4096 bytes but not all do; texts stay well below. */
const titleMax = 120;
const bodyMax = 700;
const shortBodyMax = 80;

const cut = (text: string, max: number): string => (text.length <= max ? text : `${text.slice(0, max - 1).trimEnd()}…`);

/**
 * The text of a push, as JSON. It is also a valid declarative message (`web_push: 8030`), which newer Safari shows by itself when
 * the service worker does not; `mutable` lets the worker have it first.
 * @param short a shorter form, for a service that found the whole one too large
 */
export function pushMessage(payload: PushPayload, facts: { origin: string; token: string; dueAt: Date; now: Date; short?: boolean }): string {
  const { origin, token, dueAt, now, short = false } = facts;
  const late = lateness(payload.lateNote, dueAt, now);
  const body = short ? cut(payload.body, shortBodyMax) : [cut(payload.body, bodyMax), late].filter(Boolean).join(' ');
  return JSON.stringify({
    web_push: 8030,
    notification: {
      title: cut(payload.title, titleMax),
      body,
      navigate: `${origin}${payload.path}`,
      lang: payload.language,
      dir: 'ltr',
      tag: payload.tag,
      silent: false,
      data: { token, kind: payload.kind, verdict: payload.sign },
    },
    mutable: true,
  });
}
