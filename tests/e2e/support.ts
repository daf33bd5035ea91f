import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { startDawnvane, temporaryFolder } from '../support/start-dawnvane.ts';

const executablePath = process.env['CHROMIUM'] ?? '/usr/bin/chromium';

export const phone = { width: 360, height: 740 };
export const desk = { width: 1280, height: 860 };

/** People of the demo farm, by what they may do. */
export type DemoRole = 'owner' | 'applicator' | 'crew' | 'observer';

export interface DemoInBrowser {
  address: string;
  browser: Browser;
  /** A fresh visitor; what goes wrong in the page is collected in `faults`. */
  visit(viewport: { width: number; height: number }): Promise<Page>;
  /** A visitor who has tapped one of the demo sign-ins and sees Daybreak. */
  signedIn(role: DemoRole, viewport?: { width: number; height: number }): Promise<Page>;
  /** Errors that pages met since the last call: scripts that failed, or what the content security policy refused. */
  faults(): string[];
  close(): Promise<void>;
}

/** A refused call is told in the page; the browser's own line about it is no fault. */
const expected = /Failed to load resource/;

/** Starts the product as `npm start` does, with a demo of its own, and a browser to look at it. */
export async function openDemo(): Promise<DemoInBrowser> {
  const folder = temporaryFolder();
  const [server, browser] = await Promise.all([
    startDawnvane({ DAWNVANE_DATA: folder.path }),
    chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking'] }),
  ]);
  const { address } = server;
  if (!address) {
    await browser.close();
    folder.remove();
    throw new Error(`The server did not start:\n${server.output()}`);
  }
  let faults: string[] = [];
  const contexts: BrowserContext[] = [];

  async function visit(viewport: { width: number; height: number }): Promise<Page> {
    const context = await browser.newContext({ viewport, hasTouch: viewport.width < 500, reducedMotion: 'reduce', baseURL: address! });
    contexts.push(context);
    const page = await context.newPage();
    page.setDefaultTimeout(15_000);
    page.on('pageerror', (error) => faults.push(`${page.url()}: ${error.message}`));
    page.on('console', (message) => {
      if (message.type() === 'error' && !expected.test(message.text())) faults.push(`${page.url()}: ${message.text()}`);
    });
    return page;
  }

  return {
    address,
    browser,
    visit,
    async signedIn(role, viewport = desk) {
      const page = await visit(viewport);
      await page.goto('/');
      await page.getByRole('region', { name: 'Demo sign-ins' }).getByRole('button', { name: new RegExp(role) }).click();
      await page.waitForURL(/\/farms\/[^/]+$/);
      await page.getByRole('heading', { level: 1 }).waitFor();
      return page;
    },
    faults() {
      const seen = faults;
      faults = [];
      return seen;
    },
    async close() {
      for (const context of contexts) await context.close();
      await browser.close();
      await server.stop();
      folder.remove();
    },
  };
}

/** The farm in the address of a page. */
export function farmPathOf(page: Page): string {
  const path = /^\/farms\/[^/]+/.exec(new URL(page.url()).pathname)?.[0];
  if (!path) throw new Error(`No farm in ${page.url()}.`);
  return path;
}

/** Steps the demo clock by its page, and waits until everything due has happened. */
export async function stepClock(page: Page, to: RegExp): Promise<void> {
  await page.goto('/demo/clock');
  const row = page.getByRole('listitem').filter({ hasText: to }).first();
  const answered = page.waitForResponse((response) => response.url().endsWith('/api/demo/clock') && response.request().method() === 'PUT', { timeout: 60_000 });
  await row.getByRole('button', { name: 'Step there' }).click();
  await answered;
}

/** Asks again until the check holds; the demo sends on its own time. */
export async function until<T>(what: string, look: () => Promise<T | null | undefined | false>, withinMs = 30_000): Promise<T> {
  const tries = Math.ceil(withinMs / 250);
  for (let turn = 0; turn < tries; turn += 1) {
    const found = await look();
    if (found) return found;
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  throw new Error(`Waited in vain for ${what}.`);
}
