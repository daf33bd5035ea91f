/** The assessment through its door: verdicts, windows and sentences on mornings made for each question. */
import { describe, expect, it } from 'vitest';
import { assess, bestWindowOf, headlineOf, judge, prepareMorning, retell, withoutFreshData } from '../../shared/assessment/index.ts';
import type { AssessmentAnswer } from '../../shared/assessment/answer.ts';
import { windProfileFactor } from '../../shared/atmosphere/wind-profile.ts';
import { allLimits, caseOf, date, fairHours, site } from './cases.ts';

const us = { units: 'us', timeZone: site.timeZone } as const;
const metric = { units: 'metric', timeZone: site.timeZone } as const;
const texts = (answer: AssessmentAnswer): string[] => answer.reasons.map(({ text }) => text);
const windLimits = { windMaxMs: 4.4704, windHeightM: 2 };

/** Wind at 10 m by the hour of the local day. */
const wind = (of: (hour: number) => number) => fairHours((_, hour) => ({ windSpeed10mMs: of(hour), windGust10mMs: of(hour) * 1.4 }));

describe('wind', () => {
  it('is compared at the height of the label by the FAO-56 profile, and as it is at 10 m', () => {
    for (const windHeightM of [2, 3, 10]) {
      const { value } = assess(caseOf({ limits: { windMaxMs: 5, windHeightM }, hours: wind(() => 4) })).steps[10]!.limits.wind!;
      expect(value).toBeCloseTo(4 * windProfileFactor(10, windHeightM), 5);
    }
  });

  it('is interpolated between the hours, and has headroom 1 in calm, 0 at the limit, less beyond', () => {
    const { steps } = assess(caseOf({ limits: { windMaxMs: 4, windHeightM: 10 }, hours: wind((hour) => Math.min(20, Math.max(0, hour - 5) * 4)) }));
    const at = (clock: string) => steps.find(({ time }) => time === `${date}T${clock}:00.000Z`)!.limits.wind!;
    expect(at('12:00')).toMatchObject({ value: 0, headroom: 1 });
    expect(at('12:30')).toMatchObject({ value: 2, headroom: 0.5 });
    expect(at('13:00')).toMatchObject({ value: 4, headroom: 0 });
    expect(at('13:30')).toMatchObject({ value: 6, headroom: -0.5 });
    expect(at('15:00')).toMatchObject({ headroom: -1 });
  });

  it('says by how many minutes the longest window is too short, and what closes it', () => {
    const answer = assess(caseOf({ limits: windLimits, minutesNeeded: 107, reserveMinutes: 10, hours: wind((hour) => (hour <= 6 ? 3 : 9)) }));
    expect(headlineOf(answer, us)).toBe('Hold: 17 minutes short: wind passes 10 mph at 6:30.');
    expect(headlineOf(answer, metric)).toBe('Hold: 17 minutes short: wind passes 4.5 m/s at 06:30.');
    expect(answer.bindingLimit).toBe('wind');
    expect(answer.reasons[0]).toMatchObject({ kind: 'nearestMiss', limit: 'wind', at: `${date}T13:30:00.000Z` });
  });

  it('that is over its limit all morning says so, and how near it came', () => {
    const answer = assess(caseOf({ limits: windLimits, hours: wind((hour) => (hour === 6 ? 6.5 : 9)) }));
    expect(texts(answer).slice(0, 2)).toEqual(['Wind is over 10 mph all morning.', 'Closest at 6:00: wind 10.9 mph against 10 mph.']);
  });

  it('within the usual error of a forecast is told as a caution', () => {
    expect(texts(assess(caseOf({ limits: windLimits, hours: wind(() => 5) }))).join()).toContain('within the usual error of a forecast');
    expect(texts(assess(caseOf({ limits: windLimits, hours: wind(() => 2) }))).join()).not.toContain('usual error');
  });

  it('too light is a limit of its own: still air', () => {
    const answer = assess(caseOf({ limits: { windMinMs: 1.3411, windHeightM: 2 }, hours: wind((hour) => (hour < 8 ? 0.5 : 3)), minutesNeeded: 280 }));
    expect(answer.verdict).toBe('hold');
    expect(texts(answer)[0]).toMatch(/^\d+ minutes short: the air is still \(below 3 mph\) until 7:\d\d\.$/);
  });

  it('gusts are compared as they come at 10 m, and cannot be told when they are missing', () => {
    const limits = { ...windLimits, gustMaxMs: 5 };
    expect(assess(caseOf({ limits, hours: fairHours(() => ({ windSpeed10mMs: 3, windGust10mMs: 5.5 })) })).bindingLimit).toBe('gusts');
    const untold = assess(caseOf({ limits, hours: fairHours(() => ({ windGust10mMs: null })) }));
    expect(untold).toMatchObject({ verdict: 'hold', enoughToTell: false, bindingLimit: 'data' });
    expect(texts(untold)[0]).toContain('gives no gusts');
  });
});

