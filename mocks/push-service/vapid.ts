import { createPublicKey, verify } from 'node:crypto';

export interface VapidClaims {
  aud?: unknown;
  exp?: unknown;
  sub?: unknown;
}

const json = (part: string): unknown => JSON.parse(Buffer.from(part, 'base64url').toString('utf8')) as unknown;

/** Reads `vapid t=…, k=…` and checks the ES256 signature of the token with the key (RFC 8292 §2 to §3). Null when anything is amiss. */
export function readVapid(header: string | null): { claims: VapidClaims; publicKey: string } | null {
  const match = /^vapid\s+t=([\w-]+)\.([\w-]+)\.([\w-]+)\s*,\s*k=([\w-]+)$/i.exec(header ?? '');
  if (!match) return null;
  const [, head, claims, signature, publicKey] = match as unknown as [string, string, string, string, string];
  try {
    const { typ, alg } = json(head) as { typ?: string; alg?: string };
    if (alg !== 'ES256' || (typ !== undefined && typ !== 'JWT')) return null;
    const point = Buffer.from(publicKey, 'base64url');
    if (point.length !== 65 || point[0] !== 4) return null;
    const key = createPublicKey({ format: 'jwk', key: { kty: 'EC', crv: 'P-256', x: point.subarray(1, 33).toString('base64url'), y: point.subarray(33).toString('base64url') } });
    const good = verify('sha256', Buffer.from(`${head}.${claims}`), { key, dsaEncoding: 'ieee-p1363' }, Buffer.from(signature, 'base64url'));
    return good ? { claims: json(claims) as VapidClaims, publicKey } : null;
  } catch {
    return null;
  }
}

/** What is wrong with a token, as the strictest of the real services sees it; null when nothing is. */
export function vapidProblem(header: string | null, origin: string, subscribedWith: string, now: Date): { status: number; reason: string } | null {
  const read = readVapid(header);
  if (!read) return { status: 401, reason: 'BadJwtToken' };
  const { aud, exp, sub } = read.claims;
  const nowS = now.getTime() / 1000;
  if (aud !== origin) return { status: 403, reason: 'BadJwtToken: aud' };
  if (typeof exp !== 'number' || exp <= nowS || exp > nowS + 86_400) return { status: 403, reason: 'BadJwtToken: exp' };
  if (typeof sub !== 'string' || !/^(mailto:[^@\s]+@[^@\s]+|https:\/\/\S+)$/.test(sub) || /localhost|\.invalid\b/.test(sub)) return { status: 403, reason: 'BadJwtToken: sub' };
  // As one of the services does: a token of another key than the subscription's is a bad request.
  if (read.publicKey !== subscribedWith) return { status: 400, reason: 'VapidPkHashMismatch' };
  return null;
}
