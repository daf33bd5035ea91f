/**
 * Solar radiation under cloud [kastenCzeplak1980]: (910 sin h − 30) (1 − 0.75 (N/8)^3.4).
 * @param sunAltitudeDeg degrees @param cloudCoverPct total cloud, 0–100 %
 * @returns W/m², at least 0; NaN when a value is unknown
 */
export function radiationUnderCloudWm2(sunAltitudeDeg: number, cloudCoverPct: number): number {
  if (Number.isNaN(cloudCoverPct)) return sunAltitudeDeg <= 0 ? 0 : NaN;
  const clear = 910 * Math.sin((sunAltitudeDeg * Math.PI) / 180) - 30;
  return clear <= 0 ? 0 : clear * (1 - 0.75 * (cloudCoverPct / 100) ** 3.4);
}
