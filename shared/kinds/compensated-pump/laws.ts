import { smoothMax, smoothMin, smoothStep } from '../../numerics/smooth.ts';

/** Laws of the pressure-compensated pump as plain functions; the kernel and the checks call them. SI throughout. */

/** Rounding of the stroke command, and of the change between the two lags (stroke fraction). */
export const STROKE_ROUNDING = 0.01;
/** Speed over which friction changes sign [rad/s]. */
export const FRICTION_SPEED = 2;
/** Inlet pressures at rated speed between which filling falls from 1 to 0 [Pa abs]. */
export const FULL_FILLING = 0.5e5;
export const NO_FILLING = 0.2e5;
/** Inlet pressure under which a warning is due [Pa abs]. */
export const INLET_WARNING = 0.8e5;

/** Ideal flow [m³/s] = stroke fraction × displacement [m³/rad] × speed [rad/s]. */
export function idealFlow(stroke: number, displacement: number, speed: number): number {
  return stroke * displacement * speed;
}

/** Ideal torque [N·m] = stroke fraction × displacement [m³/rad] × pressure difference [Pa]. */
export function idealTorque(stroke: number, displacement: number, difference: number): number {
  return stroke * displacement * difference;
}

/** Stroke that the compensator asks for at a pressure over the case drain [Pa], rounded at both stops. */
export function compensatorStroke(pressure: number, setting: number, band: number, least: number, most: number): number {
  return smoothMin(smoothMax((setting - pressure) / band, least, STROKE_ROUNDING), most, STROKE_ROUNDING);
}

/** Pressure at which destroking begins: setting − band × stop fraction [Pa]. */
export function kneePressure(setting: number, band: number, stopFraction: number): number {
  return setting - band * stopFraction;
}

export interface FrictionCoefficients {
  /** cV [N·m·s], Tc0 [N·m], kTp [-]. */
  readonly viscous: number;
  readonly coulomb: number;
  readonly pressure: number;
}

/** Where the plate efficiency is stated: pressure difference [Pa] and speed [rad/s]. */
export const EFFICIENCY_PRESSURE = 200e5;
export const EFFICIENCY_SPEED = 50 * Math.PI;

/** Friction coefficients that give the plate's torque efficiency at full stroke, 200 bar and 1500 rpm. The lost torque is
 *  shared 40 : 15 : 45 between viscous drag, a constant, and a share of ideal torque (common practice, no source). */
export function frictionFromEfficiency(displacement: number, efficiency: number): FrictionCoefficients {
  const ideal = idealTorque(1, displacement, EFFICIENCY_PRESSURE);
  const lost = ideal * (1 / efficiency - 1);
  return { viscous: (0.4 * lost) / EFFICIENCY_SPEED, coulomb: 0.15 * lost, pressure: (0.45 * lost) / ideal };
}

/** Friction torque against rotation without its sign [N·m], pressure and constant part. */
export function dryFriction(coulomb: number, pressureShare: number, displacement: number, difference: number): number {
  return coulomb + pressureShare * displacement * Math.abs(difference);
}

/** Filling 0 … 1 at an inlet pressure [Pa abs]; both limits go with the square of speed. */
export function filling(inlet: number, speed: number, ratedSpeed: number): number {
  return smoothStep(fillingArgument(inlet, speed, ratedSpeed));
}

/** Argument of the smooth step in `filling`; the small constant keeps it finite at standstill. */
export function fillingArgument(inlet: number, speed: number, ratedSpeed: number): number {
  const ratio = speed / ratedSpeed;
  return (inlet - NO_FILLING * ratio * ratio) / fillingSpan(speed, ratedSpeed);
}

export function fillingSpan(speed: number, ratedSpeed: number): number {
  const ratio = speed / ratedSpeed;
  return (FULL_FILLING - NO_FILLING) * ratio * ratio + 1e3;
}
