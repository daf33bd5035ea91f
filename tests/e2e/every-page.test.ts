import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { openPage, pagesOf } from './pages.ts';
import { desk, openDemo, phone, type DemoInBrowser } from './support.ts';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

interface AxeRun {
  violations: { id: string; nodes: { target: unknown[]; failureSummary?: string }[] }[];
}

/** What axe-core finds against WCAG 2.2 A and AA, in a line each. */
async function barriers(page: Page): Promise<string[]> {
  await page.evaluate(axeSource);
  const { violations } = await page.evaluate(async () => {
    const { axe } = window as unknown as { axe: { run(context: unknown, options: unknown): Promise<AxeRun> } };
    return axe.run({ exclude: ['iframe'] }, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] });
  });
  return violations.flatMap(({ id, nodes }) => nodes.map(({ target, failureSummary }) => `${id}: ${String(target[0])} ${failureSummary?.split('\n')[1]?.trim() ?? ''}`));
}

describe('every page', () => {
  let demo: DemoInBrowser;

  beforeAll(async () => {
    demo = await openDemo();
  }, 180_000);
  afterAll(() => demo?.close());

  it.each([
    ['phone', phone],
    ['desk', desk],
  ])('on a %s names itself, says whose word is final, needs no sideways scrolling, and holds no barrier', async (_, viewport) => {
    const page = await demo.signedIn('owner', viewport);
    const findings: string[] = [];
    for (const [name, path] of await pagesOf(page)) {
      await openPage(page, path);
      const { headings, title, footer, sideways } = await page.evaluate(() => ({
        headings: document.querySelectorAll('h1').length,
        title: document.title,
        footer: document.querySelector('footer')?.textContent ?? '',
        sideways: document.documentElement.scrollWidth - innerWidth,
      }));
      if (headings !== 1) findings.push(`${name}: ${headings} main headings`);
      if (!/.+ – Dawnvane$/.test(title)) findings.push(`${name}: title ${title}`);
      if (!footer.includes('The label is the law')) findings.push(`${name}: no last word`);
      if (sideways > 0) findings.push(`${name}: ${sideways} px too wide`);
      findings.push(...(await barriers(page)).map((barrier) => `${name}: ${barrier}`));
    }
    expect([...findings, ...demo.faults()]).toEqual([]);
  }, 180_000);
});
