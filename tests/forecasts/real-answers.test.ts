import { http, HttpResponse } from 'msw';
import { setupServer } from 'msw/node';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { SettableClock } from '../../server/clock/clock.ts';
import { canonicalHours, memberSuffixes, openMeteoSchema, placeOf } from '../../server/forecasts/adapters/open-meteo-answer.ts';
import { caseFromForecast, readAnswer } from '../../server/forecasts/case-from-forecast.ts';
import { createProviders } from '../../server/forecasts/create-providers.ts';
import { caseSchema } from '../../shared/assessment/case.ts';
import { hourMs, hourOf, issued, noRealAnswers, realAnswer, userAgent } from './support.ts';

// Origins of the answers: MatthewFlamm/pynws and weather-gov/weather.gov (NWS), Rory-Sullivan/metno-locationforecast
// (MET Norway), frenck/python-open-meteo (Open-Meteo). Expected values are read off those files by hand.

const server = setupServer();
beforeAll(() => server.listen({ onUnhandledRequest: 'error' }));
afterEach(() => server.resetHandlers());
afterAll(() => server.close());

const signal = new AbortController().signal;
function providersAt(at: string) {
  const clock = new SettableClock(new Date(at));
  clock.stop(new Date(at));
  const [nws, metNorway] = createProviders({ clock, userAgent, random: () => 0, sleep: async () => undefined, settings: { order: ['nws', 'metNorway'] } });
  return { nws: nws!, metNorway: metNorway! };
}

/** Serves a real point and its real grid under their own addresses. */
function serveNws(points: string, grid: string, cell: string): void {
  server.use(
    http.get('https://api.weather.gov/points/:point', () => HttpResponse.text(points, { headers: { 'content-type': 'application/geo+json' } })),
    http.get(`https://api.weather.gov/gridpoints/${cell}`, () => HttpResponse.text(grid, { headers: { 'content-type': 'application/geo+json' } })),
  );
}

/** The stored sets of weather.gov carry times relative to now: `date:now:hour -6 hours / PT1H`, `date:now -29327 seconds / PT1H`. */
function withTimes(text: string, now: Date): string {
  return text.replace(/date:now(:hour)?(?: ([+-]?\d+) (hours|seconds))?/g, (_, _hour: string | undefined, count = '0', unit = 'seconds') => {
    const atMs = now.getTime() + Number(count) * (unit === 'hours' ? hourMs : 1000);
    return `${new Date(Math.round(atMs / hourMs) * hourMs).toISOString().slice(0, 19)}+00:00`;
  }).replaceAll(/(\+00:00) \/ (P)/g, '$1/$2');
}

