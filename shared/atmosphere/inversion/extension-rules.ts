/** What the published rules look at. */
export interface RuleFacts {
  /** Above the morning's low, °C. */
  riseC: number;
  windMs: number;
  /** Hours from sunrise, negative before. */
  fromSunriseH: number;
}

const degreeF = 5 / 9;
const mphMs = 0.44704;

/**
 * Rules of thumb that extension services publish for when a morning inversion has ended [extensionInversion]. They are computed beside
 * the estimate so that a page can say how often each would have been wrong; they decide nothing.
 */
export const extensionRules = [
  { name: '3 °F above the low', holds: ({ riseC }: RuleFacts): boolean => riseC < 3 * degreeF },
  { name: 'wind over 3 mph', holds: ({ windMs }: RuleFacts): boolean => windMs <= 3 * mphMs },
  { name: 'one hour after sunrise', holds: ({ fromSunriseH }: RuleFacts): boolean => fromSunriseH < 1 },
  { name: 'wind over 3 mph or 3 °F above the low', holds: ({ riseC, windMs }: RuleFacts): boolean => riseC < 3 * degreeF && windMs <= 3 * mphMs },
] as const;
