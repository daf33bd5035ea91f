import type { planBody, productBody } from '../api/plans.ts';
import type { z } from 'zod';

type Plan = Pick<z.infer<typeof planBody>, 'products' | 'carrierLHa'>;
type Label = Pick<z.infer<typeof productBody>, 'name' | 'rateMax' | 'carrierMinLHa' | 'carrierMaxLHa'>;

/** One figure of a plan beyond one figure of a label: rates in the label's own unit, volumes in L/ha. */
export interface LabelBreach {
  path: string;
  figure: 'rateMax' | 'carrierMinLHa' | 'carrierMaxLHa';
  productName: string;
  planned: number;
  allowed: number;
}

/**
 * Where a plan goes beyond what was entered from its products' labels: a rate above the highest, a carrier volume outside
 * the range. A rate below the lowest is the grower's own affair. The label in hand is the law; this only catches slips.
 * @param labels by product id; a product not among them is not judged
 */
export function labelBreaches(plan: Plan, labels: ReadonlyMap<string, Label>): LabelBreach[] {
  const breaches: LabelBreach[] = [];
  plan.products.forEach(({ productId, rate }, index) => {
    const label = labels.get(productId);
    if (!label) return;
    const breach = (path: string, figure: LabelBreach['figure'], planned: number, allowed: number) => breaches.push({ path, figure, productName: label.name, planned, allowed });
    if (rate > label.rateMax) breach(`products.${index}.rate`, 'rateMax', rate, label.rateMax);
    if (label.carrierMinLHa !== null && plan.carrierLHa < label.carrierMinLHa) breach('carrierLHa', 'carrierMinLHa', plan.carrierLHa, label.carrierMinLHa);
    if (label.carrierMaxLHa !== null && plan.carrierLHa > label.carrierMaxLHa) breach('carrierLHa', 'carrierMaxLHa', plan.carrierLHa, label.carrierMaxLHa);
  });
  return breaches;
}

const messages: Record<LabelBreach['figure'], (breach: LabelBreach) => string> = {
  rateMax: ({ allowed, productName }) => `must be at most ${allowed}, the highest rate entered from the label of ${productName}`,
  carrierMinLHa: ({ allowed, productName }) => `must be at least ${allowed} L/ha, as entered from the label of ${productName}`,
  carrierMaxLHa: ({ allowed, productName }) => `must be at most ${allowed} L/ha, as entered from the label of ${productName}`,
};

/** The same as problems of a form, by path. @param labels by product id; a product not among them is not judged */
export function labelProblems(plan: Plan, labels: ReadonlyMap<string, Label>): { path: string; message: string }[] {
  return labelBreaches(plan, labels).map((breach) => ({ path: breach.path, message: messages[breach.figure](breach) }));
}
