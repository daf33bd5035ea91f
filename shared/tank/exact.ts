import Fraction from 'fraction.js';

/** A rational number, numerator and denominator as BigInt: sums of tanks equal their totals to the last drop. */
export type Exact = Fraction;

/** Decimals that a double keeps for sure: what lies behind them is the noise of a unit conversion (3 gal = 11.356235351999999 L). */
const keptDigits = 15;

/**
 * The number a person typed, exactly: 0.1 is one tenth, not the nearest double to it.
 * @param name of the value, for the error @throws RangeError when it is not a finite number
 */
export function exactly(value: number, name = 'value'): Exact {
  if (!Number.isFinite(value)) throw new RangeError(`${name} must be a number, not ${value}.`);
  const [mantissa = '0', exponent = '0'] = String(Number(value.toPrecision(keptDigits))).split('e');
  const [whole = '0', decimals = ''] = mantissa.split('.');
  const power = Number(exponent) - decimals.length;
  const digits = BigInt(`${whole}${decimals}`);
  return power >= 0 ? new Fraction(digits * 10n ** BigInt(power), 1n) : new Fraction(digits, 10n ** BigInt(-power));
}

export const zero: Exact = new Fraction(0n, 1n);

/** @throws RangeError naming the value when it is not above 0 */
export function exactlyPositive(value: number, name: string): Exact {
  if (!(value > 0)) throw new RangeError(`${name} must be more than 0, not ${value}.`);
  return exactly(value, name);
}

/** @throws RangeError naming the value when it is below 0 */
export function exactlyNotNegative(value: number, name: string): Exact {
  if (!(value >= 0)) throw new RangeError(`${name} must not be negative, not ${value}.`);
  return exactly(value, name);
}

export const sumOf = (values: readonly Exact[]): Exact => values.reduce((sum, value) => sum.add(value), zero);

/** To the nearest whole number of steps, a half upwards. */
export const toStep = (value: Exact, step: Exact): Exact => value.div(step).add(new Fraction(1n, 2n)).floor().mul(step);

/** `n/d` in lowest terms, for JSON; read back by `fromText`. */
export const toText = (value: Exact): string => value.toFraction();
/** @throws when the text is not a fraction such as 3/4 */
export const fromText = (text: string): Exact => new Fraction(text);
