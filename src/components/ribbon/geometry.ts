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

/** Thin threads where the ribbon is shut. */
export const threadPath = (lane: Lane, at: (index: number) => number): string =>
  lane.stretches
    .filter(({ kind }) => kind === 'closed')
    .map(({ from, to }) => `M${at(from === 0 ? 0 : from - 0.5).toFixed(1)} 0H${at(to === lane.headroom.length - 1 ? to : to + 0.5).toFixed(1)}`)
    .join('');

/** Where a knot is tied, half a step before the first step that is shut. */
export const knotPlace = (knot: number, at: (index: number) => number): number => at(knot === 0 ? 0 : knot - 0.5);

/** Middles of the open rings that mark a stretch of which nothing can be told. */
export const ringPlaces = (lane: Lane, at: (index: number) => number, gap: number): number[] =>
  lane.stretches
    .filter(({ kind }) => kind === 'untold')
    .flatMap(({ from, to }) => {
      const [begin, end] = [at(from - (from === 0 ? 0 : 0.5)), at(to + (to === lane.headroom.length - 1 ? 0 : 0.5))];
      const count = Math.max(1, Math.floor((end - begin) / gap));
      return Array.from({ length: count }, (_, index) => begin + ((index + 0.5) / count) * (end - begin));
    });

export interface LabelWish {
  /** Place of the knot along the lane. */
  at: number;
  /** End of the shut stretch behind the knot. */
  until: number;
  /** Room the label takes. */
  width: number;
  /** Whether it may stand before the knot: the ribbon is thin there. */
  before: boolean;
}

export interface PlacedLabel {
  /** Which wish it fulfils. */
  index: number;
  at: number;
  anchor: 'start' | 'end';
}

/** Clear of the knot itself. */
const labelGap = 9;
/** A label may reach over the thin beginning of the next ribbon. */
const labelOver = 30;

/**
 * Places the labels of a lane's knots so that none stands on another or leaves the lane: behind the knot, along the thread,
 * where there is room; else before it, where the ribbon is thin; else nowhere (the list of knots still names it).
 */
export function placeLabels(wishes: readonly LabelWish[], lane: { from: number; to: number }): PlacedLabel[] {
  const placed: PlacedLabel[] = [];
  let taken = lane.from;
  wishes.forEach(({ at, until, width, before }, index) => {
    const nextKnot = wishes[index + 1]?.at ?? lane.to;
    if (at + labelGap + width <= Math.min(until + labelOver, nextKnot, lane.to)) {
      placed.push({ index, at: at + labelGap, anchor: 'start' });
      taken = at + labelGap + width;
    } else if (before && at - labelGap - width >= taken) {
      placed.push({ index, at: at - labelGap, anchor: 'end' });
      taken = at;
    }
  });
  return placed;
}

/** Room that a text takes, near enough for keeping labels apart. @param sizePx size of its letters */
export const textRoom = (text: string, sizePx: number): number => text.length * sizePx * 0.54;
