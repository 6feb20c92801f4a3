/** Questions asked of a run's columns. `times` ascends; between its entries values run straight. */

export interface Window {
  readonly from: number;
  readonly to: number;
}

/** Index of the first row later than a time; the number of rows when there is none. */
function firstAfter(times: Float64Array, time: number): number {
  let low = 0;
  let high = times.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (times[middle]! > time) high = middle;
    else low = middle + 1;
  }
  return low;
}

/** Integral of a column over a window by the trapezoid rule, its ends interpolated. */
export function integrate(times: Float64Array, values: Float64Array, window: Window): number {
  let sum = 0;
  for (let i = Math.max(1, firstAfter(times, window.from)); i < times.length; i++) {
    const t0 = times[i - 1]!;
    const t1 = times[i]!;
    if (t0 >= window.to) break;
    const from = Math.max(t0, window.from);
    const to = Math.min(t1, window.to);
    if (to <= from) continue;
    const slope = t1 > t0 ? (values[i]! - values[i - 1]!) / (t1 - t0) : 0;
    const v0 = values[i - 1]! + slope * (from - t0);
    const v1 = values[i - 1]! + slope * (to - t0);
    sum += ((v0 + v1) / 2) * (to - from);
  }
  return sum;
}

/** Time average over a window; 0 for an empty one. */
export function mean(times: Float64Array, values: Float64Array, window: Window): number {
  const from = Math.max(window.from, times[0] ?? 0);
  const to = Math.min(window.to, times[times.length - 1] ?? 0);
  return to > from ? integrate(times, values, { from, to }) / (to - from) : 0;
}

/** Largest value in a window and when; −∞ at the window's start when nothing lies in it. */
export function highest(times: Float64Array, values: Float64Array, window: Window): { value: number; time: number } {
  let best = { value: Number.NEGATIVE_INFINITY, time: window.from };
  for (let i = 0; i < times.length; i++) {
    const t = times[i]!;
    if (t < window.from || t > window.to) continue;
    if (values[i]! > best.value) best = { value: values[i]!, time: t };
  }
  return best;
}

export function lowest(times: Float64Array, values: Float64Array, window: Window): { value: number; time: number } {
  let best = { value: Number.POSITIVE_INFINITY, time: window.from };
  for (let i = 0; i < times.length; i++) {
    const t = times[i]!;
    if (t < window.from || t > window.to) continue;
    if (values[i]! < best.value) best = { value: values[i]!, time: t };
  }
  return best;
}

/** Stretches in which a margin stays above zero, at least `least` seconds long; ends interpolated. A stretch that the run
 *  cuts off ends with the run. */
export function stretches(times: Float64Array, margin: (index: number) => number, least: number): Window[] {
  const found: Window[] = [];
  let from: number | null = null;
  let before = times.length > 0 ? margin(0) : 0;
  for (let i = 0; i < times.length; i++) {
    const here = i > 0 ? margin(i) : before;
    if (here > 0 && from === null) from = i > 0 ? cross(times[i - 1]!, before, times[i]!, here) : times[0]!;
    if (here <= 0 && from !== null) {
      const to = cross(times[i - 1]!, before, times[i]!, here);
      if (to - from >= least) found.push({ from, to });
      from = null;
    }
    before = here;
  }
  const end = times[times.length - 1] ?? 0;
  if (from !== null && end - from >= least) found.push({ from, to: end });
  return found;
}

function cross(t0: number, v0: number, t1: number, v1: number): number {
  if (v1 === v0) return t1;
  return Math.min(t1, Math.max(t0, t0 + ((0 - v0) * (t1 - t0)) / (v1 - v0)));
}

/** First time in a window at which a column has reached a level from below; null if it never does. */
export function firstReach(times: Float64Array, values: Float64Array, level: number, window: Window): number | null {
  for (let i = 0; i < times.length; i++) {
    const t = times[i]!;
    if (t < window.from) continue;
    if (t > window.to) return null;
    if (values[i]! < level) continue;
    if (i === 0 || values[i - 1]! >= level) return t;
    return Math.max(window.from, cross(times[i - 1]!, values[i - 1]! - level, t, values[i]! - level));
  }
  return null;
}

/** Value that a column is under for half of a window's time; 0 for an empty one. */
export function median(times: Float64Array, values: Float64Array, window: Window): number {
  const pieces: { value: number; time: number }[] = [];
  for (let i = 1; i < times.length; i++) {
    const time = Math.min(times[i]!, window.to) - Math.max(times[i - 1]!, window.from);
    if (time > 0) pieces.push({ value: (values[i]! + values[i - 1]!) / 2, time });
  }
  pieces.sort((a, b) => a.value - b.value);
  let left = pieces.reduce((sum, piece) => sum + piece.time, 0) / 2;
  for (const piece of pieces) {
    left -= piece.time;
    if (left <= 0) return piece.value;
  }
  return 0;
}
