/** Thinning of a trace for a given number of pixel columns: of each column the first, lowest, highest and last sample are
 *  kept in their order of time, so that no peak is lost and the line looks exactly like the full one.
 *  Source of the idea: first, lowest, highest and last value per column draw the same pixels as all values. */

/** Values between the ends of the window, interpolated at both ends.
 *  @param times ascending [s]
 *  @returns pairs time, value; empty when the window holds nothing. At most 4 samples a column and the two ends. */
export function envelope(times: Float64Array, values: Float64Array, from: number, to: number, columns: number): Float64Array {
  const n = Math.min(times.length, values.length);
  if (n === 0 || columns < 1 || !(to > from)) return new Float64Array(0);
  const begin = Math.max(from, times[0] as number);
  const end = Math.min(to, times[n - 1] as number);
  if (end < begin) return new Float64Array(0);
  const out = new Float64Array(2 * (4 * columns + 8));
  let count = 0;
  const put = (time: number, value: number) => {
    out[2 * count] = time;
    out[2 * count + 1] = value;
    count += 1;
  };
  let i = firstAtOrAfter(times, n, begin);
  if ((times[i] as number) > begin && i > 0) put(begin, between(times, values, i, begin));
  const perSecond = columns / (to - from);
  while (i < n && (times[i] as number) <= end) {
    const column = Math.min(columns - 1, Math.floor(((times[i] as number) - from) * perSecond));
    let low = i;
    let high = i;
    let last = i;
    const first = i;
    while (i < n && (times[i] as number) <= end) {
      if (Math.min(columns - 1, Math.floor(((times[i] as number) - from) * perSecond)) !== column) break;
      if ((values[i] as number) < (values[low] as number)) low = i;
      if ((values[i] as number) > (values[high] as number)) high = i;
      last = i;
      i += 1;
    }
    const a = Math.min(low, high);
    const b = Math.max(low, high);
    put(times[first] as number, values[first] as number);
    if (a > first) put(times[a] as number, values[a] as number);
    if (b > a && b > first) put(times[b] as number, values[b] as number);
    if (last > b && last > a && last > first) put(times[last] as number, values[last] as number);
  }
  if (i < n && end > (count > 0 ? (out[2 * (count - 1)] as number) : begin)) put(end, between(times, values, i, end));
  return out.subarray(0, 2 * count);
}

/** Least and greatest value in a window, ends interpolated; null when the window holds nothing. */
export function extent(times: Float64Array, values: Float64Array, from: number, to: number): readonly [number, number] | null {
  const n = Math.min(times.length, values.length);
  if (n === 0) return null;
  const begin = Math.max(from, times[0] as number);
  const end = Math.min(to, times[n - 1] as number);
  if (end < begin) return null;
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  const take = (value: number) => {
    if (value < low) low = value;
    if (value > high) high = value;
  };
  let i = firstAtOrAfter(times, n, begin);
  if (i > 0 && i < n && (times[i] as number) > begin) take(between(times, values, i, begin));
  for (; i < n && (times[i] as number) <= end; i += 1) take(values[i] as number);
  if (i < n && i > 0) take(between(times, values, i, end));
  return low <= high ? [low, high] : null;
}

function firstAtOrAfter(times: Float64Array, n: number, time: number): number {
  let low = 0;
  let high = n;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((times[middle] as number) < time) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Value at a time between samples i − 1 and i. */
function between(times: Float64Array, values: Float64Array, i: number, time: number): number {
  const t0 = times[i - 1] as number;
  const t1 = times[i] as number;
  const v0 = values[i - 1] as number;
  const v1 = values[i] as number;
  return t1 > t0 ? v0 + ((v1 - v0) * (time - t0)) / (t1 - t0) : v1;
}
