import { readFileSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { chromium, type Browser, type CDPSession, type Page } from 'playwright-core';
import ts from 'typescript';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { pushMessage } from '../../server/delivery/push/message.ts';

const executablePath = '/usr/bin/chromium';
const source = new URL('../../src/service-worker.ts', import.meta.url);
const payload = { title: 'Go, 5:25–6:10: Spruce row', body: 'Tomorrow, Wed, Jun 10.', path: '/farms/f/mornings/2026-06-10', tag: 'morning-f-2026-06-10', topic: 't', urgency: 'high' as const, kind: 'eve', sign: 'go' as const, language: 'en', lateNote: '' };

// A headless browser cannot subscribe without its vendor's push service, but it hands a message to the worker when the DevTools ask it to.
describe('the service worker', () => {
  let server: Server;
  let browser: Browser;
  let page: Page;
  let devTools: CDPSession;
  let registrationId = '';
  let origin = '';
  const acknowledged: { token: string; what: string }[] = [];

  beforeAll(async () => {
    const script = ts.transpileModule(readFileSync(source, 'utf8'), { compilerOptions: { target: ts.ScriptTarget.ES2022, module: ts.ModuleKind.ES2022 } }).outputText;
    server = createServer((request, response) => {
      if (request.url === '/service-worker.js') response.writeHead(200, { 'Content-Type': 'text/javascript' }).end(script);
      else if (request.url === '/api/push/acknowledge') {
        const chunks: Buffer[] = [];
        request.on('data', (chunk: Buffer) => chunks.push(chunk));
        request.on('end', () => {
          acknowledged.push(JSON.parse(Buffer.concat(chunks).toString()) as (typeof acknowledged)[0]);
          response.writeHead(204).end();
        });
      } else response.writeHead(200, { 'Content-Type': 'text/html' }).end('<!doctype html><title>Page</title>');
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    origin = `http://localhost:${(server.address() as AddressInfo).port}`;
    browser = await chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking'] });
    const context = await browser.newContext();
    await context.grantPermissions(['notifications'], { origin });
    page = await context.newPage();
    devTools = await context.newCDPSession(page);
    devTools.on('ServiceWorker.workerRegistrationUpdated', ({ registrations }: { registrations: { registrationId: string; isDeleted: boolean }[] }) => {
      registrationId = registrations.find((registration) => !registration.isDeleted)?.registrationId ?? registrationId;
    });
    await devTools.send('ServiceWorker.enable');
    await page.goto(origin);
    await page.evaluate(async () => {
      await navigator.serviceWorker.register('/service-worker.js', { type: 'module' });
      await navigator.serviceWorker.ready;
    });
  }, 60_000);
  afterAll(async () => {
    await browser?.close();
    server?.closeAllConnections();
    await new Promise((resolve) => server?.close(resolve));
  });
  const deliver = (data: string) => devTools.send('ServiceWorker.deliverPushMessage', { origin, registrationId, data });
  const shown = () =>
    page.evaluate(async () => (await (await navigator.serviceWorker.ready).getNotifications()).map(({ title, body, tag, data }) => ({ title, body, tag, url: (data as { url: string }).url })));
  const message = (title: string, token: string) => pushMessage({ ...payload, title }, { origin, token, dueAt: new Date(0), now: new Date(0) });

  it('shows a push as the server sends it, and tells that it did', async () => {
    await deliver(message(payload.title, 'token-of-the-eve'));
    await expect.poll(shown, { timeout: 10_000 }).toEqual([{ title: payload.title, body: payload.body, tag: payload.tag, url: `${origin}/farms/f/mornings/2026-06-10` }]);
    await expect.poll(() => acknowledged, { timeout: 10_000 }).toEqual([{ token: 'token-of-the-eve', what: 'shown' }]);
  });

  it('shows the newer notice of a morning in the place of the older', async () => {
    await deliver(message('Changed. Hold, gusts', 'token-of-the-turn'));
    await expect.poll(async () => (await shown()).map(({ title }) => title), { timeout: 10_000 }).toEqual(['Changed. Hold, gusts']);
  });

  it('shows something even of a message that it cannot read', async () => {
    await deliver('not json');
    await expect.poll(async () => (await shown()).map(({ title }) => title), { timeout: 10_000 }).toContain('Dawnvane has news');
  });
});