describe('what the farm measured', () => {
  const night = (count: number, share: number) => Array.from({ length: count }, (_, index) => ({ time: `${date}T0${index}:30:00Z`, windSpeedMs: 4 * share * windProfileFactor(10, 2), windHeightM: 2 }));

  it('scales the wind from five readings on by their median, shown as such', () => {
    const learned = assess(caseOf({ limits: windLimits, hours: wind(() => 4), readings: [...night(6, 0.5), { time: `${date}T08:30:00Z`, windSpeedMs: 40, windHeightM: 2 }] }));
    expect(learned.siteWindFactor).toEqual({ factor: expect.closeTo(0.5, 6) as number, readings: 7 });
    expect(learned.steps[0]!.limits.wind!.value).toBeCloseTo(2 * windProfileFactor(10, 2), 5);
    expect(texts(learned)).toContain('Wind at your site is 0.50 times the forecast so far (7 readings), and is reckoned so.');
  });

  it('counts for nothing below five readings', () => {
    const { siteWindFactor, steps } = assess(caseOf({ limits: windLimits, hours: wind(() => 4), readings: night(4, 0.5) }));
    expect(siteWindFactor).toBeNull();
    expect(steps[0]!.limits.wind!.value).toBeCloseTo(4 * windProfileFactor(10, 2), 5);
  });
});

describe('rain', () => {
  const limits = { rainFreeHours: 6, rainMm: 0.2, rainProbabilityPct: 40 };
  const rainAt = (hourOfRain: number, change: Record<string, number | null>) => fairHours((_, hour) => (hour === hourOfRain ? change : {}));

  it('counts dry hours from the end of the window: rain at 1 pm closes a window that needs six of them at 7', () => {
    const answer = assess(caseOf({ limits, hours: rainAt(13, { precipitationMm: 2 }) }));
    expect(answer.windows.at(-1)!.end).toBe(`${date}T14:00:00.000Z`);
    expect(texts(answer).join('\n')).toContain('The window closes at 7:00: work leaves less than 6 h dry from its end at 7:00, rain from 1:00 pm.');
  });

  it('by its chance counts like rain by its amount', () => {
    expect(assess(caseOf({ limits, hours: rainAt(13, { precipitationProbabilityPct: 40 }) })).windows.at(-1)!.end).toBe(`${date}T14:00:00.000Z`);
    expect(assess(caseOf({ limits, hours: rainAt(13, { precipitationProbabilityPct: 39 }) })).windows.at(-1)!.end).toBe(`${date}T19:00:00.000Z`);
  });

  it('that is falling closes the step even when no dry hours are asked for', () => {
    const { steps } = assess(caseOf({ limits: { ...limits, rainFreeHours: 0 }, hours: rainAt(6, { precipitationMm: 1 }) }));
    expect(steps.find(({ time }) => time === `${date}T13:30:00.000Z`)!.limits.rainFree!.headroom).toBe(-1);
    expect(steps.find(({ time }) => time === `${date}T14:00:00.000Z`)!.limits.rainFree!.headroom).toBe(1);
  });

  it('of an hour without amount or chance cannot be told, unless the plan goes by amount alone', () => {
    expect(assess(caseOf({ limits, hours: rainAt(9, { precipitationProbabilityPct: null }) })).enoughToTell).toBe(true);
    const noChance = { hours: fairHours(() => ({ precipitationProbabilityPct: null })) };
    expect(assess(caseOf({ limits, ...noChance }))).toMatchObject({ verdict: 'hold', enoughToTell: false });
    const byAmount = assess(caseOf({ limits: { ...limits, rainProbabilityPct: null }, ...noChance }));
    expect(byAmount.verdict).toBe('go');
    expect(texts(byAmount)).toContain('This forecast tells no chance of rain: dry hours are judged on the amount alone.');
  });

  it('tells the chance over the dry hours as a band, and can hold on its cautious end', () => {
    const hours = fairHours(() => ({ precipitationProbabilityPct: 10 }));
    const answer = assess(caseOf({ limits, hours }));
    expect(texts(answer)).toContain('Chance of rain within 6 h after the work: 10 to 47 %.');
    expect(assess(caseOf({ limits: { ...limits, rainChanceMaxPct: 40 }, hours })).verdict).toBe('hold');
  });

  it('beyond the end of the forecast counts as not known', () => {
    const hours = fairHours().slice(0, 20);
    expect(assess(caseOf({ limits: { ...limits, rainFreeHours: 12 }, hours }))).toMatchObject({ verdict: 'hold', enoughToTell: false });
  });
});

