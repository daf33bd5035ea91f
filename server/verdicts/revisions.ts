import { randomUUID } from 'node:crypto';
import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { PlanVerdict } from '../../shared/api/mornings.ts';
import type { Models } from '../models/index.ts';
import type { VerdictRow } from '../models/weather.ts';

/** The key of a plan in the table of verdicts; a unique key may not hold null. */
export const planKeyOf = (planId: string | null): string => planId ?? 'usual';

/** A shift of the window smaller than this is not news. */
const windowShiftMinutes = 10;

function shifted(before: string | null | undefined, after: string | null | undefined): boolean {
  if (!before || !after) return Boolean(before) !== Boolean(after);
  return Math.abs(Date.parse(before) - Date.parse(after)) >= windowShiftMinutes * 60_000;
}

/** Whether a verdict says something new against the one before. */
export function isNews(before: PlanVerdict, after: PlanVerdict): boolean {
  return (
    before.verdict !== after.verdict ||
    before.enoughToTell !== after.enoughToTell ||
    before.bindingLimit !== after.bindingLimit ||
    shifted(before.window?.start, after.window?.start) ||
    shifted(before.window?.end, after.window?.end)
  );
}

/** The newest verdict of each plan and morning from a date on, by `planKey date`. */
export async function newestVerdicts(sequelize: Sequelize, farmId: string, firstDate: string, transaction: Transaction): Promise<Map<string, PlanVerdict>> {
  const rows = await sequelize.query<{ plan_key: string; morning: string; summary: string }>(
    `SELECT v.plan_key, DATE_FORMAT(v.morning, '%Y-%m-%d') AS morning, v.summary
       FROM verdicts v
       JOIN (SELECT plan_key, morning, MAX(revision) AS revision FROM verdicts WHERE farm_id = :farmId AND morning >= :firstDate GROUP BY plan_key, morning) newest
         ON newest.plan_key = v.plan_key AND newest.morning = v.morning AND newest.revision = v.revision
      WHERE v.farm_id = :farmId`,
    { replacements: { farmId, firstDate }, type: QueryTypes.SELECT, transaction },
  );
  return new Map(rows.map((row) => [`${row.plan_key} ${row.morning}`, JSON.parse(row.summary) as PlanVerdict]));
}

/**
 * Gives each verdict its revision: one more than the last when it says something new, and then a row of its own.
 * Returns the verdicts with their revisions and moments of decision.
 */
export async function recordVerdicts(models: Models, farmId: string, forecastId: string | null, verdicts: PlanVerdict[], before: Map<string, PlanVerdict>, transaction: Transaction): Promise<PlanVerdict[]> {
  const news: VerdictRow[] = [];
  const recorded = verdicts.map((verdict) => {
    const previous = before.get(`${planKeyOf(verdict.planId)} ${verdict.date}`);
    if (previous && !isNews(previous, verdict)) return { ...verdict, revision: previous.revision, decidedAt: previous.decidedAt };
    const told = { ...verdict, revision: (previous?.revision ?? 0) + 1 };
    news.push({
      id: randomUUID(),
      farmId,
      planId: told.planId,
      planKey: planKeyOf(told.planId),
      morning: told.date,
      revision: told.revision,
      verdict: told.verdict,
      enoughToTell: told.enoughToTell,
      bindingLimit: told.bindingLimit,
      forecastId,
      summary: told,
      decidedAt: new Date(told.decidedAt),
    });
    return told;
  });
  if (news.length > 0) await models.verdicts.bulkCreate(news, { transaction });
  return recorded;
}
