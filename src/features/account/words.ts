import type { Units } from '../../../shared/api/accounts.ts';

export const unitChoices: [Units, string][] = [
  ['us', 'US: mph, °F, acres, gallons'],
  ['metric', 'Metric: m/s, °C, hectares, litres'],
];
