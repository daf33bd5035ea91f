import { exactly, sumOf, type Exact } from '../tank/exact.ts';
import { amountOnArea, convert, rateOnArea, rateParts, substanceOf } from '../tank/measures.ts';
import type { RateUnit } from '../api/plans.ts';
import { addDays } from './calendar.ts';
import type { Finding, FindingMaker } from './findings.ts';
import { blocksOf, labelsOf, type PastApplication, type PlanFacts, type PlanForRules } from './plan-facts.ts';

/** A rate in another unit; null between liquid and solid. */
function inUnit({ rate, rateUnit }: Pick<PastApplication, 'rate' | 'rateUnit'>, unit: RateUnit): Exact | null {
  const [from, to] = [rateParts(rateUnit), rateParts(unit)];
  if (substanceOf(from.amount) !== substanceOf(to.amount)) return null;
  if (rateUnit === unit) return exactly(rate);
  const hectare = exactly(1);
  return rateOnArea(convert(amountOnArea(exactly(rate), rateUnit, hectare), from.amount, to.amount), unit, hectare);
}

/** Applications and amount of each product on each block this season, and the interval since the last. */
export function checkSeason(plan: PlanForRules, facts: PlanFacts, find: FindingMaker): Finding[] {
  return blocksOf(plan, facts).flatMap(({ blockId, block }) =>
    labelsOf(plan, facts).flatMap(({ productId, rate, path, label }): Finding[] => {
      const findings: Finding[] = [];
      const names = { product: label.name, block: block.name };
      const past = facts.history.filter((application) => application.blockId === blockId && application.productId === productId);
      const season = past.filter(({ date }) => date >= facts.season.from && date <= facts.season.to);

      const max = label.maxApplicationsPerSeason;
      if (max !== null && season.length >= max) findings.push(find('applicationsReached', path, { ...names, done: season.length, max }));
      else if (max !== null && season.length === max - 1) findings.push(find('lastApplication', path, { ...names, max }));

      if (label.maxRatePerSeason !== null) {
        const known = season.map((application) => ({ application, rate: inUnit(application, label.rateUnit) }));
        for (const { application, rate: value } of known) if (value === null) findings.push(find('seasonAmountUnknown', path, { ...names, date: application.date }));
        const soFar = sumOf(known.flatMap(({ rate: value }) => (value === null ? [] : [value])));
        // A thousandth of a per cent of slack for rates that were converted.
        if (soFar.add(exactly(rate)).compare(exactly(label.maxRatePerSeason).mul(100_001n).div(100_000n)) > 0) findings.push(find('seasonAmountPassed', `${path}.rate`, { ...names, soFar: soFar.valueOf(), rate, max: label.maxRatePerSeason, unit: label.rateUnit }));
      }

      const before = past.map(({ date }) => date).filter((date) => date <= plan.lastDate).toSorted().at(-1);
      if (label.minIntervalDays !== null && before !== undefined) {
        const earliest = addDays(before, label.minIntervalDays);
        // Some of the plan's dates may still do.
        if (earliest > plan.firstDate) findings.push(find('intervalTooShort', 'firstDate', { ...names, lastDate: before, days: label.minIntervalDays, earliest }, { level: earliest > plan.lastDate ? 'stop' : 'warn' }));
      }
      return findings;
    }),
  );
}
