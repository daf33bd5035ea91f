import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium, type Browser, type BrowserContextOptions, type Page } from 'playwright-core';
import { build, preview } from 'vite';

const galleryRoot = join(import.meta.dirname, '..', 'gallery');
const configFile = join(import.meta.dirname, '..', '..', '..', 'vite.config.ts');

export interface Gallery {
  browser: Browser;
  /** Opens one part of the gallery and waits until it is drawn. */
  open(query: string, options?: BrowserContextOptions & { theme?: 'light' | 'dark' }): Promise<Page>;
  close(): Promise<void>;
}

/** Builds the gallery of the kit with the product's own build and opens it in Chromium, on a free port. */
export async function openGallery(): Promise<Gallery> {
  const outDir = mkdtempSync(join(tmpdir(), 'dawnvane-gallery-'));
  await build({ configFile, root: galleryRoot, logLevel: 'error', build: { outDir, emptyOutDir: true, rollupOptions: { input: join(galleryRoot, 'index.html') } } });
  const server = await preview({ configFile, root: galleryRoot, logLevel: 'error', build: { outDir }, preview: { port: 0, host: '127.0.0.1', open: false } });
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox', '--disable-gpu', '--disable-background-networking'] });
  const address = server.resolvedUrls?.local[0];
  if (!address) throw new Error('The gallery has no address.');
  return {
    browser,
    async open(query, { theme = 'light', ...options } = {}) {
      const context = await browser.newContext({ viewport: { width: 1280, height: 860 }, reducedMotion: 'reduce', locale: 'en-US', ...options });
      const page = await context.newPage();
      await page.addInitScript((choice) => localStorage.setItem('dawnvane-theme', choice), theme);
      const broken = new Promise<never>((_, reject) => page.once('pageerror', reject));
      await page.goto(`${address}?${query}`);
      // A part that cannot be drawn says why at once.
      await Promise.race([page.waitForSelector('main > *'), broken]);
      broken.catch(() => undefined);
      await page.evaluate(() => document.fonts.ready);
      return page;
    },
    async close() {
      await browser.close();
      await server.close();
      rmSync(outDir, { recursive: true, force: true });
    },
  };
}