describe('bees', () => {
  const bees = (bloom: boolean, beeStatement: string, kinds = ['honeyBee']) => ({ limits: { ...windLimits, pollinators: { kinds, bloom, beeStatement } } });

  it('hold at any hour where the label says not in bloom and something blooms', () => {
    const answer = assess(caseOf(bees(true, 'notInBloom')));
    expect(answer).toMatchObject({ verdict: 'hold', enoughToTell: true, bindingLimit: 'pollinators' });
    expect(headlineOf(answer, us)).toBe('Hold: something is in bloom, and the label forbids this use then, at any hour.');
  });

  it('hold so even when the weather is not known', () => {
    expect(assess(caseOf({ ...bees(true, 'notInBloom'), hours: [] }))).toMatchObject({ verdict: 'hold', enoughToTell: true, bindingLimit: 'pollinators' });
  });

  it('close the rest of the morning once they may fly, where the label says not while foraging', () => {
    const answer = assess(caseOf(bees(true, 'notWhileForaging')));
    expect(answer.verdict).toBe('go');
    expect(answer.windows).toHaveLength(1);
    expect(answer.windows[0]!.end).toBe(answer.beeActivity!.honeyBee!.possibleFrom);
    expect(answer.beeActivity!.honeyBee!.possibleFrom! <= answer.beeActivity!.honeyBee!.likelyFrom!).toBe(true);
  });

  it('stay a reason to stop when a cold spell follows their start', () => {
    const hours = fairHours((_, hour) => ({ temperature2mC: hour >= 6 && hour <= 7 ? 18 : 6, dewPoint2mC: 3, relativeHumidityPct: null }));
    const answer = assess(caseOf({ ...bees(true, 'notWhileForaging'), hours }));
    const started = answer.steps.findIndex((step) => step.limits.pollinators!.headroom! < 0);
    expect(started).toBeGreaterThan(0);
    for (const step of answer.steps.slice(started)) expect(step.limits.pollinators!.headroom).toBeLessThan(0);
  });

  it('are advice without bloom or statement, and never none in bloom', () => {
    const advice = assess(caseOf(bees(false, 'notWhileForaging')));
    expect(advice.verdict).toBe('go');
    expect(advice.steps[0]!.limits.pollinators!.kind).toBe('advice');
    const cold = assess(caseOf({ ...bees(true, 'notWhileForaging'), hours: fairHours(() => ({ temperature2mC: 2, dewPoint2mC: -2, relativeHumidityPct: null })) }));
    for (const step of cold.steps) expect(step.limits.pollinators!.value).toBeGreaterThan(0);
    expect(texts(cold)).toContain('Something is in bloom: weather never proves that no bee is out, and residue outlasts the morning.');
  });

  it('are judged under the brightest sky when sunlight is missing, and shown by sun and cloud', () => {
    const [given, missing] = [{}, { shortwaveWm2: null }].map((change) => assess(caseOf({ ...bees(true, 'notWhileForaging'), hours: fairHours(() => ({ cloudCoverPct: 100, ...change })) })));
    expect(missing!.windows[0]!.end <= given!.windows[0]!.end).toBe(true);
    expect(texts(missing!)).toContain('Sunlight is not in the forecast and was estimated from sun and cloud.');
  });
});

