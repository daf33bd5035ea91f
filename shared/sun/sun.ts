import { getPosition, getTimes } from 'suncalc';

/** Refraction that suncalc adds at and below the horizon (Meeus eq. 16.4 at 0°), radians. */
const horizonRefractionRad = 0.0002967 / Math.tan(0.00312536 / 0.08901179);
const radPerDeg = Math.PI / 180;

/**
 * Altitude of the sun's centre WITHOUT refraction, as twilight and the radiation formulas mean it [meeus1998, ch. 25].
 * suncalc 2 answers in degrees WITH refraction; it is taken off again.
 * @param epochMs UTC instant, ms @param latitude °N @param longitude °E
 * @returns degrees, −90..90
 */
export function sunAltitudeDeg(epochMs: number, latitude: number, longitude: number): number {
  const apparent = getPosition(new Date(epochMs), latitude, longitude).altitude * radPerDeg;
  if (apparent <= horizonRefractionRad) return (apparent - horizonRefractionRad) / radPerDeg;
  let altitude = apparent;
  for (let turn = 0; turn < 6; turn += 1) {
    const at = Math.max(0, altitude);
    altitude = apparent - 0.0002967 / Math.tan(at + 0.00312536 / (at + 0.08901179));
  }
  return altitude / radPerDeg;
}

/** Azimuth of the sun, degrees clockwise from north. */
export const sunAzimuthDeg = (epochMs: number, latitude: number, longitude: number): number => getPosition(new Date(epochMs), latitude, longitude).azimuth;

/** Instants in epoch ms; null where the sun does not pass that altitude on that day (polar day or night). */
export interface SunTimes {
  /** Sun's centre at −6°, rising. */
  civilDawnMs: number | null;
  /** Sun's centre at −0.833° (34′ refraction, 16′ radius), rising; level horizon. */
  sunriseMs: number | null;
  solarNoonMs: number;
  sunsetMs: number | null;
  civilDuskMs: number | null;
}

/**
 * Sun times of the solar day whose noon is nearest to an instant [meeus1998, ch. 15].
 * @param nearMs any instant within 12 h of the solar noon wanted, epoch ms; local clock noon serves
 */
export function sunTimesNear(nearMs: number, latitude: number, longitude: number): SunTimes {
  const times = getTimes(new Date(nearMs), latitude, longitude);
  const ms = (date: Date | null): number | null => (date === null ? null : date.getTime());
  return { civilDawnMs: ms(times.dawn), sunriseMs: ms(times.sunrise), solarNoonMs: times.solarNoon.getTime(), sunsetMs: ms(times.sunset), civilDuskMs: ms(times.dusk) };
}
