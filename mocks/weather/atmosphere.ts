import { getPosition } from 'suncalc';
import { createDays, hourMs, type SolarDay } from './day.ts';
import { createSynoptic } from './fronts.ts';
import { drift, rise, stream } from './noise.ts';
import type { View } from './view.ts';

export interface WeatherPlace {
  seed: number;
  latitude: number;
  longitude: number;
  elevationM: number | null;
}

/** The air over the farm at one instant. */
export interface AirState {
  temperature2mC: number;
  temperature80mC: number;
  dewPoint2mC: number;
  relativeHumidityPct: number;
  windSpeed10mMs: number;
  /** Three-second gusts of about this speed come now and then. */
  gust10mMs: number;
  windFromDeg: number;
  cloudCoverPct: number;
  shortwaveWm2: number;
  rainMmPerH: number;
  /** Chance of rain about now, 0–1. */
  rainChance: number;
  sunAltitudeDeg: number;
}

/** Saturation vapour pressure, kPa (FAO-56, Allen and others 1998, eq. 11). */
const saturationKPa = (temperatureC: number): number => 0.6108 * Math.exp((17.27 * temperatureC) / (temperatureC + 237.3));
/** Never below zero, straight above it. */
const softPlus = (x: number, scale: number): number => scale * Math.log1p(Math.exp(x / scale));
const unit = (x: number): number => Math.min(1, Math.max(0, x));
/** Share of a standard normal below z (logistic approximation). */
const below = (z: number): number => 1 / (1 + Math.exp(-1.702 * z));

/**
 * The weather of one place for one seed: highs and fronts from above, and below them the day's course — clear calm nights
 * that cool the ground under warmer air, a breeze that comes up some time after sunrise, afternoon showers in summer.
 * A plausible air to try the product in, not a forecast of anything.
 */
