/** 100,000 random and hostile inputs through the parser and the assessment behind the assess command. */
import { describe, expect, it } from 'vitest';
import { answerText } from '../../shared/assessment/command-answer.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { allLimits, date, fairHours, rawCase } from './cases.ts';

type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

/** A small seeded generator (mulberry32), so that a failure repeats. */
function seeded(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}

const random = seeded(20261201);
const pick = <T>(list: readonly T[]): T => list[Math.floor(random() * list.length)]!;
const deep = (levels: number): Json => JSON.parse(`${'['.repeat(levels)}${']'.repeat(levels)}`) as Json;

const hostile: Json[] = [null, true, false, 0, -0, -3, 140, -1e-9, 361, 99_999, 1e308, -1e308, 5e-324, 2 ** 53, '', 'NaN', 'Infinity', '12', '2026-02-30', '0000-00-00', '2026-06-10T11:30:00Z', '2026-06-10T11:00:00+02:00', '__proto__', '\u0000', '😀'.repeat(50), 'x'.repeat(5000), [], [[]], {}, [null], { constructor: 1 }, deep(300)];

/** Replaces, drops or adds one value somewhere in a case. */
function mutate(value: Json): void {
  let holder: Json = value;
  for (let depth = 0; depth < 6; depth += 1) {
    if (typeof holder !== 'object' || holder === null) return;
    const keys = Object.keys(holder);
    const key = keys.length === 0 ? 'extra' : pick(keys);
    const next: Json | undefined = (holder as Record<string, Json>)[key];
    if (typeof next === 'object' && next !== null && random() < 0.75) {
      holder = next;
      continue;
    }
    const change = random();
    if (change < 0.7) (holder as Record<string, Json>)[key] = structuredClone(pick(hostile));
    else if (change < 0.85) delete (holder as Record<string, Json>)[key];
    else if (!Array.isArray(holder)) (holder as Record<string, Json>)[pick(['extra', 'toString', 'constructor', 'hours', 'verdict'])] = structuredClone(pick(hostile));
    return;
  }
}

/** Damages the text itself. */
function damage(text: string): string {
  const at = Math.floor(random() * text.length);
  switch (Math.floor(random() * 6)) {
    case 0:
      return text.slice(0, at);
    case 1:
      return text.slice(0, at) + pick(['NaN', '1e999', '-Infinity', '"', '}', ',', '\u0000', '﻿', '__proto__']) + text.slice(at);
    case 2:
      return text.replace('"site"', '"__proto__"');
    case 3:
      return text.replace('{', '{"__proto__":{"verdict":"go"},');
    case 4:
      return text.replace(/:(\d+)/, ':1e999');
    default:
      return text.slice(0, at) + text.slice(at + 3);
  }
}

const base = rawCase({ limits: allLimits, hours: fairHours(undefined, date, 48), sensitivePlaces: [{ name: 'Hives', bearingDeg: 270, distanceM: 300 }] });
const baseText = JSON.stringify(base);

/** Independent of the parser: whether a case that was answered with go makes sense. */
function isSane(theCase: { hours: ForecastHour[]; minutesNeeded: number; date: string }): boolean {
  const inRange = (value: number | null | undefined, min: number, max: number): boolean => value === null || value === undefined || (value >= min && value <= max);
  const times = theCase.hours.map(({ time }) => Date.parse(time));
  return (
    theCase.minutesNeeded >= 0 &&
    theCase.hours.length <= 408 &&
    times.every((time, index) => time % 3_600_000 === 0 && (index === 0 || time > times[index - 1]!)) &&
    theCase.hours.every((hour) => inRange(hour.windSpeed10mMs, 0, 100) && inRange(hour.relativeHumidityPct, 0, 100) && inRange(hour.windFromDeg, 0, 360) && inRange(hour.temperature2mC, -60, 60) && inRange(hour.precipitationMm, 0, 500))
  );
}

/** An answer is a verdict or a list of problems, each with a path and words. */
function check(text: string): 'go' | 'hold' | 'refused' {
  const { answer, problems } = answerText(text);
  const printed = JSON.parse(JSON.stringify(answer)) as { verdict?: string; problems?: { path: string; message: string }[] };
  if (problems) {
    expect(printed.problems!.length).toBeGreaterThan(0);
    for (const { path, message } of printed.problems!) if (typeof path !== 'string' || message.length === 0) throw new Error(`problem without words: ${text.slice(0, 200)}`);
    return 'refused';
  }
  if (printed.verdict !== 'go' && printed.verdict !== 'hold') throw new Error(`neither answer nor refusal: ${text.slice(0, 200)}`);
  if (printed.verdict === 'go' && !isSane(JSON.parse(text.replace(/^\uFEFF/, '')) as Parameters<typeof isSane>[0])) throw new Error(`a go on nonsense: ${text.slice(0, 200)}`);
  return printed.verdict;
}

