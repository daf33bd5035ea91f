import { DateTime } from 'luxon';
import { Op, type Transaction } from 'sequelize';
import type { ForecastFacts, PlanVerdict } from '../../shared/api/mornings.ts';
import type { FarmRow } from '../models/farms.ts';
import type { NoticeRow } from '../models/notices.ts';
import { eveAt } from '../schedule/moments.ts';
import { scheduleRecheck } from '../schedule/recheck.ts';
import type { Services } from '../services.ts';
import type { Occasion } from '../verdicts/assessor.ts';
import { verdictKinds } from './fan-out.ts';
import { goSince } from './go-since.ts';
import { tell, type NoticeBody } from './record.ts';
import type { NoticeContent } from './texts.ts';
import { dwellMinutes, toldPlan, turnsOf, usefulUntil, type ToldPlan, type Turn } from './told.ts';

/** What an assessment found, as the notices need it. */
export interface Assessed {
  farm: FarmRow;
  occasion: Occasion;
  /** The coming mornings, by local date. */
  mornings: { date: string; verdicts: PlanVerdict[] }[];
  forecast: ForecastFacts | null;
  /** True when the newest forecast is too old to say go. */
  stale: boolean;
}

/** Before the eve by this much, a missing forecast is told. */
const missingLeadMinutes = 120;

/**
 * Writes the notices that an assessment calls for, in its transaction; the farm's row is locked by the caller.
 * Safe to repeat: an occasion is told once per farm, morning and kind.
 */
export async function noticesAfterAssessment(services: Services, transaction: Transaction, assessed: Assessed): Promise<void> {
  const { occasion, mornings, farm } = assessed;
  if (farm.archivedAt) return;
  await forecastMissing(services, transaction, assessed);
  if (occasion) {
    const morning = mornings.find(({ date }) => date === occasion.morning);
    if (!morning) services.log.warn({ farmId: farm.id, occasion }, 'a notice was asked for a morning that is over');
    else for (const kind of occasion.kind === 'dawn' ? (['dawn', 'summary'] as const) : [occasion.kind]) await tellOnce(services, transaction, assessed, kind, morning, occasion.dueAt);
  }
  await turns(services, transaction, assessed);
}

const localNoon = (date: string, zone: string): Date => DateTime.fromISO(`${date}T12:00:00`, { zone }).toJSDate();

function contentOf({ farm, forecast, stale }: Assessed, kind: NoticeContent['kind'], morning: string, plans: ToldPlan[], turned: Turn[], decidedAt: Date): NoticeContent {
  return { kind, farm, morning, plans, turned: turned.map(({ plan, to }) => ({ planKey: plan.planKey, to })), forecast, stale, decidedAt };
}

async function tellOnce(services: Services, transaction: Transaction, assessed: Assessed, kind: 'eve' | 'dawn' | 'summary', morning: Assessed['mornings'][number], dueAt: Date): Promise<void> {
  const { farm } = assessed;
  if ((await services.models.notices.count({ where: { farmId: farm.id, morning: morning.date, kind }, transaction })) > 0) return;
  const plans = morning.verdicts.map(toldPlan);
  const content = contentOf(assessed, kind, morning.date, plans, [], services.clock.now());
  await tell(services, transaction, content, farm.units, { dueAt, usefulUntil: usefulUntil(plans, localNoon(morning.date, farm.timeZone)) });
}

/** Tells the owner once per morning, from two hours before the eve on, that there is no fresh forecast to judge by. */
async function forecastMissing(services: Services, transaction: Transaction, assessed: Assessed): Promise<void> {
  const { farm, stale, forecast, mornings } = assessed;
  const [coming] = mornings;
  if ((!stale && forecast) || !coming) return;
  const now = services.clock.now();
  if (now.getTime() < eveAt(coming.date, farm).getTime() - missingLeadMinutes * 60_000) return;
  if ((await services.models.notices.count({ where: { farmId: farm.id, morning: coming.date, kind: 'forecastMissing' }, transaction })) > 0) return;
  await tell(services, transaction, contentOf(assessed, 'forecastMissing', coming.date, [], [], now), farm.units, { dueAt: now, usefulUntil: localNoon(coming.date, farm.timeZone) });
}

/** Tells every told verdict that has turned: a hold at once, a go when it has held for as long as the morning's earlier turns call for. */
async function turns(services: Services, transaction: Transaction, assessed: Assessed): Promise<void> {
  const { farm, mornings } = assessed;
  const now = services.clock.now();
  const told = await toldOf(services, farm.id, mornings.map(({ date }) => date), transaction);
  for (const { date, verdicts } of mornings) {
    const notices = told.get(date) ?? [];
    const last = notices.at(-1);
    const noon = localNoon(date, farm.timeZone);
    if (!last || now >= noon) continue;
    const plans = verdicts.map(toldPlan);
    const turned = turnsOf((last.body as NoticeBody).plans, plans, now);
    if (turned.length === 0) continue;
    const wait = turned.every((turn) => turn.to === 'go') ? dwellMinutes(notices.filter((notice) => notice.kind === 'turn').length) : 0;
    if (wait > 0) {
      const since = await goSince(services, farm.id, date, turned.map(({ plan }) => plan.planKey), transaction);
      const ripeAt = new Date(since.getTime() + wait * 60_000);
      if (now < ripeAt) {
        await scheduleRecheck(services, transaction, farm, date, ripeAt);
        continue;
      }
    }
    await tell(services, transaction, contentOf(assessed, 'turn', date, plans, turned, now), farm.units, { dueAt: now, usefulUntil: usefulUntil(plans, noon) });
  }
}

/** The notices that told verdicts of these mornings, oldest first. */
async function toldOf({ models }: Services, farmId: string, dates: string[], transaction: Transaction): Promise<Map<string, NoticeRow[]>> {
  const rows = await models.notices.findAll({ where: { farmId, morning: { [Op.in]: dates }, kind: { [Op.in]: [...verdictKinds] } }, order: [['sequence', 'ASC']], transaction });
  const byMorning = new Map<string, NoticeRow[]>();
  for (const row of rows) byMorning.set(row.morning, [...(byMorning.get(row.morning) ?? []), row.get({ plain: true })]);
  return byMorning;
}
