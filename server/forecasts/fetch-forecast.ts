import { ProviderError, type FetchAnswer, type ForecastProvider, type Place, type ProviderId, type Validators } from './provider.ts';

export interface Fetched {
  answer: FetchAnswer;
  /** Who answered. */
  provider: ProviderId;
  /** Why the providers before it gave nothing, for people; null when the first one answered. */
  standInBecause: string | null;
  failures: ProviderError[];
}

/** Longer than all tries of all providers: a last resort against a hang. */
const giveUpMs = 3 * 60_000;

/**
 * Asks the providers in order until one answers; those that do not cover the place are passed over without a word.
 * @param previous validators of the newest stored issue and the provider they belong to; only that provider is shown them
 * @throws ProviderError the first provider's, when none answers (its `cause` is an AggregateError of all); the signal's
 * reason when the caller gives up
 */
export async function fetchForecast(
  providers: readonly ForecastProvider[],
  place: Place,
  previous: { provider: string; validators: Validators } | null,
  signal: AbortSignal = AbortSignal.timeout(giveUpMs),
): Promise<Fetched> {
  const failures: ProviderError[] = [];
  for (const provider of providers.filter((candidate) => candidate.covers(place))) {
    try {
      const answer = await provider.fetch(place, previous?.provider === provider.id ? previous.validators : null, signal);
      return { answer, provider: provider.id, standInBecause: failures.length > 0 ? failures.map((failure) => failure.message).join(' ') : null, failures };
    } catch (error) {
      signal.throwIfAborted();
      if (!(error instanceof ProviderError)) throw error;
      failures.push(error);
    }
  }
  const [first] = failures;
  if (!first) throw new ProviderError(providers[0]?.id ?? 'openMeteo', 'notCovered', `No forecast provider covers ${place.latitude.toFixed(2)}, ${place.longitude.toFixed(2)}.`);
  const cause = new AggregateError(failures, failures.map((failure) => failure.message).join(' '));
  throw new ProviderError(first.provider, first.kind, cause.message, { retryAfterMs: first.retryAfterMs, cause, ...(first.status === null ? {} : { status: first.status }) });
}
