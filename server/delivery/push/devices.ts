import { createHash, createPublicKey, randomUUID } from 'node:crypto';
import type { z } from 'zod';
import type { deviceBody } from '../../../shared/api/notices.ts';
import { invalid, type ProblemItem } from '../../http/problem.ts';
import type { DeviceRow } from '../../models/notices.ts';
import type { Services } from '../../services.ts';
import { RefusedTarget, type Guard } from '../net/guard.ts';
import type { PushKeys } from './keys.ts';

type Subscription = z.infer<typeof deviceBody>;

/** Whether 65 bytes are a point on P-256 (RFC 8291 §2.1): a wrong one would fail only at dawn. */
function isPoint(bytes: Buffer): boolean {
  if (bytes.length !== 65 || bytes[0] !== 4) return false;
  try {
    createPublicKey({ format: 'jwk', key: { kty: 'EC', crv: 'P-256', x: bytes.subarray(1, 33).toString('base64url'), y: bytes.subarray(33).toString('base64url') } });
    return true;
  } catch {
    return false;
  }
}

async function problemsOf({ endpoint, keys }: Subscription, guard: Guard): Promise<ProblemItem[]> {
  const problems: ProblemItem[] = [];
  if (!isPoint(Buffer.from(keys.p256dh, 'base64url'))) problems.push({ path: 'keys.p256dh', message: 'must be the public key that the browser gave (65 bytes, base64url)' });
  if (Buffer.from(keys.auth, 'base64url').length !== 16) problems.push({ path: 'keys.auth', message: 'must be the secret that the browser gave (16 bytes, base64url)' });
  await guard.check(endpoint).catch((error: unknown) => {
    if (!(error instanceof RefusedTarget)) throw error;
    problems.push({ path: 'endpoint', message: `cannot be used: ${error.message}` });
  });
  return problems;
}

/**
 * Enables a device of a person at a farm. An endpoint that is known is renewed, and then belongs to whoever enables it: one browser has
 * one subscription, whoever is signed in.
 */
export async function enableDevice(services: Services, pushKeys: PushKeys, guard: Guard, owner: { farmId: string; userId: string }, body: Subscription): Promise<DeviceRow> {
  const problems = await problemsOf(body, guard);
  if (problems.length > 0) throw invalid(problems);
  const { models, clock } = services;
  const endpointHash = createHash('sha256').update(body.endpoint).digest('hex');
  const fresh = { userId: owner.userId, name: body.name, p256dh: body.keys.p256dh, auth: body.keys.auth, vapidKeyId: pushKeys.current.id, goneAt: null };
  const where = { farmId: owner.farmId, endpointHash };
  const [row, created] = await models.devices.findOrCreate({
    where,
    defaults: { id: randomUUID(), farmId: owner.farmId, endpoint: body.endpoint, endpointHash, createdAt: clock.now(), lastAcceptedAt: null, lastShownAt: null, ...fresh },
  });
  if (!created) await row.update(fresh);
  return row.get({ plain: true });
}
