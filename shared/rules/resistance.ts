import { daysBetween } from './calendar.ts';
import type { Finding, FindingMaker } from './findings.ts';
import { areRelated, moaGroupsOf } from './moa-groups.ts';

/** One application, past or planned, as far as rotation goes. */
export interface GroupUse {
  blockId: string;
  date: string;
  target: string;
  productName: string;
  moaSystem: string;
  moaGroup: string;
}

/**
 * How to tell the generations of a target. `starts`: first days known from scouting. `days`: length of a generation, with how many
 * there are in a year, counted from `from` (`MM-DD`); the last lasts until the next year's first.
 */
export type Generations = { kind: 'starts'; starts: readonly string[] } | { kind: 'days'; days: number; perYear: number; from: string };

/** About 30 days when the generation is not known [iracMoa, from memory]: as many in a year as fit. */
export const usualGenerations: Generations = { kind: 'days', days: 30, perYear: 12, from: '01-01' };

/**
 * Ordinal of the generation that a date falls in; consecutive generations have consecutive ordinals.
 * @throws RangeError when the length or the number of generations is not above 0
 */
export function generationOf(date: string, generations: Generations): number {
  if (generations.kind === 'starts') return generations.starts.filter((start) => start <= date).length;
  const { days, perYear, from } = generations;
  if (!(days > 0) || !(perYear >= 1)) throw new RangeError(`days and perYear must be more than 0, not ${days} and ${perYear}.`);
  const year = Number(date.slice(0, 4)) - (date.slice(5) < from ? 1 : 0);
  return year * perYear + Math.min(perYear - 1, Math.floor(daysBetween(`${String(year).padStart(4, '0')}-${from}`, date) / days));
}

const sameTarget = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase();

/** Uses on the block and target of a planned application in the generation before its own, the most recent first. */
export function usesOfGenerationBefore(planned: Pick<GroupUse, 'blockId' | 'target' | 'date'>, earlier: readonly GroupUse[], generations: Generations): GroupUse[] {
  const generation = generationOf(planned.date, generations);
  return earlier
    .filter((use) => use.blockId === planned.blockId && sameTarget(use.target, planned.target) && use.date <= planned.date && generationOf(use.date, generations) === generation - 1)
    .toSorted((a, b) => (a.date < b.date ? 1 : a.date > b.date ? -1 : 0));
}

/**
 * What rotation says of one planned application on one block: the group of the generation before may not come again; several uses
 * within one generation may [iracMoa]. Groups are compared by number within their system; codes without a number tell nothing.
 * @param earlier applications on any block and target, any order
 */
export function checkRotation(planned: GroupUse & { block: string; path: string }, earlier: readonly GroupUse[], generations: Generations, find: FindingMaker): Finding[] {
  if (planned.moaSystem === 'none') return [];
  const groups = moaGroupsOf(planned.moaSystem, planned.moaGroup);
  const findings: Finding[] = [];
  if (groups.length === 0) findings.push(find('groupUnknown', planned.path, { product: planned.productName, group: '' }));
  const before = usesOfGenerationBefore(planned, earlier, generations);
  for (const { code, rotates } of groups) {
    if (rotates === null) {
      findings.push(find('groupUnknown', planned.path, { product: planned.productName, group: code }));
      continue;
    }
    const same = before.find((use) => moaGroupsOf(use.moaSystem, use.moaGroup).some((group) => group.rotates === rotates));
    if (same) findings.push(find('sameGroupNextGeneration', planned.path, { block: planned.block, group: rotates, products: planned.productName, lastProducts: same.productName, lastDate: same.date }));
    for (const use of before) {
      const kin = moaGroupsOf(use.moaSystem, use.moaGroup).find((group) => group.rotates !== null && areRelated(group.rotates, rotates));
      if (kin) findings.push(find('relatedGroup', planned.path, { block: planned.block, group: rotates, other: kin.rotates!, lastDate: use.date }));
    }
  }
  return findings;
}

/** A full-season what-if: each planned application judged against all past and planned ones before it. */
export function checkSeasonRotation(planned: readonly (GroupUse & { block: string; path: string })[], past: readonly GroupUse[], generations: Generations, find: FindingMaker): Finding[] {
  const inOrder = planned.toSorted((a, b) => (a.date < b.date ? -1 : a.date > b.date ? 1 : 0));
  return inOrder.flatMap((use, index) => checkRotation(use, [...past, ...inOrder.slice(0, index)], generations, find));
}

export interface GroupCount {
  /** `IRAC 4`, or the code itself where it has no number. */
  group: string;
  /** Applications by calendar year. */
  byYear: Record<string, number>;
  lastDate: string;
}

/** Groups used on a block against a target, over seasons; the most recent first. A premix counts in each of its groups. */
export function groupsUsed(uses: readonly GroupUse[], blockId: string, target: string): GroupCount[] {
  const counts = new Map<string, GroupCount>();
  for (const use of uses) {
    if (use.blockId !== blockId || !sameTarget(use.target, target)) continue;
    for (const group of new Set(moaGroupsOf(use.moaSystem, use.moaGroup).map(({ rotates, system, code }) => rotates ?? `${system} ${code}`))) {
      const count = counts.get(group) ?? { group, byYear: {}, lastDate: '' };
      const year = use.date.slice(0, 4);
      count.byYear[year] = (count.byYear[year] ?? 0) + 1;
      count.lastDate = use.date > count.lastDate ? use.date : count.lastDate;
      counts.set(group, count);
    }
  }
  return [...counts.values()].toSorted((a, b) => (a.lastDate < b.lastDate ? 1 : a.lastDate > b.lastDate ? -1 : a.group < b.group ? -1 : 1));
}

/** Products on the shelf whose groups all differ from the given ones; unknown groups are left out. @param used as `rotates`, such as `IRAC 4` */
export function otherGroupsOnShelf<T extends { moaSystem: string; moaGroup: string }>(shelf: readonly T[], used: readonly string[]): T[] {
  return shelf.filter(({ moaSystem, moaGroup }) => {
    const groups = moaGroupsOf(moaSystem, moaGroup);
    return groups.length > 0 && groups.every(({ rotates }) => rotates !== null && !used.includes(rotates));
  });
}
