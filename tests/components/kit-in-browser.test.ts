import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openGallery, type Gallery } from './support/gallery-page.ts';

let gallery: Gallery;
beforeAll(async () => {
  gallery = await openGallery();
});
afterAll(() => gallery.close());

/** Opens a part of the gallery, does something there and shuts it. */
async function onPart(query: string, act: (page: Page) => Promise<void>, options: Parameters<Gallery['open']>[1] = {}) {
  const page = await gallery.open(`part=${query}`, options);
  try {
    await act(page);
  } finally {
    await page.context().close();
  }
}

const parts = ['signs', 'kit', 'forms', 'table', 'frame', 'ribbon&morning=go', 'ribbon&morning=unknown'];
const axe = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

/** Every breach of WCAG 2.2 A and AA that axe finds, as `rule: element`. */
async function breaches(page: Page): Promise<string[]> {
  await page.evaluate(axe);
  return page.evaluate(async () => {
    const { run } = (window as unknown as { axe: { run: (context: Document, options: object) => Promise<{ violations: { id: string; nodes: { html: string }[] }[] }> } }).axe;
    const { violations } = await run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] });
    return violations.flatMap(({ id, nodes }) => nodes.map(({ html }) => `${id}: ${html.slice(0, 120)}`));
  });
}

describe('every part of the kit', () => {
  it.each([...parts.map((part) => [part, 'light'] as const), ...['kit', 'forms', 'ribbon&morning=go'].map((part) => [part, 'dark'] as const)])('keeps WCAG 2.2 AA as far as axe can tell: %s, %s', (part, theme) =>
    onPart(part, async (page) => expect(await breaches(page)).toEqual([]), { theme }),
  );

  it.each(parts)('fits 320 px without scrolling sideways, with targets of at least 48 px for a wet glove: %s', (part) =>
    onPart(
      part,
      async (page) => {
        expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
        const small = await page.evaluate(() =>
          [...document.querySelectorAll<HTMLElement>('button, main a, nav a, summary, select, input:not([type=checkbox], [type=radio]), label:has(input)')]
            .map((target) => ({ name: target.outerHTML.slice(0, 90), ...target.getBoundingClientRect().toJSON() }))
            .filter(({ width, height }) => width > 1 && (height < 48 || width < 48))
            .map(({ name }) => name),
        );
        expect(small).toEqual([]);
      },
      { viewport: { width: 320, height: 640 } },
    ),
  );

  it('is drawn in the reader’s own colours where these are forced', () =>
    onPart(
      'ribbon&morning=go',
      async (page) => {
        const [ground, ink, ribbon] = await page.evaluate(() => [getComputedStyle(document.documentElement).backgroundColor, getComputedStyle(document.querySelector('.ribbon-thread')!).stroke, getComputedStyle(document.querySelector('.ribbon-hard')!).stroke]);
        expect(ink).not.toBe(ground);
        expect(ribbon).toBe(ink);
      },
      { forcedColors: 'active' },
    ));

  it('holds still for those who ask for it, and else lets the disc rise', async () => {
    const animation = (page: Page) => page.locator('.disc-rises').first().evaluate((disc) => getComputedStyle(disc).animationName);
    await onPart('signs', async (page) => expect(await animation(page)).toBe('none'), { reducedMotion: 'reduce' });
    await onPart('signs', async (page) => expect(await animation(page)).toBe('disc-rises'), { reducedMotion: 'no-preference' });
  });
});

