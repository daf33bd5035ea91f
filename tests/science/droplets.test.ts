/** Fall speeds: Beard 1976 (coefficients from memory, values computed), Gunn & Kinzer 1949 (from memory), Stokes as the limit. */
import { describe, expect, it } from 'vitest';
import { driftingDropletUm, dropletClasses } from '../../shared/droplets/classes.ts';
import { driftReachM, driftReachPerWindS } from '../../shared/droplets/drift-reach.ts';
import { airPropelledZoneM, exclusionZoneM } from '../../shared/droplets/exclusion-zone.ts';
import { fallSpeedMs, gunnKinzerMs, stokesFallSpeedMs } from '../../shared/droplets/fall-speed.ts';
import { dropletLifetimeS } from '../../shared/droplets/lifetime.ts';
import { feetToM } from '../../shared/units/units.ts';

describe('fall speed of water droplets', () => {
  it.each([
    [5, 0.00077],
    [10, 0.00305],
    [20, 0.01205],
    [50, 0.0725],
    [100, 0.25],
    [150, 0.467],
    [200, 0.695],
    [240, 0.877],
    [300, 1.146],
    [400, 1.587],
    [500, 2.018],
    [600, 2.442],
    [800, 3.258],
    [1000, 4.008],
  ])('Beard: %s µm falls at %s m/s', (diameter, speed) => {
    expect(Math.abs(fallSpeedMs(diameter) / speed - 1)).toBeLessThan(0.01);
  });

  it('stays near the measurements of Gunn & Kinzer: 8 percent at 100 µm, 4 at 200, 3 above', () => {
    for (const [diameter, measured] of gunnKinzerMs) expect(Math.abs(fallSpeedMs(diameter) / measured - 1)).toBeLessThan(diameter <= 100 ? 0.08 : diameter <= 200 ? 0.04 : 0.03);
  });

  it('meets Stokes below 50 µm, and Stokes is refused where it errs', () => {
    for (let diameter = 5; diameter <= 50; diameter += 5) expect(Math.abs(fallSpeedMs(diameter) / stokesFallSpeedMs(diameter) - 1)).toBeLessThan(0.05);
    expect(stokesFallSpeedMs(100)).toBeNaN();
    expect(fallSpeedMs(2000)).toBeNaN();
    expect(fallSpeedMs(0)).toBeNaN();
  });

  it('takes about 12 s for 100 µm and 42 s for 50 µm to fall 10 ft (extension figures: 11 s and 40 s)', () => {
    expect(feetToM(10) / fallSpeedMs(100)).toBeCloseTo(12.2, 0);
    expect(Math.abs(feetToM(10) / fallSpeedMs(50) - 42.1)).toBeLessThan(0.5);
  });

  it('rises with size without a jump', () => {
    for (let diameter = 2; diameter < 1070; diameter += 1) {
      expect(fallSpeedMs(diameter)).toBeGreaterThan(fallSpeedMs(diameter - 1));
      if (diameter > 10) expect(fallSpeedMs(diameter) / fallSpeedMs(diameter - 1)).toBeLessThan(1.25);
    }
  });
});

describe('droplet lifetime (Amsden 1962, from memory)', () => {
  it.each([
    [50, 2, 15.6],
    [50, 8, 3.9],
    [100, 2, 62.5],
    [100, 10, 12.5],
    [150, 2, 140.6],
    [200, 8, 62.5],
  ])('%s µm at a Delta T of %s °C lasts %s s', (diameter, deltaT, seconds) => {
    expect(dropletLifetimeS(diameter, deltaT)).toBeCloseTo(seconds, 1);
  });

  it('never ends in saturated air', () => {
    expect(dropletLifetimeS(100, 0)).toBe(Infinity);
  });
});

describe('drift reach (common practice, no source: fall time × wind of the finer droplets)', () => {
  it('grows with wind and height, and shrinks with coarser droplets', () => {
    expect(driftReachM('fine', 4, 3)).toBeCloseTo(2 * driftReachM('fine', 2, 3), 6);
    expect(driftReachPerWindS('fine', 4)).toBeGreaterThan(driftReachPerWindS('fine', 3));
    const reaches = dropletClasses.map((dropletClass) => driftReachM(dropletClass, 2));
    expect([...reaches].sort((a, b) => b - a)).toEqual(reaches);
    expect(dropletClasses.map(driftingDropletUm)).toEqual([30.5, 53, 88.5, 109]);
  });

  it('is never shorter than a mean droplet carried by the wind alone', () => {
    expect(driftReachM('fine', 2, 3)).toBeGreaterThan((3 / fallSpeedMs(106)) * 2 * 0.5);
    expect(driftReachM('fine', 2, 3)).toBeGreaterThan(40);
  });

  it('answers unknown outside its validity', () => {
    expect(driftReachPerWindS('fine', 40)).toBeNaN();
    expect(driftReachPerWindS('fine', 0.1)).toBeNaN();
  });
});

describe('application exclusion zone (40 CFR 170.405, published)', () => {
  it.each([
    ['a mist blower', { airPropelled: true, dropletClass: 'fine', releaseHeightM: 3 }, 100],
    ['a hand wand with fine droplets', { airPropelled: false, dropletClass: 'fine', releaseHeightM: 1 }, 100],
    ['medium droplets from 24 in', { airPropelled: false, dropletClass: 'medium', releaseHeightM: 0.61 }, 25],
    ['medium droplets from 10 in', { airPropelled: false, dropletClass: 'medium', releaseHeightM: 0.254 }, 0],
  ] as const)('%s', (_name, application, feet) => {
    expect(exclusionZoneM(application)).toBeCloseTo(feetToM(feet), 6);
  });

  it('is 100 ft for anything that air carries', () => {
    expect(airPropelledZoneM).toBeCloseTo(30.48, 6);
  });
});
