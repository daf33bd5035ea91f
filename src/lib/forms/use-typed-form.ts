import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, type DefaultValues, type FieldErrors, type FieldValues, type Path, type Resolver, type UseFormRegisterReturn } from 'react-hook-form';
import { z } from 'zod';
import { isApiProblem, type FieldProblem } from '../api/problem.ts';
import { useUnits } from '../session/session.ts';
import { plainMessages } from '../../../shared/api/messages.ts';
import { unitsOf, inOwnUnits, type Quantity } from '../quantities.ts';
import { bodyFrom, typedFrom, type NumberFields, type Typed } from './typed.ts';

// The page's content security policy allows no code made at run time, which zod would else try for speed.
z.config({ jitless: true });

/** A field of a form as its input needs it. */
export interface Bound {
  registration: UseFormRegisterReturn;
  problem: string | undefined;
  unit: string;
  numeric: boolean;
}

interface FormSpec<Body extends object> {
  /** The shared schema of the body, in SI. */
  schema: z.ZodType<Body>;
  /** Rules between fields, from the contract. */
  more?: (body: Body) => FieldProblem[];
  numbers: NumberFields;
  /** What is edited, or what a new one starts from, in SI; `null` where a number is still to be typed. */
  stored: Body;
  /** Sends the body; what it throws is shown in the form. */
  save: (body: Body) => Promise<unknown>;
}

const starred = (path: string): string => path.replace(/\.\d+(?=\.|$)/g, '.*');

/** Every message of a (possibly nested) set of errors, in the person's units. */
function withUnits(errors: FieldErrors, say: (message: string, path: string) => string, path = ''): FieldErrors {
  return Object.fromEntries(
    Object.entries(errors).map(([key, error]) => {
      const here = path ? `${path}.${key}` : key;
      if (typeof error !== 'object' || error === null) return [key, error];
      if (typeof error.message === 'string') return [key, { ...error, message: say(error.message, here) }];
      return [key, Array.isArray(error) ? error.map((item: unknown, index) => (item ? withUnits(item as FieldErrors, say, `${here}.${index}`) : item)) : withUnits(error as FieldErrors, say, here)];
    }),
  ) as FieldErrors;
}

/**
 * A form over a shared schema: numbers are typed in the person's units and sent in SI, problems of the schema and of
 * the server stand beside their fields, and what was typed stays whatever happens.
 */
export function useTypedForm<Body extends object>({ schema, more, numbers, stored, save }: FormSpec<Body>) {
  type Values = Typed<Body> & FieldValues;
  const units = useUnits();
  const [formProblem, setFormProblem] = useState<string | null>(null);
  // The form compares with what it opened on, even when the stored thing is fetched anew meanwhile.
  const [opened] = useState(stored);

  const say = (message: string, path: string) => inOwnUnits(message, units, (numbers as Record<string, Quantity>)[starred(path)]);
  const judged = z.preprocess((typed) => bodyFrom<Body>(typed as Typed<Body>, numbers, units, opened), schema).superRefine((body, context) => {
    for (const { path, message } of more?.(body) ?? []) context.addIssue({ code: 'custom', path: path.split('.'), message });
  });
  const bySchema = zodResolver(judged as unknown as z.ZodType<FieldValues, FieldValues>, { error: plainMessages }) as unknown as Resolver<Values, unknown, Body>;
  const resolver: Resolver<Values, unknown, Body> = async (...given) => {
    const result = await bySchema(...given);
    return { ...result, errors: withUnits(result.errors, say) } as typeof result;
  };

  // Judged when it is sent, then at each change: a problem that shows on leaving a field would move the button from under the finger.
  const form = useForm<Values, unknown, Body>({ resolver, defaultValues: typedFrom(opened, numbers, units) as DefaultValues<Values>, mode: 'onSubmit', shouldFocusError: false });

  /** Puts each problem beside its field; what has no field here is told above the form. */
  function place(problems: readonly FieldProblem[]): string[] {
    const homeless: string[] = [];
    problems.forEach(({ path, message }) => {
      const field = path.replace(/^body\./, '');
      const known = field.split('.')[0]! in (opened as Record<string, unknown>);
      if (known) form.setError(field as Path<Values>, { type: 'server', message: say(message, field) });
      else homeless.push(message);
    });
    return homeless;
  }

  const submit = form.handleSubmit(async (body) => {
    setFormProblem(null);
    try {
      await save(body);
    } catch (error) {
      if (!isApiProblem(error)) throw error;
      const homeless = place(error.problems);
      setFormProblem([error.message, ...homeless].join(' '));
    }
  });

  /** What a field needs: how it registers, the problem beside it, and the unit behind its number. */
  function bind(name: Path<Values>, { emptyIsNull = false }: { emptyIsNull?: boolean } = {}): Bound {
    const quantity = (numbers as Record<string, Quantity>)[starred(name)];
    return { registration: emptyIsNull ? form.register(name, { setValueAs: (value: unknown) => (value === '' ? null : value) as never }) : form.register(name), problem: form.getFieldState(name, form.formState).error?.message, unit: quantity ? unitsOf[quantity][units].name : '', numeric: quantity !== undefined };
  }

  /** Fills fields in for the person, as if typed. */
  function fill(values: Record<string, string>): void {
    for (const [name, value] of Object.entries(values)) form.setValue(name as Path<Values>, value as never, { shouldValidate: true, shouldDirty: true });
  }

  return { form, submit, bind, fill, formProblem, units, busy: form.formState.isSubmitting };
}

export type TypedForm<Body extends object> = ReturnType<typeof useTypedForm<Body>>;
