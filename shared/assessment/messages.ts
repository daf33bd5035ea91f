import type { LimitName, Reason } from './answer.ts';
import type { Contradiction } from './hours.ts';

/** When a limit fails in a morning: all of it, until or from a moment, once in between, or in several parts. */
export type FailPattern = 'all' | 'until' | 'from' | 'between' | 'parts';

/** How one limit fails. Instants are UTC ISO 8601; value and bound are in the limit's own SI unit. */
export interface Failing {
  limit: LimitName;
  pattern: FailPattern;
  /** First instant at which it fails, and the one from which it holds again. */
  fromAt: string | null;
  untilAt: string | null;
  /** Its value farthest beyond the bound. */
  worst: number | null;
  bound: number | null;
  /** A range limit: which end is passed. */
  side: 'below' | 'above';
  /** The label forbids the use in bloom, whatever the hour. */
  isForbidden: boolean;
  /** A sensitive place in the wind's way. */
  place: string | null;
  /** Start of the first rain that matters. */
  rainAt: string | null;
}

/** Value and bound of one limit at one instant. */
export interface AtLimit {
  limit: LimitName;
  value: number | null;
  bound: number | null;
  at: string;
  /** The sensitive place meant, where the limit is about one. */
  place: string | null;
}

/** Every sentence by key, with what it is filled with. */
export interface Messages {
  'limit.binding': AtLimit;
  'limit.fails': Failing;
  'window.closes': { endAt: string; failing: Failing | null };
  'miss.short': { missingMinutes: number; opens: Failing | null; closes: Failing | null };
  'miss.noOverlap': { first: Failing; last: Failing };
  'miss.closest': AtLimit;
  'time.morningShort': { morningMinutes: number; neededMinutes: number };
  'time.noMorning': Record<string, never>;
  'data.missing': { limit: LimitName; fromAt: string; untilAt: string };
  'data.noForecast': Record<string, never>;
  'data.stale': Record<string, never>;
  'data.noLimits': Record<string, never>;
  'data.contradiction': { what: Contradiction };
  'caution.windError': { windMs: number; errorMs: number; maxMs: number };
  'caution.driftReach': { reachM: number; windMs: number; at: string };
  'caution.exclusionZone': { place: string; distanceM: number; zoneM: number };
  'caution.bloom': Record<string, never>;
  'caution.inversion': { likelihood: number; at: string };
  'advice.siteFactor': { factor: number; readings: number };
  'advice.radiationEstimated': Record<string, never>;
  'advice.rainAmountOnly': Record<string, never>;
  'advice.rainChance': { leastPct: number; mostPct: number; hours: number };
  'advice.deltaTLow': { deltaTC: number; at: string };
  'advice.deltaTHigh': { deltaTC: number; at: string };
  'advice.bees': { at: string };
}

export type MessageKey = keyof Messages;

/** A reason before it is put into words. */
export interface BareReason<Key extends MessageKey = MessageKey> {
  limit: Reason['limit'];
  kind: Reason['kind'];
  at: string | null;
  key: Key;
  params: Messages[Key];
}

/** Ties a key to its params, so that a wrong pair is a type error. */
export const reason = <Key extends MessageKey>(limit: Reason['limit'], kind: Reason['kind'], key: Key, params: Messages[Key], at: string | null = null): BareReason =>
  ({ limit, kind, at, key, params }) as BareReason;
