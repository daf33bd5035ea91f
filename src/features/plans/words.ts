import type { BeeKind } from '../../../shared/assessment/case.ts';
import type { planStates } from '../../../shared/api/plans.ts';

export const planStateWords: Record<(typeof planStates)[number], string> = { planned: 'Planned', done: 'Done', cancelled: 'Called off' };
export const beeKindWords: Record<BeeKind, string> = { honeyBee: 'Honey bees', bumbleBee: 'Bumble bees', masonBee: 'Mason bees' };
