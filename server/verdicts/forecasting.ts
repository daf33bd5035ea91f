import type { ForecastFacts } from '../../shared/api/mornings.ts';
import type { FetchAnswer, IssuedForecast, Place, ProviderError, Validators } from '../forecasts/provider.ts';
import type { ForecastRow } from '../models/weather.ts';

/** What the assessor needs of the providers: the newest issue for a place, by whichever answers. */
export interface ForecastSource {
  /**
   * @param previous validators of the newest stored issue and the provider they belong to
   * @throws ProviderError when none answers
   */
  fetch(place: Place, previous: { provider: string; validators: Validators } | null): Promise<{ answer: FetchAnswer; standInBecause: string | null }>;
  /** The name shown to people and the line their licence asks for. */
  describe(provider: ForecastRow['provider']): { name: string; attribution: string };
}
export type { IssuedForecast, ProviderError };

/** The facts that pages and notices tell about a stored issue. */
export function factsOf(forecast: ForecastRow, source: ForecastSource): ForecastFacts {
  const { name, attribution } = source.describe(forecast.provider);
  return {
    id: forecast.id,
    provider: forecast.provider,
    providerName: name,
    attribution,
    model: forecast.model,
    issuedAt: forecast.issuedAt?.toISOString() ?? null,
    fetchedAt: forecast.checkedAt.toISOString(),
    standInBecause: forecast.standInBecause,
  };
}
