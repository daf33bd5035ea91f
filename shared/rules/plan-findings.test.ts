import { describe, expect, it } from 'vitest';
import { addDays, addYears, daysBetween } from './calendar.ts';
import { findingMaker, retellFinding, worstFirst } from './findings.ts';
import { planFindings } from './plan-findings.ts';
import type { BlockFacts, LabelEntries, PastApplication, PlanFacts, PlanForRules } from './plan-facts.ts';

const label: LabelEntries = {
  name: 'Example One',
  epaRegistrationNumber: '1234-567',
  moaSystem: 'IRAC',
  moaGroup: '23',
  rateMin: 2,
  rateMax: 4,
  rateUnit: 'flOzPerAcre',
  carrierMinLHa: 90,
  carrierMaxLHa: 400,
  adjuvantWanted: '',
  adjuvantForbidden: '',
  beeStatement: 'none',
  reiHours: 12,
  phiDays: 30,
  maxApplicationsPerSeason: 3,
  maxRatePerSeason: 10,
  minIntervalDays: 14,
  restrictedUse: false,
  isExample: false,
  hasLabelFile: true,
  stock: { amount: 64, unit: 'flOz' },
};
const block: BlockFacts = { name: 'North', crop: 'Noble fir', areaHa: 0.8, saleDate: null, peopleDue: [], places: [] };
const plan: PlanForRules = { products: [{ productId: 'one', rate: 3 }], carrierLHa: 112, blockIds: ['n'], firstDate: '2026-06-10', lastDate: '2026-06-14', bloom: false, target: 'twig aphid', adjuvants: [] };
const past = (date: string, own: Partial<PastApplication> = {}): PastApplication => ({ blockId: 'n', productId: 'one', productName: 'Example One', date, rate: 3, rateUnit: 'flOzPerAcre', target: 'other', moaSystem: 'IRAC', moaGroup: '23', ...own });

function findingsOf({ plan: ownPlan = {}, label: ownLabel = {}, block: ownBlock = {}, facts = {} }: { plan?: Partial<PlanForRules>; label?: Partial<LabelEntries>; block?: Partial<BlockFacts>; facts?: Partial<PlanFacts> } = {}) {
  return planFindings(
    { ...plan, ...ownPlan },
    {
      labels: new Map([['one', { ...label, ...ownLabel }]]),
      blocks: new Map([['n', { ...block, ...ownBlock }]]),
      history: [],
      season: { from: '2026-01-01', to: '2026-12-31' },
      applicator: { name: 'Ada Fern', licenceNumber: '', licenceExpires: null },
      exclusionZoneM: 30.48,
      ...facts,
    },
    { units: 'us' },
  );
}
const keysOf = (...own: Parameters<typeof findingsOf>) => findingsOf(...own).map(({ level, key }) => `${level} ${key}`);

describe('a plan that keeps to what was entered', () => {
  it('has no findings', () => {
    expect(findingsOf()).toEqual([]);
  });
});

describe('the label', () => {
  it('stops a rate above the highest, and notes one below the lowest', () => {
    const [finding] = findingsOf({ plan: { products: [{ productId: 'one', rate: 5 }] } });
    expect(finding).toEqual({
      key: 'rateAboveLabel',
      level: 'stop',
      source: 'label',
      path: 'products.0.rate',
      cite: null,
      params: { product: 'Example One', rate: 5, max: 4, unit: 'flOzPerAcre' },
      text: 'The rate of Example One, 5 fl oz/acre, is above the highest entered from its label, 4 fl oz/acre: lower it.',
    });
    expect(keysOf({ plan: { products: [{ productId: 'one', rate: 1 }] } })).toEqual(['note rateBelowLabel']);
  });

  it('has a range of its own for a crop and target where one was entered', () => {
    const uses = [
      { crop: 'noble fir', target: '', rateMin: 1, rateMax: 2 },
      { crop: 'Noble fir', target: 'Spider mite', rateMin: 2, rateMax: 3 },
    ];
    expect(keysOf({ label: { uses } })).toEqual(['stop rateAboveLabel']);
    expect(keysOf({ label: { uses }, plan: { target: 'spider mite' } })).toEqual([]);
    expect(keysOf({ label: { uses: [{ ...uses[0]!, crop: 'Apple' }] } })).toEqual(['warn useNotEntered']);
  });

  it('says each of two blocks’ equal findings once', () => {
    expect(keysOf({ plan: { blockIds: ['n', 'm'], carrierLHa: 50 }, facts: { blocks: new Map([['n', block], ['m', { ...block, name: 'South' }]]) } })).toEqual(['stop carrierBelowLabel']);
  });

  it('keeps the carrier volume, and tells it in the reader’s units', () => {
    const [finding] = findingsOf({ plan: { carrierLHa: 500 } });
    expect(finding!.text).toContain('53.45 gal/acre');
    expect(retellFinding(finding!, 'metric')).toContain('500 L/ha, is above the highest entered from the label of Example One, 400 L/ha');
  });

  it('wants or forbids an adjuvant', () => {
    const adjuvants = [{ name: 'Spreadwell', kind: 'crop oil' }];
    expect(keysOf({ label: { adjuvantWanted: 'non-ionic surfactant' } })).toEqual(['warn adjuvantWanted']);
    expect(keysOf({ label: { adjuvantWanted: 'non-ionic surfactant' }, plan: { adjuvants } })).toEqual([]);
    expect(keysOf({ label: { adjuvantForbidden: 'Crop oil concentrates' }, plan: { adjuvants } })).toEqual(['stop adjuvantForbidden']);
    expect(keysOf({ label: { adjuvantForbidden: 'any adjuvant' }, plan: { adjuvants } })).toEqual(['stop adjuvantForbidden']);
    expect(keysOf({ label: { adjuvantForbidden: 'silicones' }, plan: { adjuvants } })).toEqual(['warn adjuvantMayBeForbidden']);
    expect(keysOf({ label: { adjuvantForbidden: 'silicones' } })).toEqual([]);
  });

  it('speaks of bloom by its bee statement', () => {
    expect(keysOf({ plan: { bloom: true }, label: { beeStatement: 'notInBloom' } })).toEqual(['stop bloomForbidden']);
    expect(keysOf({ plan: { bloom: true }, label: { beeStatement: 'notWhileForaging' } })).toEqual(['note bloomWhileForaging']);
    expect(keysOf({ plan: { bloom: true } })).toEqual(['warn bloomUnnamed']);
  });
});

