/** Values per slab: some 30 morning columns. */
const slabLength = 4096;
let slab = new Float64Array(slabLength);
let used = 0;

/**
 * A zeroed column of numbers, cut from a larger slab: a column of its own would cost a system allocation each, and an assessment
 * makes dozens. Slabs are never handed out twice.
 */
export function column(length: number): Float64Array {
  if (length > slabLength / 4) return new Float64Array(length);
  if (used + length > slabLength) {
    slab = new Float64Array(slabLength);
    used = 0;
  }
  const view = slab.subarray(used, used + length);
  used += length;
  return view;
}

let byteSlab = new Uint8Array(slabLength);
let bytesUsed = 0;

/** A zeroed column of small whole numbers (0–255), cut from a slab as `column` does. */
export function byteColumn(length: number): Uint8Array {
  if (length > slabLength / 4) return new Uint8Array(length);
  if (bytesUsed + length > slabLength) {
    byteSlab = new Uint8Array(slabLength);
    bytesUsed = 0;
  }
  const view = byteSlab.subarray(bytesUsed, bytesUsed + length);
  bytesUsed += length;
  return view;
}

/** A new column made value by value; plain loops outrun typed-array `map` several times over. */
export function mapColumn(values: Float64Array, change: (value: number) => number): Float64Array {
  const changed = column(values.length);
  for (let index = 0; index < values.length; index += 1) changed[index] = change(values[index]!);
  return changed;
}
