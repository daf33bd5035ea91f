import type { ForecastHour } from '../../shared/assessment/case.ts';
import { createWeather, type Weather } from '../weather/create-weather.ts';

export const hourMs = 3_600_000;

/** The forecast that a fake service means to tell, before it is put into the service's format. */
export interface Meant {
  issuedAtMs: number;
  hours: Map<number, ForecastHour>;
}

/** One true sky for all fakes: services differ in their errors, not in the weather. */
export class Skies {
  readonly #seed: number;
  readonly #weathers = new Map<string, Weather>();
  readonly #issues = new Map<string, Meant>();

  constructor(seed: number) {
    this.#seed = seed;
  }

  /** The weather over a place; places within about a kilometre share it. */
  over(latitude: number, longitude: number, elevationM: number): Weather {
    const key = `${latitude.toFixed(2)},${longitude.toFixed(2)},${elevationM}`;
    let weather = this.#weathers.get(key);
    if (!weather) this.#weathers.set(key, (weather = createWeather({ seed: this.#seed, latitude: Number(latitude.toFixed(2)), longitude: Number(longitude.toFixed(2)), elevationM })));
    return weather;
  }

  /** What `source` says at its issue of `issuedAtMs`; the last few are remembered. */
  issue(weather: Weather, source: string, issuedAtMs: number, fromMs: number, toMs: number): Meant {
    const { latitude, longitude, elevationM } = weather.place;
    const key = [source, latitude, longitude, elevationM, issuedAtMs, fromMs, toMs].join('/');
    const kept = this.#issues.get(key);
    if (kept) return kept;
    const startMs = Math.floor(issuedAtMs / hourMs) * hourMs;
    const hours = weather.issueAt(issuedAtMs, { source, pastHours: Math.max(0, Math.round((startMs - fromMs) / hourMs)), futureHours: Math.max(1, Math.round((toMs - startMs) / hourMs)) });
    const meant = { issuedAtMs, hours: new Map(hours.map((hour) => [Date.parse(hour.time), hour])) };
    // A Map keeps its order, so the first key is the oldest.
    if (this.#issues.size > 400) this.#issues.delete(this.#issues.keys().next().value ?? '');
    this.#issues.set(key, meant);
    return meant;
  }
}

/** Start of the newest run of a model that starts every `intervalH` hours and is `delayMs` on the way. */
export const newestRunMs = (nowMs: number, intervalH: number, delayMs: number): number => Math.floor((nowMs - delayMs) / (intervalH * hourMs)) * intervalH * hourMs;

/** How far back the clock of a service in the mood `stale` stands. */
export const staleByMs = 30 * hourMs;

/** HTTP date. */
export const httpDate = (atMs: number): string => new Date(atMs).toUTCString();
export const rounded = (value: number, decimals: number): number => Math.round(value * 10 ** decimals) / 10 ** decimals;
