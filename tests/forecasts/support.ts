import { existsSync, readFileSync } from 'node:fs';
import { setupServer } from 'msw/node';
import { createProviderFakes } from '../../mocks/providers/provider-fakes.ts';
import { SettableClock } from '../../server/clock/clock.ts';
import { createEnsembleProvider, createProviders, type ForecastSettings } from '../../server/forecasts/create-providers.ts';
import type { FetchAnswer, ForecastProvider, IssuedForecast, ProviderId } from '../../server/forecasts/provider.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';

export const hourMs = 3_600_000;
/** A hillside of our own invention. */
export const place = { latitude: 44.12, longitude: -72.43, elevationM: 210 };
export const eve = '2026-05-20T00:07:00Z';
export const userAgent = 'dawnvane/test (mailto:tests@dawnvane.example)';

/** The fakes behind msw, the real adapters before it, a clock that stands still and a sleep that takes no time. */
export function stage(at: string = eve, settings: Partial<ForecastSettings> = {}) {
  const clock = new SettableClock(new Date(at));
  clock.stop(new Date(at));
  const fakes = createProviderFakes({ clock, seed: 11, elevationM: place.elevationM });
  const server = setupServer(...fakes.handlers);
  const sleeps: number[] = [];
  const warnings: string[] = [];
  const tools = {
    clock,
    userAgent,
    random: () => 0.5,
    sleep: async (ms: number) => void sleeps.push(ms),
    // A stalled answer never ends, so any short wait serves.
    deadline: () => AbortSignal.timeout(150),
    warn: (message: string) => void warnings.push(message),
    settings: { order: ['openMeteo', 'nws', 'metNorway'] as ProviderId[], ...settings },
  };
  const providers = createProviders(tools);
  const provider = (id: ProviderId): ForecastProvider => providers.find((candidate) => candidate.id === id)!;
  return {
    clock,
    fakes,
    server,
    sleeps,
    warnings,
    providers,
    provider,
    ensemble: createEnsembleProvider(tools),
    step: (hours: number) => clock.set(new Date(clock.now().getTime() + hours * hourMs)),
    ask: (id: ProviderId, previous: IssuedForecast | null = null): Promise<FetchAnswer> => provider(id).fetch(place, previous?.validators ?? null, new AbortController().signal),
  };
}

/** The issue in an answer that must hold one. */
export function issued(answer: FetchAnswer): IssuedForecast {
  if (answer.kind !== 'issued') throw new Error('The provider said that nothing is newer.');
  return answer.forecast;
}

export const hourOf = (hours: readonly ForecastHour[], time: string): ForecastHour => {
  const found = hours.find((hour) => hour.time === time);
  if (!found) throw new Error(`No hour ${time}`);
  return found;
};

const folder = new URL('../../../shared/data/', import.meta.url);
export const noRealAnswers = 'the folder with real answers (../shared/data) is not here';
/** The text of a real answer, or null where the folder is missing. */
export function realAnswer(name: string): string | null {
  const file = new URL(name, folder);
  return existsSync(file) ? readFileSync(file, 'utf8') : null;
}
