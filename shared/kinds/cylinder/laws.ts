import { smoothSign, smoothSignSlope, smoothStep, smoothStepSlope } from '../../numerics/smooth.ts';

/** Laws of the double-acting cylinder as plain functions; `prepare`, the kernel and the checks call them. SI throughout. */

/** Standard gravity [m/s²]. */
export const GRAVITY = 9.80665;
/** Speed of the Stribeck fall and of the rounded sign [m/s]. */
export const STRIBECK_SPEED = 0.02;
export const SIGN_SPEED = 2e-3;

/** Piston area [m²] from the bore. */
export function capArea(bore: number): number {
  return (Math.PI * bore * bore) / 4;
}

/** Ring area on the rod side [m²]. */
export function rodSideArea(bore: number, rod: number): number {
  return (Math.PI * (bore * bore - rod * rod)) / 4;
}

/** Hydraulic force that pushes the rod out [N]: pA·AA − pB·AB. */
export function hydraulicForce(cap: number, rodSide: number, areaA: number, areaB: number): number {
  return cap * areaA - rodSide * areaB;
}

/** Friction against the motion [N]: (Fc + (Fs − Fc)/(1 + (v/vs)²))·sign(v/vt) + b·v. */
export function friction(v: number, coulomb: number, stiction: number, viscous: number): number {
  const r = v / STRIBECK_SPEED;
  return (coulomb + (stiction - coulomb) / (1 + r * r)) * smoothSign(v / SIGN_SPEED) + viscous * v;
}

/** d(friction)/dv [N·s/m]. */
export function frictionSlope(v: number, coulomb: number, stiction: number, viscous: number): number {
  const r = v / STRIBECK_SPEED;
  const q = 1 + r * r;
  const size = coulomb + (stiction - coulomb) / q;
  const sizeSlope = (-(stiction - coulomb) * 2 * r) / (q * q * STRIBECK_SPEED);
  return sizeSlope * smoothSign(v / SIGN_SPEED) + (size * smoothSignSlope(v / SIGN_SPEED)) / SIGN_SPEED + viscous;
}

/** Share of the full work force at a position: ((x − contact)/(full − contact))^shape, 0 before contact. */
export function workShare(x: number, contact: number, travel: number, shape: number): number {
  const z = (x - contact) / travel;
  if (z <= 0) return 0;
  return shape === 1 ? z : shape === 2 ? z * z : z * z * z;
}

/** d(workShare)/dx [1/m]. */
export function workShareSlope(x: number, contact: number, travel: number, shape: number): number {
  const z = (x - contact) / travel;
  if (z <= 0) return 0;
  return (shape === 1 ? 1 : shape === 2 ? 2 * z : 3 * z * z) / travel;
}

/** Rod speed by which the work has let go when the rod goes back [m/s]. */
export const RELEASE_SPEED = 0.02;

/** Share of the work's force that is there at a rod speed: all of it while the rod pushes or stands, only the springback
 *  (0 … 1) once it goes back; smooth between 0 and −20 mm/s. */
export function workHold(v: number, springback: number): number {
  return springback + (1 - springback) * smoothStep(1 + v / RELEASE_SPEED);
}

/** d(workHold)/dv [s/m]. */
export function workHoldSlope(v: number, springback: number): number {
  return ((1 - springback) * smoothStepSlope(1 + v / RELEASE_SPEED)) / RELEASE_SPEED;
}
