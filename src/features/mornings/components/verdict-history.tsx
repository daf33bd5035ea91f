import type { Morning } from '../../../../shared/api/mornings.ts';
import { EmptyState } from '../../../components/index.ts';
import { useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';

/** Each verdict that was told for this morning, newest first. */
export function VerdictHistory({ morning: { history, plans } }: { morning: Morning }) {
  const reader = useReader();
  if (history.length === 0) return <EmptyState>Nothing was told for this morning yet.</EmptyState>;
  const nameOf = (planId: string | null): string => plans.find(({ verdict }) => verdict.planId === planId)?.verdict.planName ?? 'A plan since changed';
  return (
    <ol className="space-y-3">
      {[...history].reverse().map(({ planId, revision, headline, decidedAt }) => (
        <li key={`${planId ?? ''} ${revision}`}>
          <p>{headline[reader.units]}</p>
          <p className="text-sm text-ink-soft">
            {dateTime(decidedAt, reader)} · {nameOf(planId)}
          </p>
        </li>
      ))}
    </ol>
  );
}
