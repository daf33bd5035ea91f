/**
 * Exact unit conversions. Inside Dawnvane every value is SI (m/s, °C, mm, m, L, kg); people type and read US or metric.
 * Source: exact definitions of the international foot, pound and US gallon (NIST Handbook 44, SP 811).
 */

export type UnitSystem = 'us' | 'metric';

/** Metres per second in one mile per hour. */
export const msPerMph = 0.44704;
/** Metres per second in one knot. */
export const msPerKnot = 1852 / 3600;
export const metresPerFoot = 0.3048;
export const metresPerMile = 1609.344;
export const millimetresPerInch = 25.4;
export const litresPerGallon = 3.785411784;
export const millilitresPerFluidOunce = 29.5735295625;
export const gramsPerPound = 453.59237;
export const gramsPerOunce = 28.349523125;
export const hectaresPerAcre = 0.40468564224;
export const squareFeetPerAcre = 43_560;

export const mphToMs = (mph: number): number => mph * msPerMph;
export const msToMph = (ms: number): number => ms / msPerMph;
export const knotsToMs = (knots: number): number => knots * msPerKnot;
export const msToKnots = (ms: number): number => ms / msPerKnot;
export const kmhToMs = (kmh: number): number => kmh / 3.6;
export const msToKmh = (ms: number): number => ms * 3.6;

export const fahrenheitToC = (fahrenheit: number): number => (fahrenheit - 32) / 1.8;
export const celsiusToF = (celsius: number): number => celsius * 1.8 + 32;
/** A temperature DIFFERENCE in °F as °C. */
export const fahrenheitSpanToC = (spanF: number): number => spanF / 1.8;
/** A temperature DIFFERENCE in °C as °F. */
export const celsiusSpanToF = (spanC: number): number => spanC * 1.8;

export const feetToM = (feet: number): number => feet * metresPerFoot;
export const metresToFeet = (metres: number): number => metres / metresPerFoot;
export const inchesToMm = (inches: number): number => inches * millimetresPerInch;
export const millimetresToInches = (millimetres: number): number => millimetres / millimetresPerInch;

export const acresToHa = (acres: number): number => acres * hectaresPerAcre;
export const hectaresToAcres = (hectares: number): number => hectares / hectaresPerAcre;
export const gallonsToL = (gallons: number): number => gallons * litresPerGallon;
export const litresToGallons = (litres: number): number => litres / litresPerGallon;
export const fluidOuncesToMl = (ounces: number): number => ounces * millilitresPerFluidOunce;
export const millilitresToFluidOunces = (millilitres: number): number => millilitres / millilitresPerFluidOunce;
export const poundsToKg = (pounds: number): number => (pounds * gramsPerPound) / 1000;
export const kilogramsToPounds = (kilograms: number): number => (kilograms * 1000) / gramsPerPound;

/** Gallons per acre as litres per hectare. */
export const gallonsPerAcreToLHa = (gallonsPerAcre: number): number => (gallonsPerAcre * litresPerGallon) / hectaresPerAcre;
export const litresPerHaToGallonsPerAcre = (litresPerHa: number): number => (litresPerHa * hectaresPerAcre) / litresPerGallon;
/** Fluid ounces per acre as millilitres per hectare. */
export const fluidOuncesPerAcreToMlHa = (ounces: number): number => (ounces * millilitresPerFluidOunce) / hectaresPerAcre;
/** Pounds per acre as kilograms per hectare. */
export const poundsPerAcreToKgHa = (pounds: number): number => (pounds * gramsPerPound) / 1000 / hectaresPerAcre;
/** Ounces (weight) per acre as grams per hectare. */
export const ouncesPerAcreToGHa = (ounces: number): number => (ounces * gramsPerOunce) / hectaresPerAcre;
