/** Smooth forms of sign, clamp, step, orifice and line loss, each with its derivative.
 *  Only + − × ÷ and Math.sqrt, Math.abs, so that every host gives the same bits. Forms: the reference cases' page, "Functions". */

/** Smooth sign z/√(1+z²): −1 … 1, slope 1 at zero. */
export function smoothSign(z: number): number {
  return z / Math.sqrt(1 + z * z);
}

/** d smoothSign / dz = (1+z²)^(−3/2). */
export function smoothSignSlope(z: number): number {
  const q = 1 + z * z;
  return 1 / (q * Math.sqrt(q));
}

/** Smooth larger of a and b, rounded over about e (same unit as a and b). */
export function smoothMax(a: number, b: number, e: number): number {
  const d = a - b;
  return (a + b + Math.sqrt(d * d + e * e)) / 2;
}

/** d smoothMax / da. (d/db is 1 minus this.) Needs e > 0 or a ≠ b. */
export function smoothMaxSlope(a: number, b: number, e: number): number {
  const d = a - b;
  return (1 + d / Math.sqrt(d * d + e * e)) / 2;
}

/** Smooth smaller of a and b, rounded over about e. */
export function smoothMin(a: number, b: number, e: number): number {
  const d = a - b;
  return (a + b - Math.sqrt(d * d + e * e)) / 2;
}

/** d smoothMin / da. (d/db is 1 minus this.) Needs e > 0 or a ≠ b. */
export function smoothMinSlope(a: number, b: number, e: number): number {
  const d = a - b;
  return (1 - d / Math.sqrt(d * d + e * e)) / 2;
}

/** 0 for z ≤ 0, 1 for z ≥ 1, z²(3−2z) between. */
export function smoothStep(z: number): number {
  if (z <= 0) return 0;
  if (z >= 1) return 1;
  return z * z * (3 - 2 * z);
}

/** d smoothStep / dz. */
export function smoothStepSlope(z: number): number {
  if (z <= 0 || z >= 1) return 0;
  return 6 * z * (1 - z);
}

/** Flow through an orifice [m³/s]: k·d/(d²+dt²)^¼, which is k·√|d|·sign(d) away from zero and linear inside about ±dt.
 *  k [m³/s per √Pa] = Cd·A·√(2/ρ); d pressure difference [Pa]; dt > 0 half width of the laminar zone [Pa]. */
export function orifice(k: number, d: number, dt: number): number {
  return (k * d) / Math.sqrt(Math.sqrt(d * d + dt * dt));
}

/** d (orifice/k) / dd [√Pa/Pa]: multiply by k. */
export function orificeSlope(d: number, dt: number): number {
  const r = d * d + dt * dt;
  return (1 - (0.5 * d * d) / r) / Math.sqrt(Math.sqrt(r));
}

/** Flow through a line [m³/s] from its loss law d = rl·Q + rq·Q·|Q|, solved for Q.
 *  d pressure difference [Pa]; rl ≥ 0 [Pa·s/m³]; rq ≥ 0 [Pa·s²/m⁶]; rl must be above 0 for a finite slope at d = 0. */
export function lineFlow(rl: number, rq: number, d: number): number {
  const s = rl + Math.sqrt(rl * rl + 4 * rq * Math.abs(d));
  return s > 0 ? (2 * d) / s : 0;
}

/** d lineFlow / dd = 1/√(rl² + 4·rq·|d|) [m³/s per Pa]. */
export function lineFlowSlope(rl: number, rq: number, d: number): number {
  return 1 / Math.sqrt(rl * rl + 4 * rq * Math.abs(d));
}
