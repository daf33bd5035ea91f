import { describe, expect, it } from 'vitest';
import * as units from './units.ts';

describe('unit conversions (NIST Handbook 44 and SP 811, exact definitions; quoted values computed from them)', () => {
  it.each([
    ['3 mph is 1.341 m/s', units.mphToMs(3), 1.341],
    ['10 mph is 4.470 m/s', units.mphToMs(10), 4.47],
    ['15 mph is 6.706 m/s', units.mphToMs(15), 6.706],
    ['11 km/h is 6.84 mph', units.msToMph(units.kmhToMs(11)), 6.835],
    ['a rise of 3 °F is 1.67 °C', units.fahrenheitSpanToC(3), 1.667],
    ['1 gal/ac is 9.354 L/ha', units.gallonsPerAcreToLHa(1), 9.353956],
    ['1 fl oz/ac is 73.078 mL/ha', units.fluidOuncesPerAcreToMlHa(1), 73.07778],
    ['1 lb/ac is 1.121 kg/ha', units.poundsPerAcreToKgHa(1), 1.120851],
    ['1 oz/ac is 70.053 g/ha', units.ouncesPerAcreToGHa(1), 70.0532],
    ['100 ft is 30.48 m', units.feetToM(100), 30.48],
    ['1 knot is 0.5144 m/s', units.knotsToMs(1), 0.514444],
  ])('%s', (_title, got, wanted) => {
    expect(got).toBeCloseTo(wanted, 3);
  });

  it('takes every value there and back', () => {
    const pairs: [(x: number) => number, (x: number) => number][] = [
      [units.mphToMs, units.msToMph],
      [units.knotsToMs, units.msToKnots],
      [units.kmhToMs, units.msToKmh],
      [units.fahrenheitToC, units.celsiusToF],
      [units.fahrenheitSpanToC, units.celsiusSpanToF],
      [units.feetToM, units.metresToFeet],
      [units.inchesToMm, units.millimetresToInches],
      [units.acresToHa, units.hectaresToAcres],
      [units.gallonsToL, units.litresToGallons],
      [units.fluidOuncesToMl, units.millilitresToFluidOunces],
      [units.poundsToKg, units.kilogramsToPounds],
      [units.gallonsPerAcreToLHa, units.litresPerHaToGallonsPerAcre],
    ];
    for (const [there, back] of pairs) expect(back(there(17.3))).toBeCloseTo(17.3, 9);
  });
});
