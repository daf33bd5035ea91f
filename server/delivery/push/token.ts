import { createPrivateKey, sign, type KeyObject } from 'node:crypto';
import type { Clock } from '../../clock/clock.ts';
import type { VapidKey } from './keys.ts';

/** A token may live 24 hours (RFC 8292 §2); half of it leaves room for clocks that differ. */
const lifeS = 12 * 3600;
/** A token this near its end is not handed out any more. */
const marginS = 3600;

const part = (value: unknown): string => Buffer.from(JSON.stringify(value)).toString('base64url');

function privateKeyOf({ publicKey, privateKey }: VapidKey): KeyObject {
  const point = Buffer.from(publicKey, 'base64url');
  return createPrivateKey({ format: 'jwk', key: { kty: 'EC', crv: 'P-256', d: privateKey, x: point.subarray(1, 33).toString('base64url'), y: point.subarray(33, 65).toString('base64url') } });
}

/**
 * Value of the `Authorization` header of a push (RFC 8292 §2 and §3): a JWT signed with ES256 and the public key.
 * Not web-push's own function, because that dates tokens by the machine's clock.
 * @param audience origin of the push service @param subject mailto: or https: address of the operator
 */
export function vapidHeader(audience: string, subject: string, key: VapidKey, expiresAtS: number): string {
  const signed = `${part({ typ: 'JWT', alg: 'ES256' })}.${part({ aud: audience, exp: expiresAtS, sub: subject })}`;
  const signature = sign('sha256', Buffer.from(signed), { key: privateKeyOf(key), dsaEncoding: 'ieee-p1363' }).toString('base64url');
  return `vapid t=${signed}.${signature}, k=${key.publicKey}`;
}

/** Keeps one token per push service and key until it nears its end: a signature for each message would be most of the work. */
export class VapidTokens {
  readonly #clock: Clock;
  readonly #subject: string;
  readonly #kept = new Map<string, { header: string; issuedAtS: number }>();

  constructor(clock: Clock, subject: string) {
    this.#clock = clock;
    this.#subject = subject;
  }

  header(audience: string, key: VapidKey): string {
    const nowS = Math.floor(this.#clock.now().getTime() / 1000);
    const name = `${key.id} ${audience}`;
    const kept = this.#kept.get(name);
    // A clock set back counts as an end too: the token would lie too far ahead.
    if (kept && nowS >= kept.issuedAtS && nowS < kept.issuedAtS + lifeS - marginS) return kept.header;
    const header = vapidHeader(audience, this.#subject, key, nowS + lifeS);
    if (this.#kept.size > 1000) this.#kept.clear();
    this.#kept.set(name, { header, issuedAtS: nowS });
    return header;
  }
}
