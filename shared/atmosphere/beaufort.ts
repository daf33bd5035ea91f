/** Upper edge of each force in m/s, as the tables print it [beaufort]; forces 5 to 12 by v = 0.836 B^1.5, from memory (WMO). */
const upperMs = [0.2, 1.5, 3.3, 5.4, 7.9, 10.7, 13.8, 17.1, 20.7, 24.4, 28.4, 32.6] as const;

/** What the land shows at the forces that matter to spray work [beaufort]. */
export const beaufortSigns = ['smoke goes straight up', 'smoke drifts, the vane stays still', 'wind felt on the face, leaves rustle', 'leaves and twigs in constant motion', 'dust and paper lift, small branches move'] as const;

/**
 * Beaufort force of a 10 m wind.
 * @param windMs m/s, 0 or more
 * @returns 0–12; NaN for a negative or unknown wind
 */
export function beaufortForce(windMs: number): number {
  if (!(windMs >= 0)) return NaN;
  const rounded = Math.round(windMs * 10) / 10;
  const force = upperMs.findIndex((edge) => rounded <= edge);
  return force === -1 ? 12 : force;
}
