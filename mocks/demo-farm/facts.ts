/**
 * The demo farm: people, places, products and figures are invented. Product figures are no label's;
 * every product is marked as an example, to be replaced by the label in hand.
 */
import type { z } from 'zod';
import type { blockBody, farmBody, placeBody, sprayerBody } from '../../shared/api/farms.ts';
import type { planBody, productBody } from '../../shared/api/plans.ts';
import type { Role } from '../../shared/rules/authorization.ts';

/** Shown on the sign-in page of the demo; good for nothing else. */
export const demoPassword = 'first-light-demo';

export const demoPeople: { name: string; email: string; role: Role; units: 'us' | 'metric' }[] = [
  { name: 'Marit Halloran', email: 'marit@quillbrook.example', role: 'owner', units: 'us' },
  { name: 'June Abara', email: 'june@quillbrook.example', role: 'applicator', units: 'us' },
  { name: 'Teo Lindqvist', email: 'teo@quillbrook.example', role: 'crew', units: 'us' },
  { name: 'Dr. Priya Venn', email: 'priya@quillbrook.example', role: 'observer', units: 'metric' },
];

const acre = 0.40468564224;
const mph = 0.44704;
const gallon = 3.785411784;
const gallonsPerAcre = gallon / acre;
const fahrenheit = (f: number): number => ((f - 32) * 5) / 9;

export const demoFarm: z.input<typeof farmBody> = { name: 'Quillbrook Trees', latitude: 44.742, longitude: -85.318, elevationM: 268, exposure: 'sheltered', units: 'us', eveTime: '20:00', dawnLeadMinutes: 30 };
export const demoTimeZone = 'America/Detroit';

export const demoBlocks: Record<'brook' | 'ridge' | 'yard', z.input<typeof blockBody>> = {
  brook: { name: 'Brook rows', crop: 'Apple', species: 'Malus domestica', areaHa: 0.6 * acre, trees: 210, rows: 7, notes: 'Low end by the brook; the air lies still here longest.' },
  ridge: { name: 'Ridge firs', crop: 'Christmas trees', species: 'Abies balsamea', areaHa: 0.85 * acre, trees: 640, rows: 16, notes: 'Open to the west wind.' },
  yard: { name: 'Yard spruces', crop: 'Nursery stock', species: 'Picea glauca', areaHa: 0.3 * acre, trees: 380, rows: 10, notes: 'Young trees in the shelter of the barn.' },
};

export const demoPlaces: z.input<typeof placeBody>[] = [
  { name: "Oren's hives", kind: 'hives', bearingDeg: 78, distanceM: 210, contactName: 'Oren Tabb', contactEmail: 'oren@tabbhives.example', notes: 'Eight colonies behind the hedge.' },
  { name: 'Quill Brook', kind: 'water', bearingDeg: 155, distanceM: 60, notes: 'Runs all year.' },
  { name: 'House across the lane', kind: 'house', bearingDeg: 262, distanceM: 140, contactName: 'The Ferro family', contactEmail: 'ferro@lanehouse.example' },
];

export const demoSprayers: Record<'pack' | 'second', z.input<typeof sprayerBody>> = {
  pack: { name: 'Backpack blower A', type: 'backpackMistBlower', tankL: 3.2 * gallon, dropletClass: 'fine', minutesPerTank: 6, changeOverMinutes: 3 },
  second: { name: 'Backpack blower B', type: 'backpackMistBlower', tankL: 2.6 * gallon, dropletClass: 'veryFine', minutesPerTank: 5, changeOverMinutes: 3, notes: 'Spare; fine nozzle plate.' },
};

const invented = 'Invented example for the demo: not a real product. Replace it by the label in your hand.';
export const demoProducts: Record<'mite' | 'scab' | 'oil', z.input<typeof productBody>> = {
  mite: {
    name: 'Example Mite 12 SC', activeIngredients: 'an invented acaricide', moaSystem: 'IRAC', moaGroup: '10A', rateMin: 2, rateMax: 4, rateUnit: 'flOzPerAcre', carrierMinLHa: 8 * gallonsPerAcre, carrierMaxLHa: 40 * gallonsPerAcre,
    windMaxMs: 10 * mph, windMinMs: 1 * mph, windHeightM: 2, gustMaxMs: 20 * mph, inversionProhibited: true, rainFreeHours: 4, temperatureMinC: fahrenheit(42), temperatureMaxC: fahrenheit(86), beeStatement: 'notWhileForaging', reiHours: 12, phiDays: 14,
    maxApplicationsPerSeason: 2, maxRatePerSeason: 8, minIntervalDays: 21, notes: invented,
  },
  scab: {
    name: 'Example Scab 50 WG', activeIngredients: 'an invented fungicide', moaSystem: 'FRAC', moaGroup: '7', rateMin: 3, rateMax: 5, rateUnit: 'ozPerAcre', carrierMinLHa: 10 * gallonsPerAcre, carrierMaxLHa: 60 * gallonsPerAcre,
    windMaxMs: 10 * mph, windHeightM: 2, inversionProhibited: true, rainFreeHours: 6, temperatureMinC: fahrenheit(40), temperatureMaxC: fahrenheit(88), beeStatement: 'none', reiHours: 24, phiDays: 30, maxApplicationsPerSeason: 4, maxRatePerSeason: 18, minIntervalDays: 10, notes: invented,
  },
  oil: {
    name: 'Example Summer Oil', activeIngredients: 'an invented refined oil', moaSystem: 'none', moaGroup: '', rateMin: 64, rateMax: 128, rateUnit: 'flOzPerAcre', carrierMinLHa: 20 * gallonsPerAcre, carrierMaxLHa: 80 * gallonsPerAcre,
    windMaxMs: 9 * mph, windMinMs: 1 * mph, windHeightM: 2, inversionProhibited: true, rainFreeHours: 3, temperatureMinC: fahrenheit(45), temperatureMaxC: fahrenheit(82), beeStatement: 'none', reiHours: 4, phiDays: 0, notes: invented,
  },
};

type PlanFacts = Omit<z.input<typeof planBody>, 'blockIds' | 'products' | 'sprayerId' | 'firstDate' | 'lastDate'> & {
  blocks: (keyof typeof demoBlocks)[];
  mix: [keyof typeof demoProducts, number][];
  sprayer: keyof typeof demoSprayers;
  /** Days from the day the demo opens. */
  from: number;
  to: number;
};

export const demoPlans: PlanFacts[] = [
  { name: 'Mites on the ridge', target: 'Spruce spider mite', blocks: ['ridge'], mix: [['mite', 3]], sprayer: 'pack', carrierLHa: 14 * gallonsPerAcre, from: -12, to: 4, reserveMinutes: 10 },
  { name: 'Scab cover, brook', target: 'Apple scab', blocks: ['brook'], mix: [['scab', 4]], sprayer: 'pack', carrierLHa: 20 * gallonsPerAcre, from: 1, to: 6, reserveMinutes: 10, bloom: true },
  { name: 'Adelgid oil, yard', target: 'Spruce gall adelgid', blocks: ['yard'], mix: [['oil', 96]], sprayer: 'second', carrierLHa: 30 * gallonsPerAcre, from: 5, to: 18, reserveMinutes: 15 },
];
