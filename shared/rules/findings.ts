import type { SourceKey } from '../bibliography.ts';
import { litresPerHaToGallonsPerAcre, metresToFeet, type UnitSystem } from '../units/units.ts';
import type { RateUnit } from '../api/plans.ts';
import { sentences, type FindingKey, type FindingParams } from './finding-sentences.ts';

/** `stop`: the plan must change; `warn`: a person must decide; `note`: good to know. */
export type FindingLevel = 'stop' | 'warn' | 'note';
/** `label`: as the user entered it; `law`: a rule with its source; `practice`: advice. */
export type FindingSource = 'label' | 'law' | 'practice';

/** One finding about a plan. Figures in `params` are SI, rates in the label's own unit, dates `YYYY-MM-DD`. */
export type Finding<K extends FindingKey = FindingKey> = {
  [Key in K]: { key: Key; params: FindingParams[Key]; level: FindingLevel; source: FindingSource; /** Field of the plan, such as `products.0.rate`. */ path: string; /** Where a law or an advice stands. */ cite: SourceKey | null; text: string };
}[K];

/** How a person reads the figures of a sentence. */
export interface FindingFormats {
  carrier(lHa: number): string;
  distance(m: number): string;
  rate(value: number, unit: RateUnit): string;
}

const rateNames: Record<RateUnit, string> = { flOzPerAcre: 'fl oz/acre', ozPerAcre: 'oz/acre', lbPerAcre: 'lb/acre', mLPerHa: 'mL/ha', gPerHa: 'g/ha', lPerHa: 'L/ha', kgPerHa: 'kg/ha' };
const tidy = (value: number, digits = 4): string => String(Number(value.toPrecision(digits)));

export const findingFormats = (units: UnitSystem): FindingFormats => ({
  carrier: (lHa) => (units === 'us' ? `${tidy(litresPerHaToGallonsPerAcre(lHa))} gal/acre` : `${tidy(lHa)} L/ha`),
  distance: (m) => (units === 'us' ? `${tidy(metresToFeet(m), 3)} ft` : `${tidy(m, 3)} m`),
  rate: (value, unit) => `${tidy(value, 6)} ${rateNames[unit]}`,
});

/** Makes the findings of one reader. */
export type FindingMaker = <K extends FindingKey>(key: K, path: string, params: FindingParams[K], own?: { level?: FindingLevel }) => Finding;

export function findingMaker(units: UnitSystem): FindingMaker {
  const formats = findingFormats(units);
  return (key, path, params, own = {}) => {
    const { level, source, cite, say } = sentences[key];
    return { key, params, path, level: own.level ?? level, source, cite: cite ?? null, text: (say as (params: unknown, f: FindingFormats) => string)(params, formats) } as Finding;
  };
}

const order: readonly FindingLevel[] = ['stop', 'warn', 'note'];
/** Worst first; of one level in the order found. */
export const worstFirst = (findings: readonly Finding[]): Finding[] => findings.toSorted((a, b) => order.indexOf(a.level) - order.indexOf(b.level));

/** Says a finding again in another person's units. */
export const retellFinding = (finding: Finding, units: UnitSystem): string => (sentences[finding.key].say as (params: unknown, f: FindingFormats) => string)(finding.params, findingFormats(units));
