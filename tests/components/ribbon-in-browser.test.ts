import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { LimitName } from '../../shared/assessment/answer.ts';
import { sayEnglish } from '../../src/lib/messages/use-t.ts';
import { clockTime } from '../../src/lib/time.ts';
import { morningAnswer } from './support/mornings.ts';
import { openGallery, type Gallery } from './support/gallery-page.ts';

let gallery: Gallery;
beforeAll(async () => {
  gallery = await openGallery();
});
afterAll(() => gallery.close());

// What the ribbon must say follows from the assessment itself, so that these tests stand while its formulas improve.
const go = morningAnswer('go');
const clock = (instant: string): string => clockTime(instant, { units: 'us', timeZone: 'America/Los_Angeles' });
const wordOf = (limit: LimitName): string => sayEnglish(`limit.${limit}`);
const bestStart = go.windows.find((window) => window.bestStart)!.bestStart!;
/** The first step at which a limit of the good morning is shut after having been open. */
const firstShut = (limit: LimitName) => go.steps.find(({ limits }, index) => limits[limit]!.headroom! < 0 && (go.steps[index - 1]?.limits[limit]?.headroom ?? -1) >= 0)!;

const phone = { viewport: { width: 360, height: 740 }, hasTouch: true, isMobile: true } as const;
const slider = (page: Page) => page.getByRole('slider', { name: 'Time of the morning' });
const told = async (page: Page): Promise<string> => (await slider(page).getAttribute('aria-valuetext')) ?? '';

/** Opens a morning, does something there and shuts it. */
async function onMorning(query: string, act: (page: Page) => Promise<void>, options: Parameters<Gallery['open']>[1] = {}) {
  const page = await gallery.open(`part=ribbon&${query}`, options);
  try {
    await act(page);
  } finally {
    await page.context().close();
  }
}

describe('the time cursor of the ribbon', () => {
  it('starts at the best start and says the moment in sentences, the tightest limit first', () =>
    onMorning('morning=go', async (page) => {
      const { limits } = go.steps.find(({ time }) => Date.parse(time) === Date.parse(bestStart))!;
      const sentences = (await told(page)).split('. ');
      expect(sentences.slice(0, 2)).toEqual([clock(bestStart), 'In the window']);
      const order = sentences.slice(2).map((sentence) => (Object.keys(limits) as LimitName[]).find((limit) => sentence.startsWith(`${wordOf(limit)} `))!);
      const headrooms = order.map((limit) => limits[limit]!.headroom!);
      expect(order).toHaveLength(Object.keys(limits).length);
      expect(headrooms).toEqual(headrooms.toSorted((one, two) => one - two));
    }));

  it('goes five minutes by an arrow key, half an hour by a page key, and to both ends', () =>
    onMorning('morning=go', async (page) => {
      await slider(page).focus();
      const times: string[] = [];
      for (const key of ['ArrowRight', 'ArrowDown', 'ArrowLeft', 'PageDown', 'Home', 'ArrowLeft', 'End', 'ArrowRight']) {
        await page.keyboard.press(key);
        times.push((await told(page)).split('.')[0]!);
      }
      const later = (minutes: number) => clock(new Date(Date.parse(bestStart) + minutes * 60_000).toISOString());
      const [first, last] = [clock(go.steps[0]!.time), clock(go.steps.at(-1)!.time)];
      expect(times).toEqual([later(5), later(10), later(5), later(35), first, first, last, last]);
    }));

  it('follows the mouse, and shows the moment and its tightest limit in big type', () =>
    onMorning('morning=go', async (page) => {
      const box = (await slider(page).boundingBox())!;
      await page.mouse.move(box.x + 200, box.y + 36);
      await page.mouse.down();
      await page.mouse.move(box.x + box.width - 18, box.y + 120, { steps: 5 });
      await page.mouse.up();
      expect(await told(page)).toMatch(/^11:55\. No window\. Bees .*beyond its limit/);
      expect(await page.locator('.ribbon-moment').innerText()).toMatch(/11:55\s+No window\s+Bees/);
    }));

  it('follows a finger that taps on a phone', () =>
    onMorning(
      'morning=go',
      async (page) => {
        const box = (await slider(page).boundingBox())!;
        await page.touchscreen.tap(box.x + 200, box.y + 106 + 6.4 * 38);
        expect(await told(page)).toMatch(/^8:00\. /);
      },
      phone,
    ));

  it('moves without drawing the ribbon anew: only the cursor and what the slider says change', () =>
    onMorning('morning=gusty', async (page) => {
      await page.evaluate(() => {
        const svg = document.querySelector('[role=slider]')!;
        const seen: string[] = [];
        Object.assign(window, { seen });
        new MutationObserver((changes) => seen.push(...changes.map(({ type, attributeName }) => attributeName ?? type))).observe(svg, { subtree: true, attributes: true, childList: true, characterData: true });
      });
      const box = (await slider(page).boundingBox())!;
      await page.mouse.move(box.x + 150, box.y + 36);
      await page.mouse.down();
      await page.mouse.move(box.x + box.width - 60, box.y + 36, { steps: 30 });
      await page.mouse.up();
      const seen = await page.evaluate(() => (window as unknown as { seen: string[] }).seen);
      expect(new Set(seen)).toEqual(new Set(['transform', 'aria-valuenow', 'aria-valuetext']));
    }));

  it('goes to a knot when its line in the list is pressed', () =>
    onMorning('morning=go', async (page) => {
      const at = clock(firstShut('wind').time);
      await page.getByRole('button', { name: new RegExp(`${at}\\s*Wind: over 10 mph`) }).click();
      expect(await told(page)).toMatch(new RegExp(`^${at}\\. No window\\. .*Wind 10 mph, limit 10 mph: beyond its limit`));
    }));

  it('speaks metric to those who read metric', () =>
    onMorning('morning=go&units=metric', async (page) => {
      expect(await told(page)).toMatch(/^0\d:\d\d\. .*Wind \d\.?\d? m\/s, limit 4\.5 m\/s/);
    }));
});

