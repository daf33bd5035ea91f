/** ASHRAE Fundamentals 2017 ch. 1, values as the psychrolib tests cite them; and a grid against the package psychrolib. */
import psychrolib from 'psychrolib';
import { describe, expect, it } from 'vitest';
import { stationPressureKpa } from '../../shared/atmosphere/pressure.ts';
import { saturationVapourPressureKpa } from '../../shared/atmosphere/saturation-vapour-pressure.ts';
import { deltaTC, wetBulbC } from '../../shared/atmosphere/wet-bulb.ts';
import { wetBulbStullC } from '../../shared/atmosphere/wet-bulb-stull.ts';

psychrolib.SetUnitSystem(psychrolib.SI);
const atHumidity = (temperatureC: number, humidityPct: number): number => (saturationVapourPressureKpa(temperatureC) * humidityPct) / 100;

describe('ASHRAE 2017 values (published, as in the psychrolib tests)', () => {
  it('7 °C at 61 % and 100 kPa has its wet bulb at 3.927 °C', () => {
    expect(wetBulbC(7, atHumidity(7, 61), 100)).toBeCloseTo(3.92667, 1);
  });

  it('30 °C with a humidity ratio of 0.0192281 at 95.461 kPa has its wet bulb at 25 °C', () => {
    const vapourKpa = (95.461 * 0.0192281) / (0.621945 + 0.0192281);
    expect(Math.abs(wetBulbC(30, vapourKpa, 95.461) - 25)).toBeLessThan(0.01);
  });

  it.each([
    [0, 101325],
    [500, 95461],
    [1000, 89875],
    [4000, 61640],
  ])('pressure at %s m is %s Pa, and the FAO-56 form (20 °C air column) within 1 percent of it', (elevationM, pascal) => {
    expect(Math.abs(stationPressureKpa(elevationM) * 1000 - pascal) / pascal).toBeLessThan(0.01);
  });

  it.each([
    [5, 872.6],
    [25, 3169.7],
    [50, 12351.3],
  ])('water saturates at %s °C at %s Pa, within 0.2 percent', (temperatureC, pascal) => {
    expect(Math.abs(saturationVapourPressureKpa(temperatureC) * 1000 - pascal) / pascal).toBeLessThan(0.002);
  });
});

describe('wet bulb against psychrolib (reference library)', () => {
  it('agrees within 0.01 °C over −2..35 °C, 20..100 % and three pressures, where the bulb is not ice', () => {
    let cases = 0;
    let worst = 0;
    for (let temperatureC = -2; temperatureC <= 35; temperatureC += 1) {
      for (let humidityPct = 20; humidityPct <= 100; humidityPct += 5) {
        for (const pressurePa of [101_325, 95_461, 84_000]) {
          const reference = psychrolib.GetTWetBulbFromRelHum(temperatureC, humidityPct / 100, pressurePa);
          if (reference <= 0.5) continue;
          cases += 1;
          worst = Math.max(worst, Math.abs(wetBulbC(temperatureC, atHumidity(temperatureC, humidityPct), pressurePa / 1000) - reference));
        }
      }
    }
    expect(cases).toBeGreaterThan(1500);
    expect(worst).toBeLessThan(0.01);
  });

  it.each([
    [5, 80, 1.412],
    [10, 40, 5.437],
    [10, 80, 1.71],
    [15, 80, 2.015],
    [20, 50, 6.217],
    [25, 50, 7.111],
    [30, 50, 7.995],
    [35, 40, 11.066],
  ])('Delta T at %s °C and %s percent is %s °C (computed with psychrolib 1.1.1)', (temperatureC, humidityPct, deltaT) => {
    expect(Math.abs(deltaTC(temperatureC, atHumidity(temperatureC, humidityPct), 101.325) - deltaT)).toBeLessThan(0.01);
  });

  it('falls with pressure: 20 °C and 50 % at 89.875 kPa give 13.491 °C', () => {
    expect(Math.abs(wetBulbC(20, atHumidity(20, 50), 89.875) - 13.491)).toBeLessThan(0.01);
  });

  it('answers unknown outside its validity, and the air temperature when saturated', () => {
    expect(wetBulbC(-20, 0.1, 101.3)).toBeNaN();
    expect(wetBulbC(20, NaN, 101.3)).toBeNaN();
    expect(wetBulbC(20, 1, 20)).toBeNaN();
    expect(wetBulbC(12, saturationVapourPressureKpa(12), 101.3)).toBe(12);
  });
});

describe("Stull's fit (Stull 2011), a check only", () => {
  it("gives the paper's example of 13.7 °C at 20 °C and 50 % (from memory)", () => {
    expect(wetBulbStullC(20, 50)).toBeCloseTo(13.699, 2);
  });

  it('is low in dawn air by as much as flips a Delta T of 2', () => {
    expect(10 - wetBulbStullC(10, 80)).toBeGreaterThan(2);
    expect(deltaTC(10, atHumidity(10, 80), 101.325)).toBeLessThan(2);
  });

  it('stays within 0.7 °C of the psychrometer equation where the paper holds', () => {
    for (let temperatureC = 5; temperatureC <= 35; temperatureC += 5) {
      for (const humidityPct of [20, 40, 60, 80, 95]) expect(Math.abs(wetBulbStullC(temperatureC, humidityPct) - wetBulbC(temperatureC, atHumidity(temperatureC, humidityPct), 101.325))).toBeLessThan(0.7);
    }
  });

  it('answers unknown outside its validity', () => {
    expect(wetBulbStullC(20, 3)).toBeNaN();
    expect(wetBulbStullC(60, 50)).toBeNaN();
  });
});
