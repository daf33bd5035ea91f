import type { TestApp } from './app.ts';
import { buildFarm, signInAs, type Browser } from './people.ts';

/** What a person would enter, each with just enough to be taken. */
export const typed = {
  farm: { name: 'Larch End', latitude: 44.7, longitude: -85.3, elevationM: 260 },
  block: { name: 'North rows', crop: 'Apple', areaHa: 0.3 },
  place: { name: 'Hives by the ditch', kind: 'hives', bearingDeg: 200, distanceM: 120 },
  sprayer: { name: 'Pack', tankL: 10, minutesPerTank: 6, changeOverMinutes: 3 },
  product: { name: 'Example One', rateMin: 2, rateMax: 4, rateUnit: 'flOzPerAcre' },
} as const;

export interface OwnedFarm {
  farmId: string;
  /** Signed in as the farm's owner. */
  browser: Browser & { userId: string; email: string };
  /** Address of something under the farm. */
  at(path: string): string;
}

/** A farm with an owner who is signed in. */
export async function ownedFarm(app: TestApp): Promise<OwnedFarm> {
  const farmId = await buildFarm(app);
  return { farmId, browser: await signInAs(app, farmId, 'owner'), at: (path) => `/api/farms/${farmId}${path}` };
}

/** Adds a thing through the API and answers its id. */
export const add = async ({ browser, at }: OwnedFarm, noun: string, body: object): Promise<string> => (await browser.post(at(noun)).send(body).expect(201)).body.id as string;

/** A farm with a block, a sprayer and a product, and a plan over them that is still to be sent. */
export async function farmToPlanOn(app: TestApp) {
  const farm = await ownedFarm(app);
  const ids = { block: await add(farm, '/blocks', typed.block), sprayer: await add(farm, '/sprayers', typed.sprayer), product: await add(farm, '/products', typed.product) };
  const plan = { name: 'First cover', blockIds: [ids.block], products: [{ productId: ids.product, rate: 3 }], sprayerId: ids.sprayer, carrierLHa: 100, firstDate: '2026-06-10', lastDate: '2026-06-14' };
  return { ...farm, ids, plan };
}

/** The paths of the problems that an answer names. */
export const pathsOf = (answer: { body: { problems?: { path: string }[] } }): string[] => (answer.body.problems ?? []).map((problem) => problem.path);
