import type { beeStatements } from '../../../shared/assessment/case.ts';
import type { moaSystems, RateUnit } from '../../../shared/api/plans.ts';

export const rateUnitWords: Record<RateUnit, string> = {
  flOzPerAcre: 'fl oz/acre',
  ozPerAcre: 'oz/acre',
  lbPerAcre: 'lb/acre',
  mLPerHa: 'mL/ha',
  gPerHa: 'g/ha',
  lPerHa: 'L/ha',
  kgPerHa: 'kg/ha',
};

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
