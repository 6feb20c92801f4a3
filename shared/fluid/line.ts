/** Lines: area, loss coefficients and wall compliance. Used once per run, when the circuit is compiled. */

/** Young's modulus [Pa] and Poisson's ratio of steel tube. */
export const STEEL_MODULUS = 207e9;
export const STEEL_POISSON = 0.3;
/** Friction factor of the quadratic part. With the laminar part beside it the sum is within 15 % of the smooth-pipe value
 *  above Re 4000, about 30 % high at Re 1000 and up to 60 % high near Re 2000, where real lines scatter most. */
export const QUADRATIC_FRICTION = 0.02;

export function boreArea(bore: number): number {
  return (Math.PI * bore * bore) / 4;
}

/** Volume [m³] of a line from its length and bore [m]. */
export function lineVolume(length: number, bore: number): number {
  return length * boreArea(bore);
}

export interface LineLoss {
  /** Laminar part [Pa·s/m³] and quadratic part [Pa·s²/m⁶] of d = Rl·Q + Rq·Q·|Q|. */
  readonly laminar: number;
  readonly quadratic: number;
}

/** Loss coefficients of a straight line. Rl = 128·μ·L/(π·d⁴) (f = 64/Re), Rq = f·(L/d)·ρ/(2·A²).
 *  length, bore [m]; density [kg/m³]; viscosity dynamic [Pa·s]. Reference sheet H1–H5, H10. */
export function lineLoss(length: number, bore: number, density: number, viscosity: number): LineLoss {
  const area = boreArea(bore);
  return {
    laminar: (128 * viscosity * length) / (Math.PI * bore * bore * bore * bore),
    quadratic: (QUADRATIC_FRICTION * (length / bore) * density) / (2 * area * area),
  };
}

/** Compliance 1/Bc [1/Pa] of a thick steel tube: (2/E)·((do² + d²)/(do² − d²) + ν). bore, wall [m]. Reference sheet B10. */
export function tubeCompliance(bore: number, wall: number): number {
  const outer = bore + 2 * wall;
  const outside = outer * outer;
  const inside = bore * bore;
  return (2 / STEEL_MODULUS) * ((outside + inside) / (outside - inside) + STEEL_POISSON);
}
