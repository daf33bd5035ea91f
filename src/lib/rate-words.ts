import type { RateUnit } from '../../shared/api/plans.ts';

/** Units of a rate as labels print them. */
export const rateUnitWords: Record<RateUnit, string> = {
  flOzPerAcre: 'fl oz/acre',
  ozPerAcre: 'oz/acre',
  lbPerAcre: 'lb/acre',
  mLPerHa: 'mL/ha',
  gPerHa: 'g/ha',
  lPerHa: 'L/ha',
  kgPerHa: 'kg/ha',
};
