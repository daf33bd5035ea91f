/** Pairs of value and words for a list of choices. */
export const choices = <K extends string>(words: Record<K, string>): [K, string][] => Object.entries(words) as [K, string][];
