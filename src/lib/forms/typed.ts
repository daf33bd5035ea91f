import type { UnitSystem } from '../../../shared/units/units.ts';
import { asTyped, unitsOf, readNumber, type Quantity } from '../quantities.ts';

/** A body as a person types it: every number is text, in the person's own unit. */
export type Typed<T> = [T] extends [number | null] ? string : T extends readonly (infer Item)[] ? Typed<Item>[] : T extends object ? { [K in keyof T]: Typed<T[K]> } : T;

/** Which paths hold numbers, and of what; `*` stands for any place in a list (`products.*.rate`). */
export type NumberFields = Readonly<Record<string, Quantity>>;

type Json = unknown;

function walk(value: Json, path: string[], numbers: NumberFields, change: (value: Json, quantity: Quantity, path: string) => Json): Json {
  const quantity = numbers[path.map((part) => (/^\d+$/.test(part) ? '*' : part)).join('.')];
  if (quantity) return change(value, quantity, path.join('.'));
  if (Array.isArray(value)) return value.map((item, index) => walk(item, [...path, String(index)], numbers, change));
  if (typeof value === 'object' && value !== null) return Object.fromEntries(Object.entries(value).map(([key, item]) => [key, walk(item, [...path, key], numbers, change)]));
  return value;
}

const at = (value: Json, path: string): Json => path.split('.').reduce<Json>((inside, part) => (typeof inside === 'object' && inside !== null ? (inside as Record<string, Json>)[part] : undefined), value);

/** A stored number as it stands in the form. */
function shown(value: number, quantity: Quantity, units: UnitSystem): string {
  const { fromSi, decimals } = unitsOf[quantity][units];
  return asTyped(fromSi(value), decimals);
}

/** A stored body as text to edit. */
export function typedFrom<T>(body: T, numbers: NumberFields, units: UnitSystem): Typed<T> {
  return walk(body, [], numbers, (value, quantity) => (typeof value === 'number' ? shown(value, quantity, units) : '')) as Typed<T>;
}

/**
 * What was typed as a body in SI, for a schema to judge. Text that is no number stays text, so that the schema names it.
 * A figure left as it was keeps its stored value to the last digit: reading in one unit and saving changes nothing.
 */
export function bodyFrom<T>(typed: Typed<T>, numbers: NumberFields, units: UnitSystem, stored: T | undefined): unknown {
  return walk(typed, [], numbers, (text, quantity, path) => {
    const before = at(stored, path);
    const { toSi } = unitsOf[quantity][units];
    if (typeof before === 'number' && text === shown(before, quantity, units)) return before;
    const value = readNumber(String(text ?? ''), units);
    if (value === null) return null;
    return Number.isNaN(value) ? String(text) : toSi(value);
  });
}