export function createAtmosphere(place: WeatherPlace): (atMs: number, view: View) => AirState {
  const { seed, latitude, longitude } = place;
  const synoptic = createSynoptic(seed, longitude);
  const days = createDays(seed, latitude, longitude);
  const keys = { turbulence: stream(seed, 'turbulence'), veer: stream(seed, 'veer'), showers: stream(seed, 'showers'), moisture: stream(seed, 'moisture') };
  const south = latitude < 0;
  const nights = new WeakMap<View, Map<number, { nightC: number; dayC: number }>>();

  /** −1 in mid-January, 1 in mid-July (north). */
  const season = (atMs: number): number => (south ? -1 : 1) * -Math.cos((2 * Math.PI * (atMs / hourMs / 24 - 18)) / 365.2425);
  const seasonMeanC = (atMs: number): number => 30.2 - 0.46 * Math.abs(latitude) - 0.0055 * (place.elevationM ?? 0) + (2 + 0.26 * Math.abs(latitude)) * season(atMs - 10 * 24 * hourMs);

  /** How far the night falls below and the day rises above the mean, °C: cloud and wind level both. */
  function swing(day: SolarDay, view: View): { nightC: number; dayC: number } {
    let kept = nights.get(view);
    if (!kept) nights.set(view, (kept = new Map()));
    const known = kept.get(day.index);
    if (known) return known;
    const mean = (fromH: number, stepH: number, middleMs: number): { cloud: number; wind: number } => {
      const states = [0, 1, 2, 3].map((step) => synoptic(middleMs + (fromH + step * stepH) * hourMs, view));
      return { cloud: states.reduce((sum, { cloudFraction }) => sum + cloudFraction, 0) / 4, wind: states.reduce((sum, { gradientWindMs }) => sum + gradientWindMs, 0) / 4 };
    };
    const [night, light] = [mean(-7, 2, day.sunriseMs), mean(-4, 2.2, day.noonMs)];
    const made = { nightC: (2.2 + 4.6 * (1 - 0.8 * night.cloud) * Math.exp(-((night.wind / 11) ** 2))) * 1.05, dayC: (2.4 + 2.2 * unit((season(day.noonMs) + 1) / 2) + 2.4 * (1 - light.cloud)) * (1 - 0.35 * light.cloud) };
    kept.set(day.index, made);
    return made;
  }

  /** The day's course, °C against the mean: lowest at sunrise, highest some three hours after noon, falling fast at dusk and slowly by night. */
  function diurnalC(atMs: number, view: View): number {
    const today = days.at(atMs);
    const day = atMs < today.sunriseMs ? days.day(today.index - 1) : today;
    const { nightC, dayC } = swing(day, view);
    const peakMs = day.noonMs + Math.min(2.8 * hourMs, (day.sunsetMs - day.noonMs) * 0.6);
    const duskC = 0.3 * dayC;
    if (atMs < peakMs) return -nightC + (dayC + nightC) * (0.5 - 0.5 * Math.cos(Math.PI * unit((atMs - day.sunriseMs) / (peakMs - day.sunriseMs)) ** 0.9));
    if (atMs < day.sunsetMs) return dayC + (duskC - dayC) * rise(peakMs, day.sunsetMs, atMs);
    const tomorrow = days.day(day.index + 1);
    const lowC = -swing(tomorrow, view).nightC;
    const gone = unit((atMs - day.sunsetMs) / (tomorrow.sunriseMs - day.sunsetMs));
    return lowC + (duskC - lowC) * ((Math.exp(-2.2 * gone) - Math.exp(-2.2)) / (1 - Math.exp(-2.2)));
  }

  return (atMs, view) => {
    const above = synoptic(atMs, view);
    const cloud = unit(above.cloudFraction + view.error('cloudFraction', atMs));
    const summer = unit((season(atMs) + 0.6) / 1.6);
    const day = days.at(atMs);
    const sinceRiseH = (atMs - day.sunriseMs) / hourMs - view.error('onsetH', atMs);
    const beforeSetH = (day.sunsetMs - atMs) / hourMs;
    // Mixing: 0 when the surface air lies still under the inversion, 1 when the wind aloft comes down.
    const mixing = rise(day.onsetH, day.onsetH + day.rampH, sinceRiseH) * rise(-0.7, 2.2, beforeSetH) * (0.65 + 0.35 * summer) * (1 - 0.3 * cloud);
    const gradient = Math.max(0.3, above.gradientWindMs * (1.08 - 0.16 * summer) + view.error('gradientWindMs', atMs));
    const coupling = Math.min(0.62, Math.max(0.04, 0.05 + 0.14 * cloud + 0.0038 * gradient ** 2 + view.error('couplingFraction', atMs)));
    const steadyMs = gradient * (coupling + Math.max(0, 0.84 - coupling) * mixing) + 0.3 * (1 - mixing);
    const gusty = (0.15 + 0.09 * steadyMs) * drift(keys.turbulence, atMs / hourMs / 0.7);
    const windSpeed10mMs = softPlus(steadyMs + gusty + view.error('localWindMs', atMs) * Math.min(1.3, 0.35 + 0.25 * steadyMs), 0.15);

    // Showers: where readiness passes a changing threshold; far ahead only the readiness is known.
    const sinceNoonH = (atMs - day.noonMs) / hourMs;
    const readiness = unit(0.55 * above.unsettled * (0.5 + 0.5 * mixing) + 0.4 * summer * rise(-0.5, 3, sinceNoonH) * (1 - rise(5, 9, sinceNoonH)) * unit(drift(keys.moisture, atMs / hourMs / 60)));
    const shower = unit((below(drift(keys.showers, atMs / hourMs / 1.3)) - (1 - readiness)) * 4) * 4;
    const knowledge = view.showerKnowledge(atMs);
    const rainMmPerH = (above.frontalRainMmPerH > 0.05 ? above.frontalRainMmPerH : 0) + knowledge * shower + (1 - knowledge) * readiness * 0.5;
    const showerChance = knowledge * (shower > 0.1 ? 0.95 : 0.3 * readiness) + (1 - knowledge) * readiness * 0.8;
    const rainChance = 1 - (1 - 0.95 * above.frontalRainChance) * (1 - unit(showerChance)) * 0.99;

    const meanC = seasonMeanC(atMs) + above.airMassC;
    const wetC = Math.min(3, 2 * Math.min(1.5, rainMmPerH));
    const temperature2mC = meanC + diurnalC(atMs, view) + view.error('temperatureC', atMs) - 0.4 * wetC;
    const spreadC = temperature2mC - (meanC - (4.9 + above.drynessC) + view.error('dewPointC', atMs)) - wetC;
    const dewPoint2mC = temperature2mC - softPlus(spreadC, 0.8);
    const relativeHumidityPct = Math.min(100, (100 * saturationKPa(dewPoint2mC)) / saturationKPa(temperature2mC));

    const sinceSetH = (atMs - (atMs < day.sunriseMs ? days.day(day.index - 1) : day).sunsetMs) / hourMs;
    const standing = atMs >= day.sunriseMs && sinceSetH < -0.7 ? 1 - rise(0.3, day.breakH, sinceRiseH) : rise(-0.7, 4, sinceSetH);
    const potentialC = 5.2 * (1 - cloud) ** 1.3 * Math.exp(-((windSpeed10mMs / 2.1) ** 2)) + view.error('inversionC', atMs) * (1 - cloud);
    const stable = Math.max(0, potentialC) * standing;
    const temperature80mC = temperature2mC + stable - 0.35 - 0.5 * mixing;

    const sunAltitudeDeg = getPosition(new Date(atMs), latitude, longitude).altitude;
    const sine = Math.sin((sunAltitudeDeg * Math.PI) / 180);
    // Haurwitz (1945) under a clear sky, Kasten and Czeplak (1980) for the cloud.
    const shortwaveWm2 = sine > 0 ? 1098 * sine * Math.exp(-0.057 / sine) * (1 - 0.75 * cloud ** 3.4) : 0;

    const veerDeg = drift(keys.veer, atMs / hourMs / 1.2) * (6 + 45 * Math.exp(-windSpeed10mMs / 0.9));
    return {
      temperature2mC,
      temperature80mC,
      dewPoint2mC,
      relativeHumidityPct,
      windSpeed10mMs,
      gust10mMs: windSpeed10mMs * (1.3 + 0.35 * mixing) + 0.4 + Math.min(5, 0.8 * shower * knowledge),
      windFromDeg: (above.windFromDeg + veerDeg + view.error('bearingDeg', atMs) + 720) % 360,
      cloudCoverPct: 100 * cloud,
      shortwaveWm2,
      rainMmPerH,
      rainChance: unit(rainChance),
      sunAltitudeDeg,
    };
  };
}
