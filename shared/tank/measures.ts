import type { RateUnit } from '../api/plans.ts';
import { gramsPerOunce, gramsPerPound, hectaresPerAcre, litresPerGallon, millilitresPerFluidOunce } from '../units/units.ts';
import { exactly, type Exact } from './exact.ts';

/** Liquids in mL, solids in g. */
export type Substance = 'liquid' | 'solid';

/**
 * What a person pours or weighs with. Kitchen spoons are left out on purpose: they differ, and a spoon that has measured a
 * pesticide finds its way back to the kitchen (common practice, no source).
 */
export const measureUnits = ['flOz', 'mL', 'gal', 'L', 'oz', 'lb', 'g', 'kg'] as const;
export type MeasureUnit = (typeof measureUnits)[number];

/** Size of each unit in mL or g: exact definitions [nist44]. */
const units: Record<MeasureUnit, { substance: Substance; size: Exact }> = {
  flOz: { substance: 'liquid', size: exactly(millilitresPerFluidOunce) },
  mL: { substance: 'liquid', size: exactly(1) },
  gal: { substance: 'liquid', size: exactly(litresPerGallon).mul(1000) },
  L: { substance: 'liquid', size: exactly(1000) },
  oz: { substance: 'solid', size: exactly(gramsPerOunce) },
  lb: { substance: 'solid', size: exactly(gramsPerPound) },
  g: { substance: 'solid', size: exactly(1) },
  kg: { substance: 'solid', size: exactly(1000) },
};

export const substanceOf = (unit: MeasureUnit): Substance => units[unit].substance;

/** mL or g in one unit. */
export const sizeOf = (unit: MeasureUnit): Exact => units[unit].size;

/** @throws RangeError when one is a volume and the other a weight: without the density there is no way across */
export function convert(amount: Exact, from: MeasureUnit, to: MeasureUnit): Exact {
  if (substanceOf(from) !== substanceOf(to)) throw new RangeError(`${from} cannot be turned into ${to}: one is a volume, the other a weight.`);
  return from === to ? amount : amount.mul(sizeOf(from)).div(sizeOf(to));
}

/** A measure in hand: the unit on its scale and its finest mark. */
export interface Measure {
  unit: MeasureUnit;
  step: number;
}

/** Usual measures and their marks: a 0.1 fl oz or 1 mL syringe or cylinder, a 5 mL cup, a kitchen-size scale (common practice, no source). */
export const usualMeasures = {
  flOz: { unit: 'flOz', step: 0.1 },
  mL: { unit: 'mL', step: 1 },
  mL5: { unit: 'mL', step: 5 },
  oz: { unit: 'oz', step: 0.1 },
  g: { unit: 'g', step: 1 },
  g5: { unit: 'g', step: 5 },
} as const satisfies Record<string, Measure>;

interface RateParts {
  amount: MeasureUnit;
  /** Hectares in the unit of area. */
  areaHa: Exact;
  measure: Measure;
}

const hectare = exactly(1);
const acre = exactly(hectaresPerAcre);

/** Each rate unit: what it counts, over which area, and the measure used when none is chosen. */
const rates: Record<RateUnit, RateParts> = {
  flOzPerAcre: { amount: 'flOz', areaHa: acre, measure: usualMeasures.flOz },
  ozPerAcre: { amount: 'oz', areaHa: acre, measure: usualMeasures.oz },
  lbPerAcre: { amount: 'lb', areaHa: acre, measure: usualMeasures.oz },
  mLPerHa: { amount: 'mL', areaHa: hectare, measure: usualMeasures.mL },
  lPerHa: { amount: 'L', areaHa: hectare, measure: usualMeasures.mL },
  gPerHa: { amount: 'g', areaHa: hectare, measure: usualMeasures.g },
  kgPerHa: { amount: 'kg', areaHa: hectare, measure: usualMeasures.g },
};

export const rateParts = (unit: RateUnit): RateParts => rates[unit];

/** Product on an area, in the rate's own amount unit (fl oz for `flOzPerAcre`). */
export const amountOnArea = (rate: Exact, unit: RateUnit, areaHa: Exact): Exact => rate.mul(areaHa).div(rates[unit].areaHa);

/** The rate that an amount of product on an area comes to. */
export const rateOnArea = (amount: Exact, unit: RateUnit, areaHa: Exact): Exact => amount.mul(rates[unit].areaHa).div(areaHa);
