import { getTimes } from 'suncalc';
import { describe, expect, it } from 'vitest';
import { createWeather } from '../../mocks/weather/create-weather.ts';
import { hourSchema, readingSchema, type ForecastHour } from '../../shared/assessment/case.ts';
import { hourMs, place } from './support.ts';

const weather = createWeather({ seed: 7, ...place });
const dayMs = 24 * hourMs;
const yearMs = Date.parse('2026-01-01T00:00:00Z');
const days = (from: string, count: number): number[] => Array.from({ length: count }, (_, index) => Date.parse(`${from}T00:00:00Z`) + index * dayMs);
const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
/** True hours of one UTC hour of the day. */
const hoursAt = (dates: number[], utcHour: number): ForecastHour[] => dates.map((date) => weather.truthHour(date + utcHour * hourMs));
const sunriseMs = (dateMs: number): number => getTimes(new Date(dateMs + 16 * hourMs), place.latitude, place.longitude).sunrise!.getTime();

describe('the made-up weather', () => {
  it('is the same for the same seed, place and date, in whatever order it is asked, and another for another seed', () => {
    const at = Date.parse('2026-06-03T10:00:00Z');
    const [same, other] = [createWeather({ seed: 7, ...place }), createWeather({ seed: 8, ...place })];
    same.truthHour(at + 400 * dayMs);
    expect(same.truthHour(at)).toEqual(weather.truthHour(at));
    expect(same.issueAt(at - 9 * hourMs)).toEqual(weather.issueAt(at - 9 * hourMs));
    expect(same.stationReadingAt(at)).toEqual(weather.stationReadingAt(at));
    expect(other.truthHour(at)).not.toEqual(weather.truthHour(at));
  });

  it('has seasons: cold in January, warm in July, the other way about in the south', () => {
    const warmth = (sky: typeof weather, from: string): number => mean(days(from, 28).flatMap((date) => [3, 9, 15, 21].map((hour) => sky.truthAt(date + hour * hourMs).temperature2mC)));
    const [january, july] = [warmth(weather, '2026-01-02'), warmth(weather, '2026-07-02')];
    expect(july).toBeGreaterThan(15);
    expect(july).toBeLessThan(24);
    expect(january).toBeLessThan(0);
    const south = createWeather({ seed: 7, latitude: -38, longitude: 145, elevationM: 100 });
    expect(warmth(south, '2026-01-02')).toBeGreaterThan(warmth(south, '2026-07-02') + 5);
  });

  it('has days: coolest about sunrise, warmest in the afternoon', () => {
    const dates = days('2026-06-01', 60);
    const byHour = Array.from({ length: 24 }, (_, hour) => mean(hoursAt(dates, hour).map((one) => one.temperature2mC!)));
    // Solar time is about 4 h 50 min behind UTC here.
    expect([8, 9, 10]).toContain(byHour.indexOf(Math.min(...byHour)));
    expect([18, 19, 20]).toContain(byHour.indexOf(Math.max(...byHour)));
    expect(Math.max(...byHour) - Math.min(...byHour)).toBeGreaterThan(7);
  });

  it('keeps humidity in step with dew point (Magnus form of FAO-56, eq. 11), which never passes the temperature', () => {
    const pressure = (c: number): number => 0.6108 * Math.exp((17.27 * c) / (c + 237.3));
    for (const date of days('2026-01-01', 365)) {
      const state = weather.truthAt(date + 11 * hourMs);
      expect(state.dewPoint2mC).toBeLessThanOrEqual(state.temperature2mC);
      expect(state.relativeHumidityPct).toBeCloseTo(Math.min(100, (100 * pressure(state.dewPoint2mC)) / pressure(state.temperature2mC)), 6);
    }
  });

  it('has light only while the sun is up, less of it under cloud, and never more than Haurwitz’s clear sky', () => {
    const noons: { cloud: number; share: number }[] = [];
    for (const date of days('2026-03-01', 200)) {
      expect(weather.truthHour(date + 5 * hourMs).shortwaveWm2).toBe(0);
      const state = weather.truthAt(date + 16.8 * hourMs);
      const sine = Math.sin((state.sunAltitudeDeg * Math.PI) / 180);
      const clear = 1098 * sine * Math.exp(-0.057 / sine);
      expect(state.shortwaveWm2).toBeLessThanOrEqual(clear + 1e-9);
      noons.push({ cloud: state.cloudCoverPct, share: state.shortwaveWm2 / clear });
    }
    expect(mean(noons.filter(({ cloud }) => cloud > 90).map(({ share }) => share))).toBeLessThan(0.5);
    expect(mean(noons.filter(({ cloud }) => cloud < 20).map(({ share }) => share))).toBeGreaterThan(0.97);
  });

  it('lays an inversion on clear, calm nights and none on cloudy or windy ones; by mid-morning it is gone', () => {
    const before = days('2026-04-01', 150).map((date) => weather.truthAt(sunriseMs(date) - 0.5 * hourMs));
    const warmerAbove = (states: typeof before): number => mean(states.map((state) => state.temperature80mC - state.temperature2mC));
    const calm = before.filter((state) => state.cloudCoverPct < 25 && state.windSpeed10mMs < 1.5);
    const rough = before.filter((state) => state.cloudCoverPct > 80 || state.windSpeed10mMs > 4);
    expect([calm.length > 15, rough.length > 15]).toEqual([true, true]);
    expect(warmerAbove(calm)).toBeGreaterThan(1.5);
    expect(warmerAbove(rough)).toBeLessThan(0.3);
    for (const date of days('2026-04-01', 150)) {
      const late = weather.truthAt(sunriseMs(date) + 3.5 * hourMs);
      expect(late.temperature80mC).toBeLessThan(late.temperature2mC);
    }
  });

  it('lets the breeze come up some time after sunrise, not at once and not every day alike', () => {
    const quiet = days('2026-05-01', 100).filter((date) => weather.truthAt(sunriseMs(date)).windSpeed10mMs < 2);
    expect(quiet.length).toBeGreaterThan(40);
    const windAfter = (hours: number): number => mean(quiet.map((date) => weather.truthAt(sunriseMs(date) + hours * hourMs).windSpeed10mMs));
    expect(windAfter(0.75)).toBeLessThan(windAfter(0) + 0.35);
    expect(windAfter(4)).toBeGreaterThan(windAfter(0) + 0.8);
  });

  it('brings fronts: the wind veers from the south to the north-west, with cloud and rain, and clears behind', () => {
    const found: number[] = [];
    for (let at = yearMs + 100 * dayMs; at < yearMs + 240 * dayMs; at += hourMs) {
      const [before, after] = [weather.truthAt(at - 4 * hourMs), weather.truthAt(at + 4 * hourMs)];
      const from = (deg: number, low: number, high: number): boolean => deg >= low && deg <= high;
      if (from(before.windFromDeg, 150, 235) && from(after.windFromDeg, 270, 340) && before.windSpeed10mMs > 2.5) found.push(at);
    }
    expect(found.length).toBeGreaterThan(30);
    expect(mean(found.map((at) => weather.truthAt(at - 2 * hourMs).cloudCoverPct))).toBeGreaterThan(70);
    expect(mean(found.map((at) => weather.truthHour(at - 2 * hourMs).precipitationMm!))).toBeGreaterThan(10 * mean(days('2026-04-10', 140).map((date) => weather.truthHour(date + 9 * hourMs).precipitationMm!)) * 0.2);
    expect(mean(found.map((at) => weather.truthAt(at + 16 * hourMs).cloudCoverPct))).toBeLessThan(60);
  });

  it('has gusts above the wind, and every hour of two years fits the contract', () => {
    for (let at = yearMs; at < yearMs + 2 * 365 * dayMs; at += 5 * hourMs) {
      const hour = weather.truthHour(at);
      expect(hourSchema.safeParse(hour).success, hour.time).toBe(true);
      expect(hour.windGust10mMs!, hour.time).toBeGreaterThan(hour.windSpeed10mMs! * 0.8);
    }
  });

  it('stays finite at the poles and on the date line', () => {
    for (const at of [{ latitude: 78, longitude: 15 }, { latitude: -77, longitude: 180 }, { latitude: 0, longitude: -180 }]) {
      const sky = createWeather({ seed: 3, elevationM: null, ...at });
      for (const date of days('2026-01-01', 365)) expect(hourSchema.safeParse(sky.truthHour(date + 10 * hourMs)).success).toBe(true);
    }
  });
});

