/** Published: FAO-56 (Allen, Pereira, Raes, Smith 1998), worked examples. Examples 6 and 19 are recalled from memory and reproduced by the formulas. */
import { describe, expect, it } from 'vitest';
import { dewPointC, dewPointFromHumidityC, relativeHumidityPct } from '../../shared/atmosphere/humidity.ts';
import { psychrometricConstantKpaC, stationPressureKpa } from '../../shared/atmosphere/pressure.ts';
import * as extraterrestrial from '../../shared/atmosphere/radiation/extraterrestrial.ts';
import * as surface from '../../shared/atmosphere/radiation/surface.ts';
import { meanSaturationVapourPressureKpa, saturationSlopeKpaC, saturationVapourPressureKpa } from '../../shared/atmosphere/saturation-vapour-pressure.ts';
import { meanVapourPressureKpa, vapourPressureFromHumidityKpa, vapourPressureFromPsychrometerKpa } from '../../shared/atmosphere/vapour-pressure.ts';
import { windAt2mMs, windAtHeightMs, windProfileFactor } from '../../shared/atmosphere/wind-profile.ts';

const near = (got: number, wanted: number, tolerance: number): void => expect(Math.abs(got - wanted), `${got} against ${wanted} ± ${tolerance}`).toBeLessThanOrEqual(tolerance);

describe('FAO-56 worked examples (published answers)', () => {
  it('example 2: pressure and psychrometric constant at 1800 m', () => {
    near(stationPressureKpa(1800), 81.8, 0.05);
    near(psychrometricConstantKpaC(stationPressureKpa(1800)), 0.054, 0.0005);
  });

  it('example 3: mean saturation vapour pressure of 24.5 and 15 °C', () => {
    near(saturationVapourPressureKpa(24.5), 3.075, 0.001);
    near(saturationVapourPressureKpa(15), 1.705, 0.001);
    near(meanSaturationVapourPressureKpa(24.5, 15), 2.39, 0.001);
  });

  it('example 4: vapour pressure from an aspirated psychrometer at 1200 m', () => {
    const pressureKpa = stationPressureKpa(1200);
    near(pressureKpa, 87.9, 0.05);
    near(saturationVapourPressureKpa(19.5), 2.267, 0.005);
    const vapourKpa = vapourPressureFromPsychrometerKpa(25.6, 19.5, pressureKpa);
    near(vapourKpa, 1.91, 0.005);
    near(dewPointC(vapourKpa), 16.77, 0.02);
    near((100 * vapourKpa) / saturationVapourPressureKpa(25.6), 58.2, 0.1);
  });

  it('examples 5 and 6: vapour pressure and deficit from extremes of temperature and humidity', () => {
    const vapourKpa = meanVapourPressureKpa(18, 82, 25, 54);
    near(vapourKpa, 1.7, 0.005);
    near(meanSaturationVapourPressureKpa(25, 18) - vapourKpa, 0.91, 0.01);
  });

  it('example 8: extraterrestrial radiation at 20° S on day 246', () => {
    near(extraterrestrial.inverseDistance(246), 0.985, 0.0005);
    near(extraterrestrial.declinationRad(246), 0.12, 0.0005);
    near(extraterrestrial.sunsetHourAngleRad(-20, 246), 1.527, 0.0005);
    near(extraterrestrial.extraterrestrialDailyMjM2(-20, 246), 32.2, 0.05);
  });

  it('example 9: daylight hours at 20° S on day 246', () => {
    near(extraterrestrial.daylightHours(-20, 246), 11.7, 0.05);
  });

  it('example 10: solar radiation from 7.1 hours of sunshine at 22.9° S on day 135', () => {
    const ra = extraterrestrial.extraterrestrialDailyMjM2(-22.9, 135);
    const daylight = extraterrestrial.daylightHours(-22.9, 135);
    near(ra, 25.1, 0.05);
    near(daylight, 10.9, 0.05);
    near(surface.solarRadiationFromSunshine(7.1, daylight, ra), 14.5, 0.05);
    near(surface.clearSkyRadiation(ra, 0), 18.8, 0.05);
  });

  it('examples 11 and 12: net longwave and net radiation', () => {
    const longwave = surface.netLongwaveDailyMjM2(25.1, 19.1, 2.1, 14.5 / 18.8);
    near(longwave, 3.5, 0.05);
    near(surface.netShortwave(14.46), 11.1, 0.05);
    near(surface.netShortwave(14.46) - longwave, 7.6, 0.05);
  });

  it('example 14: 3.2 m/s at 10 m is 2.4 m/s at 2 m', () => {
    near(windAt2mMs(3.2, 10), 2.4, 0.05);
    near(windAtHeightMs(3.2, 10, 2), 2.3934, 0.002);
  });

  it('example 15: solar radiation from the temperature range, inland', () => {
    near(surface.solarRadiationFromTemperatures(26.6, 14.8, 40.6), 22.3, 0.05);
  });

  it('example 18: the radiation of Uccle, 50.8° N, 6 July', () => {
    const ra = extraterrestrial.extraterrestrialDailyMjM2(50.8, 187);
    near(ra, 41.09, 0.02);
    const daylight = extraterrestrial.daylightHours(50.8, 187);
    near(daylight, 16.1, 0.02);
    const solar = surface.solarRadiationFromSunshine(9.25, daylight, ra);
    near(solar, 22.07, 0.02);
    const clear = surface.clearSkyRadiation(ra, 100);
    near(clear, 30.9, 0.02);
    near(surface.netShortwave(solar), 17, 0.02);
    const longwave = surface.netLongwaveDailyMjM2(21.5, 12.3, 1.409, solar / clear);
    near(longwave, 3.71, 0.02);
    near(surface.netShortwave(solar) - longwave, 13.28, 0.02);
    near(windAt2mMs(2.78, 10), 2.078, 0.002);
  });

  it("example 19: an hour at N'Diaye, 1 October 14 to 15 h", () => {
    const middle = extraterrestrial.solarTimeAngleRad(14.5, 15, 16.25, 274);
    near(middle, 0.682, 0.002);
    const ra = extraterrestrial.extraterrestrialHourlyMjM2(16.217, 274, middle);
    near(ra, 3.543, 0.002);
    const clear = surface.clearSkyRadiation(ra, 8);
    near(clear, 2.658, 0.002);
    near(surface.netShortwave(2.45), 1.887, 0.002);
    const longwave = surface.netLongwaveHourlyMjM2(38, vapourPressureFromHumidityKpa(38, 52), 2.45 / clear);
    near(longwave, 0.137, 0.002);
    near(surface.netShortwave(2.45) - longwave, 1.749, 0.002);
  });
});

