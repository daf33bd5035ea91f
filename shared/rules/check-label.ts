import { labelBreaches } from './plan-label.ts';
import type { Finding, FindingMaker } from './findings.ts';
import { blocksOf, labelsOf, type LabelEntries, type LabelUse, type PlanFacts, type PlanForRules } from './plan-facts.ts';

const same = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase();

/** The entered uses that fit a crop and target: those that name the target before those for any. */
function usesFor(label: LabelEntries, crop: string, target: string): readonly LabelUse[] {
  const ofCrop = (label.uses ?? []).filter((use) => same(use.crop, crop));
  const named = ofCrop.filter((use) => use.target !== '' && same(use.target, target));
  return named.length > 0 ? named : ofCrop.filter((use) => use.target === '');
}

/** The label as it stands for one block: its range for this crop and target where one was entered. */
function narrowed(label: LabelEntries, crop: string, target: string): LabelEntries | null {
  if (!label.uses?.length) return label;
  const uses = usesFor(label, crop, target);
  return uses.length === 0 ? null : { ...label, rateMin: Math.min(...uses.map(({ rateMin }) => rateMin)), rateMax: Math.max(...uses.map(({ rateMax }) => rateMax)) };
}

/** Rate for each block's crop and the target, carrier volume. */
export function checkRates(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  const findings: Finding[] = [];
  const seen = new Set<string>();
  const add = (finding: Finding) => {
    // One sentence for all blocks that ask the same.
    const once = `${finding.path} ${finding.text}`;
    if (!seen.has(once)) findings.push(finding);
    seen.add(once);
  };
  for (const { block } of blocksOf(plan, facts)) {
    for (const { productId, rate, path, label } of labelsOf(plan, facts)) {
      const own = narrowed(label, block.crop, plan.target);
      if (own === null) add(find('useNotEntered', path, { product: label.name, block: block.name, crop: block.crop }));
      else if (rate < own.rateMin) add(find('rateBelowLabel', `${path}.rate`, { product: label.name, rate, min: own.rateMin, unit: label.rateUnit }));
      for (const breach of labelBreaches({ products: [{ productId, rate }], carrierLHa: plan.carrierLHa }, new Map([[productId, own ?? label]]))) {
        if (breach.figure === 'rateMax') add(find('rateAboveLabel', `${path}.rate`, { product: label.name, rate, max: breach.allowed, unit: label.rateUnit }));
        else if (breach.figure === 'carrierMinLHa') add(find('carrierBelowLabel', 'carrierLHa', { product: label.name, carrierLHa: plan.carrierLHa, minLHa: breach.allowed }));
        else add(find('carrierAboveLabel', 'carrierLHa', { product: label.name, carrierLHa: plan.carrierLHa, maxLHa: breach.allowed }));
      }
    }
  }
  return findings;
}

/** Words that forbid every adjuvant. */
const all = /\b(any|all|adjuvants?|surfactants?)\b/i;
const mentions = (text: string, word: string): boolean => word.trim() !== '' && text.toLowerCase().includes(word.trim().toLowerCase());

/** Adjuvant wanted or forbidden. Free text is compared by name and kind; what cannot be told is asked. */
export function checkAdjuvants(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  return labelsOf(plan, facts).flatMap(({ path, label }): Finding[] => {
    const findings: Finding[] = [];
    if (label.adjuvantWanted !== '' && plan.adjuvants.length === 0) findings.push(find('adjuvantWanted', path, { product: label.name, wanted: label.adjuvantWanted }));
    if (label.adjuvantForbidden === '' || plan.adjuvants.length === 0) return findings;
    const forbidden = label.adjuvantForbidden;
    const named = plan.adjuvants.find(({ name, kind }) => mentions(forbidden, name) || mentions(forbidden, kind)) ?? (all.test(forbidden) && !/\b(except|other than|unless)\b/i.test(forbidden) ? plan.adjuvants[0] : undefined);
    findings.push(named ? find('adjuvantForbidden', path, { product: label.name, forbidden, adjuvant: named.name }) : find('adjuvantMayBeForbidden', path, { product: label.name, forbidden }));
    return findings;
  });
}
