import type { LimitAtStep, LimitName } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import { unitsOf, type Quantity } from '../../lib/quantities.ts';

/** Name of each limit where there is room for two words. */
export const limitWord: Record<LimitName, string> = {
  wind: 'Wind',
  gusts: 'Gusts',
  stillAir: 'Still air',
  inversion: 'Inversion',
  rainFree: 'Rain-free',
  wetFoliage: 'Wet leaves',
  pollinators: 'Bees',
  temperature: 'Temperature',
  deltaT: 'Delta T',
  towardSensitivePlace: 'Toward a place',
};

/** The key: one sentence per limit. */
export const limitSentence: Record<LimitName, string> = {
  wind: 'Thick while the wind at the height the label means is well under its greatest.',
  gusts: 'Thick while gusts stay well under their greatest.',
  stillAir: 'Thick while the air moves enough: dead calm is inversion air.',
  inversion: 'Thick while a night inversion is unlikely; shut while droplets would hang and travel.',
  rainFree: 'Thick while enough dry hours follow.',
  wetFoliage: 'Thick once the leaves are dry.',
  pollinators: 'Thick before bees fly; shut when they may be foraging.',
  temperature: 'Thick well inside the temperatures allowed.',
  deltaT: 'Thick while droplets neither dry up nor hang too long.',
  towardSensitivePlace: 'Thick while the wind does not carry toward a place to be kept clear.',
};

const percent = (share: number): string => `${Math.round(share * 100)} %`;

/** To the digit that can be felt: a tenth for wind, a whole degree Fahrenheit or half a degree Celsius. */
function rounded(value: number, quantity: Quantity, units: UnitSystem): string {
  const { name, fromSi } = unitsOf[quantity][units];
  const own = fromSi(value);
  const shown = quantity === 'speed' ? Number(own.toFixed(1)) : units === 'us' ? Math.round(own) : Math.round(own * 2) / 2;
  return `${shown} ${name}`;
}

/** A value with its unit, as one reads it at the time cursor. */
export function valueText(limit: LimitName, value: number | null, units: UnitSystem): string {
  if (value === null) return 'not known';
  switch (limit) {
    case 'wind':
    case 'gusts':
    case 'stillAir':
      return rounded(value, 'speed', units);
    case 'temperature':
      return rounded(value, 'temperature', units);
    case 'deltaT':
      return rounded(value, 'temperatureSpan', units);
    case 'rainFree':
      return `${value >= 24 ? 'over 24' : Number(value.toFixed(1))} dry h`;
    case 'towardSensitivePlace':
      return `${Math.round(value)}°`;
    case 'inversion':
    case 'wetFoliage':
    case 'pollinators':
      return percent(value);
  }
}

/** How a limit stands at an instant, in a few words: never by colour alone. */
export function standing(at: LimitAtStep): string {
  if (at.headroom === null) return 'cannot be told';
  if (at.headroom < 0) return 'beyond its limit';
  if (at.headroom === 0) return 'at its limit';
  return at.headroom >= 0.5 ? 'at ease' : 'close to its limit';
}

/** One limit at one instant as a sentence: `Wind 3 mph, limit 10 mph: at ease`. */
export function limitAtText(limit: LimitName, at: LimitAtStep, units: UnitSystem): string {
  const against = at.limit === null ? '' : `, limit ${valueText(limit, at.limit, units)}`;
  return `${limitWord[limit]} ${valueText(limit, at.value, units)}${against}: ${standing(at)}`;
}
