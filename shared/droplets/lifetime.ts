/**
 * Time in which a falling water droplet evaporates: d² / (80 ΔT) [amsden1962, from memory].
 * @param diameterUm µm @param deltaTC dry less wet bulb, °C, above 0
 * @returns seconds; Infinity in saturated air, NaN for unknown input
 */
export function dropletLifetimeS(diameterUm: number, deltaTC: number): number {
  if (!(diameterUm > 0) || !(deltaTC >= 0)) return NaN;
  return (diameterUm * diameterUm) / (80 * deltaTC);
}
