import type { dropletClasses, placeKinds, sprayerTypes } from '../../../shared/api/farms.ts';
import type { z } from 'zod';
import type { exposureSchema } from '../../../shared/api/farms.ts';

export const placeKindWords: Record<(typeof placeKinds)[number], string> = { hives: 'Bee hives', house: 'House', water: 'Water', road: 'Road', school: 'School' };

export const sprayerTypeWords: Record<(typeof sprayerTypes)[number], string> = {
  backpackMistBlower: 'Backpack mist blower',
  backpackSprayer: 'Backpack sprayer',
  airblast: 'Airblast sprayer',
  handgun: 'Handgun',
};

export const dropletWords: Record<(typeof dropletClasses)[number], string> = { veryFine: 'Very fine', fine: 'Fine', medium: 'Medium', coarse: 'Coarse' };

export const exposureWords: Record<z.infer<typeof exposureSchema>, string> = { open: 'Open ground', sheltered: 'Sheltered by trees or buildings', valleyFloor: 'Valley floor', hilltop: 'Hilltop' };

const compass = ['north', 'north-east', 'east', 'south-east', 'south', 'south-west', 'west', 'north-west'] as const;

/** A bearing in words: 78° is `east`. */
export function bearingWord(bearingDeg: number): string {
  return compass[Math.round(bearingDeg / 45) % 8]!;
}
