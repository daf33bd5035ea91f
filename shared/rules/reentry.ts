import { exclusionZoneM } from '../droplets/exclusion-zone.ts';
import type { DropletClass } from '../droplets/classes.ts';

const hourMs = 3_600_000;
const at = (iso: string, hours: number): string => new Date(Date.parse(iso) + hours * hourMs).toISOString();

/** An interval as a label states it: 12 hours, or 14 days. */
export interface StatedInterval {
  value: number;
  unit: 'hours' | 'days';
}
export const hoursOf = ({ value, unit }: StatedInterval): number => value * (unit === 'days' ? 24 : 1);

export interface Reentry {
  /** UTC instant; null while an interval of the mix is not known. */
  endsAt: string | null;
  /** The longest known of the mix. */
  hours: number | null;
  /** Products that set it. */
  governedBy: string[];
  /** Products without an entered interval: nobody may go in on our word. */
  missing: string[];
}

/**
 * End of re-entry for a mix: the longest restricted-entry interval counts, from the END of the application [cfr170, from memory].
 * @param stoppedAt the recorded stop, UTC @throws RangeError when the stop is no instant
 */
export function reentryOf(stoppedAt: string, products: readonly { name: string; reiHours: number | null }[]): Reentry {
  if (Number.isNaN(Date.parse(stoppedAt))) throw new RangeError(`stoppedAt must be an instant such as 2026-05-01T12:00:00Z, not ${stoppedAt}.`);
  const missing = products.filter(({ reiHours }) => reiHours === null).map(({ name }) => name);
  const known = products.flatMap(({ name, reiHours }) => (reiHours === null ? [] : [{ name, reiHours }]));
  if (known.length === 0) return { endsAt: null, hours: null, governedBy: [], missing };
  const hours = Math.max(...known.map(({ reiHours }) => reiHours));
  return { endsAt: missing.length > 0 ? null : at(stoppedAt, hours), hours, governedBy: known.filter(({ reiHours }) => reiHours === hours).map(({ name }) => name), missing };
}

/** What the Worker Protection Standard asks around one application, where it applies [cfr170]. */
export interface WorkerProtectionTimes {
  /** Application and hazard information is up by then at the latest, and before workers enter. */
  displayBy: string;
  displayUntil: string;
  keepUntil: string;
  /** Warning signs outdoors: always above 48 h, else as the label says. */
  signsNeeded: boolean;
  signsDownBy: string;
  /** Water, soap and towels for workers in treated areas until then. */
  decontaminationUntil: string;
}

/** Outdoors, signs are needed above this even if the label is silent [cfr170, 170.409, from memory]. */
export const signsAboveHours = 48;

/**
 * Dates of the Worker Protection Standard: display within 24 h and until 30 days after re-entry, kept two years after it; signs down
 * within 3 days of it; decontamination supplies for 7 days when the interval is 4 h or less, else 30 [cfr170; all but the two years
 * and the 7 days from memory]. General information: the owner's family is partly exempt, states may ask more, check the current text.
 * @returns UTC instants @throws RangeError for an end before the stop, or an end that is no instant
 */
export function workerProtectionTimes(stoppedAt: string, reentryEndsAt: string): WorkerProtectionTimes {
  const hours = (Date.parse(reentryEndsAt) - Date.parse(stoppedAt)) / hourMs;
  if (!(hours >= 0)) throw new RangeError(`reentryEndsAt must not be before stoppedAt: ${reentryEndsAt}, ${stoppedAt}.`);
  const twoYearsOn = new Date(Date.parse(reentryEndsAt));
  twoYearsOn.setUTCFullYear(twoYearsOn.getUTCFullYear() + 2);
  return {
    displayBy: at(stoppedAt, 24),
    displayUntil: at(reentryEndsAt, 30 * 24),
    keepUntil: twoYearsOn.toISOString(),
    signsNeeded: hours > signsAboveHours,
    signsDownBy: at(reentryEndsAt, 3 * 24),
    decontaminationUntil: at(reentryEndsAt, (hours <= 4 ? 7 : 30) * 24),
  };
}

export interface ZoneStatement {
  radiusM: number;
  rule: '40 CFR 170.405';
  cite: 'aez2024';
  /** Date of the text the figure was read in. */
  asOf: string;
  /** The law changes and states may be stricter: show that it must be checked again. */
  mustBeRechecked: true;
}

/** The application exclusion zone with where it stands: 100 ft for an air-propelled sprayer, moving with it, ending with the application [aez2024]. */
export function zoneStatement(application: { airPropelled: boolean; dropletClass: DropletClass; releaseHeightM: number }): ZoneStatement {
  return { radiusM: exclusionZoneM(application), rule: '40 CFR 170.405', cite: 'aez2024', asOf: '2024-12-03', mustBeRechecked: true };
}
