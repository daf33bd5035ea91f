/** Published: Haurwitz 1945, values as in the pvlib tests; Kasten & Czeplak 1980, formula from memory, values computed. */
import { describe, expect, it } from 'vitest';
import { clearSkyHaurwitzWm2 } from '../../shared/atmosphere/radiation/haurwitz.ts';
import { radiationUnderCloudWm2 } from '../../shared/atmosphere/radiation/kasten-czeplak.ts';

describe('Haurwitz clear sky (published, as in the pvlib tests)', () => {
  it.each([
    [-20, 0],
    [0, 0],
    [5, 48.63],
    [10, 135.742],
    [30, 487.894],
    [50, 778.767],
    [90, 1035.092],
  ])('the sun at %s° gives %s W/m²', (altitude, radiation) => {
    expect(clearSkyHaurwitzWm2(altitude)).toBeCloseTo(radiation, 2);
  });
});

describe('Kasten & Czeplak under cloud (formula from memory, values computed)', () => {
  it.each([
    [10, [128, 118.9, 91.9, 32]],
    [20, [281.2, 261.3, 201.9, 70.3]],
    [30, [425, 394.8, 305.1, 106.2]],
  ])('the sun at %s° under 0, 4, 6 and 8 eighths', (altitude, radiation) => {
    for (const [index, eighths] of [0, 4, 6, 8].entries()) expect(radiationUnderCloudWm2(altitude as number, eighths * 12.5)).toBeCloseTo((radiation as number[])[index]!, 0);
  });

  it('is dark below the horizon, and unknown without cloud by day', () => {
    expect(radiationUnderCloudWm2(-3, 50)).toBe(0);
    expect(radiationUnderCloudWm2(-3, NaN)).toBe(0);
    expect(radiationUnderCloudWm2(20, NaN)).toBeNaN();
  });
});
