import { useEffect, useRef, useState, type FormEvent, type ReactNode } from 'react';
import { Button, ButtonLink } from '../../components/index.ts';
import { useT } from '../messages/use-t.ts';
import { ErrorSummary, problemsIn, type FoundProblem } from './error-summary.tsx';

interface FieldsProps {
  legend?: string;
  hint?: string;
  columns?: 1 | 2;
  children: ReactNode;
}

const grids = { 1: 'grid gap-y-5', 2: 'grid gap-x-8 gap-y-5 sm:grid-cols-2' } as const;

/** Fields that belong together, under one heading. */
export function Fields({ legend, hint, columns = 2, children }: FieldsProps) {
  return (
    <fieldset className="mb-8">
      {legend && <legend className="mb-1 w-full border-t-2 border-ink/80 pt-3 text-xl font-bold">{legend}</legend>}
      {hint && <p className="mb-4 text-ink-soft">{hint}</p>}
      <div className={`mt-3 ${grids[columns]}`}>{children}</div>
    </fieldset>
  );
}

/** Fields that few people need, behind a line that opens them. */
export function MoreFields({ legend, hint, children }: Required<Pick<FieldsProps, 'legend' | 'children'>> & Pick<FieldsProps, 'hint'>) {
  const details = useRef<HTMLDetailsElement>(null);
  // A problem never stays folded away.
  useEffect(() => {
    if (details.current?.querySelector('[aria-invalid="true"]')) details.current.open = true;
  });
  return (
    <details ref={details} className="mb-8">
      <summary className="flex min-h-touch items-center font-semibold underline underline-offset-4">{legend}</summary>
      <Fields {...(hint ? { hint } : {})}>{children}</Fields>
    </details>
  );
}

interface RecordFormProps {
  form: { submit: (event: FormEvent<HTMLFormElement>) => Promise<void>; formProblem: string | null; busy: boolean };
  saveLabel: string;
  /** Where giving up leads, or what it does. */
  cancelTo?: string;
  cancel?: () => void;
  children: ReactNode;
}

/** A form: what is wrong with a field stands beside it, several problems are listed above as well, and what is wrong with the whole is told above its buttons. */
export function RecordForm({ form, saveLabel, cancelTo, cancel, children }: RecordFormProps) {
  const t = useT();
  const [problems, setProblems] = useState<FoundProblem[]>([]);

  async function send(event: FormEvent<HTMLFormElement>) {
    const element = event.currentTarget;
    setProblems([]);
    await form.submit(event);
    // The problems stand beside their fields once the page has been drawn anew.
    requestAnimationFrame(() => {
      const found = problemsIn(element);
      if (found.length === 1) found[0]!.input.focus();
      else setProblems(found);
    });
  }

  return (
    <form noValidate onSubmit={(event) => void send(event)}>
      <ErrorSummary problems={problems} />
      {children}
      {form.formProblem && (
        <p role="alert" className="mb-4 rounded-lg border-[1.5px] border-rose-deep px-4 py-3">
          {form.formProblem}
        </p>
      )}
      <div className="flex flex-wrap gap-2">
        <Button type="submit" busy={form.busy}>
          {saveLabel}
        </Button>
        {cancelTo && <ButtonLink to={cancelTo}>{t('form.leave')}</ButtonLink>}
        {cancel && (
          <Button variant="quiet" onClick={cancel}>
            {t('form.leave')}
          </Button>
        )}
      </div>
    </form>
  );
}