describe('a real grid of the National Weather Service', () => {
  it('comes to canonical hours', async (context) => {
    const [points, grid] = [realAnswer('nws/points.json'), realAnswer('nws/detailed_forecast.json')];
    if (!points || !grid) return context.skip(noRealAnswers);
    serveNws(points, grid, 'TAE/58,65');
    const forecast = issued(await providersAt('2022-02-04T04:10:00Z').nws.fetch({ latitude: 30, longitude: -85, elevationM: 5 }, null, signal));
    expect(forecast.issuedAt?.toISOString()).toBe('2022-02-04T03:15:41.000Z');
    expect(forecast.place.latitude).toBeCloseTo(30.0194, 4);
    expect(forecast.place.longitude).toBeCloseTo(-84.9803, 4);
    expect(forecast.place.elevationM).toBeCloseTo(3.9624, 4);
    expect(forecast.hours[0]!.time).toBe('2022-02-03T21:00:00Z');
    const first = forecast.hours[0]!;
    expect(first.temperature2mC).toBeCloseTo(22.778, 3);
    expect(first.windSpeed10mMs).toBeCloseTo(20.372 / 3.6, 3);
    expect(first.windGust10mMs).toBeCloseTo(29.632 / 3.6, 3);
    expect([first.windFromDeg, first.cloudCoverPct, first.relativeHumidityPct, first.precipitationProbabilityPct]).toEqual([160, 71, 73, 8]);
    // A dew point told once for five hours holds in each of them; then the next begins.
    expect(['2022-02-04T01:00:00Z', '2022-02-04T02:00:00Z'].map((time) => hourOf(forecast.hours, time).dewPoint2mC)).toEqual([17.778, 18.333]);
    // 2.032 mm over six hours.
    for (const hour of [6, 7, 8, 9, 10, 11]) expect(hourOf(forecast.hours, `2022-02-04T${String(hour).padStart(2, '0')}:00:00Z`).precipitationMm).toBeCloseTo(2.032 / 6, 3);
    expect(hourOf(forecast.hours, '2022-02-04T05:00:00Z').precipitationMm).toBe(0);
    // Amounts end on the 10th at 12 UTC, temperature goes on: unknown, not zero.
    const late = hourOf(forecast.hours, '2022-02-10T13:00:00Z');
    expect([late.precipitationMm, late.temperature2mC === null]).toEqual([null, false]);
    expect(forecast.hours.every((hour) => hour.temperature80mC === null && hour.shortwaveWm2 === null)).toBe(true);
  });

  it('is refused when its date is more than half a day old, though the status is 200', async (context) => {
    const [points, grid] = [realAnswer('nws/points.json'), realAnswer('nws/detailed_forecast.json')];
    if (!points || !grid) return context.skip(noRealAnswers);
    serveNws(points, grid, 'TAE/58,65');
    await expect(providersAt('2022-02-05T09:00:00Z').nws.fetch({ latitude: 30, longitude: -85, elevationM: 5 }, null, signal)).rejects.toMatchObject({ kind: 'stale' });
  });

  it.for([
    ['OAX', '59,58', { latitude: 41.212, longitude: -96.623 }, -3.889],
    ['MPX', '112,73', { latitude: 44.99, longitude: -93.15 }, 2.222],
  ] as const)('of office %s, a week long, reads whole', async ([office, cell, at, firstC], context) => {
    const [points, grid] = [realAnswer(`nws/${office}_points.json`), realAnswer(`nws/${office}_${office === 'OAX' ? '59-58' : '1-1'}.gridpoint.json`)];
    if (!points || !grid) return context.skip(noRealAnswers);
    const now = new Date('2024-12-03T02:00:00Z');
    const found = /"gridX": *(\d+)[^]*?"gridY": *(\d+)/.exec(points);
    serveNws(points, withTimes(grid, now), office === 'OAX' ? `OAX/${cell}` : `${/"gridId": *"([A-Z]{3})"/.exec(points)?.[1]}/${found?.[1]},${found?.[2]}`);
    const { hours } = issued(await providersAt(now.toISOString()).nws.fetch({ ...at, elevationM: null }, null, signal));
    expect(hours.length).toBeGreaterThan(160);
    expect(hours[0]!.temperature2mC).toBe(firstC);
    expect(hours.filter((hour) => hour.windSpeed10mMs === null || hour.windFromDeg === null).length).toBeLessThan(6);
    expect(caseSchema.shape.hours.safeParse(hours).success).toBe(true);
  });
});

describe('a real answer of MET Norway', () => {
  it.for([
    ['complete', 'lat51.5lon-0.1altitude25_complete.json', { latitude: 51.5, longitude: -0.1, elevationM: 25 }, { temperature2mC: 18.8, dewPoint2mC: 7.2, relativeHumidityPct: 47, windSpeed10mMs: 2.3, windFromDeg: 349.3, cloudCoverPct: 12.5, precipitationMm: 0 }],
    ['compact', 'lat40.7lon-74.0altitude10_compact.json', { latitude: 40.7, longitude: -74, elevationM: 10 }, { temperature2mC: 26.5, dewPoint2mC: null, relativeHumidityPct: 81.3, windSpeed10mMs: 3.8, windFromDeg: 243.4, cloudCoverPct: 69.5, precipitationMm: 0 }],
  ] as const)('(%s) comes to canonical hours', async ([, file, at, first], context) => {
    const text = realAnswer(`metno/${file}`);
    if (!text) return context.skip(noRealAnswers);
    const { headers, data } = JSON.parse(text) as { headers: Record<string, string>; data: object };
    const { 'Content-Encoding': _encoding, 'Content-Length': _length, ...sent } = headers;
    let asked: URL | null = null;
    server.use(
      http.get('https://api.met.no/weatherapi/locationforecast/2.0/complete', ({ request }) => {
        asked = new URL(request.url);
        return HttpResponse.json(data, { headers: sent });
      }),
    );
    const forecast = issued(await providersAt('2020-07-20T11:44:40Z').metNorway.fetch(at, null, signal));
    expect(Object.fromEntries(asked!.searchParams)).toEqual({ lat: String(at.latitude), lon: String(at.longitude), altitude: String(at.elevationM) });
    expect(forecast.place).toEqual(at);
    expect(forecast.issuedAt?.toISOString()).toBe('2020-07-20T01:30:57.000Z');
    // Expires less Date: half an hour from now.
    expect((forecast.expiresAt!.getTime() - forecast.fetchedAt.getTime()) / 60_000).toBeCloseTo(file.includes('complete') ? 31.87 : 30.37, 1);
    expect(forecast.hours[0]).toEqual({ time: '2020-07-20T11:00:00Z', windGust10mMs: null, precipitationProbabilityPct: null, shortwaveWm2: null, temperature80mC: null, ...first });
    // Hourly until the 22nd at 17 UTC, then every six hours: rain is known in between, the rest is not.
    expect(hourOf(forecast.hours, '2020-07-22T19:00:00Z')).toMatchObject({ temperature2mC: null, windSpeed10mMs: null, precipitationMm: 0 });
    expect(hourOf(forecast.hours, '2020-07-23T00:00:00Z').temperature2mC).not.toBeNull();
    expect(forecast.hours.at(-1)).toMatchObject({ time: '2020-07-29T06:00:00Z', precipitationMm: null });
  });

  it('spreads a real six-hour amount over its hours', async (context) => {
    const text = realAnswer('metno/lat40.7lon-74.0altitude10_compact.json');
    if (!text) return context.skip(noRealAnswers);
    const { data } = JSON.parse(text) as { data: { properties: { timeseries: { time: string; data: { next_1_hours?: object; next_6_hours?: { details: { precipitation_amount: number } } } }[] } } };
    server.use(http.get('https://api.met.no/weatherapi/locationforecast/2.0/complete', () => HttpResponse.json(data)));
    const { hours } = issued(await providersAt('2020-07-20T11:44:40Z').metNorway.fetch({ latitude: 40.7, longitude: -74, elevationM: 10 }, null, signal));
    const blocks = data.properties.timeseries.filter((entry) => !entry.data.next_1_hours && (entry.data.next_6_hours?.details.precipitation_amount ?? 0) > 0);
    expect(blocks.length).toBeGreaterThan(0);
    for (const block of blocks) {
      const fromMs = Date.parse(block.time);
      const inside = hours.filter((hour) => Date.parse(hour.time) >= fromMs && Date.parse(hour.time) < fromMs + 6 * hourMs);
      expect(inside.reduce((sum, hour) => sum + hour.precipitationMm!, 0)).toBeCloseTo(block.data.next_6_hours!.details.precipitation_amount, 1);
    }
  });
});

