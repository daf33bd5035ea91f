import * as Astronomy from 'astronomy-engine';
import { DateTime, IANAZone } from 'luxon';
import { describe, expect, it } from 'vitest';
import { dawnAt, daybreakAt, eveAt, lastMoment, localInstant, morningEnds, nextMoment, nextRefresh, type Place } from '../../server/schedule/moments.ts';

const place = (latitude: number, longitude: number, timeZone: string, more: Partial<Place> = {}): Place => ({ latitude, longitude, timeZone, eveTime: '20:00', dawnLeadMinutes: 30, ...more });
const billings = place(45.784, -108.506, 'America/Denver');
const wagga = place(-35.117, 147.357, 'Australia/Sydney');
const torun = place(53.0138, 18.5984, 'Europe/Warsaw');
const tromso = place(69.6492, 18.9553, 'Europe/Oslo');

const minutesApart = (one: Date, other: Date): number => Math.abs(one.getTime() - other.getTime()) / 60_000;
const day = (date: string, days: number): string => DateTime.fromISO(date, { zone: 'utc' }).plus({ days }).toISODate()!;

describe('sunrise of a local date, over both clock changes', () => {
  // Computed once with suncalc 2 and checked below, day by day, against astronomy-engine.
  it.each([
    [billings, '2026-03-07', '2026-03-07T13:41:00Z'],
    [billings, '2026-03-08', '2026-03-08T13:39:00Z'],
    [billings, '2026-10-31', '2026-10-31T13:52:00Z'],
    [billings, '2026-11-01', '2026-11-01T13:54:00Z'],
    [wagga, '2026-04-04', '2026-04-03T20:25:00Z'],
    [wagga, '2026-04-05', '2026-04-04T20:26:00Z'],
    [wagga, '2026-10-03', '2026-10-02T19:44:00Z'],
    [wagga, '2026-10-04', '2026-10-03T19:43:00Z'],
    [torun, '2026-03-28', '2026-03-28T04:29:00Z'],
    [torun, '2026-03-29', '2026-03-29T04:26:00Z'],
    [torun, '2026-10-24', '2026-10-24T05:28:00Z'],
    [torun, '2026-10-25', '2026-10-25T05:30:00Z'],
  ])('at %o on %s is at %s', (where, date, at) => {
    expect(minutesApart(daybreakAt(date, where), new Date(at))).toBeLessThanOrEqual(2);
  });

  // Independent reference: astronomy-engine's own sunrise search (upper limb, refraction).
  it.each([
    ['the American West', billings],
    ['eastern Australia', wagga],
    ['central Europe', torun],
    ['an island just west of the date line, UTC+13', place(-21.2, -175.2, 'Pacific/Tongatapu')],
    ['an island in UTC+14 far east of the date line', place(1.87, -157.43, 'Pacific/Kiritimati')],
    ['an island in UTC−11', place(-14.3, -170.7, 'Pacific/Pago_Pago')],
    ['New Zealand, in whose summer time the sun stands highest after 13:00', place(-43.5, 172.6, 'Pacific/Auckland')],
    ['western China on Peking time, where the sun rises up to three hours late', place(39.47, 75.99, 'Asia/Shanghai')],
    ['an island with a clock change of half an hour', place(-31.55, 159.08, 'Australia/Lord_Howe')],
    ['Nepal, UTC+5:45', place(27.7, 85.3, 'Asia/Kathmandu')],
  ])('agrees with another library on every day of two years in %s', (_where, where) => {
    const observer = new Astronomy.Observer(where.latitude, where.longitude, 0);
    for (let index = 0; index < 731; index += 1) {
      const date = day('2026-01-01', index);
      const midnight = localInstant(date, '00:00', where.timeZone);
      const other = Astronomy.SearchRiseSet(Astronomy.Body.Sun, observer, 1, midnight, 1)!.date;
      const ours = daybreakAt(date, where);
      expect(minutesApart(ours, other), date).toBeLessThan(2);
      expect(DateTime.fromJSDate(ours, { zone: where.timeZone }).toISODate()).toBe(date);
    }
  });
});

