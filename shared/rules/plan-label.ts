import type { planBody, productBody } from '../api/plans.ts';
import type { z } from 'zod';

type Plan = Pick<z.infer<typeof planBody>, 'products' | 'carrierLHa'>;
type Label = Pick<z.infer<typeof productBody>, 'name' | 'rateMax' | 'carrierMinLHa' | 'carrierMaxLHa'>;

/**
 * Where a plan goes beyond what was entered from its products' labels: a rate above the highest, a carrier volume outside
 * the range. A rate below the lowest is the grower's own affair. The label in hand is the law; this only catches slips.
 * @param labels by product id; a product not among them is not judged
 * @returns problems by path, rates in the label's own unit, volumes in L/ha
 */
export function labelProblems(plan: Plan, labels: ReadonlyMap<string, Label>): { path: string; message: string }[] {
  const problems: { path: string; message: string }[] = [];
  plan.products.forEach(({ productId, rate }, index) => {
    const label = labels.get(productId);
    if (!label) return;
    if (rate > label.rateMax) problems.push({ path: `products.${index}.rate`, message: `must be at most ${label.rateMax}, the highest rate entered from the label of ${label.name}` });
    if (label.carrierMinLHa !== null && plan.carrierLHa < label.carrierMinLHa) problems.push({ path: 'carrierLHa', message: `must be at least ${label.carrierMinLHa} L/ha, as entered from the label of ${label.name}` });
    if (label.carrierMaxLHa !== null && plan.carrierLHa > label.carrierMaxLHa) problems.push({ path: 'carrierLHa', message: `must be at most ${label.carrierMaxLHa} L/ha, as entered from the label of ${label.name}` });
  });
  return problems;
}
