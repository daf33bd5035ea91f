import { millilitresPerFluidOunce } from '../units/units.ts';

/** Formulation codes as on labels, and the two kinds of helper that have a place of their own. */
export const formulations = ['waterConditioner', 'waterSolublePacket', 'WG', 'WP', 'SC', 'F', 'EC', 'SL', 'adjuvant'] as const;
export type Formulation = (typeof formulations)[number];

/** Place in the order; equal places in any order [purduePpp122, from memory; the short form is WALES, omafraMixing]. */
const places: Record<Formulation, number> = { waterConditioner: 1, waterSolublePacket: 2, WG: 3, WP: 3, SC: 4, F: 4, EC: 5, SL: 6, adjuvant: 7 };

/** More partners than about this in one tank ask for trouble [omafraMixing]. */
export const usualPartnersMax = 3;

export type MixStep<T> = { kind: 'halfFill' | 'agitate' | 'topUp' } | { kind: 'add'; item: T };

export interface MixingOrder<T> {
  /** Advice, common practice: an order on a label comes first. */
  steps: MixStep<T>[];
  /** Items of unknown formulation, put before the adjuvants: read their labels. */
  unknown: T[];
  tooManyPartners: boolean;
}

/**
 * The usual order of mixing: half the water, agitate, then packets, dry formulations, suspensions, emulsions, solutions, adjuvants,
 * then top up [omafraMixing; purduePpp122]. Advice only.
 */
export function mixingOrder<T extends { formulation: Formulation | null }>(items: readonly T[]): MixingOrder<T> {
  const place = ({ formulation }: T): number => (formulation === null ? places.adjuvant - 0.5 : places[formulation]);
  const ordered = items.toSorted((a, b) => place(a) - place(b));
  const partners = items.filter(({ formulation }) => formulation !== 'adjuvant' && formulation !== 'waterConditioner');
  return {
    steps: [{ kind: 'halfFill' }, { kind: 'agitate' }, ...ordered.flatMap((item): MixStep<T>[] => [{ kind: 'add', item }, { kind: 'agitate' }]), { kind: 'topUp' }],
    unknown: items.filter(({ formulation }) => formulation === null),
    tooManyPartners: partners.length > usualPartnersMax,
  };
}

/** The customary jar: one US quart. */
export const quartJarL = 0.946352946;
/** Minutes to let a jar stand before looking for clumps, gel, heat or layers [purduePpp122, from memory]. */
export const jarTestMinutes = [15, 30] as const;

/**
 * Product for a jar test: the jar holds the same ratio as the tank.
 * @param amountPerTank in any unit @param jarL spray in the jar
 * @returns the same unit as the amount @throws RangeError naming a volume that is not above 0
 */
export function jarAmount(amountPerTank: number, tankL: number, jarL: number = quartJarL): number {
  for (const [name, value] of Object.entries({ tankL, jarL })) if (!(value > 0)) throw new RangeError(`${name} must be more than 0, not ${value}.`);
  return (amountPerTank * jarL) / tankL;
}

/** The same from a rate per area: fl oz per acre at gal/ac in a quart jar, as extension tables put it. @returns mL */
export const quartJarMl = (flOzPerAcre: number, gallonsPerAcre: number): number => (flOzPerAcre / gallonsPerAcre) * 0.25 * millilitresPerFluidOunce;

/** Why water pH is asked: half-life of captan in water [omafraMixing, quoting Michigan State]. An example, not a rule for other products. */
export const captanHalfLife = [
  { pH: 5, minutes: 32 * 60 },
  { pH: 8, minutes: 10 },
] as const;