describe('where the sun does not rise', () => {
  it('takes civil twilight in the dark months that still have one', () => {
    const daybreak = daybreakAt('2026-12-21', tromso);
    const local = DateTime.fromJSDate(daybreak, { zone: tromso.timeZone });
    expect(local.toISODate()).toBe('2026-12-21');
    expect(local.hour).toBeGreaterThanOrEqual(8);
    expect(local.hour).toBeLessThan(11);
  });

  it('takes six in the morning under the midnight sun and in the deepest night', () => {
    expect(daybreakAt('2026-06-21', tromso)).toEqual(new Date('2026-06-21T04:00:00Z'));
    expect(daybreakAt('2026-12-21', place(82.5, -62.3, 'America/Toronto'))).toEqual(new Date('2026-12-21T11:00:00Z'));
  });

  it('has one dawn for every date of the year all the same, each before its noon and after the one before', () => {
    for (const where of [tromso, place(78.22, 15.65, 'Arctic/Longyearbyen'), place(66.56, 25.85, 'Europe/Helsinki'), place(-77.85, 166.67, 'Antarctica/McMurdo')]) {
      let before = dawnAt('2025-12-31', where);
      for (let index = 0; index < 366; index += 1) {
        const date = day('2026-01-01', index);
        const dawn = dawnAt(date, where);
        expect(dawn.getTime(), `${where.timeZone} ${date}`).toBeGreaterThan(before.getTime());
        expect(dawn.getTime()).toBeLessThan(morningEnds(date, where.timeZone).getTime());
        before = dawn;
      }
    }
  });
});

describe('local times over a clock change', () => {
  it('moves a time that the spring change leaves out forward by the gap', () => {
    expect(localInstant('2026-03-08', '02:30', 'America/Denver')).toEqual(new Date('2026-03-08T09:30:00Z'));
    expect(localInstant('2026-10-04', '02:15', 'Australia/Lord_Howe')).toEqual(new Date('2026-10-03T15:45:00Z'));
  });

  it('takes the first of a time that the autumn change brings twice', () => {
    expect(localInstant('2026-11-01', '01:30', 'America/Denver')).toEqual(new Date('2026-11-01T07:30:00Z'));
  });

  it('keeps the eve at its local time on both sides of a change', () => {
    expect(eveAt('2026-03-08', billings)).toEqual(new Date('2026-03-08T03:00:00Z'));
    expect(eveAt('2026-03-09', billings)).toEqual(new Date('2026-03-09T02:00:00Z'));
    expect(eveAt('2026-11-01', billings)).toEqual(new Date('2026-11-01T02:00:00Z'));
    expect(eveAt('2026-11-02', billings)).toEqual(new Date('2026-11-02T03:00:00Z'));
  });
});

describe('the chain of moments', () => {
  it.each([
    ['the American West', billings],
    ['eastern Australia, eve in the hour that the spring change leaves out', { ...wagga, eveTime: '02:30' }],
    ['central Europe, eve in the hour that comes twice', { ...torun, eveTime: '02:30' }],
    ['the far north', tromso],
    ['the date line', place(-21.2, -175.2, 'Pacific/Tongatapu', { eveTime: '23:59' })],
  ])('skips and doubles no morning over two years in %s', (_where, where) => {
    for (const kind of ['eve', 'dawn'] as const) {
      let moment = nextMoment(kind, where, new Date('2026-01-01T00:00:00Z'));
      for (let index = 0; index < 730; index += 1) {
        const next = nextMoment(kind, where, moment.at);
        expect(next.morning).toBe(day(moment.morning, 1));
        expect(next.at.getTime()).toBeGreaterThan(moment.at.getTime());
        expect(lastMoment(kind, where, new Date(next.at.getTime() - 1))).toEqual(moment);
        expect(lastMoment(kind, where, next.at)).toEqual(next);
        moment = next;
      }
    }
  });

  it('has a next eve and dawn in every zone that the machine knows, at any instant', () => {
    const zones = Intl.supportedValuesOf('timeZone').filter((zone) => IANAZone.isValidZone(zone));
    expect(zones.length).toBeGreaterThan(300);
    for (const [index, timeZone] of zones.entries()) {
      const where = place(40, DateTime.fromISO('2026-06-01', { zone: timeZone }).offset / 4 > 180 ? -170 : DateTime.fromISO('2026-06-01', { zone: timeZone }).offset / 4, timeZone);
      const after = new Date(Date.UTC(2026, index % 12, 1 + (index % 28), index % 24));
      for (const kind of ['eve', 'dawn'] as const) {
        const { at, morning } = nextMoment(kind, where, after);
        expect(at.getTime() - after.getTime(), timeZone).toBeLessThanOrEqual(26 * 3_600_000);
        expect(morning).toBe(DateTime.fromJSDate(at, { zone: timeZone }).plus({ days: kind === 'eve' ? 1 : 0 }).toISODate());
      }
    }
  });

  it('refreshes every farm once an hour, each at a minute of its own', () => {
    const farms = Array.from({ length: 200 }, (_, index) => `farm ${index}`);
    const start = new Date('2026-06-10T09:00:00Z');
    const minutes = farms.map((farm) => {
      const first = nextRefresh(farm, start);
      expect(first.getTime()).toBeGreaterThan(start.getTime());
      expect(nextRefresh(farm, first).getTime() - first.getTime()).toBe(3_600_000);
      return first.getUTCMinutes();
    });
    expect(new Set(minutes).size).toBeGreaterThan(40);
  });
});