describe('sensitive places', () => {
  const place = (bearingDeg: number, distanceM: number) => [{ name: 'the hives', bearingDeg, distanceM }];
  const west = { windFromDeg: 270, windSpeed10mMs: 4, windGust10mMs: 6 };
  const placed = (bearingDeg: number, distanceM: number, change: Record<string, number | null> = {}) => assess(caseOf({ limits: windLimits, sensitivePlaces: place(bearingDeg, distanceM), hours: fairHours(() => ({ ...west, ...change })) }));

  it('downwind and in reach hold', () => {
    const answer = placed(90, 60);
    expect(answer).toMatchObject({ verdict: 'hold', bindingLimit: 'towardSensitivePlace' });
    expect(headlineOf(answer, us)).toBe('Hold: the wind may carry spray toward the hives all morning.');
  });

  it('upwind, aside, or out of reach leave the morning open, with no distance called safe', () => {
    expect(placed(270, 60).verdict).toBe('go');
    expect(placed(0, 60).verdict).toBe('go');
    const far = placed(90, 600);
    expect(far.verdict).toBe('go');
    expect(texts(far).join()).toContain('no distance is safe');
  });

  it('in reach hold whatever the direction when the wind idles', () => {
    expect(placed(270, 10, { windSpeed10mMs: 0.8, windGust10mMs: 2 }).verdict).toBe('hold');
  });

  it('in reach cannot be told with an unknown direction; out of reach they can', () => {
    expect(placed(90, 60, { windFromDeg: null })).toMatchObject({ verdict: 'hold', enoughToTell: false });
    expect(placed(90, 600, { windFromDeg: null }).verdict).toBe('go');
  });

  it('within 100 ft are named as inside the zone that must be empty of people', () => {
    expect(texts(placed(270, 20)).join()).toContain('The hives lies 70 ft away, within the 100 ft around the sprayer');
  });

  it('reach farther with finer droplets', () => {
    const at = (dropletClass: string) => assess(caseOf({ limits: windLimits, sensitivePlaces: place(90, 200), sprayer: { dropletClass }, hours: fairHours(() => west) })).verdict;
    expect(at('veryFine')).toBe('hold');
    expect(at('coarse')).toBe('go');
  });
});

describe('temperature and Delta T', () => {
  it('name the end of the range that is passed', () => {
    const cold = assess(caseOf({ limits: { temperatureMinC: 7.2222, temperatureMaxC: 29.4 }, hours: fairHours((_, hour) => ({ temperature2mC: hour < 8 ? 2 : 12, dewPoint2mC: 0, relativeHumidityPct: null })), minutesNeeded: 280 }));
    expect(texts(cold)[0]).toMatch(/^\d+ minutes short: temperature is below 45 °F until 7:\d\d\.$/);
    const dry = assess(caseOf({ limits: { deltaTMaxC: 8 }, hours: fairHours((_, hour) => ({ temperature2mC: 22, dewPoint2mC: hour < 6 ? 14 : -6, relativeHumidityPct: null })), minutesNeeded: 300 }));
    expect(texts(dry)[0]).toMatch(/Delta T passes 14.4 °F at [56]:\d\d\.$/);
    expect(headlineOf(dry, metric)).toMatch(/Delta T passes 8 °C at 0[56]:\d\d\.$/);
  });

  it('below 2 °C without a limit is advice, not a hold', () => {
    const answer = assess(caseOf({ limits: windLimits, hours: fairHours(() => ({ temperature2mC: 10, dewPoint2mC: 9, relativeHumidityPct: null })) }));
    expect(answer.verdict).toBe('go');
    expect(answer.reasons.find(({ key }) => key === 'advice.deltaTLow')).toMatchObject({ limit: 'deltaT', kind: 'advice' });
  });
});

describe('two limits that meet', () => {
  it('are both named when they leave no minute between them', () => {
    const answer = assess(caseOf({ limits: { ...windLimits, temperatureMinC: 8 }, hours: fairHours((_, hour) => ({ temperature2mC: hour < 8 ? 3 : 14, dewPoint2mC: 1, relativeHumidityPct: null, windSpeed10mMs: hour < 6 ? 3 : 9, windGust10mMs: 10 })) }));
    expect(headlineOf(answer, us)).toMatch(/^Hold: no minute is open: temperature is below 46 °F until 7:\d\d, and wind passes 10 mph at 5:\d\d\.$/);
  });
});

