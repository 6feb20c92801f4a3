import { naturalLog } from '../../fluid/elementary.ts';

/** Laws of the induction motor and its overload relay as plain functions; `prepare` and the checks call them. */

/** Synchronous speed [rad/s] of a number of poles at a frequency [Hz]: 4π·f/poles. */
export function synchronousSpeed(frequency: number, poles: number): number {
  return (4 * Math.PI * frequency) / poles;
}

/** Pull-out slip from the rated slip and b = pull-out ÷ rated torque, so that the Kloss curve passes through the plate point. */
export function pullOutSlip(ratedSlip: number, b: number): number {
  return ratedSlip * (b + Math.sqrt(b * b - 1));
}

/** Kloss: torque at slip s ÷ pull-out torque = 2·s·sk/(s² + sk²). */
export function klossRatio(slip: number, pullOut: number): number {
  return (2 * slip * pullOut) / (slip * slip + pullOut * pullOut);
}

export interface TorqueRatios {
  /** Locked-rotor, pull-up and pull-out torque ÷ rated torque. */
  readonly lockedRotor: number;
  readonly pullUp: number;
  readonly pullOut: number;
}

/** Least torques of a design N motor, per cent of rated: up to a rated power [W]; locked rotor, pull-up, pull-out.
 *  2 and 4 poles up to 16 kW: IEC design N as quoted by an engineering handbook; larger frames from memory.
 *  6 and 8 poles were not read: set a step lower, from memory. */
const minima: Readonly<Record<string, readonly (readonly [upTo: number, locked: number, pullUp: number, pullOut: number])[]>> = {
  '2': [
    [2500, 170, 110, 200],
    [4000, 160, 110, 200],
    [10000, 150, 100, 200],
    [Number.POSITIVE_INFINITY, 140, 100, 200],
  ],
  '4': [
    [2500, 180, 120, 200],
    [4000, 170, 120, 200],
    [10000, 160, 110, 200],
    [16000, 150, 110, 200],
    [25000, 150, 105, 200],
    [Number.POSITIVE_INFINITY, 140, 100, 200],
  ],
  '6': [
    [4000, 160, 110, 200],
    [10000, 150, 110, 200],
    [Number.POSITIVE_INFINITY, 140, 100, 200],
  ],
  '8': [
    [10000, 140, 100, 200],
    [Number.POSITIVE_INFINITY, 130, 100, 200],
  ],
};

export function designMinima(ratedPower: number, poles: string): TorqueRatios {
  const rows = minima[poles] ?? minima['4']!;
  const row = rows.find(([upTo]) => ratedPower <= upTo)!;
  return { lockedRotor: row[1] / 100, pullUp: row[2] / 100, pullOut: row[3] / 100 };
}

/** Factor k on the dial at which the relay trips in the end. Not the service factor. */
export function relayFactor(standard: string): number {
  return standard === 'NEMA' ? 1.25 : 1.15;
}

/** Time constant [s] of a relay that trips after t seconds at i times the dial: τ = t/ln(i²/(i² − k²)). */
export function relayTimeConstant(time: number, multiple: number, k: number): number {
  const square = multiple * multiple;
  return time / naturalLog(square / (square - k * k));
}

/** Middle of the IEC class band at 7.2 × dial; NEMA: the class itself at 6 × dial [s]. */
const iecMiddle: Readonly<Record<string, number>> = { '10': 7, '20': 13, '30': 20 };

export function classTimeConstant(standard: string, tripClass: string): number {
  if (standard === 'NEMA') return relayTimeConstant(Number(tripClass), 6, relayFactor('NEMA'));
  return relayTimeConstant(iecMiddle[tripClass] ?? 7, 7.2, relayFactor('IEC'));
}

/** Time to trip [s] at a steady current i (times the dial) from heat θ0; infinity where it never trips.
 *  t = τ·ln((i²/k² − θ0)/(i²/k² − 1)). */
export function tripTime(multiple: number, k: number, timeConstant: number, startHeat = 0): number {
  const target = (multiple / k) * (multiple / k);
  if (startHeat >= 1) return 0;
  if (target <= 1) return Number.POSITIVE_INFINITY;
  return timeConstant * naturalLog((target - startHeat) / (target - 1));
}

/** Single-phase torque ÷ pull-out torque at full voltage, for slip s and pull-out slip sk:
 *  2·sk·(1/s − 1/(2−s))/((sk/s + sk/(2−s))² + 4), written without the poles at s = 0 and 2. */
export function singlePhaseRatio(slip: number, pullOut: number): number {
  const q = slip * (2 - slip);
  return (pullOut * (1 - slip) * q) / (pullOut * pullOut + q * q);
}
