import type { Delivery, Notice } from '../../../../shared/api/notices.ts';
import { Button, useToast, VerdictSign } from '../../../components/index.ts';
import { useFarm, useMay, useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { stateOf } from '../../../lib/verdict-text.ts';
import { useReplayDelivery } from '../api/replay-delivery.ts';
import { channelWords, deliveryStateWords, noticeKindWords } from '../words.ts';

/** How the deliveries of a notice stand, in a few words. */
export function summaryOf(deliveries: Delivery[]): string {
  const count = (state: Delivery['state']) => deliveries.filter((delivery) => delivery.state === state).length;
  const parts = [
    [count('delivered'), 'accepted'],
    [count('waiting') + count('claimed'), 'on the way'],
    [count('dead'), 'given up'],
    [count('dropped'), 'not sent'],
  ] as const;
  const told = parts.filter(([many]) => many > 0).map(([many, word]) => `${many} ${word}`);
  return told.length > 0 ? `Deliveries: ${told.join(', ')}` : 'Nobody wished for it';
}

export function NoticeItem({ notice }: { notice: Notice }) {
  const reader = useReader();
  return (
    <li className="py-4">
      <div className="flex items-start gap-3">
        {notice.verdict && <VerdictSign state={stateOf({ verdict: notice.verdict, enoughToTell: notice.enoughToTell ?? true })} size={40} silent />}
        <div>
          <p className="font-semibold">{notice.title}</p>
          <p>{notice.text}</p>
          <p className="text-sm text-ink-soft">
            {noticeKindWords[notice.kind].name} · {dateTime(notice.createdAt, reader)}
            {notice.lateMinutes > 0 && ` · ${notice.lateMinutes} min late`}
          </p>
        </div>
      </div>
      <details className="mt-1" open={notice.deliveries.some(({ state }) => state === 'dead')}>
        <summary className="flex min-h-touch cursor-pointer items-center text-sm underline">{summaryOf(notice.deliveries)}</summary>
        <ul className="space-y-2 pl-2">
          {notice.deliveries.map((delivery) => (
            <DeliveryRow key={delivery.id} delivery={delivery} />
          ))}
        </ul>
      </details>
    </li>
  );
}

/** When it was sent, shown and tapped, as far as it is known. */
function DeliveryRow({ delivery }: { delivery: Delivery }) {
  const { id: farmId } = useFarm();
  const may = useMay();
  const reader = useReader();
  const toast = useToast();
  const replay = useReplayDelivery(farmId);
  const when = [
    delivery.acceptedAt && `accepted ${dateTime(delivery.acceptedAt, reader)}`,
    delivery.shownAt && `shown ${dateTime(delivery.shownAt, reader)}`,
    delivery.tappedAt && `tapped ${dateTime(delivery.tappedAt, reader)}`,
    delivery.state === 'waiting' && delivery.nextAttemptAt && `next try ${dateTime(delivery.nextAttemptAt, reader)}`,
  ].filter(Boolean);
  return (
    <li className="flex flex-wrap items-center justify-between gap-2">
      <span>
        <span className="block">
          {channelWords[delivery.channel]} to {delivery.recipient}: {deliveryStateWords[delivery.state].toLowerCase()}
        </span>
        <span className="block text-sm text-ink-soft">
          {[...when, delivery.attempts > 1 && `${delivery.attempts} tries`, delivery.state !== 'delivered' && delivery.lastError].filter(Boolean).join(' · ')}
        </span>
      </span>
      {delivery.state === 'dead' && may('run', 'notice') && (
        <Button variant="quiet" busy={replay.isPending} onClick={() => replay.mutate(delivery.id, { onSuccess: () => toast('It is being sent again.'), onError: (error) => toast(error.message) })}>
          Send again
        </Button>
      )}
    </li>
  );
}
