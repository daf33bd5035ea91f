import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { openDemo, phone, until, type DemoInBrowser } from './support.ts';

describe('a grower who is new', () => {
  let demo: DemoInBrowser;

  beforeAll(async () => {
    demo = await openDemo();
  }, 180_000);
  afterAll(() => demo?.close());
  afterEach(() => expect(demo.faults()).toEqual([]));

  it('opens an account, confirms the address by the letter, and gets to a real verdict in a dozen answers', async () => {
    const page = await demo.visit(phone);
    await page.goto('/');
    await page.getByRole('link', { name: 'Open an account' }).click();
    await page.getByLabel('Your name').fill('Isa Wren');
    await page.getByLabel('E-mail').fill('isa@wren.example');
    await page.getByLabel('Password').fill('short');
    await page.getByRole('button', { name: 'Open the account' }).click();
    await page.getByText('Password must have at least 10 characters.').waitFor();
    await page.getByLabel('Password').fill('larch and alder at dawn');
    await page.getByRole('button', { name: 'Open the account' }).click();
    await page.getByRole('heading', { level: 1, name: 'Look into your mailbox' }).waitFor();

    await page.goto('/demo/mailbox');
    const letter = page.getByRole('list', { name: 'Letters' }).getByRole('button', { name: /Confirm your address/ });
    await letter.click();
    await page.getByRole('button', { name: 'Plain text' }).click();
    const link = (await page.getByRole('article').locator('pre').innerText()).match(/https?:\/\/\S+\/confirm\?token=\S+/)![0];
    await page.goto(link);
    await page.getByRole('button', { name: 'Yes, this is my address' }).click();
    await page.getByText('The address is confirmed.').waitFor();

    await page.goto('/sign-in');
    await page.getByLabel('E-mail').fill('isa@wren.example');
    await page.getByLabel('Password').fill('larch and alder at dawn');
    await page.getByRole('button', { name: 'Sign in', exact: true }).click();

    let answers = 0;
    const answer = async (label: RegExp, text: string) => {
      await page.getByLabel(label).fill(text);
      answers += 1;
    };
    await page.getByRole('heading', { level: 1, name: 'Open a farm' }).waitFor();
    await answer(/^Name of the farm/, 'Wrenfold');
    await answer(/^Latitude/, '45.52');
    await answer(/^Longitude/, '-122.68');
    await answer(/^Elevation/, '190');
    await page.getByRole('button', { name: 'Go on' }).click();
    await page.getByText('A first block').waitFor();
    await answer(/^What you call it/, 'Lower rows');
    await answer(/^Crop/, 'Noble fir');
    await answer(/^Area/, '0.7');
    await page.getByRole('button', { name: 'Go on' }).click();
    await page.getByRole('button', { name: /^Example insect/ }).click();
    answers += 1;
    await page.getByText('Your sprayer').waitFor();
    await answer(/^Tank/, '3.5');
    await answer(/^Minutes to spray one tank/, '7');
    await answer(/^Minutes between tanks/, '4');
    await page.getByRole('button', { name: 'Go on' }).click();
    await page.getByRole('button', { name: 'Make the plan' }).click();
    await page.getByRole('link', { name: 'See the next morning' }).click();
    expect(answers).toBeLessThanOrEqual(12);

    expect(await until('the first verdict', async () => ((await page.locator('.answer').count()) > 0 ? page.locator('.answer').innerText() : null))).toMatch(/^(Go|Hold)/);
    expect(await page.getByRole('main').innerText()).toContain('First plan, Lower rows');
  }, 90_000);

  it('is led to the sign-in page from a page that needs one, and back again afterwards', async () => {
    const owner = await demo.signedIn('owner');
    const wanted = `${new URL(owner.url()).pathname}/shelf`;
    const page = await demo.visit(phone);
    await page.goto(wanted);
    await page.waitForURL(/\/sign-in\?next=/);
    await page.getByRole('region', { name: 'Demo sign-ins' }).getByRole('button', { name: /observer/ }).click();
    await page.getByRole('heading', { level: 1, name: 'Shelf' }).waitFor();
    expect(new URL(page.url()).pathname).toBe(wanted);
  });

  it('is told the same for a wrong password as for an unknown address', async () => {
    const page = await demo.visit(phone);
    await page.goto('/sign-in');
    const tryWith = async (email: string) => {
      await page.getByLabel('E-mail').fill(email);
      await page.getByLabel('Password').fill('not the right password');
      await page.getByRole('button', { name: 'Sign in', exact: true }).click();
      const said = page.getByRole('alert');
      await said.waitFor();
      return said.innerText();
    };
    const known = await tryWith('marit@quillbrook.example');
    await page.reload();
    expect(await tryWith('nobody@nowhere.example')).toBe(known);
    expect(await page.getByLabel('E-mail').inputValue()).toBe('nobody@nowhere.example');
  });

  it('meets a plain page where an address names nothing, or another farm', async () => {
    const page = await demo.signedIn('owner');
    for (const address of ['/nowhere', '/farms/00000000-0000-4000-8000-000000000000', `${new URL(page.url()).pathname}/settings/blocks/00000000-0000-4000-8000-000000000000`]) {
      await page.goto(address);
      await page.getByRole('heading', { level: 1, name: 'Nothing here' }).waitFor();
    }
  });
});
