import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { NoticeKind } from '../../shared/api/notices.ts';
import type { NoticeRow } from '../models/notices.ts';
import type { Services } from '../services.ts';
import { fanOut } from './fan-out.ts';
import { textOf, type NoticeContent } from './texts.ts';
import { signOf, type ToldPlan } from './told.ts';

/** What a notice keeps of what it told, beside its text. */
export interface NoticeBody {
  plans: ToldPlan[];
  turned: NoticeContent['turned'];
}

const titleMax = 200;
const textMax = 4000;

/** The next numbers of a farm's morning: of this kind, and over all kinds. The farm's row is locked by the caller. */
async function numbers({ models }: Services, farmId: string, morning: string, kind: NoticeKind, transaction: Transaction): Promise<{ revision: number; sequence: number }> {
  const rows = await models.notices.findAll({ where: { farmId, morning }, attributes: ['kind', 'revision', 'sequence'], transaction, raw: true });
  return {
    revision: Math.max(0, ...rows.filter((row) => row.kind === kind).map((row) => row.revision)) + 1,
    sequence: Math.max(0, ...rows.map((row) => row.sequence)) + 1,
  };
}

/** A notice row as it will be stored, in the farm's own units. */
export async function noticeRow(services: Services, transaction: Transaction, content: NoticeContent, units: 'us' | 'metric', times: { dueAt: Date; usefulUntil: Date }): Promise<NoticeRow> {
  const { farm, morning, kind, plans, turned } = content;
  const text = textOf(content, { units, language: 'en' });
  const sign = signOf(plans);
  const tellsVerdict = kind !== 'test' && kind !== 'forecastMissing';
  const body: NoticeBody = { plans, turned };
  return {
    id: randomUUID(), farmId: farm.id, kind, morning, ...(await numbers(services, farm.id, morning, kind, transaction)), title: text.title.slice(0, titleMax), text: text.paragraphs.join('\n').slice(0, textMax),
    verdict: tellsVerdict ? (sign === 'go' ? 'go' : 'hold') : null, enoughToTell: tellsVerdict ? sign !== 'unknown' : null, body, ...times, createdAt: services.clock.now(),
  };
}

/** Stores a notice and puts it into the outbox for everyone who wished for it. */
export async function tell(services: Services, transaction: Transaction, content: NoticeContent, units: 'us' | 'metric', times: { dueAt: Date; usefulUntil: Date }): Promise<NoticeRow> {
  const notice = await noticeRow(services, transaction, content, units, times);
  await services.models.notices.create(notice, { transaction });
  const deliveries = await fanOut(services, transaction, notice, content);
  services.log.info({ noticeId: notice.id, farmId: notice.farmId, kind: notice.kind, morning: notice.morning, revision: notice.revision, verdict: notice.verdict, deliveries }, 'notice');
  return notice;
}
