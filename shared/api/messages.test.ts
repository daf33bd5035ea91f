import { describe, expect, it } from 'vitest';
import { productBody } from './plans.ts';
import { farmBody } from './farms.ts';
import { plainMessages } from './messages.ts';

const said = (schema: typeof farmBody | typeof productBody, value: object): Record<string, string> =>
  Object.fromEntries((schema.safeParse(value, { error: plainMessages }).error?.issues ?? []).map((issue) => [issue.path.join('.'), issue.message]));

describe('what is said of an entry', () => {
  it('asks for what is missing, by field', () => {
    expect(said(productBody, { name: 'x', rateUnit: 'lPerHa' })).toEqual({ rateMin: 'must be filled in', rateMax: 'must be filled in' });
  });

  it('says what kind of thing is wanted', () => {
    expect(said(productBody, { name: 3, rateMin: '2', rateMax: 4, rateUnit: 'cups', inversionProhibited: 'no' })).toEqual({
      name: 'must be text',
      rateMin: 'must be a number, such as 12.5',
      rateUnit: 'must be one of: flOzPerAcre, ozPerAcre, lbPerAcre, mLPerHa, gPerHa, lPerHa, kgPerHa',
      inversionProhibited: 'must be true or false',
    });
  });

  it('lets the contract speak where it has words of its own', () => {
    expect(said(farmBody, { name: 'x', latitude: 91, longitude: 0, elevationM: 0 })).toEqual({ latitude: 'must be at most 90' });
  });
});
