/** Every condition that a plan may have to meet, in the order in which they are shown. Apart from the schemas, so that a page may name them without zod. */
export const limitNames = ['wind', 'gusts', 'stillAir', 'inversion', 'rainFree', 'wetFoliage', 'pollinators', 'temperature', 'deltaT', 'towardSensitivePlace'] as const;
export type LimitName = (typeof limitNames)[number];
