/** Sign changes on a step's dense output. */

/** Quarter points at which a step is looked at: its end included, its start not. */
export const SUBSAMPLES = [0.25, 0.5, 0.75, 1] as const;

/** Times of crossings are narrowed down to this [s]. */
export const EVENT_TIME_TOLERANCE = 1e-7;

/** A signal crosses upwards when it was below zero and is not any more, downwards the other way round. */
export function crosses(before: number, after: number): 'rises' | 'falls' | null {
  if (before < 0 && after >= 0) return 'rises';
  if (before >= 0 && after < 0) return 'falls';
  return null;
}

/** Place q of the crossing between two places of opposite sign, by halving until the bracket is narrower than the tolerance;
 *  the answer is the later end of the bracket (where the signal has crossed). `length` is the step's duration [s]. */
export function bisect(value: (q: number) => number, low: number, high: number, rising: boolean, length: number): number {
  let a = low;
  let b = high;
  while ((b - a) * length > EVENT_TIME_TOLERANCE) {
    const middle = 0.5 * (a + b);
    if (middle <= a || middle >= b) break;
    if (value(middle) >= 0 === rising) b = middle;
    else a = middle;
  }
  return b;
}
