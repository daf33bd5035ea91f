import type { Transaction } from 'sequelize';
import type { Daybreak, ForecastFacts, Morning } from '../../shared/api/mornings.ts';
import type { AssessmentAnswer } from '../../shared/assessment/answer.ts';
import { judge, prepareMorning, withoutFreshData } from '../../shared/assessment/index.ts';
import { inTransaction } from '../database/connection.ts';
import { confirmForecast, freshUntil, newestForecast, refreshDue, storeForecast } from '../forecasts/store.ts';
import { noticesAfterAssessment } from '../notices/index.ts';
import type { FarmRow } from '../models/farms.ts';
import type { ForecastRow } from '../models/weather.ts';
import type { Services } from '../services.ts';
import type { AssessOptions, Assessor, HandedForecast } from './assessor.ts';
import { factsOf, type ForecastSource } from './forecasting.ts';
import { loadFarmState, type FarmState } from './farm-state.ts';
import { comingMornings, localNoon } from './mornings.ts';
import { asForecastTells, judgedPlan, readingsOf, siteOf, usualPlan, type JudgedPlan } from './plan-case.ts';
import { newestVerdicts, recordVerdicts } from './revisions.ts';
import { summaryOf } from './summary.ts';
import { notFound } from '../http/problem.ts';

/** What was judged, with the names it is told by. */
interface Judged {
  planId: string | null;
  planName: string;
  judged: JudgedPlan;
}

/** What the providers gave, before it is stored. */
type Fetched = { kind: 'issued'; forecast: Parameters<typeof storeForecast>[2]; standInBecause: string | null } | { kind: 'confirmed'; expiresAt: Date | null } | { kind: 'nothing' };

/** The plans of one morning; without any, the farm's usual limits. */
function judgedOn(state: FarmState, date: string): Judged[] {
  const planned = state.plans.filter(({ plan }) => plan.firstDate <= date && date <= plan.lastDate).map((whole) => ({ planId: whole.plan.id, planName: whole.plan.name, judged: judgedPlan(whole, state.places) }));
  return planned.length > 0 ? planned : [{ planId: null, planName: '', judged: usualPlan(state.places) }];
}

