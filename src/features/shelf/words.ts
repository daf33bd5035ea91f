import type { beeStatements } from '../../../shared/assessment/case.ts';
import type { moaSystems, Product } from '../../../shared/api/plans.ts';
import { rateUnitWords } from '../../lib/rate-words.ts';

export const beeStatementWords: Record<(typeof beeStatements)[number], string> = {
  none: 'The label says nothing of bees',
  notWhileForaging: 'Do not apply while bees are foraging',
  notInBloom: 'Do not apply while anything is in bloom',
};

export const moaSystemWords: Record<(typeof moaSystems)[number], string> = {
  IRAC: 'IRAC (insects, mites)',
  FRAC: 'FRAC (fungi)',
  HRAC: 'HRAC (weeds)',
  none: 'No group on the label',
};

/** `2 to 4 fl oz/acre`. */
export function rateRange({ rateMin, rateMax, rateUnit }: Pick<Product, 'rateMin' | 'rateMax' | 'rateUnit'>): string {
  return rateMin === rateMax ? `${rateMin} ${rateUnitWords[rateUnit]}` : `${rateMin} to ${rateMax} ${rateUnitWords[rateUnit]}`;
}

/** `IRAC 10A`; nothing when the label has no group. */
export function moaOf({ moaSystem, moaGroup }: Pick<Product, 'moaSystem' | 'moaGroup'>): string {
  return moaSystem === 'none' || moaGroup === '' ? '' : `${moaSystem} ${moaGroup}`;
}
