/** Natural logarithm, exponential and sine from + − × ÷ only: hosts may round their own Math.log, exp and sin differently,
 *  and a run must give the same bits everywhere. Used once per run, never in kernels. Accurate to about 1e-15 relative. */

const LN2 = Math.LN2;

/** ln x for x > 0; NaN otherwise. ln 1 is exactly 0. */
export function naturalLog(x: number): number {
  if (!(x > 0) || x === Number.POSITIVE_INFINITY) return Number.NaN;
  let mantissa = x;
  let halvings = 0;
  while (mantissa > Math.SQRT2) {
    mantissa /= 2;
    halvings += 1;
  }
  while (mantissa < Math.SQRT1_2) {
    mantissa *= 2;
    halvings -= 1;
  }
  const z = (mantissa - 1) / (mantissa + 1);
  const square = z * z;
  let sum = 0;
  for (let k = 41; k >= 1; k -= 2) sum = sum * square + 1 / k;
  return 2 * z * sum + halvings * LN2;
}

/** e^x for |x| < 700. e^0 is exactly 1. */
export function exponential(x: number): number {
  const turns = Math.floor(x / LN2 + 0.5);
  const rest = x - turns * LN2;
  let sum = 1;
  for (let k = 24; k >= 1; k -= 1) sum = 1 + (rest / k) * sum;
  let scale = 1;
  for (let k = 0; k < Math.abs(turns); k += 1) scale *= 2;
  return turns >= 0 ? sum * scale : sum / scale;
}

/** x to the power y for x > 0. */
export function power(x: number, y: number): number {
  return exponential(y * naturalLog(x));
}

/** sin x for |x| ≤ 2π [rad]. */
export function sine(x: number): number {
  const square = x * x;
  let sum = 1;
  for (let k = 20; k >= 1; k -= 1) sum = 1 - (square / (2 * k * (2 * k + 1))) * sum;
  return x * sum;
}
