import { createHash } from 'node:crypto';
import { QueryTypes } from 'sequelize';
import webPush from 'web-push';
import { seal, unseal } from '../seal.ts';
import type { Services } from '../../services.ts';

/** A VAPID key pair (RFC 8292), base64url: 65-byte point and 32-byte scalar of P-256. */
export interface VapidKey {
  /** Kept with each device: a subscription takes only tokens of the key it was made with. */
  id: string;
  publicKey: string;
  privateKey: string;
}

export interface PushKeys {
  /** The key that new subscriptions are made with. */
  current: VapidKey;
  /** The key of an older subscription; null when it was thrown away. */
  byId(id: string): VapidKey | null;
}

interface StoredKey {
  publicKey: string;
  privateSealed: string;
}

const settingName = 'vapidKeys';
const purpose = 'vapid';

/** Short name of a public key. */
export const vapidKeyId = (publicKey: string): string => createHash('sha256').update(publicKey).digest('hex').slice(0, 16);

function stored(services: Services): StoredKey {
  const { publicKey, privateKey } = webPush.generateVAPIDKeys();
  return { publicKey, privateSealed: seal(services.settings.secret, purpose, privateKey) };
}

/** The server's VAPID keys, newest first, made and kept (sealed) at the first start. Safe with several servers starting at once. */
export async function loadPushKeys(services: Services): Promise<PushKeys> {
  const { models, sequelize, settings, clock } = services;
  const read = () => models.settings.findByPk(settingName);
  let row = await read();
  if (!row) {
    await sequelize.query('INSERT IGNORE INTO settings (name, value, updated_at) VALUES (:name, :value, :now)', {
      replacements: { name: settingName, value: JSON.stringify([stored(services)]), now: clock.now() },
      type: QueryTypes.INSERT,
    });
    row = await read();
  }
  const keys = ((row?.value ?? []) as StoredKey[]).map<VapidKey>(({ publicKey, privateSealed }) => ({ id: vapidKeyId(publicKey), publicKey, privateKey: unseal(settings.secret, purpose, privateSealed) }));
  const [current] = keys;
  if (!current) throw new Error('The VAPID keys could not be kept in the database.');
  return { current, byId: (id) => keys.find((key) => key.id === id) ?? null };
}
