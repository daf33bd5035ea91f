import { signGeometry, signSize, verdictWord, type VerdictState } from '../../shared/look/verdict-sign.ts';

interface VerdictSignProps {
  state: VerdictState;
  /** Side of the square, pixels. */
  size: number;
  /** Leave the word to the text beside it. */
  silent?: boolean;
}

/**
 * The disc and the horizon. Go: the full disc stands on the line. Hold: it has not risen. Not enough to tell: an open ring.
 * On arrival the disc rises as far as the verdict lets it.
 */
export function VerdictSign({ state, size, silent = false }: VerdictSignProps) {
  const { line, rim, horizon, disc, skyTo } = signGeometry(state, size);
  return (
    <svg width={size} height={size} viewBox={`0 0 ${signSize} ${signSize}`} className="verdict-sign shrink-0" {...(silent ? { 'aria-hidden': true } : { role: 'img', 'aria-label': verdictWord[state] })}>
      <svg width={signSize} height={skyTo} overflow="hidden">
        <circle key={state} cx={disc.x} cy={disc.y} r={disc.radius} className={`stroke-current ${state === 'unknown' ? 'fill-none' : 'fill-straw disc-rises'}`} strokeWidth={rim} />
      </svg>
      <path d={`M${horizon.from} ${horizon.y}H${horizon.to}`} className="stroke-current" strokeWidth={line} strokeLinecap="round" />
    </svg>
  );
}
