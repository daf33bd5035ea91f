import { exactly, sumOf } from '../tank/exact.ts';
import { amountOnArea, convert, rateParts, substanceOf } from '../tank/measures.ts';
import type { Finding, FindingMaker } from './findings.ts';
import { blocksOf, labelsOf, type PlanFacts, type PlanForRules } from './plan-facts.ts';

/** Licence for restricted-use products [cfr171]: on file, and valid on the plan's dates. */
export function checkLicence(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  const { name: applicator, licenceNumber, licenceExpires: expires } = facts.applicator;
  return labelsOf(plan, facts).flatMap(({ path, label }): Finding[] => {
    if (!label.restrictedUse) return [];
    if (licenceNumber.trim() === '' || expires === null) return [find('licenceMissing', path, { product: label.name, applicator })];
    return expires < plan.lastDate ? [find('licenceExpires', path, { product: label.name, applicator, expires }, { level: expires < plan.firstDate ? 'stop' : 'warn' })] : [];
  });
}

const unitNames = { flOz: 'fl oz', mL: 'mL', gal: 'gal', L: 'L', oz: 'oz', lb: 'lb', g: 'g', kg: 'kg' } as const;
const tidy = (value: number): number => Number(value.toPrecision(6));

/** Product needed on all blocks against the shelf; exact doses, the mix sheet tells what rounding adds. */
export function checkShelf(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  const areaHa = sumOf(blocksOf(plan, facts).map(({ block }) => exactly(block.areaHa, 'areaHa')));
  return labelsOf(plan, facts).flatMap(({ rate, path, label }): Finding[] => {
    const findings: Finding[] = [];
    if (label.isExample) findings.push(find('exampleProduct', path, { product: label.name }));
    if (!label.hasLabelFile) findings.push(find('labelFileMissing', path, { product: label.name }));
    if (label.epaRegistrationNumber === '') findings.push(find('registrationMissing', path, { product: label.name }));
    const { amount } = rateParts(label.rateUnit);
    if (label.stock !== null && substanceOf(label.stock.unit) === substanceOf(amount)) {
      const need = convert(amountOnArea(exactly(rate), label.rateUnit, areaHa), amount, label.stock.unit);
      if (need.compare(exactly(label.stock.amount)) > 0) findings.push(find('stockShort', `${path}.rate`, { product: label.name, need: tidy(need.valueOf()), have: label.stock.amount, unit: unitNames[label.stock.unit] }));
    }
    return findings;
  });
}
