import type { z } from 'zod';
import type { Clock } from '../../clock/clock.ts';
import { ProviderError, type ProviderId, type Validators } from '../provider.ts';
import { fullJitterMs, type Backoff } from './backoff.ts';
import { CircuitBreaker, type BreakerSettings } from './circuit-breaker.ts';
import { answeredAt, expiryOf } from './expiry.ts';
import { BodyTooLarge, readBoundedText } from './read-body.ts';
import { retryAfterMs } from './retry-after.ts';

export interface HttpSettings {
  /** For one try, body included. */
  timeoutMs: number;
  maxBodyBytes: number;
  /** Tries for one question. */
  attempts: number;
  backoff: Backoff;
  /** A longer `Retry-After` is not waited for: the question fails, and the circuit rests that long. */
  longestWaitMs: number;
  breaker: BreakerSettings;
}
export const defaultHttpSettings: HttpSettings = {
  timeoutMs: 10_000,
  maxBodyBytes: 5_000_000,
  attempts: 3,
  backoff: { baseMs: 1_000, capMs: 8_000 },
  longestWaitMs: 10_000,
  breaker: { failures: 3, restMs: 5 * 60_000, longestRestMs: 6 * 3_600_000 },
};

/** The common ground of all adapters; everything that a test wants to hold in its hand. */
export interface HttpTools {
  clock: Clock;
  /** Names the application and how to reach who runs it: two of the providers refuse anything less. */
  userAgent: string;
  /** Uniform in [0, 1). */
  random: () => number;
  sleep: (ms: number, signal: AbortSignal) => Promise<void>;
  /** A signal that aborts after so many milliseconds. */
  deadline: (ms: number) => AbortSignal;
  /** Told of what is odd but no failure, such as a version soon to end. */
  warn: (message: string) => void;
  settings: HttpSettings;
}

export interface Question<T> {
  url: URL;
  schema: z.ZodType<T>;
  headers?: Record<string, string>;
  previous?: Validators | null;
  signal: AbortSignal;
  /** The provider's own words out of an error body, and a wait it only tells there. */
  explain?: (body: unknown) => { reason: string | null; retryAfterMs?: number | null };
}
export type JsonAnswer<T> = { kind: 'ok'; body: T; validators: Validators; expiresAt: Date | null } | { kind: 'notModified'; expiresAt: Date | null };

const retriedStatuses = new Set([429, 500, 502, 503, 504]);

/** Asks one provider for JSON: conditional, bounded in time, size and tries, and spared while the provider is down. */
export class JsonClient {
  readonly #provider: ProviderId;
  readonly #name: string;
  readonly #tools: HttpTools;
  readonly #breaker: CircuitBreaker;

  constructor(provider: ProviderId, name: string, tools: HttpTools) {
    this.#provider = provider;
    this.#name = name;
    this.#tools = tools;
    this.#breaker = new CircuitBreaker(tools.clock, tools.settings.breaker);
  }

  /** @throws ProviderError, or the signal's reason when the asker gave up */
  async get<T>(question: Question<T>): Promise<JsonAnswer<T>> {
    const restMs = this.#breaker.enter();
    if (restMs > 0) throw this.#error('circuitOpen', `${this.#name} failed several times in a row and is left alone for another ${minutes(restMs)}.`, { retryAfterMs: restMs });
    try {
      const answer = await this.#tryRepeatedly(question);
      this.#breaker.succeeded();
      return answer;
    } catch (error) {
      if (!(error instanceof ProviderError)) this.#breaker.abandoned();
      // An answer such as 404 shows that the provider is up.
      else if (error.kind === 'http' && error.status !== null && error.status < 500) this.#breaker.succeeded();
      else this.#breaker.failed(error.retryAfterMs);
      throw error;
    }
  }

