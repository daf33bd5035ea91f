import { createECDH, randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import type { ReceiverKeys } from './decrypt.ts';

/** What a browser hands to the page when a push is subscribed to. */
export interface Subscription {
  endpoint: string;
  keys: { p256dh: string; auth: string };
}

interface Kept extends ReceiverKeys {
  id: string;
  /** The server's VAPID key that the subscription was made with; null while there is none. */
  subscribedWith: string | null;
}

export const pushServiceOrigin = 'https://push.dawnvane-demo.invalid';

/** A phone of the demo. Its keys are made at the first start and kept in the data folder, so that the device stored on the server stays good. */
export class DemoPhone {
  readonly name: string;
  readonly #file: string | null;
  #kept: Kept;

  constructor(name: string, file: string | null) {
    this.name = name;
    this.#file = file;
    this.#kept = file && existsSync(file) ? (JSON.parse(readFileSync(file, 'utf8')) as Kept) : fresh();
    this.#keep();
  }

  get keys(): ReceiverKeys {
    return this.#kept;
  }
  get id(): string {
    return this.#kept.id;
  }
  get subscribedWith(): string | null {
    return this.#kept.subscribedWith;
  }

  /** Subscribes as a browser would: anew when the server's key is another one. */
  subscribe(applicationServerKey: string): Subscription {
    if (this.#kept.subscribedWith !== null && this.#kept.subscribedWith !== applicationServerKey) this.#kept = fresh();
    this.#kept.subscribedWith = applicationServerKey;
    this.#keep();
    return { endpoint: `${pushServiceOrigin}/send/${this.id}`, keys: { p256dh: this.#kept.publicKey, auth: this.#kept.auth } };
  }

  /** The subscription ends, as when the app is removed. */
  unsubscribe(): void {
    this.#kept.subscribedWith = null;
    this.#keep();
  }

  #keep(): void {
    if (this.#file) writeFileSync(this.#file, JSON.stringify(this.#kept), { mode: 0o600 });
  }
}

function fresh(): Kept {
  const pair = createECDH('prime256v1');
  const publicKey = pair.generateKeys('base64url');
  // Written at full length: a key that begins with zeros would come out shorter.
  const privateKey = Buffer.concat([Buffer.alloc(32), pair.getPrivateKey()]).subarray(-32).toString('base64url');
  return { id: randomBytes(24).toString('base64url'), publicKey, privateKey, auth: randomBytes(16).toString('base64url'), subscribedWith: null };
}
