/** Weights of the evidence for an inversion, on the logit. Set by hand from the energy balance of the ground. */
export const weights = {
  base: 0.2,
  /** Long-wave loss of the ground under a clear sky, W/m². */
  clearSkyLossWm2: 75,
  cloudShielding: 0.8,
  cloudWhenUnknown: 0.5,
  /** Share of sunlight that short grass absorbs (albedo 0.23, FAO-56 eq. 38). */
  absorbed: 0.77,
  perNetWm2: -0.028,
  windMiddleMs: 2.5,
  perWindMs: -0.45,
  perRiseC: -0.35,
  perNightWindMs: -0.2,
  perNightCloud: -0.8,
  dew: 0.4,
  perAloftC: 0.9,
  exposure: { open: 0, sheltered: 0.3, valleyFloor: 0.7, hilltop: -0.7 },
} as const;
