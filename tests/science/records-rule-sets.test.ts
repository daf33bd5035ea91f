/**
 * Elements of each rule set, one by one, as listed in: 7 CFR 110.3 (2006 copy; rescinded by FR Doc. 2025-08220 from 11 July 2025);
 * 40 CFR 170.311 (partly from memory); 40 CFR 171.303(b)(7) by a compliance summary; Washington (RCW 17.21.100, WAC 16-228-1320;
 * list partly from memory); 4 TAC 7.33; Regulation (EC) 1107/2009 Art. 67 with Implementing Regulation (EU) 2023/564.
 */
import { describe, expect, it } from 'vitest';
import { bibliography } from '../../shared/bibliography.ts';
import type { ApplicationRecord } from '../../shared/records/application-record.ts';
import { completeness, keptUntil, madeBy } from '../../shared/records/completeness.ts';
import { recordRuleSet, recordRuleSets, type RecordItem, type RecordRuleSetId } from '../../shared/rules/record-rules.ts';

const at = '2026-05-12T13:00:00.000Z';
const full: ApplicationRecord = {
  date: '2026-05-12',
  startedAt: '2026-05-12T12:40:00.000Z',
  stoppedAt: '2026-05-12T13:20:00.000Z',
  timeZone: 'America/Los_Angeles',
  location: 'Example County, block North',
  position: { longitude: -123, latitude: 45 },
  hasMap: true,
  areaHa: 0.8,
  crop: 'Noble fir',
  cropEppoCode: 'ABIPR',
  bbch: 9,
  target: 'balsam twig aphid',
  products: [{ name: 'Example One', registrationNumber: '1234-567', activeIngredients: 'exampline', restrictedUse: false, amount: 6, amountUnit: 'flOz', rate: 3, rateUnit: 'flOzPerAcre', reiHours: 12, lot: '' }],
  sprayVolumeL: 90,
  equipment: 'backpack mist blower',
  applicator: { name: 'Ada Fern', licenceNumber: 'A-1' },
  uncertifiedApplicator: 'Bo Reed',
  customer: { name: 'Cy Moss', address: '1 Lane' },
  permitNumber: 'P-1',
  windMs: { value: 1.5, origin: 'reading', at },
  windFromDeg: { value: 270, origin: 'reading', at },
  temperatureC: { value: 9, origin: 'observation', at },
  hasSafetyDataSheets: true,
};

/** The record without one item, by taking out the one field that carries it. */
const without: Record<RecordItem, (record: ApplicationRecord) => ApplicationRecord> = {
  productName: (r) => ({ ...r, products: r.products.map((p) => ({ ...p, name: ' ' })) }),
  registrationNumber: (r) => ({ ...r, products: r.products.map((p) => ({ ...p, registrationNumber: '' })) }),
  activeIngredients: (r) => ({ ...r, products: r.products.map((p) => ({ ...p, activeIngredients: '' })) }),
  amount: (r) => ({ ...r, products: r.products.map((p) => ({ ...p, amount: null })) }),
  rate: (r) => ({ ...r, products: r.products.map((p) => ({ ...p, rate: null })) }),
  concentration: (r) => ({ ...r, sprayVolumeL: null }),
  sprayVolume: (r) => ({ ...r, sprayVolumeL: null }),
  location: (r) => ({ ...r, location: '' }),
  geodata: (r) => ({ ...r, position: null }),
  map: (r) => ({ ...r, hasMap: false }),
  area: (r) => ({ ...r, areaHa: null }),
  crop: (r) => ({ ...r, crop: '' }),
  eppoCode: (r) => ({ ...r, cropEppoCode: '' }),
  bbch: (r) => ({ ...r, bbch: null }),
  target: (r) => ({ ...r, target: '' }),
  date: (r) => ({ ...r, date: null }),
  startTime: (r) => ({ ...r, startedAt: null }),
  stopTime: (r) => ({ ...r, stoppedAt: null }),
  applicatorName: (r) => ({ ...r, applicator: { ...r.applicator, name: '' } }),
  licenceNumber: (r) => ({ ...r, applicator: { ...r.applicator, licenceNumber: '' } }),
  uncertifiedApplicator: (r) => ({ ...r, uncertifiedApplicator: '' }),
  customer: (r) => ({ ...r, customer: null }),
  permitNumber: (r) => ({ ...r, permitNumber: '' }),
  windDirection: (r) => ({ ...r, windFromDeg: null }),
  windSpeed: (r) => ({ ...r, windMs: null }),
  temperature: (r) => ({ ...r, temperatureC: null }),
  equipment: (r) => ({ ...r, equipment: '' }),
  restrictedEntryInterval: (r) => ({ ...r, products: r.products.map((p) => ({ ...p, reiHours: null })) }),
  safetyDataSheet: (r) => ({ ...r, hasSafetyDataSheets: false }),
};

