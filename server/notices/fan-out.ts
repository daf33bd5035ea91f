import { createHash, randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { Units } from '../../shared/api/accounts.ts';
import type { NoticeKind } from '../../shared/api/notices.ts';
import { maskedAddress } from '../delivery/mask.ts';
import { queueDelivery, type NewDelivery } from '../delivery/outbox.ts';
import type { MailPayload, PushPayload, WebhookPayload } from '../delivery/payloads.ts';
import { acknowledgementHash, acknowledgementToken } from '../delivery/push/acknowledgement.ts';
import type { NoticeRow } from '../models/notices.ts';
import type { Services } from '../services.ts';
import { letterHtml } from './letter-html.ts';
import { textOf, type NoticeContent } from './texts.ts';
import { signOf } from './told.ts';
import { defaultWishes } from './wishes.ts';

/** Kinds whose push rings at once even on a phone that saves power. */
const urgent: readonly NoticeKind[] = ['dawn', 'turn', 'test'];
/** Kinds that tell the verdict of a morning: among them a newer one replaces an older. */
export const verdictKinds: readonly NoticeKind[] = ['eve', 'dawn', 'turn', 'summary'];
/** Webhook events are for machines that keep books too: tried for three days, with their own end of use inside. */
const webhookDays = 3;

interface Member {
  userId: string;
  name: string;
  email: string;
  confirmed: boolean;
  units: Units;
  language: string;
  push: readonly NoticeKind[];
  mail: readonly NoticeKind[];
}

async function membersOf({ models }: Services, farmId: string, transaction: Transaction): Promise<Member[]> {
  const memberships = await models.memberships.findAll({ where: { farmId }, transaction, raw: true });
  const userIds = memberships.map((row) => row.userId);
  const users = new Map((await models.users.findAll({ where: { id: userIds }, transaction })).map((user) => [user.id, user]));
  const wishes = new Map((await models.wishes.findAll({ where: { farmId, userId: userIds }, transaction })).map((row) => [row.userId, row.body]));
  return memberships.flatMap(({ userId, role }) => {
    const user = users.get(userId);
    if (!user) return [];
    const wished = wishes.get(userId) ?? defaultWishes(role);
    return [{ userId, name: user.name, email: user.email, confirmed: user.emailConfirmedAt !== null, units: user.units, language: user.language, push: wished.push, mail: wished.email }];
  });
}

/** Path of a morning in the client. */
export const morningPath = (farmId: string, morning: string): string => `/farms/${farmId}/mornings/${morning}`;

/** A topic of RFC 8030 §5.4: at most 32 characters of base64url. */
const topicOf = (tag: string): string => createHash('sha256').update(tag).digest('base64url').slice(0, 32);

/** Tag of a notice on the device: one per farm and morning for verdicts, so that the newest is the one shown. */
const tagOf = (notice: NoticeRow): string => (verdictKinds.includes(notice.kind) ? `morning-${notice.farmId}-${notice.morning}` : `${notice.kind}-${notice.farmId}-${notice.morning}-${notice.revision}`);

type Common = Pick<NewDelivery, 'noticeId' | 'farmId' | 'dueAt' | 'usefulUntil'>;

/** What all deliveries of a notice share, and their keys. */
function commonOf(notice: NoticeRow): { common: Common; named: (recipient: string, channel: string) => Pick<NewDelivery, 'key' | 'order'> } {
  const common: Common = { noticeId: notice.id, farmId: notice.farmId, dueAt: notice.dueAt, usefulUntil: notice.usefulUntil };
  const named = (recipient: string, channel: string) => ({
    key: [notice.farmId, notice.morning, notice.kind, notice.revision, recipient, channel].join(':'),
    order: verdictKinds.includes(notice.kind) ? { key: [recipient, channel, notice.farmId, notice.morning].join(':'), sequence: notice.sequence } : null,
  });
  return { common, named };
}

/** The push of a notice to one device. */
export function pushDelivery({ settings }: Services, notice: NoticeRow, content: NoticeContent, member: Pick<Member, 'name' | 'units' | 'language'>, device: { id: string; name: string }): NewDelivery & { id: string } {
  const { common, named } = commonOf(notice);
  const text = textOf(content, member);
  const tag = tagOf(notice);
  const id = randomUUID();
  const payload: PushPayload = {
    title: text.title,
    body: text.brief,
    path: morningPath(notice.farmId, notice.morning),
    tag,
    topic: topicOf(tag),
    urgency: urgent.includes(notice.kind) ? 'high' : 'normal',
    kind: notice.kind,
    sign: notice.verdict === null ? null : signOf(content.plans),
    language: text.words.language,
    lateNote: text.words.late,
  };
  return { id, ...common, ...named(device.id, 'push'), channel: 'push', target: device.id, recipient: `${member.name}, ${device.name}`, payload, ackTokenHash: acknowledgementHash(acknowledgementToken(settings.secret, id)) };
}

function mailDelivery({ settings }: Services, notice: NoticeRow, content: NoticeContent, member: Member): NewDelivery {
  const { common, named } = commonOf(notice);
  const text = textOf(content, member);
  const { words } = text;
  const url = `${settings.publicUrl}${morningPath(notice.farmId, notice.morning)}`;
  const subject = notice.kind === 'summary' ? words.summarySubject(text.title) : text.title;
  const small = [words.finalWord, words.because(content.farm.name)];
  const payload: MailPayload = {
    subject,
    text: [text.title, ...text.paragraphs, `${words.open}: ${url}`, ...small].join('\n\n'),
    html: letterHtml({ language: words.language, title: text.title, sign: notice.verdict === null ? null : signOf(content.plans), paragraphs: text.paragraphs, link: { text: words.open, url }, small }),
    thread: `${notice.farmId} ${notice.morning} ${member.userId}`,
    lateNote: words.late,
  };
  return { ...common, ...named(member.userId, 'email'), channel: 'email', target: member.userId, recipient: `${member.name}, ${maskedAddress(member.email)}`, payload, ackTokenHash: null };
}

/** The event of a notice, for machines: SI units, instants in UTC. */
function eventOf({ settings }: Services, notice: NoticeRow, content: NoticeContent): WebhookPayload {
  return {
    type: `notice.${notice.kind}`,
    timestamp: notice.createdAt.toISOString(),
    data: {
      noticeId: notice.id,
      farmId: notice.farmId,
      farmName: content.farm.name,
      date: notice.morning,
      timeZone: content.farm.timeZone,
      /** Higher is newer, within one farm and date. */
      sequence: notice.sequence,
      title: notice.title,
      verdict: notice.verdict,
      enoughToTell: notice.enoughToTell,
      dueAt: notice.dueAt.toISOString(),
      usefulUntil: notice.usefulUntil.toISOString(),
      plans: content.plans.map((plan) => ({
        planId: plan.planKey === 'usual' ? null : plan.planKey,
        planName: plan.planName,
        verdict: plan.verdict,
        enoughToTell: plan.enoughToTell,
        bindingLimit: plan.bindingLimit,
        window: plan.window,
        headline: plan.headline.metric,
      })),
      url: `${settings.publicUrl}${morningPath(notice.farmId, notice.morning)}`,
    },
  };
}

/** The event of a notice to one webhook. */
export function webhookDelivery(services: Services, notice: NoticeRow, content: NoticeContent, webhook: { id: string; name: string }): NewDelivery & { id: string } {
  const { common, named } = commonOf(notice);
  const usefulUntil = new Date(notice.dueAt.getTime() + webhookDays * 86_400_000);
  return { id: randomUUID(), ...common, usefulUntil, ...named(webhook.id, 'webhook'), channel: 'webhook', target: webhook.id, recipient: webhook.name, payload: eventOf(services, notice, content), ackTokenHash: null };
}

/** Puts a notice into the outbox for everyone who wished for it: each device, each confirmed address, each webhook. @returns how many deliveries */
export async function fanOut(services: Services, transaction: Transaction, notice: NoticeRow, content: NoticeContent): Promise<number> {
  const { models } = services;
  const { farmId, kind } = notice;
  const members = await membersOf(services, farmId, transaction);
  const pushed = new Map(members.filter((member) => member.push.includes(kind)).map((member) => [member.userId, member]));
  const devices = pushed.size > 0 ? await models.devices.findAll({ where: { farmId, userId: [...pushed.keys()], goneAt: null }, transaction }) : [];
  const webhooks = (await models.webhooks.findAll({ where: { farmId, active: true }, transaction })).filter((webhook) => webhook.kinds.includes(kind));
  const deliveries = [
    ...devices.map((device) => pushDelivery(services, notice, content, pushed.get(device.userId)!, device)),
    ...members.filter((member) => member.confirmed && member.mail.includes(kind)).map((member) => mailDelivery(services, notice, content, member)),
    ...webhooks.map((webhook) => webhookDelivery(services, notice, content, webhook)),
  ];
  for (const delivery of deliveries) await queueDelivery(services, transaction, delivery);
  return deliveries.length;
}
