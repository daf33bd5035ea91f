import { drift2, normal, stream } from './noise.ts';

/** How the weather is seen: as it truly comes, or through a forecast whose error grows with the lead time. */
export interface View {
  /** Error of a quantity at a valid time, in its own unit; 0 in truth. */
  error(quantity: ErrorQuantity, atMs: number): number;
  /** Hours by which a front is seen too late. */
  frontShiftH(front: number, atMs: number): number;
  /** Standard deviation of that shift, hours: what the forecaster knows of their own doubt. */
  frontDoubtH(atMs: number): number;
  rainFactor(front: number, atMs: number): number;
  /** 1 where single showers are seen as they come, towards 0 where only their chance is known. */
  showerKnowledge(atMs: number): number;
}

/**
 * Standard deviation of each error as start + growth per hour of lead, up to a cap. They are chosen so that the 10 m wind
 * is off by about 1 m/s on the mean at half a day and more later, as regional models are (MEPS pairs of February 2019:
 * mean absolute error 1.11 m/s at 12 h, 1.48 at 48 h); the rest is common practice, no source.
 */
const spreads = {
  gradientWindMs: [0.9, 0.04, 4.5],
  /** What a grid cell cannot know of one spot. */
  localWindMs: [0.55, 0.008, 1.2],
  couplingFraction: [0.025, 0.0008, 0.08],
  temperatureC: [0.5, 0.016, 3],
  dewPointC: [0.5, 0.014, 3],
  cloudFraction: [0.06, 0.004, 0.4],
  bearingDeg: [8, 0.45, 80],
  onsetH: [0.2, 0.01, 1.2],
  inversionC: [0.3, 0.012, 1.5],
  frontH: [0.4, 0.07, 5],
  rainLog: [0.15, 0.006, 0.8],
} as const satisfies Record<string, readonly [number, number, number]>;
export type ErrorQuantity = Exclude<keyof typeof spreads, 'frontH' | 'rainLog'>;

const hourMs = 3_600_000;

export const truth: View = { error: () => 0, frontShiftH: () => 0, frontDoubtH: () => 0, rainFactor: () => 1, showerKnowledge: () => 1 };

/**
 * The view of one issue. Errors of issues that follow on one another are alike and shrink as the hour comes near.
 * @param source distinguishes providers and members: each errs in its own way
 */
export function issueView(seed: number, source: string, issueMs: number): View {
  const leadH = (atMs: number): number => Math.max(0, (atMs - issueMs) / hourMs);
  const spread = (name: keyof typeof spreads, atMs: number): number => {
    const [start, growth, cap] = spreads[name];
    return Math.min(cap, start + growth * leadH(atMs));
  };
  const keys = Object.fromEntries(Object.keys(spreads).map((name) => [name, stream(seed, `${source}/${name}`)])) as Record<keyof typeof spreads, number>;
  const issueH = issueMs / hourMs;
  return {
    error: (quantity, atMs) => spread(quantity, atMs) * drift2(keys[quantity], atMs / hourMs / 7, issueH / 15),
    frontShiftH: (front, atMs) => spread('frontH', atMs) * drift2(keys.frontH ^ front, 0, issueH / 15),
    frontDoubtH: (atMs) => spread('frontH', atMs),
    rainFactor: (front, atMs) => Math.exp(spread('rainLog', atMs) * normal(keys.rainLog, front)),
    showerKnowledge: (atMs) => Math.exp(-leadH(atMs) / 5),
  };
}
