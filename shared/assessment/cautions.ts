import { airPropelledZoneM } from '../droplets/exclusion-zone.ts';
import { possibleActivity } from '../pollinators/thresholds.ts';
import { isoAt } from './failing.ts';
import { rainChanceBandPct } from './limits/rain-free.ts';
import { reachOf } from './limits/toward-sensitive-place.ts';
import { reason, type BareReason } from './messages.ts';
import { hourMs } from './hours.ts';
import { stepMinutes, stepMs } from './morning.ts';
import type { Judgement } from './verdict.ts';

/** Usual error of an hourly wind forecast, m/s [windError]. */
export const usualWindErrorMs = 1.5;
/** Delta T below and above which it is told, °C [bomDeltaT; grdc103]. */
const lowDeltaTC = 2;
const highDeltaTC = 8;
/** Told when a plan does not limit it. */
const likelyInversion = 0.5;

/** Steps that the job would take: from the best start on a go; the whole morning on a hold. */
function spanOf({ chosen, neededMinutes, least }: Judgement): [from: number, to: number] {
  if (!chosen) return [0, least.length];
  const from = Math.round(chosen.bestStartMin / stepMinutes);
  return [from, Math.min(chosen.to, from + Math.max(1, Math.ceil(neededMinutes / stepMinutes)))];
}

/** Step with the greatest (or least) known value in a span; −1 when none is known. */
function extreme(values: Float64Array, [from, to]: [number, number], sign: 1 | -1 = 1): number {
  let found = -1;
  for (let step = from; step < to; step += 1) if (!Number.isNaN(values[step]!) && (found < 0 || sign * values[step]! > sign * values[found]!)) found = step;
  return found;
}

/** What a grower should mind beside the verdict: cautions first, then advice. */
export function cautionsOf(judgement: Judgement): BareReason[] {
  const { morning } = judgement;
  const { hours } = morning;
  const reasons = [...weatherCautions(judgement), ...placeCautions(judgement), ...beeCautions(judgement)];
  for (const what of hours.contradictions) reasons.push(reason('data', 'caution', 'data.contradiction', { what }));
  return [...reasons, ...adviceOf(judgement)];
}

function weatherCautions(judgement: Judgement): BareReason[] {
  const { chosen, plan, tracks, morning } = judgement;
  if (!chosen) return [];
  const reasons: BareReason[] = [];
  const span = spanOf(judgement);
  const wind = tracks.find((track) => track.limit === 'wind');
  const max = plan.limits.windMaxMs;
  const windiest = wind ? extreme(wind.value, span) : -1;
  if (wind && max !== undefined && windiest >= 0 && wind.value[windiest]! + usualWindErrorMs > max) {
    reasons.push(reason('wind', 'caution', 'caution.windError', { windMs: wind.value[windiest]!, errorMs: usualWindErrorMs, maxMs: max }, isoAt(judgement, windiest)));
  }
  if (plan.limits.inversionMax === undefined) {
    const likeliest = extreme(morning.inversionLikelihood, span);
    const likelihood = likeliest < 0 ? 0 : morning.inversionLikelihood[likeliest]!;
    if (likelihood >= likelyInversion) reasons.push(reason('inversion', 'caution', 'caution.inversion', { likelihood, at: isoAt(judgement, likeliest) }, isoAt(judgement, likeliest)));
  }
  return reasons;
}

function placeCautions(judgement: Judgement): BareReason[] {
  const { plan, morning, chosen } = judgement;
  const places = plan.sensitivePlaces ?? [];
  const reasons: BareReason[] = places
    .filter(({ distanceM }) => distanceM < airPropelledZoneM)
    .slice(0, 5)
    .map(({ name, distanceM }) => reason('towardSensitivePlace', 'caution', 'caution.exclusionZone', { place: name, distanceM, zoneM: airPropelledZoneM }));
  const windiest = places.length > 0 && chosen ? extreme(morning.windMs, spanOf(judgement)) : -1;
  if (windiest >= 0) {
    const windMs = morning.windMs[windiest]!;
    const at = isoAt(judgement, windiest);
    reasons.push(reason('towardSensitivePlace', 'caution', 'caution.driftReach', { reachM: reachOf(plan) * windMs, windMs, at }, at));
  }
  return reasons;
}

function beeCautions(judgement: Judgement): BareReason[] {
  const rule = judgement.plan.limits.pollinators;
  if (!rule) return [];
  const reasons: BareReason[] = rule.bloom ? [reason('pollinators', 'caution', 'caution.bloom', {})] : [];
  const track = judgement.tracks.find((candidate) => candidate.limit === 'pollinators');
  const first = track && !track.isHard ? track.value.findIndex((activity) => activity >= possibleActivity) : -1;
  if (first >= 0) reasons.push(reason('pollinators', 'advice', 'advice.bees', { at: isoAt(judgement, first) }, isoAt(judgement, first)));
  return reasons;
}

function adviceOf(judgement: Judgement): BareReason[] {
  const { plan, morning, chosen } = judgement;
  const { limits } = plan;
  const reasons: BareReason[] = [];
  if (morning.siteFactor) reasons.push(reason('wind', 'advice', 'advice.siteFactor', { factor: morning.siteFactor.factor, readings: morning.siteFactor.readings }));
  if (limits.pollinators && morning.radiationIsEstimated) reasons.push(reason('pollinators', 'advice', 'advice.radiationEstimated', {}));
  if (limits.rainFreeHours !== undefined && limits.rainProbabilityPct === null) reasons.push(reason('rainFree', 'advice', 'advice.rainAmountOnly', {}));
  if (!chosen) return reasons;
  if (limits.deltaTMinC === undefined && limits.deltaTMaxC === undefined) {
    const span = spanOf(judgement);
    const lowest = extreme(morning.deltaTC, span, -1);
    const highest = extreme(morning.deltaTC, span);
    if (highest >= 0 && morning.deltaTC[highest]! > highDeltaTC) reasons.push(reason('deltaT', 'advice', 'advice.deltaTHigh', { deltaTC: morning.deltaTC[highest]!, at: isoAt(judgement, highest) }, isoAt(judgement, highest)));
    else if (lowest >= 0 && morning.deltaTC[lowest]! < lowDeltaTC) reasons.push(reason('deltaT', 'advice', 'advice.deltaTLow', { deltaTC: morning.deltaTC[lowest]!, at: isoAt(judgement, lowest) }, isoAt(judgement, lowest)));
  }
  if (limits.rainFreeHours) {
    const endMs = morning.morning.startMs + spanOf(judgement)[1] * stepMs;
    const hour = Math.floor((endMs - morning.hours.startMs) / hourMs);
    const band = rainChanceBandPct(morning.hours, hour, Math.ceil(limits.rainFreeHours));
    if (band.mostPct >= 10) reasons.push(reason('rainFree', 'advice', 'advice.rainChance', { ...band, hours: limits.rainFreeHours }));
  }
  return reasons;
}
