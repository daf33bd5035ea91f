/** Physics that any inversion estimate must obey; rules of extension services as in the bibliography under `extensionInversion`. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { extensionRules } from '../../shared/atmosphere/inversion/extension-rules.ts';
import { featureNames, featureRules } from '../../shared/atmosphere/inversion/features.ts';
import { coefficients } from '../../shared/atmosphere/inversion/coefficients.ts';
import { inEnglish } from '../../shared/atmosphere/inversion/evidence.ts';
import { prepareInversion } from '../../shared/atmosphere/inversion/index.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { altitudeAt, clearCalm, dullWindy, likelihoodAt, sunriseMs } from './inversion-cases.ts';
import { site } from './cases.ts';

describe('the likelihood of an inversion', () => {
  it('is high before sunrise after a clear, calm night', () => expect(likelihoodAt(clearCalm(), -0.5)).toBeGreaterThan(0.85));

  it('is low before sunrise after an overcast, windy night', () => expect(likelihoodAt(dullWindy(), -0.5)).toBeLessThan(0.1));

  it('falls hour by hour after sunrise and is small four hours later', () => {
    const said = [0, 1, 2, 3, 4].map((hour) => likelihoodAt(clearCalm(), hour)!);
    for (let index = 1; index < said.length; index += 1) expect(said[index]).toBeLessThan(said[index - 1]!);
    expect(said[4]).toBeLessThan(0.15);
  });

  it('is still high in a gentle breeze where wind usually blows more', () => {
    const open = clearCalm().map((hour) => ({ ...hour, windSpeed10mMs: altitudeAt(Date.parse(hour.time)) > 5 ? 6 : 2 }));
    const sheltered = clearCalm({ windSpeed10mMs: 2 });
    expect(likelihoodAt(open, -0.5)).toBeGreaterThan(0.5);
    expect(likelihoodAt(open, -0.5)).toBeGreaterThan(likelihoodAt(sheltered, -0.5)! - 0.05);
  });

  it('never rises with more wind, in one hour or in all, at equal rest', () => {
    const winds = fc.array(fc.double({ min: 0, max: 12, noNaN: true }), { minLength: 72, maxLength: 72 });
    fc.assert(
      fc.property(winds, fc.double({ min: 0, max: 8, noNaN: true }), fc.boolean(), fc.double({ min: -2, max: 5, noNaN: true }), (windMs, more, inAll, fromSunriseH) => {
        const calm = clearCalm().map((hour, index) => ({ ...hour, windSpeed10mMs: windMs[index]! }));
        const asked = Math.floor((sunriseMs + fromSunriseH * 3_600_000 - Date.parse(calm[0]!.time)) / 3_600_000);
        const windier = calm.map((hour, index) => (inAll || index === asked || index === asked + 1 ? { ...hour, windSpeed10mMs: hour.windSpeed10mMs + more } : hour));
        expect(likelihoodAt(windier, fromSunriseH)).toBeLessThanOrEqual(likelihoodAt(calm, fromSunriseH)! + 1e-12);
      }),
      { numRuns: 300, seed: 20261201 },
    );
  });

  it('never falls when humidity, or a temperature or wind of the night before, is not known', () => {
    const fields = ['relativeHumidityPct', 'temperature2mC', 'windSpeed10mMs', 'cloudCoverPct'] as const;
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.nat(71), fc.constantFrom(...fields)), { minLength: 1, maxLength: 6 }), fc.double({ min: 0, max: 4, noNaN: true }), fc.integer({ min: -1, max: 4 }), (gaps, windMs, fromSunriseH) => {
        const whole = clearCalm({ windSpeed10mMs: windMs, cloudCoverPct: 30 });
        const holed = whole.map((hour) => ({ ...hour })) as ForecastHour[];
        for (const [index, field] of gaps) holed[index]![field] = null;
        const known = likelihoodAt(holed, fromSunriseH);
        if (known !== null) expect(known).toBeGreaterThanOrEqual(likelihoodAt(whole, fromSunriseH)! - 1e-9);
      }),
      { numRuns: 500, seed: 20261201 },
    );
  });

  it.each(['windSpeed10mMs', 'cloudCoverPct'] as const)('is unknown before sunrise without %s', (field) => expect(likelihoodAt(clearCalm({ [field]: null }), -0.5)).toBeNull());

  it('reads the sky from sunlight by day where cloud is not told', () => {
    const sunny = clearCalm({ cloudCoverPct: null }).map((hour) => ({ ...hour, shortwaveWm2: 800 * Math.max(0, Math.sin((altitudeAt(Date.parse(hour.time) + 1_800_000) * Math.PI) / 180)) }));
    expect(likelihoodAt(sunny, 3)).not.toBeNull();
  });

  it('follows the lie of the land: hilltop, open, sheltered, valley floor', () => {
    const said = (['hilltop', 'open', 'sheltered', 'valleyFloor'] as const).map((exposure) => likelihoodAt(clearCalm(), 1.5, { exposure })!);
    expect([...said].sort((a, b) => a - b)).toEqual(said);
    expect(said[3]! - said[0]!).toBeGreaterThan(0.05);
  });

  it('rises with warmer air at 80 m and falls with colder', () => {
    const aloft = (differenceC: number): number => likelihoodAt(clearCalm().map((hour) => ({ ...hour, temperature80mC: hour.temperature2mC! + differenceC })), 1.5)!;
    expect(aloft(2)).toBeGreaterThan(likelihoodAt(clearCalm(), 1.5)!);
    expect(aloft(-1)).toBeLessThan(likelihoodAt(clearCalm(), 1.5)!);
  });

  it('gives no stability class where wind is not known', () => expect(prepareInversion({ site, hours: clearCalm({ windSpeed10mMs: null }), sunAltitudeDegAt: altitudeAt }).at(sunriseMs).stabilityClass).toBeNull());
});

describe('the evidence of an inversion', () => {
  const at = (hours: readonly ForecastHour[], fromSunriseH: number, units?: 'us' | 'metric') => prepareInversion({ site, hours, sunAltitudeDegAt: altitudeAt, units }).at(sunriseMs + fromSunriseH * 3_600_000);

  it('is told in plain words', () => {
    expect(at(clearCalm(), -1).evidence).toEqual(expect.arrayContaining(['clear and nearly calm through the night', 'the sun is not up yet', 'nearly calm now', 'an inversion of more than 1 °C is likely']));
    expect(at(clearCalm(), 0.4).evidence.join()).toMatch(/sun up 24 minutes.*2\.\d °C above the low/);
    expect(at(clearCalm(), 4).evidence).toContain(`the sun stands ${Math.round(altitudeAt(sunriseMs + 4 * 3_600_000))}° high`);
  });

  it('is told in US units to who reads those', () => {
    const warmAloft = clearCalm().map((hour) => ({ ...hour, temperature80mC: hour.temperature2mC! + 2 }));
    expect(at(warmAloft, 0.4, 'us').evidence).toContain('3.6 °F warmer at 260 ft than near the ground');
    expect(at(warmAloft, 0.4, 'us').evidence.join()).not.toMatch(/°C| m /);
    expect(at(warmAloft, 0.4).evidence).toContain('2.0 °C warmer at 80 m than near the ground');
  });

  it('comes as keys and SI figures too, for other languages', () => {
    const messages = at(clearCalm(), 0.4).messages;
    expect(messages).toEqual(expect.arrayContaining([{ key: 'night', params: { sky: 'clear', air: 'nearlyCalm' } }, { key: 'sunUp', params: { minutes: 24 } }]));
    expect(messages.map((message) => inEnglish(message, 'metric'))).toEqual(at(clearCalm(), 0.4).evidence);
  });

  it.each([
    ['wind', clearCalm({ windSpeed10mMs: null }), -0.5],
    ['sky', clearCalm({ cloudCoverPct: null }), -0.5],
    ['hours', clearCalm(), 400],
    ['hours', [], 0],
  ] as const)('names what is missing, the %s, where nothing can be said', (missing, hours, fromSunriseH) => {
    const { likelihood, messages } = at(hours, fromSunriseH);
    expect(likelihood).toBeNull();
    expect(messages).toEqual([{ key: 'needs', params: { missing } }]);
  });

  it('names the gap also where only the hour after the instant has one', () => {
    const hours = clearCalm();
    const next = Math.ceil((sunriseMs - Date.parse(hours[0]!.time)) / 3_600_000);
    hours[next] = { ...hours[next]!, windSpeed10mMs: null };
    expect(at(hours, 0).messages).toEqual([{ key: 'needs', params: { missing: 'wind' } }]);
  });
});

describe('the fitted coefficients', () => {
  it('say what they were made of, one weight and one mean per feature', () => {
    expect(coefficients.madeOf.rows).toBeGreaterThan(4000);
    expect(coefficients.madeOf.date).toMatch(/^\d{4}-\d{2}-\d{2}$/);
    expect(coefficients.weights).toHaveLength(featureNames.length);
    expect(coefficients.means).toHaveLength(featureNames.length);
  });

  it.each(featureNames.map((name, index) => [name, index] as const))('weigh %s with the sign that physics gives it', (name, index) => {
    const { sign, low, high } = featureRules[name];
    if (sign !== 0) expect(coefficients.weights[index]! * sign).toBeGreaterThanOrEqual(0);
    expect(coefficients.means[index]).toBeGreaterThanOrEqual(low);
    expect(coefficients.means[index]).toBeLessThanOrEqual(high);
  });
});

/** Vectors built from the published statements [science notes, 3.2]. */
describe('the rules of extension services', () => {
  const said = (riseC: number, windMs: number, fromSunriseH: number): boolean[] => extensionRules.map(({ holds }) => holds({ riseC, windMs, fromSunriseH }));
  it('all hold ten minutes after sunrise at 0.5 °F above the low in 1 mph', () => expect(said(0.28, 0.45, 0.17)).toEqual([true, true, true, true]));
  it('all are over two hours after sunrise at 6 °F above the low in 5 mph', () => expect(said(3.33, 2.24, 2.17)).toEqual([false, false, false, false]));
  it('disagree 80 minutes after sunrise at 3 °F above the low in 2 mph', () => expect(said(1.67, 0.89, 1.33)).toEqual([false, true, false, false]));
});
