import { QueryErrorResetBoundary } from '@tanstack/react-query';
import { Suspense, type ReactNode } from 'react';
import { Panel, PanelErrorBoundary, Skeleton } from '../index.ts';

interface QueryPanelProps {
  title: string;
  actions?: ReactNode;
  children: ReactNode;
  /** Lines of the skeleton while it loads. */
  lines?: number;
}

/** A panel that loads and fails by itself: the rest of the page stands, and one can try again. */
export function QueryPanel({ title, actions, children, lines = 3 }: QueryPanelProps) {
  return (
    <Panel title={title} actions={actions}>
      <QueryErrorResetBoundary>
        {({ reset }) => (
          <PanelErrorBoundary onRetry={reset}>
            <Suspense fallback={<Skeleton lines={lines} />}>{children}</Suspense>
          </PanelErrorBoundary>
        )}
      </QueryErrorResetBoundary>
    </Panel>
  );
}
