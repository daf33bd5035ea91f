import type { LimitName } from './answer.ts';
import type { Formats } from './formats.ts';
import type { Contradiction } from './hours.ts';
import type { Failing, MessageKey, Messages } from './messages.ts';

type Phrase = (failing: Failing, f: Formats) => string;

const names: Record<LimitName, string> = {
  wind: 'wind',
  gusts: 'gusts',
  stillAir: 'still air',
  inversion: 'the chance of an inversion',
  rainFree: 'dry time after the work',
  wetFoliage: 'leaf wetness',
  pollinators: 'bee activity',
  temperature: 'temperature',
  deltaT: 'Delta T',
  towardSensitivePlace: 'the angle off a sensitive place',
};

const missing: Record<LimitName, string> = {
  wind: 'no wind speed',
  gusts: 'no gusts',
  stillAir: 'no wind speed',
  inversion: 'too little to judge an inversion by',
  rainFree: 'no rain amount or chance of rain for the dry hours needed',
  wetFoliage: 'too little to judge wet leaves by',
  pollinators: 'no temperature to judge bees by',
  temperature: 'no temperature',
  deltaT: 'no humidity',
  towardSensitivePlace: 'no wind direction',
};

const contradicting: Record<Contradiction, string> = {
  dewPointAboveTemperature: 'a dew point above the air temperature',
  humidityAgainstDewPoint: 'a humidity that does not fit the dew point',
  gustBelowWind: 'gusts below the mean wind',
  sunlightAtNight: 'sunlight at night (are the hours in UTC?)',
  sunlightTooStrong: 'more sunlight than the sun can give then (are the hours in UTC?)',
};

function clock(f: Formats, iso: string | null): string {
  if (iso === null) return '–';
  const { text, daysLater } = f.clock(iso);
  if (daysLater === 0) return text;
  return daysLater === 1 ? `${text} the next day` : daysLater === -1 ? `${text} the day before` : `${text}, ${daysLater} days on`;
}

/** Words a failing span: what happens when it begins, and the state while it lasts. */
function span(failing: Failing, f: Formats, begins: string, state: string): string {
  switch (failing.pattern) {
    case 'all':
      return `${state} all morning`;
    case 'until':
      return `${state} until ${clock(f, failing.untilAt)}`;
    case 'from':
      return `${begins} at ${clock(f, failing.fromAt)}`;
    case 'between':
      return `${state} from ${clock(f, failing.fromAt)} to ${clock(f, failing.untilAt)}`;
    case 'parts':
      return `${state} at times, first at ${clock(f, failing.fromAt)}`;
  }
}

const range = (what: string, show: (f: Formats, value: number) => string): Phrase => (failing, f) => {
  const bound = failing.bound === null ? '–' : show(f, failing.bound);
  return failing.side === 'above' ? span(failing, f, `${what} passes ${bound}`, `${what} is over ${bound}`) : span(failing, f, `${what} falls below ${bound}`, `${what} is below ${bound}`);
};

const fails: Record<LimitName, Phrase> = {
  wind: (p, f) => span(p, f, `wind passes ${f.ofLimit('wind', p.bound)}`, `wind is over ${f.ofLimit('wind', p.bound)}`),
  gusts: (p, f) => span(p, f, `gusts pass ${f.ofLimit('gusts', p.bound)}`, `gusts are over ${f.ofLimit('gusts', p.bound)}`),
  stillAir: (p, f) => span(p, f, `the air falls still (below ${f.ofLimit('stillAir', p.bound)})`, `the air is still (below ${f.ofLimit('stillAir', p.bound)})`),
  inversion: (p, f) => span(p, f, `the chance of an inversion passes ${f.ofLimit('inversion', p.bound)}`, `an inversion is too likely (over ${f.ofLimit('inversion', p.bound)})`),
  rainFree: (p, f) => {
    const rain = p.rainAt === null ? '' : `, rain from ${clock(f, p.rainAt)}`;
    return span(p, f, `work leaves less than ${f.ofLimit('rainFree', p.bound)} dry from its end`, `less than ${f.ofLimit('rainFree', p.bound)} stay dry after the work`) + rain;
  },
  wetFoliage: (p, f) => span(p, f, 'leaves turn wet', 'leaves are wet'),
  pollinators: (p, f) => (p.isForbidden ? 'something is in bloom, and the label forbids this use then, at any hour' : span(p, f, 'bees may start to fly', 'bees may be flying')),
  temperature: range('temperature', (f, value) => f.temperature(value)),
  deltaT: range('Delta T', (f, value) => f.temperatureSpan(value)),
  towardSensitivePlace: (p, f) => span(p, f, `the wind may carry spray toward ${p.place ?? 'a sensitive place'}`, `the wind may carry spray toward ${p.place ?? 'a sensitive place'}`),
};

