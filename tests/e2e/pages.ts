import type { Page } from 'playwright-core';
import { farmPathOf } from './support.ts';

/** Every page of a farm, by a short name and its address; ids are those of the first things that the farm keeps. */
export async function pagesOf(page: Page): Promise<[name: string, path: string][]> {
  const farm = farmPathOf(page);
  const idOf = (noun: string) => page.evaluate(async (path) => ((await (await fetch(path)).json()) as { items: { id: string }[] }).items[0]!.id, `/api${farm}/${noun}`);
  const date = await page.evaluate(async (path) => ((await (await fetch(path)).json()) as { mornings: { date: string }[] }).mornings[0]!.date, `/api${farm}/daybreak`);
  const [block, place, sprayer, product, plan] = [await idOf('blocks'), await idOf('sensitive-places'), await idOf('sprayers'), await idOf('products'), await idOf('plans')];
  return [
    ['daybreak', farm],
    ['morning', `${farm}/mornings/${date}`],
    ['plans', `${farm}/plans`],
    ['plan', `${farm}/plans/${plan}`],
    ['plan-new', `${farm}/plans/new`],
    ['plan-edit', `${farm}/plans/${plan}/edit`],
    ['shelf', `${farm}/shelf`],
    ['product', `${farm}/shelf/${product}`],
    ['product-new', `${farm}/shelf/new`],
    ['product-edit', `${farm}/shelf/${product}/edit`],
    ['farm', `${farm}/settings`],
    ['farm-edit', `${farm}/settings/edit`],
    ['block', `${farm}/settings/blocks/${block}`],
    ['block-new', `${farm}/settings/blocks/new`],
    ['block-edit', `${farm}/settings/blocks/${block}/edit`],
    ['place', `${farm}/settings/places/${place}`],
    ['place-edit', `${farm}/settings/places/${place}/edit`],
    ['sprayer', `${farm}/settings/sprayers/${sprayer}`],
    ['sprayer-edit', `${farm}/settings/sprayers/${sprayer}/edit`],
    ['notices', `${farm}/notices`],
    ['devices', `${farm}/notices/devices`],
    ['hooks', `${farm}/notices/hooks`],
    ['people', `${farm}/people`],
    ['changes', `${farm}/people/changes`],
    ['account', '/account'],
    ['new-farm', '/farms/new'],
    ['demo-clock', '/demo/clock'],
    ['demo-phone', '/demo/phone'],
    ['demo-mailbox', '/demo/mailbox'],
    ['demo-hooks', '/demo/hooks'],
    ['nothing', '/nowhere'],
  ];
}

/** Opens a page and waits until nothing on it is still loading. */
export async function openPage(page: Page, path: string): Promise<void> {
  await page.goto(path);
  await page.getByRole('heading', { level: 1 }).waitFor();
  await page.waitForFunction(() => !document.querySelector('[role=status][aria-label=Loading]'));
}
