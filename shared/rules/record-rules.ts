import type { SourceKey } from '../bibliography.ts';

/** Items of a record that rule sets name. What each means stands in `shared/records/record-items.ts`. */
export const recordItems = [
  'productName',
  'registrationNumber',
  'activeIngredients',
  'amount',
  'rate',
  'concentration',
  'sprayVolume',
  'location',
  'geodata',
  'map',
  'area',
  'crop',
  'eppoCode',
  'bbch',
  'target',
  'date',
  'startTime',
  'stopTime',
  'applicatorName',
  'licenceNumber',
  'uncertifiedApplicator',
  'customer',
  'permitNumber',
  'windDirection',
  'windSpeed',
  'temperature',
  'equipment',
  'restrictedEntryInterval',
  'safetyDataSheet',
] as const;
export type RecordItem = (typeof recordItems)[number];

/**
 * `always`: missing when absent; `whereRelevant`: only a person can tell whether it applies, so it is asked, not missed;
 * `aboveOneAcre`: asked always of a treated area above one acre.
 */
export type Requirement = 'always' | 'whereRelevant' | 'aboveOneAcre';

export interface RecordRuleSet {
  id: string;
  name: string;
  /** Date on which this table was last compared with its sources. */
  asOf: string;
  cites: readonly SourceKey[];
  /** Date from which the rule no longer stands; null: it stands. */
  rescindedFrom: string | null;
  /** When the record must exist: on the day, within some days of it, or hours after the stop. Null: no limit was found. */
  madeWithin: { kind: 'sameDay' } | { kind: 'days'; days: number } | { kind: 'hours'; hours: number } | null;
  /** Kept at least so long, from the application or from the end of re-entry. */
  kept: { years: number; from: 'application' | 'reentry' };
  items: Readonly<Partial<Record<RecordItem, Requirement>>>;
  /** What the table cannot say by itself. */
  note: string;
}

const always = <T extends RecordItem>(...items: T[]): Record<T, 'always'> => Object.fromEntries(items.map((item) => [item, 'always'])) as Record<T, 'always'>;

/** Rules change: every table has its date, and none stands for the current text of the law. */
export const recordRuleSets = [
  {
    id: 'us-former-7cfr110',
    name: 'the former federal rule for restricted-use products, 7 CFR 110',
    asOf: '2026-12-01',
    cites: ['cfr110'],
    rescindedFrom: '2025-07-11',
    madeWithin: { kind: 'days', days: 14 },
    kept: { years: 2, from: 'application' },
    items: always('productName', 'registrationNumber', 'amount', 'location', 'area', 'crop', 'date', 'applicatorName', 'licenceNumber'),
    note: 'Rescinded from 11 July 2025; still the base of many state forms. State, tribal, EPA and label duties continue.',
  },
  {
    id: 'us-40cfr170-311',
    name: 'the application and hazard information of 40 CFR 170.311',
    asOf: '2026-12-01',
    cites: ['cfr170'],
    rescindedFrom: null,
    madeWithin: { kind: 'hours', hours: 24 },
    kept: { years: 2, from: 'reentry' },
    items: always('productName', 'registrationNumber', 'activeIngredients', 'crop', 'location', 'date', 'startTime', 'stopTime', 'restrictedEntryInterval', 'safetyDataSheet'),
    note: 'Where the label has an Agricultural Use box. Displayed before workers enter and for 30 days after re-entry; the owner’s family is partly exempt.',
  },
  {
    id: 'us-40cfr171-303',
    name: 'the records of commercial applicators of 40 CFR 171.303(b)(7)',
    asOf: '2026-12-01',
    cites: ['cfr171'],
    rescindedFrom: null,
    madeWithin: null,
    kept: { years: 2, from: 'application' },
    items: { ...always('customer', 'location', 'area', 'crop', 'startTime', 'date', 'productName', 'registrationNumber', 'amount', 'applicatorName', 'licenceNumber'), uncertifiedApplicator: 'whereRelevant' },
    note: 'Restricted-use products applied for hire; each state’s own plan may ask more.',
  },
  {
    id: 'us-wa',
    name: 'Washington’s application record (RCW 17.21.100, WAC 16-228-1320)',
    asOf: '2026-12-01',
    cites: ['waRecords'],
    rescindedFrom: null,
    madeWithin: { kind: 'sameDay' },
    kept: { years: 7, from: 'application' },
    items: { ...always('date', 'startTime', 'stopTime', 'windDirection', 'windSpeed', 'temperature', 'productName', 'registrationNumber', 'amount', 'concentration', 'crop', 'location', 'applicatorName'), map: 'aboveOneAcre', licenceNumber: 'whereRelevant', uncertifiedApplicator: 'whereRelevant' },
    note: 'All certified applicators, and anyone who treats more than an acre of agricultural land a year. On the state’s form if it asks. Rule text last amended on 31 October 2025; the statute’s list is from memory.',
  },
  {
    id: 'us-tx',
    name: 'Texas’s application record (4 TAC 7.33)',
    asOf: '2026-12-01',
    cites: ['txRecords'],
    rescindedFrom: null,
    madeWithin: null,
    kept: { years: 2, from: 'application' },
    items: {
      ...always('date', 'startTime', 'applicatorName', 'location', 'productName', 'registrationNumber', 'rate', 'sprayVolume', 'target', 'crop', 'area', 'windDirection', 'windSpeed', 'temperature', 'equipment', 'licenceNumber'),
      permitNumber: 'whereRelevant',
    },
    note: 'The permit where one is needed.',
  },
  {
    id: 'eu-1107-67',
    name: 'Art. 67 of Regulation (EC) 1107/2009 with Implementing Regulation (EU) 2023/564',
    asOf: '2026-12-01',
    cites: ['eu1107', 'eu2023564'],
    rescindedFrom: null,
    madeWithin: null,
    kept: { years: 3, from: 'application' },
    items: { ...always('productName', 'registrationNumber', 'date', 'rate', 'area', 'geodata', 'crop', 'eppoCode'), bbch: 'whereRelevant', startTime: 'whereRelevant' },
    note: 'Electronic and machine-readable from 1 January 2026, in some states after a transition until 1 January 2027. The registration number is the authorisation number.',
  },
] as const satisfies readonly RecordRuleSet[];

export type RecordRuleSetId = (typeof recordRuleSets)[number]['id'];
export const recordRuleSet = (id: RecordRuleSetId): RecordRuleSet => recordRuleSets.find((set) => set.id === id)!;
export const isRecordRuleSetId = (text: string): text is RecordRuleSetId => recordRuleSets.some(({ id }) => id === text);