describe('the season so far', () => {
  it('counts applications on the block up to the most', () => {
    expect(keysOf({ facts: { history: ['2026-03-01', '2026-04-01'].map((date) => past(date, { rate: 1 })) } })).toEqual(['note lastApplication']);
    expect(keysOf({ facts: { history: ['2026-03-01', '2026-04-01', '2026-05-01'].map((date) => past(date, { rate: 1 })) } })).toEqual(['stop applicationsReached']);
    expect(keysOf({ facts: { history: ['2025-03-01', '2025-04-01', '2025-05-01'].map((date) => past(date)) } })).toEqual([]);
    expect(keysOf({ facts: { history: ['2026-03-01', '2026-04-01', '2026-05-01'].map((date) => past(date, { blockId: 'm' })) } })).toEqual([]);
  });

  it('adds up amounts exactly: 0.1 and 0.2 of at most 0.3 is allowed', () => {
    const small = { label: { rateMin: 0.1, rateMax: 1, maxRatePerSeason: 0.3 }, plan: { products: [{ productId: 'one', rate: 0.2 }] } };
    expect(keysOf({ ...small, facts: { history: [past('2026-03-01', { rate: 0.1 })] } })).toEqual([]);
    expect(keysOf({ ...small, facts: { history: [past('2026-03-01', { rate: 0.11 })] } })).toEqual(['stop seasonAmountPassed']);
  });

  it('adds up amounts recorded in another unit, and says so where it cannot', () => {
    // 4 fl oz/acre are 292.31 mL/ha (1 fl oz/acre = 73.07778 mL/ha).
    const history = [past('2026-03-01', { rate: 292.31112, rateUnit: 'mLPerHa' }), past('2026-04-01', { rate: 4 })];
    const [finding] = findingsOf({ facts: { history } }).filter(({ key }) => key === 'seasonAmountPassed');
    expect((finding as { params: { soFar: number } }).params.soFar).toBeCloseTo(8, 5);
    expect(keysOf({ facts: { history: [past('2026-03-01', { rateUnit: 'gPerHa' })] } })).toEqual(['warn seasonAmountUnknown']);
  });

  it('keeps the days between applications, and warns where later dates of the plan will do', () => {
    expect(keysOf({ facts: { history: [past('2026-06-05')] } })).toEqual(['stop intervalTooShort']);
    const [finding] = findingsOf({ facts: { history: [past('2026-05-29')] } });
    expect(finding).toMatchObject({ level: 'warn', params: { earliest: '2026-06-12' } });
    expect(keysOf({ facts: { history: [past('2026-05-27')] } })).toEqual([]);
  });
});

describe('people', () => {
  it('buy no tree before its pre-harvest interval is over', () => {
    expect(keysOf({ block: { saleDate: '2026-07-05' } })).toEqual(['stop phiPastSale']);
    expect(findingsOf({ block: { saleDate: '2026-07-12' } })).toMatchObject([{ level: 'warn', params: { latest: '2026-06-12' } }]);
    expect(keysOf({ block: { saleDate: '2026-07-14' } })).toEqual([]);
    expect(keysOf({ block: { saleDate: '2026-11-20' }, label: { phiDays: null } })).toEqual(['warn phiMissing']);
    expect(keysOf({ block: { saleDate: '2025-11-20' } })).toEqual([]);
  });

  it('due in the block meet the re-entry interval on the days it touches', () => {
    const due = (date: string) => ({ block: { peopleDue: [{ who: 'Choose-and-cut visitors', date }] } });
    expect(findingsOf(due('2026-06-12'))).toMatchObject([{ key: 'reiMeetsPeople', level: 'warn', params: { blocked: 1, of: 5 } }]);
    expect(keysOf(due('2026-06-16'))).toEqual([]);
    expect(findingsOf({ ...due('2026-06-12'), label: { reiHours: 48 } })).toMatchObject([{ params: { blocked: 3 } }]);
    expect(keysOf({ ...due('2026-06-14'), label: { reiHours: 14 * 24 } })).toEqual(['stop reiMeetsPeople']);
    expect(keysOf({ label: { reiHours: null } })).toEqual(['warn reiMissing']);
  });
});

