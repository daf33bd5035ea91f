import type { PlanVerdict } from '../../shared/api/mornings.ts';

type Limit = NonNullable<PlanVerdict['bindingLimit']>;

/** The words of notices in one language. Sentences about the weather itself come from the assessment. */
export interface Words {
  language: string;
  /** luxon format of a date, such as `Tue, Jun 8`. */
  dateFormat: string;
  why: Record<Limit, string>;
  notEnough: string;
  go: string;
  hold: string;
  turned: (title: string) => string;
  moved: (title: string) => string;
  some: (goes: number, plans: number, from: string) => string;
  allHold: (plans: number, why: string) => string;
  tomorrow: (date: string, farm: string) => string;
  onDate: (date: string, farm: string) => string;
  forecast: (provider: string, time: string) => string;
  standIn: (provider: string, because: string) => string;
  noForecast: string;
  missingTitle: (date: string) => string;
  missingText: (farm: string, last: string | null) => string;
  summarySubject: (title: string) => string;
  late: string;
  onSite: string;
  finalWord: string;
  open: string;
  because: (farm: string) => string;
  testTitle: string;
  testText: (farm: string) => string;
}

const en: Words = {
  language: 'en',
  dateFormat: 'ccc, LLL d',
  why: {
    wind: 'wind',
    gusts: 'gusts',
    stillAir: 'still air',
    inversion: 'inversion',
    rainFree: 'rain too soon',
    wetFoliage: 'wet foliage',
    pollinators: 'bees at work',
    temperature: 'temperature',
    deltaT: 'Delta T',
    towardSensitivePlace: 'wind toward a sensitive place',
    time: 'too little time',
    data: 'not enough to tell',
  },
  notEnough: 'not enough to tell',
  go: 'Go',
  hold: 'Hold',
  turned: (title) => `Changed. ${title}`,
  moved: (title) => `New time. ${title}`,
  some: (goes, plans, from) => `Go for ${goes} of ${plans} plans, from ${from}`,
  allHold: (plans, why) => `Hold for all ${plans} plans: ${why}`,
  tomorrow: (date, farm) => `Tomorrow, ${date}, ${farm}.`,
  onDate: (date, farm) => `${date}, ${farm}.`,
  forecast: (provider, time) => `Forecast: ${provider}, taken ${time}.`,
  standIn: (provider, because) => `${provider} stands in for the first provider: ${because}`,
  noForecast: 'No fresh forecast is to be had, so the answer is hold.',
  missingTitle: (date) => `No fresh forecast for ${date}`,
  missingText: (farm, last) => `${farm} has no fresh forecast${last ? `; the last one is from ${last}` : ' yet'}. Until one comes, every answer is hold: not enough to tell. Dawnvane keeps asking and tells you when that changes.`,
  summarySubject: (title) => `This morning: ${title}`,
  late: 'This comes {minutes} minutes late.',
  onSite: 'Measure wind and look around before you start.',
  finalWord: 'The label is the law; local rules and a licensed applicator’s judgement come first, and a reading on site beats any forecast.',
  open: 'Open this morning',
  because: (farm) => `You get this as a member of ${farm} on Dawnvane. Choose what reaches you on the notices page.`,
  testTitle: 'Test notice',
  testText: (farm) => `Notices of ${farm} reach this device.`,
};

const languages: Readonly<Record<string, Words>> = { en };

/** Words of a person's language; English where there is no other yet. */
export const wordsOf = (language: string): Words => languages[language] ?? en;
