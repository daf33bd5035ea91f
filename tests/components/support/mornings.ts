import { assess } from '../../../shared/assessment/index.ts';
import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import type { ForecastHour } from '../../../shared/assessment/case.ts';
import { dewPointFromHumidityC } from '../../../shared/atmosphere/humidity.ts';
import { allLimits, caseOf, fairHours, rawCase } from '../../science/cases.ts';

/** Mornings of an invented farm, assessed by the real code: what the pictures and the tests of the kit show. */
export type MorningName = 'go' | 'hold' | 'unknown' | 'gusty';

const hives = { name: 'Hives by the ditch', bearingDeg: 200, distanceM: 120 };

/** A clear, cool, nearly calm night that the sun breaks up, then a breeze that grows past the label's wind. */
function breezy(localHour: number): Partial<ForecastHour> {
  const warmth = Math.max(0, Math.sin(((localHour - 5) / 15) * Math.PI));
  const temperature2mC = 4 + 16 * warmth;
  const relativeHumidityPct = 88 - 45 * warmth;
  const windSpeed10mMs = 2.1 + Math.max(0, localHour - 6) * 0.85;
  const [cloudCoverPct, windFromDeg] = [localHour < 6 ? 10 : 35, (250 + localHour * 4) % 360];
  return { temperature2mC, relativeHumidityPct, dewPoint2mC: dewPointFromHumidityC(temperature2mC, relativeHumidityPct), windSpeed10mMs, windGust10mMs: windSpeed10mMs * 1.45, cloudCoverPct, windFromDeg };
}

function blustery(localHour: number): Partial<ForecastHour> {
  const windSpeed10mMs = 5.4 + 0.4 * Math.max(0, localHour - 4);
  const wet = localHour > 13;
  return { ...breezy(localHour), windSpeed10mMs, windGust10mMs: windSpeed10mMs * 1.6, cloudCoverPct: 100, precipitationProbabilityPct: wet ? 70 : 10, precipitationMm: wet ? 1.2 : 0 };
}

const hoursOf: Record<MorningName, (localHour: number) => Partial<ForecastHour>> = {
  go: breezy,
  hold: blustery,
  unknown: (localHour) => ({ ...breezy(localHour), ...(localHour >= 5 && localHour <= 11 ? { windSpeed10mMs: null, windGust10mMs: null } : {}) }),
  gusty: (localHour) => ({ ...breezy(localHour), ...(localHour === 7 ? { windSpeed10mMs: 7.4, windGust10mMs: 11 } : localHour > 7 ? { windSpeed10mMs: 3.2, windGust10mMs: 4.6 } : {}) }),
};

const limits = { ...allLimits, pollinators: { kinds: ['honeyBee', 'bumbleBee'], bloom: true, beeStatement: 'notWhileForaging' } };

/** The case as JSON, before it is parsed. */
export const rawMorning = (name: MorningName): Record<string, unknown> => rawCase({ minutesNeeded: 42, limits, sensitivePlaces: [hives], hours: fairHours((_, localHour) => hoursOf[name](localHour)) });

/** The answer of the assessment for one of the mornings. */
export const morningAnswer = (name: MorningName): AssessmentAnswer => assess(caseOf(rawMorning(name)));

/** Least hard headroom at every second step: what a small ribbon is drawn from. */
export function smallRibbonOf({ steps }: AssessmentAnswer): { headroom: (number | null)[]; sunAltitudeDeg: number[] } {
  const every = steps.filter((_, index) => index % 2 === 0);
  return {
    headroom: every.map(({ limits }) => {
      const hard = Object.values(limits).filter(({ kind }) => kind === 'hard');
      return hard.some(({ headroom }) => headroom === null) ? null : Math.min(...hard.map(({ headroom }) => headroom ?? 0));
    }),
    sunAltitudeDeg: every.map(({ sunAltitudeDeg }) => sunAltitudeDeg),
  };
}
