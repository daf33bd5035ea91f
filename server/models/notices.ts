import type { Sequelize } from 'sequelize';
import type { Channel, deliveryStates, NoticeKind } from '../../shared/api/notices.ts';
import { day, flag, flagOrNull, instant, instantOrNull, integer, integerOrNull, jsonColumn, key, reference, referenceOrNull, table, text, textOrNull } from './table.ts';

export interface NoticeRow {
  id: string;
  farmId: string;
  kind: NoticeKind;
  morning: string;
  revision: number;
  /** Order of decision among the notices of this farm and morning. */
  sequence: number;
  title: string;
  text: string;
  verdict: 'go' | 'hold' | null;
  enoughToTell: boolean | null;
  body: unknown;
  dueAt: Date;
  usefulUntil: Date;
  createdAt: Date;
}
export interface DeviceRow {
  id: string;
  farmId: string;
  userId: string;
  name: string;
  endpoint: string;
  endpointHash: string;
  p256dh: string;
  auth: string;
  vapidKeyId: string;
  createdAt: Date;
  lastAcceptedAt: Date | null;
  lastShownAt: Date | null;
  goneAt: Date | null;
}
export interface WishesRow {
  farmId: string;
  userId: string;
  body: { push: NoticeKind[]; email: NoticeKind[] };
  updatedAt: Date;
}
export interface WebhookRow {
  id: string;
  farmId: string;
  name: string;
  url: string;
  kinds: NoticeKind[];
  secretSealed: string;
  active: boolean;
  disabledBecause: string | null;
  failingSince: Date | null;
  lastDeliveredAt: Date | null;
  createdAt: Date;
  updatedAt: Date;
}
export interface DeliveryRow {
  id: string;
  noticeId: string | null;
  farmId: string | null;
  channel: Channel;
  target: string;
  recipient: string;
  deliveryKey: string;
  /** Recipient, channel and morning; null where order does not matter. */
  orderKey: string | null;
  sequence: number;
  state: (typeof deliveryStates)[number];
  payload: unknown;
  attempts: number;
  dueAt: Date;
  nextAttemptAt: Date | null;
  usefulUntil: Date;
  claimedBy: string | null;
  leaseUntil: Date | null;
  ackTokenHash: string | null;
  acceptedAt: Date | null;
  shownAt: Date | null;
  tappedAt: Date | null;
  lastError: string | null;
  createdAt: Date;
  updatedAt: Date;
}
export interface DeliveryAttemptRow {
  id: string;
  deliveryId: string;
  attempt: number;
  startedAt: Date;
  endedAt: Date | null;
  outcome: 'started' | 'accepted' | 'retry' | 'gone' | 'refused';
  status: number | null;
  detail: string | null;
}
export interface InboundSourceRow {
  id: string;
  farmId: string;
  name: string;
  secretSealed: string;
  lastReceivedAt: Date | null;
  archivedAt: Date | null;
  createdAt: Date;
}
export interface InboundMessageRow {
  sourceId: string;
  messageId: string;
  receivedAt: Date;
  claimedUntil: Date | null;
  tries: number;
  body: unknown;
  processedAt: Date | null;
  outcome: string | null;
}

/** The next moment of one farm and kind; see server/schedule. */
export interface MomentRow {
  farmId: string;
  kind: 'eve' | 'dawn' | 'refresh' | 'recheck';
  dueAt: Date;
  morning: string | null;
  runAt: Date;
  tries: number;
  farmVersion: number;
}

export const noticeTables = (sequelize: Sequelize) => ({
  notices: table<NoticeRow>(sequelize, 'notices', {
    id: key(), farmId: reference(), kind: text(20), morning: day(), revision: integer(), sequence: integer(), title: text(200), text: text(4000), verdict: textOrNull(4), enoughToTell: flagOrNull(), body: jsonColumn('body'), dueAt: instant(), usefulUntil: instant(), createdAt: instant(),
  }),
  devices: table<DeviceRow>(sequelize, 'devices', {
    id: key(), farmId: reference(), userId: reference(), name: text(120), endpoint: text(1000), endpointHash: text(64), p256dh: text(100), auth: text(30), vapidKeyId: text(40), createdAt: instant(), lastAcceptedAt: instantOrNull(), lastShownAt: instantOrNull(), goneAt: instantOrNull(),
  }),
  wishes: table<WishesRow>(sequelize, 'wishes', { farmId: key(), userId: key(), body: jsonColumn('body'), updatedAt: instant() }),
  webhooks: table<WebhookRow>(sequelize, 'webhooks', {
    id: key(), farmId: reference(), name: text(120), url: text(1000), kinds: jsonColumn('kinds'), secretSealed: text(400), active: flag(), disabledBecause: textOrNull(300), failingSince: instantOrNull(), lastDeliveredAt: instantOrNull(), createdAt: instant(), updatedAt: instant(),
  }),
  deliveries: table<DeliveryRow>(sequelize, 'deliveries', {
    id: key(), noticeId: referenceOrNull(), farmId: referenceOrNull(), channel: text(10), target: text(254), recipient: text(300), deliveryKey: text(400), orderKey: textOrNull(200), sequence: integer(), state: text(10), payload: jsonColumn('payload'), attempts: integer(), dueAt: instant(), nextAttemptAt: instantOrNull(),
    usefulUntil: instant(), claimedBy: textOrNull(80), leaseUntil: instantOrNull(), ackTokenHash: textOrNull(64), acceptedAt: instantOrNull(), shownAt: instantOrNull(), tappedAt: instantOrNull(), lastError: textOrNull(500), createdAt: instant(), updatedAt: instant(),
  }),
  deliveryAttempts: table<DeliveryAttemptRow>(sequelize, 'delivery_attempts', {
    id: key(), deliveryId: reference(), attempt: integer(), startedAt: instant(), endedAt: instantOrNull(), outcome: text(10), status: integerOrNull(), detail: textOrNull(500),
  }),
  inboundSources: table<InboundSourceRow>(sequelize, 'inbound_sources', { id: key(), farmId: reference(), name: text(120), secretSealed: text(400), lastReceivedAt: instantOrNull(), archivedAt: instantOrNull(), createdAt: instant() }),
  inboundMessages: table<InboundMessageRow>(sequelize, 'inbound_messages', {
    sourceId: key(), messageId: { ...text(200), primaryKey: true }, receivedAt: instant(), claimedUntil: instantOrNull(), tries: integer(), body: jsonColumn('body'), processedAt: instantOrNull(), outcome: textOrNull(300),
  }),
  moments: table<MomentRow>(sequelize, 'moments', { farmId: key(), kind: { ...text(10), primaryKey: true }, dueAt: instant(), morning: { ...day(), allowNull: true }, runAt: instant(), tries: integer(), farmVersion: integer() }),
});