  async #tryRepeatedly<T>(question: Question<T>): Promise<JsonAnswer<T>> {
    const { settings, random, sleep } = this.#tools;
    for (let attempt = 0; ; attempt += 1) {
      try {
        return await this.#tryOnce(question);
      } catch (error) {
        if (!(error instanceof ProviderError) || attempt + 1 >= settings.attempts || !worthAnotherTry(error)) throw error;
        if (error.retryAfterMs !== null && error.retryAfterMs > settings.longestWaitMs) throw error;
        await sleep(Math.max(error.retryAfterMs ?? 0, fullJitterMs(attempt, settings.backoff, random)), question.signal);
        question.signal.throwIfAborted();
      }
    }
  }

  async #tryOnce<T>({ url, schema, headers = {}, previous = null, signal, explain }: Question<T>): Promise<JsonAnswer<T>> {
    const { clock, settings, userAgent, deadline, warn } = this.#tools;
    const timeUp = deadline(settings.timeoutMs);
    const either = AbortSignal.any([signal, timeUp]);
    let text: string;
    let response: Response;
    try {
      response = await fetch(url, { headers: { accept: 'application/json', 'user-agent': userAgent, ...headers, ...this.#conditions(previous) }, signal: either });
      text = await readBoundedText(response, settings.maxBodyBytes, either);
    } catch (error) {
      signal.throwIfAborted();
      if (timeUp.aborted) throw this.#error('timeout', `${this.#name} did not answer within ${settings.timeoutMs / 1000} s.`, { cause: error });
      if (error instanceof BodyTooLarge) throw this.#error('malformed', `${this.#name} sent more than ${settings.maxBodyBytes} bytes.`);
      throw this.#error('http', `${this.#name} could not be reached.`, { cause: error });
    }
    const now = clock.now();
    const expiresAt = expiryOf(response.headers, now);
    if (response.status === 304 && previous) return { kind: 'notModified', expiresAt };
    if (!response.ok) throw this.#refusal(response, text, now, explain);
    if (response.status === 203) warn(`${this.#name} marks ${url.pathname} as deprecated.`);
    const body = schema.safeParse(this.#json(text));
    if (!body.success) {
      const issue = body.error.issues[0];
      throw this.#error('malformed', `${this.#name} sent an answer that does not read as a forecast (${issue?.path.join('.') || 'top level'}: ${issue?.message ?? 'unreadable'}).`);
    }
    return { kind: 'ok', body: body.data, validators: { etag: response.headers.get('etag'), lastModified: response.headers.get('last-modified') }, expiresAt };
  }

  /** A `Last-Modified` that lies in the future (seen in the wild) would pin an old answer for ever, so it is not sent. */
  #conditions(previous: Validators | null): Record<string, string> {
    const since = Date.parse(previous?.lastModified ?? '');
    return {
      ...(previous?.etag ? { 'if-none-match': previous.etag } : {}),
      ...(previous?.lastModified && since <= this.#tools.clock.now().getTime() ? { 'if-modified-since': previous.lastModified } : {}),
    };
  }

  #json(text: string): unknown {
    try {
      return JSON.parse(text) as unknown;
    } catch (error) {
      throw this.#error('malformed', `${this.#name} sent an answer that is not whole JSON.`, { cause: error });
    }
  }

  #refusal(response: Response, text: string, now: Date, explain: Question<unknown>['explain']): ProviderError {
    const { status, headers } = response;
    let body: unknown = null;
    try {
      body = JSON.parse(text);
    } catch {
      // Refusals often come as HTML; the status says enough.
    }
    const told = explain?.(body) ?? { reason: null };
    const wait = retryAfterMs(headers.get('retry-after'), answeredAt(headers, now)) ?? told.retryAfterMs ?? null;
    const reason = told.reason ? ` (“${told.reason.slice(0, 160)}”)` : '';
    if (status === 429) return this.#error('rateLimited', `${this.#name} asks us to come back later${reason}.`, { status, retryAfterMs: wait });
    return this.#error('http', `${this.#name} answered with status ${status}${reason}.`, { status, retryAfterMs: wait });
  }

  #error(kind: ProviderError['kind'], message: string, facts: ConstructorParameters<typeof ProviderError>[3] = {}): ProviderError {
    return new ProviderError(this.#provider, kind, message, facts);
  }
}

const minutes = (ms: number): string => (ms < 90_000 ? 'minute' : `${Math.ceil(ms / 60_000)} minutes`);

/** Time-outs, broken connections, server errors and answers cut off on the way may go better next time; a clear refusal will not. */
function worthAnotherTry(error: ProviderError): boolean {
  if (error.status !== null) return retriedStatuses.has(error.status);
  return error.kind === 'timeout' || error.kind === 'http' || (error.kind === 'malformed' && error.cause instanceof SyntaxError);
}
