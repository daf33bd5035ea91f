import type { Coefficients } from './coefficients.ts';
import { featureNames, featureRules, outside } from './features.ts';

/**
 * Weighs features. Outside the series the mean of the fit stands in; a gap inside it counts as whatever makes an inversion the
 * likeliest, so that a missing value never opens a morning.
 */
export function logitOf({ base, weights, means }: Pick<Coefficients, 'base' | 'weights' | 'means'>, features: Float64Array): number {
  let logit = base;
  for (let f = 0; f < featureNames.length; f += 1) {
    const weight = weights[f]!;
    const value = features[f]!;
    const { low, high } = rules[f]!;
    logit += weight * (value === outside ? means[f]! : Number.isNaN(value) ? (weight > 0 ? high : low) : value < low ? low : value > high ? high : value);
  }
  return logit;
}

const rules = featureNames.map((name) => featureRules[name]);
