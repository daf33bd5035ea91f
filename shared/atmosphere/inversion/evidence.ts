import { celsiusSpanToF, metresToFeet, type UnitSystem } from '../../units/units.ts';
import { siteWords, type LearnedSite } from './site.ts';

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

export type SkyWord = 'clear' | 'partlyCloudy' | 'cloudy';
export type AirWord = 'nearlyCalm' | 'lightBreeze' | 'windy';
/** What an estimate cannot do without: an hour in the series, its wind, its cloud (or by day its sunlight). */
export type Needed = 'hours' | 'wind' | 'sky';

/** Every piece of evidence by key, with what it is filled with; SI units, so that any language and any units can be made of it. */
export interface EvidenceMessages {
  night: { sky: SkyWord; air: AirWord };
  sunNotUp: Record<string, never>;
  sunUp: { minutes: number };
  sunStands: { altitudeDeg: number };
  windNow: { air: AirWord };
  atLow: Record<string, never>;
  aboveLow: { riseC: number };
  humidityUnknown: Record<string, never>;
  dewLikely: Record<string, never>;
  warmerAloft: { differenceC: number; heightM: number };
  notWarmerAloft: { heightM: number };
  strongLikely: { aboveC: number };
  siteSoFar: LearnedSite;
  needs: { missing: Needed };
}
export type EvidenceKey = keyof EvidenceMessages;
export type Evidence = { [Key in EvidenceKey]: { key: Key; params: EvidenceMessages[Key] } }[EvidenceKey];

/** From this relative humidity on dew or fog may be expected at dawn. Common practice, no source. */
const dewFromPct = 92;
const upperHeightM = 80;
/** Altitude of the sun's centre at sunrise: refraction 34′ and radius 16′. */
export const risenDeg = -0.833;
/** Longer after sunrise the sun's height says more than the minutes. */
const sunUpMostMinutes = 180;
const skyWord = (cloudPct: number): SkyWord => (cloudPct <= 25 ? 'clear' : cloudPct <= 60 ? 'partlyCloudy' : 'cloudy');
const airWord = (windMs: number): AirWord => (windMs < 1.5 ? 'nearlyCalm' : windMs < 4 ? 'lightBreeze' : 'windy');

export interface EvidenceSituation {
  facts: InversionFacts;
  /** Minutes since the sun rose; null before sunrise or where it is not known. */
  sunUpMinutes: number | null;
  /** Chance that the inversion is stronger than 1 °C, 0–1. */
  strongChance: number;
  site: LearnedSite | null;
}

/** The evidence as keys and figures. */
export function evidenceOf({ facts, sunUpMinutes, strongChance, site }: EvidenceSituation): Evidence[] {
  const said: Evidence[] = [{ key: 'night', params: { sky: skyWord(facts.nightCloudPct), air: airWord(facts.nightWindMs) } }];
  if (facts.altitudeDeg < risenDeg) said.push({ key: 'sunNotUp', params: {} });
  else if (sunUpMinutes !== null && sunUpMinutes <= sunUpMostMinutes) said.push({ key: 'sunUp', params: { minutes: sunUpMinutes } });
  else said.push({ key: 'sunStands', params: { altitudeDeg: Math.max(0, facts.altitudeDeg) } });
  said.push({ key: 'windNow', params: { air: airWord(facts.windMs) } });
  if (facts.riseC !== null) said.push(facts.riseC < 0.2 ? { key: 'atLow', params: {} } : { key: 'aboveLow', params: { riseC: facts.riseC } });
  if (facts.humidityPct === null) said.push({ key: 'humidityUnknown', params: {} });
  else if (facts.humidityPct >= dewFromPct) said.push({ key: 'dewLikely', params: {} });
  if (facts.aloftC !== null) said.push(facts.aloftC > 0 ? { key: 'warmerAloft', params: { differenceC: facts.aloftC, heightM: upperHeightM } } : { key: 'notWarmerAloft', params: { heightM: upperHeightM } });
  if (strongChance >= 0.5) said.push({ key: 'strongLikely', params: { aboveC: 1 } });
  if (site !== null) said.push({ key: 'siteSoFar', params: site });
  return said;
}

const skies: Record<SkyWord, string> = { clear: 'clear', partlyCloudy: 'partly cloudy', cloudy: 'cloudy' };
const airs: Record<AirWord, string> = { nearlyCalm: 'nearly calm', lightBreeze: 'a light breeze', windy: 'windy' };
const needed: Record<Needed, string> = {
  hours: 'no forecast for this hour: an inversion cannot be judged',
  wind: 'wind is not known: an inversion cannot be judged without it',
  sky: 'neither cloud nor enough sunlight to tell it is known: an inversion cannot be judged without the sky',
};

// Not inside `inEnglish`: made anew for every piece they cost more than the words.
const spanOf = (celsius: number, digits: number, units: UnitSystem): string => (units === 'us' ? `${celsiusSpanToF(celsius).toFixed(1)} °F` : `${celsius.toFixed(digits)} °C`);
const heightOf = (metres: number, units: UnitSystem): string => (units === 'us' ? `${Math.round(metresToFeet(metres) / 10) * 10} ft` : `${metres} m`);

/** One piece of evidence in English, in a person's own units. */
export function inEnglish(evidence: Evidence, units: UnitSystem): string {
  switch (evidence.key) {
    case 'night':
      return `${skies[evidence.params.sky]} and ${airs[evidence.params.air]} through the night`;
    case 'sunNotUp':
      return 'the sun is not up yet';
    case 'sunUp':
      return `sun up ${evidence.params.minutes} minute${evidence.params.minutes === 1 ? '' : 's'}`;
    case 'sunStands':
      return `the sun stands ${Math.round(evidence.params.altitudeDeg)}° high`;
    case 'windNow':
      return `${airs[evidence.params.air]} now`;
    case 'atLow':
      return 'at the low of the night';
    case 'aboveLow':
      return `${spanOf(evidence.params.riseC, 1, units)} above the low`;
    case 'humidityUnknown':
      return 'humidity is not known: taken as damp';
    case 'dewLikely':
      return 'dew or fog is likely';
    case 'warmerAloft':
      return `${spanOf(evidence.params.differenceC, 1, units)} warmer at ${heightOf(evidence.params.heightM, units)} than near the ground`;
    case 'notWarmerAloft':
      return `no warmer at ${heightOf(evidence.params.heightM, units)} than near the ground`;
    case 'strongLikely':
      return `an inversion of more than ${spanOf(evidence.params.aboveC, 0, units)} is likely`;
    case 'siteSoFar':
      return siteWords(evidence.params);
    case 'needs':
      return needed[evidence.params.missing];
  }
}
