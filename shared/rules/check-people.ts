import { addDays, daysBetween } from './calendar.ts';
import type { Finding, FindingMaker } from './findings.ts';
import { blocksOf, labelsOf, type PlanFacts, type PlanForRules } from './plan-facts.ts';

/** Work ends by noon at the latest, local time: the morning of Dawnvane does. */
const workEndsHour = 12;

/** Last date that a restricted-entry interval touches when work may end at noon; a day it ends at midnight sharp is not touched. */
export const reiTouchesUntil = (date: string, reiHours: number): string => addDays(date, Math.max(0, Math.ceil((workEndsHour + reiHours) / 24) - 1));

/** Pre-harvest interval against the sale date. Some of the plan's dates may still do: then it warns. */
export function checkHarvest(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  return blocksOf(plan, facts).flatMap(({ block }) =>
    labelsOf(plan, facts).flatMap(({ path, label }): Finding[] => {
      const { saleDate } = block;
      if (saleDate === null || saleDate < plan.firstDate) return [];
      if (label.phiDays === null) return [find('phiMissing', path, { product: label.name, block: block.name, saleDate })];
      const latest = addDays(saleDate, -label.phiDays);
      if (plan.lastDate <= latest) return [];
      return [find('phiPastSale', 'lastDate', { product: label.name, block: block.name, days: label.phiDays, saleDate, latest }, { level: plan.firstDate > latest ? 'stop' : 'warn' })];
    }),
  );
}

/** The mix's longest restricted-entry interval against people due in the block, on each date that the plan may run. */
export function checkReentry(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  const labels = labelsOf(plan, facts);
  const missing = labels.filter(({ label }) => label.reiHours === null).map(({ path, label }) => find('reiMissing', path, { product: label.name }));
  const longest = labels.reduce<{ hours: number; product: string } | null>((best, { label }) => (label.reiHours !== null && label.reiHours > (best?.hours ?? 0) ? { hours: label.reiHours, product: label.name } : best), null);
  if (longest === null) return missing;
  const dates = Array.from({ length: Math.max(0, daysBetween(plan.firstDate, plan.lastDate)) + 1 }, (_, index) => addDays(plan.firstDate, index));
  const meeting = blocksOf(plan, facts).flatMap(({ path, block }) =>
    block.peopleDue.flatMap(({ who, date: due }): Finding[] => {
      const blocked = dates.filter((date) => due >= date && due <= reiTouchesUntil(date, longest.hours)).length;
      if (blocked === 0) return [];
      return [find('reiMeetsPeople', path, { block: block.name, product: longest.product, hours: longest.hours, who, date: due, blocked, of: dates.length }, { level: blocked === dates.length ? 'stop' : 'warn' })];
    }),
  );
  return [...missing, ...meeting];
}
