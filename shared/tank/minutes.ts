/** What of a sprayer sets the pace of a job. */
export interface Pace {
  /** Litres that the tank holds. */
  tankL: number;
  /** Minutes to spray one full tank out. */
  minutesPerTank: number;
  /** Minutes from an empty tank to the next full one. */
  changeOverMinutes: number;
}

export interface Job {
  /** Area treated, hectares. */
  areaHa: number;
  /** Spray volume needed, litres. */
  volumeL: number;
  /** Tanks, the last one as a fraction: 2.5 = two full and a half. */
  tanks: number;
  /** Fillings: tanks rounded up. */
  fills: number;
  minutesNeeded: number;
}

/** Less than this share of a tank is rounding, not a further filling. */
const speck = 1e-9;

/**
 * Tanks and minutes of a job: volume = area × carrier volume; time = tanks × minutes per tank, plus one change-over
 * between each two fillings (the first tank is full before the start). Common practice, no source.
 * @throws RangeError when an area, a volume or a time is not a positive number
 */
export function jobOfPlan({ areaHa, carrierLHa, sprayer }: { areaHa: number; carrierLHa: number; sprayer: Pace }): Job {
  for (const [name, value] of Object.entries({ carrierLHa, tankL: sprayer.tankL, minutesPerTank: sprayer.minutesPerTank })) {
    if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`${name} must be a positive number, not ${value}.`);
  }
  if (!(areaHa >= 0) || !Number.isFinite(areaHa)) throw new RangeError(`areaHa must not be negative, not ${areaHa}.`);
  const volumeL = areaHa * carrierLHa;
  const tanks = volumeL / sprayer.tankL;
  const fills = Math.ceil(tanks - speck);
  const minutesNeeded = tanks * sprayer.minutesPerTank + Math.max(0, fills - 1) * sprayer.changeOverMinutes;
  return { areaHa, volumeL, tanks, fills, minutesNeeded: Math.ceil(minutesNeeded - speck) };
}
