/** Seeded noise with random access: the same seed, stream and position give the same value, in any order of asking. */

/** Mixes two 32-bit numbers into one (multiply and xorshift rounds). */
function mix(a: number, b: number): number {
  let h = Math.imul(a ^ (a >>> 16), 0x7feb352d) ^ Math.imul(b + 0x9e3779b9, 0x846ca68b);
  h = Math.imul(h ^ (h >>> 15), 0x2c1b3c6d);
  h = Math.imul(h ^ (h >>> 12), 0x297a2d39);
  return (h ^ (h >>> 15)) >>> 0;
}

/** Turns a name into the key of a stream of its own. */
export function stream(seed: number, name: string): number {
  let key = seed >>> 0;
  for (const character of name) key = mix(key, character.codePointAt(0) ?? 0);
  return key;
}

/** Uniform in [0, 1) at an integer position. */
export const uniform = (key: number, index: number): number => mix(mix(key, index | 0), Math.floor(index / 4_294_967_296)) / 4_294_967_296;

/** Standard normal at an integer position (Box and Muller). */
export const normal = (key: number, index: number): number => Math.sqrt(-2 * Math.log(1 - uniform(key, index))) * Math.cos(2 * Math.PI * uniform(key ^ 0x5bd1e995, index));

const ease = (x: number): number => x * x * (3 - 2 * x);

/** Smooth noise along a line, about standard normal; it forgets itself over one unit of `x`. */
export function drift(key: number, x: number): number {
  const cell = Math.floor(x);
  const w = ease(x - cell);
  return (normal(key, cell) * (1 - w) + normal(key, cell + 1) * w) / Math.hypot(w, 1 - w);
}

/** Smooth noise over a plane, about standard normal: for errors that hang on the valid time and on the time of issue. */
export function drift2(key: number, x: number, y: number): number {
  const row = Math.floor(y);
  const w = ease(y - row);
  return (drift(mix(key, row), x) * (1 - w) + drift(mix(key, row + 1), x) * w) / Math.hypot(w, 1 - w);
}

/** 0 below `from`, 1 above `to`, smooth between. */
export function rise(from: number, to: number, x: number): number {
  return ease(Math.min(1, Math.max(0, (x - from) / (to - from))));
}
