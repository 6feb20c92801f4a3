/** Step-size control of the Rosenbrock method: from the embedded error and the step before. Square roots only. */

const SAFETY = 0.9;
const SHRINK_LIMIT = 0.2;
const GROWTH_LIMIT = 6;

function fourthRoot(x: number): number {
  return Math.sqrt(Math.sqrt(x));
}

/** Factor for the next step after an accepted one with error ≤ 1; `ratio` = step ÷ step before (0 when there is none), with
 *  the error of that one. No growth right after a rejection. */
export function factorAfterSuccess(error: number, ratio: number, errorBefore: number, rejectedBefore: boolean): number {
  let factor = SAFETY / fourthRoot(error);
  if (ratio > 0) {
    const predicted = SAFETY * ratio * fourthRoot(errorBefore / (error * error));
    if (predicted < factor) factor = predicted;
  }
  factor = Math.min(Math.max(factor, SHRINK_LIMIT), GROWTH_LIMIT);
  return rejectedBefore && factor > 1 ? 1 : factor;
}

/** Factor for trying again after an error above 1; a fifth where the error is not finite. */
export function factorAfterRejection(error: number): number {
  return Number.isFinite(error) ? Math.min(Math.max(SAFETY / fourthRoot(error), SHRINK_LIMIT), 1) : SHRINK_LIMIT;
}
