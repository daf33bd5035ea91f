import { windProfileFactor } from '../atmosphere/wind-profile.ts';
import { angleBetweenDeg } from '../atmosphere/wind-direction.ts';
import { halfAngleOf } from './prepare-direction.ts';
import { reachOf } from './limits/toward-sensitive-place.ts';
import type { PlanToJudge } from './track.ts';

/** What the applicator finds at the block before the start; null = not looked at. */
export interface OnSite {
  windMs: number | null;
  windHeightM: number;
  windFromDeg: number | null;
  temperatureC: number | null;
  /** What smoke or dust did. */
  hangTest: 'mixed' | 'hung' | 'blew' | null;
  foliageWet: boolean | null;
  /** Anyone within the application exclusion zone. */
  someoneNear: boolean | null;
  beesFlying: boolean | null;
}

export const onSiteFindings = ['windOver', 'windUnder', 'windUnknown', 'airHangs', 'hangTestMissing', 'foliageWet', 'someoneNear', 'peopleUnchecked', 'beesFlying', 'temperatureOut', 'towardPlace'] as const;
export type OnSiteFinding = (typeof onSiteFindings)[number];

/**
 * The on-site check. It can turn a go into a hold, NEVER a hold into a go: its verdict is a go only when the assessment's was one
 * and nothing found speaks against it. What must be looked at and was not, holds too.
 */
export function checkOnSite(assessed: 'go' | 'hold', plan: PlanToJudge, site: OnSite): { verdict: 'go' | 'hold'; findings: OnSiteFinding[] } {
  const { limits } = plan;
  const findings: OnSiteFinding[] = [];
  if (site.windMs === null) findings.push('windUnknown');
  else {
    const windMs = site.windMs * windProfileFactor(site.windHeightM, limits.windHeightM);
    if (limits.windMaxMs !== undefined && !(windMs <= limits.windMaxMs)) findings.push('windOver');
    if (limits.windMinMs !== undefined && !(windMs >= limits.windMinMs)) findings.push('windUnder');
    if (blowsTowardPlace(plan, site.windMs * windProfileFactor(site.windHeightM, 10), site.windFromDeg)) findings.push('towardPlace');
  }
  if (site.hangTest === 'hung') findings.push('airHangs');
  if (site.hangTest === null && limits.inversionMax !== undefined) findings.push('hangTestMissing');
  if (limits.foliageDry === true && site.foliageWet !== false) findings.push('foliageWet');
  if (site.someoneNear === true) findings.push('someoneNear');
  if (site.someoneNear === null) findings.push('peopleUnchecked');
  if (site.beesFlying === true && limits.pollinators?.bloom && limits.pollinators.beeStatement !== 'none') findings.push('beesFlying');
  const { temperatureMinC = -Infinity, temperatureMaxC = Infinity } = limits;
  if (site.temperatureC !== null && !(site.temperatureC >= temperatureMinC && site.temperatureC <= temperatureMaxC)) findings.push('temperatureOut');
  return { verdict: assessed === 'go' && findings.length === 0 ? 'go' : 'hold', findings };
}

/** True when a place in reach lies downwind, or could, with the direction not read. */
function blowsTowardPlace(plan: PlanToJudge, windAt10mMs: number, fromDeg: number | null): boolean {
  const reachM = reachOf(plan) * windAt10mMs;
  const halfAngle = halfAngleOf(windAt10mMs);
  return (plan.sensitivePlaces ?? []).some(({ bearingDeg, distanceM }) => distanceM <= reachM && (fromDeg === null || distanceM === 0 || angleBetweenDeg(bearingDeg, fromDeg + 180) <= halfAngle));
}
