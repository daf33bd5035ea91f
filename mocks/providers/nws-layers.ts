import type { ForecastHour } from '../../shared/assessment/case.ts';
import { hourMs, rounded, type Meant } from './skies.ts';

type Row = { validTime: string; value: unknown };
export type Layer = { uom?: string; values: Row[] };

/** ISO 8601 duration of whole hours, days first: 28 → `P1DT4H`, 24 → `P1D`, 5 → `PT5H`. */
export function durationText(hours: number): string {
  const days = Math.floor(hours / 24);
  const rest = hours % 24;
  return `P${days > 0 ? `${days}D` : ''}${rest > 0 ? `T${rest}H` : ''}`;
}
const row = (startMs: number, hours: number, value: unknown): Row => ({ validTime: `${new Date(startMs).toISOString().slice(0, 19)}+00:00/${durationText(hours)}`, value });

/** The service thinks in whole °F and whole knots, and converts at the door. */
const fahrenheitGrain = (c: number): number => (Math.round(c * 1.8 + 32) - 32) / 1.8;
const knotGrain = (ms: number): number => rounded(Math.round((ms * 3600) / 1852) * 1.852, 3);
const tens = (deg: number): number => (Math.round(deg / 10) * 10) % 360;
const hundredthsOfInch = (mm: number): number => rounded(Math.round((mm / 25.4) * 100) * 0.254, 3);

/** Names of the layers that a real grid lists without values where nobody fills them. */
const empty = {
  before: ['snowLevel'],
  waves: ['waveDirection', 'primarySwellHeight', 'primarySwellDirection', 'secondarySwellHeight', 'secondarySwellDirection', 'wavePeriod2', 'windWaveHeight'],
  chances: ['pressure', 'probabilityOfTropicalStormWinds', 'probabilityOfHurricaneWinds', 'potentialOf15mphWinds', 'potentialOf25mphWinds', 'potentialOf35mphWinds', 'potentialOf45mphWinds', 'potentialOf20mphWindGusts', 'potentialOf30mphWindGusts', 'potentialOf40mphWindGusts', 'potentialOf50mphWindGusts', 'potentialOf60mphWindGusts', 'grasslandFireDangerIndex', 'probabilityOfThunder', 'davisStabilityIndex', 'atmosphericDispersionIndex'],
};
const emptyLayers = (names: string[]): [string, Layer][] => names.map((name) => [name, { values: [] }]);

/** Sky words as the grid carries them. */
function weatherOf(hour: ForecastHour): unknown {
  const chance = hour.precipitationProbabilityPct ?? 0;
  const visibility = { unitCode: 'wmoUnit:km', value: null };
  if (chance < 15) return [{ coverage: null, weather: null, intensity: null, visibility, attributes: [] }];
  return [{ coverage: chance >= 55 ? 'likely' : chance >= 25 ? 'chance' : 'slight_chance', weather: 'rain_showers', intensity: 'light', visibility, attributes: [] }];
}

