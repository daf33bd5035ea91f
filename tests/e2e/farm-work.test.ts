import type { Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { farmPathOf, openDemo, phone, until, type DemoInBrowser } from './support.ts';

describe('the work on a farm', () => {
  let demo: DemoInBrowser;

  beforeAll(async () => {
    demo = await openDemo();
  }, 180_000);
  afterAll(() => demo?.close());
  afterEach(() => expect(demo.faults()).toEqual([]));

  const openBlock = async (page: Page, name: string) => {
    await page.goto(`${farmPathOf(page)}/settings`);
    await page.getByRole('link', { name: new RegExp(name) }).click();
    await page.getByRole('heading', { level: 1, name }).waitFor();
  };

  /** A problem beside its field; the summary of the form names it too, as a button. */
  const besideField = (page: Page, problem: string) => page.getByRole('paragraph').filter({ hasText: problem });

  it('keeps what was typed into a new block, shows each problem beside its field, and saves it once it is right', async () => {
    const page = await demo.signedIn('owner', phone);
    await page.goto(`${farmPathOf(page)}/settings`);
    await page.getByRole('link', { name: 'Add a block' }).click();
    await page.getByLabel('Crop').fill('Pear');
    await page.getByLabel(/^Area/).fill('half');
    await page.getByLabel(/^Trees/).fill('12.5');
    await page.getByRole('button', { name: 'Add the block' }).click();

    await besideField(page, 'Name must not be empty.').waitFor();
    await besideField(page, 'Area must be a number, such as 12.5.').waitFor();
    await besideField(page, 'Trees must be a whole number.').waitFor();
    expect(await page.getByLabel('Crop').inputValue()).toBe('Pear');
    expect(await page.getByLabel(/^Area/).inputValue()).toBe('half');
    expect(await page.getByLabel(/^Area/).getAttribute('aria-invalid')).toBe('true');
    await page.getByRole('button', { name: 'Name must not be empty.' }).click();
    expect(await page.evaluate(() => document.activeElement?.getAttribute('name'))).toBe('name');

    await page.getByLabel('Name', { exact: true }).fill('Mill pears');
    await page.getByLabel(/^Area/).fill('0,5');
    await page.getByLabel(/^Trees/).fill('120');
    await page.getByRole('button', { name: 'Add the block' }).click();
    await page.getByRole('heading', { level: 1, name: 'Mill pears' }).waitFor();
    expect(await page.getByRole('main').innerText()).toContain('0.5 acres');
    expect(await page.evaluate(() => document.activeElement?.tagName)).toBe('H1');
  });

  it('shows a problem that only the server finds beside the field, too', async () => {
    const page = await demo.signedIn('owner');
    await page.route('**/api/farms/*/blocks', (route) =>
      route.request().method() === 'POST'
        ? route.fulfill({ status: 422, contentType: 'application/problem+json', body: JSON.stringify({ type: 'about:blank', title: 'Some entries need another look', status: 422, detail: 'Correct the entries named below.', problems: [{ path: 'areaHa', message: 'must be at most 1000 ha' }] }) })
        : route.continue(),
    );
    await page.goto(`${farmPathOf(page)}/settings/blocks/new`);
    await page.getByLabel('Name', { exact: true }).fill('Far field');
    await page.getByLabel('Crop').fill('Apple');
    await page.getByLabel(/^Area/).fill('3');
    await page.getByRole('button', { name: 'Add the block' }).click();
    await besideField(page, 'Area must be at most 2471 acres.').waitFor();
    expect(await page.getByRole('alert').innerText()).toContain('Correct the entries');
    expect(await page.getByLabel('Crop').inputValue()).toBe('Apple');
  });

  it('tells two people who edit one block, instead of losing the work of either', async () => {
    const [first, second] = await Promise.all([demo.signedIn('owner'), demo.signedIn('applicator')]);
    for (const page of [first, second]) {
      await openBlock(page, 'Brook rows');
      await page.getByRole('link', { name: 'Edit' }).click();
      await page.getByLabel(/^Rows/).waitFor();
    }
    await first.getByLabel(/^Rows/).fill('8');
    await first.getByRole('button', { name: 'Save the block' }).click();
    await first.getByRole('heading', { level: 1, name: 'Brook rows' }).waitFor();

    await second.getByLabel(/^Notes/).fill('Two rows are grafted anew.');
    await second.getByRole('button', { name: 'Save the block' }).click();
    await second.getByRole('alert').waitFor();
    expect(await second.getByLabel(/^Notes/).inputValue()).toBe('Two rows are grafted anew.');
  });

  it('archives a block with a way back', async () => {
    const page = await demo.signedIn('owner');
    await openBlock(page, 'Yard spruces');
    await page.getByRole('button', { name: 'Archive' }).click();
    await page.getByText('Yard spruces is archived.').waitFor();
    await page.getByRole('button', { name: 'Undo' }).click();
    await page.getByRole('button', { name: 'Archive' }).waitFor();
    await page.getByText('Yard spruces is back.').waitFor();
  });

  it('lets the crew look and measure, but not change', async () => {
    const page = await demo.signedIn('crew');
    await openBlock(page, 'Brook rows');
    expect(await page.getByRole('link', { name: 'Edit' }).count()).toBe(0);
    expect(await page.getByRole('button', { name: 'Archive' }).count()).toBe(0);
    await page.goto(`${page.url()}/edit`);
    await page.getByText('As crew of this farm you may look but not change this.').waitFor();
    expect(await page.getByRole('textbox').count()).toBe(0);

    const farm = farmPathOf(page);
    await page.goto(`${farm}/people`);
    await page.getByText('Marit Halloran').waitFor();
    expect(await page.getByText('Invite someone').count()).toBe(0);

    await page.goto(farm);
    await page.getByRole('region', { name: 'The mornings after' }).getByRole('link').first().click();
    await page.getByLabel(/^Wind, mph|^Wind \(/).first().fill('4');
    await page.getByRole('button', { name: 'Keep the reading' }).click();
    await page.getByText(/wind 4 mph at/).waitFor();
  });

  it('speaks to an observer in metric units', async () => {
    const page = await demo.signedIn('observer');
    await openBlock(page, 'Ridge firs');
    expect(await page.getByRole('main').innerText()).toContain('0.344 ha');
    await page.goto(`${farmPathOf(page)}/shelf`);
    await page.getByRole('link', { name: /Example Mite/ }).click();
    await page.getByText('Weather').waitFor();
    expect(await page.getByRole('main').innerText()).toMatch(/4\.47 m\/s/);
  });

  it('makes a plan that mornings are then judged by', async () => {
    const page = await demo.signedIn('applicator');
    await page.goto(`${farmPathOf(page)}/plans/new`);
    await page.getByLabel('Name', { exact: true }).fill('Trial on the yard');
    await page.getByLabel('Yard spruces').check();
    await page.getByLabel('Product 1', { exact: true }).selectOption({ label: 'Example Mite 12 SC' });
    await page.getByLabel(/^Rate of product 1/).fill('3');
    await page.getByLabel(/^Carrier volume/).fill('15');
    await page.getByRole('button', { name: 'Make the plan' }).click();
    await page.getByRole('heading', { level: 1, name: 'Trial on the yard' }).waitFor();
    const mornings = page.getByRole('region', { name: 'Mornings in sight' }).getByRole('listitem');
    expect(await until('mornings judged by the plan', async () => (await mornings.count()) > 0)).toBe(true);
  });

  it('reads the ribbon of a morning by keys alone', async () => {
    const page = await demo.signedIn('owner');
    await page.getByRole('region', { name: 'The mornings after' }).getByRole('link').first().press('Enter');
    await page.waitForURL(/\/mornings\//);
    await page.getByRole('heading', { level: 1, name: /day, / }).waitFor();
    const slider = page.getByRole('slider').first();
    await slider.focus();
    await page.keyboard.press('Home');
    const first = await slider.getAttribute('aria-valuetext');
    await page.keyboard.press('ArrowRight');
    expect(Number(await slider.getAttribute('aria-valuenow'))).toBe(5);
    expect(await slider.getAttribute('aria-valuetext')).not.toBe(first);
    await page.keyboard.press('PageDown');
    expect(Number(await slider.getAttribute('aria-valuenow'))).toBe(35);
    await page.keyboard.press('End');
    expect(await slider.getAttribute('aria-valuenow')).toBe(await slider.getAttribute('aria-valuemax'));
    expect(first).toMatch(/\d{1,2}:\d{2}/);
    await page.keyboard.press('t');
    await page.getByRole('table').first().waitFor();
  });

  it('leads past the links to the content by keyboard', async () => {
    const page = await demo.signedIn('owner');
    await page.goto(`${farmPathOf(page)}/plans`);
    await page.getByRole('heading', { level: 1 }).waitFor();
    await page.keyboard.press('Tab');
    expect(await page.evaluate(() => document.activeElement?.textContent)).toBe('To the content');
  });
});
