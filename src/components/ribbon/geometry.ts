import type { AssessmentStep, LimitName } from '../../../shared/assessment/answer.ts';
import { limitNames } from '../../../shared/assessment/limit-names.ts';

/** One stretch of a ribbon in step indexes, ends included. */
export interface Stretch {
  kind: 'open' | 'closed' | 'untold';
  from: number;
  to: number;
}

/** One limit over the morning. */
export interface Lane {
  limit: LimitName;
  kind: 'hard' | 'advice';
  /** Headroom per step; null where it cannot be told. */
  headroom: (number | null)[];
  stretches: Stretch[];
  /** Steps at which the ribbon pinches shut. */
  knots: number[];
}

const stateAt = (headroom: number | null): Stretch['kind'] => (headroom === null ? 'untold' : headroom < 0 ? 'closed' : 'open');

/** Runs of one kind, in order. */
export function stretchesOf(headroom: readonly (number | null)[]): Stretch[] {
  const stretches: Stretch[] = [];
  headroom.forEach((value, index) => {
    const kind = stateAt(value);
    const last = stretches.at(-1);
    if (last?.kind === kind) last.to = index;
    else stretches.push({ kind, from: index, to: index });
  });
  return stretches;
}

/** A knot is tied where an open ribbon closes, and at the start of one that is closed from the first. */
export const knotsOf = (stretches: readonly Stretch[]): number[] => stretches.filter(({ kind }) => kind === 'closed').map(({ from }) => from);

/** The judged limits of a morning as lanes, in the order of the contract. */
export function lanesOf(steps: readonly AssessmentStep[]): Lane[] {
  const first = steps[0];
  if (!first) return [];
  return limitNames.flatMap((limit) => {
    const kind = first.limits[limit]?.kind;
    if (!kind) return [];
    const headroom = steps.map((step) => step.limits[limit]?.headroom ?? null);
    const stretches = stretchesOf(headroom);
    return [{ limit, kind, headroom, stretches, knots: knotsOf(stretches) }];
  });
}

/** Thickness of a ribbon is its headroom; at the limit it is shut. */
export const halfThickness = (headroom: number | null, most: number): number => Math.max(0, Math.min(1, headroom ?? 0)) * most;

/**
 * Outline of the open stretches of a lane, as an SVG path along x (time) around y = 0.
 * @param at x of a step, in drawing units @param most half thickness at headroom 1
 */
export function ribbonPath(lane: Lane, at: (index: number) => number, most: number): string {
  return lane.stretches
    .filter(({ kind }) => kind === 'open')
    .map(({ from, to }) => {
      const points = Array.from({ length: to - from + 1 }, (_, offset) => from + offset);
      const edge = (sign: 1 | -1) => (index: number) => `${at(index).toFixed(1)} ${(sign * Math.max(0.6, halfThickness(lane.headroom[index]!, most))).toFixed(1)}`;
      // The ends run out to where the ribbon is shut, half a step beyond its last open step.
      const begin = from === 0 ? '' : `${at(from - 0.5).toFixed(1)} 0L`;
      const end = to === lane.headroom.length - 1 ? '' : `L${at(to + 0.5).toFixed(1)} 0`;
      return `M${begin}${points.map(edge(-1)).join('L')}${end}L${points.reverse().map(edge(1)).join('L')}Z`;
    })
    .join('');
}

/** Straight threads for the stretches of one kind: thin where the ribbon is shut, dotted where nothing is known. */
export const threadPath = (lane: Lane, kind: 'closed' | 'untold', at: (index: number) => number): string =>
  lane.stretches
    .filter((stretch) => stretch.kind === kind)
    .map(({ from, to }) => `M${at(from - 0.5).toFixed(1)} 0H${at(to + 0.5).toFixed(1)}`)
    .join('');

/** Keeps, of places in order, those that stand at least `room` apart: labels that would collide are left out. */
export function spaced(places: readonly number[], room: number): number[] {
  const kept: number[] = [];
  for (const place of places) if (kept.length === 0 || place - kept.at(-1)! >= room) kept.push(place);
  return kept;
}