describe('a form', () => {
  const alerts = (page: Page) => page.getByRole('group', { name: /entries need another look/ });

  it('lists several problems, moves the focus to the list, and leads from each to its field', () =>
    onPart('forms', async (page) => {
      await page.getByRole('button', { name: 'Add the block' }).click();
      await alerts(page).waitFor();
      expect(await alerts(page).evaluate((list) => list === document.activeElement)).toBe(true);
      expect(await alerts(page).getByRole('button').allInnerTexts()).toEqual(['Name must not be empty.', expect.stringMatching(/^Area must be a number/), 'Choose at least one.']);
      await alerts(page).getByRole('button', { name: /Area/ }).click();
      expect(await page.evaluate(() => document.activeElement?.getAttribute('name'))).toBe('areaHa');
    }));

  it('says each problem with its field, and puts the focus into the field when there is only one', () =>
    onPart('forms', async (page) => {
      await page.getByLabel('Name').fill('North rows');
      await page.getByRole('checkbox', { name: 'Honey bees' }).check();
      await page.getByLabel('Area').fill('half');
      await page.getByRole('button', { name: 'Add the block' }).click();
      await page.waitForFunction(() => document.activeElement?.getAttribute('name') === 'areaHa');
      const said = await page.evaluate(() => document.activeElement?.getAttribute('aria-describedby')?.split(' ').map((id) => document.getElementById(id)?.textContent));
      expect(said?.join()).toMatch(/^Area must be/);
      expect(await page.evaluate(() => document.activeElement?.getAttribute('inputmode'))).toBe('decimal');
      expect(await page.getByLabel('Area').inputValue()).toBe('half');
    }));

  it('sends in SI what was typed in acres', () =>
    onPart('forms', async (page) => {
      await page.getByLabel('Name').fill('North rows');
      await page.getByLabel('Area').fill('2');
      await page.getByRole('checkbox', { name: 'Honey bees' }).check();
      await page.getByRole('button', { name: 'Add the block' }).click();
      expect(JSON.parse(await page.locator('[data-sent]').innerText())).toMatchObject({ name: 'North rows', areaHa: 0.80937128448, firstDate: '2026-06-10', eveTime: '20:00' });
    }));

  it('puts what the server finds wrong beside its field, in the person’s units, and keeps what was typed', () =>
    onPart('forms', async (page) => {
      await page.getByLabel('Name').fill('Taken');
      await page.getByLabel('Area').fill('2');
      await page.getByRole('checkbox', { name: 'Honey bees' }).check();
      await page.getByRole('button', { name: 'Add the block' }).click();
      await alerts(page).waitFor();
      expect(await alerts(page).getByRole('button').allInnerTexts()).toEqual(['Name must differ from the names in use.', 'Area must be at most 2471 acres.']);
      expect(await page.getByRole('alert').innerText()).toContain('Some entries need another look.');
      expect(await page.getByLabel('Name').inputValue()).toBe('Taken');
    }));
});

