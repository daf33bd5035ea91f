import { createHmac, timingSafeEqual } from 'node:crypto';

/** The signature of Standard Webhooks 1.0.0 (symmetric), from the specification with node:crypto alone. */
export function webhookSignature(secret: string, id: string, timestamp: string, body: string): string {
  const key = Buffer.from(secret.replace(/^whsec_/, ''), 'base64');
  return `v1,${createHmac('sha256', key).update(`${id}.${timestamp}.${body}`, 'utf8').digest('base64')}`;
}

/** Whether one of the signatures in the header is the right one. */
export function signatureIsValid(secret: string, id: string, timestamp: string, body: string, header: string): boolean {
  const right = Buffer.from(webhookSignature(secret, id, timestamp, body));
  return header.split(' ').some((part) => {
    const offered = Buffer.from(part);
    return offered.length === right.length && timingSafeEqual(offered, right);
  });
}
