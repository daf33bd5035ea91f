import { hectaresPerAcre } from '../units/units.ts';
import { exactly, exactlyNotNegative, fromText, sumOf, toStep, zero, type Exact } from './exact.ts';
import { convert, type MeasureUnit } from './measures.ts';
import type { Amount, MixLine, MixSheet } from './mix-sheet.ts';

/** Price of one unit of a product, in the farm's own currency. */
export interface Price {
  amount: number;
  per: MeasureUnit;
}

/** Money in the farm's currency, rounded to its hundredth part; each is rounded by itself from the exact amount. */
export interface MixCost {
  perFullTank: number | null;
  lastTank: number | null;
  perAcre: number;
  perHa: number;
  plan: number;
  /** Lines without a price: the cost is at least this. */
  unpriced: string[];
}

const toCents = (value: Exact): number => toStep(value, exactly(0.01)).valueOf();

/**
 * Cost of what is poured (measured amounts, not exact doses). Water and time are free here.
 * @param prices by line id @throws RangeError for a negative price, or a price per weight of a liquid
 */
export function mixCost(sheet: MixSheet, prices: ReadonlyMap<string, Price>): MixCost {
  const priced = sheet.lines.flatMap((line) => {
    const price = prices.get(line.id);
    return price ? [{ line, price: exactlyNotNegative(price.amount, `price of ${line.name}`), per: price.per }] : [];
  });
  const costOf = (pick: (line: MixLine) => Amount | null): Exact =>
    sumOf(priced.map(({ line, price, per }) => {
      const amount = pick(line);
      return amount === null ? zero : convert(exactly(amount.measured), amount.unit, per).mul(price);
    }));
  const plan = costOf(({ total }) => total);
  const areaHa = exactly(sheet.areaHa);
  return {
    perFullTank: sheet.fullTanks > 0 ? toCents(costOf(({ fullTank }) => fullTank)) : null,
    lastTank: sheet.lastTankL === null ? null : toCents(costOf(({ lastTank }) => lastTank)),
    perAcre: toCents(plan.div(areaHa).mul(exactly(hectaresPerAcre))),
    perHa: toCents(plan.div(areaHa)),
    plan: toCents(plan),
    unpriced: sheet.lines.filter(({ id }) => !prices.has(id)).map(({ name }) => name),
  };
}

/** What the shelf holds after the plan, in the stock's unit; `short` is what is missing, 0 when there is enough. */
export interface StockAfter {
  unit: MeasureUnit;
  used: number;
  after: number;
  short: number;
}

/**
 * Stock after a plan, by what is poured. A shelf never goes below 0: what it lacks is `short`.
 * @throws RangeError for a negative stock, or a stock by weight of a product measured by volume
 */
export function stockAfter(stock: { amount: number; unit: MeasureUnit }, line: Pick<MixLine, 'total'>): StockAfter {
  const used = convert(exactly(line.total.measured), line.total.unit, stock.unit);
  const left = exactlyNotNegative(stock.amount, 'stock').sub(used);
  const isShort = left.compare(0) < 0;
  return { unit: stock.unit, used: used.valueOf(), after: isShort ? 0 : left.valueOf(), short: isShort ? left.neg().valueOf() : 0 };
}

/** Sum of exact amounts of one unit, for a plan over several blocks. */
export const totalOf = (amounts: readonly Pick<Amount, 'exact'>[]): number => sumOf(amounts.map(({ exact }) => fromText(exact))).valueOf();
