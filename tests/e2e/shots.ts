/**
 * `npm run shots`: every page of the demo on a phone and on a desk, light and dark, into `.data/shots`;
 * and the README's pictures (the evening, dawn, a hold) into `tests/e2e/pictures`.
 */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { Page } from 'playwright-core';
import { openPage, pagesOf } from './pages.ts';
import { desk, farmPathOf, openDemo, phone, stepClock, type DemoInBrowser } from './support.ts';

const root = fileURLToPath(new URL('../..', import.meta.url));
const allFolder = join(root, '.data/shots');
const pictureFolder = join(root, 'tests/e2e/pictures');
const sizes = { phone, desk } as const;
/** Evenings looked at for one whose morning is a hold; the demo's weather changes every few days. */
const eveningsMax = 8;

const say = (line: string): void => void process.stdout.write(`${line}\n`);

async function everyPage(demo: DemoInBrowser): Promise<void> {
  for (const [size, viewport] of Object.entries(sizes)) {
    for (const theme of ['light', 'dark'] as const) {
      const page = await demo.signedIn('owner', viewport);
      await page.evaluate((choice) => localStorage.setItem('dawnvane-theme', choice), theme);
      for (const [name, path] of await pagesOf(page)) {
        await openPage(page, path);
        await page.screenshot({ path: join(allFolder, `${name}-${size}-${theme}.png`), fullPage: true });
      }
      await page.context().close();
    }
  }
}

/** One moment of the demo on both screens. */
async function picture(pages: Record<keyof typeof sizes, Page>, name: string, path: string): Promise<void> {
  for (const [size, page] of Object.entries(pages)) {
    await openPage(page, path);
    await page.screenshot({ path: join(pictureFolder, `${name}-${size}.png`) });
  }
}

async function comingVerdict(page: Page, farm: string): Promise<{ date: string; go: boolean }> {
  return page.evaluate(async (path) => {
    const { mornings } = (await (await fetch(path)).json()) as { mornings: { date: string; verdicts: { verdict: string }[] }[] };
    return { date: mornings[0]!.date, go: mornings[0]!.verdicts.some(({ verdict }) => verdict === 'go') };
  }, `/api${farm}/daybreak`);
}

async function readmePictures(demo: DemoInBrowser): Promise<void> {
  const pages = { phone: await demo.signedIn('owner', phone), desk: await demo.signedIn('owner', desk) };
  const farm = farmPathOf(pages.desk);
  const wanted = new Set(['go', 'hold']);
  for (let evening = 0; evening < eveningsMax && wanted.size > 0; evening += 1) {
    await stepClock(pages.desk, evening === 0 ? /^The evening/ : /^The (next )?evening/);
    const { date, go } = await comingVerdict(pages.desk, farm);
    if (go && wanted.delete('go')) {
      await picture(pages, 'eve', farm);
      await stepClock(pages.desk, /^Dawn/);
      await picture(pages, 'dawn', farm);
      await picture(pages, 'morning', `${farm}/mornings/${date}`);
      await picture(pages, 'push', '/demo/phone');
    } else if (!go && wanted.delete('hold')) {
      await picture(pages, 'hold', farm);
    }
  }
  if (wanted.size > 0) throw new Error(`No ${[...wanted].join(' and no ')} in ${eveningsMax} evenings of the demo.`);
}

for (const folder of [allFolder, pictureFolder]) mkdirSync(folder, { recursive: true });
const demo = await openDemo();
try {
  await everyPage(demo);
  await readmePictures(demo);
  say(`Every page: ${allFolder}\nPictures of the README: ${pictureFolder}`);
} finally {
  await demo.close();
}
