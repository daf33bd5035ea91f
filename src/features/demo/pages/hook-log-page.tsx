import { useSuspenseQuery } from '@tanstack/react-query';
import { EmptyState, Mark, PageHeading } from '../../../components/index.ts';
import { useUnits } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { demoClockQuery, demoHooksQuery } from '../api/demo.ts';

/** Indented where it is JSON, else as it came. */
function pretty(body: string): string {
  try {
    return JSON.stringify(JSON.parse(body), null, 2);
  } catch {
    return body;
  }
}

/** What the demo's webhook receiver got, and whether each signature held. */
export function HookLogPage() {
  const { data: hooks } = useSuspenseQuery(demoHooksQuery);
  const { data: clock } = useSuspenseQuery(demoClockQuery);
  const units = useUnits();
  const newestFirst = [...hooks].sort((a, b) => Date.parse(b.receivedAt) - Date.parse(a.receivedAt));
  return (
    <>
      <PageHeading title="Demo hook log" over="Only in the demo" />
      {newestFirst.length === 0 && <EmptyState>Nothing was posted yet. Step the demo clock to dawn: the farm’s webhook posts the verdict here, signed.</EmptyState>}
      <ul className="divide-y divide-ink/15">
        {newestFirst.map(({ id, receivedAt, url, messageId, signatureValid, status, body }) => (
          <li key={id} className="py-3">
            <p className="flex flex-wrap items-center gap-3">
              <Mark strong={signatureValid}>{signatureValid ? 'Signature valid' : 'Signature not valid'}</Mark>
              <span>answered {status}</span>
              <span className="text-ink-soft">{dateTime(receivedAt, { units, timeZone: clock.timeZone })}</span>
            </p>
            <p className="mt-1 text-sm break-all">
              {url} · {messageId}
            </p>
            <details>
              <summary className="flex min-h-touch items-center underline">What was posted</summary>
              <pre className="overflow-x-auto rounded-lg bg-paper-sunk p-4 text-sm">{pretty(body)}</pre>
            </details>
          </li>
        ))}
      </ul>
    </>
  );
}
