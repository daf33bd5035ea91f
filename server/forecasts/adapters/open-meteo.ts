import { saysSomething } from '../hours.ts';
import { JsonClient, type HttpTools, type JsonAnswer } from '../http/json-client.ts';
import { ProviderError, type EnsembleProvider, type FetchAnswer, type ForecastProvider, type IssuedEnsemble, type Place, type Validators } from '../provider.ts';
import { canonicalHours, explainRefusal, hourlyVariables, memberSuffixes, openMeteoSchema, placeOf, withCertainRain, type OpenMeteoAnswer } from './open-meteo-answer.ts';
import { issuedAtOf, nextRunAt, runSchema, tokenOf, type ModelRun } from './open-meteo-runs.ts';

export interface OpenMeteoSettings {
  /** Key of the paid plan; without one the free, non-commercial hosts are asked. */
  apiKey: string | null;
  /** A seamless blend, as the provider names it. */
  model: string;
  ensembleModel: string;
  /** Runs that the blend is made of, by the provider's meta names: the finer one only inside its own area. */
  globalRuns: readonly string[];
  regionalRuns: readonly string[];
}
export const defaultOpenMeteoSettings: OpenMeteoSettings = { apiKey: null, model: 'gfs_seamless', ensembleModel: 'gfs_seamless', globalRuns: ['ncep_gfs013'], regionalRuns: ['ncep_hrrr_conus'] };

const name = 'Open-Meteo';
const attribution = 'Weather data by Open-Meteo.com (CC BY 4.0)';
/** A run every 6 h, some 5 h on the way: beyond this age at least one run was lost. */
const staleAfterMs = 13 * 3_600_000;

/** The contiguous United States, roughly: where the finer model runs. */
const insideRegion = ({ latitude, longitude }: Place): boolean => latitude > 24 && latitude < 50 && longitude > -126 && longitude < -66;

/**
 * Open-Meteo's forecast and ensemble calls. Times are asked for as unix seconds in UTC and speeds in m/s, but stamps and
 * units are read from the answer all the same. The answer does not tell its model run; that is asked for apart.
 */
export class OpenMeteo implements ForecastProvider, EnsembleProvider {
  readonly id = 'openMeteo';
  readonly name = name;
  readonly attribution = attribution;
  readonly #tools: HttpTools;
  readonly #settings: OpenMeteoSettings;
  readonly #forecasts: JsonClient;
  readonly #ensembles: JsonClient;
  readonly #runs: JsonClient;

  constructor(tools: HttpTools, settings: OpenMeteoSettings) {
    this.#tools = tools;
    this.#settings = settings;
    this.#forecasts = new JsonClient(this.id, name, tools);
    this.#ensembles = new JsonClient(this.id, `${name} (ensemble)`, tools);
    // Nice to have: one try, and a circuit of its own that leaves the forecast's alone.
    this.#runs = new JsonClient(this.id, `${name} (model runs)`, { ...tools, settings: { ...tools.settings, attempts: 1 } });
  }

  covers(): boolean {
    return true;
  }

  async fetch(place: Place, previous: Validators | null, signal: AbortSignal): Promise<FetchAnswer> {
    const { clock } = this.#tools;
    const runs = await this.#newestRuns(insideRegion(place) ? [...this.#settings.regionalRuns, ...this.#settings.globalRuns] : this.#settings.globalRuns, signal);
    const token = tokenOf(runs, clock.now());
    const issuedAt = issuedAtOf(runs);
    if (issuedAt && clock.now().getTime() - issuedAt.getTime() > staleAfterMs) {
      throw new ProviderError(this.id, 'stale', `${name}'s newest model run is of ${issuedAt.toISOString().slice(0, 16)}Z, too old to rely on.`);
    }
    if (token !== null && previous?.etag === token) return { kind: 'notModified', expiresAt: nextRunAt(runs, clock.now()) };
    const url = this.#url('api', '/v1/forecast', place, { hourly: hourlyVariables, models: this.#settings.model, forecast_days: 8, past_days: 1 });
    const { body, expiresAt } = await this.#ask(this.#forecasts, url, signal);
    const hours = canonicalHours(body);
    if (!saysSomething(hours)) throw new ProviderError(this.id, 'malformed', `${name} sent hours without wind or temperature.`);
    return {
      kind: 'issued',
      forecast: {
        provider: this.id,
        model: this.#settings.model,
        issuedAt,
        fetchedAt: clock.now(),
        expiresAt: nextRunAt(runs, clock.now()) ?? expiresAt,
        place: placeOf(body),
        hours,
        validators: { etag: token, lastModified: null },
      },
    };
  }

  async fetchEnsemble(place: Place, signal: AbortSignal): Promise<IssuedEnsemble> {
    const variables = hourlyVariables.filter((variable) => variable !== 'precipitation_probability');
    const url = this.#url('ensemble-api', '/v1/ensemble', place, { hourly: variables, models: this.#settings.ensembleModel, forecast_days: 7, past_days: 1 });
    const { body, expiresAt } = await this.#ask(this.#ensembles, url, signal);
    const members = memberSuffixes(body).map((suffix) => withCertainRain(canonicalHours(body, suffix))).filter(saysSomething);
    if (members.length === 0) throw new ProviderError(this.id, 'malformed', `${name} sent an ensemble without wind or temperature.`);
    return { provider: this.id, model: this.#settings.ensembleModel, issuedAt: null, fetchedAt: this.#tools.clock.now(), expiresAt, place: placeOf(body), members };
  }

  async #ask(client: JsonClient, url: URL, signal: AbortSignal): Promise<Extract<JsonAnswer<OpenMeteoAnswer>, { kind: 'ok' }>> {
    const answer = await client.get({ url, schema: openMeteoSchema, signal, explain: explainRefusal });
    // No validators were sent, so 304 cannot come.
    if (answer.kind !== 'ok') throw new ProviderError(this.id, 'malformed', `${name} answered a question that was not asked.`);
    return answer;
  }

  /** Without word on the runs the forecast is still good; only its age and the sparing of questions are lost. */
  async #newestRuns(models: readonly string[], signal: AbortSignal): Promise<ModelRun[]> {
    try {
      return await Promise.all(
        models.map(async (model) => {
          const url = this.#url('api', `/data/${model}/static/meta.json`, null, {});
          const answer = await this.#runs.get({ url, schema: runSchema, signal });
          if (answer.kind !== 'ok') throw new ProviderError(this.id, 'malformed', `${name} answered a question that was not asked.`);
          return { ...answer.body, model };
        }),
      );
    } catch (error) {
      if (error instanceof ProviderError) return [];
      throw error;
    }
  }

  #url(host: string, path: string, place: Place | null, query: Record<string, string | number | readonly string[]>): URL {
    const { apiKey } = this.#settings;
    const url = new URL(path, `https://${apiKey ? 'customer-' : ''}${host}.open-meteo.com`);
    const whole = place
      ? {
          latitude: place.latitude.toFixed(4),
          longitude: place.longitude.toFixed(4),
          ...(place.elevationM === null ? {} : { elevation: Math.round(place.elevationM) }),
          ...query,
          wind_speed_unit: 'ms',
          timeformat: 'unixtime',
          timezone: 'GMT',
        }
      : query;
    for (const [key, value] of Object.entries(whole)) url.searchParams.set(key, Array.isArray(value) ? value.join(',') : String(value));
    if (apiKey) url.searchParams.set('apikey', apiKey);
    return url;
  }
}
