import { useSuspenseQuery } from '@tanstack/react-query';
import type { NoticeKind, Wishes } from '../../../../shared/api/notices.ts';
import { useToast } from '../../../components/index.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { useUpdateWishes, wishesQuery } from '../api/wishes.ts';
import { channelWords, chosenKinds, noticeKindWords } from '../words.ts';

const channels = ['push', 'email'] as const;

const toggled = (kinds: NoticeKind[], kind: NoticeKind): NoticeKind[] => (kinds.includes(kind) ? kinds.filter((other) => other !== kind) : [...kinds, kind]);

/** Which notices reach me, by which channel; each tick is kept at once. */
export function WishesTable() {
  const { id: farmId } = useFarm();
  const { data: wishes } = useSuspenseQuery(wishesQuery(farmId));
  const update = useUpdateWishes(farmId);
  const toast = useToast();
  // What was just ticked shows at once, and goes back when the server refuses it.
  const shown: Wishes = update.isPending ? update.variables : wishes;

  return (
    <table className="w-full text-left">
      <thead>
        <tr>
          <th scope="col" className="font-normal text-ink-soft">
            Notice
          </th>
          {channels.map((channel) => (
            <th key={channel} scope="col" className="w-20 text-center font-normal text-ink-soft">
              {channelWords[channel]}
            </th>
          ))}
        </tr>
      </thead>
      <tbody className="divide-y divide-ink/10">
        {chosenKinds.map((kind) => (
          <tr key={kind}>
            <th scope="row" className="py-2 pr-2 font-normal">
              <span className="block font-semibold">{noticeKindWords[kind].name}</span>
              <span className="block text-sm text-ink-soft">{noticeKindWords[kind].hint}</span>
            </th>
            {channels.map((channel) => (
              <td key={channel} className="text-center">
                <label className="inline-flex min-h-touch min-w-touch items-center justify-center">
                  <input
                    type="checkbox"
                    className="size-6 accent-needle"
                    aria-label={`${noticeKindWords[kind].name} by ${channelWords[channel].toLowerCase()}`}
                    checked={shown[channel].includes(kind)}
                    onChange={() => update.mutate({ ...shown, [channel]: toggled(shown[channel], kind) }, { onError: (error) => toast(error.message) })}
                  />
                </label>
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
