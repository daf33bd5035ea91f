import type { BeeKind } from '../assessment/case.ts';

/** Where one condition lets a kind begin (activity 0) and no longer holds it back (activity 1). */
export type Ramp = readonly [none: number, full: number];

export interface BeeThresholds {
  /** Air temperature, °C. */
  temperatureC: Ramp;
  /** Solar radiation, W/m²; null where no threshold is published: then the sun's altitude serves. */
  radiationWm2: Ramp | null;
  /** Sun's altitude, degrees, where radiation has no threshold. */
  sunAltitudeDeg: Ramp;
  /** Wind near flower height, m/s, falling; null where none is published. */
  windMs: Ramp | null;
  /** An hour with at least this much rain keeps the kind at home, mm; a wetter-looking hour may still be dry in part. */
  rainMm: number;
  sources: readonly string[];
}

/**
 * Published thresholds, the cautious end wherever sources disagree (bees taken to fly sooner and longer).
 * - Honey bee: sources give 12–14 °C for full activity [vicensBosch2000], "typically no search below 12 °C" [burrillDietz1981],
 *   about 13 °C [naturalistNote], 55 °F on labels [epa2013bees]; we begin at 10 °C. About 300 W/m² for full activity
 *   [vicensBosch2000] against a rise up to 460 W/m² [burrillDietz1981]; we take 300. Flight ends at 24 km/h by one source and at
 *   24–34 km/h by another [winston1987]; we let it fall from 24 and end at 34.
 * - Bumble bee: from about 10 °C, a weak source [naturalistNote]; we begin 2 °C lower (ours, no source). Less sensitive to weather
 *   than the honey bee [karbassioon2023], with no threshold of light or wind found: it may fly from civil dawn on, in any wind (ours).
 * - Mason bee: full from 10–12 °C and about 200 W/m²; it flew in strong wind and light rain [vicensBosch2000]; from about 12–13 °C
 *   [boschKemp2001]; we begin at 8 and are full at 12 °C.
 * Rain: only "not raining" is published; 1 mm in the hour (honey bee) and 2.5 mm, the upper edge of light rain (from memory:
 * [amsGlossary]), are ours.
 */
export const beeThresholds: Readonly<Record<BeeKind, BeeThresholds>> = {
  honeyBee: { temperatureC: [10, 14], radiationWm2: [0, 300], sunAltitudeDeg: [-6, 0], windMs: [6.7, 9.4], rainMm: 1, sources: ['vicensBosch2000', 'burrillDietz1981', 'winston1987', 'epa2013bees'] },
  bumbleBee: { temperatureC: [8, 12], radiationWm2: null, sunAltitudeDeg: [-6, 0], windMs: null, rainMm: 2.5, sources: ['naturalistNote', 'karbassioon2023'] },
  masonBee: { temperatureC: [8, 12], radiationWm2: [0, 200], sunAltitudeDeg: [-6, 0], windMs: null, rainMm: 2.5, sources: ['vicensBosch2000', 'boschKemp2001'] },
};

/** From this activity on, bees are "possibly flying": the cautious start. */
export const possibleActivity = 0.1;
/** From this activity on, bees are "likely flying": the late edge of the start. */
export const likelyActivity = 0.5;
/** With anything in bloom the weather alone never says "no bees": the least activity then told. */
export const leastActivityInBloom = 0.05;
