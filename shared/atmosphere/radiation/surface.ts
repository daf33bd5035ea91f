const stefanBoltzmannMjK4M2Day = 4.903e-9;
/** FAO-56 counts kelvin from −273.16 °C. */
const kelvin = (temperatureC: number): number => temperatureC + 273.16;

/** Solar radiation from sunshine hours [fao56, eq. 35], in the unit of `extraterrestrial`. */
export const solarRadiationFromSunshine = (sunshineH: number, daylightH: number, extraterrestrial: number): number => (0.25 + (0.5 * sunshineH) / daylightH) * extraterrestrial;

/** Clear-sky solar radiation from extraterrestrial radiation and elevation [fao56, eq. 37]; at sea level it is eq. 36. */
export const clearSkyRadiation = (extraterrestrial: number, elevationM: number): number => (0.75 + 2e-5 * elevationM) * extraterrestrial;

/** Net shortwave radiation of the grass reference [fao56, eq. 38]. */
export const netShortwave = (solar: number): number => 0.77 * solar;

/** Solar radiation from the day's temperature range [fao56, eq. 50]; coefficient 0.16 inland, 0.19 on the coast. */
export const solarRadiationFromTemperatures = (maxC: number, minC: number, extraterrestrial: number, coefficient = 0.16): number => coefficient * Math.sqrt(maxC - minC) * extraterrestrial;

/** Humidity and cloud factors of eq. 39; the ratio of solar to clear-sky radiation is at most 1. */
const longwaveFactors = (vapourPressureKpa: number, relativeShortwave: number): number => (0.34 - 0.14 * Math.sqrt(vapourPressureKpa)) * (1.35 * Math.min(1, relativeShortwave) - 0.35);

/** Net outgoing longwave radiation of a day, MJ/m² [fao56, eq. 39]. */
export const netLongwaveDailyMjM2 = (maxC: number, minC: number, vapourPressureKpa: number, relativeShortwave: number): number =>
  ((stefanBoltzmannMjK4M2Day * (kelvin(maxC) ** 4 + kelvin(minC) ** 4)) / 2) * longwaveFactors(vapourPressureKpa, relativeShortwave);

/** Net outgoing longwave radiation of an hour, MJ/m² [fao56, eq. 39 with σ/24]. */
export const netLongwaveHourlyMjM2 = (temperatureC: number, vapourPressureKpa: number, relativeShortwave: number): number =>
  (stefanBoltzmannMjK4M2Day / 24) * kelvin(temperatureC) ** 4 * longwaveFactors(vapourPressureKpa, relativeShortwave);
