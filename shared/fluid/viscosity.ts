import { exponential, naturalLog } from './elementary.ts';

/** Viscosity of mineral oil by the standard viscosity–temperature equation (ASTM D341, Walther):
 *  log10 log10(ν + 0.7) = A − B·log10 T, ν in mm²/s, T in kelvin.
 *  Points at 40 °C from ISO 3448 (mid-grade), at 100 °C typical of paraffinic oils (reference sheet V1–V3). */

export type Grade = 'VG 22' | 'VG 32' | 'VG 46' | 'VG 68';

interface Points {
  /** Kinematic viscosity at 40 °C and 100 °C [mm²/s]. */
  readonly at40: number;
  readonly at100: number;
}
export const gradePoints: Readonly<Record<Grade, Points>> = {
  'VG 22': { at40: 22, at100: 4.3 },
  'VG 32': { at40: 32, at100: 5.4 },
  'VG 46': { at40: 46, at100: 6.8 },
  'VG 68': { at40: 68, at100: 8.7 },
};

const LN10 = Math.LN10;
const T40 = 313.15;
const T100 = 373.15;

function doubleLog(viscosity: number): number {
  return naturalLog(naturalLog(viscosity + 0.7) / LN10) / LN10;
}

/** A and B of the viscosity–temperature equation through two points [mm²/s, K]. */
export function walther(first: number, firstTemperature: number, second: number, secondTemperature: number): { a: number; b: number } {
  const x1 = naturalLog(firstTemperature) / LN10;
  const x2 = naturalLog(secondTemperature) / LN10;
  const b = (doubleLog(first) - doubleLog(second)) / (x2 - x1);
  return { a: doubleLog(first) + b * x1, b };
}

/** Viscosity [mm²/s] from A, B at a temperature [K]. */
export function waltherViscosity(a: number, b: number, temperature: number): number {
  return exponential(LN10 * exponential(LN10 * (a - (b * naturalLog(temperature)) / LN10))) - 0.7;
}

/** Kinematic viscosity [m²/s] of an ISO VG grade at a temperature [K]. */
export function kinematicViscosity(grade: Grade, temperature: number): number {
  const { at40, at100 } = gradePoints[grade];
  const { a, b } = walther(at40, T40, at100, T100);
  return waltherViscosity(a, b, temperature) * 1e-6;
}
