/**
 * Published worked examples: North Carolina State Christmas tree worksheet; slides of the 1/128-acre method; Mesa County and Albany
 * County Extension; NAFEX list. Values marked "computed" are worked out from the stated formula.
 */
import { describe, expect, it } from 'vitest';
import { carrierByArea, carrierByOunces, carrierByTimedOutput, carrierByTrees, areaPerTankHa, ounceCourseLengthM, ounceCourseM2, outputForCarrierLMin, treesPerHa } from '../../shared/tank/calibration.ts';
import { jarAmount, quartJarMl } from '../../shared/tank/mixing-order.ts';
import { areaCoveredHa, mixSheet, type MixInput } from '../../shared/tank/mix-sheet.ts';
import { acresToHa, feetToM, fluidOuncesToMl, gallonsPerAcreToLHa, gallonsToL, hectaresToAcres, inchesToMm, litresPerHaToGallonsPerAcre, litresToGallons, metresToFeet, mphToMs } from '../../shared/units/units.ts';

const gallonsPerAcre = litresPerHaToGallonsPerAcre;
const onAcres = (acres: number, gpa: number, tankGal: number, rest: Partial<MixInput>): MixInput => ({ areaHa: acresToHa(acres), carrierLHa: gallonsPerAcreToLHa(gpa), tankL: gallonsToL(tankGal), products: [], ...rest });
const flOz = { unit: 'flOz', step: 0.1 } as const;

describe('the 1/128-acre method', () => {
  it('walks a course of 340 ft², so 56.7 ft long for a strip of 6 ft (North Carolina State)', () => {
    expect(ounceCourseM2 / feetToM(1) ** 2).toBeCloseTo(340.3125, 9);
    expect(metresToFeet(ounceCourseLengthM(feetToM(6)))).toBeCloseTo(56.7, 1);
  });

  it('reads 7.5 fl oz caught in the 17 s of the course as 7.5 gal/ac (North Carolina State)', () => {
    expect(gallonsPerAcre(carrierByOunces({ caughtMl: fluidOuncesToMl(7.5), courseSeconds: 17 }))).toBeCloseTo(7.5, 9);
  });

  it('reads 150 fl oz in 75 s as 150 gal/ac, at which 25 gal cover a sixth of an acre (Mesa County)', () => {
    const carrierLHa = carrierByOunces({ caughtMl: fluidOuncesToMl(150), courseSeconds: 75 });
    expect(gallonsPerAcre(carrierLHa)).toBeCloseTo(150, 9);
    expect(hectaresToAcres(areaPerTankHa(gallonsToL(25), carrierLHa))).toBeCloseTo(1 / 6, 9);
  });

  it('allows another catching time, brought to that of the course (computed)', () => {
    expect(gallonsPerAcre(carrierByOunces({ caughtMl: fluidOuncesToMl(30), courseSeconds: 17, caughtSeconds: 68 }))).toBeCloseTo(7.5, 9);
  });
});

describe('carrier volume from timed output, area and trees', () => {
  it('gives 20 gal/ac for a boom of 222 in at 3.75 gal/min and 5 mph (Albany County)', () => {
    const carrierLHa = carrierByTimedOutput({ outputL: gallonsToL(3.75), seconds: 60, paceMs: mphToMs(5), swathM: inchesToMm(222) / 1000 });
    expect(gallonsPerAcre(carrierLHa)).toBeCloseTo(20.07, 2);
  });

  it('gives 65 gal/ac for 1.5 gal on 1000 ft² (NAFEX list)', () => {
    expect(gallonsPerAcre(carrierByArea({ usedL: gallonsToL(1.5), areaM2: 1000 * feetToM(1) ** 2 }))).toBeCloseTo(65.3, 1);
  });

  it.each([
    [4, 2722],
    [4.5, 2151],
    [5, 1742],
  ])('counts trees at %s ft each way as %s to the acre (North Carolina State)', (feet, trees) => {
    // The worksheet cuts 2722.5 and 1742.4 down.
    expect(Math.floor(treesPerHa(feetToM(feet), feetToM(feet)) * acresToHa(1))).toBe(trees);
  });

  it('gives 52.3 gal/ac for a mist blower that used 3 gal on 100 trees at 5 × 5 ft (inputs North Carolina State, computed)', () => {
    expect(gallonsPerAcre(carrierByTrees({ usedL: gallonsToL(3), trees: 100, inRowM: feetToM(5), betweenRowsM: feetToM(5) }))).toBeCloseTo(52.27, 2);
  });

  it('asks 6.06 gal/min of both sides for 100 gal/ac at 2.5 mph in rows of 12 ft (formula from memory, computed)', () => {
    expect(litresToGallons(outputForCarrierLMin({ carrierLHa: gallonsPerAcreToLHa(100), paceMs: mphToMs(2.5), swathM: feetToM(12) }))).toBeCloseTo(6.06, 2);
  });
});

