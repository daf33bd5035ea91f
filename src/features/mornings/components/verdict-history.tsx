import { useState } from 'react';
import type { Morning } from '../../../../shared/api/mornings.ts';
import { Button, EmptyState } from '../../../components/index.ts';
import { useReader } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';

const shownAtFirst = 6;

/** How the answer for this morning changed with each forecast, newest first. */
export function VerdictHistory({ morning: { history, plans } }: { morning: Morning }) {
  const reader = useReader();
  const [all, setAll] = useState(false);
  if (history.length === 0) return <EmptyState>The answer has not changed yet.</EmptyState>;
  const nameOf = (planId: string | null): string => plans.find(({ verdict }) => verdict.planId === planId)?.verdict.planName ?? 'A plan since changed';
  const newestFirst = [...history].sort((a, b) => Date.parse(b.decidedAt) - Date.parse(a.decidedAt));
  return (
    <>
      <ol className="space-y-3">
      {newestFirst.slice(0, all ? undefined : shownAtFirst).map(({ planId, revision, headline, decidedAt }) => (
        <li key={`${planId ?? ''} ${revision}`}>
          <p>{headline[reader.units]}</p>
          <p className="text-sm text-ink-soft">
            {dateTime(decidedAt, reader)} · {nameOf(planId)}
          </p>
        </li>
      ))}
      </ol>
      {!all && history.length > shownAtFirst && (
        <Button variant="link" onClick={() => setAll(true)}>
          Show all {history.length}
        </Button>
      )}
    </>
  );
}
