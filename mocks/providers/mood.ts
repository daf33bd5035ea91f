import { HttpResponse } from 'msw';

/** How a fake provider answers. */
export const moods = ['ok', 'error500', 'tooMany', 'slow', 'cut', 'stale', 'missingLayer', 'denied'] as const;
export type Mood = (typeof moods)[number];

/** An answer as the real service would send it. */
export interface Answer {
  status?: number;
  headers: Record<string, string>;
  body: string;
}
/** Each service fails in its own words. */
export interface Failures {
  error500: Answer;
  tooMany: Answer;
}

const denied: Answer = { status: 403, headers: { 'content-type': 'text/html' }, body: '<HTML><HEAD>\n<TITLE>Access Denied</TITLE>\n</HEAD><BODY>\n<H1>Access Denied</H1>\n</BODY>\n</HTML>\n' };

const send = ({ status = 200, headers, body }: Answer): Response => new HttpResponse(status === 304 ? null : body, { status, headers });

/** A first piece of the body, and then nothing more for as long as anyone waits. */
const stalled = ({ headers, body }: Answer): Response =>
  new HttpResponse(
    new ReadableStream({
      start(controller) {
        controller.enqueue(new TextEncoder().encode(body.slice(0, 64)));
      },
    }),
    { headers },
  );

/** Answers in a mood; `stale` and `missingLayer` are for the service itself to build into `ok`. */
export function inMood(mood: Mood, failures: Failures, ok: () => Answer): Response {
  if (mood === 'error500') return send(failures.error500);
  if (mood === 'tooMany') return send(failures.tooMany);
  if (mood === 'denied') return send(denied);
  const answer = ok();
  if (mood === 'slow' && (answer.status ?? 200) === 200) return stalled(answer);
  if (mood === 'cut' && (answer.status ?? 200) === 200) return send({ ...answer, body: answer.body.slice(0, Math.floor(answer.body.length * 0.6)) });
  return send(answer);
}

/** Two of the services refuse who does not say who asks and how to reach them. */
export const saysWhoAsks = (request: Request): boolean => /@|https?:\/\//.test(request.headers.get('user-agent') ?? '');
export { denied, send };
