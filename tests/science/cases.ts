import { dewPointFromHumidityC } from '../../shared/atmosphere/humidity.ts';
import { clearSkyHaurwitzWm2 } from '../../shared/atmosphere/radiation/haurwitz.ts';
import type { AssessmentCase, ForecastHour } from '../../shared/assessment/case.ts';
import { parseCase } from '../../shared/assessment/problems.ts';
import { sunAltitudeDeg } from '../../shared/sun/sun.ts';

/** An invented farm in hill country; the place serves only for the sun. */
export const site = { latitude: 44.9, longitude: -123.1, elevationM: 160, timeZone: 'America/Los_Angeles' };
export const date = '2026-06-10';
const hourMs = 3_600_000;

/** A dry, mild June day: calm at night, a breeze from mid-morning, thin cloud. */
export function fairHour(epochMs: number, change: Partial<ForecastHour> = {}): ForecastHour {
  const localHour = (((epochMs / hourMs - 7) % 24) + 24) % 24;
  const warmth = Math.sin(((localHour - 9) / 24) * 2 * Math.PI);
  const temperature2mC = 13 + 5 * warmth;
  const relativeHumidityPct = 65 - 20 * warmth;
  const windSpeed10mMs = 3.2 + 1.6 * Math.max(0, Math.sin(((localHour - 8) / 24) * 2 * Math.PI));
  return {
    time: new Date(epochMs).toISOString(),
    temperature2mC,
    dewPoint2mC: dewPointFromHumidityC(temperature2mC, relativeHumidityPct),
    relativeHumidityPct,
    windSpeed10mMs,
    windGust10mMs: windSpeed10mMs * 1.5,
    windFromDeg: 270,
    cloudCoverPct: 70,
    precipitationMm: 0,
    precipitationProbabilityPct: 5,
    shortwaveWm2: 0.6 * clearSkyHaurwitzWm2(sunAltitudeDeg(epochMs + hourMs / 2, site.latitude, site.longitude)),
    temperature80mC: null,
    ...change,
  };
}

/** Hours from the evening before to two nights after, each changed by `change`. */
export function fairHours(change: (epochMs: number, localHour: number) => Partial<ForecastHour> = () => ({}), day = date, count = 72): ForecastHour[] {
  const startMs = Date.parse(`${day}T00:00:00Z`);
  return Array.from({ length: count }, (_, index) => {
    const epochMs = startMs + index * hourMs;
    // Hours since local midnight of the morning (negative the evening before), in summer time of the invented farm.
    return fairHour(epochMs, change(epochMs, index - 7));
  });
}

/** Every limit at once, all met on a fair day. */
export const allLimits = {
  windMaxMs: 4.4704,
  windMinMs: 1.3411,
  gustMaxMs: 9,
  windHeightM: 2,
  inversionMax: 0.9,
  rainFreeHours: 6,
  rainMm: 0.2,
  rainProbabilityPct: 40,
  foliageDry: true,
  pollinators: { kinds: ['honeyBee', 'bumbleBee', 'masonBee'], bloom: false, beeStatement: 'notWhileForaging' },
  temperatureMinC: 4,
  temperatureMaxC: 29,
  deltaTMinC: 0.5,
  deltaTMaxC: 10,
};

/** A case before it is parsed: plain JSON. */
export function rawCase(change: Record<string, unknown> = {}): Record<string, unknown> {
  return { site, date, minutesNeeded: 60, reserveMinutes: 10, limits: { windMaxMs: 4.4704, windMinMs: 1.3411, windHeightM: 2 }, sensitivePlaces: [], hours: fairHours(), readings: [], ...change };
}

/** A parsed case; throws with its problems when it is none. */
export function caseOf(change: Record<string, unknown> = {}): AssessmentCase {
  const parsed = parseCase(rawCase(change));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problems));
  return parsed.case;
}
