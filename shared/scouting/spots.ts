import { grouped } from './group.ts';

/** One checked tree, or a handful, with where it stood. */
export interface SpotCheck {
  /** Local date of the walk, `YYYY-MM-DD`. */
  date: string;
  longitude: number;
  latitude: number;
  treesChecked: number;
  treesWith: number;
}

export interface Spot {
  /** Middle of the square, degrees. */
  longitude: number;
  latitude: number;
  /** Walks that found it here, and walks that looked here. */
  datesWith: string[];
  datesChecked: string[];
  treesChecked: number;
  treesWith: number;
  recurs: boolean;
}

/** Side of a square: about the error of a phone's position under trees. Common practice, no source. */
export const usualSquareM = 10;
/** Found on this many walks, a spot recurs. */
export const recursFromWalks = 2;

/** Metres in one degree of latitude, and of longitude at the equator, on a sphere of 6371 km: ample for one block. */
const metresPerDegree = (6_371_000 * Math.PI) / 180;

/**
 * Squares of a block's map where a target was found, those that recur first. Squares are laid from an origin that stays the same over
 * the years, so that one spot keeps its square.
 * @param origin south-west of the block, degrees @throws RangeError when the square has no side
 */
export function spotsOf(checks: readonly SpotCheck[], origin: { longitude: number; latitude: number }, squareM: number = usualSquareM): Spot[] {
  if (!(squareM > 0)) throw new RangeError(`squareM must be more than 0, not ${squareM}.`);
  const latitudeStep = squareM / metresPerDegree;
  const longitudeStep = latitudeStep / Math.cos((origin.latitude * Math.PI) / 180);
  const squareOf = ({ longitude, latitude }: SpotCheck) => ({ column: Math.floor((longitude - origin.longitude) / longitudeStep), row: Math.floor((latitude - origin.latitude) / latitudeStep) });
  const squares = grouped(checks, (check) => {
    const { column, row } = squareOf(check);
    return `${column} ${row}`;
  });
  const datesOf = (own: readonly SpotCheck[]): string[] => [...new Set(own.map(({ date }) => date))].toSorted();
  const spots = [...squares.values()].map((own): Spot => {
    const { column, row } = squareOf(own[0]!);
    const datesWith = datesOf(own.filter(({ treesWith }) => treesWith > 0));
    return {
      longitude: origin.longitude + (column + 0.5) * longitudeStep,
      latitude: origin.latitude + (row + 0.5) * latitudeStep,
      datesWith,
      datesChecked: datesOf(own),
      treesChecked: own.reduce((sum, { treesChecked }) => sum + treesChecked, 0),
      treesWith: own.reduce((sum, { treesWith }) => sum + treesWith, 0),
      recurs: datesWith.length >= recursFromWalks,
    };
  });
  return spots.filter(({ datesWith }) => datesWith.length > 0).toSorted((a, b) => b.datesWith.length - a.datesWith.length || b.treesWith - a.treesWith);
}
