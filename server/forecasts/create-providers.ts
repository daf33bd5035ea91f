import { setTimeout as wait } from 'node:timers/promises';
import type { Clock } from '../clock/clock.ts';
import { MetNorway } from './adapters/met-norway.ts';
import { NationalWeatherService } from './adapters/nws.ts';
import { defaultOpenMeteoSettings, OpenMeteo, type OpenMeteoSettings } from './adapters/open-meteo.ts';
import { defaultHttpSettings, type HttpSettings, type HttpTools } from './http/json-client.ts';
import type { EnsembleProvider, ForecastProvider, ProviderId } from './provider.ts';

export interface ForecastSettings {
  /** Which providers are asked, the preferred one first. */
  order: readonly ProviderId[];
  openMeteo?: Partial<OpenMeteoSettings>;
  http?: Partial<HttpSettings>;
}
export const defaultProviderOrder: readonly ProviderId[] = ['openMeteo', 'nws', 'metNorway'];

export interface ProviderTools extends Pick<HttpTools, 'clock' | 'userAgent' | 'random'>, Partial<Pick<HttpTools, 'sleep' | 'deadline' | 'warn'>> {
  clock: Clock;
  settings: ForecastSettings;
}

/** Every provider there is; a new one is added here and to `providerIds`. */
const adapters: Record<ProviderId, (tools: HttpTools, settings: ForecastSettings) => ForecastProvider> = {
  openMeteo: (tools, settings) => new OpenMeteo(tools, { ...defaultOpenMeteoSettings, ...settings.openMeteo }),
  nws: (tools) => new NationalWeatherService(tools),
  metNorway: (tools) => new MetNorway(tools),
};

function httpTools({ settings, ...given }: ProviderTools): HttpTools {
  return {
    sleep: (ms, signal) => wait(ms, undefined, { signal }),
    deadline: (ms) => AbortSignal.timeout(ms),
    warn: () => undefined,
    ...given,
    settings: { ...defaultHttpSettings, ...settings.http },
  };
}

/** The providers of the settings, in their order. Make them once: circuits and looked-up grid cells live in them. */
export function createProviders(tools: ProviderTools): ForecastProvider[] {
  const http = httpTools(tools);
  return tools.settings.order.map((id) => adapters[id](http, tools.settings));
}

/** The provider of ensembles. */
export const createEnsembleProvider = (tools: ProviderTools): EnsembleProvider => new OpenMeteo(httpTools(tools), { ...defaultOpenMeteoSettings, ...tools.settings.openMeteo });
