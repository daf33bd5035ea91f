const solarConstantMjM2Min = 0.082;

/** Inverse relative distance Earth–Sun [fao56, eq. 23]; `dayOfYear` 1–366. */
export const inverseDistance = (dayOfYear: number): number => 1 + 0.033 * Math.cos((2 * Math.PI * dayOfYear) / 365);

/** Solar declination, radians [fao56, eq. 24]. */
export const declinationRad = (dayOfYear: number): number => 0.409 * Math.sin((2 * Math.PI * dayOfYear) / 365 - 1.39);

/** Sunset hour angle, radians [fao56, eq. 25]; 0 in polar night, π in polar day. */
export function sunsetHourAngleRad(latitudeDeg: number, dayOfYear: number): number {
  const x = -Math.tan((latitudeDeg * Math.PI) / 180) * Math.tan(declinationRad(dayOfYear));
  return Math.acos(Math.max(-1, Math.min(1, x)));
}

/** Daylight hours [fao56, eq. 34]. */
export const daylightHours = (latitudeDeg: number, dayOfYear: number): number => (24 * sunsetHourAngleRad(latitudeDeg, dayOfYear)) / Math.PI;

/** Extraterrestrial radiation of a day, MJ/m² [fao56, eq. 21]. */
export function extraterrestrialDailyMjM2(latitudeDeg: number, dayOfYear: number): number {
  const phi = (latitudeDeg * Math.PI) / 180;
  const delta = declinationRad(dayOfYear);
  const ws = sunsetHourAngleRad(latitudeDeg, dayOfYear);
  return ((24 * 60) / Math.PI) * solarConstantMjM2Min * inverseDistance(dayOfYear) * (ws * Math.sin(phi) * Math.sin(delta) + Math.cos(phi) * Math.cos(delta) * Math.sin(ws));
}

/** Seasonal correction for solar time, hours [fao56, eqs. 32 and 33]. */
export function seasonalCorrectionH(dayOfYear: number): number {
  const b = (2 * Math.PI * (dayOfYear - 81)) / 364;
  return 0.1645 * Math.sin(2 * b) - 0.1255 * Math.cos(b) - 0.025 * Math.sin(b);
}

/**
 * Solar time angle at the middle of a period, radians [fao56, eq. 31].
 * @param midpointH standard clock time at the middle of the period, hours
 * @param zoneWestDeg longitude of the zone's centre, degrees WEST of Greenwich @param siteWestDeg of the site, degrees WEST
 */
export const solarTimeAngleRad = (midpointH: number, zoneWestDeg: number, siteWestDeg: number, dayOfYear: number): number =>
  (Math.PI / 12) * (midpointH + 0.06667 * (zoneWestDeg - siteWestDeg) + seasonalCorrectionH(dayOfYear) - 12);

/**
 * Extraterrestrial radiation of an hour or shorter period, MJ/m² per hour of it [fao56, eqs. 28–30].
 * @param middleRad solar time angle at the middle of the period @param periodH its length, hours
 */
export function extraterrestrialHourlyMjM2(latitudeDeg: number, dayOfYear: number, middleRad: number, periodH = 1): number {
  const phi = (latitudeDeg * Math.PI) / 180;
  const delta = declinationRad(dayOfYear);
  const ws = sunsetHourAngleRad(latitudeDeg, dayOfYear);
  const clip = (angle: number): number => Math.max(-ws, Math.min(ws, angle));
  const from = clip(middleRad - (Math.PI * periodH) / 24);
  const to = clip(middleRad + (Math.PI * periodH) / 24);
  const sum = (to - from) * Math.sin(phi) * Math.sin(delta) + Math.cos(phi) * Math.cos(delta) * (Math.sin(to) - Math.sin(from));
  return Math.max(0, ((12 * 60) / Math.PI) * solarConstantMjM2Min * inverseDistance(dayOfYear) * sum);
}
