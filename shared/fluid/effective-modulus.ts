/** Effective bulk modulus of oil with entrained free air, as in the reference cases:
 *    g(p)    = (pa + √(pa² + pc²))/2,  pa = p + patm            smooth positive absolute pressure
 *    va(p)   = χ·(patm/g)^(3/4)                                  air per volume of oil, polytropic exponent n = 4/3
 *    beta(p) = (1 + va)/(1/betaL + va/(n·g)) + betaCav
 *  The mixture form is the usual one (reference sheet B8, B9); betaCav keeps a cavity well posed. Square roots only. */

export const POLYTROPIC = 4 / 3;
/** Rounding of absolute pressure near zero [Pa], and the constant modulus of a cavity [Pa]. */
export const ZERO_ROUNDING = 2e3;
export const CAVITY_MODULUS = 2e4;

export interface OilModel {
  /** Modulus of the clean oil [Pa]. */
  readonly modulus: number;
  /** χ: free air per volume of oil at atmospheric pressure [-]. */
  readonly airFraction: number;
  /** Atmospheric pressure [Pa abs]. */
  readonly atmosphere: number;
}

function absolutePressure(p: number, oil: OilModel): number {
  const pa = p + oil.atmosphere;
  return (pa + Math.sqrt(pa * pa + ZERO_ROUNDING * ZERO_ROUNDING)) / 2;
}

/** Free air per volume of oil at a gauge pressure [Pa]. */
export function airVolume(p: number, oil: OilModel): number {
  const root = Math.sqrt(oil.atmosphere / absolutePressure(p, oil));
  return oil.airFraction * (root * Math.sqrt(root));
}

/** K(p) [Pa] at a gauge pressure [Pa]; `compliance` [1/Pa] of line walls is taken in series: 1/K = 1/beta + compliance. */
export function effectiveModulus(p: number, oil: OilModel, compliance = 0): number {
  const g = absolutePressure(p, oil);
  const va = airVolume(p, oil);
  const beta = (1 + va) / (1 / oil.modulus + va / (POLYTROPIC * g)) + CAVITY_MODULUS;
  return compliance === 0 ? beta : beta / (1 + beta * compliance);
}

/** dK/dp [-], exact. */
export function effectiveModulusSlope(p: number, oil: OilModel, compliance = 0): number {
  const pa = p + oil.atmosphere;
  const root = Math.sqrt(pa * pa + ZERO_ROUNDING * ZERO_ROUNDING);
  const g = (pa + root) / 2;
  const dg = g / root;
  const va = airVolume(p, oil);
  const dva = (-0.75 * va * dg) / g;
  const top = 1 + va;
  const bottom = 1 / oil.modulus + va / (POLYTROPIC * g);
  const dBottom = (dva * g - va * dg) / (POLYTROPIC * g * g);
  const slope = (dva * bottom - top * dBottom) / (bottom * bottom);
  if (compliance === 0) return slope;
  const beta = top / bottom + CAVITY_MODULUS;
  const series = 1 + beta * compliance;
  return slope / (series * series);
}
