/** What stands between this browser and a push. */
export type PushState =
  /** This browser has no web push. */
  | 'unsupported'
  /** An iPhone or iPad allows push only from the home screen. */
  | 'needsHomeScreen'
  /** Refused before: only the browser's own settings can undo it. */
  | 'denied'
  /** Not asked yet. */
  | 'ask'
  /** Allowed. */
  | 'granted';

/** Recent iPads call themselves Macs; only their touch points tell. */
const isIos = (): boolean => /iPhone|iPad|iPod/.test(navigator.userAgent) || (navigator.userAgent.includes('Macintosh') && navigator.maxTouchPoints > 1);
const onHomeScreen = (): boolean => matchMedia('(display-mode: standalone)').matches || matchMedia('(display-mode: fullscreen)').matches;

export function readPushState(): PushState {
  const supported = 'serviceWorker' in navigator && 'PushManager' in window && 'Notification' in window;
  if (isIos() && !onHomeScreen()) return 'needsHomeScreen';
  if (!supported) return 'unsupported';
  if (Notification.permission === 'denied') return 'denied';
  return Notification.permission === 'granted' ? 'granted' : 'ask';
}

const systems: [RegExp, string][] = [
  [/iPhone/, 'iPhone'],
  [/iPad/, 'iPad'],
  [/Android/, 'Android phone'],
  [/Windows/, 'Windows computer'],
  [/Macintosh/, 'Mac'],
  [/Linux/, 'Linux computer'],
];

/** What this device might be called, from what the browser says of itself. */
export function guessDeviceName(userAgent: string): string {
  return systems.find(([pattern]) => pattern.test(userAgent))?.[1] ?? 'This device';
}

function bytesOf(base64Url: string): Uint8Array<ArrayBuffer> {
  const binary = atob(base64Url.replace(/-/g, '+').replace(/_/g, '/'));
  return Uint8Array.from(binary, (letter) => letter.charCodeAt(0));
}

function sameKey(subscription: PushSubscription, key: Uint8Array): boolean {
  const own = subscription.options.applicationServerKey;
  return own !== null && new Uint8Array(own).every((byte, index) => byte === key[index]);
}

export interface PushAddress {
  endpoint: string;
  keys: { p256dh: string; auth: string };
}

/** Tells a person why a device could not be enabled. */
export class PushRefused extends Error {}

/**
 * Asks for permission and subscribes this browser; call it inside a tap, as browsers demand.
 * @param publicKey the server's VAPID public key, base64url
 * @throws PushRefused with a sentence for the person
 */
export async function subscribeToPush(publicKey: string): Promise<PushAddress> {
  if ((await Notification.requestPermission()) !== 'granted') throw new PushRefused('The browser did not allow notices. Allow them for this site in its settings, then try again.');
  await navigator.serviceWorker.register('/service-worker.js');
  const registration = await navigator.serviceWorker.ready;
  const key = bytesOf(publicKey);
  let subscription = await registration.pushManager.getSubscription();
  if (subscription && !sameKey(subscription, key)) {
    await subscription.unsubscribe();
    subscription = null;
  }
  try {
    subscription ??= await registration.pushManager.subscribe({ userVisibleOnly: true, applicationServerKey: key });
  } catch {
    throw new PushRefused('The browser’s push service cannot be reached. Check the connection and try again; some private windows never allow push.');
  }
  const { endpoint, keys } = subscription.toJSON();
  if (!endpoint || !keys?.['p256dh'] || !keys['auth']) throw new PushRefused('This browser gave an address that cannot be used. Try another browser.');
  return { endpoint, keys: { p256dh: keys['p256dh'], auth: keys['auth'] } };
}

/** Tells the service worker where it is enabled, so that it can renew a subscription that the browser drops. */
export async function rememberDevice(farmId: string, name: string): Promise<void> {
  const { active } = await navigator.serviceWorker.ready;
  active?.postMessage({ type: 'deviceEnabled', farmId, name });
}
