/** Longer than any of these answers takes on an idle machine. */
const floorMs = 250;

/**
 * Does work whose duration would tell whether an address is known, and answers no sooner than a fixed time after the start.
 * @returns what the work returns
 */
export async function inEvenTime<T>(work: Promise<T>): Promise<T> {
  const [result] = await Promise.all([work, new Promise((resolve) => setTimeout(resolve, floorMs))]);
  return result;
}
