import type { ForecastHour, Reading, Site } from './case.ts';
import { morningOf } from './morning.ts';
import { prepareMorning, type PreparedMorning } from './prepare.ts';
import type { PlanToJudge } from './track.ts';
import { decide } from './verdict.ts';

/** Share of ensemble members in which the same plan fits; null without a member that can be told. */
export interface Chance {
  /** Members that say go. */
  fit: number;
  /** Members with enough data to tell. */
  members: number;
  share: number | null;
}

/**
 * Prepares the members of an ensemble one by one as they are asked for; the sun is computed once for all. For a single plan this is
 * the quicker way, as no member outlives its judgement.
 * @param members hours of each member, in order @param readings as for a single forecast
 */
export function* eachMember(site: Site, date: string, members: readonly (readonly ForecastHour[])[], readings: readonly Reading[] = []): Generator<PreparedMorning> {
  const morning = morningOf(site, date);
  for (const hours of members) yield prepareMorning({ site, date, hours, readings }, morning);
}

/** Prepares every member of an ensemble, to judge several plans on; see `eachMember`. */
export const prepareEnsemble = (...ensemble: Parameters<typeof eachMember>): PreparedMorning[] => [...eachMember(...ensemble)];

/** Judges one plan on every member, by the same code that judges a single forecast. */
export function chanceOf(members: Iterable<PreparedMorning>, plan: PlanToJudge): Chance {
  let fit = 0;
  let told = 0;
  for (const member of members) {
    const { verdict, enoughToTell } = decide(member, plan);
    if (!enoughToTell) continue;
    told += 1;
    if (verdict === 'go') fit += 1;
  }
  return { fit, members: told, share: told === 0 ? null : fit / told };
}
