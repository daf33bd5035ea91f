/** Properties that must hold for every case (fast-check); seeds are fixed, so a failure repeats. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { assess, judge, prepareMorning } from '../../shared/assessment/index.ts';
import type { AssessmentAnswer, LimitName } from '../../shared/assessment/answer.ts';
import type { AssessmentCase, ForecastHour } from '../../shared/assessment/case.ts';
import { celsiusToF, fahrenheitToC, mphToMs, msToMph } from '../../shared/units/units.ts';
import { parseCase } from '../../shared/assessment/problems.ts';
import { allLimits, caseOf, fairHours, rawCase, site } from './cases.ts';

const runs = { numRuns: 300, seed: 20261201 };


/** An hour's weather around fair and foul. */
const weather = fc.record({
  temperature2mC: fc.double({ min: -2, max: 32, noNaN: true }),
  windSpeed10mMs: fc.double({ min: 0, max: 6, noNaN: true }),
  windFromDeg: fc.double({ min: 0, max: 360, noNaN: true }),
  cloudCoverPct: fc.double({ min: 0, max: 100, noNaN: true }),
  precipitationMm: fc.oneof({ weight: 20, arbitrary: fc.constant(0) }, { weight: 1, arbitrary: fc.double({ min: 0, max: 5, noNaN: true }) }),
  precipitationProbabilityPct: fc.oneof({ weight: 20, arbitrary: fc.integer({ min: 0, max: 30 }) }, { weight: 1, arbitrary: fc.integer({ min: 0, max: 100 }) }),
});

/** Three-hourly weather for three days, humidity and gusts in keeping with it. */
const hoursArbitrary = fc.tuple(fc.array(weather, { minLength: 25, maxLength: 25 }), fc.double({ min: 35, max: 98, noNaN: true }), fc.double({ min: 1.05, max: 2, noNaN: true })).map(([nodes, humidity, gustFactor]) => {
  let index = 0;
  return fairHours(() => {
    const at = index / 3;
    const a = nodes[Math.floor(at)]!;
    const b = nodes[Math.floor(at) + 1]!;
    const share = at % 1;
    index += 1;
    const windSpeed10mMs = a.windSpeed10mMs + (b.windSpeed10mMs - a.windSpeed10mMs) * share;
    const temperature2mC = a.temperature2mC + (b.temperature2mC - a.temperature2mC) * share;
    return { ...a, temperature2mC, windSpeed10mMs, windGust10mMs: windSpeed10mMs * gustFactor, relativeHumidityPct: humidity, dewPoint2mC: null };
  });
});

const limitsArbitrary = fc.record(
  {
    windMaxMs: fc.double({ min: 1, max: 8, noNaN: true }),
    windMinMs: fc.double({ min: 0, max: 1, noNaN: true }),
    gustMaxMs: fc.double({ min: 3, max: 15, noNaN: true }),
    inversionMax: fc.double({ min: 0.2, max: 1, noNaN: true }),
    rainFreeHours: fc.integer({ min: 0, max: 12 }),
    foliageDry: fc.constantFrom(true, false, false),
    pollinators: fc.record({ kinds: fc.subarray(['honeyBee', 'bumbleBee', 'masonBee'] as const, { minLength: 1 }), bloom: fc.boolean(), beeStatement: fc.constantFrom('none', 'notWhileForaging', 'notInBloom') }),
    temperatureMinC: fc.double({ min: -5, max: 8, noNaN: true }),
    temperatureMaxC: fc.double({ min: 15, max: 32, noNaN: true }),
    deltaTMinC: fc.double({ min: 0, max: 2, noNaN: true }),
    deltaTMaxC: fc.double({ min: 4, max: 12, noNaN: true }),
  },
  { requiredKeys: [] },
);

const placesArbitrary = fc.array(fc.record({ name: fc.constant('Hives'), bearingDeg: fc.double({ min: 0, max: 360, noNaN: true }), distanceM: fc.double({ min: 0, max: 400, noNaN: true }) }), { maxLength: 3 });

const caseArbitrary: fc.Arbitrary<AssessmentCase> = fc
  .record({ hours: hoursArbitrary, limits: limitsArbitrary, sensitivePlaces: placesArbitrary, minutesNeeded: fc.integer({ min: 0, max: 180 }), reserveMinutes: fc.integer({ min: 0, max: 30 }) })
  .map((change) => caseOf(change));

