import { useId, type HTMLInputTypeAttribute, type ReactNode } from 'react';
import { useT } from '../messages/use-t.ts';
import type { Bound } from './use-typed-form.ts';

interface FieldProps extends Bound {
  label: string;
  hint?: string | undefined;
  required?: boolean;
}

const inputLook = 'min-h-touch w-full rounded-lg border-[1.5px] border-ink/50 bg-paper-raised px-3 aria-invalid:border-2 aria-invalid:border-rose-deep';

interface FrameProps {
  id: string;
  label: string;
  hint: string | undefined;
  problem: string | undefined;
  required: boolean | undefined;
  wide?: boolean;
  children: ReactNode;
}

const problemId = (id: string): string => `${id}-problem`;
const hintId = (id: string): string => `${id}-hint`;

/** What an input must say of itself for a screen reader. */
const described = (id: string, hint: string | undefined, problem: string | undefined) => ({
  id,
  'aria-invalid': problem ? true : undefined,
  'aria-describedby': [hint && hintId(id), problem && problemId(id)].filter(Boolean).join(' ') || undefined,
});

/** `must be more than 0` becomes `Area must be more than 0.`, so that it can be read by itself. */
function sentence(label: string, problem: string): string {
  const whole = /^(must|each|choose)/.test(problem) ? (problem.startsWith('must') ? `${label} ${problem}` : problem) : problem;
  return `${whole.charAt(0).toUpperCase()}${whole.slice(1)}${/[.!?]$/.test(whole) ? '' : '.'}`;
}

export function Problem({ id, children }: { id: string; children: ReactNode }) {
  return (
    <p id={id} data-problem className="mt-1 font-semibold text-rose-deep">
      {children}
    </p>
  );
}

function Frame({ id, label, hint, problem, required, wide = false, children }: FrameProps) {
  const t = useT();
  return (
    <div data-field className={wide ? 'col-span-full' : ''}>
      <label htmlFor={id} className="block font-semibold">
        {label}
        {!required && <span className="font-normal text-ink-soft"> ({t('form.optional')})</span>}
      </label>
      {children}
      {hint && (
        <p id={hintId(id)} className="mt-1 text-sm text-ink-soft">
          {hint}
        </p>
      )}
      {problem && <Problem id={problemId(id)}>{sentence(label, problem)}</Problem>}
    </div>
  );
}

export function TextField({ registration, problem, label, hint, required, type = 'text', autoComplete }: FieldProps & { type?: HTMLInputTypeAttribute; autoComplete?: string }) {
  const id = useId();
  return (
    <Frame {...{ id, label, hint, problem, required }}>
      <input type={type} className={inputLook} autoComplete={autoComplete} required={required} {...described(id, hint, problem)} {...registration} />
    </Frame>
  );
}

/** A number with its unit beside it; a phone shows the figures of its keyboard. `unit` overrides the one of the quantity. */
export function NumberField({ registration, problem, label, hint, required, unit }: FieldProps) {
  const id = useId();
  return (
    <Frame {...{ id, label, hint, problem, required }}>
      <span className="flex items-center gap-2">
        <input
          type="text"
          inputMode="decimal"
          autoComplete="off"
          className={`${inputLook} max-w-40`}
          required={required}
          {...described(id, hint, problem)}
          {...(unit ? { 'aria-label': `${label}, ${unit}` } : {})}
          {...registration}
        />
        <span aria-hidden="true" className="text-ink-soft">
          {unit}
        </span>
      </span>
    </Frame>
  );
}

export function NotesField({ registration, problem, label, hint, required }: FieldProps) {
  const id = useId();
  return (
    <Frame {...{ id, label, hint, problem, required }} wide>
      <textarea rows={3} className={`${inputLook} py-2`} {...described(id, hint, problem)} {...registration} />
    </Frame>
  );
}

type Choices = [value: string, words: string][];

export function ChoiceField({ registration, problem, label, hint, choices }: FieldProps & { choices: Choices }) {
  const id = useId();
  return (
    <Frame {...{ id, label, hint, problem }} required>
      <select className={inputLook} {...described(id, hint, problem)} {...registration}>
        {choices.map(([value, words]) => (
          <option key={value} value={value}>
            {words}
          </option>
        ))}
      </select>
    </Frame>
  );
}

const checkLook = 'size-6 shrink-0 accent-needle';

export function CheckField({ registration, problem, label, hint }: FieldProps) {
  const id = useId();
  return (
    <div data-field className="col-span-full">
      <label className="flex min-h-touch items-center gap-3">
        <input type="checkbox" className={checkLook} {...described(id, hint, problem)} {...registration} />
        <span className="font-semibold">{label}</span>
      </label>
      {hint && (
        <p id={hintId(id)} className="text-sm text-ink-soft">
          {hint}
        </p>
      )}
      {problem && <Problem id={problemId(id)}>{sentence(label, problem)}</Problem>}
    </div>
  );
}

/** Several of a list, as boxes to tick. */
export function CheckGroup({ registration, problem, label, hint, choices }: FieldProps & { choices: Choices }) {
  const id = useId();
  return (
    <fieldset data-field className="col-span-full" aria-describedby={problem ? problemId(id) : undefined}>
      <legend className="font-semibold">{label}</legend>
      {hint && <p className="text-sm text-ink-soft">{hint}</p>}
      <div className="flex flex-wrap gap-x-6">
        {choices.map(([value, words]) => (
          <label key={value} className="inline-flex min-h-touch items-center gap-3">
            <input type="checkbox" value={value} className={checkLook} aria-invalid={problem ? true : undefined} {...registration} />
            {words}
          </label>
        ))}
      </div>
      {problem && <Problem id={problemId(id)}>{sentence(label, problem)}</Problem>}
    </fieldset>
  );
}
