import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SettableClock } from '../../server/clock/clock.ts';
import { spanOf } from '../../server/forecasts/adapters/nws-grid.ts';
import { issuedAtOf, nextRunAt, tokenOf } from '../../server/forecasts/adapters/open-meteo-runs.ts';
import { fullJitterMs } from '../../server/forecasts/http/backoff.ts';
import { CircuitBreaker } from '../../server/forecasts/http/circuit-breaker.ts';
import { expiryOf } from '../../server/forecasts/http/expiry.ts';
import { retryAfterMs } from '../../server/forecasts/http/retry-after.ts';
import { conversionFrom } from '../../server/forecasts/units.ts';

const now = new Date('2026-05-20T09:00:00Z');

describe('Retry-After (RFC 9110 §10.2.3)', () => {
  it.each([
    [null, null],
    ['120', 120_000],
    [' 0 ', 0],
    ['Wed, 20 May 2026 09:02:00 GMT', 120_000],
    ['Wed, 20 May 2026 08:00:00 GMT', 0],
    ['soon', null],
    ['-5', null],
    ['', null],
  ])('reads %j as %j ms', (header, ms) => expect(retryAfterMs(header, now)).toBe(ms));
});

describe('freshness of an answer (RFC 9111 §4.2.1)', () => {
  const until = (headers: Record<string, string>): number | null => {
    const at = expiryOf(new Headers(headers), now);
    return at && (at.getTime() - now.getTime()) / 1000;
  };
  it.each([
    [{}, null],
    [{ 'cache-control': 'public, max-age=749, s-maxage=3600' }, 749],
    [{ 'cache-control': 's-maxage=3600' }, null],
    [{ 'cache-control': 'max-age=600', age: '100', expires: 'Wed, 20 May 2026 12:00:00 GMT' }, 500],
    [{ expires: 'Wed, 20 May 2026 09:30:00 GMT' }, 1800],
    [{ date: 'Wed, 20 May 2026 03:00:00 GMT', expires: 'Wed, 20 May 2026 03:31:00 GMT' }, 1860],
    [{ expires: '0' }, null],
    [{ 'cache-control': 'max-age=0' }, null],
  ])('%j lasts %j s', (headers, seconds) => expect(until(headers as Record<string, string>)).toBe(seconds));
});

describe('waits between tries', () => {
  it('lie anywhere between nothing and the doubled bound, never above the cap', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 40 }), fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true }), (attempt, chance) => {
        const ms = fullJitterMs(attempt, { baseMs: 1000, capMs: 8000 }, () => chance);
        expect(ms).toBeGreaterThanOrEqual(0);
        expect(ms).toBeLessThan(Math.min(8000, 1000 * 2 ** attempt) + 1e-9);
      }),
    );
  });
});

describe('the circuit breaker', () => {
  const made = () => {
    const clock = new SettableClock(now);
    clock.stop(now);
    return { clock, breaker: new CircuitBreaker(clock, { failures: 2, restMs: 60_000, longestRestMs: 200_000 }), to: (ms: number) => clock.set(new Date(now.getTime() + ms)) };
  };

  it('lets one single probe through after the rest, however many ask', () => {
    const { breaker, to } = made();
    breaker.failed();
    expect(breaker.enter()).toBe(0);
    breaker.failed();
    expect(breaker.enter()).toBe(60_000);
    to(60_000);
    expect(breaker.enter()).toBe(0);
    expect(breaker.enter()).toBeGreaterThan(0);
    breaker.succeeded();
    expect([breaker.enter(), breaker.enter()]).toEqual([0, 0]);
  });

  it('doubles its rest after each failed probe, up to the longest', () => {
    const { breaker, clock } = made();
    breaker.failed();
    const rests = [60_000, 120_000, 200_000, 200_000].map(() => {
      breaker.failed();
      const restMs = breaker.enter();
      clock.set(new Date(clock.now().getTime() + restMs));
      expect(breaker.enter()).toBe(0);
      return restMs;
    });
    expect(rests).toEqual([60_000, 120_000, 200_000, 200_000]);
  });

  it('gives a probe’s place back when its asker went away, and forgets failures that a success parts', () => {
    const { breaker, to } = made();
    breaker.failed();
    breaker.succeeded();
    breaker.failed();
    expect(breaker.enter()).toBe(0);
    breaker.failed();
    to(60_000);
    expect(breaker.enter()).toBe(0);
    breaker.abandoned();
    expect(breaker.enter()).toBe(0);
  });

  it('is not kept shut by a clock that was set back', () => {
    const { breaker, to } = made();
    breaker.failed(60_000);
    expect(breaker.enter()).toBe(60_000);
    to(-3_600_000);
    expect(breaker.enter()).toBe(0);
  });
});

