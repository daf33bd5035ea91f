import { http, HttpResponse } from 'msw';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { ProviderError, ProviderId } from '../../server/forecasts/provider.ts';
import { issued, place, stage, userAgent } from './support.ts';

let scene = stage();
beforeEach(() => {
  scene = stage();
  scene.server.listen({ onUnhandledRequest: 'error' });
});
afterEach(() => scene.server.close());

const failure = async (id: ProviderId): Promise<ProviderError> =>
  scene.ask(id).then(
    () => {
      throw new Error(`${id} answered though it should not have.`);
    },
    (error: ProviderError) => error,
  );
const asked = (part: string): number => scene.fakes.requests.filter(({ url }) => url.includes(part)).length;
const forecastCall: Record<ProviderId, string> = { openMeteo: '/v1/forecast', nws: '/points/', metNorway: '/locationforecast/' };
const all = ['openMeteo', 'nws', 'metNorway'] as const;

describe.each(all)('when %s has its troubles', (id) => {
  it('a server error is tried three times, with waits of full jitter between', async () => {
    scene.fakes.setMood(id, 'error500');
    expect(await failure(id)).toMatchObject({ kind: 'http', status: 500, provider: id });
    expect(asked(forecastCall[id])).toBe(3);
    // random() is one half: half of 1 s, then half of 2 s.
    expect(scene.sleeps.slice(-2)).toEqual([500, 1000]);
  });

  it('a single bad moment goes unnoticed', async () => {
    let bad = 1;
    scene.server.use(http.get('https://*', ({ request }) => (request.url.includes(forecastCall[id]) && bad-- > 0 ? new HttpResponse('busy', { status: 503 }) : undefined)));
    expect(issued(await scene.ask(id)).hours.length).toBeGreaterThan(100);
    expect(scene.sleeps).toEqual([500]);
  });

  it('“too many requests” is obeyed: no second try, and the wait that was asked for is told on', async () => {
    scene.fakes.setMood(id, 'tooMany');
    const error = await failure(id);
    expect(error).toMatchObject({ kind: 'rateLimited', status: 429, retryAfterMs: id === 'openMeteo' ? 60_000 : 30_000 });
    expect(asked(forecastCall[id])).toBe(1);
    // Until then nobody knocks again.
    expect(await failure(id)).toMatchObject({ kind: 'circuitOpen' });
    expect(asked(forecastCall[id])).toBe(1);
    scene.fakes.setMood(id, 'ok');
    scene.step(1 / 30);
    expect(issued(await scene.ask(id)).provider).toBe(id);
  });

  it('an answer that trickles and stalls ends in a time-out', async () => {
    scene.fakes.setMood(id, 'slow');
    const error = await failure(id);
    expect(error).toMatchObject({ kind: 'timeout', status: null });
    expect(error.message).toMatch(/did not answer within 10 s/);
    expect(asked(forecastCall[id])).toBe(3);
  });

  it('JSON cut off in the middle is malformed, after another try', async () => {
    scene.fakes.setMood(id, 'cut');
    expect(await failure(id)).toMatchObject({ kind: 'malformed' });
    expect(asked(forecastCall[id])).toBe(3);
  });

  it('an old forecast is refused though its status is 200', async () => {
    scene.fakes.setMood(id, 'stale');
    const error = await failure(id);
    expect(error).toMatchObject({ kind: 'stale' });
    expect(error.message).toMatch(/too old to rely on/);
  });

  it('a refusal in HTML is told as its status and not tried again', async () => {
    scene.fakes.setMood(id, 'denied');
    expect(await failure(id)).toMatchObject({ kind: 'http', status: 403 });
    expect(asked(forecastCall[id])).toBe(1);
    // Whoever refuses is up: the circuit stays closed, however often it happens.
    for (let turn = 0; turn < 4; turn += 1) expect(await failure(id)).toMatchObject({ status: 403 });
  });

  it('a page of HTML with status 200 is no forecast', async () => {
    scene.server.use(http.get('https://*', () => HttpResponse.html('<h1>Maintenance</h1>')));
    expect(await failure(id)).toMatchObject({ kind: 'malformed' });
  });

  it('valid JSON of another shape is malformed, and the message names the place', async () => {
    scene.server.use(http.get('https://*', () => HttpResponse.json({ properties: { gridId: 'TST', gridX: 1, gridY: 'north' }, hourly: [] })));
    const error = await failure(id);
    expect(error.kind).toBe('malformed');
    expect(error.message).toMatch(/\((latitude|properties\.gridY|geometry): /);
  });

  it('a body without end is cut off at its bound', async () => {
    scene = stage(undefined, { http: { maxBodyBytes: 20_000, attempts: 1 } });
    scene.server.listen({ onUnhandledRequest: 'error' });
    scene.server.use(http.get('https://*', () => new HttpResponse(new ReadableStream({ pull: (controller) => controller.enqueue(new Uint8Array(8_192).fill(32)) }))));
    const error = await failure(id);
    expect(error).toMatchObject({ kind: 'malformed' });
    expect(error.message).toMatch(/more than 20000 bytes/);
  });

  it('a connection that breaks is tried again and then told', async () => {
    scene.server.use(http.get('https://*', () => HttpResponse.error()));
    const error = await failure(id);
    expect(error).toMatchObject({ kind: 'http', status: null });
    expect(error.message).toMatch(/could not be reached/);
  });

  it('three failures in a row open the circuit; after the rest one probe goes out, and a good one closes it', async () => {
    scene.fakes.setMood(id, 'error500');
    for (let turn = 0; turn < 3; turn += 1) expect((await failure(id)).kind).toBe('http');
    const before = asked(forecastCall[id]);
    const shut = await failure(id);
    expect(shut).toMatchObject({ kind: 'circuitOpen', retryAfterMs: 5 * 60_000 });
    expect(asked(forecastCall[id])).toBe(before);
    scene.step(6 / 60);
    // The probe fails, so the rest doubles.
    expect((await failure(id)).kind).toBe('http');
    scene.step(6 / 60);
    expect((await failure(id)).kind).toBe('circuitOpen');
    scene.fakes.setMood(id, 'ok');
    scene.step(6 / 60);
    expect(issued(await scene.ask(id)).provider).toBe(id);
    scene.fakes.setMood(id, 'error500');
    scene.step(1);
    expect((await failure(id)).kind).toBe('http');
  });

  it('a missing layer stays missing and is never zero', async () => {
    scene.fakes.setMood(id, 'missingLayer');
    const { hours } = issued(await scene.ask(id));
    const gone = ({ openMeteo: ['windGust10mMs', 'temperature80mC'], nws: ['windGust10mMs'], metNorway: ['cloudCoverPct'] } as const)[id];
    for (const field of gone) expect(hours.every((hour) => hour[field] === null), field).toBe(true);
    expect(hours.some((hour) => hour.windSpeed10mMs !== null)).toBe(true);
  });

  it('the asker may give up, and that is not held against the provider', async () => {
    scene.fakes.setMood(id, 'slow');
    const asker = new AbortController();
    const question = scene.provider(id).fetch(place, null, asker.signal);
    asker.abort(new Error('the server is closing'));
    await expect(question).rejects.toThrow('the server is closing');
    scene.fakes.setMood(id, 'ok');
    expect(issued(await scene.ask(id)).provider).toBe(id);
  });

  it('says who asks and how to reach them', async () => {
    await scene.ask(id);
    expect(new Set(scene.fakes.requests.map(({ headers }) => headers['user-agent']))).toEqual(new Set([userAgent]));
  });

  it('asked again before anything is newer, it says so, and tells a new issue from the old', async () => {
    const first = issued(await scene.ask(id));
    const again = await scene.ask(id, first);
    expect(again.kind).toBe('notModified');
    expect(again.kind === 'notModified' && again.expiresAt!.getTime()).toBeGreaterThan(scene.clock.now().getTime());
    scene.step(7);
    const later = issued(await scene.ask(id, first));
    expect(later.issuedAt!.getTime()).toBeGreaterThan(first.issuedAt!.getTime());
    expect(later.validators).not.toEqual(first.validators);
  });
});

describe('a wait that the provider asks for', () => {
  it('is kept when short, in seconds or as a date by the provider’s own clock', async () => {
    const waits = [{ 'retry-after': '4' }, { date: 'Wed, 20 May 2026 11:00:00 GMT', 'retry-after': 'Wed, 20 May 2026 11:00:07 GMT' }];
    scene.server.use(http.get('https://api.met.no/*', () => {
      const headers = waits.shift();
      return headers ? new HttpResponse('', { status: 429, headers }) : undefined;
    }));
    expect(issued(await scene.ask('metNorway')).provider).toBe('metNorway');
    expect(scene.sleeps).toEqual([4000, 7000]);
  });
});

describe('Open-Meteo', () => {
  it('still gives a forecast when its word on the model runs is missing; only the age is unknown', async () => {
    scene.server.use(http.get('https://api.open-meteo.com/data/*', () => new HttpResponse('', { status: 500 })));
    const forecast = issued(await scene.ask('openMeteo'));
    expect([forecast.issuedAt, forecast.validators.etag]).toEqual([null, null]);
    expect(forecast.hours.length).toBeGreaterThan(200);
  });

  it('asks the paid hosts with the key when there is one, and keeps the key out of its errors', async () => {
    scene = stage(undefined, { openMeteo: { apiKey: 'k-e-y' } });
    scene.server.listen({ onUnhandledRequest: 'error' });
    await scene.ask('openMeteo');
    expect(scene.fakes.requests.every(({ url }) => url.startsWith('https://customer-api.') && url.includes('apikey=k-e-y'))).toBe(true);
    scene.fakes.setMood('openMeteo', 'error500');
    expect((await failure('openMeteo')).message).not.toContain('k-e-y');
  });

  it('reads units and local times from the answer when they are not those it asked for', async () => {
    const meant = issued(await scene.ask('openMeteo'));
    let turned = 0;
    scene.server.use(
      http.get('https://api.open-meteo.com/v1/forecast', ({ request }) => {
        const url = new URL(request.url);
        if (url.searchParams.get('timezone') !== 'GMT') return undefined;
        turned += 1;
        for (const [name, value] of Object.entries({ wind_speed_unit: 'mph', temperature_unit: 'fahrenheit', precipitation_unit: 'inch', timeformat: 'iso8601', timezone: 'America/New_York' })) url.searchParams.set(name, value);
        return fetch(url, { headers: request.headers });
      }),
    );
    const told = issued(await scene.ask('openMeteo'));
    expect(turned).toBe(1);
    expect(told.hours.map((hour) => hour.time)).toEqual(meant.hours.map((hour) => hour.time));
    told.hours.slice(0, -1).forEach((hour, index) => {
      expect(hour.windSpeed10mMs).toBeCloseTo(meant.hours[index]!.windSpeed10mMs!, 1);
      expect(hour.temperature2mC).toBeCloseTo(meant.hours[index]!.temperature2mC!, 0);
      expect(hour.precipitationMm).toBeCloseTo(meant.hours[index]!.precipitationMm!, 1);
    });
  });

  it('takes impossible values and values of an unknown unit for unknown', async () => {
    const good = issued(await scene.ask('openMeteo'));
    scene.server.use(
      http.get('https://api.open-meteo.com/v1/forecast', () =>
        HttpResponse.json({
          latitude: 44, longitude: -72, utc_offset_seconds: 0,
          hourly_units: { time: 'unixtime', temperature_2m: '°C', wind_speed_10m: 'm/s', wind_gusts_10m: 'furlongs/fortnight', relative_humidity_2m: '%', precipitation: 'mm', wind_direction_10m: '°' },
          hourly: { time: [1779235200, 1779238800], temperature_2m: [4000, 11], wind_speed_10m: [-3, 2], wind_gusts_10m: [4, 4], relative_humidity_2m: [140, 100.4], precipitation: [0, -1], wind_direction_10m: [360, 725] },
        }),
      ),
    );
    const { hours } = issued(await scene.ask('openMeteo'));
    expect(good.hours.length).toBeGreaterThan(2);
    expect(hours).toHaveLength(2);
    expect(hours[0]).toMatchObject({ temperature2mC: null, windSpeed10mMs: null, windGust10mMs: null, relativeHumidityPct: null, precipitationMm: null, windFromDeg: 0 });
    expect(hours[1]).toMatchObject({ temperature2mC: 11, windSpeed10mMs: 2, relativeHumidityPct: 100, windFromDeg: 5, precipitationMm: null });
  });
});

describe('the National Weather Service', () => {
  it('is asked for a point once and for its grid each time', async () => {
    await scene.ask('nws');
    await scene.ask('nws');
    expect([asked('/points/'), asked('/gridpoints/')]).toEqual([1, 2]);
    scene.step(15 * 24);
    await scene.ask('nws');
    expect(asked('/points/')).toBe(2);
  });

  it('is asked for the point anew when its grid was re-cut', async () => {
    await scene.ask('nws');
    let gone = 1;
    scene.server.use(http.get('https://api.weather.gov/gridpoints/*', () => (gone-- > 0 ? HttpResponse.json({ title: 'Not Found' }, { status: 404 }) : undefined)));
    expect(issued(await scene.ask('nws')).provider).toBe('nws');
    expect(asked('/points/')).toBe(2);
  });

  it('covers its own country and says so of a point it does not know', async () => {
    const nws = scene.provider('nws');
    expect(nws.covers(place)).toBe(true);
    expect(nws.covers({ latitude: 61.2, longitude: -149.9, elevationM: 40 })).toBe(true);
    expect(nws.covers({ latitude: 51.5, longitude: -0.1, elevationM: 20 })).toBe(false);
    scene.server.use(http.get('https://api.weather.gov/points/*', () => HttpResponse.json({ title: 'Data Unavailable For Requested Point' }, { status: 404 })));
    expect(await failure('nws')).toMatchObject({ kind: 'notCovered', status: 404 });
  });

  it('is not pinned to an old grid by a date of last change that lies in the future', async () => {
    const first = issued(await scene.ask('nws'));
    await scene.provider('nws').fetch(place, { etag: null, lastModified: 'Thu, 21 May 2026 00:00:00 GMT' }, new AbortController().signal);
    expect(scene.fakes.requests.at(-1)!.headers['if-modified-since']).toBeUndefined();
    await scene.ask('nws', first);
    expect(scene.fakes.requests.at(-1)!.headers).toMatchObject({ 'if-none-match': first.validators.etag!, 'if-modified-since': first.validators.lastModified! });
  });
});

describe('MET Norway', () => {
  it('is not asked again before its answer expires', async () => {
    const first = issued(await scene.ask('metNorway'));
    scene.step(0.4);
    expect((await scene.ask('metNorway', first)).kind).toBe('notModified');
    expect(asked('/locationforecast/')).toBe(1);
    scene.step(0.2);
    expect((await scene.ask('metNorway', first)).kind).toBe('notModified');
    expect(asked('/locationforecast/')).toBe(2);
  });

  it('has its word passed on when it marks the version as soon to end', async () => {
    scene.server.use(http.get('https://api.met.no/*', async ({ request }) => {
      if (request.headers.has('x-passed')) return undefined;
      const answer = await fetch(request.url, { headers: { ...Object.fromEntries(request.headers), 'x-passed': '1' } });
      return new HttpResponse(answer.body, { status: 203, headers: answer.headers });
    }));
    await scene.ask('metNorway');
    expect(scene.warnings).toEqual([expect.stringMatching(/MET Norway marks .* as deprecated/)]);
  });
});