/** Makes the assessor of one server. */
export function createAssessor(services: Services, source: ForecastSource): Assessor {
  const { models, sequelize, clock, log } = services;

  async function fetchFor(farm: FarmRow, newest: ForecastRow | null, options: AssessOptions): Promise<Fetched> {
    const now = clock.now();
    if (options.handed) return { kind: 'issued', forecast: handedForecast(farm, options.handed, now), standInBecause: null };
    if (options.fetch === 'never' || (options.fetch === 'ifDue' && !refreshDue(newest, now))) return { kind: 'nothing' };
    const place = { latitude: farm.latitude, longitude: farm.longitude, elevationM: farm.elevationM };
    const previous = newest && newest.provider !== 'webhook' ? { provider: newest.provider, validators: { etag: newest.etag, lastModified: newest.lastModified } } : null;
    try {
      const { answer, standInBecause } = await source.fetch(place, previous);
      return answer.kind === 'issued' ? { kind: 'issued', forecast: answer.forecast, standInBecause } : { kind: 'confirmed', expiresAt: answer.expiresAt };
    } catch (error) {
      // No provider answered: what is stored serves until it is stale, and then the verdict is a hold.
      log.warn({ err: error, farmId: farm.id }, 'no provider gave a forecast');
      return { kind: 'nothing' };
    }
  }

  async function keep(farmId: string, newest: ForecastRow | null, fetched: Fetched, transaction: Transaction): Promise<ForecastRow | null> {
    if (fetched.kind === 'issued') return storeForecast(models, farmId, fetched.forecast, fetched.standInBecause, transaction);
    if (fetched.kind === 'confirmed' && newest) return confirmForecast(models, newest, clock.now(), fetched.expiresAt, transaction);
    return newest;
  }

  function answersOf(state: FarmState, forecast: ForecastRow | null, date: string, stale: boolean, only?: Judged[]): { judged: Judged; answer: AssessmentAnswer }[] {
    const prepared = prepareMorning({ site: siteOf(state.farm), date, hours: forecast?.hours ?? [], readings: readingsOf(state.readings) });
    return (only ?? judgedOn(state, date)).map((judged) => {
      const answer = judge(prepared, asForecastTells(judged.judged, forecast?.hours ?? []));
      return { judged, answer: stale ? withoutFreshData(answer) : answer };
    });
  }

  async function assessFarm(farmId: string, options: AssessOptions): Promise<Daybreak> {
    const farmRow = await models.farms.findOne({ where: { id: farmId } });
    if (!farmRow) throw notFound();
    const fetched = await fetchFor(farmRow.get({ plain: true }), await newestForecast(models, farmRow), options);
    return inTransaction(sequelize, async (transaction) => {
      // One assessment of a farm at a time: revisions count up without gaps.
      await models.farms.findOne({ where: { id: farmId }, attributes: ['id'], lock: transaction.LOCK.UPDATE, transaction });
      const now = clock.now();
      const forecast = await keep(farmId, await newestForecast(models, farmRow, transaction), fetched, transaction);
      const dates = comingMornings(now, farmRow.timeZone);
      const state = await loadFarmState(models, farmId, dates[0]!, dates.at(-1)!, now, transaction);
      const stale = !forecast || freshUntil(forecast) <= now;
      const verdicts = dates.flatMap((date) =>
        answersOf(state, forecast, date, stale).map(({ judged, answer }) =>
          summaryOf(answer, { planId: judged.planId, planName: judged.planName, date, minutesNeeded: judged.judged.minutesNeeded, reserveMinutes: judged.judged.reserveMinutes, timeZone: state.farm.timeZone, decidedAt: now }),
        ),
      );
      const recorded = await recordVerdicts(models, farmId, forecast?.id ?? null, verdicts, await newestVerdicts(sequelize, farmId, dates[0]!, transaction), transaction);
      const mornings = dates.map((date) => ({ date, verdicts: recorded.filter((verdict) => verdict.date === date) }));
      const facts = forecast ? factsOf(forecast, source) : null;
      const daybreak: Daybreak = { now: now.toISOString(), farmId, timeZone: state.farm.timeZone, forecast: facts, stale, mornings };
      await models.daybreaks.upsert({ farmId, forecastId: forecast?.id ?? null, body: JSON.stringify(withoutNow(daybreak)), assessedAt: now, validUntil: validUntil(forecast, stale, dates[0]!, state.farm.timeZone) }, { transaction });
      await noticesAfterAssessment(services, transaction, { farm: state.farm, occasion: options.occasion ?? null, mornings, forecast: facts, stale });
      return daybreak;
    });
  }

  async function daybreakJson(farmId: string): Promise<string> {
    const now = clock.now();
    const row = await models.daybreaks.findOne({ where: { farmId }, attributes: ['body', 'validUntil', 'assessedAt'], raw: true });
    const body = row && row.validUntil > now && row.assessedAt <= now ? row.body : JSON.stringify(withoutNow(await assessFarm(farmId, { fetch: 'ifDue' })));
    return `{"now":${JSON.stringify(now.toISOString())},${body.slice(1)}`;
  }

  async function morning(farmId: string, date: string): Promise<Morning> {
    const now = clock.now();
    const state = await loadFarmState(models, farmId, date, date, now);
    const forecast = await newestForecast(models, state.farm);
    const stale = !forecast || freshUntil(forecast) <= now;
    const told = (await models.verdicts.findAll({ where: { farmId, morning: date }, order: [['decidedAt', 'DESC'], ['revision', 'DESC']], limit: 100 })).map((row) => row.get({ plain: true }));
    const plans = answersOf(state, forecast, date, stale).map(({ judged, answer }) => {
      const { planId, planName } = judged;
      const fresh = summaryOf(answer, { planId, planName, date, minutesNeeded: judged.judged.minutesNeeded, reserveMinutes: judged.judged.reserveMinutes, timeZone: state.farm.timeZone, decidedAt: now });
      const last = told.find((row) => row.planId === planId);
      return { verdict: last ? { ...fresh, revision: last.revision, decidedAt: last.decidedAt.toISOString() } : fresh, answer, case: { site: siteOf(state.farm), date, ...asForecastTells(judged.judged, forecast?.hours ?? []), hours: forecast?.hours ?? [], readings: readingsOf(state.readings) } };
    });
    const facts: ForecastFacts | null = forecast ? factsOf(forecast, source) : null;
    const history = told.map((row) => ({ planId: row.planId, revision: row.revision, verdict: row.verdict, headline: row.summary.headline, decidedAt: row.decidedAt.toISOString() }));
    return { farmId, date, now: now.toISOString(), timeZone: state.farm.timeZone, forecast: facts, stale, plans, history };
  }

  return { assessFarm, daybreakJson, morning };
}

const withoutNow = ({ now: _now, ...rest }: Daybreak): Omit<Daybreak, 'now'> => rest;

/** A stored Daybreak holds until its forecast is stale or its first morning is over. */
function validUntil(forecast: ForecastRow | null, stale: boolean, firstDate: string, timeZone: string): Date {
  const noon = localNoon(firstDate, timeZone);
  if (!forecast || stale) return noon;
  const fresh = freshUntil(forecast);
  return fresh < noon ? fresh : noon;
}

function handedForecast(farm: FarmRow, handed: HandedForecast, now: Date): Parameters<typeof storeForecast>[2] {
  return {
    provider: 'webhook',
    model: handed.model,
    issuedAt: handed.issuedAt,
    fetchedAt: now,
    expiresAt: null,
    place: { latitude: farm.latitude, longitude: farm.longitude, elevationM: farm.elevationM },
    hours: handed.hours,
    validators: { etag: null, lastModified: null },
  };
}

