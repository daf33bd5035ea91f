import type { HttpHandler } from 'msw';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import type { Weather } from '../weather/create-weather.ts';
import { metNorwayFake } from './met-norway.ts';
import { moods, type Mood } from './mood.ts';
import { nwsFake } from './nws.ts';
import { openMeteoFake } from './open-meteo.ts';
import { Skies } from './skies.ts';

export { moods, type Mood };
export type FakeProvider = 'openMeteo' | 'nws' | 'metNorway';

/** A question that reached a fake. */
export interface SeenRequest {
  provider: FakeProvider;
  url: string;
  headers: Record<string, string>;
}

/** What the fakes share. */
export interface FakeTools {
  clock: { now(): Date };
  skies: Skies;
  moodOf(provider: FakeProvider): Mood;
  note(provider: FakeProvider, request: Request): void;
  /** Height of the ground where a question does not tell it, metres. */
  elevationM: number;
}

export interface ProviderFakes {
  /** For msw's `setupServer`. */
  handlers: HttpHandler[];
  setMood(provider: FakeProvider, mood: Mood): void;
  /** Newest last; only so many are kept. */
  requests: readonly SeenRequest[];
  /** The hours that a provider means to tell now, by start of hour in epoch milliseconds: what its adapter must bring home. */
  meant(provider: FakeProvider, place: { latitude: number; longitude: number; elevationM: number }): { issuedAtMs: number; hours: Map<number, ForecastHour> };
  /** The same for each member of the ensemble, the control run first. */
  meantMembers(place: { latitude: number; longitude: number; elevationM: number }): Map<number, ForecastHour>[];
  /** The true weather there, for readings and for checking forecasts against. */
  weatherOver(place: { latitude: number; longitude: number; elevationM: number }): Weather;
}

const requestsKept = 500;

/**
 * Fakes of the three forecast services in their real formats, over one weather generator and one clock, so that stepping
 * the clock steps the weather, the model runs and the HTTP dates alike.
 */
export function createProviderFakes({ clock, seed, elevationM = 210 }: { clock: { now(): Date }; seed: number; elevationM?: number }): ProviderFakes {
  const moodsNow: Record<FakeProvider, Mood> = { openMeteo: 'ok', nws: 'ok', metNorway: 'ok' };
  const requests: SeenRequest[] = [];
  const skies = new Skies(seed);
  const tools: FakeTools = {
    clock,
    skies,
    elevationM,
    moodOf: (provider) => moodsNow[provider],
    note(provider, request) {
      requests.push({ provider, url: request.url, headers: Object.fromEntries(request.headers) });
      if (requests.length > requestsKept) requests.shift();
    },
  };
  const openMeteo = openMeteoFake(tools);
  const nws = nwsFake(tools);
  const metNorway = metNorwayFake(tools);
  const question = (place: { latitude: number; longitude: number; elevationM: number }, days: number): URLSearchParams =>
    new URLSearchParams({ latitude: place.latitude.toFixed(4), longitude: place.longitude.toFixed(4), elevation: String(Math.round(place.elevationM)), forecast_days: String(days), past_days: '1' });
  return {
    handlers: [...openMeteo.handlers, ...nws.handlers, ...metNorway.handlers],
    setMood(provider, mood) {
      moodsNow[provider] = mood;
    },
    requests,
    meant(provider, place) {
      if (provider === 'openMeteo') return openMeteo.meant(question(place, 8));
      return provider === 'nws' ? nws.meant(place.latitude, place.longitude) : metNorway.meant(place.latitude, place.longitude, Math.round(place.elevationM));
    },
    meantMembers: (place) => openMeteo.members(question(place, 7)).map(({ meant }) => meant.hours),
    weatherOver: (place) => skies.over(place.latitude, place.longitude, Math.round(place.elevationM)),
  };
}
