/** Pictures of every part of the kit for the eye: `npx tsx tests/components/shots.ts FOLDER [PART]` at 360 and 1280 px, light and dark. */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { openGallery } from './support/gallery-page.ts';

const parts = ['signs', 'kit', 'forms', 'table', 'frame', 'ribbon&morning=go', 'ribbon&morning=hold', 'ribbon&morning=gusty', 'ribbon&morning=unknown'];
const [folder = 'dist/shots', only = ''] = process.argv.slice(2);
mkdirSync(folder, { recursive: true });
const gallery = await openGallery();
try {
  for (const part of parts.filter((each) => each.includes(only))) {
    for (const [width, height] of [[360, 740], [1280, 860]] as const) {
      for (const theme of ['light', 'dark'] as const) {
        const page = await gallery.open(`part=${part}`, { viewport: { width, height }, theme, deviceScaleFactor: 1.5 });
        await page.screenshot({ path: join(folder, `${part.replace('&morning=', '-')}-${width}-${theme}.png`), fullPage: true });
        await page.context().close();
      }
    }
  }
} finally {
  await gallery.close();
}
