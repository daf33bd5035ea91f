import { assess, type PlanToJudge } from '../../shared/assessment/index.ts';
import type { AssessmentAnswer, LimitName } from '../../shared/assessment/answer.ts';
import type { AssessmentCase, ForecastHour } from '../../shared/assessment/case.ts';
import { hourMs, type HourlyRecord } from './record.ts';

/** A month of mornings: how many were fit, and what bound the others. */
export interface MonthOfMornings {
  month: string;
  mornings: number;
  fit: number;
  notEnough: number;
  boundBy: Map<LimitName | 'time' | 'data', number>;
}

const hoursBefore = 48;
const hoursAfter = 60;

/** The usual limits of the trade (common practice, no source), as far as the record can tell them. */
export function usualPlan(record: HourlyRecord): PlanToJudge {
  const tells = (field: Exclude<keyof ForecastHour, 'time'>): boolean => record.hours.some((hour) => hour[field] !== null);
  const humid = tells('relativeHumidityPct') || tells('dewPoint2mC');
  return {
    minutesNeeded: 60,
    reserveMinutes: 10,
    limits: {
      windHeightM: 2,
      rainMm: 0.2,
      rainProbabilityPct: 40,
      windMaxMs: 4.4704,
      windMinMs: 0.894,
      ...(tells('cloudCoverPct') ? { inversionMax: 0.5 } : {}),
      ...(tells('precipitationMm') ? { rainFreeHours: 6 } : {}),
      ...(humid && tells('precipitationMm') ? { foliageDry: true } : {}),
      temperatureMinC: 4.4,
      temperatureMaxC: 29.4,
      ...(humid ? { deltaTMaxC: 10 } : {}),
    },
  };
}

/** The case of one date of a record: the hours from two days before its noon to two and a half after. */
export function caseOfDate(record: HourlyRecord, date: string, plan: PlanToJudge, hours: readonly ForecastHour[] = record.hours): AssessmentCase {
  const noonMs = Date.parse(`${date}T12:00:00Z`) - Math.round(record.site.longitude / 15) * hourMs;
  return { site: record.site, date, readings: [], sensitivePlaces: [], ...plan, hours: hours.filter(({ time }) => Math.abs(Date.parse(time) - noonMs) <= (Date.parse(time) < noonMs ? hoursBefore : hoursAfter) * hourMs) };
}

/** Judges every morning of a record. */
export const judgeSeason = (record: HourlyRecord, plan: PlanToJudge = usualPlan(record)): { date: string; answer: AssessmentAnswer }[] => record.dates.map((date) => ({ date, answer: assess(caseOfDate(record, date, plan)) }));

/** Counts mornings by month. */
export function byMonth(mornings: readonly { date: string; answer: AssessmentAnswer }[]): MonthOfMornings[] {
  const months = new Map<string, MonthOfMornings>();
  for (const { date, answer } of mornings) {
    const month = date.slice(0, 7);
    const row = months.get(month) ?? { month, mornings: 0, fit: 0, notEnough: 0, boundBy: new Map() };
    months.set(month, row);
    row.mornings += 1;
    if (answer.verdict === 'go') row.fit += 1;
    else if (!answer.enoughToTell) row.notEnough += 1;
    else if (answer.bindingLimit) row.boundBy.set(answer.bindingLimit, (row.boundBy.get(answer.bindingLimit) ?? 0) + 1);
  }
  return [...months.values()];
}
