import { drift, rise, stream, uniform } from './noise.ts';
import type { View } from './view.ts';

const hourMs = 3_600_000;
/** On the mean one front in so many hours; no multiple of a day, so that fronts come at any time of it. */
const spacingH = 64.3;
/** Fronts come from the west: about this much later per degree of longitude (10 m/s at middle latitudes; common practice, no source). */
const delayHPerDeg = 2.2;
/** No forecast puts a front further off than this, hours; it also keeps neighbouring fronts in order. */
const furthestShiftH = 11;
/** Damp spells err in time like fronts do, under a number that no front has. */
const dampIndex = 1_000_003;

interface Front {
  index: number;
  passageMs: number;
  /** 0 hardly felt, 1 stormy. */
  strength: number;
  rainMmPerH: number;
  rainHalfWidthH: number;
  bearingBeforeDeg: number;
  bearingAfterDeg: number;
}

/** What the procession of highs and fronts makes of an instant, before the ground has its say. */
export interface Synoptic {
  /** Wind above the friction layer, m/s. */
  gradientWindMs: number;
  windFromDeg: number;
  cloudFraction: number;
  /** Warm before, cold behind, °C against the season. */
  airMassC: number;
  /** How much drier (+) or moister (−) than usual, °C of dew-point depression. */
  drynessC: number;
  frontalRainMmPerH: number;
  /** Chance of frontal rain in view of the doubt about its timing, 0–1. */
  frontalRainChance: number;
  /** Readiness for showers behind the front, 0–1. */
  unsettled: number;
}

/** Rises over `before` hours up to the passage and falls over `after` hours behind it. */
const bump = (tauH: number, before: number, after: number): number => (tauH < 0 ? rise(-before, 0, tauH) : 1 - rise(0, after, tauH));

