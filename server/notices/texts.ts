import { DateTime } from 'luxon';
import type { Units } from '../../shared/api/accounts.ts';
import type { ForecastFacts } from '../../shared/api/mornings.ts';
import type { NoticeKind } from '../../shared/api/notices.ts';
import type { FarmRow } from '../models/farms.ts';
import type { ToldPlan } from './told.ts';
import { wordsOf, type Words } from './words.ts';

/** A notice before it is put into anyone's language and units. */
export interface NoticeContent {
  kind: NoticeKind;
  farm: Pick<FarmRow, 'id' | 'name' | 'timeZone'>;
  /** Local date. */
  morning: string;
  plans: ToldPlan[];
  /** Plans that turned; of a turn notice only. */
  turned: { planKey: string; to: 'hold' | 'go' | 'moved' }[];
  forecast: ForecastFacts | null;
  stale: boolean;
  decidedAt: Date;
}

export interface NoticeText {
  title: string;
  /** Short form for a phone: the date, the sentences, what to do. */
  brief: string;
  /** Whole form: paragraphs. */
  paragraphs: string[];
  words: Words;
}

const clock = (instant: string, zone: string): string => DateTime.fromISO(instant, { zone }).toFormat('H:mm');

function planTitle(plan: ToldPlan, zone: string, words: Words): string {
  const name = plan.planName ? `: ${plan.planName}` : '';
  if (plan.verdict === 'go') return `${words.go}${plan.window ? `, ${clock(plan.window.start, zone)}–${clock(plan.window.end, zone)}` : ''}${name}`;
  const why = plan.enoughToTell && plan.bindingLimit ? words.why[plan.bindingLimit] : words.notEnough;
  return `${words.hold}, ${why}${name}`;
}

/** Plans named one by one in a title up to this many; more are counted. */
const namedMax = 3;

/** The overall answer in words: which plans go and when, and why the others hold. */
export function overallTitle(plans: readonly ToldPlan[], zone: string, words: Words): string {
  const goes = plans.filter((plan) => plan.verdict === 'go');
  const holds = plans.filter((plan) => plan.verdict === 'hold');
  if (plans.length === 0) return `${words.hold}, ${words.notEnough}`;
  if (plans.length <= namedMax) return [...goes, ...holds].map((plan) => planTitle(plan, zone, words)).join('; ');
  if (goes.length === 0) {
    const reasons = [...new Set(holds.map((plan) => (plan.enoughToTell && plan.bindingLimit ? words.why[plan.bindingLimit] : words.notEnough)))];
    return words.allHold(plans.length, reasons.slice(0, 3).join(', '));
  }
  const first = goes.flatMap((plan) => plan.window?.start ?? []).sort()[0];
  return words.some(goes.length, plans.length, first ? clock(first, zone) : '');
}

function titleOf({ kind, plans, turned, farm, morning }: NoticeContent, words: Words, date: string): string {
  if (kind === 'forecastMissing') return words.missingTitle(date || morning);
  if (kind === 'test') return words.testTitle;
  if (kind !== 'turn') return overallTitle(plans, farm.timeZone, words);
  const keys = new Set(turned.map((turn) => turn.planKey));
  const title = overallTitle(plans.filter((plan) => keys.has(plan.planKey)), farm.timeZone, words);
  return turned.every((turn) => turn.to === 'moved') ? words.moved(title) : words.turned(title);
}

/** Puts a notice into a person's language and units. */
export function textOf(content: NoticeContent, reader: { units: Units; language: string }): NoticeText {
  const { farm, morning, plans, forecast, stale, kind, decidedAt } = content;
  const words = wordsOf(reader.language);
  const zone = farm.timeZone;
  const day = DateTime.fromISO(morning, { zone }).setLocale(words.language);
  const date = day.toFormat(words.dateFormat);
  const told = DateTime.fromJSDate(decidedAt, { zone });
  const title = titleOf(content, words, date);
  const takenAt = forecast ? DateTime.fromISO(forecast.fetchedAt, { zone }).setLocale(words.language).toFormat(`${words.dateFormat} H:mm`) : null;
  if (kind === 'test') return { title, brief: words.testText(farm.name), paragraphs: [words.testText(farm.name)], words };
  if (kind === 'forecastMissing') {
    const text = words.missingText(farm.name, takenAt);
    return { title, brief: text, paragraphs: [text], words };
  }
  const when = day.toISODate() === told.plus({ days: 1 }).toISODate() ? words.tomorrow(date, farm.name) : words.onDate(date, farm.name);
  const sentences = plans.map((plan) => (plans.length > 1 && plan.planName ? `${plan.planName}: ${plan.headline[reader.units]}` : plan.headline[reader.units]));
  const doubt = stale || !forecast ? words.noForecast : null;
  const goes = plans.some((plan) => plan.verdict === 'go');
  const source = forecast && takenAt ? words.forecast(forecast.providerName, takenAt) : null;
  const standIn = forecast?.standInBecause ? words.standIn(forecast.providerName, forecast.standInBecause) : null;
  const kept = (lines: (string | null)[]): string[] => lines.filter((line) => line !== null);
  return {
    title,
    brief: kept([when, ...sentences, doubt, goes ? words.onSite : null]).join(' '),
    paragraphs: kept([when, ...sentences, doubt, source, standIn, goes ? words.onSite : null]),
    words,
  };
}
