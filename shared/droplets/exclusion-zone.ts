import { feetToM } from '../units/units.ts';
import type { DropletClass } from './classes.ts';

/** The zone around the sprayer that must be empty of people: 100 ft for air-propelled or finer-than-medium sprays, else 25 ft above 12 in [aez2024]. */
export const airPropelledZoneM = feetToM(100);

/**
 * Radius of the application exclusion zone [aez2024, 40 CFR 170.405].
 * @param application how the spray is carried @param releaseHeightM above the soil, m
 * @returns metres, all directions, moving with the equipment
 */
export function exclusionZoneM(application: { airPropelled: boolean; dropletClass: DropletClass; releaseHeightM: number }): number {
  if (application.airPropelled || application.dropletClass === 'veryFine' || application.dropletClass === 'fine') return airPropelledZoneM;
  return application.releaseHeightM > feetToM(1) ? feetToM(25) : 0;
}
