import { within } from './validity.ts';

export const pressureValidity = { elevationM: [-430, 6000] } as const;

/**
 * Mean station pressure from elevation [fao56, eq. 7].
 * @param elevationM above sea level, m
 * @returns kPa; NaN outside the validity
 */
export function stationPressureKpa(elevationM: number): number {
  if (!within(elevationM, pressureValidity.elevationM)) return NaN;
  return 101.3 * ((293 - 0.0065 * elevationM) / 293) ** 5.26;
}

/**
 * Psychrometric constant [fao56, eq. 8].
 * @param pressureKpa station pressure, kPa
 * @returns kPa/°C
 */
export const psychrometricConstantKpaC = (pressureKpa: number): number => 0.665e-3 * pressureKpa;
