import { keptApi } from '../../../lib/api/kept.ts';
import { routes } from '../../../lib/api/routes.ts';

export const blocksApi = keptApi('blocks', routes.blocks);