describe('places', () => {
  it('by the water and hives keep the buffers entered from the label', () => {
    const creek = { name: 'Creek', kind: 'water', distanceM: 20 } as const;
    expect(keysOf({ block: { places: [creek] }, label: { bufferWaterM: 25 } })).toEqual(['stop bufferTooNear']);
    expect(keysOf({ block: { places: [creek] }, label: { bufferWaterM: 20 } })).toEqual([]);
    expect(keysOf({ block: { places: [creek] } })).toEqual(['note bufferUnknown']);
    expect(keysOf({ block: { places: [{ ...creek, kind: 'hives', distanceM: 500 }] } })).toEqual([]);
  });

  it('of people inside 100 ft are told with the rule', () => {
    const [finding] = findingsOf({ block: { places: [{ name: 'Neighbour', kind: 'house', distanceM: 25 }] } });
    expect(finding).toMatchObject({ key: 'peopleInZone', level: 'warn', source: 'law', cite: 'aez2024' });
    expect(finding!.text).toContain('inside the 100 ft application exclusion zone');
  });
});

describe('papers and shelf', () => {
  const licence = (licenceExpires: string | null) => ({ label: { restrictedUse: true }, facts: { applicator: { name: 'Ada Fern', licenceNumber: 'A-1', licenceExpires } } });
  it('want a valid licence for a restricted-use product only', () => {
    expect(keysOf({ label: { restrictedUse: true } })).toEqual(['stop licenceMissing']);
    expect(keysOf(licence('2026-06-01'))).toEqual(['stop licenceExpires']);
    expect(keysOf(licence('2026-06-12'))).toEqual(['warn licenceExpires']);
    expect(keysOf(licence('2026-06-14'))).toEqual([]);
  });

  it('want stock, label file, registration number, and no invented example', () => {
    expect(findingsOf({ label: { stock: { amount: 5, unit: 'flOz' } } })).toMatchObject([{ key: 'stockShort', params: { need: 5.93053, have: 5, unit: 'fl oz' } }]);
    expect(keysOf({ label: { stock: { amount: 200, unit: 'mL' } } })).toEqual([]);
    expect(keysOf({ label: { stock: null, hasLabelFile: false, epaRegistrationNumber: '', isExample: true } })).toEqual(['warn exampleProduct', 'note labelFileMissing', 'note registrationMissing']);
  });
});

describe('rotation', () => {
  it('warns of the same group one generation later, and names other groups on the shelf', () => {
    const facts = { history: [past('2026-05-20', { productId: 'two', productName: 'Example Two', target: 'twig aphid' })] };
    expect(keysOf({ facts })).toEqual(['warn sameGroupNextGeneration']);
    const findings = planFindings(
      plan,
      { labels: new Map([['one', label]]), blocks: new Map([['n', block]]), season: { from: '2026-01-01', to: '2026-12-31' }, applicator: { name: 'Ada Fern', licenceNumber: '', licenceExpires: null }, exclusionZoneM: 30.48, ...facts },
      { units: 'us', shelf: [label, { name: 'Example Three', moaSystem: 'IRAC', moaGroup: '4A' }] },
    );
    expect(findings.at(-1)!.text).toBe('Other groups on the shelf: Example Three (IRAC 4A).');
  });
});

describe('findings', () => {
  it('come worst first, of one level in the order found', () => {
    const find = findingMaker('us');
    const made = [find('labelFileMissing', 'a', { product: 'x' }), find('reiMissing', 'b', { product: 'x' }), find('bloomForbidden', 'c', { product: 'x' }), find('reiMissing', 'd', { product: 'y' })];
    expect(worstFirst(made).map(({ path }) => path)).toEqual(['c', 'b', 'd', 'a']);
  });
});

describe('calendar dates', () => {
  it('add and subtract over month, year and clock change', () => {
    expect(addDays('2026-02-28', 1)).toBe('2026-03-01');
    expect(addDays('2026-03-08', -8)).toBe('2026-02-28');
    expect(daysBetween('2026-01-01', '2027-01-01')).toBe(365);
    expect(addYears('2028-02-29', 7)).toBe('2035-03-01');
    expect(() => addDays('2026-02-30', 1)).toThrow(/not a date/);
  });
});
