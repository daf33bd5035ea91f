/** What the estimate looked at, at one instant. */
export interface InversionFacts {
  altitudeDeg: number;
  windMs: number;
  cloudPct: number | null;
  nightWindMs: number | null;
  nightCloudPct: number | null;
  /** Above the lowest of the last twelve hours, °C. */
  riseC: number | null;
  dewDepressionC: number | null;
  /** 80 m less 2 m, °C; more than 0 is an inversion seen. */
  aloftC: number | null;
}

const sky = (cloudPct: number): string => (cloudPct <= 25 ? 'clear' : cloudPct <= 60 ? 'partly cloudy' : 'cloudy');
const air = (windMs: number): string => (windMs < 1.5 ? 'nearly calm' : windMs < 4 ? 'a light breeze' : 'windy');

/** The evidence in words a grower knows. */
export function evidenceOf(facts: InversionFacts): string[] {
  const said: string[] = [];
  if (facts.nightCloudPct !== null && facts.nightWindMs !== null) said.push(`${sky(facts.nightCloudPct)} and ${air(facts.nightWindMs)} through the night`);
  said.push(facts.altitudeDeg < -0.8 ? 'the sun is not up yet' : `the sun stands ${Math.max(0, Math.round(facts.altitudeDeg))}° high`);
  said.push(`${air(facts.windMs)} now`);
  if (facts.riseC !== null) said.push(facts.riseC < 0.2 ? 'at the low of the night' : `${facts.riseC.toFixed(1)} °C above the low`);
  if (facts.dewDepressionC !== null && facts.dewDepressionC < 1.5) said.push('dew or fog is likely');
  if (facts.aloftC !== null) said.push(facts.aloftC > 0 ? `${facts.aloftC.toFixed(1)} °C warmer at 80 m than at 2 m` : `no warmer at 80 m than at 2 m`);
  return said;
}
