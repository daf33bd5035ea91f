import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { noRealAnswers, place, realAnswer, stage, userAgent } from './support.ts';

const { server, fakes, clock, step } = stage();
beforeAll(() => server.listen({ onUnhandledRequest: 'error' }));
afterAll(() => server.close());

type Json = { [key: string]: Json } & Json[];
const get = (url: string, headers: Record<string, string> = {}): Promise<Response> => fetch(url, { headers: { 'user-agent': userAgent, ...headers } });
const read = async (url: string): Promise<Json> => (await (await get(url)).json()) as Json;
const keys = (value: object): string[] => Object.keys(value);
const point = `${place.latitude},${place.longitude}`;

describe('the fake of the National Weather Service against a real answer', () => {
  it('has the same keys for a point', async (context) => {
    const text = realAnswer('nws/points.json');
    if (!text) return context.skip(noRealAnswers);
    const real = JSON.parse(text) as Json;
    const fake = await read(`https://api.weather.gov/points/${point}`);
    expect(keys(fake)).toEqual(keys(real));
    expect(keys(fake.properties!)).toEqual(keys(real.properties!));
    expect(fake['@context']).toEqual(real['@context']);
    for (const [key, value] of Object.entries(real.properties!)) expect(typeof fake.properties![key], key).toBe(typeof value);
  });

  it('has the same layers, units and stamps in a grid', async (context) => {
    const text = realAnswer('nws/detailed_forecast.json');
    if (!text) return context.skip(noRealAnswers);
    const real = JSON.parse(text) as Json;
    const { forecastGridData } = (await read(`https://api.weather.gov/points/${point}`)).properties as unknown as { forecastGridData: string };
    const fake = await read(forecastGridData);
    expect(keys(fake)).toEqual(keys(real));
    expect(fake['@context']).toEqual(real['@context']);
    expect(keys(fake.properties!)).toEqual(keys(real.properties!));
    for (const [name, layer] of Object.entries(real.properties!)) {
      const mine = fake.properties![name]!;
      if (typeof layer !== 'object' || !Array.isArray(layer.values)) {
        expect(typeof mine, name).toBe(typeof layer);
        continue;
      }
      // An empty layer has no unit, as in the real answer.
      if (mine.values!.length > 0) expect(mine.uom, name).toEqual(layer.uom);
      else expect(keys(mine), name).toEqual(['values']);
      for (const row of mine.values as unknown as { validTime: string }[]) expect(row.validTime, name).toMatch(/^\d{4}-\d\d-\d\dT\d\d:00:00\+00:00\/P(\d+D)?(T\d+H)?$/);
    }
    expect(typeof fake.properties!.gridX).toBe('string');
    // Whole knots and whole degrees Fahrenheit, as offices enter them.
    for (const { value } of fake.properties!.windSpeed!.values as unknown as { value: number }[]) expect(Math.abs(value / 1.852 - Math.round(value / 1.852))).toBeLessThan(0.001);
    for (const { value } of fake.properties!.temperature!.values as unknown as { value: number }[]) expect(Math.abs(value * 1.8 - Math.round(value * 1.8))).toBeLessThan(1e-9);
  });

  it('sends too fine a point on, and turns away who does not say who asks or asks with strange words', async () => {
    const moved = await fetch(`https://api.weather.gov/points/${place.latitude}00,${place.longitude}`, { redirect: 'manual', headers: { 'user-agent': userAgent } });
    expect([moved.status, moved.headers.get('location')]).toEqual([301, `https://api.weather.gov/points/${point}`]);
    expect((await fetch(`https://api.weather.gov/points/${point}`)).status).toBe(403);
    expect((await get('https://api.weather.gov/gridpoints/TST/4303,1765?now=1')).status).toBe(400);
    expect((await get('https://api.weather.gov/points/51.5,-0.1')).status).toBe(404);
  });
});

