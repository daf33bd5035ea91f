import type { RateUnit } from '../api/plans.ts';
import type { MeasureUnit } from '../tank/measures.ts';

/** Where a weather value came from; readings come before observations, observations before a forecast. */
export const weatherOrigins = ['reading', 'observation', 'forecast'] as const;
export type WeatherOrigin = (typeof weatherOrigins)[number];

export interface Observed {
  value: number;
  origin: WeatherOrigin;
  /** UTC instant of the value. */
  at: string;
}

export interface RecordedProduct {
  name: string;
  registrationNumber: string;
  activeIngredients: string;
  restrictedUse: boolean;
  /** Product used, not spray mix and not active ingredient. */
  amount: number | null;
  amountUnit: MeasureUnit | null;
  rate: number | null;
  rateUnit: RateUnit | null;
  reiHours: number | null;
  lot: string;
}

/** Everything that any rule set of `shared/rules/record-rules.ts` asks for. Empty texts and nulls are not known yet. */
export interface ApplicationRecord {
  /** Local date, `YYYY-MM-DD`. */
  date: string | null;
  /** UTC instants. */
  startedAt: string | null;
  stoppedAt: string | null;
  /** IANA zone of the farm. */
  timeZone: string;
  /** Where, in words: county, address or survey description, and the block. */
  location: string;
  /** Degrees; GeoJSON order, as everywhere. */
  position: { longitude: number; latitude: number } | null;
  /** An outline or map of the treated area is kept with the record. */
  hasMap: boolean;
  areaHa: number | null;
  /** Crop, commodity or site. */
  crop: string;
  /** EPPO code of the crop. */
  cropEppoCode: string;
  /** Growth stage, BBCH 0–99. */
  bbch: number | null;
  target: string;
  products: readonly RecordedProduct[];
  sprayVolumeL: number | null;
  equipment: string;
  applicator: { name: string; licenceNumber: string };
  /** Who sprayed under the certified applicator; empty when nobody else did. */
  uncertifiedApplicator: string;
  /** Work for hire; null on the own farm. */
  customer: { name: string; address: string } | null;
  permitNumber: string;
  windMs: Observed | null;
  /** Degrees clockwise from true north, the direction the wind came from. */
  windFromDeg: Observed | null;
  temperatureC: Observed | null;
  hasSafetyDataSheets: boolean;
}

/** Of several values of one thing: the reading, else the observation, else the forecast; of one origin the one nearest to an instant. */
export function bestObserved(values: readonly Observed[], nearAt: string): Observed | null {
  const distance = ({ at }: Observed): number => Math.abs(Date.parse(at) - Date.parse(nearAt));
  return values.toSorted((a, b) => weatherOrigins.indexOf(a.origin) - weatherOrigins.indexOf(b.origin) || distance(a) - distance(b))[0] ?? null;
}

/** Combinations that cannot be, by field; a record with any may not be signed. @param today local date, from the caller's clock */
export function recordProblems(record: ApplicationRecord, today: string): { path: string; message: string }[] {
  const problems: { path: string; message: string }[] = [];
  const add = (isWrong: boolean, path: string, message: string) => {
    if (isWrong) problems.push({ path, message });
  };
  const { startedAt, stoppedAt, date } = record;
  add(startedAt !== null && stoppedAt !== null && Date.parse(stoppedAt) < Date.parse(startedAt), 'stoppedAt', 'must not be before the start');
  add(startedAt !== null && stoppedAt !== null && Date.parse(stoppedAt) - Date.parse(startedAt) > 24 * 3_600_000, 'stoppedAt', 'must be within a day of the start: make one record for each day');
  add(date !== null && date > today, 'date', 'must not be in the future');
  add(record.areaHa !== null && !(record.areaHa > 0), 'areaHa', 'must be more than 0');
  add(record.sprayVolumeL !== null && !(record.sprayVolumeL > 0), 'sprayVolumeL', 'must be more than 0');
  add(record.bbch !== null && !(record.bbch >= 0 && record.bbch <= 99), 'bbch', 'must be 0 to 99');
  add(record.windMs !== null && !(record.windMs.value >= 0 && record.windMs.value <= 60), 'windMs', 'must be 0 to 60 m/s');
  add(record.windFromDeg !== null && !(record.windFromDeg.value >= 0 && record.windFromDeg.value <= 360), 'windFromDeg', 'must be 0 to 360 degrees');
  add(record.temperatureC !== null && !(record.temperatureC.value >= -40 && record.temperatureC.value <= 60), 'temperatureC', 'must be −40 to 60 °C');
  add(record.products.length === 0, 'products', 'must name at least one product');
  record.products.forEach((product, index) => {
    const path = `products.${index}`;
    add(product.amount !== null && !(product.amount > 0), `${path}.amount`, 'must be more than 0');
    add(product.amount !== null && product.amountUnit === null, `${path}.amountUnit`, 'must be chosen: an amount needs its unit');
    add(product.rate !== null && record.areaHa === null, 'areaHa', 'must be entered: a rate needs an area');
  });
  return problems;
}
