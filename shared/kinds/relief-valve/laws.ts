import { orifice, smoothMax, smoothMin } from '../../numerics/smooth.ts';

/** Laws of the relief valve as plain functions; the kernel and the checks call them. SI throughout. */

/** Half width of the laminar zone [Pa], rounding of the wanted lift. */
export const LAMINAR = 1e5;
export const LIFT_ROUNDING = 0.01;

/** Cracking pressure of a valve set at `set` with an override (set − cracking)/cracking: set/(1 + override). */
export function crackingPressure(set: number, override: number): number {
  return set / (1 + override);
}

/** Flow coefficient at full lift, so that half lift at the set pressure passes the set flow. */
export function reliefCoefficient(setFlow: number, set: number): number {
  return (2 * setFlow) / orifice(1, set, LAMINAR);
}

/** Lift wanted at a pressure difference, 0 … 1, rounded at both ends. */
export function wantedLift(difference: number, threshold: number, forFullLift: number): number {
  return smoothMin(smoothMax((difference - threshold) / forFullLift, 0, LIFT_ROUNDING), 1, LIFT_ROUNDING);
}
