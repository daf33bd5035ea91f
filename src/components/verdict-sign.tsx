import { disc, discY, horizon, horizonY, signSize, verdictWord, type VerdictState } from '../../shared/look/verdict-sign.ts';

interface VerdictSignProps {
  state: VerdictState;
  /** Side of the square, pixels. */
  size: number;
  /** Leave the word to the text beside it. */
  silent?: boolean;
}

/** The disc and the horizon. Go: the full disc stands on the line. Hold: it has not risen. Not enough to tell: an open ring. */
export function VerdictSign({ state, size, silent = false }: VerdictSignProps) {
  return (
    <svg width={size} height={size} viewBox={`0 0 ${signSize} ${signSize}`} className="verdict-sign shrink-0" {...(silent ? { 'aria-hidden': true } : { role: 'img', 'aria-label': verdictWord[state] })}>
      <svg width={signSize} height={horizonY - 1.25} overflow="hidden">
        {state === 'unknown' ? (
          <circle cx={disc.x} cy={discY.unknown} r={disc.radius - 1.25} className="fill-none stroke-current" strokeWidth={2.5} />
        ) : (
          <circle cx={disc.x} cy={discY[state]} r={disc.radius} className={`fill-straw stroke-current ${state === 'go' ? 'disc-rises' : ''}`} strokeWidth={1.5} />
        )}
      </svg>
      <path d={`M${horizon.from} ${horizonY}H${horizon.to}`} className="stroke-current" strokeWidth={2.5} strokeLinecap="round" />
    </svg>
  );
}
