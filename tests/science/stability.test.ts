/** Published: EPA-454/R-99-005 §6.4 (tables 6-4 to 6-7), row by row; the Richardson cases are computed from the formula. */
import { describe, expect, it } from 'vitest';
import { bulkRichardson, criticalRichardson } from '../../shared/atmosphere/richardson.ts';
import { srdtClass } from '../../shared/atmosphere/stability-srdt.ts';
import { insolationClass, netRadiationIndex, turnerClass } from '../../shared/atmosphere/stability-turner.ts';

describe("Turner's table 6-4 (EPA-454/R-99-005, published)", () => {
  const indices = [4, 3, 2, 1, 0, -1, -2];
  const rows: [winds: number[], classes: string][] = [
    [[0, 0.5, 0.7], 'AABCDFG'],
    [[0.8, 1.3, 1.8], 'ABBCDFG'],
    [[1.9, 2.4, 2.8], 'ABCDDEF'],
    [[2.9, 3.1, 3.3], 'BBCDDEF'],
    [[3.4, 3.6, 3.8], 'BBCDDDE'],
    [[3.9, 4.4, 4.8], 'BCCDDDE'],
    [[4.9, 5.2, 5.4], 'CCDDDDE'],
    [[5.5, 5.7, 5.9], 'CCDDDDD'],
    [[6, 9, 20], 'CDDDDDD'],
  ];
  it.each(rows)('row of winds %s m/s reads %s', (winds, classes) => {
    for (const wind of winds) expect(indices.map((index) => turnerClass(wind, index)).join('')).toBe(classes);
  });

  it('answers unknown for an unknown wind or an index that the table lacks', () => {
    expect(turnerClass(NaN, 0)).toBeNull();
    expect(turnerClass(-1, 0)).toBeNull();
    expect(turnerClass(2, 5)).toBeNull();
    expect(turnerClass(2, 0.5)).toBeNull();
  });
});

describe('insolation class and net radiation index (tables 6-5 and 6-6; the row up to 15° and the cloudy-day rows from memory)', () => {
  it.each([
    [61, 4],
    [60, 3],
    [36, 3],
    [35, 2],
    [16, 2],
    [15, 1],
    [2, 1],
  ])('the sun at %s° is of class %s', (altitude, insolation) => {
    expect(insolationClass(altitude)).toBe(insolation);
  });

  it.each([
    ['a clear night', 0, 0, null, true, -2],
    ['a night of 4/10 cloud', 0, 4, null, true, -2],
    ['a night of 5/10 cloud', 0, 5, null, true, -1],
    ['low overcast by night', 0, 10, 900, true, 0],
    ['low overcast by day', 40, 10, 900, false, 0],
    ['a day of 5/10 cloud', 40, 5, 900, false, 3],
    ['a day of 8/10 low cloud', 40, 8, 900, false, 1],
    ['a day of 8/10 middle cloud', 40, 8, 3048, false, 2],
    ['a day of 8/10 high cloud', 40, 8, 6000, false, 3],
    ['high overcast by day', 40, 10, 6000, false, 2],
    ['low cloud under a low sun', 10, 8, 900, false, 1],
  ])('%s', (_name, altitude, cloud, ceiling, isNight, index) => {
    expect(netRadiationIndex(altitude, cloud, ceiling, isNight)).toBe(index);
  });

  it.each([
    ['night clear 1.5 m/s', 1.5, -5, 0, null, true, 'G'],
    ['40 minutes after sunrise counts as night', 1.5, 6, 0, null, true, 'G'],
    ['2 hours after sunrise at 20°, clear, 2 m/s', 2, 20, 0, null, false, 'C'],
    ['overcast, ceiling 3000 ft, 2 m/s', 2, 30, 10, 914, false, 'D'],
    ['40°, cloud 8/10, ceiling 10 000 ft, 3 m/s', 3, 40, 8, 3048, false, 'C'],
  ])('taken together (computed from the tables): %s', (_name, wind, altitude, cloud, ceiling, isNight, wanted) => {
    expect(turnerClass(wind, netRadiationIndex(altitude, cloud, ceiling, isNight))).toBe(wanted);
  });
});

describe('solar radiation / delta-T table 6-7 (EPA-454/R-99-005, published)', () => {
  const day: [winds: number[], classes: string][] = [
    [[0, 1.9], 'AABD'],
    [[2, 2.9], 'ABCD'],
    [[3, 4.9], 'BBCD'],
    [[5, 5.9], 'CCDD'],
    [[6, 15], 'CDDD'],
  ];
  it.each(day)('by day, winds %s m/s read %s', (winds, classes) => {
    for (const wind of winds) {
      expect([1000, 800, 300, 50].map((radiation) => srdtClass(wind, true, radiation, NaN)).join('')).toBe(classes);
      expect([925, 675, 175, 174.9].map((radiation) => srdtClass(wind, true, radiation, NaN)).join('')).toBe(classes);
    }
  });

  it.each([
    [1.9, 'EF'],
    [2, 'DE'],
    [2.4, 'DE'],
    [2.5, 'DD'],
    [8, 'DD'],
  ])('by night, %s m/s reads %s for falling and rising temperature', (wind, classes) => {
    expect([-0.01, 0].map((gradient) => srdtClass(wind, false, NaN, gradient)).join('')).toBe(classes);
  });

  it('answers unknown without the value it needs', () => {
    expect(srdtClass(NaN, true, 300, 0)).toBeNull();
    expect(srdtClass(2, true, NaN, 0)).toBeNull();
    expect(srdtClass(2, false, 300, NaN)).toBeNull();
  });
});

describe('bulk Richardson number (computed from the formula; critical value by the AMS Glossary)', () => {
  const layer = (temperatureC: number, windMs: number, heightM: number) => ({ temperatureC, windMs, heightM });
  it.each([
    ['10 to 12 °C, 2 to 10 m, 0.5 to 1.5 m/s', layer(10, 0.5, 2), layer(12, 1.5, 10), 0.574],
    ['10 to 10.1 °C, 2 to 4 m/s', layer(10, 2, 2), layer(10.1, 4, 10), 0.0124],
    ['20 to 19 °C, 1.5 to 2.5 m/s', layer(20, 1.5, 2), layer(19, 2.5, 10), -0.247],
    ['10 to 11 °C, ground to 10 m, calm to 1 m/s', layer(10, 0, 0), layer(11, 1, 10), 0.38],
    ['the same with 3 m/s', layer(10, 0, 0), layer(11, 3, 10), 0.0422],
  ])('%s', (_name, lower, upper, wanted) => {
    expect(Math.abs(bulkRichardson(lower, upper) - wanted)).toBeLessThan(0.002);
  });

  it('tells still layers from stirred ones, and answers unknown without shear or depth', () => {
    expect(bulkRichardson(layer(10, 0.5, 2), layer(12, 1.5, 10))).toBeGreaterThan(criticalRichardson);
    expect(bulkRichardson(layer(10, 2, 2), layer(12, 2, 10))).toBeNaN();
    expect(bulkRichardson(layer(10, 1, 10), layer(12, 2, 10))).toBeNaN();
  });
});
