import type { Site } from '../../assessment/case.ts';

/**
 * What the lie of the land adds on the logit. Cold air gathers in low ground and drains off hills: in one June a creek bottom 12 m
 * below a hill had 22 inverted nights to the hill's 18 and held them two to four hours longer [steckelSimpson]; the sizes are ours.
 */
export const exposureLogit: Readonly<Record<NonNullable<Site['exposure']>, number>> = { open: 0, sheltered: 0.3, valleyFloor: 0.7, hilltop: -0.7 };

/** One look at the air on site: smoke that spreads flat, or two thermometers, against what was said for that hour. */
export interface InversionReading {
  isInverted: boolean;
  /** Likelihood said for that instant without what the site has taught, 0–1. */
  likelihood: number;
}

export interface LearnedSite {
  /** Added to the logit of every hour at this site. */
  logitOffset: number;
  readings: number;
  inverted: number;
  /** How many of the readings were expected to be inverted before learning. */
  expected: number;
  words: string;
}

/**
 * Deviation of the prior on a site's offset. Each reading moves the offset by less than its square, so five move it by less than
 * 1.25: what was held 80 % sure stays on its side of one half.
 */
export const priorDeviation = 0.5;
const leastLikelihood = 0.001;
const logistic = (logit: number): number => 1 / (1 + Math.exp(-logit));

/** A difference between two thermometers as a reading: inverted when the upper one is the warmer. @param differenceC upper less lower, °C */
export const readingOfDifference = (differenceC: number, likelihood: number): InversionReading => ({ isInverted: differenceC > 0, likelihood });

/**
 * What a place's own readings teach: the most probable offset on the logit under a normal prior around 0 (Bayesian logistic
 * regression with one unknown, solved by Newton's method). Readings without a known likelihood are left out.
 */
export function learnSite(readings: readonly InversionReading[]): LearnedSite {
  const usable = readings.filter(({ likelihood }) => likelihood >= 0 && likelihood <= 1);
  const logits = usable.map(({ likelihood }) => {
    const bounded = Math.min(1 - leastLikelihood, Math.max(leastLikelihood, likelihood));
    return Math.log(bounded / (1 - bounded));
  });
  const precision = 1 / priorDeviation ** 2;
  let offset = 0;
  for (let round = 0; round < 30; round += 1) {
    let slope = -precision * offset;
    let curvature = precision;
    for (let index = 0; index < usable.length; index += 1) {
      const chance = logistic(logits[index]! + offset);
      slope += (usable[index]!.isInverted ? 1 : 0) - chance;
      curvature += chance * (1 - chance);
    }
    // Half a unit at most: keeps the first steps from overshooting.
    const step = Math.max(-0.5, Math.min(0.5, slope / curvature));
    offset += step;
    if (Math.abs(step) < 1e-9) break;
  }
  const inverted = usable.filter(({ isInverted }) => isInverted).length;
  const expected = usable.reduce((sum, { likelihood }) => sum + likelihood, 0);
  const learned = { logitOffset: offset, readings: usable.length, inverted, expected };
  return { ...learned, words: siteWords(learned) };
}

/** "Your site so far" in English. */
export function siteWords({ readings: count, inverted, expected, logitOffset: offset }: Omit<LearnedSite, 'words'>): string {
  if (count === 0) return 'your site so far: no readings yet';
  const seen = `your site so far: inverted in ${inverted} of ${count} reading${count === 1 ? '' : 's'}, ${expected.toFixed(1)} expected`;
  if (Math.abs(offset) < 0.15) return `${seen}; the estimate stays as it is`;
  const turn = offset > 0 ? 'raised' : 'lowered';
  return `${seen}; the estimate is ${turn}${count <= 5 ? ' a little, few readings weigh little' : ''}`;
}
