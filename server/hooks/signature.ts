import { timingSafeEqual } from 'node:crypto';
import { Webhook } from 'standardwebhooks';

/** Messages dated further from our clock than this are refused, in both directions (the tolerance of the reference libraries). */
const toleranceS = 5 * 60;
const idMax = 200;

export type SignedMessage = { id: string; timestamp: Date } | { refused: string };

interface Headers {
  'webhook-id': string | undefined;
  'webhook-timestamp': string | undefined;
  'webhook-signature': string | undefined;
}

function sameText(one: string, other: string): boolean {
  const [a, b] = [Buffer.from(one), Buffer.from(other)];
  return a.length === b.length && timingSafeEqual(a, b);
}

/**
 * Checks a message signed after Standard Webhooks 1.0.0 (symmetric, `v1`). The library computes the signature; its own `verify`
 * reads the machine's clock, so the comparison is made here against the injected one.
 * @param body the bytes as they came @param secrets all that are valid at present (`whsec_…`)
 */
export function checkSignature(headers: Headers, body: Buffer, secrets: readonly string[], now: Date): SignedMessage {
  const id = headers['webhook-id'];
  const stamp = headers['webhook-timestamp'];
  const signature = headers['webhook-signature'];
  if (!id || !stamp || !signature) return { refused: 'The headers webhook-id, webhook-timestamp and webhook-signature are all needed.' };
  if (id.length > idMax || !/^[\x21-\x7e]+$/.test(id) || id.includes('.')) return { refused: `The header webhook-id must be at most ${idMax} visible characters without a full stop.` };
  if (!/^\d{1,12}$/.test(stamp)) return { refused: 'The header webhook-timestamp must be whole seconds since 1970.' };
  const timestamp = new Date(Number(stamp) * 1000);
  const offered = signature.split(' ').filter((part) => part.startsWith('v1,'));
  const expected = secrets.map((secret) => new Webhook(secret).sign(id, timestamp, body));
  // All are compared, so that the time taken tells nothing.
  const matches = expected.flatMap((right) => offered.slice(0, 20).map((part) => sameText(right, part))).filter(Boolean).length;
  if (matches === 0) return { refused: 'The signature does not match.' };
  if (Math.abs(now.getTime() / 1000 - Number(stamp)) > toleranceS) return { refused: 'The message is dated too far from our clock; sign it anew when you send it.' };
  return { id, timestamp };
}
