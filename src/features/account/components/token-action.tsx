import { useState, type ReactNode } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { Button } from '../../../components/index.ts';
import { paths } from '../../../lib/paths.ts';

/** The token of a letter's link; null when the link was cut short. */
export function useToken(): string | null {
  const [search] = useSearchParams();
  const token = search.get('token');
  return token && token.length >= 20 ? token : null;
}

export function BrokenLink() {
  return (
    <p role="alert">
      This link is not whole. Open it from the letter again, or copy it to its last letter.{' '}
      <Link className="underline" to={paths.home()}>
        To the first page
      </Link>
    </p>
  );
}

interface TokenActionProps {
  label: string;
  act: () => Promise<unknown>;
  /** Shown once it is done. */
  done: ReactNode;
}

/** One button that uses a letter's token: never on loading the page, because mail scanners open links too. */
export function TokenAction({ label, act, done }: TokenActionProps) {
  const [state, setState] = useState<{ kind: 'ready' | 'busy' | 'done' } | { kind: 'failed'; because: string }>({ kind: 'ready' });

  async function run() {
    setState({ kind: 'busy' });
    try {
      await act();
      setState({ kind: 'done' });
    } catch (error) {
      setState({ kind: 'failed', because: error instanceof Error ? error.message : 'That did not work. Try again.' });
    }
  }

  if (state.kind === 'done') return <div role="status">{done}</div>;
  return (
    <>
      <Button onClick={() => void run()} busy={state.kind === 'busy'}>
        {label}
      </Button>
      {state.kind === 'failed' && <p role="alert">{state.because}</p>}
    </>
  );
}