const failing = (p: Failing, f: Formats): string => fails[p.limit](p, f);
const minutes = (count: number): string => `${count} minute${count === 1 ? '' : 's'}`;

/** English: one clause per message, without capital and full stop. */
export const english: { [Key in MessageKey]: (params: Messages[Key], f: Formats) => string } = {
  'limit.binding': (p, f) =>
    p.place !== null ? `the wind comes closest to carrying spray toward ${p.place} at ${clock(f, p.at)}` : `${names[p.limit]} ${p.limit === 'gusts' || p.limit === 'pollinators' ? 'leave' : 'leaves'} the least to spare: ${f.ofLimit(p.limit, p.value)} against ${f.ofLimit(p.limit, p.bound)} at ${clock(f, p.at)}`,
  'limit.fails': failing,
  'window.closes': (p, f) => (p.failing === null ? `the window closes at ${clock(f, p.endAt)}, the end of the morning` : `the window closes at ${clock(f, p.endAt)}: ${failing(p.failing, f)}`),
  'miss.short': (p, f) => `${minutes(p.missingMinutes)} short: ${[p.opens, p.closes].filter((cause) => cause !== null).map((cause) => failing(cause, f)).join(', and ')}`,
  'miss.noOverlap': (p, f) => `no minute is open: ${failing(p.first, f)}, and ${failing(p.last, f)}`,
  'miss.closest': (p, f) =>
    p.place !== null ? `least toward ${p.place} at ${clock(f, p.at)}` : `closest at ${clock(f, p.at)}: ${names[p.limit]} ${f.ofLimit(p.limit, p.value)} against ${f.ofLimit(p.limit, p.bound)}`,
  'time.morningShort': (p) => `the job needs ${minutes(p.neededMinutes)}, and the morning has ${p.morningMinutes} from civil dawn to noon`,
  'time.noMorning': () => 'there is no daylight before noon on this date',
  'data.missing': (p, f) => `not enough to tell: the forecast gives ${missing[p.limit]} from ${clock(f, p.fromAt)} to ${clock(f, p.untilAt)}`,
  'data.noForecast': () => 'not enough to tell: there is no forecast for this morning',
  'data.stale': () => 'not enough to tell: no fresh forecast is to be had',
  'data.noLimits': () => 'not enough to tell: the plan has no limit that could hold; enter the limits from the label',
  'data.contradiction': (p) => `the forecast contradicts itself and was not used there: ${contradicting[p.what]}`,
  'caution.windError': (p, f) => `wind comes to ${f.speed(p.windMs)}, within the usual error of a forecast (about ${f.speed(p.errorMs)}) of ${f.speed(p.maxMs)}: measure on site`,
  'caution.driftReach': (p, f) => `fine droplets may go ${f.distance(p.reachM)} and more with ${f.speed(p.windMs)} of wind; this is a caution, no distance is safe`,
  'caution.exclusionZone': (p, f) => `${p.place} lies ${f.distance(p.distanceM)} away, within the ${f.distance(p.zoneM)} around the sprayer that must be empty of people`,
  'caution.bloom': () => 'something is in bloom: weather never proves that no bee is out, and residue outlasts the morning',
  'caution.inversion': (p, f) => `an inversion is likely (${f.percent(p.likelihood)}) at ${clock(f, p.at)}: check with smoke or dust before you start`,
  'advice.siteFactor': (p) => `wind at your site is ${p.factor.toFixed(2)} times the forecast so far (${p.readings} readings), and is reckoned so`,
  'advice.radiationEstimated': () => 'sunlight is not in the forecast and was estimated from sun and cloud',
  'advice.rainAmountOnly': () => 'this forecast tells no chance of rain: dry hours are judged on the amount alone',
  'advice.rainChance': (p, f) => `chance of rain within ${f.hours(p.hours)} after the work: ${Math.round(p.leastPct)} to ${Math.round(p.mostPct)} %`,
  'advice.deltaTLow': (p, f) => `Delta T is low (${f.temperatureSpan(p.deltaTC)}) at ${clock(f, p.at)}: droplets last long, and such moist air often lies under an inversion`,
  'advice.deltaTHigh': (p, f) => `Delta T is high (${f.temperatureSpan(p.deltaTC)}) at ${clock(f, p.at)}: fine droplets dry out and drift`,
  'advice.bees': (p, f) => `bees may be flying from ${clock(f, p.at)}`,
};

/** The one line that leads a notice or a page. */
export const englishHeadlines = {
  go: (window: { bestStart: string; latestStart: string; end: string }, f: Formats): string => `Go: start at ${clock(f, window.bestStart)}, at the latest ${clock(f, window.latestStart)}; the window closes at ${clock(f, window.end)}.`,
  hold: (because: string): string => `Hold: ${because}`,
  bareHold: (): string => 'Hold.',
};
