// Shows pushes and opens the right morning. Self-contained: it imports nothing of the application.
declare const self: ServiceWorkerGlobalScope;

/** A push as the server sends it: also a valid declarative message, which some browsers show by themselves. */
interface PushMessage {
  notification: {
    title: string;
    body: string;
    /** Address that a tap opens. */
    navigate: string;
    lang?: string;
    tag?: string;
    data?: { token?: string; kind?: string; verdict?: string | null };
  };
}

/** Where this device is enabled; told by the page, so that a lost subscription can be renewed without it. */
interface EnabledAt {
  type: 'deviceEnabled';
  farmId: string;
  name: string;
}

const deviceCache = 'dawnvane-device';
const deviceKey = '/device.json';

self.addEventListener('install', () => void self.skipWaiting());
self.addEventListener('activate', (event) => event.waitUntil(self.clients.claim()));

/** Never rejects: an acknowledgement that is lost must not keep a notice from being shown or opened. */
async function acknowledge(token: string | undefined, what: 'shown' | 'tapped'): Promise<void> {
  if (!token) return;
  await fetch('/api/push/acknowledge', { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify({ token, what }), keepalive: true }).catch(() => undefined);
}

function readMessage(event: PushEvent): PushMessage['notification'] {
  try {
    const message = event.data?.json() as PushMessage | undefined;
    if (message?.notification?.title) return message.notification;
  } catch {
    // Something must be shown all the same: a push that shows nothing costs the right to send any.
  }
  return { title: 'Dawnvane has news', body: 'Open it to see the coming morning.', navigate: '/' };
}

async function show(event: PushEvent): Promise<void> {
  const { title, body, navigate, lang, tag, data } = readMessage(event);
  // `renotify` rings again when a newer notice takes the place of an older one; it is not in TypeScript's own list.
  const options: NotificationOptions & { renotify?: boolean } = {
    body,
    data: { url: navigate, token: data?.token },
    ...(lang ? { lang } : {}),
    ...(tag ? { tag, renotify: true } : {}),
  };
  await self.registration.showNotification(title, options);
  await acknowledge(data?.token, 'shown');
}
self.addEventListener('push', (event) => event.waitUntil(show(event)));

/** Brings an open window to the address, or opens one. Only our own pages are opened, whatever the message says. */
async function open(address: string): Promise<void> {
  const asked = new URL(address, self.location.origin);
  const url = asked.origin === self.location.origin ? asked : new URL(asked.pathname, self.location.origin);
  const windows = await self.clients.matchAll({ type: 'window', includeUncontrolled: true });
  const best = windows.find((client) => client.url === url.href) ?? windows[0];
  if (best) {
    const focused = await best.focus().catch(() => best);
    if (focused.url === url.href) return;
    if (await focused.navigate(url.href).catch(() => null)) return;
  }
  await self.clients.openWindow(url.href);
}
self.addEventListener('notificationclick', (event) => {
  event.notification.close();
  const { url, token } = (event.notification.data ?? {}) as { url?: string; token?: string };
  event.waitUntil(Promise.all([open(url ?? '/'), acknowledge(token, 'tapped')]));
});

async function enabledAt(): Promise<EnabledAt[]> {
  const kept = await (await caches.open(deviceCache)).match(deviceKey);
  return kept ? ((await kept.json()) as EnabledAt[]) : [];
}

self.addEventListener('message', (event) => {
  const message = event.data as EnabledAt | undefined;
  if (message?.type !== 'deviceEnabled') return;
  const keep = async () => {
    const others = (await enabledAt()).filter((other) => other.farmId !== message.farmId);
    await (await caches.open(deviceCache)).put(deviceKey, Response.json([...others, message]));
  };
  event.waitUntil(keep());
});

/** The browser has given the subscription up: takes a new one under the server's present key and tells the server, as this device. */
async function renewSubscription(): Promise<void> {
  const { publicKey } = (await (await fetch('/api/push/key')).json()) as { publicKey: string };
  const subscription = await self.registration.pushManager.subscribe({ userVisibleOnly: true, applicationServerKey: publicKey });
  const { endpoint, keys } = subscription.toJSON();
  for (const { farmId, name } of await enabledAt()) {
    await fetch(`/api/farms/${farmId}/devices`, { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify({ name, endpoint, keys }) });
  }
}
// Not every browser tells; the page checks the subscription at each start too.
self.addEventListener('pushsubscriptionchange', (event) => (event as ExtendableEvent).waitUntil(renewSubscription()));

export {};
