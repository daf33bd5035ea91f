import { fetchForecast } from '../forecasts/fetch-forecast.ts';
import type { ForecastProvider } from '../forecasts/provider.ts';
import type { ForecastSource } from './forecasting.ts';

/** The providers in their order of preference, as the assessor sees them. */
export function providerSource(providers: readonly ForecastProvider[]): ForecastSource {
  return {
    fetch: (place, previous) => fetchForecast(providers, place, previous),
    describe(id) {
      if (id === 'webhook') return { name: 'Sent by webhook', attribution: 'Forecast handed in by a source of your own.' };
      const provider = providers.find((candidate) => candidate.id === id);
      return provider ? { name: provider.name, attribution: provider.attribution } : { name: id, attribution: '' };
    },
  };
}
