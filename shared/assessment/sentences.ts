import type { UnitSystem } from '../units/units.ts';
import { localDateOf } from '../units/time-zone.ts';
import type { AssessmentAnswer, Reason } from './answer.ts';
import { formatsFor, type Formats } from './formats.ts';
import type { BareReason, MessageKey, Messages } from './messages.ts';
import { english, englishHeadlines } from './sentences-en.ts';

/** Languages that every sentence exists in; another one is another table of the same keys. */
const languages = { en: { clauses: english, headlines: englishHeadlines } } as const;
export type Language = keyof typeof languages;

/** How a person reads: units, the farm's zone, language. */
export interface SentenceOptions {
  units: UnitSystem;
  timeZone: string;
  language?: Language;
}

const capital = (clause: string): string => clause.charAt(0).toUpperCase() + clause.slice(1);

function clauseOf(key: MessageKey, params: unknown, formats: Formats, language: Language): string {
  const clause = languages[language].clauses[key] as (params: Messages[MessageKey], formats: Formats) => string;
  return clause(params as Messages[MessageKey], formats);
}

/** Puts a bare reason into one plain sentence. */
export const sentenceOf = ({ key, params }: Pick<BareReason, 'key' | 'params'>, formats: Formats, language: Language = 'en'): string => `${capital(clauseOf(key, params, formats, language))}.`;

/** Says a reason of an answer in a person's own units and language; a reason without its key keeps its text. */
export function retell(reason: Reason, answer: Pick<AssessmentAnswer, 'sun'>, options: SentenceOptions): string {
  if (reason.key === undefined || !(reason.key in english)) return reason.text;
  return sentenceOf({ key: reason.key as MessageKey, params: reason.params as unknown as Messages[MessageKey] }, formatsOf(answer, options), options.language);
}

const formatsOf = (answer: Pick<AssessmentAnswer, 'sun'>, { units, timeZone }: SentenceOptions): Formats => formatsFor({ units, timeZone, date: localDateOf(Date.parse(answer.sun.localNoon), timeZone) });

/** Which reason leads: what is missing, else what nearly fitted, else what holds. */
const leadingKinds: readonly Reason['kind'][] = ['notEnough', 'nearestMiss', 'hold'];

/**
 * The verdict in one sentence: "Go: start at 6:10, at the latest 7:05; the window closes at 8:20." or
 * "Hold: 17 minutes short: wind passes 10 mph at 6:40."
 */
export function headlineOf(answer: AssessmentAnswer, options: SentenceOptions): string {
  const { headlines } = languages[options.language ?? 'en'];
  if (answer.verdict === 'go') {
    const window = bestWindowOf(answer);
    if (window?.bestStart && window.latestStart) return headlines.go({ bestStart: window.bestStart, latestStart: window.latestStart, end: window.end }, formatsOf(answer, options));
  }
  for (const kind of leadingKinds) {
    const reason = answer.reasons.find((candidate) => candidate.kind === kind);
    if (!reason) continue;
    return headlines.hold(reason.key === undefined ? reason.text : `${clauseOf(reason.key as MessageKey, reason.params, formatsOf(answer, options), options.language ?? 'en')}.`);
  }
  return headlines.bareHold();
}

/** The window a go means: the one that its binding reason lies in. */
export function bestWindowOf(answer: Pick<AssessmentAnswer, 'windows' | 'reasons'>): AssessmentAnswer['windows'][number] | null {
  const fitting = answer.windows.filter((window) => window.bestStart !== null);
  const binding = answer.reasons.find((reason) => reason.kind === 'binding')?.at;
  return fitting.find((window) => typeof binding === 'string' && window.start <= binding && binding < window.end) ?? fitting[0] ?? null;
}
