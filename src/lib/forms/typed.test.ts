import { describe, expect, it } from 'vitest';
import { inOwnUnits, readNumber } from '../quantities.ts';
import { bodyFrom, typedFrom } from './typed.ts';

interface Body {
  name: string;
  areaHa: number;
  windMaxMs: number | null;
  products: { id: string; rate: number }[];
}
const numbers = { areaHa: 'area', windMaxMs: 'speed', 'products.*.rate': 'plain' } as const;
const stored: Body = { name: 'Brook rows', areaHa: 0.2428113851, windMaxMs: null, products: [{ id: 'a', rate: 3 }] };

describe('what a person types into a form', () => {
  it('is shown in the units of their choice', () => {
    expect(typedFrom(stored, numbers, 'us')).toEqual({ name: 'Brook rows', areaHa: '0.6', windMaxMs: '', products: [{ id: 'a', rate: '3' }] });
    expect(typedFrom(stored, numbers, 'metric').areaHa).toBe('0.2428');
  });

  it('is saved in SI', () => {
    const typed = { ...typedFrom(stored, numbers, 'us'), areaHa: '2', windMaxMs: '10' };
    expect(bodyFrom<Body>(typed, numbers, 'us', stored)).toMatchObject({ areaHa: 0.80937128448, windMaxMs: 4.4704 });
  });

  it('keeps a figure nobody touched to its last digit', () => {
    expect(bodyFrom<Body>(typedFrom(stored, numbers, 'metric'), numbers, 'metric', stored)).toEqual(stored);
  });

  it('stays as typed where it is no number, for the schema to name', () => {
    const typed = { ...typedFrom(stored, numbers, 'us'), areaHa: 'half' };
    expect(bodyFrom<Body>(typed, numbers, 'us', stored)).toMatchObject({ areaHa: 'half' });
  });

  it.each([
    ['12.5', 'us', 12.5],
    ['12,5', 'us', 12.5],
    ['1,200', 'us', 1200],
    ['1,200', 'metric', 1.2],
    ['0,850', 'us', 0.85],
    ['-123.1', 'us', -123.1],
    ['−3', 'metric', -3],
    ['', 'us', null],
    ['ten', 'us', Number.NaN],
    ['1e3', 'us', Number.NaN],
  ] as const)('reads %s in %s use as %s', (text, units, value) => {
    expect(readNumber(text, units)).toEqual(value);
  });

  it('is answered in the same units', () => {
    expect(inOwnUnits('must be at most 30 m/s', 'us')).toBe('must be at most 67.11 mph');
    expect(inOwnUnits('must be at most 10 000 L/ha', 'us')).toBe('must be at most 1069 gal/acre');
    expect(inOwnUnits('must be at least −40 °C', 'us')).toBe('must be at least −40 °F');
    expect(inOwnUnits('must be at most 30 °C', 'us', 'temperatureSpan')).toBe('must be at most 54 °F');
    expect(inOwnUnits('must be at most 1000 ha', 'metric')).toBe('must be at most 1000 ha');
  });
});
