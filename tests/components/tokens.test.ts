import { describe, expect, it } from 'vitest';
import { skyColour } from '../../shared/look/sky.ts';
import { themes, type TokenName } from '../../src/app/tokens.ts';

/** Relative luminance of `#rrggbb` [WCAG 2.2, definition of relative luminance]. */
function luminance(colour: string): number {
  const [red, green, blue] = [1, 3, 5].map((at) => {
    const share = Number.parseInt(colour.slice(at, at + 2), 16) / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** Contrast ratio, 1 to 21 [WCAG 2.2, definition of contrast ratio]. */
function contrast(one: string, two: string): number {
  const [light, dark] = [luminance(one), luminance(two)].toSorted((first, second) => second - first) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

/** Words on their ground: at least 4.5 [WCAG 2.2 §1.4.3]. */
const words: [TokenName, TokenName][] = [
  ...(['paper', 'paper-raised', 'paper-sunk'] as const).flatMap((ground): [TokenName, TokenName][] => [
    ['ink', ground],
    ['ink-soft', ground],
    ['rose-deep', ground],
    ['needle', ground],
  ]),
  ['paper', 'ink'],
  ['needle-on', 'needle'],
  ['needle-on', 'needle-deep'],
  ['ink', 'rose-pale'],
  ['ink', 'straw-pale'],
  ['sky-ink', 'straw'],
  ['sky-light', 'night'],
];

/** Forms that must be told from what they lie on: at least 3 [WCAG 2.2 §1.4.11]. */
const forms: [TokenName, TokenName][] = [
  ['dusk', 'paper'],
  ['dusk', 'dusk-pale'],
  ['dusk', 'straw-pale'],
  ['ink', 'dusk-pale'],
  ['ink', 'straw-pale'],
  ['needle', 'straw-pale'],
  ['ink-soft', 'paper'],
  ['sky-ink', 'straw'],
];

describe.each(['light', 'dark'] as const)('the colours of the %s theme', (theme) => {
  const colours = themes[theme];

  it.each(words)('let %s be read on %s', (front, ground) => {
    expect(contrast(colours[front], colours[ground])).toBeGreaterThanOrEqual(4.5);
  });

  it.each(forms)('set %s apart from %s', (form, ground) => {
    expect(contrast(colours[form], colours[ground])).toBeGreaterThanOrEqual(3);
  });

  it('keep words readable on the sky from sunrise on', () => {
    for (let altitudeDeg = -0.833; altitudeDeg < 60; altitudeDeg += 0.25) expect(contrast(colours['sky-ink'], skyColour(altitudeDeg))).toBeGreaterThanOrEqual(4.5);
  });
});

describe('the sky', () => {
  it('grows lighter as the sun climbs, so that it reads in grey', () => {
    const altitudes = Array.from({ length: 50 }, (_, index) => index - 12);
    const lights = altitudes.map((altitudeDeg) => luminance(skyColour(altitudeDeg)));
    expect(lights).toEqual(lights.toSorted((one, two) => one - two));
  });
});

describe('the measure of contrast', () => {
  it('agrees with the ends of the scale: black on white is 21, a colour on itself 1', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 5);
    expect(contrast('#777777', '#777777')).toBe(1);
  });

  it('puts #767676 just over 4.5 on white and #777777 just under, as WebAIM’s checker does (from memory)', () => {
    expect(contrast('#767676', '#ffffff')).toBeGreaterThan(4.5);
    expect(contrast('#777777', '#ffffff')).toBeLessThan(4.5);
  });
});