describe('hostile input', () => {
  it('in 100,000 random and damaged cases is answered or refused, never crashes, and is never a go on nonsense', () => {
    const counts = { go: 0, hold: 0, refused: 0 };
    for (let turn = 0; turn < 100_000; turn += 1) {
      const kind = random();
      if (kind < 0.5) {
        // Few hours keep most turns cheap; every eighth is whole.
        const theCase = JSON.parse(baseText) as { [key: string]: Json };
        if (turn % 8 !== 0) (theCase['hours'] as Json[]).length = 6;
        const changes = 1 + Math.floor(random() * 3);
        for (let change = 0; change < changes; change += 1) mutate(theCase);
        counts[check(JSON.stringify(theCase))] += 1;
      } else if (kind < 0.8) counts[check(damage(baseText.slice(0, 1200)))] += 1;
      else if (kind < 0.85) counts[check(damage(baseText))] += 1;
      else counts[check(JSON.stringify(pick(hostile)))] += 1;
    }
    expect(counts.refused).toBeGreaterThan(80_000);
    expect(counts.hold).toBeGreaterThan(1000);
    expect(counts.go).toBeGreaterThan(100);
  }, 300_000);

  const hours = fairHours();
  const withHour = (change: Record<string, unknown>) => ({ hours: hours.map((hour, index) => (index === 12 ? { ...hour, ...change } : hour)) });
  it.each([
    ['wind of −3', withHour({ windSpeed10mMs: -3 })],
    ['humidity of 140', withHour({ relativeHumidityPct: 140 })],
    ['a direction of 400°', withHour({ windFromDeg: 400 })],
    ['hours out of order', { hours: [...hours].reverse() }],
    ['an hour given twice', { hours: hours.flatMap((hour, index) => (index === 5 ? [hour, hour] : [hour])) }],
    ['hours in another zone', { hours: hours.map((hour) => ({ ...hour, time: hour.time.replace('.000Z', '-07:00') })) }],
    ['hours off the hour', { hours: hours.map((hour) => ({ ...hour, time: hour.time.replace(':00:00.000Z', ':30:00.000Z') })) }],
    ['400 days of hours', { hours: fairHours(undefined, '2026-01-01', 9600) }],
    ['a day that no calendar has', { date: '2026-02-30' }],
    ['a year of long ago', { date: '0026-06-10' }],
    ['a zone that no one knows', { site: { latitude: 44.9, longitude: -123.1, elevationM: 160, timeZone: 'Mars/Olympus' } }],
    ['a bare offset for a zone', { site: { latitude: 44.9, longitude: -123.1, elevationM: 160, timeZone: '+05:00' } }],
    ['a zone on the far side of the world', { site: { latitude: 44.9, longitude: -123.1, elevationM: 160, timeZone: 'Asia/Tokyo' } }],
    ['a least wind above the greatest', { limits: { windMaxMs: 2, windMinMs: 3 } }],
    ['a least temperature above the greatest', { limits: { temperatureMinC: 20, temperatureMaxC: 10 } }],
    ['a limit that does not exist', { limits: { windMax: 4 } }],
    ['minutes below zero', { minutesNeeded: -5 }],
  ])('%s is refused with a path', (_name, change) => {
    const { problems } = answerText(JSON.stringify(rawCase(change)));
    expect(problems).not.toBeNull();
    expect(problems![0]!.message.length).toBeGreaterThan(5);
    if (Object.keys(change)[0] !== 'hours' || !_name.startsWith('400')) expect(problems![0]!.path).toContain(Object.keys(change)[0]);
  });

  it('nests ten thousand deep without harm', () => {
    expect(answerText(`${'['.repeat(10_000)}${']'.repeat(10_000)}`).problems).not.toBeNull();
    expect(answerText(JSON.stringify(rawCase({ site: 'here' })).replace('"here"', `${'['.repeat(5000)}${']'.repeat(5000)}`)).problems).not.toBeNull();
  });

  it('lists at most a hundred problems and counts the rest', () => {
    const { problems } = answerText(JSON.stringify(rawCase({ hours: hours.map((hour) => ({ ...hour, windSpeed10mMs: -1, windFromDeg: -1 })) })));
    expect(problems).toHaveLength(101);
    expect(problems!.at(-1)!.message).toBe('and 44 more');
  });
});

describe('any place and any day', () => {
  it('are answered, from pole to pole through a whole year', () => {
    const zones = ['Etc/UTC', 'Etc/GMT+8', 'Etc/GMT-6', 'Etc/GMT-12', 'Etc/GMT+11'];
    for (let turn = 0; turn < 3000; turn += 1) {
      const zone = Math.floor(random() * zones.length);
      const longitude = [0, -120, 90, 180, -165][zone]! + (random() - 0.5) * 20;
      const day = new Date(Date.UTC(2026, 0, 1 + Math.floor(random() * 365))).toISOString().slice(0, 10);
      const theCase = rawCase({ date: day, site: { latitude: Math.round((random() * 180 - 90) * 100) / 100, longitude: Math.max(-180, Math.min(180, longitude)), elevationM: Math.floor(random() * 3000), timeZone: zones[zone] }, hours: fairHours(undefined, day, 48) });
      expect(check(JSON.stringify(theCase))).not.toBe('refused');
    }
  });
});
