import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { signGeometry, signSize, stateOf, verdictSignSvg, type VerdictState } from '../../shared/look/verdict-sign.ts';
import { VerdictSign } from '../../src/components/index.ts';

const states: VerdictState[] = ['go', 'hold', 'unknown'];
const sizesPx = [24, 32, 48, 96, 192, 600];

/** Lowest and highest edge of the disc, its rim counted. */
function edges(state: VerdictState, sizePx: number) {
  const { disc, rim, skyTo } = signGeometry(state, sizePx);
  return { top: disc.y - disc.radius - rim / 2, bottom: disc.y + disc.radius + rim / 2, skyTo };
}

describe('the disc and the horizon', () => {
  it.each(sizesPx)('stands full on the line for a go, at %i px', (sizePx) => {
    const { top, bottom, skyTo } = edges('go', sizePx);
    expect(bottom).toBeCloseTo(skyTo, 5);
    expect(top).toBeGreaterThanOrEqual(0);
  });

  it.each(sizesPx)('shows only its rim for a hold, at %i px', (sizePx) => {
    const { top, bottom, skyTo } = edges('hold', sizePx);
    const shownPx = ((skyTo - top) * sizePx) / signSize;
    expect(shownPx).toBeGreaterThanOrEqual(3);
    expect((skyTo - top) / (bottom - top)).toBeLessThan(1 / 3);
  });

  it.each(sizesPx)('is an open ring on the line where there is not enough to tell, at %i px', (sizePx) => {
    expect(edges('unknown', sizePx).bottom).toBeCloseTo(edges('unknown', sizePx).skyTo, 5);
    expect(verdictSignSvg('unknown', sizePx)).toContain('fill="none"');
    expect(verdictSignSvg('go', sizePx)).not.toContain('fill="none"');
  });

  it.each(sizesPx)('keeps its lines at least 1 px thick and inside the square, at %i px', (sizePx) => {
    for (const state of states) {
      const { line, rim, horizon } = signGeometry(state, sizePx);
      expect((line * sizePx) / signSize).toBeGreaterThanOrEqual(2);
      expect((rim * sizePx) / signSize).toBeGreaterThanOrEqual(1);
      expect(horizon.from - line / 2).toBeGreaterThanOrEqual(0);
      expect(horizon.to + line / 2).toBeLessThanOrEqual(signSize);
    }
  });

  it('always comes with the word', () => {
    expect(states.map((state) => /aria-label="([^"]+)"/.exec(renderToStaticMarkup(<VerdictSign state={state} size={48} />))?.[1])).toEqual(['Go', 'Hold', 'Not enough to tell']);
    expect(states.map((state) => /aria-label="([^"]+)"/.exec(verdictSignSvg(state, 48))?.[1])).toEqual(['Go', 'Hold', 'Not enough to tell']);
  });

  it('leaves the word to the text beside it where that is asked', () => {
    expect(renderToStaticMarkup(<VerdictSign state="go" size={48} silent />)).toContain('aria-hidden="true"');
  });

  it('is drawn alike on the page, in a letter and in a notification', () => {
    for (const state of states) {
      const circle = (svg: string) => ['cy', 'r'].map((name) => Number(new RegExp(`<circle[^>]* ${name}="([\\d.]+)"`).exec(svg)?.[1]));
      const [page, letter] = [circle(renderToStaticMarkup(<VerdictSign state={state} size={96} />)), circle(verdictSignSvg(state, 96))];
      page.forEach((value, index) => expect(letter[index]).toBeCloseTo(value, 1));
    }
  });

  it('shows a verdict given for want of data as not enough to tell, never as a go', () => {
    expect(stateOf({ verdict: 'hold', enoughToTell: false })).toBe('unknown');
    expect(stateOf({ verdict: 'go', enoughToTell: false })).toBe('unknown');
    expect(stateOf({ verdict: 'go', enoughToTell: true })).toBe('go');
  });
});
