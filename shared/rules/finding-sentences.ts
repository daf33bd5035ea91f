import type { RateUnit } from '../api/plans.ts';
import type { SourceKey } from '../bibliography.ts';
import type { FindingFormats, FindingLevel, FindingSource } from './findings.ts';

interface OfProduct {
  product: string;
}
interface OfBlock extends OfProduct {
  block: string;
}

/** What each finding tells, by its key: SI, rates in `unit`, dates `YYYY-MM-DD`. */
export interface FindingParams {
  rateAboveLabel: OfProduct & { rate: number; max: number; unit: RateUnit };
  rateBelowLabel: OfProduct & { rate: number; min: number; unit: RateUnit };
  useNotEntered: OfBlock & { crop: string };
  carrierBelowLabel: OfProduct & { carrierLHa: number; minLHa: number };
  carrierAboveLabel: OfProduct & { carrierLHa: number; maxLHa: number };
  adjuvantWanted: OfProduct & { wanted: string };
  adjuvantForbidden: OfProduct & { forbidden: string; adjuvant: string };
  adjuvantMayBeForbidden: OfProduct & { forbidden: string };
  applicationsReached: OfBlock & { done: number; max: number };
  lastApplication: OfBlock & { max: number };
  seasonAmountPassed: OfBlock & { soFar: number; rate: number; max: number; unit: RateUnit };
  seasonAmountUnknown: OfBlock & { date: string };
  intervalTooShort: OfBlock & { lastDate: string; days: number; earliest: string };
  phiPastSale: OfBlock & { days: number; saleDate: string; latest: string };
  phiMissing: OfBlock & { saleDate: string };
  reiMeetsPeople: { block: string; product: string; hours: number; who: string; date: string; blocked: number; of: number };
  reiMissing: OfProduct;
  bloomForbidden: OfProduct;
  bloomWhileForaging: OfProduct;
  bloomUnnamed: OfProduct;
  bufferTooNear: OfBlock & { place: string; distanceM: number; bufferM: number };
  bufferUnknown: OfBlock & { place: string; distanceM: number };
  peopleInZone: { block: string; place: string; distanceM: number; zoneM: number };
  licenceMissing: OfProduct & { applicator: string };
  licenceExpires: OfProduct & { applicator: string; expires: string };
  stockShort: OfProduct & { need: number; have: number; unit: string };
  labelFileMissing: OfProduct;
  registrationMissing: OfProduct;
  exampleProduct: OfProduct;
  sameGroupNextGeneration: { block: string; group: string; products: string; lastProducts: string; lastDate: string };
  relatedGroup: { block: string; group: string; other: string; lastDate: string };
  groupUnknown: OfProduct & { group: string };
  otherGroups: { products: string };
}
export type FindingKey = keyof FindingParams;

interface Sentence<K extends FindingKey> {
  level: FindingLevel;
  source: FindingSource;
  cite?: SourceKey;
  say: (p: FindingParams[K], f: FindingFormats) => string;
}

const times = (count: number): string => (count === 1 ? 'once' : count === 2 ? 'twice' : `${count} times`);
const days = (count: number): string => `${count} ${count === 1 ? 'day' : 'days'}`;
const hours = (count: number): string => `${count} ${count === 1 ? 'hour' : 'hours'}`;