describe('dose per tank', () => {
  it('is 3.2 fl oz in 3 gal for 8 fl oz per acre at 7.5 gal/ac (North Carolina State; 96 mL there at 30 mL to the ounce, 94.6 exactly)', () => {
    const [line] = mixSheet(onAcres(1, 7.5, 3, { products: [{ name: 'a', rate: 8, rateUnit: 'flOzPerAcre' }] })).lines;
    expect(line!.fullTank!.value).toBeCloseTo(3.2, 12);
    expect(line!.fullTank!.measured).toBe(3.2);
    const [inMl] = mixSheet(onAcres(1, 7.5, 3, { products: [{ name: 'a', rate: 8, rateUnit: 'flOzPerAcre', measure: { unit: 'mL', step: 1 } }] })).lines;
    expect(inMl!.fullTank!.value).toBeCloseTo(94.6, 1);
    expect(inMl!.fullTank!.measured).toBe(95);
  });

  it('is 0.8 fl oz or 24 mL to the gallon for a quart per acre at 40 gal/ac (slides of the method)', () => {
    const [line] = mixSheet(onAcres(1, 40, 1, { products: [{ name: 'a', rate: 32, rateUnit: 'flOzPerAcre', measure: { unit: 'mL', step: 1 } }] })).lines;
    expect(line!.fullTank!.value).toBeCloseTo(23.66, 2);
    expect(line!.fullTank!.measured).toBe(24);
  });

  it('is 0.344 fl oz or 10.2 mL in 3 gal for 6 fl oz per acre at 52.26 gal/ac (computed)', () => {
    const products = [{ name: 'a', rate: 6, rateUnit: 'flOzPerAcre' as const }];
    expect(mixSheet(onAcres(1, 52.26, 3, { products })).lines[0]!.fullTank!.value).toBeCloseTo(0.344, 3);
    expect(mixSheet(onAcres(1, 52.26, 3, { products: [{ ...products[0]!, measure: { unit: 'mL', step: 1 } }] })).lines[0]!.fullTank!.value).toBeCloseTo(10.2, 1);
  });

  it('scales the last tank: 2.5 acres at 52.26 gal/ac are 43.55 tanks of 3 gal, the last of 1.65 gal (computed)', () => {
    const sheet = mixSheet(onAcres(2.5, 52.26, 3, { products: [{ name: 'a', rate: 6, rateUnit: 'flOzPerAcre' }] }));
    expect(sheet.tanks).toBeCloseTo(43.55, 9);
    expect(sheet.fullTanks).toBe(43);
    expect(litresToGallons(sheet.lastTankL!)).toBeCloseTo(1.65, 9);
    expect(sheet.lines[0]!.lastTank!.value / sheet.lines[0]!.fullTank!.value).toBeCloseTo(0.55, 9);
  });

  it('is 4 tanks of 3 fl oz and 12 gal to the acre for 12 fl oz per acre in a 3-gallon pack; 48 fl oz cover 4 acres (common practice, no source)', () => {
    const sheet = mixSheet(onAcres(1, 12, 3, { products: [{ name: 'a', rate: 12, rateUnit: 'flOzPerAcre' }] }));
    expect(sheet).toMatchObject({ tanks: 4, fullTanks: 4, fills: 4, lastTankL: null });
    expect(litresToGallons(sheet.volumeL)).toBeCloseTo(12, 12);
    expect(sheet.lines[0]).toMatchObject({ lastTank: null, fullTank: { value: 3, measured: 3, roundingPct: 0, exact: '3' }, total: { value: 12, measured: 12, exact: '12' } });
    expect(hectaresToAcres(areaCoveredHa(48, 'flOz', 12, 'flOzPerAcre'))).toBeCloseTo(4, 12);
  });
});

describe('adjuvants (computed: fl oz = % × gal × 1.28)', () => {
  it.each([
    [0.25, 100, 32],
    [0.25, 3, 0.96],
    [1, 3, 3.84],
    [0.125, 4, 0.64],
  ])('%s percent v/v of %s gal is %s fl oz', (percentVv, gallons, ounces) => {
    const sheet = mixSheet(onAcres(1, gallons, gallons, { adjuvants: [{ name: 'spreader', percentVv, measure: flOz }] }));
    expect(sheet.lines[0]!.fullTank!.value).toBeCloseTo(ounces, 12);
  });

  it('take a rate per 100 gal of spray by the tank: 16 fl oz per 100 gal is 0.48 fl oz in 3 gal', () => {
    const sheet = mixSheet(onAcres(1, 30, 3, { adjuvants: [{ name: 'dilute', amountPerVolume: { amount: 16, unit: 'flOz', per: 100, perUnit: 'gal' }, measure: { unit: 'flOz', step: 0.01 } }] }));
    expect(sheet.lines[0]!.fullTank).toMatchObject({ exact: '12/25', measured: 0.48, roundingPct: 0 });
  });
});

describe('a quart jar test (scale computed)', () => {
  it('takes 5.91 mL for 16 fl oz per acre at 20 gal/ac, and 1.18 mL for 16 fl oz per 100 gal', () => {
    expect(quartJarMl(16, 20)).toBeCloseTo(5.91, 2);
    expect(quartJarMl(16, 100)).toBeCloseTo(1.18, 2);
    expect(jarAmount(fluidOuncesToMl(16), gallonsToL(20))).toBeCloseTo(5.91, 2);
  });
});
