import type { Wishes } from '../../shared/api/notices.ts';
import type { Role } from '../../shared/rules/authorization.ts';

const defaults: Readonly<Record<Role, Wishes>> = {
  owner: { push: ['eve', 'dawn', 'turn'], email: ['forecastMissing'] },
  applicator: { push: ['eve', 'dawn', 'turn'], email: [] },
  crew: { push: [], email: ['summary', 'turn'] },
  observer: { push: [], email: [] },
};

/** Which notices reach a member who has chosen nothing yet. */
export const defaultWishes = (role: Role): Wishes => structuredClone(defaults[role]);
