import { keptApi } from '../../../lib/api/kept.ts';
import { routes } from '../../../lib/api/routes.ts';

export const plansApi = keptApi('plans', routes.plans);
