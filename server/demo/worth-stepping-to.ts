import type { DemoClock } from '../../shared/api/system.ts';
import type { FarmRow } from '../models/farms.ts';
import { dawnAt, eveAt, morningEnds, nextMoment } from '../schedule/moments.ts';

type Stop = DemoClock['next'][number];

/**
 * The coming moments of a farm that show something, soonest first: each once, after `now`.
 * @param windowStart start of the coming morning's window, when there is one
 */
export function worthSteppingTo(farm: FarmRow, now: Date, windowStart: (morning: string) => Date | null): Stop[] {
  const eve = nextMoment('eve', farm, now);
  const dawn = nextMoment('dawn', farm, now);
  // After dawn and before noon the morning at hand is the one before the next dawn's.
  const mornings = [...new Set([previousDay(dawn.morning), dawn.morning])];
  const stops: { name: Stop['name']; at: Date }[] = [
    { name: 'eve', at: eve.at },
    { name: 'dawn', at: dawnAt(dawn.morning, farm) },
    ...mornings.flatMap((morning) => {
      const start = windowStart(morning);
      return [...(start ? [{ name: 'windowStart' as const, at: start }] : []), { name: 'noon' as const, at: morningEnds(morning, farm.timeZone) }];
    }),
    { name: 'nextEvening', at: eveAt(nextDay(eve.morning), farm) },
  ];
  const seen = new Set<Stop['name']>();
  return stops
    .filter(({ at }) => at > now)
    .sort((a, b) => a.at.getTime() - b.at.getTime())
    .filter(({ name }) => !seen.has(name) && seen.add(name))
    .map(({ name, at }) => ({ name, at: at.toISOString() }));
}

const dayMs = 86_400_000;
const previousDay = (date: string): string => new Date(Date.parse(date) - dayMs).toISOString().slice(0, 10);
const nextDay = (date: string): string => new Date(Date.parse(date) + dayMs).toISOString().slice(0, 10);
