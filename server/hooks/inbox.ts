import type { InboundForecast } from '../../shared/api/inbound-forecast.ts';
import { execute, inTransaction, select } from '../database/connection.ts';
import type { Services } from '../services.ts';
import type { Assessor } from '../verdicts/assessor.ts';

/** Processes messages that were taken in, each once. */
export interface Inbox {
  /** Processes everything waiting. @returns how many */
  process(): Promise<number>;
}

/** Another process leaves a message alone for this long after one has taken it. */
const takenMs = 120_000;
const triesMax = 5;
const atOnce = 20;

interface Row {
  source_id: string;
  message_id: string;
  body: string;
  tries: number;
}
type Taken = Row & { farm_id: string };

export function createInbox(services: Services, assessor: Assessor): Inbox {
  const { sequelize, models, clock, random, log } = services;

  async function take(): Promise<Taken[]> {
    const now = clock.now();
    return inTransaction(
      sequelize,
      async (transaction) => {
        const rows = await select<Row>(
          sequelize,
          `SELECT source_id, message_id, body, tries FROM inbound_messages FORCE INDEX (inbound_messages_waiting)
            WHERE processed_at IS NULL AND (claimed_until IS NULL OR claimed_until <= :now) ORDER BY received_at LIMIT ${atOnce} FOR UPDATE SKIP LOCKED`,
          { now },
          transaction,
        );
        if (rows.length === 0) return [];
        const sources = await models.inboundSources.findAll({ where: { id: [...new Set(rows.map((row) => row.source_id))] }, attributes: ['id', 'farmId'], transaction, raw: true });
        const farms = new Map(sources.map((source) => [source.id, source.farmId]));
        for (const row of rows) {
          await execute(
            sequelize,
            'UPDATE inbound_messages SET claimed_until = :until, tries = tries + 1 WHERE source_id = :sourceId AND message_id = :messageId',
            { until: new Date(now.getTime() + takenMs), sourceId: row.source_id, messageId: row.message_id },
            transaction,
          );
        }
        return rows.map((row) => ({ ...row, farm_id: farms.get(row.source_id)!, tries: row.tries + 1 }));
      },
      random,
    );
  }

  /** An issue older than one that came before it changes nothing: messages may overtake each other. */
  async function isOutdated(farmId: string, issuedAt: string | null): Promise<boolean> {
    if (issuedAt === null) return false;
    const newest = await models.forecasts.findOne({ where: { farmId, provider: 'webhook' }, attributes: ['issuedAt'], order: [['issuedAt', 'DESC']], raw: true });
    return newest?.issuedAt !== null && newest?.issuedAt !== undefined && newest.issuedAt.getTime() > Date.parse(issuedAt);
  }

  async function act(row: Taken): Promise<string> {
    const message = JSON.parse(row.body) as InboundForecast;
    if (message.type === 'forecast.issued') {
      await assessor.assessFarm(row.farm_id, { fetch: 'now' });
      return 'fetched and assessed';
    }
    const { model, issuedAt, hours } = message.data;
    if (await isOutdated(row.farm_id, issuedAt)) return 'older than the forecast at hand; kept out';
    await assessor.assessFarm(row.farm_id, { fetch: 'never', handed: { model, issuedAt: issuedAt === null ? null : new Date(issuedAt), hours } });
    return 'taken and assessed';
  }

  async function handle(row: Taken): Promise<void> {
    const where = { sourceId: row.source_id, messageId: row.message_id };
    try {
      const outcome = await act(row);
      await models.inboundMessages.update({ processedAt: clock.now(), outcome, claimedUntil: null }, { where });
    } catch (error) {
      log.error({ err: error, ...where, tries: row.tries }, 'an inbound message could not be processed');
      const given = row.tries >= triesMax;
      await models.inboundMessages.update(
        given ? { processedAt: clock.now(), outcome: 'given up: the farm could not be assessed', claimedUntil: null } : { claimedUntil: new Date(clock.now().getTime() + 2 ** row.tries * 5000) },
        { where },
      );
    }
  }

  async function process(): Promise<number> {
    let total = 0;
    for (;;) {
      const rows = await take();
      if (rows.length === 0) return total;
      total += rows.length;
      // The messages of one farm follow each other; farms go side by side.
      await Promise.all([...new Set(rows.map((row) => row.farm_id))].map(async (farmId) => {
        for (const row of rows) if (row.farm_id === farmId) await handle(row);
      }));
    }
  }

  return { process };
}
