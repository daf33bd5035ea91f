import { randomUUID } from 'node:crypto';
import { http, HttpResponse, type HttpHandler } from 'msw';
import type { z } from 'zod';
import type { demoPushSchema } from '../../shared/api/system.ts';
import { KeptLog } from '../kept-log.ts';
import { FaultQueue } from '../faults.ts';
import { decryptPush } from './decrypt.ts';
import { pushServiceOrigin, type DemoPhone } from './phone.ts';
import { vapidProblem } from './vapid.ts';

export type DemoPush = z.infer<typeof demoPushSchema>;

/** A push as it reached the phone, with the token by which the phone tells that it was shown. */
export interface ReceivedPush {
  push: DemoPush;
  token: string | null;
  text: string;
}

interface Message {
  web_push?: number;
  notification?: { title?: string; body?: string; navigate?: string; tag?: string; data?: { token?: string; verdict?: DemoPush['verdict'] } };
}

const refuse = (status: number, reason: string): Response => HttpResponse.json({ reason }, { status });
const urgencies = ['very-low', 'low', 'normal', 'high'];
const bytesMax = 4096;

export interface PushServiceFake {
  handlers: HttpHandler[];
  faults: FaultQueue;
  /** Everything that reached the phones, newest first. */
  received(): DemoPush[];
  /** What the phones show: of one tag on one phone, and of one topic, only the newest. */
  shown(): DemoPush[];
  /** Forgets what was received. */
  clear(): void;
  /** Called for each push that reached a phone. */
  onPush(listener: (received: ReceivedPush) => void): void;
}

/** A push service after RFC 8030, as strict as the strictest real one, together with the phones at its other end. */
export function createPushService({ clock, phones, logFile = null }: { clock: { now(): Date }; phones: DemoPhone[]; logFile?: string | null }): PushServiceFake {
  const log = new KeptLog<DemoPush>(logFile);
  const faults = new FaultQueue();
  const listeners: ((received: ReceivedPush) => void)[] = [];

  async function receive(request: Request, phoneId: string): Promise<Response> {
    const fault = await faults.next();
    if (fault) return fault;
    const phone = phones.find(({ id }) => id === phoneId);
    if (!phone || phone.subscribedWith === null) return refuse(410, 'Unregistered');
    const problem = vapidProblem(request.headers.get('authorization'), pushServiceOrigin, phone.subscribedWith, clock.now());
    if (problem) return refuse(problem.status, problem.reason);
    const ttl = request.headers.get('ttl');
    if (ttl === null || !/^\d+$/.test(ttl)) return refuse(400, 'BadTtl');
    const urgency = request.headers.get('urgency') ?? 'normal';
    if (!urgencies.includes(urgency)) return refuse(400, 'BadUrgency');
    const topic = request.headers.get('topic');
    if (topic !== null && !/^[\w-]{1,32}$/.test(topic)) return refuse(400, 'BadTopic');
    if (request.headers.get('content-encoding') !== 'aes128gcm') return refuse(400, 'BadContentEncoding');
    const body = Buffer.from(await request.arrayBuffer());
    if (body.length > bytesMax) return refuse(413, 'PayloadTooLarge');
    let text: string;
    try {
      text = decryptPush(body, phone.keys).plaintext.toString('utf8');
    } catch {
      return refuse(400, 'BadPayload');
    }
    const message = JSON.parse(text) as Message;
    const { notification } = message;
    const push: DemoPush = {
      id: randomUUID(), receivedAt: clock.now().toISOString(), title: notification?.title ?? '', body: notification?.body ?? '', url: notification?.navigate ?? '', tag: notification?.tag ?? null, topic,
      ttlSeconds: Number(ttl), urgency, verdict: notification?.data?.verdict ?? null, device: phone.name,
    };
    log.add(push);
    for (const listener of listeners) listener({ push, token: notification?.data?.token ?? null, text });
    return new HttpResponse(null, { status: 201, headers: { Location: `${pushServiceOrigin}/message/${push.id}`, TTL: ttl } });
  }

  return {
    handlers: [http.post(`${pushServiceOrigin}/send/:phone`, ({ request, params }) => receive(request, String(params['phone'])))],
    faults,
    received: () => log.items,
    shown: () => log.items.filter((push, index, all) => push.tag === null || all.findIndex((other) => other.tag === push.tag && other.device === push.device) === index),
    clear: () => log.clear(),
    onPush: (listener) => listeners.push(listener),
  };
}
