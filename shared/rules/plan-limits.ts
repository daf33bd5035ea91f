import type { z } from 'zod';
import type { planBody, productBody } from '../api/plans.ts';
import { beeKinds, beeStatements, type Limits } from '../assessment/case.ts';
import { windAtHeightMs } from '../atmosphere/wind-profile.ts';

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

/** Height at which the grower's own wind figures are meant: where a person measures (the height of FAO-56's u2). */
export const ownWindHeightM = 2;

interface WindFigure {
  windMs: number;
  heightM: number;
}
const figure = (windMs: number | null, heightM: number): WindFigure[] => (windMs === null ? [] : [{ windMs, heightM }]);
const atOwnHeight = ({ windMs, heightM }: WindFigure): number => windAtHeightMs(windMs, heightM, ownWindHeightM);

/** The figure that lets the least through, compared at one height [fao56, eq. 47]; of equals the first. */
function binding(figures: readonly WindFigure[], stricter: (a: number, b: number) => boolean): WindFigure | undefined {
  return figures.reduce<WindFigure | undefined>((best, next) => (best === undefined || stricter(atOwnHeight(next), atOwnHeight(best)) ? next : best), undefined);
}

/** Wind figures of different heights: the height is the binding greatest wind's (else the binding least wind's), the other figure is brought to it. */
function windLimits(greatestWinds: readonly WindFigure[], leastWinds: readonly WindFigure[]): Pick<Limits, 'windMaxMs' | 'windMinMs'> & { windHeightM: number } {
  const max = binding(greatestWinds, (a, b) => a < b);
  const min = binding(leastWinds, (a, b) => a > b);
  const windHeightM = max?.heightM ?? min?.heightM ?? ownWindHeightM;
  return { windHeightM, ...(max ? { windMaxMs: max.windMs } : {}), ...(min ? { windMinMs: windAtHeightMs(min.windMs, min.heightM, windHeightM) } : {}) };
}

/**
 * The limits of a plan: for each condition the strictest of its products' labels and the grower's own.
 * The label in hand is the law; this only carries what was entered from it.
 * @returns m/s, °C, hours, mm, %; wind figures at `windHeightM`, gusts as forecast; what nobody limits is left out and not judged
 */
export function limitsOfPlan(plan: Plan, labels: readonly Label[]): Limits {
  const strictest = beeStatements[Math.max(0, ...labels.map((label) => beeStatements.indexOf(label.beeStatement)))]!;
  const prohibited = labels.some((label) => label.inversionProhibited) ? inversionProhibitedMax : null;
  return given({
    ...windLimits(
      [...labels.flatMap((label) => figure(label.windMaxMs, label.windHeightM)), ...figure(plan.windMaxMs, ownWindHeightM)],
      [...labels.flatMap((label) => figure(label.windMinMs, label.windHeightM)), ...figure(plan.windMinMs, ownWindHeightM)],
    ),
    gustMaxMs: least([plan.gustMaxMs, ...labels.map((label) => label.gustMaxMs)]),
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

/**
 * Limits for a morning that no plan covers, not from any label: wind of 3–10 mph (the range that extension advice and several
 * labels give, Univ. of Tennessee herbicide stewardship among them), here at 2 m; no likely inversion; the rest common practice, no source.
 */
export const usualLimits: Limits = {
  windMaxMs: 4.4704,
  windMinMs: 1.34112,
  windHeightM: ownWindHeightM,
  inversionMax: inversionProhibitedMax,
  rainFreeHours: 4,
  rainMm: 0.2,
  rainProbabilityPct: 40,
  pollinators: { kinds: [...beeKinds], bloom: false, beeStatement: 'none' },
  temperatureMinC: 4,
  temperatureMaxC: 30,
};
