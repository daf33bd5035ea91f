import { describe, expect, it } from 'vitest';
import { createWeather, type Weather } from '../../mocks/weather/create-weather.ts';
import { caseFromForecast } from '../../server/forecasts/case-from-forecast.ts';
import { assess } from '../../shared/assessment/index.ts';
import type { AssessmentAnswer } from '../../shared/assessment/answer.ts';
import type { AssessmentCase, ForecastHour } from '../../shared/assessment/case.ts';
import { hourMs, place } from './support.ts';

const mph = 0.44704;
const fahrenheit = (f: number): number => (f - 32) / 1.8;
/** The usual limits of the trade for a backpack blower (common practice, no source). */
const limits = { windMaxMs: 10 * mph, windMinMs: 1.5 * mph, windHeightM: 2, inversionMax: 0.5, rainFreeHours: 4, foliageDry: true, temperatureMinC: fahrenheit(45), temperatureMaxC: fahrenheit(80) } satisfies Partial<AssessmentCase['limits']>;
const site = { ...place, timeZone: 'America/New_York' };
const judged = (date: string, hours: ForecastHour[]): AssessmentAnswer => assess(caseFromForecast(hours, { site, date, minutesNeeded: 30, limits }));

/** Every third morning of spring and summer: the verdict of the evening before (19 h local time) and of first light (4 h). */
function season(weather: Weather): { eve: AssessmentAnswer; dawn: AssessmentAnswer }[] {
  return Array.from({ length: 46 }, (_, index) => {
    const dayMs = Date.parse('2026-04-15T00:00:00Z') + index * 72 * hourMs;
    const date = new Date(dayMs).toISOString().slice(0, 10);
    return { eve: judged(date, weather.issueAt(dayMs - hourMs, { source: 'openMeteo', futureHours: 72 })), dawn: judged(date, weather.issueAt(dayMs + 8 * hourMs, { source: 'openMeteo', futureHours: 72 })) };
  });
}

const seeds = [7, 11, 23, 42];
const seasons = new Map(seeds.map((seed) => [seed, season(createWeather({ seed, ...place }))]));
const shareOfGo = (mornings: { dawn: AssessmentAnswer }[]): number => mornings.filter(({ dawn }) => dawn.verdict === 'go').length / mornings.length;

describe('spring and summer of the made-up weather, judged on the usual limits', () => {
  it('is fit on about half of its mornings or somewhat fewer, over several seeds', () => {
    const share = shareOfGo([...seasons.values()].flat());
    expect(share).toBeGreaterThan(0.35);
    expect(share).toBeLessThan(0.57);
  });

  it.each(seeds)('(seed %d) has fit mornings and unfit ones, neither rare, and always enough to tell', (seed) => {
    const mornings = seasons.get(seed)!;
    expect(shareOfGo(mornings)).toBeGreaterThan(0.2);
    expect(shareOfGo(mornings)).toBeLessThan(0.7);
    expect(mornings.every(({ dawn, eve }) => dawn.enoughToTell && eve.enoughToTell)).toBe(true);
  });

  it.each(seeds)('(seed %d) binds now by one thing and now by another', (seed) => {
    const binding = new Set(seasons.get(seed)!.filter(({ dawn }) => dawn.verdict === 'hold').map(({ dawn }) => dawn.bindingLimit));
    expect(binding.size, [...binding].join()).toBeGreaterThanOrEqual(3);
    expect(binding.has('rainFree')).toBe(true);
  });

  it.each(seeds)('(seed %d) has mornings whose verdict turns between the evening and first light', (seed) => expect(seasons.get(seed)!.filter(({ eve, dawn }) => eve.verdict !== dawn.verdict).length).toBeGreaterThan(0));
});
