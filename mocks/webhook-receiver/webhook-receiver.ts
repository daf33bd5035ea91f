import { randomBytes, randomUUID } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { http, HttpResponse, type HttpHandler } from 'msw';
import type { z } from 'zod';
import type { demoHookSchema } from '../../shared/api/system.ts';
import { FaultQueue } from '../faults.ts';
import { KeptLog } from '../kept-log.ts';
import { signatureIsValid } from './verify.ts';

export type DemoHook = z.infer<typeof demoHookSchema>;
export const webhookOrigin = 'https://hooks.dawnvane-demo.invalid';
const toleranceS = 300;

export interface WebhookReceiver {
  handlers: HttpHandler[];
  faults: FaultQueue;
  /** Address and secret of the receiver that the demo farm sends to. */
  url: string;
  secret: string;
  /** Another secret to check by, for an address under the same origin. */
  trust(secret: string): void;
  /** Newest first. */
  hooks(): DemoHook[];
  /** Forgets what was received. */
  clear(): void;
}

/** A receiver of outgoing webhooks that checks signature and date by itself. Its secret is made at the first start and kept in a file. */
export function createWebhookReceiver({ clock, logFile = null, secretFile = null }: { clock: { now(): Date }; logFile?: string | null; secretFile?: string | null }): WebhookReceiver {
  const log = new KeptLog<DemoHook>(logFile);
  const faults = new FaultQueue();
  const secret = secretFile && existsSync(secretFile) ? readFileSync(secretFile, 'utf8') : `whsec_${randomBytes(32).toString('base64')}`;
  if (secretFile) writeFileSync(secretFile, secret, { mode: 0o600 });
  const secrets = [secret];

  async function receive(request: Request): Promise<Response> {
    const body = await request.text();
    const id = request.headers.get('webhook-id') ?? '';
    const timestamp = request.headers.get('webhook-timestamp') ?? '';
    const signature = request.headers.get('webhook-signature') ?? '';
    const dated = Math.abs(clock.now().getTime() / 1000 - Number(timestamp)) <= toleranceS;
    const signatureValid = dated && secrets.some((one) => signatureIsValid(one, id, timestamp, body, signature));
    const answer = (await faults.next()) ?? HttpResponse.json(signatureValid ? { received: id } : { error: 'signature' }, { status: signatureValid ? 200 : 401 });
    log.add({ id: randomUUID(), receivedAt: clock.now().toISOString(), url: request.url, messageId: id, timestamp, signatureValid, status: answer.status, body });
    return answer;
  }

  return { handlers: [http.post(`${webhookOrigin}/*`, ({ request }) => receive(request))], faults, url: `${webhookOrigin}/quillbrook`, secret, trust: (one) => secrets.push(one), hooks: () => log.items, clear: () => log.clear() };
}
