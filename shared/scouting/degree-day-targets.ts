import type { SourceKey } from '../bibliography.ts';
import { fahrenheitSpanToC, fahrenheitToC } from '../units/units.ts';

/** When to look for a target, in degree days. The grower edits all of it. */
export interface DegreeDayTarget {
  target: string;
  event: string;
  baseC: number;
  /** Horizontal upper cutoff; null: none. */
  upperC: number | null;
  /** Degree days in °C from the start date. */
  fromDegreeDaysC: number;
  toDegreeDaysC: number;
  /** `MM-DD` from which the sum counts; null: the source's was not found, and one must be chosen. */
  startsOn: string | null;
  source: string;
}

export interface ExampleTarget extends DegreeDayTarget {
  cite: SourceKey;
}

/** Base of every example: 50 °F. */
export const exampleBaseC = fahrenheitToC(50);

const example = (target: string, event: string, fromF: number, toF: number, source: string, cite: SourceKey): ExampleTarget => ({
  target,
  event,
  baseC: exampleBaseC,
  upperC: null,
  fromDegreeDaysC: fahrenheitSpanToC(fromF),
  toDegreeDaysC: fahrenheitSpanToC(toF),
  startsOn: null,
  source,
  cite,
});

/**
 * Examples to edit, at base 50 °F as published. Start dates differ between guides and ranges conflict, so these are ranges to go and
 * look in, never a day to treat on. What was not found stands in none: Douglas-fir needle midge (use traps), Cinara aphids.
 */
export const exampleTargets: readonly ExampleTarget[] = [
  example('balsam twig aphid', 'egg hatch', 30, 100, 'Cornell IPM 2019-20', 'cornellGdd'),
  example('balsam twig aphid', 'stem mothers, treatment window', 100, 150, 'Michigan State, 13 May 2024', 'msuTrees2024'),
  example('spruce spider mite', 'egg hatch', 50, 121, 'Cornell IPM 2019-20', 'cornellGdd'),
  example('spruce spider mite', 'autumn', 2375, 2806, 'Cornell IPM 2019', 'cornellGdd'),
  example('Cooley spruce gall adelgid', 'foliar spring window', 25, 120, 'Michigan State model report 2015', 'msuCooley2015'),
  example('Cooley spruce gall adelgid', 'autumn, on spruce', 1850, 1950, 'Cornell IPM 2019; other guides say later', 'cornellGdd'),
  example('Cooley spruce gall adelgid', 'autumn, on Douglas-fir', 1500, 1775, 'Cornell IPM 2019; other guides say later', 'cornellGdd'),
  example('eastern spruce gall adelgid', 'stem mothers', 22, 170, 'Cornell IPM 2020', 'cornellGdd'),
  example('white pine weevil', 'adults', 7, 58, 'Penn State; Cornell IPM', 'pennStateTrees'),
  example('European pine sawfly', 'egg hatch', 35, 135, 'Rutgers', 'rutgersGdd'),
  example('pine needle scale', 'second generation', 1290, 1917, 'Cornell IPM', 'cornellGdd'),
];