describe('what is missing', () => {
  it('without any forecast is not enough to tell', () => {
    const answer = assess(caseOf({ hours: [] }));
    expect(answer).toMatchObject({ verdict: 'hold', enoughToTell: false, bindingLimit: 'data', windows: [] });
    expect(headlineOf(answer, us)).toBe('Hold: not enough to tell: there is no forecast for this morning.');
  });

  it('does not matter where a known limit fails all morning', () => {
    expect(assess(caseOf({ limits: { ...windLimits, gustMaxMs: 9 }, hours: fairHours(() => ({ windSpeed10mMs: 12, windGust10mMs: null })) }))).toMatchObject({ verdict: 'hold', enoughToTell: true, bindingLimit: 'wind' });
  });

  it('does not matter where enough of the morning is known to fit', () => {
    expect(assess(caseOf({ limits: windLimits, hours: fairHours((_, hour) => (hour > 8 ? { windSpeed10mMs: null } : {})) })).verdict).toBe('go');
  });

  it('in a plan without any limit is everything', () => {
    expect(assess(caseOf({ limits: {} }))).toMatchObject({ verdict: 'hold', enoughToTell: false });
  });

  it('counts contradictions as missing and says so', () => {
    const answer = assess(caseOf({ limits: { deltaTMaxC: 10 }, hours: fairHours(() => ({ temperature2mC: 10, dewPoint2mC: 15 })) }));
    expect(answer).toMatchObject({ verdict: 'hold', enoughToTell: false });
    expect(texts(answer)).toContain('The forecast contradicts itself and was not used there: a dew point above the air temperature.');
  });

  it('becomes a hold with its reason when the forecast is too old, whatever it said', () => {
    const stale = withoutFreshData(assess(caseOf()));
    expect(stale).toMatchObject({ verdict: 'hold', enoughToTell: false, bindingLimit: 'data' });
    expect(stale.windows.every(({ bestStart }) => bestStart === null)).toBe(true);
    expect(headlineOf(stale, us)).toBe('Hold: not enough to tell: no fresh forecast is to be had.');
    expect(stale.steps.length).toBeGreaterThan(50);
  });
});

describe('sentences', () => {
  it('say a go with its start, latest start and end, and are told again in other units', () => {
    const answer = assess(caseOf({ limits: windLimits, hours: wind((hour) => (hour <= 6 ? 3 : 9)) }));
    expect(headlineOf(answer, us)).toMatch(/^Go: start at \d:\d\d, at the latest 5:20; the window closes at 6:30\.$/);
    const binding = answer.reasons.find(({ kind }) => kind === 'binding')!;
    expect(retell(binding, answer, metric)).toMatch(/m\/s against 4\.5 m\/s at 0\d:\d\d\.$/);
    expect(retell({ ...binding, key: 'unheard.of' }, answer, metric)).toBe(binding.text);
    expect(bestWindowOf(answer)!.bestStart).not.toBeNull();
  });

  it('each end in a full stop, with no figure left out', () => {
    const answers = [caseOf({ limits: allLimits }), caseOf({ limits: allLimits, hours: fairHours((_, hour) => ({ precipitationMm: hour % 5 === 0 ? 1 : 0, windSpeed10mMs: Math.abs(hour % 7), windGust10mMs: Math.abs(hour % 7) * 1.5 })) }), caseOf({ limits: allLimits, hours: fairHours((_, hour) => (hour % 4 === 0 ? { temperature2mC: null, cloudCoverPct: null } : {})) })].map((theCase) => assess(theCase));
    for (const answer of answers) for (const text of texts(answer)) expect(text).toMatch(/^[A-Z0-9].*[^–]\.$/);
  });
});

describe('a prepared morning', () => {
  it('serves any number of plans alike', () => {
    const theCase = caseOf({ limits: allLimits });
    const morning = prepareMorning(theCase);
    const first = judge(morning, theCase);
    judge(morning, { ...theCase, minutesNeeded: 200 });
    expect(judge(morning, theCase)).toEqual(first);
    expect(first).toEqual(assess(theCase));
  });
});