describe('spans of the National Weather Service (ISO 8601)', () => {
  // Durations seen in real grids.
  it.each([['PT1H', 1], ['PT18H', 18], ['P1D', 24], ['P1DT4H', 28], ['P2DT16H', 64], ['P7DT12H', 180], ['P7DT17H', 185]] as const)('%s is %d hours', (length, hours) => {
    expect(spanOf(`2022-02-03T13:00:00+00:00/${length}`)).toEqual({ startMs: Date.UTC(2022, 1, 3, 13), endMs: Date.UTC(2022, 1, 3, 13 + hours) });
  });
  it('reads starts with an offset, and refuses what is no span', () => {
    expect(spanOf('2022-02-03T08:00:00-05:00/PT2H')?.startMs).toBe(Date.UTC(2022, 1, 3, 13));
    for (const bad of ['', '2022-02-03T13:00:00+00:00', 'PT1H', '2022-02-03T13:00:00+00:00/PT0H', 'yesterday/PT1H']) expect(spanOf(bad), bad).toBeNull();
  });
});

describe('units', () => {
  // One mile is 1609.344 m, one nautical mile 1852 m and one inch 25.4 mm by definition.
  it.each([
    ['temperatureC', 'wmoUnit:degC', 5, 5],
    ['temperatureC', 'wmooUnit:degF', 50, 10],
    ['temperatureC', 'K', 273.15, 0],
    ['speedMs', 'wmoUnit:km_h-1', 18.52, 5.144],
    ['speedMs', 'kn', 10, 5.144],
    ['speedMs', 'mp/h', 10, 4.4704],
    ['depthMm', 'inch', 1, 25.4],
    ['percent', 'unit:percent', 40, 40],
    ['bearingDeg', 'wmoUnit:degree_(angle)', 270, 270],
  ] as const)('%s in %s', (quantity, unit, value, expected) => expect(conversionFrom(quantity, unit)!(value)).toBeCloseTo(expected, 3));
  it('that are absent or strange are no units', () => {
    for (const unit of [null, undefined, '', 'wmoUnit:', 'furlong', 'toString']) expect(conversionFrom('speedMs', unit), String(unit)).toBeNull();
  });
});

describe('model runs of Open-Meteo', () => {
  const at = (text: string): number => Date.parse(text) / 1000;
  const run = (model: string, start: string, arrived: string, intervalH: number) => ({ model, last_run_initialisation_time: at(start), last_run_availability_time: at(arrived), update_interval_seconds: intervalH * 3600 });
  const runs = [run('fine', '2026-05-20T08:00:00Z', '2026-05-20T08:48:00Z', 1), run('coarse', '2026-05-20T00:00:00Z', '2026-05-20T04:50:00Z', 6)];

  it('tell the age of the blend, a token for it, and when the next is due', () => {
    expect(issuedAtOf(runs)?.toISOString()).toBe('2026-05-20T08:00:00.000Z');
    expect(tokenOf(runs, now)).toBe(`runs:fine@${at('2026-05-20T08:00:00Z')},coarse@${at('2026-05-20T00:00:00Z')}`);
    expect(nextRunAt(runs, now)?.toISOString()).toBe('2026-05-20T09:58:00.000Z');
  });
  it('give no token in the ten minutes in which servers may still disagree, and ask again after them', () => {
    const soon = new Date('2026-05-20T08:50:00Z');
    expect(tokenOf(runs, soon)).toBeNull();
    expect(nextRunAt(runs, soon)?.toISOString()).toBe('2026-05-20T08:58:00.000Z');
  });
  it('that are late are asked for every five minutes, no oftener', () => expect(nextRunAt(runs, new Date('2026-05-20T11:00:00Z'))?.toISOString()).toBe('2026-05-20T11:05:00.000Z'));
  it('that nobody told give neither', () => expect([issuedAtOf([]), tokenOf([], now), nextRunAt([], now)]).toEqual([null, null, null]));
});
