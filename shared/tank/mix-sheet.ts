import type { RateUnit } from '../api/plans.ts';
import { exactly, exactlyNotNegative, exactlyPositive, sumOf, toStep, toText, zero, type Exact } from './exact.ts';
import { amountOnArea, convert, rateOnArea, rateParts, sizeOf, substanceOf, usualMeasures, type Measure, type MeasureUnit } from './measures.ts';

export interface MixProduct {
  /** Tells lines of one name apart; left out: the name. */
  id?: string;
  name: string;
  /** Product per area, in `rateUnit`. */
  rate: number;
  rateUnit: RateUnit;
  /** What it is measured with; left out: the usual measure of the rate's unit. */
  measure?: Measure;
}

/** An adjuvant, or a product whose label states an amount per volume of spray (dilute, to run-off), never per area as well. */
export type MixAdjuvant = { id?: string; name: string; measure?: Measure } & (
  | { /** Percent of the spray volume, v/v. */ percentVv: number }
  | { /** Such as 1 fl oz per 100 gal of spray: `{ amount: 1, unit: 'flOz', per: 100, perUnit: 'gal' }`. */ amountPerVolume: { amount: number; unit: MeasureUnit; per: number; perUnit: 'gal' | 'L' } }
);

export interface MixInput {
  areaHa: number;
  /** Spray volume per hectare, best from a calibration. */
  carrierLHa: number;
  tankL: number;
  products: readonly MixProduct[];
  adjuvants?: readonly MixAdjuvant[];
}

/** One amount for one filling (or all), in the unit of its measure. */
export interface Amount {
  unit: MeasureUnit;
  /** Exact amount, `n/d`: tanks sum to the total without a remainder. */
  exact: string;
  /** The same as a plain number. */
  value: number;
  /** Rounded to the measure's step: what to pour or weigh. */
  measured: number;
  /** `measured` less `value`, in percent of `value`. */
  roundingPct: number;
  /** The measure's step is too coarse for so little: take a finer measure. */
  tooCoarse: boolean;
}

export interface MixLine {
  id: string;
  name: string;
  kind: 'product' | 'adjuvant';
  measure: Measure;
  /** Null when there is no full tank. */
  fullTank: Amount | null;
  /** The last, part tank; null when all tanks are full. */
  lastTank: Amount | null;
  /** `measured` is the sum of what is poured into every tank. */
  total: Amount;
  /** What the poured sum comes to per area, in the product's rate unit; null for an amount per volume. */
  rateAsMeasured: number | null;
}

export interface MixSheet {
  areaHa: number;
  carrierLHa: number;
  tankL: number;
  volumeL: number;
  /** Tanks, the last as a fraction. */
  tanks: number;
  fullTanks: number;
  /** Spray in the last, part tank, L; null when all tanks are full. */
  lastTankL: number | null;
  fills: number;
  /** Spray volume less the liquids; solids are taken to displace none. Always topped up to the tank's mark in the end. */
  water: { fullTankL: number | null; lastTankL: number | null; totalL: number };
  /** Exact litres, `n/d`: fullTanks × fullTank + lastTank = total, of spray and of water. */
  exactL: { fullTank: string; lastTank: string; total: string; waterFullTank: string; waterLastTank: string; waterTotal: string };
  lines: MixLine[];
}

/** Rounding beyond this share of the dose asks for a finer measure. Common practice, no source. */
export const coarsePct = 5;
/** Less than this share of a tank is the rounding of a unit (12 gal/ac kept as L/ha), not a further filling; as in `jobOfPlan`. */
const speck = 1e-9;

function amountOf(exact: Exact, measured: Exact, unit: MeasureUnit): Amount {
  const roundingPct = exact.equals(0) ? 0 : measured.sub(exact).div(exact).mul(100).valueOf();
  return { unit, exact: toText(exact), value: exact.valueOf(), measured: measured.valueOf(), roundingPct, tooCoarse: Math.abs(roundingPct) > coarsePct };
}

interface Dose {
  id: string;
  name: string;
  kind: MixLine['kind'];
  measure: Measure;
  /** In the measure's unit, for one litre of spray. */
  perL: Exact;
  /** Product and its rate's unit; an amount per volume has none. */
  rateUnit: RateUnit | null;
}

function doseOfProduct({ name, id = name, rate, rateUnit, measure }: MixProduct, areaHa: Exact, volumeL: Exact, path: string): Dose {
  const parts = rateParts(rateUnit);
  const own = measure ?? parts.measure;
  const total = convert(amountOnArea(exactlyPositive(rate, `${path}.rate`), rateUnit, areaHa), parts.amount, own.unit);
  return { id, name, kind: 'product', measure: own, perL: total.div(volumeL), rateUnit };
}

