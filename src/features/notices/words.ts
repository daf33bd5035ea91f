import type { Channel, Delivery, NoticeKind } from '../../../shared/api/notices.ts';

export const noticeKindWords: Record<NoticeKind, { name: string; hint: string }> = {
  eve: { name: 'The night before', hint: 'Tomorrow’s go or hold, at the time the farm sets.' },
  dawn: { name: 'At dawn', hint: 'Go or hold on the newest forecast, before sunrise.' },
  turn: { name: 'When it turns', hint: 'As soon as new data turns what you were told.' },
  summary: { name: 'Morning summary', hint: 'Everything of the morning in one letter, for whoever mixes.' },
  forecastMissing: { name: 'No forecast', hint: 'When no fresh forecast is to be had.' },
  test: { name: 'Test', hint: 'Sent by hand, to see that it arrives.' },
};

/** Kinds that a person or a webhook may choose; a test always comes. */
export const chosenKinds = ['eve', 'dawn', 'turn', 'summary', 'forecastMissing'] as const satisfies readonly NoticeKind[];

export const channelWords: Record<Channel, string> = { push: 'Push', email: 'E-mail', webhook: 'Webhook' };

export const deliveryStateWords: Record<Delivery['state'], string> = {
  waiting: 'Waiting to be sent',
  claimed: 'Being sent',
  delivered: 'Accepted',
  dead: 'Given up',
  dropped: 'Not sent, it came too late to help',
};
