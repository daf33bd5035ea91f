/** Droplet size classes that a sprayer may have, fine to coarse; the class is a comparison with reference nozzles, not a size [asabeS572]. */
export const dropletClasses = ['veryFine', 'fine', 'medium', 'coarse'] as const;
export type DropletClass = (typeof dropletClasses)[number];

/** Smallest median diameter that extension tables print for each class, µm [asabeS572, from memory; the tables differ, the small end is taken]. */
export const smallestMedianUm: Readonly<Record<DropletClass, number>> = { veryFine: 61, fine: 106, medium: 177, coarse: 218 };

/** About a tenth of the volume is finer than half the median: common practice, no source. */
export const driftingDropletUm = (dropletClass: DropletClass): number => smallestMedianUm[dropletClass] / 2;
