import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { ProviderId } from '../../server/forecasts/provider.ts';
import { hourSchema, type ForecastHour } from '../../shared/assessment/case.ts';
import { hourMs, issued, place, stage } from './support.ts';

const { fakes, server, clock, ask, ensemble } = stage();
beforeAll(() => server.listen({ onUnhandledRequest: 'error' }));
afterEach(() => server.resetHandlers());
afterAll(() => server.close());

type Field = Exclude<keyof ForecastHour, 'time'>;
/** The largest difference that the provider's own grain allows: knots and °F at NWS, tenths elsewhere. */
const grains: Record<ProviderId, Partial<Record<Field, number>>> = {
  openMeteo: { temperature2mC: 0.001, dewPoint2mC: 0.001, relativeHumidityPct: 0.001, windSpeed10mMs: 0.001, windGust10mMs: 0.001, windFromDeg: 0.001, cloudCoverPct: 0.001, precipitationMm: 0.001, precipitationProbabilityPct: 0.001, shortwaveWm2: 0.001, temperature80mC: 0.001 },
  nws: { temperature2mC: 0.28, dewPoint2mC: 0.28, relativeHumidityPct: 0.001, windSpeed10mMs: 0.26, windGust10mMs: 0.26, windFromDeg: 5, cloudCoverPct: 0.001 },
  metNorway: { temperature2mC: 0.001, dewPoint2mC: 0.001, relativeHumidityPct: 0.001, windSpeed10mMs: 0.051, windFromDeg: 0.001, cloudCoverPct: 0.001, precipitationMm: 0.001 },
};
const silent: Record<ProviderId, Field[]> = { openMeteo: [], nws: ['shortwaveWm2', 'temperature80mC'], metNorway: ['shortwaveWm2', 'temperature80mC', 'windGust10mMs', 'precipitationProbabilityPct'] };

const apart = (field: Field, a: number, b: number): number => (field === 'windFromDeg' ? Math.abs(((a - b + 540) % 360) - 180) : Math.abs(a - b));

describe.each(['openMeteo', 'nws', 'metNorway'] as const)('what %s means at an hour', (id) => {
  it('comes out of its adapter at that same hour', async () => {
    const forecast = issued(await ask(id));
    const { hours: meant } = fakes.meant(id, place);
    // Two days: the part that all three tell hour by hour. Past and coming hours both.
    const near = forecast.hours.filter((hour) => Math.abs(Date.parse(hour.time) - clock.now().getTime()) < 48 * hourMs);
    expect(near.length).toBeGreaterThan(45);
    for (const hour of near) {
      const intended = meant.get(Date.parse(hour.time));
      expect(intended, hour.time).toBeDefined();
      for (const [field, grain] of Object.entries(grains[id]) as [Field, number][]) {
        expect(hour[field], `${field} at ${hour.time}`).not.toBeNull();
        expect(apart(field, hour[field]!, intended![field]!), `${field} at ${hour.time}: ${hour[field]} for ${intended![field]}`).toBeLessThanOrEqual(grain);
      }
      for (const field of silent[id]) expect(hour[field], `${field} at ${hour.time}`).toBeNull();
    }
  });

  it('would not fit one hour earlier or later', async () => {
    const forecast = issued(await ask(id));
    const { hours: meant } = fakes.meant(id, place);
    const misfit = (shiftH: number, field: Field): number => {
      const pairs = forecast.hours.map((hour) => [hour[field], meant.get(Date.parse(hour.time) + shiftH * hourMs)?.[field]] as const).filter((pair) => typeof pair[0] === 'number' && typeof pair[1] === 'number');
      return pairs.reduce((sum, [a, b]) => sum + apart(field, a!, b!), 0) / pairs.length;
    };
    for (const field of Object.keys(grains[id]) as Field[]) {
      if (field === 'precipitationMm' || field === 'precipitationProbabilityPct') continue;
      expect(misfit(0, field), field).toBeLessThan(Math.min(misfit(1, field), misfit(-1, field)) * 0.7);
    }
  });

  it('is in order, none doubled, and fits the contract of an assessment', async () => {
    const { hours } = issued(await ask(id));
    const times = hours.map((hour) => Date.parse(hour.time));
    expect(times).toEqual([...new Set(times)].sort((a, b) => a - b));
    for (const hour of hours) expect(hourSchema.safeParse(hour).success, hour.time).toBe(true);
  });
});

