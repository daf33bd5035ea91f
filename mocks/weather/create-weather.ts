import type { ForecastHour, Reading } from '../../shared/assessment/case.ts';
import { createAtmosphere, type AirState, type WeatherPlace } from './atmosphere.ts';
import { hourMs } from './day.ts';
import { normal, stream } from './noise.ts';
import { issueView, truth, type View } from './view.ts';

export type { AirState, WeatherPlace };

export interface IssueOptions {
  /** Whose forecast it is: each source errs in its own way. */
  source?: string;
  pastHours?: number;
  futureHours?: number;
}

export interface Weather {
  readonly place: WeatherPlace;
  /** The air as it truly is. */
  truthAt(atMs: number): AirState;
  /** The canonical hour that starts at `startMs`, as it truly came; rain is certain, so its probability is 0 or 100. */
  truthHour(startMs: number): ForecastHour;
  /** The hours of a forecast made at `issueMs`: near ones nearly right, far ones less so, and the same for the same issue. */
  issueAt(issueMs: number, options?: IssueOptions): ForecastHour[];
  /** What a cup, a vane and a thermometer at 2 m in the orchard show: sheltered, and with their own small errors. */
  stationReadingAt(atMs: number): Reading;
  /** What an official station reports for the hour, for verification: rounded, with the probability unknown. */
  observationAt(startMs: number): ForecastHour;
}

const round = (value: number, decimals: number): number => Math.round(value * 10 ** decimals) / 10 ** decimals;
const text = (atMs: number): string => `${new Date(atMs).toISOString().slice(0, 19)}Z`;
const samples = [5, 15, 25, 35, 45, 55].map((minute) => minute * 60_000);
/** Ratio of the wind at 2 m to that at 10 m over short grass (FAO-56, Allen and others 1998, eq. 47). */
const windAt2m = 4.87 / Math.log(67.8 * 10 - 5.42);
/** The orchard's hedges take a share of it; invented. */
const shelter = 0.86;

/**
 * A weather generator: the same seed, place and date always give the same weather.
 * @param place degrees, metres above sea level, and the seed
 */
export function createWeather(place: WeatherPlace): Weather {
  const air = createAtmosphere(place);
  const instruments = stream(place.seed, 'instruments');
  const kept = new Map<number, ForecastHour>();

  function hour(startMs: number, view: View): ForecastHour {
    const at = air(startMs, view);
    const within = samples.map((offset) => air(startMs + offset, view));
    const mean = (pick: (state: AirState) => number): number => within.reduce((sum, state) => sum + pick(state), 0) / within.length;
    const rainMm = mean((state) => state.rainMmPerH);
    return {
      time: text(startMs),
      temperature2mC: round(at.temperature2mC, 1),
      dewPoint2mC: round(at.dewPoint2mC, 1),
      relativeHumidityPct: round(at.relativeHumidityPct, 0),
      windSpeed10mMs: round(at.windSpeed10mMs, 2),
      windGust10mMs: round(Math.max(...within.map((state) => state.gust10mMs)), 1),
      windFromDeg: round(at.windFromDeg, 0) % 360,
      cloudCoverPct: round(at.cloudCoverPct, 0),
      precipitationMm: rainMm < 0.05 ? 0 : round(rainMm, 1),
      precipitationProbabilityPct: round(100 * mean((state) => state.rainChance), 0),
      shortwaveWm2: round(mean((state) => state.shortwaveWm2), 0),
      temperature80mC: round(at.temperature80mC, 1),
    };
  }

  function truthHour(startMs: number): ForecastHour {
    const known = kept.get(startMs);
    if (known) return known;
    const true_ = hour(startMs, truth);
    const made = { ...true_, precipitationProbabilityPct: (true_.precipitationMm ?? 0) > 0.1 ? 100 : 0 };
    if (kept.size > 20_000) kept.clear();
    kept.set(startMs, made);
    return made;
  }

  return {
    place,
    truthAt: (atMs) => air(atMs, truth),
    truthHour,
    issueAt(issueMs, { source = 'forecast', pastHours = 24, futureHours = 192 } = {}) {
      const view = issueView(place.seed, source, issueMs);
      const firstMs = Math.floor(issueMs / hourMs) * hourMs - pastHours * hourMs;
      return Array.from({ length: pastHours + futureHours }, (_, index) => hour(firstMs + index * hourMs, view));
    },
    stationReadingAt(atMs) {
      const state = air(atMs, truth);
      const error = (channel: number): number => normal(instruments ^ channel, Math.floor(atMs / 60_000));
      return {
        time: text(atMs),
        windSpeedMs: round(Math.max(0, state.windSpeed10mMs * windAt2m * shelter + 0.12 * error(1)), 1),
        windHeightM: 2,
        windFromDeg: (round((state.windFromDeg + 6 * error(2) + 360) / 5, 0) * 5) % 360,
        temperatureC: round(state.temperature2mC + 0.2 * error(3), 1),
        relativeHumidityPct: Math.min(100, Math.max(1, round(state.relativeHumidityPct + 2 * error(4), 0))),
      };
    },
    observationAt(startMs) {
      const true_ = truthHour(startMs);
      return { ...true_, windFromDeg: (Math.round((true_.windFromDeg ?? 0) / 10) * 10) % 360, precipitationProbabilityPct: null, temperature80mC: null };
    },
  };
}
