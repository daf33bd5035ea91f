/** Least and greatest input for which a formula was made, both included; the unit is in the input's name. */
export type Validity = Readonly<Record<string, readonly [min: number, max: number]>>;

/**
 * Says why a formula answers "unknown" (NaN) for these inputs.
 *
 * Formulas in `shared/` are bare-number functions, so that thousands run in a millisecond; beside each stands its validity.
 * @returns a sentence naming the first input that is missing or outside, or null when all are inside
 */
export function whyUnknown(validity: Validity, inputs: Readonly<Record<string, number | null>>): string | null {
  for (const [name, [min, max]] of Object.entries(validity)) {
    const value = inputs[name];
    if (value === undefined || value === null || Number.isNaN(value)) return `${name} is not known`;
    if (value < min) return `${name} ${value} is below ${min}, where the formula does not hold`;
    if (value > max) return `${name} ${value} is above ${max}, where the formula does not hold`;
  }
  return null;
}

/** True when a bare number lies inside a range; false for NaN. */
export const within = (value: number, [min, max]: readonly [number, number]): boolean => value >= min && value <= max;
