import type { UnitSystem } from '../units/units.ts';
import { checkAdjuvants, checkRates } from './check-label.ts';
import { checkLicence, checkShelf } from './check-papers.ts';
import { checkHarvest, checkReentry } from './check-people.ts';
import { checkBloom, checkPlaces } from './check-place.ts';
import { checkSeason } from './check-season.ts';
import { findingMaker, worstFirst, type Finding } from './findings.ts';
import { moaGroupsOf } from './moa-groups.ts';
import { blocksOf, labelsOf, type LabelEntries, type PlanFacts, type PlanForRules } from './plan-facts.ts';
import { checkRotation, otherGroupsOnShelf, usesOfGenerationBefore, usualGenerations, type Generations } from './resistance.ts';

export interface FindingOptions {
  units: UnitSystem;
  /** How the target's generations are told; left out: about 30 days each. */
  generations?: Generations;
  /** Products on the shelf for this target, to name other groups from. */
  shelf?: readonly Pick<LabelEntries, 'name' | 'moaSystem' | 'moaGroup'>[];
}

/**
 * All that the rules have to say of a plan, worst first: against its labels as entered, the season so far, people, places, papers, and
 * rotation. No finding is no permission: the label in hand is the law, local rules come on top.
 * @throws RangeError for a date or a figure that is none
 */
export function planFindings(plan: PlanForRules, facts: PlanFacts, { units, generations = usualGenerations, shelf = [] }: FindingOptions): Finding[] {
  const find = findingMaker(units);
  const rotation = blocksOf(plan, facts).flatMap(({ blockId, block }) =>
    labelsOf(plan, facts).flatMap(({ path, label }) => checkRotation({ blockId, block: block.name, path, date: plan.firstDate, target: plan.target, productName: label.name, moaSystem: label.moaSystem, moaGroup: label.moaGroup }, facts.history, generations, find)),
  );
  const kept = [
    ...labelsOf(plan, facts).map(({ label }) => label),
    ...plan.blockIds.flatMap((blockId) => usesOfGenerationBefore({ blockId, target: plan.target, date: plan.firstDate }, facts.history, generations)),
  ];
  const used = kept.flatMap(({ moaSystem, moaGroup }) => moaGroupsOf(moaSystem, moaGroup).flatMap(({ rotates }) => rotates ?? []));
  const others = otherGroupsOnShelf(shelf, used);
  const unique = new Map(rotation.map((finding) => [`${finding.path} ${finding.text}`, finding]));
  const repeats = rotation.some(({ key }) => key === 'sameGroupNextGeneration');
  return worstFirst([
    ...checkRates(plan, facts, find),
    ...checkAdjuvants(plan, facts, find),
    ...checkSeason(plan, facts, find),
    ...checkHarvest(plan, facts, find),
    ...checkReentry(plan, facts, find),
    ...checkBloom(plan, facts, find),
    ...checkPlaces(plan, facts, find),
    ...checkLicence(plan, facts, find),
    ...checkShelf(plan, facts, find),
    ...unique.values(),
    ...(repeats && others.length > 0 ? [find('otherGroups', 'products', { products: others.map(({ name, moaSystem, moaGroup }) => `${name} (${moaSystem} ${moaGroup})`).join(', ') })] : []),
  ]);
}
