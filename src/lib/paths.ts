/** Builders of links to the pages of app/router.tsx. */

/** Lists of things that a farm keeps, and where each thing has its pages. */
function kept(base: (farmId: string) => string) {
  return {
    list: base,
    create: (farmId: string) => `${base(farmId)}/new`,
    one: (farmId: string, id: string) => `${base(farmId)}/${id}`,
    edit: (farmId: string, id: string) => `${base(farmId)}/${id}/edit`,
  };
}

const farm = (farmId: string) => `/farms/${farmId}`;

export const paths = {
  home: () => '/',
  signIn: (next?: string) => (next && next !== '/' ? `/sign-in?next=${encodeURIComponent(next)}` : '/sign-in'),
  signUp: () => '/sign-up',
  forgot: () => '/forgot',
  account: () => '/account',
  newFarm: () => '/farms/new',
  daybreak: farm,
  morning: (farmId: string, date: string) => `${farm(farmId)}/mornings/${date}`,
  plans: kept((farmId) => `${farm(farmId)}/plans`),
  shelf: kept((farmId) => `${farm(farmId)}/shelf`),
  settings: (farmId: string) => `${farm(farmId)}/settings`,
  editSettings: (farmId: string) => `${farm(farmId)}/settings/edit`,
  blocks: kept((farmId) => `${farm(farmId)}/settings/blocks`),
  places: kept((farmId) => `${farm(farmId)}/settings/places`),
  sprayers: kept((farmId) => `${farm(farmId)}/settings/sprayers`),
  notices: (farmId: string) => `${farm(farmId)}/notices`,
  devices: (farmId: string) => `${farm(farmId)}/notices/devices`,
  hooks: (farmId: string) => `${farm(farmId)}/notices/hooks`,
  people: (farmId: string) => `${farm(farmId)}/people`,
  audit: (farmId: string) => `${farm(farmId)}/people/changes`,
  demoClock: () => '/demo/clock',
  demoPhone: () => '/demo/phone',
  demoMailbox: () => '/demo/mailbox',
  demoHooks: () => '/demo/hooks',
};

/** A way back into the application that came in by the address: never to another site. */
export function safeNext(next: string | null): string {
  return next && /^\/(?![/\\])/.test(next) ? next : '/';
}