/** English; each sentence names what was found and what to do. Label figures are the user's own entries. */
export const sentences: { [K in FindingKey]: Sentence<K> } = {
  rateAboveLabel: { level: 'stop', source: 'label', say: (p, f) => `The rate of ${p.product}, ${f.rate(p.rate, p.unit)}, is above the highest entered from its label, ${f.rate(p.max, p.unit)}: lower it.` },
  rateBelowLabel: { level: 'note', source: 'practice', say: (p, f) => `The rate of ${p.product}, ${f.rate(p.rate, p.unit)}, is below the lowest entered from its label, ${f.rate(p.min, p.unit)}: it may not control the target and may favour resistance.` },
  useNotEntered: { level: 'warn', source: 'label', say: (p) => `No use on ${p.crop} (${p.block}) was entered from the label of ${p.product}: check that the label names this crop.` },
  carrierBelowLabel: { level: 'stop', source: 'label', say: (p, f) => `The carrier volume, ${f.carrier(p.carrierLHa)}, is below the lowest entered from the label of ${p.product}, ${f.carrier(p.minLHa)}: raise it.` },
  carrierAboveLabel: { level: 'stop', source: 'label', say: (p, f) => `The carrier volume, ${f.carrier(p.carrierLHa)}, is above the highest entered from the label of ${p.product}, ${f.carrier(p.maxLHa)}: lower it.` },
  adjuvantWanted: { level: 'warn', source: 'label', say: (p) => `The label of ${p.product} wants an adjuvant (${p.wanted}) and the plan has none: add it.` },
  adjuvantForbidden: { level: 'stop', source: 'label', say: (p) => `The label of ${p.product} forbids ${p.forbidden}, and the plan has ${p.adjuvant}: leave it out.` },
  adjuvantMayBeForbidden: { level: 'warn', source: 'label', say: (p) => `The label of ${p.product} forbids ${p.forbidden}: check that the plan's adjuvant is none of these.` },
  applicationsReached: { level: 'stop', source: 'label', say: (p) => `${p.product} went on ${p.block} ${times(p.done)} this season, and its label allows ${p.max}: choose another product.` },
  lastApplication: { level: 'note', source: 'label', say: (p) => `This is the last of ${p.max} applications of ${p.product} that its label allows on ${p.block} this season.` },
  seasonAmountPassed: { level: 'stop', source: 'label', say: (p, f) => `${p.product} on ${p.block} would come to ${f.rate(p.soFar + p.rate, p.unit)} this season (${f.rate(p.soFar, p.unit)} so far), and its label allows ${f.rate(p.max, p.unit)}: lower the rate or choose another product.` },
  seasonAmountUnknown: { level: 'warn', source: 'label', say: (p) => `The amount of ${p.product} on ${p.block} on ${p.date} was recorded in a unit that does not fit its label: add up the season by hand.` },
  intervalTooShort: { level: 'stop', source: 'label', say: (p) => `${p.product} went on ${p.block} on ${p.lastDate}, and its label wants ${days(p.days)} between applications: not before ${p.earliest}.` },
  phiPastSale: { level: 'stop', source: 'label', say: (p) => `${p.block} is sold from ${p.saleDate}, and ${p.product} needs ${days(p.days)} before harvest: apply by ${p.latest} or choose another product.` },
  phiMissing: { level: 'warn', source: 'label', say: (p) => `${p.block} is sold from ${p.saleDate}, and no pre-harvest interval was entered from the label of ${p.product}: enter it.` },
  reiMeetsPeople: { level: 'stop', source: 'label', say: (p) => `${p.who} in ${p.block} on ${p.date} would meet the ${hours(p.hours)} restricted-entry interval of ${p.product} on ${p.blocked} of the plan's ${days(p.of)}: move the one or the other.` },
  reiMissing: { level: 'warn', source: 'label', say: (p) => `No restricted-entry interval was entered from the label of ${p.product}: enter it, so that the end of re-entry can be told.` },
  bloomForbidden: { level: 'stop', source: 'label', say: (p) => `Something is in bloom, and the label of ${p.product} forbids use in bloom: wait for petal fall, mow the weeds, or choose another product.` },
  bloomWhileForaging: { level: 'note', source: 'label', say: (p) => `Something is in bloom, and the label of ${p.product} forbids use while bees forage: the window must end before they fly.` },
  bloomUnnamed: { level: 'warn', source: 'practice', say: (p) => `Something is in bloom, and no bee statement was entered from the label of ${p.product}: read the label for one.` },
  bufferTooNear: { level: 'stop', source: 'label', say: (p, f) => `${p.block} comes within ${f.distance(p.distanceM)} of ${p.place}, and the label of ${p.product} wants ${f.distance(p.bufferM)}: leave the near rows out.` },
  bufferUnknown: { level: 'note', source: 'practice', say: (p, f) => `${p.place} is ${f.distance(p.distanceM)} from ${p.block}, and no buffer was entered from the label of ${p.product}: read the label for one.` },
  peopleInZone: { level: 'warn', source: 'law', cite: 'aez2024', say: (p, f) => `${p.place} is ${f.distance(p.distanceM)} from ${p.block}, inside the ${f.distance(p.zoneM)} application exclusion zone: suspend the work while anyone is in it (40 CFR 170.405; check the current text and your state's).` },
  licenceMissing: { level: 'stop', source: 'law', cite: 'cfr171', say: (p) => `${p.product} is a restricted-use product, and no licence of ${p.applicator} is on file: only a certified applicator, or someone under one, may apply it.` },
  licenceExpires: { level: 'stop', source: 'law', cite: 'cfr171', say: (p) => `${p.product} is a restricted-use product, and the licence of ${p.applicator} ends on ${p.expires}: renew it first.` },
  stockShort: { level: 'warn', source: 'practice', say: (p) => `The plan needs ${p.need} ${p.unit} of ${p.product}, and the shelf holds ${p.have} ${p.unit}.` },
  labelFileMissing: { level: 'note', source: 'practice', say: (p) => `No label file is kept with ${p.product}: add it, so that it is at hand in the field.` },
  registrationMissing: { level: 'note', source: 'practice', say: (p) => `No registration number was entered for ${p.product}: the record will want it.` },
  exampleProduct: { level: 'warn', source: 'practice', say: (p) => `${p.product} is an invented example: replace its figures by those of the label in hand before any use.` },
  sameGroupNextGeneration: { level: 'warn', source: 'practice', cite: 'iracMoa', say: (p) => `${p.products} is of group ${p.group}, as was ${p.lastProducts} on ${p.block} on ${p.lastDate}, one generation before: successive generations should not get the same group.` },
  relatedGroup: { level: 'note', source: 'practice', cite: 'iracMoa', say: (p) => `Group ${p.group} differs from group ${p.other} (${p.block}, ${p.lastDate}), but both act on the chordotonal organs: resistance may cross.` },
  groupUnknown: { level: 'note', source: 'practice', cite: 'iracMoa', say: (p) => (p.group === '' ? `No mode-of-action group was entered for ${p.product}: its rotation cannot be judged.` : `${p.product} is of unknown or non-specific mode of action (${p.group}): its rotation cannot be judged.`) },
  otherGroups: { level: 'note', source: 'practice', say: (p) => `Other groups on the shelf: ${p.products}.` },
};
