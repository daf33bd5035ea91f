import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { EmptyState, PageHeading } from '../../../components/index.ts';
import { useUnits } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { demoClockQuery, demoMailboxQuery } from '../api/demo.ts';
import { MailReader } from '../components/mail-reader.tsx';

/** Every letter that the demo sent, to whomever. */
export function MailboxPage() {
  const { data: mails } = useSuspenseQuery(demoMailboxQuery);
  const { data: clock } = useSuspenseQuery(demoClockQuery);
  const units = useUnits();
  const [openId, setOpenId] = useState<string | null>(null);
  const newestFirst = [...mails].sort((a, b) => Date.parse(b.receivedAt) - Date.parse(a.receivedAt));
  const open = newestFirst.find(({ id }) => id === openId) ?? newestFirst[0];
  if (!open) {
    return (
      <>
        <PageHeading title="Demo mailbox" over="Only in the demo" />
        <EmptyState>No letters yet. Step the demo clock to dawn: the morning summary to the partner comes in here.</EmptyState>
      </>
    );
  }
  return (
    <>
      <PageHeading title="Demo mailbox" over="Only in the demo" />
      <div className="gap-8 md:grid md:grid-cols-[20rem_1fr]">
        <ul aria-label="Letters" className="mb-4 max-h-56 divide-y divide-ink/15 overflow-y-auto border-y border-ink/15 md:max-h-[70dvh]">
          {newestFirst.map(({ id, to, subject, receivedAt }) => (
            <li key={id}>
              <button type="button" aria-current={id === open.id ? 'true' : undefined} className="min-h-touch w-full px-2 py-2 text-left aria-[current=true]:bg-paper-sunk" onClick={() => setOpenId(id)}>
                <span className="block truncate font-semibold">{subject}</span>
                <span className="block truncate text-sm text-ink-soft">
                  to {to} · {dateTime(receivedAt, { units, timeZone: clock.timeZone })}
                </span>
              </button>
            </li>
          ))}
        </ul>
        <MailReader key={open.id} mail={open} />
      </div>
    </>
  );
}
