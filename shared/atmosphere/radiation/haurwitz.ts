/**
 * Clear-sky solar radiation on the level [haurwitz1945]: 1098 cos Z exp(−0.059 / cos Z).
 * @param sunAltitudeDeg apparent altitude, degrees
 * @returns W/m²; 0 with the sun at or below the horizon, NaN for an unknown altitude
 */
export function clearSkyHaurwitzWm2(sunAltitudeDeg: number): number {
  if (sunAltitudeDeg <= 0) return 0;
  const cosZenith = Math.sin((sunAltitudeDeg * Math.PI) / 180);
  return 1098 * cosZenith * Math.exp(-0.059 / cosZenith);
}
