import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { farmPathOf, openDemo, phone, stepClock, until, type DemoInBrowser } from './support.ts';

describe('a visitor of the demo, from the evening to dawn', () => {
  let demo: DemoInBrowser;

  beforeAll(async () => {
    demo = await openDemo();
  }, 180_000);
  afterAll(() => demo?.close());
  afterEach(() => expect(demo.faults()).toEqual([]));

  it('signs in with one tap and sees whether the coming morning is fit for spraying, and why', async () => {
    const page = await demo.signedIn('owner');
    expect(await page.title()).toMatch(/morning – Dawnvane$/);
    expect(await page.locator('.answer').innerText()).toMatch(/^(Go|Hold)/);
    expect(await page.getByRole('region', { name: 'The mornings after' }).getByRole('link').count()).toBe(5);
    expect(await page.getByRole('contentinfo').innerText()).toContain('The label is the law');
    expect(await page.getByText(/^Forecast by /).innerText()).toMatch(/min|h old/);
  });

  it('finds the answer, the next step and the next mornings on one screen of a small phone', async () => {
    const page = await demo.signedIn('owner', phone);
    const bottomOf = async (locator: ReturnType<typeof page.locator>) => (await locator.boundingBox().then((box) => (box ? box.y + box.height : Number.NaN))) as number;
    const bar = await page.getByRole('navigation', { name: 'Pages' }).boundingBox();
    for (const part of [page.locator('.answer'), page.getByRole('main').getByRole('link', { name: /^(Look at|Check|Make)|Fetch/ }).first(), page.getByRole('region', { name: 'The mornings after' }).getByRole('list')]) {
      expect(await bottomOf(part)).toBeLessThanOrEqual(bar!.y);
    }
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
  });

  it('steps the clock to dawn, and sees the push on the phone, the summary in the mailbox and the signed webhook', async () => {
    const page = await demo.signedIn('owner', phone);
    const farm = farmPathOf(page);
    await stepClock(page, /^The evening/);
    await stepClock(page, /^Dawn/);
    const { date, verdict } = await page.evaluate(async (path) => {
      const { mornings } = (await (await fetch(`/api${path}/daybreak`)).json()) as { mornings: { date: string; verdicts: { verdict: string }[] }[] };
      return { date: mornings[0]!.date, verdict: mornings[0]!.verdicts.some((told) => told.verdict === 'go') ? 'Go' : 'Hold' };
    }, farm);

    await page.goto('/demo/phone');
    const notice = page.getByRole('list', { name: 'Notices on the lock screen' }).getByRole('link').first();
    await until('the push of this morning', async () => (await notice.getAttribute('href'))?.endsWith(`/mornings/${date}`));
    expect(await notice.innerText()).toMatch(new RegExp(`^${verdict}`));

    await page.goto('/demo/mailbox');
    const letters = page.getByRole('list', { name: 'Letters' }).getByRole('button');
    await until('the summary to the partner', async () => /This morning/.test(await letters.first().innerText()));
    await letters.first().click();
    const letter = page.getByRole('article');
    expect(await letter.innerText()).toContain('teo@quillbrook.example');
    await page.frameLocator('iframe').getByRole('heading', { level: 1 }).waitFor();
    await letter.getByRole('button', { name: 'Plain text' }).click();
    expect(await letter.locator('pre').innerText()).toContain('The label is the law');

    await page.goto('/demo/hooks');
    const posted = page.getByRole('main').getByRole('listitem').filter({ hasText: 'Signature valid' }).first();
    await posted.getByText('What was posted').click();
    const body = JSON.parse(await posted.locator('pre').innerText()) as { type: string; data: { date?: string } };
    expect(body.type).toMatch(/^notice\.(dawn|turn)$/);
  });

  it('opens the morning by a tap on the push, with the same verdict', async () => {
    const page = await demo.signedIn('owner', phone);
    await stepClock(page, /^(Dawn|The evening|The next evening)/);
    await page.goto('/demo/phone');
    const notice = page.getByRole('list', { name: 'Notices on the lock screen' }).getByRole('link').first();
    const word = (await notice.innerText()).match(/^(Go|Hold)/)![0];
    await notice.click();
    await page.waitForURL(/\/mornings\/\d{4}-\d{2}-\d{2}$/);
    await page.getByRole('heading', { level: 1 }).waitFor();
    expect(await page.getByRole('main').innerText()).toMatch(new RegExp(`\\n${word}`));
  });

  it('is told when the forecast fails, and never gets a go from silence', async () => {
    const page = await demo.signedIn('owner');
    const farm = farmPathOf(page);
    await page.goto('/demo/clock');
    for (const provider of ['Open-Meteo', 'US National Weather Service', 'MET Norway']) {
      const answered = page.waitForResponse(/\/api\/demo\/mood$/);
      await page.getByLabel(provider).selectOption({ label: 'Cuts its answer short' });
      await answered;
    }
    await stepClock(page, /^(The next evening|Noon)/);
    await page.goto(farm);
    await page.getByText(/too old to say go/).first().waitFor();
    expect(await page.locator('.answer').innerText()).toMatch(/^Hold/);
    expect(await page.getByText('not enough to tell').count()).toBeGreaterThan(0);
  }, 120_000);
});
