import { acresToHa, celsiusSpanToF, celsiusToF, fahrenheitSpanToC, fahrenheitToC, feetToM, gallonsPerAcreToLHa, gallonsToL, hectaresToAcres, inchesToMm, litresPerHaToGallonsPerAcre, litresToGallons, metresToFeet, millimetresToInches, mphToMs, msToMph, type UnitSystem } from '../../shared/units/units.ts';

/** Kinds of number that people read and type in units of their own; all but the last are kept in SI. */
export type Quantity = 'speed' | 'temperature' | 'temperatureSpan' | 'area' | 'volume' | 'carrier' | 'distance' | 'height' | 'rain' | 'position' | 'plain';

interface Unit {
  /** As written beside the number. */
  name: string;
  /** Decimals where significant digits would say too much. */
  decimals?: number;
  fromSi: (value: number) => number;
  toSi: (value: number) => number;
}

const same = (value: number): number => value;
const plain: Unit = { name: '', fromSi: same, toSi: same };
const degrees: Unit = { name: '°', decimals: 5, fromSi: same, toSi: same };
const si = (name: string): Unit => ({ name, fromSi: same, toSi: same });

/** The unit of each quantity for each choice of units. */
export const unitsOf: Record<Quantity, Record<UnitSystem, Unit>> = {
  speed: { us: { name: 'mph', fromSi: msToMph, toSi: mphToMs }, metric: si('m/s') },
  temperature: { us: { name: '°F', fromSi: celsiusToF, toSi: fahrenheitToC }, metric: si('°C') },
  temperatureSpan: { us: { name: '°F', fromSi: celsiusSpanToF, toSi: fahrenheitSpanToC }, metric: si('°C') },
  area: { us: { name: 'acres', fromSi: hectaresToAcres, toSi: acresToHa }, metric: si('ha') },
  volume: { us: { name: 'gal', fromSi: litresToGallons, toSi: gallonsToL }, metric: si('L') },
  carrier: { us: { name: 'gal/acre', fromSi: litresPerHaToGallonsPerAcre, toSi: gallonsPerAcreToLHa }, metric: si('L/ha') },
  distance: { us: { name: 'ft', fromSi: metresToFeet, toSi: feetToM }, metric: si('m') },
  height: { us: { name: 'ft', fromSi: metresToFeet, toSi: feetToM }, metric: si('m') },
  rain: { us: { name: 'in', decimals: 3, fromSi: millimetresToInches, toSi: inchesToMm }, metric: si('mm') },
  /** Degrees of latitude or longitude; five decimals are about a metre. */
  position: { us: degrees, metric: degrees },
  plain: { us: plain, metric: plain },
};

const significantDigits = 4;

/** A number as text to type over: at most four significant digits (or the unit's decimals), whole above a thousand, no trailing zeros. */
export function asTyped(value: number, decimals?: number): string {
  if (!Number.isFinite(value)) return '';
  if (decimals !== undefined) return String(Number(value.toFixed(decimals)));
  if (Math.abs(value) >= 1000) return String(Math.round(value));
  return String(Number(value.toPrecision(significantDigits)));
}

/**
 * Reads a typed number. A comma is taken for a decimal comma, except where it parts thousands (`1,200`) in US use.
 * @returns the number; null for nothing typed; NaN for what is no number
 */
export function readNumber(text: string, units: UnitSystem): number | null {
  const trimmed = text.trim().replace('−', '-');
  if (trimmed === '') return null;
  const thousands = units === 'us' && /^-?[1-9]\d{0,2}(,\d{3})+(\.\d+)?$/.test(trimmed);
  const pointed = thousands ? trimmed.replaceAll(',', '') : trimmed.replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(pointed) ? Number(pointed) : Number.NaN;
}

const writtenUnits: readonly [RegExp, Quantity, number][] = [
  [/([−-]?\d[\d   ]*(?:\.\d+)?) m\/s(?!\w)/g, 'speed', 1],
  [/([−-]?\d[\d   ]*(?:\.\d+)?) °C(?!\w)/g, 'temperature', 1],
  [/([−-]?\d[\d   ]*(?:\.\d+)?) L\/ha(?!\w)/g, 'carrier', 1],
  [/([−-]?\d[\d   ]*(?:\.\d+)?) ha(?!\w)/g, 'area', 1],
  [/([−-]?\d[\d   ]*(?:\.\d+)?) L(?![\w/])/g, 'volume', 1],
  [/([−-]?\d[\d   ]*(?:\.\d+)?) km(?!\w)/g, 'distance', 1000],
  [/([−-]?\d[\d   ]*(?:\.\d+)?) m(?![\w/])/g, 'distance', 1],
];

/** Brings the figures of a sentence about a field (`must be at most 30 m/s`) to the person's units. */
export function inOwnUnits(sentence: string, units: UnitSystem, quantity: Quantity = 'plain'): string {
  if (units === 'metric') return sentence;
  return writtenUnits.reduce((text, [pattern, written, factor]) => {
    const { name, fromSi } = unitsOf[written === 'temperature' && quantity === 'temperatureSpan' ? quantity : written].us;
    return text.replace(pattern, (_, figure: string) => {
      const value = Number(figure.replace('−', '-').replace(/[\s  ]/g, '')) * factor;
      return `${asTyped(fromSi(value)).replace('-', '−')} ${name}`;
    });
  }, sentence);
}

/** A stored value with its unit, in the person's units: `10 mph`; a dash when there is none. */
export function quantityText(value: number | null, quantity: Quantity, units: UnitSystem): string {
  if (value === null) return '—';
  const { name, fromSi, decimals } = unitsOf[quantity][units];
  const figure = fromSi(value);
  return `${Number(decimals === undefined ? figure.toPrecision(3) : figure.toFixed(decimals))}${name === '' ? '' : ` ${name}`}`;
}

/** `1 to 10 mph`, `at most 20 mph`, or nothing. */
export function rangeText(low: number | null, high: number | null, quantity: Quantity, units: UnitSystem): string {
  if (low === null) return high === null ? '' : `at most ${quantityText(high, quantity, units)}`;
  if (high === null) return `at least ${quantityText(low, quantity, units)}`;
  return `${quantityText(low, quantity, units).split(' ')[0]} to ${quantityText(high, quantity, units)}`;
}
