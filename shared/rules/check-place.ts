import type { Finding, FindingMaker } from './findings.ts';
import { blocksOf, labelsOf, type LabelEntries, type NearPlace, type PlanFacts, type PlanForRules } from './plan-facts.ts';

const bloomFindings = { notInBloom: 'bloomForbidden', notWhileForaging: 'bloomWhileForaging', none: 'bloomUnnamed' } as const;

/** Bloom in or near the blocks against each label's bee statement. */
export function checkBloom(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  if (!plan.bloom) return [];
  return labelsOf(plan, facts).map(({ label }) => find(bloomFindings[label.beeStatement], 'bloom', { product: label.name }));
}

/** Nearer than this a place without an entered buffer is mentioned. Common practice, no source. */
export const mentionedWithinM = 100;

const bufferOf = (label: LabelEntries, kind: NearPlace['kind']): number | null => (kind === 'water' ? label.bufferWaterM : kind === 'hives' ? label.bufferHivesM : null) ?? null;

/** Buffers to water and hives as entered from the labels, and people's places inside the exclusion zone [aez2024]. */
export function checkPlaces(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  return blocksOf(plan, facts).flatMap(({ path, block }) =>
    block.places.flatMap((place): Finding[] => {
      const near = { block: block.name, place: place.name, distanceM: place.distanceM };
      if (place.kind !== 'water' && place.kind !== 'hives') return place.distanceM <= facts.exclusionZoneM ? [find('peopleInZone', path, { ...near, zoneM: facts.exclusionZoneM })] : [];
      return labelsOf(plan, facts).flatMap(({ label }): Finding[] => {
        const bufferM = bufferOf(label, place.kind);
        if (bufferM === null) return place.distanceM <= mentionedWithinM ? [find('bufferUnknown', path, { ...near, product: label.name })] : [];
        return place.distanceM < bufferM ? [find('bufferTooNear', path, { ...near, product: label.name, bufferM })] : [];
      });
    }),
  );
}