/** All layers of a raw grid in the service's order; those that end early end early here too. */
export function gridLayers(meant: Meant, startMs: number, hours: number, withoutGusts: boolean): Record<string, Layer> {
  const hourAt = (index: number): ForecastHour | undefined => meant.hours.get(startMs + index * hourMs);

  /** A level per hour; equal neighbours are told once. */
  function level(uom: string | null, of: (hour: ForecastHour) => unknown, until = hours): Layer {
    const values: Row[] = [];
    for (let from = 0; from < until; ) {
      const hour = hourAt(from);
      const value = hour ? of(hour) : null;
      const told = JSON.stringify(value);
      let to = from + 1;
      for (let next = hourAt(to); to < until && next && JSON.stringify(of(next)) === told; next = hourAt((to += 1)));
      values.push(row(startMs + from * hourMs, to - from, value));
      from = to;
    }
    return uom === null ? { values } : { uom, values };
  }

  /** Blocks of six hours from 00, 06, 12 and 18 UTC, the first one cut off. */
  function blocks(uom: string, of: (hours: ForecastHour[]) => number, until: number, merged: boolean): Layer {
    const told: { from: number; to: number; value: number }[] = [];
    for (let from = 0; from < until; ) {
      const to = Math.min(until, from + 6 - ((startMs / hourMs + from) % 6));
      const value = of(Array.from({ length: to - from }, (_, index) => hourAt(from + index)).filter((hour) => hour !== undefined));
      const last = told.at(-1);
      if (merged && last?.value === value) last.to = to;
      else told.push({ from, to, value });
      from = to;
    }
    return { uom, values: told.map(({ from, to, value }) => row(startMs + from * hourMs, to - from, value)) };
  }

  /** A day's high or a night's low, over the hours for which the service states it. */
  function extreme(fromUtcHour: number, length: number, pick: (...values: number[]) => number): Layer {
    const values: Row[] = [];
    for (let from = 0; from + length <= hours; from += 1) {
      if ((startMs / hourMs + from) % 24 !== fromUtcHour) continue;
      const temperatures = Array.from({ length }, (_, index) => hourAt(from + index)?.temperature2mC ?? 0);
      values.push(row(startMs + from * hourMs, length, fahrenheitGrain(pick(...temperatures))));
    }
    return { uom: 'wmoUnit:degC', values };
  }

  const sum = (many: ForecastHour[]): number => hundredthsOfInch(many.reduce((total, hour) => total + (hour.precipitationMm ?? 0), 0));
  const nothing = (uom: string): Layer => level(uom, () => null);
  const amountsUntil = 79 - ((startMs / hourMs + 79) % 6);
  const speed = (share: number) => (hour: ForecastHour): number => knotGrain((hour.windSpeed10mMs ?? 0) * share);
  const bearing = (hour: ForecastHour): number => tens(hour.windFromDeg ?? 0);
  const temperature = (hour: ForecastHour): number => fahrenheitGrain(hour.temperature2mC ?? 0);
  return Object.fromEntries<Layer>([
    ['temperature', level('wmoUnit:degC', temperature)],
    ['dewpoint', level('wmoUnit:degC', (hour) => fahrenheitGrain(hour.dewPoint2mC ?? 0))],
    ['maxTemperature', extreme(12, 13, Math.max)],
    ['minTemperature', extreme(0, 14, Math.min)],
    ['relativeHumidity', level('wmoUnit:percent', (hour) => hour.relativeHumidityPct)],
    ['apparentTemperature', level('wmoUnit:degC', temperature)],
    ['heatIndex', nothing('wmoUnit:degC')],
    ['windChill', nothing('wmoUnit:degC')],
    ['skyCover', level('wmoUnit:percent', (hour) => hour.cloudCoverPct)],
    ['windDirection', level('wmoUnit:degree_(angle)', bearing)],
    ['windSpeed', level('wmoUnit:km_h-1', speed(1))],
    ['windGust', withoutGusts ? { values: [] } : level('wmoUnit:km_h-1', (hour) => knotGrain(hour.windGust10mMs ?? 0))],
    ['weather', level(null, weatherOf)],
    ['hazards', { values: [] }],
    ['probabilityOfPrecipitation', blocks('wmoUnit:percent', (many) => Math.max(...many.map((hour) => hour.precipitationProbabilityPct ?? 0)), hours, true)],
    ['quantitativePrecipitation', blocks('wmoUnit:mm', sum, amountsUntil, false)],
    ['iceAccumulation', blocks('wmoUnit:mm', () => 0, amountsUntil, false)],
    ['snowfallAmount', blocks('wmoUnit:mm', () => 0, amountsUntil, false)],
    ...emptyLayers(empty.before),
    ['ceilingHeight', level('wmoUnit:m', (hour) => ((hour.cloudCoverPct ?? 0) > 60 ? 914.4 : null), 36)],
    ['visibility', level('wmoUnit:m', (hour) => ((hour.relativeHumidityPct ?? 0) >= 97 ? 8046.72 : 16093.44), 36)],
    ['transportWindSpeed', level('wmoUnit:km_h-1', speed(1.6), 72)],
    ['transportWindDirection', level('wmoUnit:degree_(angle)', bearing, 72)],
    ['mixingHeight', level('wmoUnit:m', (hour) => 91.44 + rounded((hour.shortwaveWm2 ?? 0) / 100, 0) * 182.88, 75)],
    ['hainesIndex', { values: [] }],
    ['lightningActivityLevel', level(null, () => 1, 48)],
    ['twentyFootWindSpeed', level('wmoUnit:km_h-1', speed(0.85), 72)],
    ['twentyFootWindDirection', level('wmoUnit:degree_(angle)', bearing, 72)],
    ['waveHeight', level('wmoUnit:m', () => 0, 148)],
    ['wavePeriod', level('nwsUnit:s', () => 0, 111)],
    ...emptyLayers(empty.waves),
    ['dispersionIndex', level(null, (hour) => rounded((hour.shortwaveWm2 ?? 0) / 12, 0) + 4, 75)],
    ...emptyLayers(empty.chances),
    ['lowVisibilityOccurrenceRiskIndex', level(null, (hour) => ((hour.relativeHumidityPct ?? 0) >= 97 ? 6 : 3), 75)],
    ['stability', level(null, () => 4, 75)],
    ['redFlagThreatIndex', { values: [] }],
  ]);
}
