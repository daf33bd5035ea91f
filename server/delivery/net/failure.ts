import { clipped, type Outcome } from '../sender.ts';
import { RefusedTarget } from './guard.ts';

/** A network failure in words for the log: the cause, not the wrapper. */
export function failureText(error: unknown): string {
  if (!(error instanceof Error)) return 'The call failed.';
  if (error.name === 'TimeoutError') return 'No answer in time.';
  const cause = error.cause instanceof Error ? error.cause : error;
  const code = (cause as NodeJS.ErrnoException).code;
  return code ? `${cause.message || 'The call failed'} (${code})` : cause.message;
}

/** A call that brought no answer: tried again, unless its target is one that may never be called. */
export function failureOutcome(error: unknown): Outcome {
  const refused = error instanceof RefusedTarget || (error instanceof Error && error.cause instanceof RefusedTarget);
  const detail = clipped(failureText(error));
  return refused ? { kind: 'refused', status: null, detail } : { kind: 'retry', status: null, detail, retryAfterSeconds: null };
}
