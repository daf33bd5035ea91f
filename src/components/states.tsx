import { Component, type ReactNode } from 'react';
import { useT } from '../lib/messages/use-t.ts';
import { Button } from './button.tsx';

/** Nothing here yet: says what to do next. */
export function EmptyState({ children }: { children: ReactNode }) {
  return <div className="rounded-lg bg-paper-sunk px-4 py-5 text-ink-soft">{children}</div>;
}

/** Holds the place of what is loading. */
export function Skeleton({ lines = 3 }: { lines?: number }) {
  const t = useT();
  return (
    <div role="status" aria-label={t('loading')} className="space-y-3 py-1">
      {Array.from({ length: lines }, (_, index) => (
        <div key={index} className="h-5 rounded bg-ink/10 motion-safe:animate-pulse" style={{ width: `${88 - ((index * 23) % 40)}%` }} />
      ))}
    </div>
  );
}

interface BoundaryProps {
  onRetry: () => void;
  children: ReactNode;
}

/** Keeps the failure of one part to that part, says what happened and offers to try again. */
export class PanelErrorBoundary extends Component<BoundaryProps, { error: Error | null }> {
  override state: { error: Error | null } = { error: null };

  static getDerivedStateFromError(error: unknown): { error: Error } {
    return { error: error instanceof Error ? error : new Error(String(error)) };
  }

  override render() {
    if (!this.state.error) return this.props.children;
    const retry = () => {
      this.props.onRetry();
      this.setState({ error: null });
    };
    return <Failed because={this.state.error.message} retry={retry} />;
  }
}

function Failed({ because, retry }: { because: string; retry: () => void }) {
  const t = useT();
  return (
    <div role="alert" className="rounded-lg border-[1.5px] border-rose-deep px-4 py-4">
      <p className="mb-3">{t('panel.failed', { because })}</p>
      <Button variant="quiet" onClick={retry}>
        {t('tryAgain')}
      </Button>
    </div>
  );
}

/** A few words set apart, such as a state. */
export function Mark({ children, strong = false }: { children: ReactNode; strong?: boolean }) {
  return <span className={`inline-block whitespace-nowrap rounded-full px-3 py-1 text-sm ${strong ? 'bg-ink text-paper' : 'bg-paper-sunk'}`}>{children}</span>;
}
