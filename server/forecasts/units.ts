/** The quantities of a canonical hour and the units they are brought to. */
export type Quantity = 'temperatureC' | 'speedMs' | 'percent' | 'depthMm' | 'bearingDeg' | 'irradianceWm2';

type Conversion = (value: number) => number;
const same: Conversion = (value) => value;

/** Every spelling seen in real answers of the three providers, without its namespace. Definitions: 1 mile = 1609.344 m, 1 nautical mile = 1852 m, 1 inch = 25.4 mm. */
const conversions: Record<Quantity, Record<string, Conversion>> = {
  temperatureC: { degC: same, celsius: same, '°C': same, degF: (f) => (f - 32) / 1.8, '°F': (f) => (f - 32) / 1.8, K: (k) => k - 273.15 },
  speedMs: {
    'm/s': same,
    'm_s-1': same,
    'km/h': (kmh) => kmh / 3.6,
    'km_h-1': (kmh) => kmh / 3.6,
    kn: (kn) => (kn * 1852) / 3600,
    kt: (kn) => (kn * 1852) / 3600,
    'mp/h': (mph) => mph * 0.44704,
    'mi_h-1': (mph) => mph * 0.44704,
  },
  percent: { '%': same, percent: same },
  depthMm: { mm: same, m: (m) => m * 1000, cm: (cm) => cm * 10, inch: (inch) => inch * 25.4, in: (inch) => inch * 25.4 },
  bearingDeg: { 'degree_(angle)': same, degrees: same, '°': same },
  irradianceWm2: { 'W/m²': same },
};

/**
 * How to bring a value of `unit` to the canonical unit, or null when the unit is not told or not known: then the value
 * is not known either. Namespaces such as `wmoUnit:` and `unit:` are dropped, as the agencies change them.
 */
export function conversionFrom(quantity: Quantity, unit: string | null | undefined): Conversion | null {
  const name = unit?.slice(unit.lastIndexOf(':') + 1) ?? '';
  const known = conversions[quantity];
  return Object.hasOwn(known, name) ? (known[name] ?? null) : null;
}