describe('FAO-56 tables', () => {
  const table23 = [0.657, 0.706, 0.758, 0.813, 0.872, 0.935, 1.002, 1.073, 1.148, 1.228, 1.313, 1.403, 1.498, 1.599, 1.705, 1.818, 1.938, 2.064, 2.197, 2.338, 2.487, 2.644, 2.809, 2.984, 3.168, 3.361, 3.565, 3.78, 4.006, 4.243, 4.493, 4.755, 5.03, 5.319, 5.623, 5.941, 6.275, 6.625, 6.991, 7.376];
  it.each(table23.map((kpa, index) => [index + 1, kpa]))('Annex 2, table 2.3: %s °C saturates at %s kPa', (temperatureC, kpa) => {
    near(saturationVapourPressureKpa(temperatureC!), kpa!, 0.0006);
  });

  it.each([
    [1, 0.0474],
    [10, 0.0823],
    [20, 0.1447],
    [25, 0.1887],
    [30, 0.2434],
    [30.2, 0.246],
  ])('Annex 2, table 2.4: the slope at %s °C is %s kPa/°C', (temperatureC, slope) => {
    near(saturationSlopeKpaC(temperatureC), slope, 0.0003);
  });

  it.each([
    [1, 1.178],
    [1.5, 1.066],
    [2, 1],
    [2.5, 0.955],
    [3, 0.921],
    [4, 0.872],
    [5, 0.838],
    [6, 0.812],
    [8, 0.775],
    [10, 0.748],
  ])('eq. 47: wind at %s m times %s is wind at 2 m', (heightM, factor) => {
    near(windAt2mMs(1, heightM), factor, 0.001);
    near(windProfileFactor(heightM, 2), factor, 0.001);
  });

  const days = [15, 105, 172, 196, 258, 349];
  it.each([
    [0, [36.16, 36.78, 33.37, 33.86, 37.23, 35.61]],
    [30, [21.08, 36.84, 41.16, 40.53, 33.33, 19.74]],
    [40, [15.01, 34.67, 41.87, 40.8, 29.92, 13.58]],
    [45, [11.93, 33.21, 41.91, 40.6, 27.87, 10.5]],
    [50, [8.89, 31.52, 41.78, 40.21, 25.61, 7.51]],
  ])('eq. 21 on the grid of days at %s° N', (latitude, radiation) => {
    for (const [index, day] of days.entries()) near(extraterrestrial.extraterrestrialDailyMjM2(latitude as number, day), (radiation as number[])[index]!, 0.01);
  });
});

describe('dew point and humidity', () => {
  it.each([
    [20, 50, 9.27],
    [10, 90, 8.44],
    [15, 80, 11.58],
    [30, 30, 10.53],
  ])('computed from eq. 11: %s °C and %s percent have their dew point at %s °C', (temperatureC, humidityPct, dewPoint) => {
    near(dewPointFromHumidityC(temperatureC, humidityPct), dewPoint, 0.01);
  });

  it('goes from dew point to humidity and back', () => {
    for (let temperatureC = -10; temperatureC <= 40; temperatureC += 5) {
      for (const humidityPct of [10, 30, 60, 95, 100]) near(relativeHumidityPct(temperatureC, dewPointFromHumidityC(temperatureC, humidityPct)), humidityPct, 1e-6);
    }
  });

  it('answers unknown outside its range, never a figure', () => {
    expect(saturationVapourPressureKpa(80)).toBeNaN();
    expect(dewPointC(0)).toBeNaN();
    expect(stationPressureKpa(9000)).toBeNaN();
    expect(windProfileFactor(10, 0.1)).toBeNaN();
  });
});