describe('rain', () => {
  // A wet spell of this seed, so that the sums have something to sum.
  const wet = (hours: Iterable<ForecastHour>): number => [...hours].reduce((sum, hour) => sum + (hour.precipitationMm ?? 0), 0);

  it('keeps its six-hour totals when the National Weather Service’s blocks are divided, and its chance when they are repeated', async () => {
    const { hours } = issued(await ask('nws'));
    const { hours: meant } = fakes.meant('nws', place);
    expect(wet(meant.values())).toBeGreaterThan(2);
    for (let from = 0; from < hours.length; from += 1) {
      const startMs = Date.parse(hours[from]!.time);
      if ((startMs / hourMs) % 6 !== 0 || startMs > clock.now().getTime() + 60 * hourMs) continue;
      const block = hours.slice(from, from + 6);
      const intended = block.map((hour) => meant.get(Date.parse(hour.time))!);
      expect(wet(block), hours[from]!.time).toBeCloseTo(wet(intended), 0);
      expect(new Set(block.map((hour) => hour.precipitationMm)).size).toBe(1);
      expect(block.map((hour) => hour.precipitationProbabilityPct)).toEqual(Array(6).fill(Math.max(...intended.map((hour) => hour.precipitationProbabilityPct!))));
    }
  });

  it('is unknown, not zero, beyond the end of the National Weather Service’s amounts', async () => {
    const { hours } = issued(await ask('nws'));
    const far = hours.filter((hour) => Date.parse(hour.time) > clock.now().getTime() + 90 * hourMs);
    expect(far.length).toBeGreaterThan(48);
    for (const hour of far) expect([hour.precipitationMm, hour.temperature2mC === null]).toEqual([null, false]);
  });

  it('of MET Norway’s six-hour part is spread over its hours, whose other values stay unknown', async () => {
    const { hours } = issued(await ask('metNorway'));
    const { hours: meant } = fakes.meant('metNorway', place);
    const far = hours.filter((hour) => Date.parse(hour.time) >= clock.now().getTime() + 80 * hourMs).slice(0, 36);
    for (let from = 0; from < far.length; from += 1) {
      const hour = far[from]!;
      const onGrid = (Date.parse(hour.time) / hourMs) % 6 === 0;
      expect(hour.temperature2mC === null, hour.time).toBe(!onGrid);
      expect(hour.windSpeed10mMs === null).toBe(!onGrid);
      expect(hour.precipitationMm).not.toBeNull();
      if (onGrid && far[from + 5]) expect(wet(far.slice(from, from + 6))).toBeCloseTo(wet(far.slice(from, from + 6).map((one) => meant.get(Date.parse(one.time))!)), 1);
    }
  });
});

describe('the ensemble', () => {
  it('comes home member by member, each at its own hours, with rain that is certain in each', async () => {
    const { members, model, place: used } = await ensemble.fetchEnsemble(place, new AbortController().signal);
    const meant = fakes.meantMembers(place);
    expect(members).toHaveLength(31);
    expect(model).toBe('gfs_seamless');
    expect(Math.abs(used.latitude - place.latitude)).toBeLessThan(0.03);
    members.forEach((hours, member) => {
      expect(hours).toHaveLength(192);
      for (const hour of hours.slice(0, -1)) {
        const intended = meant[member]!.get(Date.parse(hour.time))!;
        expect(hour.windSpeed10mMs).toBeCloseTo(intended.windSpeed10mMs!, 2);
        expect(hour.windGust10mMs).toBeCloseTo(intended.windGust10mMs!, 1);
        expect(hour.precipitationMm).toBeCloseTo(intended.precipitationMm!, 2);
        expect(hour.precipitationProbabilityPct).toBe(intended.precipitationMm! > 0.1 ? 100 : 0);
      }
      // The last stamp's sums would need one stamp more.
      expect([hours.at(-1)!.precipitationMm, hours.at(-1)!.precipitationProbabilityPct, hours.at(-1)!.windGust10mMs]).toEqual([null, null, null]);
    });
    const winds = members.map((hours) => hours[150]!.windSpeed10mMs!);
    expect(Math.max(...winds) - Math.min(...winds)).toBeGreaterThan(1);
  });
});

describe('MET Norway in the Nordic area', () => {
  it('tells gusts, the greater of both ends of the hour, and probabilities', async () => {
    const { provider } = stage();
    const farm = { latitude: 60.4, longitude: 10.2, elevationM: 160 };
    const { hours } = issued(await provider('metNorway').fetch(farm, null, new AbortController().signal));
    const { hours: meant } = fakes.meant('metNorway', farm);
    const hour = hours[6]!;
    const startMs = Date.parse(hour.time);
    expect(hour.windGust10mMs).toBe(Math.max(meant.get(startMs)!.windGust10mMs!, meant.get(startMs + hourMs)!.windGust10mMs!));
    expect(hour.precipitationProbabilityPct).toBe(meant.get(startMs)!.precipitationProbabilityPct);
  });
});
