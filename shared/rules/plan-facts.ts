import type { z } from 'zod';
import type { MeasureUnit } from '../tank/measures.ts';
import type { planBody, productBody, RateUnit } from '../api/plans.ts';
import type { placeKinds } from '../api/farms.ts';

/** A rate range that a label gives for one crop, and maybe one target, instead of the general one. */
export interface LabelUse {
  crop: string;
  /** Empty where it holds for every target. */
  target: string;
  rateMin: number;
  rateMax: number;
}

/** What the user copied from a product's label, with what the shelf knows of it. Figures that nobody entered are null. */
export type LabelEntries = Pick<
  z.infer<typeof productBody>,
  | 'name'
  | 'epaRegistrationNumber'
  | 'moaSystem'
  | 'moaGroup'
  | 'rateMin'
  | 'rateMax'
  | 'rateUnit'
  | 'carrierMinLHa'
  | 'carrierMaxLHa'
  | 'adjuvantWanted'
  | 'adjuvantForbidden'
  | 'beeStatement'
  | 'reiHours'
  | 'phiDays'
  | 'maxApplicationsPerSeason'
  | 'maxRatePerSeason'
  | 'minIntervalDays'
  | 'restrictedUse'
> & {
  /** Left out: the general range holds for every crop. */
  uses?: readonly LabelUse[];
  bufferWaterM?: number | null;
  bufferHivesM?: number | null;
  isExample: boolean;
  hasLabelFile: boolean;
  /** Null: no stock is kept. */
  stock: { amount: number; unit: MeasureUnit } | null;
};

/** A place that wants care, by its distance from the nearest edge of the block. */
export interface NearPlace {
  name: string;
  kind: (typeof placeKinds)[number];
  distanceM: number;
}

export interface BlockFacts {
  name: string;
  crop: string;
  areaHa: number;
  /** First day of harvest or sale; null: none set. */
  saleDate: string | null;
  /** People who will be in the block: choose-and-cut days, hired crew. */
  peopleDue: readonly { who: string; date: string }[];
  places: readonly NearPlace[];
}

/** One product of one past application on one block, from its signed record. */
export interface PastApplication {
  blockId: string;
  productId: string;
  productName: string;
  /** Local date of the stop. */
  date: string;
  rate: number;
  rateUnit: RateUnit;
  target: string;
  moaSystem: LabelEntries['moaSystem'];
  moaGroup: string;
}

export interface PlanFacts {
  /** By product id; a product not among them is not judged. */
  labels: ReadonlyMap<string, LabelEntries>;
  /** By block id; a block not among them is not judged. */
  blocks: ReadonlyMap<string, BlockFacts>;
  /** Past applications on the plan's blocks, any order, this season's and earlier ones; not the plan itself. */
  history: readonly PastApplication[];
  /** Inclusive dates between which label maxima per season count. */
  season: { from: string; to: string };
  applicator: { name: string; licenceNumber: string; licenceExpires: string | null };
  /** Radius to keep empty of people, from `exclusionZoneM`. */
  exclusionZoneM: number;
}

export type PlanForRules = Pick<z.infer<typeof planBody>, 'products' | 'carrierLHa' | 'blockIds' | 'firstDate' | 'lastDate' | 'bloom' | 'target'> & {
  adjuvants: readonly { name: string; /** Such as "non-ionic surfactant" or "crop oil". */ kind: string }[];
};

/** Product × its label, block × its facts: only those known. */
export const labelsOf = (plan: PlanForRules, facts: PlanFacts) => plan.products.flatMap(({ productId, rate }, index) => (facts.labels.has(productId) ? [{ productId, rate, path: `products.${index}`, label: facts.labels.get(productId)! }] : []));
export const blocksOf = (plan: PlanForRules, facts: PlanFacts) => plan.blockIds.flatMap((blockId, index) => (facts.blocks.has(blockId) ? [{ blockId, path: `blockIds.${index}`, block: facts.blocks.get(blockId)! }] : []));