describe('a forecast of the made-up weather', () => {
  const errors = (fromH: number, toH: number, field: 'windSpeed10mMs' | 'temperature2mC'): number =>
    mean(
      days('2026-04-01', 150).filter((_, index) => index % 5 === 0).flatMap((issueMs) =>
        weather
          .issueAt(issueMs)
          .filter((hour) => Date.parse(hour.time) >= issueMs + fromH * hourMs && Date.parse(hour.time) < issueMs + toH * hourMs)
          .map((hour) => Math.abs(hour[field]! - weather.truthHour(Date.parse(hour.time))[field]!)),
      ),
    );

  it('errs more the further ahead it looks', () => {
    for (const field of ['windSpeed10mMs', 'temperature2mC'] as const) {
      const [hours, day, days3] = [errors(1, 6, field), errors(20, 28, field), errors(68, 76, field)];
      expect(day, field).toBeGreaterThan(hours * 1.15);
      expect(days3, field).toBeGreaterThan(day * 1.15);
    }
  });

  it('errs in the wind about as much as a regional model (0.4–1.2 m/s at half a day; 1.11 in the MEPS pairs of 2019)', () => {
    const half = errors(10, 14, 'windSpeed10mMs');
    expect(half).toBeGreaterThan(0.4);
    expect(half).toBeLessThan(1.2);
  });

  it('gives chances of rain that mean something: rain is commoner the higher they are, and they beat the mean chance', () => {
    const pairs = days('2026-04-01', 150).filter((_, index) => index % 2 === 0).flatMap((issueMs) =>
      weather.issueAt(issueMs, { futureHours: 30 }).filter((hour) => Date.parse(hour.time) >= issueMs + 6 * hourMs).map((hour) => ({ chance: hour.precipitationProbabilityPct! / 100, rain: weather.truthHour(Date.parse(hour.time)).precipitationMm! > 0.1 ? 1 : 0 })),
    );
    const share = (low: number, high: number): number => mean(pairs.filter(({ chance }) => chance >= low && chance < high).map(({ rain }) => rain));
    expect(share(0, 0.1)).toBeLessThan(0.08);
    expect(share(0.1, 0.5)).toBeGreaterThan(share(0, 0.1));
    expect(share(0.5, 1.01)).toBeGreaterThan(share(0.1, 0.5));
    const climate = mean(pairs.map(({ rain }) => rain));
    expect(mean(pairs.map(({ chance, rain }) => (chance - rain) ** 2))).toBeLessThan(climate * (1 - climate) * 0.85);
  });

  it('changes little from one hour’s issue to the next', () => {
    const at = Date.parse('2026-05-10T00:00:00Z');
    const [one, next] = [weather.issueAt(at), weather.issueAt(at + hourMs)];
    const far = (hours: ForecastHour[]): ForecastHour[] => hours.filter((hour) => Date.parse(hour.time) > at + 12 * hourMs && Date.parse(hour.time) < at + 36 * hourMs);
    expect(mean(far(one).map((hour, index) => Math.abs(hour.windSpeed10mMs! - far(next)[index]!.windSpeed10mMs!)))).toBeLessThan(0.3);
  });
});

describe('a station in the orchard', () => {
  it('reads in the form of a reading, lower wind than at 10 m, and near the truth', () => {
    const pairs = days('2026-05-01', 60).map((date) => ({ told: weather.stationReadingAt(date + 14 * hourMs), true_: weather.truthAt(date + 14 * hourMs) }));
    for (const { told } of pairs) expect(readingSchema.safeParse(told).success).toBe(true);
    expect(mean(pairs.map(({ told, true_ }) => told.windSpeedMs! / true_.windSpeed10mMs))).toBeCloseTo(0.748 * 0.86, 1);
    expect(mean(pairs.map(({ told, true_ }) => Math.abs(told.temperatureC! - true_.temperature2mC)))).toBeLessThan(0.4);
  });
  it('of the weather service tells no chance of rain and no upper air', () => expect(weather.observationAt(Date.parse('2026-05-01T09:00:00Z'))).toMatchObject({ precipitationProbabilityPct: null, temperature80mC: null }));
});