/** The sky's procession for one seed; a place sees it later the further east it lies. */
export function createSynoptic(seed: number, longitude: number): (atMs: number, view: View) => Synoptic {
  const keys = { time: stream(seed, 'front time'), strength: stream(seed, 'front strength'), rain: stream(seed, 'front rain'), width: stream(seed, 'front width'), before: stream(seed, 'bearing before'), after: stream(seed, 'bearing after'), texture: stream(seed, 'rain texture'), wind: stream(seed, 'gradient wind'), cloud: stream(seed, 'cloud'), scud: stream(seed, 'scud'), air: stream(seed, 'air mass'), dry: stream(seed, 'dryness'), damp: stream(seed, 'damp spell'), drizzle: stream(seed, 'drizzle') };
  const delayMs = longitude * delayHPerDeg * hourMs;
  const known = new Map<number, Front>();

  function front(index: number): Front {
    const kept = known.get(index);
    if (kept) return kept;
    const strength = uniform(keys.strength, index) ** 0.9;
    const made: Front = {
      index,
      passageMs: ((index + 0.5) * spacingH + (uniform(keys.time, index) - 0.5) * 40) * hourMs + delayMs,
      strength,
      rainMmPerH: strength < 0.18 ? 0 : 0.3 + 1.3 * uniform(keys.rain, index) * strength,
      rainHalfWidthH: 2.5 + 7.5 * strength * uniform(keys.width, index),
      bearingBeforeDeg: 195 + 50 * (uniform(keys.before, index) - 0.5),
      bearingAfterDeg: 305 + 50 * (uniform(keys.after, index) - 0.5),
    };
    known.set(index, made);
    return made;
  }

  const passedH = (one: Front, atMs: number, view: View): number => (atMs - one.passageMs) / hourMs - Math.min(furthestShiftH, Math.max(-furthestShiftH, view.frontShiftH(one.index, atMs)));

  return (atMs, view) => {
    const middle = Math.floor((atMs - delayMs) / hourMs / spacingH);
    // Fronts lie at most 20 h from the middle of their cells, so three of them are all that is felt at one time.
    const near = [front(middle - 1), front(middle), front(middle + 1)];
    const taus = near.map((one) => passedH(one, atMs, view));
    const atH = atMs / hourMs;
    const felt: Synoptic = {
      gradientWindMs: 5.1 + 2.4 * drift(keys.wind, atH / 30),
      windFromDeg: 0,
      cloudFraction: 0.3 + 0.2 * drift(keys.cloud, atH / 22) + 0.1 * drift(keys.scud, atH / 5),
      airMassC: 1.8 * drift(keys.air, atH / 90),
      drynessC: 1.4 * drift(keys.dry, atH / 50),
      frontalRainMmPerH: 0,
      frontalRainChance: 0,
      unsettled: 0,
    };
    lieDamp(felt, atMs, view);
    let [north, east] = [0, 0];
    for (let position = 0; position < near.length; position += 1) {
      const one = near[position]!;
      const tauH = taus[position]!;
      feel(felt, one, tauH);
      if (one.rainMmPerH > 0) rainOf(felt, one, tauH, atMs, view);
      const nextTauH = taus[position + 1];
      if (nextTauH === undefined) continue;
      // Between two fronts a high goes by: the wind veers from north-west through north and east to south.
      const between = Math.min(1, Math.max(0, tauH / Math.max(1, tauH - nextTauH)));
      const bearing = ((one.bearingAfterDeg + rise(0.05, 0.95, between) * (near[position + 1]!.bearingBeforeDeg + 360 - one.bearingAfterDeg)) * Math.PI) / 180;
      const weight = rise(-1.5, 1.5, tauH) * (1 - rise(-1.5, 1.5, nextTauH));
      north += weight * Math.cos(bearing);
      east += weight * Math.sin(bearing);
    }
    felt.gradientWindMs = Math.max(0.4, felt.gradientWindMs);
    felt.windFromDeg = ((Math.atan2(east, north) * 180) / Math.PI + 360) % 360;
    felt.cloudFraction = Math.min(1, Math.max(0, felt.cloudFraction));
    return felt;
  };

  /** Now and then low cloud settles in for a day, with drizzle out of it and everything wet below. */
  function lieDamp(felt: Synoptic, atMs: number, view: View): void {
    const damp = rise(0.85, 1.6, drift(keys.damp, atMs / hourMs / 38 - view.frontShiftH(dampIndex, atMs) / 38));
    if (damp === 0) return;
    felt.cloudFraction += 0.75 * damp;
    felt.drynessC -= 3.6 * damp;
    felt.frontalRainMmPerH += 0.4 * damp * Math.max(0, drift(keys.drizzle, atMs / hourMs / 2.5));
    felt.frontalRainChance = 0.5 * damp;
  }

  function rainOf(felt: Synoptic, one: Front, tauH: number, atMs: number, view: View): void {
    const doubtH = Math.min(furthestShiftH / 2, view.frontDoubtH(atMs));
    if (Math.abs(tauH + 1) > one.rainHalfWidthH + 2 * doubtH) return;
    const now = band(one, tauH, 0);
    if (now > 0) felt.frontalRainMmPerH += one.rainMmPerH * view.rainFactor(one.index, atMs) * Math.sqrt(now) * Math.max(0.15, 1 + 0.5 * drift(keys.texture, atMs / hourMs / 1.5));
    // Nine equal slices of a normal timing error: the share of them in which it rains now.
    const raining = ninths.filter((z) => band(one, tauH, z * doubtH) > 0.05).length;
    felt.frontalRainChance = Math.max(felt.frontalRainChance, raining / ninths.length);
  }
}

/** What one front does to wind, cloud and air at so many hours behind its passage. */
function feel(felt: Synoptic, { strength }: Front, tauH: number): void {
  felt.gradientWindMs += (1 + 7 * strength) * bump(tauH, 20, 30);
  felt.cloudFraction += (0.35 + 0.75 * strength) * bump(tauH, 22, 9);
  felt.airMassC += strength * (3.5 * bump(Math.min(tauH, 0), 34, 1) * (1 - rise(-1, 5, tauH)) - 5 * rise(-1, 8, tauH) * (1 - rise(20, 75, tauH)));
  felt.drynessC += strength * (3 * rise(2, 12, tauH) * (1 - rise(18, 48, tauH)) - 2.5 * bump(tauH, 14, 6));
  felt.unsettled = Math.max(felt.unsettled, strength * rise(1, 5, tauH) * (1 - rise(9, 20, tauH)));
}

/** How deep inside the front's rain band, 0–1, the band passing an hour before the front. */
const band = (one: Front, tauH: number, shiftH: number): number => Math.max(0, 1 - Math.abs(tauH + 1 - shiftH) / one.rainHalfWidthH);
const ninths = [-1.59, -0.97, -0.59, -0.28, 0, 0.28, 0.59, 0.97, 1.59];
