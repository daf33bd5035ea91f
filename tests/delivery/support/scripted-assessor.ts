import { inTransaction } from '../../../server/database/connection.ts';
import { noticesAfterAssessment } from '../../../server/notices/index.ts';
import { comingMornings, localNoon } from '../../../server/verdicts/mornings.ts';
import { newestVerdicts, recordVerdicts } from '../../../server/verdicts/revisions.ts';
import type { AssessOptions, Assessor } from '../../../server/verdicts/assessor.ts';
import type { Services } from '../../../server/services.ts';
import type { Daybreak, ForecastFacts, PlanVerdict } from '../../../shared/api/mornings.ts';

/** What a test wants a plan's verdict to be on every coming morning. Times are local, HH:MM. */
export interface Script {
  plan?: string;
  verdict: 'go' | 'hold';
  enoughToTell?: boolean;
  because?: PlanVerdict['bindingLimit'];
  from?: string;
  to?: string;
  latestStart?: string;
}

/** Decides by script instead of by weather, but stores verdicts and writes notices by the product's own road. */
export interface ScriptedAssessor extends Assessor {
  /** The plans' verdicts from now on. */
  say(...plans: Script[]): void;
  /** Whether there is a fresh forecast. */
  forecast: 'fresh' | 'stale' | 'none';
  /** How each assessment was asked for. */
  asked: { farmId: string; options: AssessOptions }[];
  /** Thrown by the next assessments, one each. */
  failures: Error[];
}

export function scriptedAssessor(services: Services, planIds: Map<string, string> = new Map()): ScriptedAssessor {
  const { models, sequelize, clock } = services;
  let script: Script[] = [{ verdict: 'hold', because: 'wind' }];
  const facts = (): ForecastFacts => ({ id: '00000000-0000-4000-8000-000000000001', provider: 'openMeteo', providerName: 'Open-Meteo', attribution: '', model: null, issuedAt: clock.now().toISOString(), fetchedAt: clock.now().toISOString(), standInBecause: null });

  function verdictOf(line: Script, date: string, zone: string): PlanVerdict {
    const noon = localNoon(date, zone);
    const at = (time: string): string => {
      const [hours, minutes] = time.split(':').map(Number) as [number, number];
      return new Date(noon.getTime() - 12 * 3_600_000 + (hours * 60 + minutes) * 60_000).toISOString();
    };
    const go = line.verdict === 'go';
    const window = go ? { start: at(line.from ?? '06:00'), end: at(line.to ?? '07:00'), minutes: 60, bestStart: at(line.from ?? '06:00'), latestStart: at(line.latestStart ?? line.to ?? '07:00') } : null;
    const because = go ? 'wind' : line.enoughToTell === false ? 'data' : (line.because ?? 'wind');
    return {
      planId: line.plan ? (planIds.get(line.plan) ?? null) : null, planName: line.plan ?? '', date, verdict: line.verdict, enoughToTell: line.enoughToTell ?? true, bindingLimit: because,
      headline: go ? { us: 'Wind stays under 8 mph.', metric: 'Wind stays under 3.6 m/s.' } : { us: 'Wind passes 10 mph.', metric: 'Wind passes 4.5 m/s.' },
      reasons: [], window, minutesNeeded: 30, reserveMinutes: 10, sun: { civilDawn: null, sunrise: null, localNoon: noon.toISOString() }, ribbon: { startAt: null, stepMinutes: 10, headroom: [], sunAltitudeDeg: [] }, revision: 0, decidedAt: clock.now().toISOString(),
    };
  }

  const assessor: ScriptedAssessor = {
    forecast: 'fresh',
    asked: [],
    failures: [],
    say: (...plans) => {
      script = plans;
    },
    async assessFarm(farmId, options): Promise<Daybreak> {
      assessor.asked.push({ farmId, options });
      const failure = assessor.failures.shift();
      if (failure) throw failure;
      return inTransaction(sequelize, async (transaction) => {
        const farm = (await models.farms.findOne({ where: { id: farmId }, lock: transaction.LOCK.UPDATE, transaction }))!.get({ plain: true });
        const dates = comingMornings(clock.now(), farm.timeZone);
        const stale = assessor.forecast !== 'fresh';
        const lines: Script[] = stale ? script.map((line) => ({ ...line, verdict: 'hold', enoughToTell: false })) : script;
        const verdicts = dates.flatMap((date) => lines.map((line) => verdictOf(line, date, farm.timeZone)));
        const recorded = await recordVerdicts(models, farmId, null, verdicts, await newestVerdicts(sequelize, farmId, dates[0]!, transaction), transaction);
        const mornings = dates.map((date) => ({ date, verdicts: recorded.filter((verdict) => verdict.date === date) }));
        const forecast = assessor.forecast === 'none' ? null : facts();
        await noticesAfterAssessment(services, transaction, { farm, occasion: options.occasion ?? null, mornings, forecast, stale });
        return { farmId, now: clock.now().toISOString(), timeZone: farm.timeZone, forecast, stale, mornings };
      });
    },
    daybreakJson: async (farmId) => JSON.stringify(await assessor.assessFarm(farmId, { fetch: 'never' })),
    morning: () => Promise.reject(new Error('The scripted assessor tells no morning in full.')),
  };
  return assessor;
}