describe('a real answer of Open-Meteo', () => {
  it('reads temperatures above the ground, told in local time, at their UTC hours', (context) => {
    const text = realAnswer('open_meteo/forecast_height_levels.json');
    if (!text) return context.skip(noRealAnswers);
    const answer = openMeteoSchema.parse(JSON.parse(text));
    const hours = canonicalHours(answer);
    expect(placeOf(answer)).toEqual({ latitude: 51.49349, longitude: -0.13172913, elevationM: 1 });
    // 00:00 in London that day is 23:00 UTC the day before.
    expect(hours[0]).toMatchObject({ time: '2026-10-03T23:00:00Z', temperature80mC: 15.1, temperature2mC: null, precipitationMm: null });
    expect(hourOf(hours, '2026-10-04T07:00:00Z').temperature80mC).toBe(11.8);
    expect(hours).toHaveLength(24);
  });

  it('reads an ensemble as its control run and twenty members', (context) => {
    const text = realAnswer('open_meteo/ensemble_gefs_2h_sample.json');
    if (!text) return context.skip(noRealAnswers);
    const answer = openMeteoSchema.parse(JSON.parse(text));
    const suffixes = memberSuffixes(answer);
    expect(suffixes).toHaveLength(21);
    expect(suffixes.slice(0, 3)).toEqual(['', '_member01', '_member02']);
    expect(canonicalHours(answer, '_member01').map((hour) => [hour.time, hour.temperature2mC])).toEqual([
      ['2026-10-03T00:00:00Z', 10.1],
      ['2026-10-03T01:00:00Z', 9.8],
    ]);
  });
});

describe('a real answer of each provider as an assessment case', () => {
  const frame = { minutesNeeded: 30, reserveMinutes: 10, limits: { windMaxMs: 4.47, windMinMs: 0.67, rainFreeHours: 4 } };
  it.for([
    ['nws', 'nws/detailed_forecast.json', '2022-02-05', 'America/New_York', 180],
    ['metNorway', 'metno/lat51.5lon-0.1altitude25_complete.json', '2020-07-21', 'Europe/London', 200],
    ['openMeteo', 'open_meteo/forecast_height_levels.json', '2026-10-04', 'Europe/London', 24],
  ] as const)('(%s) is accepted by the contract of `npm run assess`', ([provider, file, date, timeZone, atLeast], context) => {
    const text = realAnswer(file);
    if (!text) return context.skip(noRealAnswers);
    const body = JSON.parse(text) as { data?: unknown };
    const { place, hours } = readAnswer(provider, body.data ?? body);
    expect(hours.length).toBeGreaterThanOrEqual(atLeast);
    const site = { ...place, elevationM: place.elevationM ?? 0, timeZone };
    expect(caseFromForecast(hours, { ...frame, site, date }).hours).toEqual(hours);
    expect(() => caseFromForecast(hours, { ...frame, site, date: 'tomorrow' })).toThrow(/date/);
  });
});
