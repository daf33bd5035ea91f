import { useEffect, useRef } from 'react';
import { useT } from '../messages/use-t.ts';

export interface FoundProblem {
  input: HTMLElement;
  text: string;
}

/** Every input of a form that is marked as wrong, in the order of the page, with the problem beside it; a group of boxes counts once. */
export function problemsIn(form: HTMLFormElement): FoundProblem[] {
  const found = new Map<string, FoundProblem>();
  for (const input of form.querySelectorAll<HTMLInputElement>('[aria-invalid="true"]')) {
    const text = input.closest('[data-field]')?.querySelector('[data-problem]')?.textContent ?? '';
    if (!found.has(input.name)) found.set(input.name, { input, text });
  }
  return [...found.values()];
}

/** Several problems at once, each leading to its field; the list takes the focus as it appears. */
export function ErrorSummary({ problems }: { problems: FoundProblem[] }) {
  const t = useT();
  const summary = useRef<HTMLDivElement>(null);
  useEffect(() => summary.current?.focus(), [problems]);
  if (problems.length === 0) return null;
  const title = t('form.problems', { count: problems.length });
  return (
    <div ref={summary} tabIndex={-1} role="group" aria-label={title} className="mb-6 rounded-lg border-2 border-rose-deep px-4 py-3">
      <p className="font-bold">{title}</p>
      <ul>
        {problems.map(({ input, text }, index) => (
          <li key={index}>
            <button type="button" onClick={() => input.focus()} className="min-h-touch text-left underline underline-offset-4">
              {text}
            </button>
          </li>
        ))}
      </ul>
    </div>
  );
}
