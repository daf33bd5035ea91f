import { isTimeZone, localDateOf, localInstantMs, zoneOffsetMinutes } from '../units/time-zone.ts';

/** What the rules between fields look at; shapes and ranges are the schema's work. */
interface RuledCase {
  site: { longitude: number; latitude: number; timeZone: string };
  date: string;
  limits: {
    windMinMs?: number | undefined;
    windMaxMs?: number | undefined;
    temperatureMinC?: number | undefined;
    temperatureMaxC?: number | undefined;
    deltaTMinC?: number | undefined;
    deltaTMaxC?: number | undefined;
  };
  hours: readonly { time: string }[];
}

export interface CrossFieldProblem {
  path: (string | number)[];
  message: string;
}

const firstYear = 1950;
const lastYear = 2150;
/** Clocks run at most about 4 h off the sun anywhere people live (western China; summer time added). */
const mostHoursOffTheSun = 5;

/** Problems between fields of a case that each look right alone; empty when there are none. */
export function crossFieldProblems(theCase: RuledCase): CrossFieldProblem[] {
  return [...placeAndDateProblems(theCase), ...limitProblems(theCase.limits), ...hourProblems(theCase.hours)];
}

function placeAndDateProblems({ site, date }: RuledCase): CrossFieldProblem[] {
  // The schema has told of a text that is no date; it still runs the rules between fields.
  if (Number.isNaN(Date.parse(`${date}T00:00:00Z`))) return [];
  const problems: CrossFieldProblem[] = [];
  const year = Number(date.slice(0, 4));
  if (!(year >= firstYear && year <= lastYear)) problems.push({ path: ['date'], message: `must lie between the years ${firstYear} and ${lastYear}` });
  if (!isTimeZone(site.timeZone)) problems.push({ path: ['site', 'timeZone'], message: 'is not a known IANA zone; give a name such as America/Los_Angeles' });
  if (problems.length > 0) return problems;
  const noonMs = localInstantMs(date, 720, site.timeZone);
  if (localDateOf(noonMs, site.timeZone) !== date) return [{ path: ['date'], message: `is a day that the calendar of ${site.timeZone} left out` }];
  const offTheSunH = (((zoneOffsetMinutes(noonMs, site.timeZone) / 60 - site.longitude / 15 + 12) % 24) + 24) % 24 - 12;
  // Near the poles clocks follow the supply line, not the sun.
  if (Math.abs(offTheSunH) > mostHoursOffTheSun && Math.abs(site.latitude) < 60) {
    problems.push({ path: ['site', 'timeZone'], message: `clocks of ${site.timeZone} are ${Math.abs(offTheSunH).toFixed(0)} hours off the sun at longitude ${site.longitude}; correct the zone or the position` });
  }
  return problems;
}

function limitProblems(limits: RuledCase['limits']): CrossFieldProblem[] {
  const pairs = [
    ['windMinMs', 'windMaxMs'],
    ['temperatureMinC', 'temperatureMaxC'],
    ['deltaTMinC', 'deltaTMaxC'],
  ] as const;
  return pairs.flatMap(([low, high]) => {
    const min = limits[low];
    const max = limits[high];
    return min !== undefined && max !== undefined && min > max ? [{ path: ['limits', low], message: `${min} is above ${high} (${max}); swap or correct them` }] : [];
  });
}

function hourProblems(hours: RuledCase['hours']): CrossFieldProblem[] {
  const problems: CrossFieldProblem[] = [];
  let beforeMs = -Infinity;
  for (const [index, { time }] of hours.entries()) {
    const ms = Date.parse(time);
    if (ms === beforeMs) problems.push({ path: ['hours', index, 'time'], message: 'is given twice; keep one hour of each time' });
    else if (ms < beforeMs) problems.push({ path: ['hours', index, 'time'], message: 'comes before the hour in front of it; put the hours in order of time' });
    beforeMs = Math.max(beforeMs, ms);
  }
  return problems;
}
