/** The disc and the horizon: the sign of a verdict, as plain geometry, so that page, letter and notification draw the same. */
export type VerdictState = 'go' | 'hold' | 'unknown';

/** Side of the square that the figures below are drawn in. */
export const signSize = 48;

/** The word that always stands with the sign. */
export const verdictWord: Record<VerdictState, string> = { go: 'Go', hold: 'Hold', unknown: 'Not enough to tell' };

export const stateOf = ({ verdict, enoughToTell }: { verdict: 'go' | 'hold'; enoughToTell: boolean }): VerdictState => (enoughToTell ? verdict : 'unknown');

export interface SignGeometry {
  /** Thickness of the horizon and of the ring. */
  line: number;
  /** Thickness of the disc's rim. */
  rim: number;
  /** Middle, right and left end of the horizon. */
  horizon: { y: number; from: number; to: number };
  disc: { x: number; y: number; radius: number };
  /** Nothing of the disc is drawn below this. */
  skyTo: number;
}

/** Share of the disc's height that a hold shows above the line. */
const rimShown = 0.26;
const outerRadius = 15.5;
const horizonTo = 40;

/** Lines grow slower than the sign, so that 24 px is not faint and 600 px not clumsy. */
const lineAt = (sizePx: number): number => Math.max(2, 0.22 * sizePx ** 0.7) * (signSize / sizePx);

/**
 * Where everything of the sign stands, in a square of `signSize`.
 * Go: the full disc stands on the line. Hold: it is sunk, only its rim shows. Not enough to tell: an open ring on the line.
 * @param sizePx side at which it will be shown, pixels; decides only how thick its lines are
 */
export function signGeometry(state: VerdictState, sizePx: number): SignGeometry {
  const line = lineAt(sizePx);
  const rim = state === 'unknown' ? line : Math.max(line * 0.6, signSize / sizePx);
  const skyTo = horizonTo - line;
  const standing = skyTo - outerRadius;
  return {
    line,
    rim,
    horizon: { y: horizonTo - line / 2, from: 1 + line / 2, to: signSize - 1 - line / 2 },
    disc: { x: signSize / 2, y: state === 'hold' ? standing + 2 * outerRadius * (1 - rimShown) : standing, radius: outerRadius - rim / 2 },
    skyTo,
  };
}

export interface SignColours {
  /** Line, rim and ring. */
  ink: string;
  /** The disc. */
  light: string;
  /** Fills the square; none leaves it clear. */
  ground?: string;
}

/** On paper, as in a letter. */
const onPaper: SignColours = { ink: '#23261f', light: '#f0b95b' };

/**
 * The sign as an SVG document: for letters, notification icons and badges.
 * @param sizePx side of the square, pixels
 */
export function verdictSignSvg(state: VerdictState, sizePx: number, { ink, light, ground }: SignColours = onPaper): string {
  const { line, rim, horizon, disc, skyTo } = signGeometry(state, sizePx);
  const figure = (value: number): string => String(Number(value.toFixed(2)));
  const clip = `sky-${state}-${sizePx}`;
  const square = ground ? `<rect width="${signSize}" height="${signSize}" fill="${ground}"/>` : '';
  const circle = `<circle cx="${disc.x}" cy="${figure(disc.y)}" r="${figure(disc.radius)}" fill="${state === 'unknown' ? 'none' : light}" stroke="${ink}" stroke-width="${figure(rim)}" clip-path="url(#${clip})"/>`;
  const earth = `<path d="M${figure(horizon.from)} ${figure(horizon.y)}H${figure(horizon.to)}" stroke="${ink}" stroke-width="${figure(line)}" stroke-linecap="round"/>`;
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${sizePx}" height="${sizePx}" viewBox="0 0 ${signSize} ${signSize}" role="img" aria-label="${verdictWord[state]}"><clipPath id="${clip}"><rect width="${signSize}" height="${figure(skyTo)}"/></clipPath>${square}${circle}${earth}</svg>`;
}
