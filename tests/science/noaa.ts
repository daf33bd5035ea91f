/** The NOAA low-accuracy solar calculator, written again for the checks (formulas from memory: NOAA GML, after Meeus). */

const rad = Math.PI / 180;

/** Declination (degrees) and equation of time (minutes) at an instant. */
export function noaaSun(epochMs: number): { declinationDeg: number; equationOfTimeMin: number } {
  const t = (epochMs / 86_400_000 + 2_440_587.5 - 2_451_545) / 36_525;
  const l0 = 280.46646 + t * (36_000.76983 + 0.0003032 * t);
  const m = 357.52911 + t * (35_999.05029 - 0.0001537 * t);
  const e = 0.016708634 - t * (0.000042037 + 0.0000001267 * t);
  const c = (1.914602 - t * (0.004817 + 0.000014 * t)) * Math.sin(m * rad) + (0.019993 - 0.000101 * t) * Math.sin(2 * m * rad) + 0.000289 * Math.sin(3 * m * rad);
  const node = (125.04 - 1934.136 * t) * rad;
  const lambda = l0 + c - 0.00569 - 0.00478 * Math.sin(node);
  const epsilon = 23 + (26 + (21.448 - t * (46.815 + t * (0.00059 - 0.001813 * t))) / 60) / 60 + 0.00256 * Math.cos(node);
  const y = Math.tan((epsilon / 2) * rad) ** 2;
  const equation = y * Math.sin(2 * l0 * rad) - 2 * e * Math.sin(m * rad) + 4 * e * y * Math.sin(m * rad) * Math.cos(2 * l0 * rad) - 0.5 * y * y * Math.sin(4 * l0 * rad) - 1.25 * e * e * Math.sin(2 * m * rad);
  return { declinationDeg: Math.asin(Math.sin(epsilon * rad) * Math.sin(lambda * rad)) / rad, equationOfTimeMin: (4 * equation) / rad };
}

/** Instant at which the sun's centre rises through an altitude, near a first guess; null when it does not. */
export function noaaRiseMs(dayNoonMs: number, latitude: number, longitude: number, altitudeDeg: number): number | null {
  const dayMs = Math.floor(dayNoonMs / 86_400_000) * 86_400_000;
  let riseMs = dayNoonMs;
  for (let turn = 0; turn < 4; turn += 1) {
    const { declinationDeg, equationOfTimeMin } = noaaSun(riseMs);
    const cosine = (Math.sin(altitudeDeg * rad) - Math.sin(latitude * rad) * Math.sin(declinationDeg * rad)) / (Math.cos(latitude * rad) * Math.cos(declinationDeg * rad));
    if (Math.abs(cosine) > 1) return null;
    const minutes = 720 - 4 * (longitude + Math.acos(cosine) / rad) - equationOfTimeMin;
    const wanted = dayMs + minutes * 60_000;
    // The solar day meant is the one whose noon lies nearest to the given instant.
    riseMs = wanted + Math.round((dayNoonMs - (wanted + (Math.acos(cosine) / rad) * 240_000)) / 86_400_000) * 86_400_000;
  }
  return riseMs;
}
