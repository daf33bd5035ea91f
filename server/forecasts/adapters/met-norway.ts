import { hourMs, saysSomething } from '../hours.ts';
import { JsonClient, type HttpTools } from '../http/json-client.ts';
import { ProviderError, type FetchAnswer, type ForecastProvider, type Place, type Validators } from '../provider.ts';
import { metHours, metPlace, metSchema } from './met-norway-answer.ts';

const name = 'MET Norway';
/** Renewed every six hours outside the Nordic area, and half a day old in real answers: beyond this, two runs were lost. */
const staleAfterMs = 18 * hourMs;

/** MET Norway's Locationforecast 2.0 in its complete form. Its terms: say who asks, four decimals at most, never before `Expires`. */
export class MetNorway implements ForecastProvider {
  readonly id = 'metNorway';
  readonly name = name;
  readonly attribution = 'Forecast: MET Norway (CC BY 4.0)';
  readonly #tools: HttpTools;
  readonly #client: JsonClient;
  /** The newest answer's expiry and date by address: asking sooner is against the terms. */
  readonly #notBefore = new Map<string, { lastModified: string; expiresAt: Date }>();

  constructor(tools: HttpTools) {
    this.#tools = tools;
    this.#client = new JsonClient(this.id, name, tools);
  }

  covers(): boolean {
    return true;
  }

  async fetch(place: Place, previous: Validators | null, signal: AbortSignal): Promise<FetchAnswer> {
    const url = new URL('https://api.met.no/weatherapi/locationforecast/2.0/complete');
    url.searchParams.set('lat', String(Number(place.latitude.toFixed(4))));
    url.searchParams.set('lon', String(Number(place.longitude.toFixed(4))));
    if (place.elevationM !== null) url.searchParams.set('altitude', String(Math.round(place.elevationM)));
    const kept = this.#notBefore.get(url.href);
    if (kept && previous?.lastModified === kept.lastModified && this.#tools.clock.now() < kept.expiresAt) return { kind: 'notModified', expiresAt: kept.expiresAt };
    const answer = await this.#client.get({ url, schema: metSchema, previous, signal });
    const lastModified = answer.kind === 'ok' ? answer.validators.lastModified : (previous?.lastModified ?? null);
    if (lastModified && answer.expiresAt) this.#notBefore.set(url.href, { lastModified, expiresAt: answer.expiresAt });
    if (answer.kind === 'notModified') return answer;
    const now = this.#tools.clock.now();
    const issuedAt = new Date(answer.body.properties.meta.updated_at);
    if (now.getTime() - issuedAt.getTime() > staleAfterMs) {
      throw new ProviderError(this.id, 'stale', `${name}'s forecast is of ${issuedAt.toISOString().slice(0, 16)}Z, too old to rely on.`);
    }
    const hours = metHours(answer.body);
    if (!saysSomething(hours)) throw new ProviderError(this.id, 'malformed', `${name} sent hours without wind or temperature.`);
    return {
      kind: 'issued',
      forecast: { provider: this.id, model: 'Locationforecast 2.0', issuedAt, fetchedAt: now, expiresAt: answer.expiresAt, place: metPlace(answer.body), hours, validators: answer.validators },
    };
  }
}
