import { power } from './elementary.ts';

/** Pressure of the standard atmosphere at sea level [Pa]. */
export const SEA_LEVEL = 101325;

/** Atmospheric pressure [Pa abs] at an altitude [m], from the standard atmosphere (ISO 2533): p0·(1 − 2.25577e-5·h)^5.25588.
 *  Exactly 101325 at sea level. */
export function atmosphericPressure(altitude: number): number {
  return SEA_LEVEL * power(1 - 2.25577e-5 * altitude, 5.25588);
}