describe('the ribbon', () => {
  it('is as thick as the headroom: a limit at ease all morning fills its lane, and a limit at half fills half', () =>
    onMorning('morning=go', async (page) => {
      const heights = await page.evaluate(() => Object.fromEntries([...document.querySelectorAll('.ribbon-name')].map((name) => [name.textContent, (name.parentElement!.querySelector('path') as SVGPathElement).getBBox().height])));
      const most = heights['Rain-free']!;
      expect(most).toBeCloseTo(26, 0);
      const thickestGust = Math.max(...morningAnswer('go').steps.map(({ limits }) => limits.gusts!.headroom!));
      expect(heights['Gusts']! / most).toBeCloseTo(thickestGust, 1);
    }));

  it('names every knot, with its time, in the drawing or below it', () =>
    onMorning('morning=hold', async (page) => {
      const list = await page.getByRole('region', { name: 'Where a ribbon is tied shut' }).getByRole('button').allInnerTexts();
      const { steps } = morningAnswer('hold');
      const knots = steps.flatMap(({ time, limits }, index) => (Object.keys(limits) as LimitName[]).filter((limit) => limits[limit]!.headroom! < 0 && (steps[index - 1]?.limits[limit]?.headroom ?? 0) >= 0).map((limit) => `${clock(time)} ${wordOf(limit)}: `));
      expect(list.map((line) => line.replace(/\s+/g, ' ')).map((line, index) => line.startsWith(knots[index]!))).toEqual(knots.map(() => true));
      expect(list.join()).toContain('Wind: over 10 mph');
    }));

  it('draws open rings and claims no window where it cannot be told', () =>
    onMorning('morning=unknown', async (page) => {
      expect(await page.locator('.ribbon-ring').count()).toBeGreaterThan(20);
      expect(await page.locator('.ribbon-job').count()).toBe(0);
      expect(await told(page)).toContain('Cannot be told.');
    }));

  it('lights no ribbon in a span too short for the job', () =>
    onMorning('morning=hold', async (page) => {
      expect(await page.locator('.ribbon clipPath rect').count()).toBe(0);
      expect(await told(page)).toContain('Open, but too short for the job.');
    }));

  it('shows only the limit that binds when asked, and all again', () =>
    onMorning('morning=go', async (page) => {
      const names = () => page.locator('.ribbon-name').allTextContents();
      const all = await names();
      await page.getByRole('button', { name: 'Only what binds' }).click();
      expect(await names()).toEqual([wordOf(go.bindingLimit as LimitName)]);
      await page.getByRole('button', { name: 'Only what binds' }).click();
      expect(await names()).toEqual(all);
    }));

  it('is one key away from a table that says the same', () =>
    onMorning('morning=go', async (page) => {
      await slider(page).focus();
      await page.keyboard.press('t');
      const table = page.getByRole('region', { name: 'The morning as a table' });
      expect(await table.evaluate((element) => element === document.activeElement)).toBe(true);
      expect((await table.locator('thead th').allInnerTexts()).slice(0, 3)).toEqual(['Time', 'Wind', 'Gusts']);
      const shut = go.steps.find(({ limits }, index) => index % 3 === 0 && limits.wind!.headroom! < 0)!;
      expect(await table.getByRole('row', { name: new RegExp(`^${clock(shut.time)} `) }).innerText()).toMatch(/10\.?\d? mph\s+beyond its limit/);
    }));

  it.each([320, 360])('stands upright at %i px, fits the width and lets the page scroll beside its rail', (width) =>
    onMorning(
      'morning=gusty',
      async (page) => {
        expect(await slider(page).getAttribute('aria-orientation')).toBe('vertical');
        expect(await page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth)).toBe(true);
        const touch = await page.evaluate(() => ['[role=slider]', '[role=slider] > rect'].map((part) => getComputedStyle(document.querySelector(part)!).touchAction));
        expect(touch).toEqual(['pan-y', 'none']);
        const rail = (await page.locator('[role=slider] > rect').boundingBox())!;
        expect(rail.width).toBeGreaterThanOrEqual(48);
      },
      { ...phone, viewport: { width, height: 740 } },
    ),
  );

  it('keeps the names of knots apart from each other', () =>
    onMorning('morning=gusty', async (page) => {
      const boxes = await page.locator('.ribbon-knot-name').evaluateAll((names) => names.map((name) => name.getBoundingClientRect()).map(({ left, right, top, bottom }) => ({ left, right, top, bottom })));
      expect(boxes.length).toBeGreaterThanOrEqual(3);
      boxes.forEach((one, index) => boxes.slice(index + 1).forEach((two) => expect(one.right <= two.left || two.right <= one.left || one.bottom <= two.top || two.bottom <= one.top).toBe(true)));
    }));
});