describe('the fake of MET Norway against a real answer', () => {
  it('has the same keys, units and steps', async (context) => {
    const text = realAnswer('metno/lat51.5lon-0.1altitude25_complete.json');
    if (!text) return context.skip(noRealAnswers);
    const real = (JSON.parse(text) as Json).data!;
    const fake = await read(`https://api.met.no/weatherapi/locationforecast/2.0/complete?lat=${place.latitude}&lon=${place.longitude}&altitude=210`);
    expect(keys(fake)).toEqual(keys(real));
    expect(keys(fake.geometry!)).toEqual(keys(real.geometry!));
    expect(fake.properties!.meta!.units).toEqual(real.properties!.meta!.units);
    const shape = (entry: Json): string => JSON.stringify([keys(entry.data!).sort(), keys(entry.data!.instant!.details!), entry.data!.next_1_hours && keys(entry.data!.next_1_hours.details!), entry.data!.next_6_hours && keys(entry.data!.next_6_hours.details!)]);
    const shapes = (answer: Json): Set<string> => new Set(answer.properties!.timeseries!.map(shape));
    expect(shapes(fake)).toEqual(shapes(real));
    // The series ends alike: last hourly step at 17 UTC, then every six hours, the last entry bare.
    expect(shape(fake.properties!.timeseries!.at(-1)!)).toBe(shape(real.properties!.timeseries!.at(-1)!));
  });
});

describe('the fake of Open-Meteo', () => {
  it('has the keys of a real answer', async (context) => {
    const text = realAnswer('open_meteo/forecast_height_levels.json');
    if (!text) return context.skip(noRealAnswers);
    const real = JSON.parse(text) as Json;
    const fake = await read(`https://api.open-meteo.com/v1/forecast?latitude=${place.latitude}&longitude=${place.longitude}&hourly=temperature_80m&timezone=Europe/London&forecast_days=1`);
    expect(keys(fake)).toEqual(keys(real).filter((key) => !key.startsWith('current')));
    expect(fake.hourly_units).toEqual({ time: 'iso8601', temperature_80m: '°C' });
    expect(fake.hourly!.time).toHaveLength(24);
    expect(fake.hourly!.time![0]).toMatch(/^\d{4}-\d\d-\d\dT\d\d:00$/);
    expect([fake.utc_offset_seconds, fake.timezone_abbreviation]).toEqual([3600, 'GMT+1']);
  });

  it('names the members of an ensemble as a real one does', async () => {
    const fake = await read(`https://ensemble-api.open-meteo.com/v1/ensemble?latitude=44&longitude=-72&hourly=temperature_2m&forecast_days=1`);
    expect(keys(fake.hourly!).slice(0, 3)).toEqual(['time', 'temperature_2m', 'temperature_2m_member01']);
    expect(keys(fake.hourly!).at(-1)).toBe('temperature_2m_member30');
  });

  it('refuses a variable that it does not know, in its own words', async () => {
    const answer = await get('https://api.open-meteo.com/v1/forecast?latitude=44&longitude=-72&hourly=happiness');
    expect([answer.status, await answer.json()]).toEqual([400, { error: true, reason: expect.stringContaining('happiness') }]);
  });
});

describe('the rhythm of issues', () => {
  it('is hourly at Open-Meteo, about three-hourly at the National Weather Service and six-hourly at MET Norway', () => {
    const seen = { openMeteo: new Set<number>(), nws: new Set<number>(), metNorway: new Set<number>() };
    for (let turn = 0; turn < 96; turn += 1) {
      for (const id of ['openMeteo', 'nws', 'metNorway'] as const) {
        const { issuedAtMs } = fakes.meant(id, place);
        expect(issuedAtMs).toBeLessThanOrEqual(clock.now().getTime());
        seen[id].add(issuedAtMs);
      }
      step(0.5);
    }
    const counts = [seen.openMeteo.size, seen.nws.size, seen.metNorway.size];
    expect(counts[0]).toBeGreaterThanOrEqual(48);
    expect(counts[1]).toBeGreaterThanOrEqual(16);
    expect(counts[1]).toBeLessThanOrEqual(18);
    expect(counts[2]).toBeGreaterThanOrEqual(8);
    expect(counts[2]).toBeLessThanOrEqual(9);
  });
});
