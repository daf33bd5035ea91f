/** The layout of a morning: civil dawn to local noon through the clock changes and at the ends of the world. */
import { DateTime } from 'luxon';
import { describe, expect, it } from 'vitest';
import { assess, morningOf } from '../../shared/assessment/index.ts';
import { isTimeZone, localDateOf, localInstantMs, localMinutesOf, zoneOffsetMinutes } from '../../shared/units/time-zone.ts';
import { caseOf, fairHours } from './cases.ts';

const at = (latitude: number, longitude: number, timeZone: string, date: string) => morningOf({ latitude, longitude, elevationM: 100, timeZone }, date);
const iso = (ms: number): string => new Date(ms).toISOString();

describe('a morning', () => {
  it('runs from the first full five minutes after civil dawn to noon on the local clock', () => {
    const morning = at(44.9, -123.1, 'America/Los_Angeles', '2026-06-10');
    expect(iso(morning.startMs)).toBe('2026-06-10T11:50:00.000Z');
    expect(iso(morning.startMs + morning.count * 300_000)).toBe('2026-06-10T19:00:00.000Z');
    expect(morning.startMs - morning.sun.civilDawnMs!).toBeLessThan(300_000);
  });

  it.each([
    ['2026-03-07', '2026-03-07T20:00:00.000Z'],
    ['2026-03-08', '2026-03-08T19:00:00.000Z'],
    ['2026-10-31', '2026-10-31T19:00:00.000Z'],
    ['2026-11-01', '2026-11-01T20:00:00.000Z'],
  ])('ends at noon of its own clock on the days of the clock change: %s', (date, noon) => {
    const morning = at(44.9, -123.1, 'America/Los_Angeles', date);
    expect(iso(morning.localNoonMs)).toBe(noon);
    expect(morning.count).toBeGreaterThan(50);
  });

  it('belongs to the date of its zone, also east of the date line and with half-hour clocks', () => {
    for (const [latitude, longitude, timeZone] of [[1.87, -157.4, 'Pacific/Kiritimati'], [-43.9, -176.5, 'Pacific/Chatham'], [22.6, 88.4, 'Asia/Kolkata'], [39.5, 76, 'Asia/Shanghai']] as const) {
      const morning = at(latitude, longitude, timeZone, '2026-06-10');
      expect(localDateOf(morning.startMs, timeZone)).toBe('2026-06-10');
      expect(morning.count).toBeGreaterThan(30);
      expect(Math.abs(morning.sun.solarNoonMs - morning.localNoonMs)).toBeLessThan(4 * 3_600_000);
    }
  });

  it('of a polar day begins at midnight, and its sun never sets', () => {
    const morning = at(69.65, 18.96, 'Europe/Oslo', '2026-06-21');
    expect(morning.sun).toMatchObject({ civilDawnMs: null, sunriseMs: null });
    expect(iso(morning.startMs)).toBe('2026-06-20T22:00:00.000Z');
    expect(morning.count).toBe(144);
    expect(Math.min(...morning.sunAltitudeDeg)).toBeGreaterThan(0);
  });

  it('of a white night without dawn begins at midnight too', () => {
    const morning = at(62, 10, 'Europe/Oslo', '2026-06-21');
    expect(morning.sun.civilDawnMs).toBeNull();
    expect(morning.sun.sunriseMs).not.toBeNull();
    expect(iso(morning.startMs)).toBe('2026-06-20T22:00:00.000Z');
  });

  it('of a polar night does not exist: a hold that says so', () => {
    const site = { latitude: 78.2, longitude: 15.6, elevationM: 10, timeZone: 'Arctic/Longyearbyen' };
    const answer = assess(caseOf({ site, date: '2026-12-20', hours: fairHours(undefined, '2026-12-20') }));
    expect(answer).toMatchObject({ verdict: 'hold', enoughToTell: true, bindingLimit: 'time', steps: [] });
    expect(answer.reasons[0]!.text).toBe('There is no daylight before noon on this date.');
  });

  it('exists at the poles and on the equator without harm', () => {
    for (const latitude of [-90, 0, 90]) for (const date of ['2026-03-20', '2026-06-21', '2026-12-21']) expect(at(latitude, 0, 'Etc/UTC', date).count).toBeGreaterThanOrEqual(0);
  });

  it('too short for the job says so', () => {
    const answer = assess(caseOf({ minutesNeeded: 700 }));
    expect(answer).toMatchObject({ verdict: 'hold', bindingLimit: 'time' });
    expect(answer.reasons[0]!.text).toMatch(/^The job needs 710 minutes, and the morning has 4\d\d from civil dawn to noon\.$/);
  });
});

describe('clock arithmetic against luxon (reference library)', () => {
  const zones = ['America/Los_Angeles', 'America/St_Johns', 'Europe/Berlin', 'Asia/Kolkata', 'Asia/Kathmandu', 'Australia/Lord_Howe', 'Pacific/Chatham', 'Africa/Casablanca', 'America/Santiago', 'Etc/GMT+7'];

  it('gives the same offset every six hours of 2026', () => {
    for (const timeZone of zones) {
      for (let ms = Date.UTC(2026, 0, 1); ms < Date.UTC(2027, 0, 1); ms += 6 * 3_600_000 + 1) {
        const reference = DateTime.fromMillis(ms, { zone: timeZone });
        expect(zoneOffsetMinutes(ms, timeZone)).toBe(reference.offset);
        expect(localMinutesOf(ms, timeZone)).toBe(reference.hour * 60 + reference.minute);
      }
    }
  });

  it('finds noon and midnight of every date of 2026', () => {
    for (const timeZone of zones) {
      for (let day = DateTime.fromISO('2026-01-01', { zone: timeZone }); day.year === 2026; day = day.plus({ days: 1 })) {
        expect(localInstantMs(day.toISODate()!, 720, timeZone)).toBe(day.set({ hour: 12 }).toMillis());
        expect(localInstantMs(day.toISODate()!, 0, timeZone)).toBe(day.startOf('day').toMillis());
      }
    }
  });

  it('knows zones from other texts', () => {
    for (const name of [...zones, 'UTC']) expect(isTimeZone(name)).toBe(true);
    for (const name of ['', '+05:00', 'Mars/Olympus', '__proto__', 'a b', '../etc']) expect(isTimeZone(name)).toBe(false);
  });
});
