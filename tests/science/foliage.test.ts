/** Physics that any estimate of wet leaves must obey; dew of some tenths of a millimetre a night is common knowledge of the field [monteith1965]. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { coefficients } from '../../shared/atmosphere/foliage/coefficients.ts';
import { featureNames, featureSigns } from '../../shared/atmosphere/foliage/features.ts';
import { evaporationMmPerHour } from '../../shared/atmosphere/foliage/film.ts';
import { prepareFoliage } from '../../shared/atmosphere/foliage/index.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { fairHours, site } from './cases.ts';
import { altitudeAt, sunriseMs } from './inversion-cases.ts';

const hourMs = 3_600_000;
const prepared = (hours: readonly ForecastHour[]) => prepareFoliage({ site, hours, sunAltitudeDegAt: altitudeAt });
const damp = (change: Partial<ForecastHour> = {}) => fairHours((_, localHour) => ({ relativeHumidityPct: localHour % 24 >= 20 || localHour % 24 < 7 ? 98 : 60, dewPoint2mC: null, windSpeed10mMs: 1, cloudCoverPct: 0, ...change }));
const dry = (change: Partial<ForecastHour> = {}) => fairHours(() => ({ relativeHumidityPct: 45, dewPoint2mC: null, windSpeed10mMs: 4, cloudCoverPct: 10, ...change }));
const noonMs = sunriseMs + 7 * hourMs;
const slotOf = (epochMs: number, hours: readonly ForecastHour[]): number => Math.floor((epochMs - Date.parse(hours[0]!.time)) / hourMs);

describe('wet leaves', () => {
  it('are likely at dawn after a clear, damp night', () => expect(prepared(damp()).at(sunriseMs).wetness).toBeGreaterThan(0.8));
  it('are unlikely on a dry, windy, sunny noon', () => expect(prepared(dry()).at(noonMs).wetness).toBeLessThan(0.05));

  it('are likely an hour after rain', () => {
    const hours = dry({ relativeHumidityPct: 85, cloudCoverPct: 100, shortwaveWm2: 40, windSpeed10mMs: 1.5 });
    const slot = slotOf(noonMs, hours);
    hours[slot - 1] = { ...hours[slot - 1]!, precipitationMm: 3 };
    expect(prepared(hours).at(noonMs + 0.5 * hourMs).wetness).toBeGreaterThan(0.7);
  });

  it('dry sooner in sun and wind than under cloud in calm air', () => {
    const afterRain = (change: Partial<ForecastHour>): number => {
      const hours = dry({ relativeHumidityPct: 75, ...change });
      const slot = slotOf(noonMs - 4 * hourMs, hours);
      hours[slot] = { ...hours[slot]!, precipitationMm: 5 };
      return prepared(hours).driesAt(Date.parse(hours[slot + 1]!.time)) ?? Infinity;
    };
    expect(afterRain({ windSpeed10mMs: 5, shortwaveWm2: 700 })).toBeLessThan(afterRain({ windSpeed10mMs: 0.3, shortwaveWm2: 30 }));
  });

  it('dry at the instant from which wetness is below one half', () => {
    const foliage = prepared(damp());
    const at = foliage.driesAt(sunriseMs)!;
    expect(at).toBeGreaterThan(sunriseMs);
    expect(foliage.at(at - 60_000).wetness).toBeGreaterThanOrEqual(0.5);
    expect(foliage.at(at + 60_000).wetness).toBeLessThan(0.5);
  });

  it('are dry at once when they are dry already', () => expect(prepared(dry()).driesAt(noonMs)).toBe(noonMs));

  it.each(['temperature2mC', 'relativeHumidityPct'] as const)('are unknown without %s', (field) => {
    const foliage = prepared(damp({ [field]: null }));
    expect(foliage.at(sunriseMs).wetness).toBeNull();
    expect(foliage.driesAt(sunriseMs)).toBeNull();
  });

  it('are never said drier for a value that is not known', () => {
    const fields = ['precipitationMm', 'relativeHumidityPct', 'windSpeed10mMs', 'cloudCoverPct', 'temperature2mC'] as const;
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.nat(71), fc.constantFrom(...fields)), { minLength: 1, maxLength: 8 }), fc.constantFrom(damp, dry), fc.integer({ min: -3, max: 8 }), (gaps, weather, fromSunriseH) => {
        const whole = weather();
        const holed = whole.map((hour) => ({ ...hour }));
        for (const [index, field] of gaps) holed[index]![field] = null;
        const at = sunriseMs + fromSunriseH * hourMs;
        const said = prepared(holed).at(at).wetness;
        if (said !== null) expect(said).toBeGreaterThanOrEqual(prepared(whole).at(at).wetness! - 1e-9);
      }),
      { numRuns: 400, seed: 20261201 },
    );
  });

  it('are known again after an hour too cold for the formulas', () => {
    const hours = damp();
    hours[3] = { ...hours[3]!, temperature2mC: -55 };
    expect(prepared(hours).at(Date.parse(hours[3]!.time)).wetness).toBeNull();
    expect(prepared(hours).at(sunriseMs).wetness).toBeGreaterThan(0.8);
  });

  it('count as wet after hours that were left out', () => {
    const whole = dry();
    const slot = slotOf(noonMs, whole);
    const holed = whole.filter((_, index) => index < slot - 4 || index > slot - 2);
    expect(prepared(holed).at(Date.parse(whole[slot - 1]!.time)).wetness).toBeGreaterThan(prepared(whole).at(Date.parse(whole[slot - 1]!.time)).wetness!);
  });
});

describe('the film of water', () => {
  const night = { temperatureC: 10, vapourKpa: 1.227, windMs: 1, sunWm2: 0, cloud: 0 };
  it('gains dew of at most some hundredths of a millimetre an hour on a clear, saturated night', () => {
    const gain = -evaporationMmPerHour(night, coefficients.film);
    expect(gain).toBeGreaterThan(0.01);
    // No more than the sky's loss can condense: skyLoss / latent heat.
    expect(gain).toBeLessThan((coefficients.film.skyLossWm2 * 3600) / 2.45e6);
  });
  it('gains less under cloud', () => expect(evaporationMmPerHour({ ...night, cloud: 1 }, coefficients.film)).toBeGreaterThan(evaporationMmPerHour(night, coefficients.film)));
  it('dries faster with sun, wind and dry air', () => {
    const day = { temperatureC: 20, vapourKpa: 1.4, windMs: 2, sunWm2: 300, cloud: 0 };
    const rate = evaporationMmPerHour(day, coefficients.film);
    for (const change of [{ sunWm2: 600 }, { windMs: 5 }, { vapourKpa: 1 }]) expect(evaporationMmPerHour({ ...day, ...change }, coefficients.film)).toBeGreaterThan(rate);
  });
  it('is weighed with the signs that physics gives', () => {
    expect(coefficients.weights).toHaveLength(featureNames.length);
    coefficients.weights.forEach((weight, index) => expect(weight * featureSigns[index]!).toBeGreaterThanOrEqual(0));
  });
});
