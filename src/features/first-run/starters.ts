import type { z } from 'zod';
import type { productBody } from '../../../shared/api/plans.ts';
import { fahrenheitToC, gallonsPerAcreToLHa, mphToMs } from '../../../shared/units/units.ts';

const invented = 'Invented example, not a real product: replace every figure by the label in your hand.';

/** Invented products to begin with; none is any maker's, and each says so. */
export const starters: (z.input<typeof productBody> & { name: string })[] = [
  {
    name: 'Example insect and mite spray',
    activeIngredients: 'invented',
    moaSystem: 'IRAC',
    moaGroup: '',
    rateMin: 3,
    rateMax: 5,
    rateUnit: 'flOzPerAcre',
    carrierMinLHa: gallonsPerAcreToLHa(10),
    carrierMaxLHa: gallonsPerAcreToLHa(40),
    windMaxMs: mphToMs(10),
    windMinMs: mphToMs(2),
    rainFreeHours: 4,
    temperatureMinC: fahrenheitToC(42),
    temperatureMaxC: fahrenheitToC(85),
    beeStatement: 'notWhileForaging',
    reiHours: 12,
    notes: invented,
  },
  {
    name: 'Example fungus spray',
    activeIngredients: 'invented',
    moaSystem: 'FRAC',
    moaGroup: '',
    rateMin: 4,
    rateMax: 6,
    rateUnit: 'ozPerAcre',
    carrierMinLHa: gallonsPerAcreToLHa(15),
    carrierMaxLHa: gallonsPerAcreToLHa(60),
    windMaxMs: mphToMs(10),
    windMinMs: mphToMs(2),
    rainFreeHours: 6,
    temperatureMinC: fahrenheitToC(40),
    temperatureMaxC: fahrenheitToC(88),
    beeStatement: 'none',
    reiHours: 24,
    notes: invented,
  },
];
