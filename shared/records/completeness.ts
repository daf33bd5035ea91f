import { addDays, addYears } from '../rules/calendar.ts';
import type { RecordItem, RecordRuleSet, Requirement } from '../rules/record-rules.ts';
import { localDateOf, localInstantMs } from '../units/time-zone.ts';
import { hectaresPerAcre } from '../units/units.ts';
import type { ApplicationRecord } from './application-record.ts';
import { itemTable } from './record-items.ts';

export interface MissingItem {
  item: RecordItem;
  /** The product it is missing of; null: of the whole record. */
  product: string | null;
  /** Such as "registration number of Example One". */
  text: string;
}

export interface Completeness {
  ruleSetId: string;
  asOf: string;
  hasEveryItem: boolean;
  missing: MissingItem[];
  /** Asked where relevant, and not filled in: only a person can tell. */
  toConsider: MissingItem[];
  /** Never says that a record is sufficient in law. */
  statement: string;
}

const isAsked = (requirement: Requirement, { areaHa }: ApplicationRecord): boolean => requirement === 'always' || (requirement === 'aboveOneAcre' && areaHa !== null && areaHa > hectaresPerAcre);

function missingOf(item: RecordItem, record: ApplicationRecord): MissingItem[] {
  const { name, missing } = itemTable[item];
  return missing(record).map((product) => ({ item, product: product === '' ? null : product, text: product === '' ? name : `${name} of ${product}` }));
}

/**
 * Holds a record against one rule set's list of items, each missing one named. It says what the list says, not what the law wants:
 * the list has a date, and laws change.
 */
export function completeness(record: ApplicationRecord, ruleSet: RecordRuleSet): Completeness {
  const entries = Object.entries(ruleSet.items) as [RecordItem, Requirement][];
  const missing = entries.filter(([, requirement]) => isAsked(requirement, record)).flatMap(([item]) => missingOf(item, record));
  const toConsider = entries.filter(([, requirement]) => requirement === 'whereRelevant').flatMap(([item]) => missingOf(item, record));
  const of = `of ${ruleSet.name} as of ${ruleSet.asOf}`;
  const rescinded = ruleSet.rescindedFrom === null ? '' : ` The rule was rescinded from ${ruleSet.rescindedFrom}.`;
  const statement = missing.length === 0 ? `Has every item ${of}.${rescinded}` : `Lacks ${missing.length} ${missing.length === 1 ? 'item' : 'items'} ${of}: ${missing.map(({ text }) => text).join(', ')}.${rescinded}`;
  return { ruleSetId: ruleSet.id, asOf: ruleSet.asOf, hasEveryItem: missing.length === 0, missing, toConsider, statement };
}

/** The date of the application: as entered, else the local date of the start. */
export const dateOfRecord = ({ date, startedAt, timeZone }: Pick<ApplicationRecord, 'date' | 'startedAt' | 'timeZone'>): string | null => date ?? (startedAt === null ? null : localDateOf(Date.parse(startedAt), timeZone));

/** Instant (UTC) by which the record must be made; null when the rule set gives no limit, or the record no date yet. */
export function madeBy(record: ApplicationRecord, { madeWithin }: RecordRuleSet): string | null {
  const date = dateOfRecord(record);
  if (madeWithin === null || date === null) return null;
  const endOf = (day: string): string => new Date(localInstantMs(addDays(day, 1), 0, record.timeZone)).toISOString();
  switch (madeWithin.kind) {
    case 'sameDay':
      return endOf(date);
    case 'days':
      return endOf(addDays(date, madeWithin.days));
    case 'hours':
      return record.stoppedAt === null ? null : new Date(Date.parse(record.stoppedAt) + madeWithin.hours * 3_600_000).toISOString();
  }
}

/** What no rule set asks for longer: the strictest of ours, kept for every record. */
export const usualRetentionYears = 7;

/**
 * Local date until which a record is kept: the latest of the rule sets', and of the usual seven years.
 * @param reentryEndsOn local date, for rule sets that count from it; null: counted from the application
 */
export function keptUntil(date: string, reentryEndsOn: string | null, ruleSets: readonly RecordRuleSet[]): string {
  const dates = ruleSets.map(({ kept }) => addYears(kept.from === 'reentry' ? (reentryEndsOn ?? date) : date, kept.years));
  return [addYears(date, usualRetentionYears), ...dates].reduce((a, b) => (a > b ? a : b));
}
