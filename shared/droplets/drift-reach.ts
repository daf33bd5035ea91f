import { windProfileFactor } from '../atmosphere/wind-profile.ts';
import { driftingDropletUm, type DropletClass } from './classes.ts';
import { fallSpeedMs } from './fall-speed.ts';

/** Height to which a mist blower throws into trees, m: common practice, no source. */
export const usualReleaseHeightM = 3;
export const releaseHeightValidity = { releaseHeightM: [0.5, 15] } as const;

/** Mean wind between the ground and a height over the wind at 10 m, by the FAO-56 profile; below 0.5 m the wind of 0.5 m is taken. */
function meanProfileFactor(heightM: number): number {
  const slices = 20;
  let sum = 0;
  for (let slice = 0; slice < slices; slice += 1) sum += windProfileFactor(10, Math.max(0.5, ((slice + 0.5) / slices) * heightM));
  return sum / slices;
}

/**
 * How far the finer droplets go for each m/s of 10 m wind: fall time × mean wind over the fall.
 * A caution, NEVER a safe distance: it leaves out evaporation (droplets shrink and float on), gusts, the blower's own air,
 * slopes and inversions, in which small droplets travel for thousands of feet.
 * @param releaseHeightM height of the top of the spray, m, 0.5–15
 * @returns metres per (m/s of wind at 10 m); NaN outside the validity
 */
export function driftReachPerWindS(dropletClass: DropletClass, releaseHeightM: number = usualReleaseHeightM): number {
  const [min, max] = releaseHeightValidity.releaseHeightM;
  if (!(releaseHeightM >= min && releaseHeightM <= max)) return NaN;
  return (releaseHeightM / fallSpeedMs(driftingDropletUm(dropletClass))) * meanProfileFactor(releaseHeightM);
}

/** Drift reach in m at a 10 m wind in m/s; see `driftReachPerWindS` for what it leaves out. */
export const driftReachM = (dropletClass: DropletClass, windAt10mMs: number, releaseHeightM: number = usualReleaseHeightM): number => driftReachPerWindS(dropletClass, releaseHeightM) * windAt10mMs;
