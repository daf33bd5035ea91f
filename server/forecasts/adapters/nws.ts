import { z } from 'zod';
import { hourMs, saysSomething } from '../hours.ts';
import { JsonClient, type HttpTools } from '../http/json-client.ts';
import { ProviderError, type FetchAnswer, type ForecastProvider, type Place, type Validators } from '../provider.ts';
import { gridHours, gridPlace, gridSchema, pointSchema } from './nws-grid.ts';

const name = 'National Weather Service';
/** Offices renew their grid at least every twelve hours; one more for the way. */
const staleAfterMs = 13 * hourMs;
/** Grids are re-cut now and then; a 404 makes a cell be looked up again at once. */
const pointKeptMs = 14 * 24 * hourMs;

/** Boxes around the contiguous states, Alaska, Hawaii, Puerto Rico with the Virgin Islands, and Guam: south, north, west, east in degrees. */
const covered = [
  [24.4, 49.5, -125, -66.8],
  [51, 71.6, -180, -129.9],
  [18.8, 22.4, -160.4, -154.7],
  [17.6, 18.6, -67.4, -64.5],
  [13.2, 15.4, 144.5, 146.1],
] as const;

/** Refusals are problem documents (RFC 9457). */
const explain = (body: unknown): { reason: string | null } => {
  const told = z.object({ title: z.string() }).safeParse(body);
  return { reason: told.success ? told.data.title : null };
};

/** At most four decimals and no zeros at the end: anything else is redirected. */
const coordinate = (degrees: number): string => String(Number(degrees.toFixed(4)));

/** The US National Weather Service: a point is looked up once, then the raw layers of its grid cell are read. */
export class NationalWeatherService implements ForecastProvider {
  readonly id = 'nws';
  readonly name = name;
  readonly attribution = 'Forecast: NOAA National Weather Service (public domain)';
  readonly #tools: HttpTools;
  readonly #points: JsonClient;
  readonly #grids: JsonClient;
  readonly #cells = new Map<string, { cell: string; untilMs: number }>();

  constructor(tools: HttpTools) {
    this.#tools = tools;
    this.#points = new JsonClient(this.id, name, tools);
    this.#grids = new JsonClient(this.id, name, tools);
  }

  covers({ latitude, longitude }: Place): boolean {
    return covered.some(([south, north, west, east]) => latitude >= south && latitude <= north && longitude >= west && longitude <= east);
  }

  async fetch(place: Place, previous: Validators | null, signal: AbortSignal): Promise<FetchAnswer> {
    const point = `${coordinate(place.latitude)},${coordinate(place.longitude)}`;
    const known = this.#cells.get(point);
    try {
      return await this.#fetchGrid(await this.#cellOf(point, signal), place, previous, signal);
    } catch (error) {
      if (!known || !(error instanceof ProviderError) || error.status !== 404) throw error;
      this.#cells.delete(point);
      return this.#fetchGrid(await this.#cellOf(point, signal), place, null, signal);
    }
  }

  async #cellOf(point: string, signal: AbortSignal): Promise<string> {
    const nowMs = this.#tools.clock.now().getTime();
    const kept = this.#cells.get(point);
    if (kept && nowMs < kept.untilMs) return kept.cell;
    try {
      const answer = await this.#points.get({ url: this.#url(`/points/${point}`), schema: pointSchema, headers: { accept: 'application/geo+json' }, signal, explain });
      if (answer.kind !== 'ok') throw new ProviderError(this.id, 'malformed', `The ${name} answered a question that was not asked.`);
      const { gridId, gridX, gridY } = answer.body.properties;
      const cell = `${gridId}/${gridX},${gridY}`;
      this.#cells.set(point, { cell, untilMs: nowMs + pointKeptMs });
      return cell;
    } catch (error) {
      if (error instanceof ProviderError && error.status === 404) throw new ProviderError(this.id, 'notCovered', `The ${name} has no forecast for ${point}.`, { status: 404, cause: error });
      throw error;
    }
  }

  async #fetchGrid(cell: string, place: Place, previous: Validators | null, signal: AbortSignal): Promise<FetchAnswer> {
    const answer = await this.#grids.get({ url: this.#url(`/gridpoints/${cell}`), schema: gridSchema, headers: { accept: 'application/geo+json' }, previous, signal, explain });
    if (answer.kind === 'notModified') return answer;
    const now = this.#tools.clock.now();
    const issuedAt = new Date(answer.body.properties.updateTime);
    const hours = gridHours(answer.body);
    if (!saysSomething(hours)) throw new ProviderError(this.id, 'malformed', `The ${name} sent a grid without wind or temperature.`);
    // Old grids come with status 200: only their own date tells.
    const lastMs = Date.parse(hours.findLast((hour) => hour.temperature2mC !== null)?.time ?? '');
    if (now.getTime() - issuedAt.getTime() > staleAfterMs || lastMs < now.getTime()) {
      throw new ProviderError(this.id, 'stale', `The ${name}'s grid is of ${issuedAt.toISOString().slice(0, 16)}Z, too old to rely on.`);
    }
    return {
      kind: 'issued',
      forecast: { provider: this.id, model: `NDFD grid ${cell}`, issuedAt, fetchedAt: now, expiresAt: answer.expiresAt, place: gridPlace(answer.body, place), hours, validators: answer.validators },
    };
  }

  #url(path: string): URL {
    return new URL(path, 'https://api.weather.gov');
  }
}
