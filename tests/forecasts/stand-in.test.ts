import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { fetchForecast } from '../../server/forecasts/fetch-forecast.ts';
import type { ProviderError } from '../../server/forecasts/provider.ts';
import { issued, place, stage } from './support.ts';

let scene = stage();
beforeEach(() => {
  scene = stage();
  scene.server.listen({ onUnhandledRequest: 'error' });
});
afterEach(() => scene.server.close());

const london = { latitude: 51.5, longitude: -0.1, elevationM: 20 };
const hostsAsked = (): string[] => [...new Set(scene.fakes.requests.map(({ url }) => new URL(url).hostname))];

describe('a farm’s forecast', () => {
  it('comes from the first provider while that one answers, and nobody else is asked', async () => {
    const { answer, provider, standInBecause, failures } = await fetchForecast(scene.providers, place, null);
    expect([issued(answer).provider, provider, standInBecause, failures]).toEqual(['openMeteo', 'openMeteo', null, []]);
    expect(hostsAsked()).toEqual(['api.open-meteo.com']);
  });

  it('comes from the second when the first fails, and says in a sentence why', async () => {
    scene.fakes.setMood('openMeteo', 'error500');
    const { answer, provider, standInBecause } = await fetchForecast(scene.providers, place, null);
    expect([issued(answer).provider, provider]).toEqual(['nws', 'nws']);
    expect(standInBecause).toBe('Open-Meteo answered with status 500 (“Internal Server Error”).');
  });

  it('comes from the third when two fail, each named', async () => {
    scene.fakes.setMood('openMeteo', 'stale');
    scene.fakes.setMood('nws', 'cut');
    const { answer, standInBecause, failures } = await fetchForecast(scene.providers, place, null);
    expect(issued(answer).provider).toBe('metNorway');
    expect(failures.map(({ kind }) => kind)).toEqual(['stale', 'malformed']);
    expect(standInBecause).toMatch(/^Open-Meteo's newest model run is of .* The|^Open-Meteo's .*National Weather Service sent/);
  });

  it('passes over a provider that does not cover the place, without a word', async () => {
    scene.fakes.setMood('openMeteo', 'error500');
    const { provider, failures } = await fetchForecast(scene.providers, london, null);
    expect([provider, failures.map((failure) => failure.provider)]).toEqual(['metNorway', ['openMeteo']]);
    expect(hostsAsked()).toEqual(['api.open-meteo.com', 'api.met.no']);
  });

  it('fails with the reasons of all when none answers', async () => {
    for (const id of ['openMeteo', 'nws', 'metNorway'] as const) scene.fakes.setMood(id, 'error500');
    const error = await fetchForecast(scene.providers, place, null).catch((thrown: ProviderError) => thrown);
    expect(error).toMatchObject({ name: 'ProviderError', kind: 'http', provider: 'openMeteo', status: 500 });
    expect((error as Error).message).toMatch(/Open-Meteo .*National Weather Service .*MET Norway /);
    expect(((error as Error).cause as AggregateError).errors).toHaveLength(3);
  });

  it('is refused plainly when no provider covers the place', async () => {
    await expect(fetchForecast([scene.provider('nws')], london, null)).rejects.toMatchObject({ kind: 'notCovered', message: 'No forecast provider covers 51.50, -0.10.' });
  });

  it('shows validators only to the provider that gave them', async () => {
    scene.fakes.setMood('openMeteo', 'error500');
    const { validators, provider } = issued((await fetchForecast(scene.providers, place, null)).answer);
    const again = await fetchForecast(scene.providers, place, { provider, validators });
    expect([again.answer.kind, again.provider, again.standInBecause === null]).toEqual(['notModified', 'nws', false]);
    scene.fakes.setMood('openMeteo', 'ok');
    scene.step(0.2);
    const back = await fetchForecast(scene.providers, place, { provider, validators });
    expect([back.answer.kind, back.provider, back.standInBecause]).toEqual(['issued', 'openMeteo', null]);
    // Another's date of last change would make MET Norway keep its own forecast to itself.
    const other = await fetchForecast([scene.provider('metNorway')], place, { provider: 'nws', validators: { etag: '"x"', lastModified: scene.clock.now().toUTCString() } });
    expect(other.answer.kind).toBe('issued');
    expect(scene.fakes.requests.at(-1)!.headers).not.toHaveProperty('if-modified-since');
  });

  it('stops asking when the asker gives up, instead of going on to the next', async () => {
    scene.fakes.setMood('openMeteo', 'slow');
    const asker = new AbortController();
    const question = fetchForecast(scene.providers, place, null, asker.signal);
    asker.abort(new Error('the server is closing'));
    await expect(question).rejects.toThrow('the server is closing');
    expect(hostsAsked()).not.toContain('api.weather.gov');
  });

  it('is never spoiled by a fault of our own: what is no provider’s failure is thrown on', async () => {
    const broken = { ...scene.provider('nws'), covers: () => true, fetch: () => Promise.reject(new RangeError('a bug')) };
    await expect(fetchForecast([broken, scene.provider('metNorway')], place, null)).rejects.toThrow(RangeError);
  });
});
