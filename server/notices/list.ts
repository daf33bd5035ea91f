import { Op } from 'sequelize';
import type { Delivery, Notice } from '../../shared/api/notices.ts';
import type { DeliveryRow, NoticeRow } from '../models/notices.ts';
import type { Services } from '../services.ts';

const iso = (instant: Date | null): string | null => instant?.toISOString() ?? null;

export const presentDelivery = (row: Omit<DeliveryRow, 'payload'>): Delivery => ({
  id: row.id, channel: row.channel, recipient: row.recipient, state: row.state, attempts: row.attempts, dueAt: row.dueAt.toISOString(), nextAttemptAt: iso(row.nextAttemptAt), acceptedAt: iso(row.acceptedAt),
  shownAt: iso(row.shownAt), tappedAt: iso(row.tappedAt), lastError: row.lastError,
});

const presentNotice = (row: NoticeRow, deliveries: Delivery[]): Notice => ({
  id: row.id, kind: row.kind, date: row.morning, title: row.title, text: row.text, verdict: row.verdict, enoughToTell: row.enoughToTell, lateMinutes: Math.max(0, Math.floor((row.createdAt.getTime() - row.dueAt.getTime()) / 60_000)),
  createdAt: row.createdAt.toISOString(), deliveries,
});

/** The farm's notices with their deliveries, newest first; two queries however many. */
export async function listNotices({ models }: Services, farmId: string, { limit, before }: { limit: number; before: Date | null }): Promise<Notice[]> {
  const notices = await models.notices.findAll({ where: { farmId, ...(before ? { createdAt: { [Op.lt]: before } } : {}) }, attributes: { exclude: ['body'] }, order: [['createdAt', 'DESC'], ['sequence', 'DESC'], ['id', 'ASC']], limit });
  const rows = await models.deliveries.findAll({ where: { noticeId: notices.map(({ id }) => id) }, attributes: { exclude: ['payload'] }, order: [['channel', 'ASC'], ['recipient', 'ASC'], ['id', 'ASC']] });
  const deliveries = new Map<string, Delivery[]>();
  for (const row of rows) {
    const kept = deliveries.get(row.noticeId!);
    if (kept) kept.push(presentDelivery(row));
    else deliveries.set(row.noticeId!, [presentDelivery(row)]);
  }
  return notices.map((notice) => presentNotice(notice, deliveries.get(notice.id) ?? []));
}
