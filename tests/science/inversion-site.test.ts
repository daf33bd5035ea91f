/** Learning from a grower's own hang tests and thermometers; no published source, the prior is ours. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { prepareInversion } from '../../shared/atmosphere/inversion/index.ts';
import { learnSite, readingOfDifference, type InversionReading } from '../../shared/atmosphere/inversion/site.ts';
import { site } from './cases.ts';
import { altitudeAt, clearCalm, sunriseMs } from './inversion-cases.ts';

const logit = (chance: number): number => Math.log(chance / (1 - chance));
const logistic = (value: number): number => 1 / (1 + Math.exp(-value));
const same = (count: number, isInverted: boolean, likelihood: number): InversionReading[] => Array.from({ length: count }, () => ({ isInverted, likelihood }));

describe('your site so far', () => {
  it('changes nothing without readings', () => expect(learnSite([])).toMatchObject({ logitOffset: 0, readings: 0, words: 'your site so far: no readings yet' }));

  it('is not overturned by five readings, whatever they say and were expected to say', () => {
    fc.assert(
      fc.property(fc.array(fc.record({ isInverted: fc.boolean(), likelihood: fc.double({ min: 0, max: 1, noNaN: true }) }), { maxLength: 5 }), (readings) => {
        const { logitOffset } = learnSite(readings);
        expect(logistic(logit(0.8) + logitOffset)).toBeGreaterThan(0.5);
        expect(logistic(logit(0.2) + logitOffset)).toBeLessThan(0.5);
      }),
      { numRuns: 500, seed: 20261201 },
    );
  });

  it('is overturned by forty that all say otherwise', () => {
    expect(logistic(logit(0.2) + learnSite(same(40, true, 0.2)).logitOffset)).toBeGreaterThan(0.5);
    expect(logistic(logit(0.8) + learnSite(same(40, false, 0.8)).logitOffset)).toBeLessThan(0.5);
  });

  it('stays where the readings come as often as said', () => expect(learnSite([...same(7, true, 0.7), ...same(3, false, 0.7)]).logitOffset).toBeCloseTo(0, 6));

  it('solves the posterior: pull of the readings equals pull of the prior', () => {
    const readings = [...same(6, true, 0.4), ...same(2, false, 0.7)];
    const { logitOffset } = learnSite(readings);
    const pull = readings.reduce((sum, { isInverted, likelihood }) => sum + (isInverted ? 1 : 0) - logistic(logit(likelihood) + logitOffset), 0);
    expect(pull).toBeCloseTo(logitOffset / 0.5 ** 2, 6);
  });

  it('leaves out readings whose likelihood is not known', () => expect(learnSite([{ isInverted: true, likelihood: NaN }]).readings).toBe(0));

  it('takes warmer air above as inverted', () => expect([0.4, -0.4].map((differenceC) => readingOfDifference(differenceC, 0.5).isInverted)).toEqual([true, false]));

  it('says in words what was seen, what was expected and what follows', () => {
    expect(learnSite(same(4, true, 0.5)).words).toBe('your site so far: inverted in 4 of 4 readings, 2.0 expected; the estimate is raised a little, few readings weigh little');
    expect(learnSite(same(20, false, 0.5)).words).toBe('your site so far: inverted in 0 of 20 readings, 10.0 expected; the estimate is lowered');
  });

  it('moves the likelihood and is named in the evidence', () => {
    const learned = learnSite(same(20, false, 0.6));
    const at = (withReadings: boolean) => prepareInversion({ site, hours: clearCalm(), sunAltitudeDegAt: altitudeAt, ...(withReadings ? { learned } : {}) }).at(sunriseMs + 5_400_000);
    expect(at(true).likelihood).toBeLessThan(at(false).likelihood!);
    expect(at(true).evidence).toContain(learned.words);
    expect(at(false).evidence.join()).not.toContain('your site');
  });
});
