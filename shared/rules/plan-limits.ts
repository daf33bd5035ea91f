import type { z } from 'zod';
import type { planBody, productBody } from '../api/plans.ts';
import { beeKinds, beeStatements, type Limits } from '../assessment/case.ts';

type Plan = Pick<
  z.infer<typeof planBody>,
  'bloom' | 'beeKinds' | 'windMaxMs' | 'windMinMs' | 'gustMaxMs' | 'inversionMax' | 'rainFreeHours' | 'rainMm' | 'rainProbabilityPct' | 'foliageDry' | 'deltaTMinC' | 'deltaTMaxC' | 'temperatureMinC' | 'temperatureMaxC'
>;
type Label = Pick<
  z.infer<typeof productBody>,
  'windMaxMs' | 'windMinMs' | 'windHeightM' | 'gustMaxMs' | 'inversionProhibited' | 'rainFreeHours' | 'temperatureMinC' | 'temperatureMaxC' | 'beeStatement'
>;

/** A label that forbids spraying in an inversion holds where one is as likely as not. Common practice, no source. */
export const inversionProhibitedMax = 0.5;
/** Minutes of a usual job, for mornings that no plan covers. Common practice, no source. */
export const usualMinutesNeeded = 30;

const known = (values: readonly (number | null)[]): number[] => values.filter((value) => value !== null);
const least = (values: readonly (number | null)[]): number | undefined => (known(values).length ? Math.min(...known(values)) : undefined);
const greatest = (values: readonly (number | null)[]): number | undefined => (known(values).length ? Math.max(...known(values)) : undefined);

/** Leaves out what is not limited, so that it is not judged. */
function given<T extends object>(limits: T): { [K in keyof T]: Exclude<T[K], undefined> } {
  return Object.fromEntries(Object.entries(limits).filter(([, value]) => value !== undefined)) as { [K in keyof T]: Exclude<T[K], undefined> };
}

/**
 * The limits of a plan: for each condition the strictest of its products' labels and the grower's own.
 * Wind figures are taken at the greatest height that a label with a wind figure names: wind grows with height, so a figure meant
 * lower down is then only held more strictly. The label in hand is the law; this only carries what was entered from it.
 */
export function limitsOfPlan(plan: Plan, labels: readonly Label[]): Limits {
  const strictest = beeStatements[Math.max(0, ...labels.map((label) => beeStatements.indexOf(label.beeStatement)))]!;
  const prohibited = labels.some((label) => label.inversionProhibited) ? inversionProhibitedMax : null;
  const windLabels = labels.filter((label) => label.windMaxMs !== null || label.windMinMs !== null || label.gustMaxMs !== null);
  return given({
    windMaxMs: least([plan.windMaxMs, ...labels.map((label) => label.windMaxMs)]),
    windMinMs: greatest([plan.windMinMs, ...labels.map((label) => label.windMinMs)]),
    gustMaxMs: least([plan.gustMaxMs, ...labels.map((label) => label.gustMaxMs)]),
    windHeightM: greatest(windLabels.map((label) => label.windHeightM)) ?? 2,
    inversionMax: least([plan.inversionMax, prohibited]),
    rainFreeHours: greatest([plan.rainFreeHours, ...labels.map((label) => label.rainFreeHours)]),
    rainMm: plan.rainMm,
    rainProbabilityPct: plan.rainProbabilityPct,
    foliageDry: plan.foliageDry ? true : undefined,
    pollinators: { kinds: [...plan.beeKinds], bloom: plan.bloom, beeStatement: strictest },
    temperatureMinC: greatest([plan.temperatureMinC, ...labels.map((label) => label.temperatureMinC)]),
    temperatureMaxC: least([plan.temperatureMaxC, ...labels.map((label) => label.temperatureMaxC)]),
    deltaTMinC: plan.deltaTMinC ?? undefined,
    deltaTMaxC: plan.deltaTMaxC ?? undefined,
  });
}

/** Limits for a morning that no plan covers: 10 mph at 2 m, some air moving, no inversion, four dry hours. Common practice, no source. */
export const usualLimits: Limits = {
  windMaxMs: 4.4704,
  windMinMs: 0.67056,
  windHeightM: 2,
  inversionMax: inversionProhibitedMax,
  rainFreeHours: 4,
  rainMm: 0.2,
  rainProbabilityPct: 40,
  pollinators: { kinds: [...beeKinds], bloom: false, beeStatement: 'none' },
  temperatureMinC: 4,
  temperatureMaxC: 30,
};
