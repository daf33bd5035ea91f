import { z } from 'zod';

/** Facts about one model's newest run; all times are unix seconds. */
export const runSchema = z.object({
  last_run_initialisation_time: z.number(),
  last_run_availability_time: z.number(),
  update_interval_seconds: z.number().positive(),
});
export type ModelRun = z.infer<typeof runSchema> & { model: string };

/** The provider's servers take up a new run one after another; it says to wait ten minutes. */
const settlingMs = 10 * 60_000;

/** The newest start among the runs that the forecast is blended from; null without any. */
export const issuedAtOf = (runs: readonly ModelRun[]): Date | null => (runs.length === 0 ? null : new Date(Math.max(...runs.map((run) => run.last_run_initialisation_time)) * 1000));

/**
 * A token that changes when any run does, kept in the place of an ETag, which this provider does not send.
 * Null while a run is still settling: the same question must then be asked again.
 */
export function tokenOf(runs: readonly ModelRun[], now: Date): string | null {
  if (runs.length === 0 || runs.some((run) => now.getTime() < run.last_run_availability_time * 1000 + settlingMs)) return null;
  return `runs:${runs.map((run) => `${run.model}@${run.last_run_initialisation_time}`).join(',')}`;
}

/** When the next run should have arrived and settled; at least five minutes off, so that a late run is not hunted. */
export function nextRunAt(runs: readonly ModelRun[], now: Date): Date | null {
  if (runs.length === 0) return null;
  const expected = Math.min(
    ...runs.map((run) => {
      const arrivedMs = run.last_run_availability_time * 1000;
      return arrivedMs + settlingMs > now.getTime() ? arrivedMs + settlingMs : arrivedMs + run.update_interval_seconds * 1000 + settlingMs;
    }),
  );
  return new Date(Math.max(expected, now.getTime() + 5 * 60_000));
}
