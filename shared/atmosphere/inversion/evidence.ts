/** What the estimate looked at, at one hour. */
export interface InversionFacts {
  altitudeDeg: number;
  windMs: number;
  cloudPct: number;
  /** Means of the last twelve hours; hours not known count as calm and clear. */
  nightWindMs: number;
  nightCloudPct: number;
  /** Above the lowest of the last twelve hours, °C. */
  riseC: number | null;
  humidityPct: number | null;
  /** 80 m less 2 m, °C; more than 0 is an inversion seen. */
  aloftC: number | null;
}

/** From this relative humidity on dew or fog may be expected at dawn. Common practice, no source. */
const dewFromPct = 92;
const sky = (cloudPct: number): string => (cloudPct <= 25 ? 'clear' : cloudPct <= 60 ? 'partly cloudy' : 'cloudy');
const air = (windMs: number): string => (windMs < 1.5 ? 'nearly calm' : windMs < 4 ? 'a light breeze' : 'windy');

/**
 * The evidence in words a grower knows.
 * @param strongChance chance that the inversion is stronger than 1 °C, 0–1 @param siteWords what the place's own readings add, when there are any
 */
export function evidenceOf(facts: InversionFacts, strongChance: number, siteWords: string | null = null): string[] {
  const said = [`${sky(facts.nightCloudPct)} and ${air(facts.nightWindMs)} through the night`];
  said.push(facts.altitudeDeg < -0.8 ? 'the sun is not up yet' : `the sun stands ${Math.max(0, Math.round(facts.altitudeDeg))}° high`);
  said.push(`${air(facts.windMs)} now`);
  if (facts.riseC !== null) said.push(facts.riseC < 0.2 ? 'at the low of the night' : `${facts.riseC.toFixed(1)} °C above the low`);
  if (facts.humidityPct === null) said.push('humidity is not known: taken as damp');
  else if (facts.humidityPct >= dewFromPct) said.push('dew or fog is likely');
  if (facts.aloftC !== null) said.push(facts.aloftC > 0 ? `${facts.aloftC.toFixed(1)} °C warmer at 80 m than at 2 m` : `no warmer at 80 m than at 2 m`);
  if (strongChance >= 0.5) said.push('an inversion of more than 1 °C is likely');
  if (siteWords !== null) said.push(siteWords);
  return said;
}
