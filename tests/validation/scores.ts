import { brierScore } from '../../shared/assessment/brier-score.ts';

/** Area under the ROC curve: the chance that an event was given a greater likelihood than a non-event; ties count half. NaN without both. */
export function rocArea(scores: readonly number[], happened: readonly boolean[]): number {
  const order = scores.map((_, index) => index).sort((a, b) => scores[a]! - scores[b]!);
  let rankSum = 0;
  for (let from = 0; from < order.length; ) {
    let to = from;
    while (to < order.length && scores[order[to]!] === scores[order[from]!]) to += 1;
    for (let place = from; place < to; place += 1) if (happened[order[place]!]) rankSum += (from + to + 1) / 2;
    from = to;
  }
  const events = happened.filter(Boolean).length;
  const others = happened.length - events;
  return events === 0 || others === 0 ? NaN : (rankSum - (events * (events + 1)) / 2) / (events * others);
}

export interface Scores {
  hours: number;
  share: number;
  area: number;
  brier: number;
  /** 1 − Brier / Brier of always saying the share of these hours. */
  skill: number;
}

export function scoresOf(chances: readonly number[], happened: readonly boolean[]): Scores {
  const share = happened.filter(Boolean).length / happened.length;
  const brier = brierScore(chances, happened);
  return { hours: happened.length, share, area: rocArea(chances, happened), brier, skill: 1 - brier / (share * (1 - share)) };
}

export interface Tenth {
  from: number;
  hours: number;
  said: number;
  happened: number;
}

/** Reliability by tenths of the chance said. */
export function reliability(chances: readonly number[], happened: readonly boolean[]): Tenth[] {
  return Array.from({ length: 10 }, (_, tenth) => {
    const members = chances.flatMap((chance, index) => (Math.min(9, Math.floor(chance * 10)) === tenth ? [index] : []));
    const mean = (value: (index: number) => number): number => members.reduce((sum, index) => sum + value(index), 0) / members.length;
    return { from: tenth / 10, hours: members.length, said: mean((index) => chances[index]!), happened: mean((index) => (happened[index] ? 1 : 0)) };
  });
}

/** Rows as a markdown table. */
export function markdown(head: readonly string[], rows: readonly (readonly (string | number)[])[]): string {
  const line = (cells: readonly (string | number)[]): string => `| ${cells.join(' | ')} |`;
  return [line(head), line(head.map(() => '---')), ...rows.map(line)].join('\n');
}
