import type { AssessmentAnswer } from './answer.ts';

/** One later morning with its answer for the same plan. */
export interface AssessedMorning {
  /** Local calendar date, `YYYY-MM-DD`. */
  date: string;
  answer: Pick<AssessmentAnswer, 'verdict' | 'enoughToTell' | 'windows'>;
}

export interface BetterMorning {
  date: string;
  /** `go`: the job fits as the forecast stands; `closer`: it does not, but the longest window is longer than today's. */
  looks: 'go' | 'closer';
  longestWindowMinutes: number;
}

const longestMinutes = ({ windows }: AssessedMorning['answer']): number => windows.reduce((longest, { minutes }) => Math.max(longest, minutes), 0);

/**
 * The next morning that looks better than this one: the first go, else the one with the longest window beyond this one's.
 * @param current the answer that holds @param later the mornings after it, in order
 * @returns null when none looks better; a morning on which too little is known never counts
 */
export function nextBetterMorning(current: AssessedMorning['answer'], later: readonly AssessedMorning[]): BetterMorning | null {
  const firstGo = later.find(({ answer }) => answer.verdict === 'go');
  if (firstGo) return { date: firstGo.date, looks: 'go', longestWindowMinutes: longestMinutes(firstGo.answer) };
  let best: BetterMorning | null = null;
  for (const { date, answer } of later) {
    const minutes = longestMinutes(answer);
    if (answer.enoughToTell && minutes > (best?.longestWindowMinutes ?? longestMinutes(current))) best = { date, looks: 'closer', longestWindowMinutes: minutes };
  }
  return best;
}
