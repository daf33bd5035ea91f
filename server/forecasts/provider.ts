import type { ForecastHour } from '../../shared/assessment/case.ts';

export const providerIds = ['openMeteo', 'nws', 'metNorway'] as const;
export type ProviderId = (typeof providerIds)[number];

/** A point on the ground: degrees north and east, metres above sea level. */
export interface Place {
  latitude: number;
  longitude: number;
  elevationM: number | null;
}

/** What a provider gave to ask "anything newer than this?" with; kept as it came. */
export interface Validators {
  etag: string | null;
  lastModified: string | null;
}

/** One forecast as issued, in canonical hours. */
export interface IssuedForecast {
  provider: ProviderId;
  /** The model or product, as the provider names it. */
  model: string | null;
  /** When the provider made it; null when it does not say. */
  issuedAt: Date | null;
  fetchedAt: Date;
  /** Until when asking again is pointless; null when the provider does not say. */
  expiresAt: Date | null;
  /** The grid place actually used, not the one asked for. */
  place: Place;
  /** In order, none doubled; gaps are allowed, and what was not told is null. */
  hours: ForecastHour[];
  validators: Validators;
}

export type FetchAnswer = { kind: 'issued'; forecast: IssuedForecast } | { kind: 'notModified'; expiresAt: Date | null };

/** A source of hourly forecasts. Its adapter alone knows the provider's format, units and stamps. */
export interface ForecastProvider {
  readonly id: ProviderId;
  /** The name shown to people. */
  readonly name: string;
  /** The line that the provider's licence asks to show beside its data. */
  readonly attribution: string;
  /** Whether a question about this place makes sense at all. */
  covers(place: Place): boolean;
  /**
   * Fetches the newest issue, or learns that the previous one still stands.
   * @param previous validators of the issue last stored from this same provider
   * @throws ProviderError
   */
  fetch(place: Place, previous: Validators | null, signal: AbortSignal): Promise<FetchAnswer>;
}

/** One forecast of many members, each a whole possible course of the weather. */
export interface IssuedEnsemble extends Omit<IssuedForecast, 'hours' | 'validators'> {
  /** One series per member, the control run first. */
  members: ForecastHour[][];
}

export interface EnsembleProvider {
  readonly id: ProviderId;
  readonly name: string;
  readonly attribution: string;
  /** @throws ProviderError */
  fetchEnsemble(place: Place, signal: AbortSignal): Promise<IssuedEnsemble>;
}

export type ProviderErrorKind = 'timeout' | 'http' | 'rateLimited' | 'malformed' | 'circuitOpen' | 'notCovered' | 'stale';

/** Why a provider gave no forecast. The message is one sentence for people and names the provider. */
export class ProviderError extends Error {
  override readonly name = 'ProviderError';
  readonly provider: ProviderId;
  readonly kind: ProviderErrorKind;
  /** HTTP status, when there was an answer. */
  readonly status: number | null;
  /** How long the provider asked us to wait, when it did. */
  readonly retryAfterMs: number | null;

  constructor(provider: ProviderId, kind: ProviderErrorKind, message: string, facts: { status?: number; retryAfterMs?: number | null; cause?: unknown } = {}) {
    super(message, facts.cause === undefined ? undefined : { cause: facts.cause });
    this.provider = provider;
    this.kind = kind;
    this.status = facts.status ?? null;
    this.retryAfterMs = facts.retryAfterMs ?? null;
  }
}