/** What the sources list, written out here a second time so that a slip in the tables shows. */
const asked: Record<RecordRuleSetId, { always: RecordItem[]; whereRelevant?: RecordItem[] }> = {
  'us-former-7cfr110': { always: ['productName', 'registrationNumber', 'amount', 'location', 'area', 'crop', 'date', 'applicatorName', 'licenceNumber'] },
  'us-40cfr170-311': { always: ['productName', 'registrationNumber', 'activeIngredients', 'crop', 'location', 'date', 'startTime', 'stopTime', 'restrictedEntryInterval', 'safetyDataSheet'] },
  'us-40cfr171-303': { always: ['customer', 'location', 'area', 'crop', 'startTime', 'date', 'productName', 'registrationNumber', 'amount', 'applicatorName', 'licenceNumber'], whereRelevant: ['uncertifiedApplicator'] },
  'us-wa': { always: ['startTime', 'stopTime', 'windDirection', 'windSpeed', 'temperature', 'productName', 'registrationNumber', 'amount', 'concentration', 'map', 'crop', 'applicatorName', 'date', 'location'], whereRelevant: ['licenceNumber', 'uncertifiedApplicator'] },
  'us-tx': { always: ['date', 'startTime', 'applicatorName', 'location', 'productName', 'registrationNumber', 'rate', 'sprayVolume', 'target', 'crop', 'area', 'windDirection', 'windSpeed', 'temperature', 'equipment', 'licenceNumber'], whereRelevant: ['permitNumber'] },
  'eu-1107-67': { always: ['productName', 'date', 'rate', 'area', 'crop', 'registrationNumber', 'eppoCode', 'geodata'], whereRelevant: ['bbch', 'startTime'] },
};
const sets = Object.entries(asked) as [RecordRuleSetId, (typeof asked)[RecordRuleSetId]][];
const elements = sets.flatMap(([id, { always, whereRelevant = [] }]) => [...always.map((item) => ({ id, item, list: 'missing' as const })), ...whereRelevant.map((item) => ({ id, item, list: 'toConsider' as const }))]);

describe('a record with everything', () => {
  it.each(sets)('has every item of %s, with its date, and is never called sufficient', (id) => {
    const { hasEveryItem, missing, toConsider, statement } = completeness(full, recordRuleSet(id));
    expect({ hasEveryItem, missing, toConsider }).toEqual({ hasEveryItem: true, missing: [], toConsider: [] });
    expect(statement).toMatch(/^Has every item of .+ as of 2026-12-01\./);
    expect(statement).not.toMatch(/legal|sufficient|complian|valid/i);
  });
});

describe('each element of each rule set', () => {
  it.each(elements)('$id: $item is named in "$list" when it is not there', ({ id, item, list }) => {
    const result = completeness(without[item](full), recordRuleSet(id));
    expect(result[list].map((missing) => missing.item)).toContain(item);
    expect(result.hasEveryItem).toBe(result.missing.length === 0);
  });

  it('and no table asks for more than its source', () => {
    for (const [id, { always, whereRelevant = [] }] of sets) expect(Object.keys(recordRuleSet(id).items).toSorted()).toEqual([...always, ...whereRelevant].toSorted());
    expect(recordRuleSets.map(({ id }) => id).toSorted()).toEqual(Object.keys(asked).toSorted());
  });

  it('is named with the product it is missing of', () => {
    const two = { ...full, products: [full.products[0]!, { ...full.products[0]!, name: 'Example Two', registrationNumber: '' }] };
    expect(completeness(two, recordRuleSet('us-tx')).statement).toBe('Lacks 1 item of Texas’s application record (4 TAC 7.33) as of 2026-12-01: registration number of Example Two.');
  });

  it('says that the former federal rule was rescinded from 11 July 2025 (FR Doc. 2025-08220)', () => {
    expect(completeness(full, recordRuleSet('us-former-7cfr110')).statement).toMatch(/rescinded from 2025-07-11\.$/);
    expect(recordRuleSets.filter(({ rescindedFrom }) => rescindedFrom !== null).map(({ id }) => id)).toEqual(['us-former-7cfr110']);
  });

  it('wants the map in Washington above one acre only', () => {
    const small = { ...full, hasMap: false, areaHa: 0.4 };
    expect(completeness(small, recordRuleSet('us-wa')).hasEveryItem).toBe(true);
    expect(completeness({ ...small, areaHa: 0.41 }, recordRuleSet('us-wa')).missing.map(({ item }) => item)).toEqual(['map']);
  });

  it('stands in tables whose sources are in the bibliography', () => {
    for (const { cites } of recordRuleSets) for (const key of cites) expect(Object.keys(bibliography)).toContain(key);
  });
});

describe('time limits', () => {
  it('are the same local day in Washington, 14 days in the former federal rule, 24 hours for display', () => {
    expect(madeBy(full, recordRuleSet('us-wa'))).toBe('2026-05-13T07:00:00.000Z');
    expect(madeBy(full, recordRuleSet('us-former-7cfr110'))).toBe('2026-05-27T07:00:00.000Z');
    expect(madeBy(full, recordRuleSet('us-40cfr170-311'))).toBe('2026-05-13T13:20:00.000Z');
    expect(madeBy(full, recordRuleSet('us-tx'))).toBeNull();
  });

  it('follow the clock change of the farm', () => {
    expect(madeBy({ ...full, date: '2026-10-31' }, recordRuleSet('us-wa'))).toBe('2026-11-01T07:00:00.000Z');
    expect(madeBy({ ...full, date: '2026-11-01' }, recordRuleSet('us-wa'))).toBe('2026-11-02T08:00:00.000Z');
  });
});

describe('retention', () => {
  it('is 2, 7 and 3 years by rule set, from the application or the end of re-entry', () => {
    const years = Object.fromEntries(recordRuleSets.map(({ id, kept }) => [id, `${kept.years} from ${kept.from}`]));
    expect(years).toEqual({ 'us-former-7cfr110': '2 from application', 'us-40cfr170-311': '2 from reentry', 'us-40cfr171-303': '2 from application', 'us-wa': '7 from application', 'us-tx': '2 from application', 'eu-1107-67': '3 from application' });
  });

  it('is seven years here whatever the set, and longer where one asks for it', () => {
    expect(keptUntil('2026-05-12', null, [])).toBe('2033-05-12');
    expect(keptUntil('2026-05-12', '2026-05-13', [recordRuleSet('us-40cfr170-311')])).toBe('2033-05-12');
    expect(keptUntil('2026-05-12', '2026-05-13', [{ ...recordRuleSet('us-40cfr170-311'), kept: { years: 8, from: 'reentry' } }])).toBe('2034-05-13');
  });
});
