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
 * Prepares every member of an ensemble; the sun is computed once for all.
 * @param members hours of each member, in order @param readings as for a single forecast
 */
export function prepareEnsemble(site: Site, date: string, members: readonly (readonly ForecastHour[])[], readings: readonly Reading[] = []): PreparedMorning[] {
  const morning = morningOf(site, date);
  return members.map((hours) => prepareMorning({ site, date, hours, readings }, morning));
}

/** Judges one plan on every member, by the same code that judges a single forecast. */
export function chanceOf(members: readonly PreparedMorning[], plan: PlanToJudge): Chance {
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
