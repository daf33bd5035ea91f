import { useEffect, useRef, type FormEvent, type ReactNode } from 'react';
import { Button, ButtonLink } from '../../components/index.ts';

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

/** A form: what is wrong with the whole is told above its buttons, what is wrong with a field beside it. */
export function RecordForm({ form, saveLabel, cancelTo, cancel, children }: RecordFormProps) {
  return (
    <form noValidate onSubmit={(event) => void form.submit(event)}>
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
        {cancelTo && <ButtonLink to={cancelTo}>Leave it</ButtonLink>}
        {cancel && (
          <Button variant="quiet" onClick={cancel}>
            Leave it
          </Button>
        )}
      </div>
    </form>
  );
}