function doseOfAdjuvant(adjuvant: MixAdjuvant, path: string): Dose {
  const id = adjuvant.id ?? adjuvant.name;
  if ('percentVv' in adjuvant) {
    if (adjuvant.percentVv > 100) throw new RangeError(`${path}.percentVv must be at most 100, not ${adjuvant.percentVv}.`);
    const measure = adjuvant.measure ?? usualMeasures.mL;
    const mLPerL = exactlyPositive(adjuvant.percentVv, `${path}.percentVv`).mul(10);
    return { id, name: adjuvant.name, kind: 'adjuvant', measure, perL: convert(mLPerL, 'mL', measure.unit), rateUnit: null };
  }
  const { amount, unit, per, perUnit } = adjuvant.amountPerVolume;
  const measure = adjuvant.measure ?? (substanceOf(unit) === 'liquid' ? usualMeasures.mL : usualMeasures.g);
  const litres = convert(exactlyPositive(per, `${path}.amountPerVolume.per`), perUnit, 'L');
  return { id, name: adjuvant.name, kind: 'adjuvant', measure, perL: convert(exactlyPositive(amount, `${path}.amountPerVolume.amount`), unit, measure.unit).div(litres), rateUnit: null };
}

/**
 * What goes into each tank, exactly: product per tank = rate × area × (tank ÷ spray volume); the last, part tank gets its own
 * scaled dose; an adjuvant in % v/v is that share of the spray volume [ncStateCalibration; arithmetic as in extension tables].
 * Rate and carrier are used as given: checks against the label are `shared/rules`.
 * @throws RangeError naming the field: not above 0, a volume weighed, or more liquid than fits the tank
 */
export function mixSheet({ areaHa, carrierLHa, tankL, products, adjuvants = [] }: MixInput): MixSheet {
  const area = exactlyPositive(areaHa, 'areaHa');
  const tank = exactlyPositive(tankL, 'tankL');
  const asked = area.mul(exactlyPositive(carrierLHa, 'carrierLHa')).div(tank);
  const whole = asked.round();
  const tanks = whole.compare(0) > 0 && asked.sub(whole).abs().valueOf() < speck ? whole : asked;
  const volume = tanks.mul(tank);
  const fullTanks = tanks.floor();
  const lastTank = tanks.sub(fullTanks).mul(tank);
  const hasFull = fullTanks.compare(0) > 0;
  const hasLast = lastTank.compare(0) > 0;

  const doses = [...products.map((product, index) => doseOfProduct(product, area, volume, `products.${index}`)), ...adjuvants.map((adjuvant, index) => doseOfAdjuvant(adjuvant, `adjuvants.${index}`))];
  const liquidLPerL = sumOf(doses.filter(({ measure }) => substanceOf(measure.unit) === 'liquid').map(({ perL, measure }) => perL.mul(sizeOf(measure.unit)).div(1000)));
  if (liquidLPerL.compare(1) > 0) throw new RangeError(`carrierLHa must be more than ${carrierLHa}: the products alone are more than the spray volume.`);
  const waterShare = exactly(1).sub(liquidLPerL);

  const lineOf = ({ id, name, kind, measure, perL, rateUnit }: Dose): MixLine => {
    const step = exactlyPositive(measure.step, 'measure.step');
    const full = perL.mul(tank);
    const last = perL.mul(lastTank);
    const pouredFull = hasFull ? toStep(full, step) : zero;
    const pouredLast = hasLast ? toStep(last, step) : zero;
    const poured = pouredFull.mul(fullTanks).add(pouredLast);
    return {
      id,
      name,
      kind,
      measure,
      fullTank: hasFull ? amountOf(full, pouredFull, measure.unit) : null,
      lastTank: hasLast ? amountOf(last, pouredLast, measure.unit) : null,
      total: amountOf(perL.mul(volume), poured, measure.unit),
      rateAsMeasured: rateUnit === null ? null : rateOnArea(convert(poured, measure.unit, rateParts(rateUnit).amount), rateUnit, area).valueOf(),
    };
  };

  const litres = (spray: Exact) => ({ spray: toText(spray), water: toText(spray.mul(waterShare)), waterL: spray.mul(waterShare).valueOf() });
  const [ofFull, ofLast, ofAll] = [litres(hasFull ? tank : zero), litres(lastTank), litres(volume)];
  return {
    areaHa,
    carrierLHa,
    tankL,
    volumeL: volume.valueOf(),
    tanks: tanks.valueOf(),
    fullTanks: fullTanks.valueOf(),
    lastTankL: hasLast ? lastTank.valueOf() : null,
    fills: tanks.ceil().valueOf(),
    water: { fullTankL: hasFull ? ofFull.waterL : null, lastTankL: hasLast ? ofLast.waterL : null, totalL: ofAll.waterL },
    exactL: { fullTank: ofFull.spray, lastTank: ofLast.spray, total: ofAll.spray, waterFullTank: ofFull.water, waterLastTank: ofLast.water, waterTotal: ofAll.water },
    lines: doses.map(lineOf),
  };
}

/** Area that an amount of product covers at a rate, ha: 48 fl oz at 12 fl oz per acre cover 4 acres. */
export function areaCoveredHa(amount: number, unit: MeasureUnit, rate: number, rateUnit: RateUnit): number {
  const parts = rateParts(rateUnit);
  return convert(exactlyNotNegative(amount, 'amount'), unit, parts.amount).div(exactlyPositive(rate, 'rate')).mul(parts.areaHa).valueOf();
}
