/** The disc and the horizon: the sign of a verdict, as plain geometry, so that page, letter and notification draw the same. */
export type VerdictState = 'go' | 'hold' | 'unknown';

/** Side of the square that the figures below are drawn in. */
export const signSize = 48;
const centre = signSize / 2;
const radius = 13;
/** Height of the horizon. */
export const horizonY = 34;

/** Where the disc's middle stands for a state; a hold shows only the rim above the line. */
export const discY: Record<VerdictState, number> = { go: horizonY - radius - 1.25, hold: horizonY + radius - 5, unknown: horizonY - radius - 1.25 };
export const disc = { x: centre, radius } as const;
export const horizon = { from: 3, to: signSize - 3 } as const;

/** The word that always stands with the sign. */
export const verdictWord: Record<VerdictState, string> = { go: 'Go', hold: 'Hold', unknown: 'Not enough to tell' };

export const stateOf = (verdict: { verdict: 'go' | 'hold'; enoughToTell: boolean }): VerdictState => (!verdict.enoughToTell ? 'unknown' : verdict.verdict);

/**
 * The sign as an SVG document.
 * @param sizePx side of the square, pixels
 * @param colours ink of line and ring, light of the disc; `ground` fills the square, none leaves it clear
 */
export function verdictSignSvg(state: VerdictState, sizePx: number, colours: { ink: string; light: string; ground?: string }): string {
  const ground = colours.ground ? `<rect width="${signSize}" height="${signSize}" fill="${colours.ground}"/>` : '';
  const sky = `<clipPath id="sky"><rect width="${signSize}" height="${horizonY - 1.25}"/></clipPath>`;
  const body =
    state === 'unknown'
      ? `<circle cx="${disc.x}" cy="${discY.unknown}" r="${radius - 1.25}" fill="none" stroke="${colours.ink}" stroke-width="2.5"/>`
      : `<circle cx="${disc.x}" cy="${discY[state]}" r="${radius}" fill="${colours.light}" stroke="${colours.ink}" stroke-width="1.5" clip-path="url(#sky)"/>`;
  const line = `<path d="M${horizon.from} ${horizonY}H${horizon.to}" stroke="${colours.ink}" stroke-width="2.5" stroke-linecap="round"/>`;
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${sizePx}" height="${sizePx}" viewBox="0 0 ${signSize} ${signSize}" role="img" aria-label="${verdictWord[state]}">${sky}${ground}${body}${line}</svg>`;
}