describe('a table', () => {
  const firstCells = (page: Page) => page.locator('tbody tr td:first-child').allInnerTexts();

  it('sorts by a press on its head, empty cells last both ways, and keeps the order in the address', () =>
    onPart('table', async (page) => {
      const head = page.getByRole('button', { name: 'Area, ha' });
      await head.click();
      await expect.poll(() => firstCells(page)).toEqual(['Old pears', 'North rows', 'Ridge', 'Brook side']);
      await head.click();
      await expect.poll(() => firstCells(page)).toEqual(['Ridge', 'North rows', 'Old pears', 'Brook side']);
      expect(await page.getByRole('columnheader', { name: /Area/ }).getAttribute('aria-sort')).toBe('descending');
      expect(new URL(page.url()).searchParams.get('sort')).toBe('-area');
      await page.reload();
      await expect.poll(() => firstCells(page)).toEqual(['Ridge', 'North rows', 'Old pears', 'Brook side']);
    }));

  it('finds rows by all the words typed, keeps them in the address, and offers a way back when nothing is found', () =>
    onPart('table', async (page) => {
      await page.getByLabel('Find in this table').pressSequentially('05 stopped');
      await expect.poll(() => firstCells(page)).toEqual(['Brook side']);
      await page.waitForURL(/find=05\+stopped/);
      await page.reload();
      await expect.poll(() => firstCells(page)).toEqual(['Brook side']);
      await page.getByLabel('Find in this table').fill('nowhere');
      expect(await page.getByText('Nothing matches “nowhere”.').isVisible()).toBe(true);
      await page.getByRole('button', { name: 'Show all' }).click();
      await expect.poll(() => firstCells(page)).toHaveLength(4);
    }));

  it('saves what is shown as CSV that no spreadsheet runs as a formula', () =>
    onPart('table', async (page) => {
      await page.getByRole('button', { name: 'Date' }).click();
      const [download] = await Promise.all([page.waitForEvent('download'), page.getByRole('button', { name: 'Save as CSV' }).click()]);
      expect(download.suggestedFilename()).toBe('sprayed.csv');
      expect(readFileSync(await download.path(), 'utf8')).toBe('\uFEFFBlock,Date,"Area, ha",Note\r\nRidge,2026-04-20,1.2,\'=1+1\r\nNorth rows,2026-05-02,0.8,"calm, dry"\r\nBrook side,2026-05-11,,"gusts, stopped"\r\nOld pears,2026-05-30,0.35,"said ""go"""\r\n');
    }));

  it('is walked row by row with the arrow keys', () =>
    onPart('table', async (page) => {
      await page.getByRole('link', { name: 'North rows' }).focus();
      await page.keyboard.press('ArrowDown');
      await page.keyboard.press('ArrowDown');
      await page.keyboard.press('ArrowUp');
      expect(await page.evaluate(() => document.activeElement?.textContent)).toBe('Brook side');
    }));

  it('says what to do when there is nothing', () => onPart('table&empty', async (page) => expect(await page.getByText('The first finished job stands here.').isVisible()).toBe(true)));
});

describe('what is pressed', () => {
  it('a dialog holds the focus, shuts on Escape and gives the focus back', () =>
    onPart('kit', async (page) => {
      const opener = page.getByRole('button', { name: 'Open the dialog' });
      await opener.click();
      expect(await page.getByRole('dialog', { name: 'Take the label in hand' }).isVisible()).toBe(true);
      await page.keyboard.press('Escape');
      expect(await page.getByRole('dialog').count()).toBe(0);
      expect(await opener.evaluate((button) => button === document.activeElement)).toBe(true);
    }));

  it('an act is said and can be undone', () =>
    onPart('kit', async (page) => {
      await page.getByRole('button', { name: 'Archive' }).click();
      await page.getByText('North rows is archived.').waitFor();
      await page.getByRole('button', { name: 'Undo' }).click();
      await page.getByText('North rows is back.').waitFor();
    }));

  it('dark by the sun is dark at night and light by day where the farm lies', async () => {
    const themeAt = async (instant: string): Promise<string | undefined> => {
      let theme: string | undefined;
      await onPart('kit', async (page) => {
        await page.clock.setFixedTime(instant);
        await page.getByRole('radio', { name: /By the sun/ }).check();
        await page.waitForFunction(() => localStorage.getItem('dawnvane-sun') !== null);
        theme = await page.evaluate(() => document.documentElement.dataset['theme']);
      });
      return theme;
    };
    expect(await themeAt('2026-06-10T12:20:00Z')).toBe('dark');
    expect(await themeAt('2026-06-10T12:40:00Z')).toBe('light');
    expect(await themeAt('2026-06-11T04:10:00Z')).toBe('dark');
  });

  it('the frame keeps four pages under the thumb and the others under More', () =>
    onPart(
      'frame',
      async (page) => {
        const bar = page.getByRole('navigation', { name: 'Pages' });
        expect((await bar.getByRole('link').allInnerTexts()).filter(Boolean)).toEqual(['Daybreak', 'Plans', 'Shelf', 'Farm']);
        await bar.getByText('More').click();
        await bar.getByRole('link', { name: 'People' }).click();
        expect(new URL(page.url()).pathname).toBe('/people');
      },
      { viewport: { width: 360, height: 740 } },
    ));
});
