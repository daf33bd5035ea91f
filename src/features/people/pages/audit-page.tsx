import { useSuspenseQuery } from '@tanstack/react-query';
import { EmptyState, PageHeading } from '../../../components/index.ts';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { auditQuery } from '../api/people.ts';

/** Who changed people, keys and limits, and when. */
export function AuditPage() {
  const { id: farmId } = useFarm();
  return (
    <>
      <PageHeading title="What was changed" up={[paths.people(farmId), 'People']} />
      <QueryPanel title="People, keys and limits" lines={8}>
        <Entries />
      </QueryPanel>
    </>
  );
}

const detail = (details: Record<string, unknown>): string =>
  Object.entries(details)
    .map(([name, value]) => `${name}: ${typeof value === 'object' ? JSON.stringify(value) : String(value)}`)
    .join(', ');

function Entries() {
  const { id: farmId } = useFarm();
  const reader = useReader();
  const { data: entries } = useSuspenseQuery(auditQuery(farmId));
  if (entries.length === 0) return <EmptyState>Nothing was changed yet.</EmptyState>;
  return (
    <ul className="divide-y divide-ink/10">
      {entries.map(({ id, at, who, what, subject, details }) => (
        <li key={id} className="py-3">
          <p>
            <span className="font-semibold">{who}</span> · {what} · {subject}
          </p>
          <p className="text-sm break-words text-ink-soft">{[dateTime(at, reader), detail(details)].filter(Boolean).join(' · ')}</p>
        </li>
      ))}
    </ul>
  );
}