const headroomOf = (answer: AssessmentAnswer, limit: LimitName): (number | null)[] => answer.steps.map((step) => step.limits[limit]?.headroom ?? null);
const openMinutes = (answer: AssessmentAnswer): number => answer.windows.reduce((sum, { minutes }) => sum + minutes, 0);

describe('every assessment', () => {
  it('says go exactly when a window holds the job and its reserve, and windows are runs of open steps', () => {
    let goes = 0;
    fc.assert(
      fc.property(caseArbitrary, (theCase) => {
        const answer = assess(theCase);
        if (answer.verdict === 'go') goes += 1;
        const needed = theCase.minutesNeeded + theCase.reserveMinutes;
        expect(answer.verdict).toBe(answer.windows.some(({ minutes }) => minutes >= needed) ? 'go' : 'hold');
        if (answer.verdict === 'go') expect(answer.enoughToTell).toBe(true);
        for (const step of answer.steps) {
          const hard = Object.values(step.limits).filter(({ kind }) => kind === 'hard');
          const isOpen = hard.length > 0 && hard.every(({ headroom }) => headroom !== null && headroom >= 0);
          expect(answer.windows.some(({ start, end }) => start <= step.time && step.time < end)).toBe(isOpen);
        }
        for (const window of answer.windows) {
          expect((Date.parse(window.end) - Date.parse(window.start)) / 60_000).toBe(window.minutes);
          if (window.bestStart === null || window.latestStart === null) continue;
          expect(window.bestStart >= window.start && window.bestStart <= window.latestStart).toBe(true);
          expect(Date.parse(window.latestStart) + needed * 60_000).toBeLessThanOrEqual(Date.parse(window.end));
        }
      }),
      runs,
    );
    expect(goes).toBeGreaterThan(20);
  });

  it('more wind never gives the wind or the gusts more headroom', () => {
    fc.assert(
      fc.property(caseArbitrary, fc.double({ min: 0, max: 10, noNaN: true }), (theCase, more) => {
        const windier = { ...theCase, hours: theCase.hours.map((hour) => ({ ...hour, windSpeed10mMs: (hour.windSpeed10mMs ?? 0) + more, windGust10mMs: (hour.windGust10mMs ?? 0) + more })) };
        const [before, after] = [assess(theCase), assess(windier)];
        for (const limit of ['wind', 'gusts'] as const) {
          const calm = headroomOf(before, limit);
          for (const [index, headroom] of headroomOf(after, limit).entries()) if (headroom !== null && calm[index] !== null) expect(headroom).toBeLessThanOrEqual(calm[index]!);
        }
      }),
      runs,
    );
  });

  it('a missing value never turns a hold into a go', () => {
    const fields = ['temperature2mC', 'windSpeed10mMs', 'windGust10mMs', 'windFromDeg', 'cloudCoverPct', 'precipitationMm', 'precipitationProbabilityPct', 'relativeHumidityPct', 'shortwaveWm2'] as const;
    let holds = 0;
    fc.assert(
      fc.property(caseArbitrary, fc.array(fc.tuple(fc.nat(71), fc.constantFrom(...fields)), { minLength: 1, maxLength: 40 }), fc.option(fc.constantFrom(...fields)), (theCase, gaps, wholeLayer) => {
        if (assess(theCase).verdict === 'go') return;
        holds += 1;
        const hours: ForecastHour[] = theCase.hours.map((hour) => ({ ...hour, ...(wholeLayer ? { [wholeLayer]: null } : {}) }));
        for (const [index, field] of gaps) hours[index] = { ...hours[index]!, [field]: null } as ForecastHour;
        expect(assess({ ...theCase, hours }).verdict).toBe('hold');
      }),
      { ...runs, numRuns: 600 },
    );
    expect(holds).toBeGreaterThan(100);
  });

  it('an hour left out never turns a hold into a go', () => {
    fc.assert(
      fc.property(caseArbitrary, fc.array(fc.nat(71), { minLength: 1, maxLength: 10 }), (theCase, gone) => {
        if (assess(theCase).verdict === 'go') return;
        expect(assess({ ...theCase, hours: theCase.hours.filter((_, index) => !gone.includes(index)) }).verdict).toBe('hold');
      }),
      runs,
    );
  });

  it('a longer job never finds more windows that hold it', () => {
    fc.assert(
      fc.property(caseArbitrary, fc.integer({ min: 1, max: 200 }), (theCase, more) => {
        const morning = prepareMorning(theCase);
        const fits = (minutesNeeded: number): number => judge(morning, { ...theCase, minutesNeeded }).windows.filter(({ bestStart }) => bestStart !== null).length;
        expect(fits(theCase.minutesNeeded + more)).toBeLessThanOrEqual(fits(theCase.minutesNeeded));
      }),
      runs,
    );
  });

  it('a stricter wind limit never opens more minutes', () => {
    fc.assert(
      fc.property(caseArbitrary, fc.double({ min: 0.3, max: 1, noNaN: true }), (theCase, share) => {
        const morning = prepareMorning(theCase);
        const windMaxMs = theCase.limits.windMaxMs ?? 5;
        const open = (max: number): number => openMinutes(judge(morning, { ...theCase, limits: { ...theCase.limits, windMaxMs: max } }));
        expect(open(windMaxMs * share)).toBeLessThanOrEqual(open(windMaxMs));
      }),
      runs,
    );
  });

  it('another name of the same clock changes nothing', () => {
    fc.assert(
      fc.property(caseArbitrary, (theCase) => {
        const [here, there] = ['America/Los_Angeles', 'America/Vancouver'].map((timeZone) => assess({ ...theCase, site: { ...theCase.site, timeZone } }));
        expect(there).toEqual(here);
      }),
      { ...runs, numRuns: 50 },
    );
  });

  it('a clock set otherwise changes no step that both mornings have, and no verdict of a window that both hold', () => {
    fc.assert(
      fc.property(caseArbitrary, fc.constantFrom('America/Phoenix', 'America/Denver', 'Pacific/Honolulu', 'Etc/GMT+9'), (theCase, timeZone) => {
        const [here, there] = [site.timeZone, timeZone].map((zone) => assess({ ...theCase, limits: { ...theCase.limits, pollinators: undefined }, site: { ...theCase.site, timeZone: zone } }));
        const other = new Map(there!.steps.map((step) => [step.time, step]));
        let shared = 0;
        for (const step of here!.steps) {
          const twin = other.get(step.time);
          if (!twin) continue;
          shared += 1;
          expect(twin).toEqual(step);
        }
        expect(shared).toBeGreaterThan(30);
        const noon = [here!.sun.localNoon, there!.sun.localNoon].sort()[0]!;
        const early = here!.windows.some(({ bestStart, start }) => bestStart !== null && Date.parse(start) + (theCase.minutesNeeded + theCase.reserveMinutes) * 60_000 <= Date.parse(noon));
        if (early) expect(there!.verdict).toBe('go');
      }),
      { ...runs, numRuns: 100 },
    );
  });

  it('entries in miles per hour and °F give the verdict of the same entries in m/s and °C', () => {
    fc.assert(
      fc.property(hoursArbitrary, fc.integer({ min: 3, max: 20 }), fc.integer({ min: 60, max: 95 }), (hours, maxMph, maxF) => {
        const metric = { windMaxMs: mphToMs(maxMph), temperatureMaxC: fahrenheitToC(maxF) };
        const us = { windMaxMs: mphToMs(msToMph(metric.windMaxMs)), temperatureMaxC: fahrenheitToC(celsiusToF(metric.temperatureMaxC)) };
        const [a, b] = [metric, us].map((limits) => assess(caseOf({ hours, limits: { ...limits, windHeightM: 2 } })));
        expect(b!.verdict).toBe(a!.verdict);
        expect(b!.windows).toEqual(a!.windows);
      }),
      runs,
    );
  });

  it('headroom lies in −1..1 and every answer fits the schema of answers', async () => {
    const { answerSchema } = await import('../../shared/assessment/answer.ts');
    fc.assert(
      fc.property(caseArbitrary, (theCase) => {
        const parsed = answerSchema.safeParse(JSON.parse(JSON.stringify(assess(theCase))));
        expect(parsed.error?.issues ?? []).toEqual([]);
      }),
      { ...runs, numRuns: 60 },
    );
  });
});

describe('the fair day of these tests', () => {
  it('is a go with every limit judged', () => {
    const answer = assess(caseOf({ limits: allLimits, sensitivePlaces: [{ name: 'Hives', bearingDeg: 270, distanceM: 300 }] }));
    expect(answer.verdict).toBe('go');
    expect(Object.keys(answer.steps[0]!.limits)).toHaveLength(10);
  });

  it('is read alike from JSON', () => {
    const parsed = parseCase(JSON.parse(JSON.stringify(rawCase())));
    expect(parsed.ok).toBe(true);
  });
});

