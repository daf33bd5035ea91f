import { Component, type ReactNode } from 'react';
import { Button, ButtonLink, PageHeading, Skeleton } from '../components/index.ts';
import { isApiProblem } from '../lib/api/problem.ts';
import { paths } from '../lib/paths.ts';

/** Holds the place of a page on its way. */
export function PageSkeleton() {
  return (
    <div className="px-4 pt-8">
      <Skeleton lines={6} />
    </div>
  );
}

export function NotFoundPage() {
  return (
    <div className="px-4 pt-8">
      <PageHeading title="Nothing here" />
      <p className="mb-4">This address names nothing, or nothing that is yours to see. It may have been moved, or mistyped.</p>
      <ButtonLink to={paths.home()} variant="primary">
        To the first page
      </ButtonLink>
    </div>
  );
}

/** A page that could not be shown, and what to do. */
export function ProblemPage({ error, retry }: { error: Error; retry: () => void }) {
  if (isApiProblem(error, 404)) return <NotFoundPage />;
  const refused = isApiProblem(error, 403);
  return (
    <div role="alert" className="px-4 pt-8">
      <PageHeading title={isApiProblem(error) ? error.title : 'Something went wrong'} />
      <p className="mb-4">{isApiProblem(error) ? error.message : 'This page met an error. Nothing you saved is lost.'}</p>
      {refused ? (
        <ButtonLink to={paths.home()}>To the first page</ButtonLink>
      ) : (
        <Button onClick={retry}>Try again</Button>
      )}
    </div>
  );
}

interface PageBoundaryProps {
  /** A new address is a new try. */
  address: string;
  onRetry: () => void;
  children: ReactNode;
}

/** Keeps a failing page inside its frame. */
export class PageBoundary extends Component<PageBoundaryProps, { error: Error | null; address: string }> {
  override state: { error: Error | null; address: string } = { error: null, address: this.props.address };

  static getDerivedStateFromError(error: unknown): { error: Error } {
    return { error: error instanceof Error ? error : new Error(String(error)) };
  }

  static getDerivedStateFromProps({ address }: PageBoundaryProps, state: { error: Error | null; address: string }) {
    return address === state.address ? null : { error: null, address };
  }

  override render() {
    const { children, onRetry } = this.props;
    const retry = () => {
      onRetry();
      this.setState({ error: null });
    };
    return this.state.error ? <ProblemPage error={this.state.error} retry={retry} /> : children;
  }
}
