/** How the work is shared and what it takes, in minutes. */
export interface CrewPace {
  /** To spray one full tank out. */
  sprayMinutesPerTank: number;
  /** From the trees to the fill point and back. */
  walkMinutes: number;
  /** To pour a ready mix into the pack and shoulder it. */
  pourMinutes: number;
  /** To set one pack down and shoulder a full one. */
  swapMinutes: number;
  /** To measure and mix the next tank. */
  mixMinutes: number;
  crew: 'alone' | 'withMixer';
  /** Packs to spray from: with two, the mixer fills the one while the other is out. Alone, a second pack changes nothing here. */
  packs: 1 | 2;
}

export interface TankTime {
  /** Minutes from the start of the first tank. */
  startMinute: number;
  emptyMinute: number;
  /** The applicator stands at the fill point for the mix, after this tank. */
  waitsMinutes: number;
}

export interface CrewTime {
  minutes: number;
  tanks: TankTime[];
  /** Who sets the pace: the mixer when the applicator ever waits for them. */
  boundBy: 'applicator' | 'mixer';
}

function check(tanks: number, pace: CrewPace): void {
  for (const [name, value] of Object.entries({ tanks, sprayMinutesPerTank: pace.sprayMinutesPerTank })) if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`${name} must be more than 0, not ${value}.`);
  for (const name of ['walkMinutes', 'pourMinutes', 'swapMinutes', 'mixMinutes'] as const) if (!(pace[name] >= 0) || !Number.isFinite(pace[name])) throw new RangeError(`${name} must not be negative, not ${pace[name]}.`);
}

/**
 * Time of a job as a pipeline of two people. The first tank is full before the start, as in `jobOfPlan`. Alone, each further filling
 * adds walk + mix + pour. With a mixer the next tank is mixed while this one is sprayed, so a full cycle takes the longer of
 * (spray + walk) and mix, plus the pouring; with a second pack the pouring moves to the mixer's side and a swap takes its place.
 * A part tank takes its part to spray, but is mixed whole. Common practice, no source: a flow shop of two machines.
 * @param tanks the last as a fraction @throws RangeError naming a value that is not a number of its kind
 */
export function crewTime(tanks: number, pace: CrewPace): CrewTime {
  check(tanks, pace);
  const fills = Math.ceil(tanks - 1e-9);
  const hasMixer = pace.crew === 'withMixer';
  const swaps = hasMixer && pace.packs === 2;
  const handOverMinutes = swaps ? pace.swapMinutes : pace.pourMinutes;
  const sideMinutes = pace.mixMinutes + (swaps ? pace.pourMinutes : 0);
  const times: TankTime[] = [];
  let startMinute = 0;
  let mixStartMinute = 0;
  for (let index = 0; index < fills; index += 1) {
    const isLast = index === fills - 1;
    const emptyMinute = startMinute + pace.sprayMinutesPerTank * (isLast ? tanks - (fills - 1) : 1);
    const atFillPoint = emptyMinute + pace.walkMinutes / 2;
    const readyMinute = (hasMixer ? mixStartMinute : atFillPoint) + sideMinutes;
    const waitsMinutes = isLast ? 0 : Math.max(0, readyMinute - atFillPoint);
    times.push({ startMinute, emptyMinute, waitsMinutes });
    mixStartMinute = atFillPoint + waitsMinutes + handOverMinutes;
    startMinute = mixStartMinute + pace.walkMinutes / 2;
  }
  return { minutes: times.at(-1)!.emptyMinute, tanks: times, boundBy: hasMixer && times.some(({ waitsMinutes }) => waitsMinutes > 0) ? 'mixer' : 'applicator' };
}

export interface Saving {
  change: 'mixer' | 'secondPack' | 'nearerFillPoint';
  minutes: number;
  savedMinutes: number;
}

/**
 * What each single change would save: a partner who mixes, a second pack (with the partner), a fill point at half the way.
 * Changes that are in place already are left out. @throws RangeError as `crewTime`
 */
export function savings(tanks: number, pace: CrewPace): Saving[] {
  const now = crewTime(tanks, pace).minutes;
  const saving = (change: Saving['change'], changed: Partial<CrewPace>): Saving => {
    const { minutes } = crewTime(tanks, { ...pace, ...changed });
    return { change, minutes, savedMinutes: now - minutes };
  };
  return [
    ...(pace.crew === 'alone' ? [saving('mixer', { crew: 'withMixer' })] : []),
    ...(pace.packs === 1 ? [saving('secondPack', { crew: 'withMixer', packs: 2 })] : []),
    ...(pace.walkMinutes > 0 ? [saving('nearerFillPoint', { walkMinutes: pace.walkMinutes / 2 })] : []),
  ];
}
