import type { AssessmentAnswer, AssessmentStep, LimitAtStep, LimitName, SprayWindow } from '../../../shared/assessment/answer.ts';
import { limitNames } from '../../../shared/assessment/limit-names.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import type { MessageKey } from '../../lib/messages/en.ts';
import type { Say } from '../../lib/messages/use-t.ts';
import { unitsOf, type Quantity } from '../../lib/quantities.ts';
import { clockTime, type Reader } from '../../lib/time.ts';

const percent = (share: number): string => `${Math.round(share * 100)} %`;
const hoursOfADay = 24;

/** To the digit that can be felt: a tenth for wind, a whole degree Fahrenheit or half a degree Celsius. */
function rounded(value: number, quantity: Quantity, units: UnitSystem): string {
  const { name, fromSi } = unitsOf[quantity][units];
  const own = fromSi(value);
  const shown = quantity === 'speed' ? Number(own.toFixed(1)) : units === 'us' ? Math.round(own) : Math.round(own * 2) / 2;
  return `${shown} ${name}`;
}

/** A value with its unit, as one reads it at the time cursor. */
export function valueText(limit: LimitName, value: number | null, units: UnitSystem, t: Say): string {
  if (value === null) return t('value.unknown');
  switch (limit) {
    case 'wind':
    case 'gusts':
    case 'stillAir':
      return rounded(value, 'speed', units);
    case 'temperature':
      return rounded(value, 'temperature', units);
    case 'deltaT':
      return rounded(value, 'temperatureSpan', units);
    case 'rainFree':
      return t('value.dryHours', { hours: value >= hoursOfADay ? t('value.overDay') : Number(value.toFixed(1)) });
    case 'towardSensitivePlace':
      return `${Math.round(value)}°`;
    case 'inversion':
    case 'wetFoliage':
    case 'pollinators':
      return percent(value);
  }
}

/** At least this much headroom is at ease. */
const easy = 0.5;

/** How a limit stands at an instant, in a few words: never by colour alone. */
export function standing({ headroom }: LimitAtStep, t: Say): string {
  if (headroom === null) return t('standing.untold');
  if (headroom < 0) return t('standing.beyond');
  if (headroom === 0) return t('standing.at');
  return t(headroom >= easy ? 'standing.easy' : 'standing.close');
}

/** One limit at one instant as a sentence: `Wind 3 mph, limit 10 mph: at ease.` */
function limitSentence(limit: LimitName, at: LimitAtStep, units: UnitSystem, t: Say): string {
  const params = { limit: t(`limit.${limit}`), value: valueText(limit, at.value, units, t), bound: valueText(limit, at.limit, units, t), standing: standing(at, t) };
  return t(at.limit === null ? 'standing.unbounded' : 'standing.sentence', params);
}

/** The judged limits of a step, the least headroom first; what cannot be told comes before everything. */
const tightestFirst = ({ limits }: AssessmentStep): [LimitName, LimitAtStep][] =>
  limitNames
    .flatMap((limit): [LimitName, LimitAtStep][] => (limits[limit] ? [[limit, limits[limit]]] : []))
    .sort(([, one], [, two]) => (one.headroom ?? -2) - (two.headroom ?? -2));

/** Whether every hard limit is open at a step; null where one cannot be told and none is shut. */
export function isOpen({ limits }: AssessmentStep): boolean | null {
  const hard = Object.values(limits).filter(({ kind }) => kind === 'hard');
  if (hard.some(({ headroom }) => headroom !== null && headroom < 0)) return false;
  return hard.some(({ headroom }) => headroom === null) ? null : true;
}

/** Whether a step lies in a window, in a span too short for the job, in none, or cannot be told. */
function stateText(step: AssessmentStep, windows: readonly SprayWindow[], t: Say): string {
  const open = isOpen(step);
  if (open !== true) return t(open === null ? 'ribbon.cannotBeTold' : 'ribbon.outside');
  const window = windows.find(({ start, end }) => Date.parse(start) <= Date.parse(step.time) && Date.parse(step.time) <= Date.parse(end));
  return t(window?.bestStart ? 'ribbon.inWindow' : 'ribbon.tooShort');
}

/** What stands out at a step: whether the window is open, and the tightest hard limit. */
export function momentText(step: AssessmentStep, windows: readonly SprayWindow[], units: UnitSystem, t: Say): { state: string; tightest: string } {
  const open = isOpen(step);
  const hard = tightestFirst(step).find(([, { kind, headroom }]) => kind === 'hard' && (open === false ? headroom !== null : true));
  return { state: stateText(step, windows, t), tightest: hard ? limitSentence(hard[0], hard[1], units, t) : '' };
}

/** What a screen reader says of a moment: whole sentences, the tightest limit first. */
export function sentenceAt(step: AssessmentStep, windows: readonly SprayWindow[], reader: Reader, t: Say): string {
  return [`${clockTime(step.time, reader)}.`, `${stateText(step, windows, t)}.`, ...tightestFirst(step).map(([limit, at]) => limitSentence(limit, at, reader.units, t))].join(' ');
}

/** Limits whose bound says less than what it means. */
const plainReasons: Partial<Record<LimitName, MessageKey>> = { pollinators: 'ribbon.beesFly', wetFoliage: 'ribbon.leavesWet', towardSensitivePlace: 'ribbon.carries' };

/** Why a ribbon is tied shut at a step: `over 10 mph`. */
export function knotText(limit: LimitName, answer: AssessmentAnswer, knot: number, units: UnitSystem, t: Say): string {
  const at = answer.steps[knot]?.limits[limit];
  const plain = plainReasons[limit];
  if (plain) return t(plain);
  if (!at || at.limit === null || at.value === null) return t('ribbon.shut');
  return t(at.value > at.limit ? 'ribbon.over' : 'ribbon.under', { bound: valueText(limit, at.limit, units, t) });
}
