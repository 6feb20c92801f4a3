/** How large the embedded error of a step is against the tolerance. */

export interface ErrorScale {
  readonly size: number;
  /** States counted in the mean (those on which others depend). */
  readonly counted: number;
  readonly nominal: Float64Array;
  readonly tolerance: number;
  /** The relative part of a state's tolerance stops growing at this many nominal sizes. */
  readonly relativeLimit: number;
}

/** Root mean square over states of error/(rtol·(nominal + min(larger of |before| and |after|, limit·nominal))); NaN when
 *  something is not finite. */
export function errorNorm(scale: ErrorScale, error: Float64Array, before: Float64Array, after: Float64Array): number {
  const { size, nominal, tolerance, relativeLimit } = scale;
  let sum = 0;
  for (let i = 0; i < size; i++) {
    const one = nominal[i]!;
    const share = error[i]! / (tolerance * (one + Math.min(Math.max(Math.abs(before[i]!), Math.abs(after[i]!)), relativeLimit * one)));
    sum += share * share;
  }
  return Math.sqrt(sum / scale.counted);
}

/** State with the largest share of the error norm, or the first that is not finite; −1 for a system without states. */
export function worstState(scale: ErrorScale, error: Float64Array, before: Float64Array, after: Float64Array): number {
  let worst = -1;
  let most = -1;
  for (let i = 0; i < scale.size; i++) {
    const share = Math.abs(error[i]!) / (scale.nominal[i]! + Math.max(Math.abs(before[i]!), Math.abs(after[i]!)));
    if (!Number.isFinite(share)) return i;
    if (share > most) {
      most = share;
      worst = i;
    }
  }
  return worst;
}
