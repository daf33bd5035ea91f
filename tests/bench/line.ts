/** One figure of a benchmark. */
export interface BenchLine {
  name: string;
  value: number;
  unit: string;
  /** What was measured beside it in the same run. */
  baseline?: { name: string; value: number };
  /** `value` against the baseline, the way round that the goal is stated. */
  ratio?: number;
  /** The goal in words. */
  goal?: string;
  /** Whether the goal was met in this run. */
  met?: boolean;
}
