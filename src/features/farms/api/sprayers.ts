import { keptApi } from '../../../lib/api/kept.ts';
import { routes } from '../../../lib/api/routes.ts';

export const sprayersApi = keptApi('sprayers', routes.sprayers);
