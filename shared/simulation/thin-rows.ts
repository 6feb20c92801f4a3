/** Which rows of a table must stay so that straight lines between them miss no value by more than a share of its column's
 *  range. Every column's largest and smallest value, the first and last row, and rows of equal time (jumps) always stay. */

interface Table {
  readonly times: Float64Array;
  /** Column after column, `capacity` apart. */
  readonly data: Float64Array;
  readonly capacity: number;
  readonly rows: number;
  readonly columns: number;
}

/** Ascending row indices to keep: about `limit` at most (more only if the columns have more extremes than that). */
export function rowsToKeep(table: Table, limit: number): Int32Array {
  const { rows, columns } = table;
  if (rows <= limit) return Int32Array.from({ length: rows }, (_, i) => i);
  const must = new Uint8Array(rows);
  must[0] = 1;
  must[rows - 1] = 1;
  for (let r = 1; r < rows; r++) {
    if (table.times[r] === table.times[r - 1]) {
      must[r] = 1;
      must[r - 1] = 1;
    }
  }
  const ranges = markExtremes(table, must);
  const low = new Float64Array(columns);
  const high = new Float64Array(columns);
  let fixed = 0;
  for (let r = 0; r < rows; r++) fixed += must[r]!;
  const most = Math.max(limit, fixed);
  for (let share = 1e-4; ; share *= 2) {
    const kept = swing(table, must, ranges, share, low, high);
    if (kept.length <= most || share > 1) return Int32Array.from(kept);
  }
}

function markExtremes({ data, capacity, rows, columns }: Table, must: Uint8Array): Float64Array {
  const ranges = new Float64Array(columns);
  for (let c = 0; c < columns; c++) {
    const base = c * capacity;
    let least = base;
    let most = base;
    for (let at = base + 1; at < base + rows; at++) {
      const value = data[at]!;
      if (value < data[least]!) least = at;
      if (value > data[most]!) most = at;
    }
    must[least - base] = 1;
    must[most - base] = 1;
    ranges[c] = data[most]! - data[least]!;
  }
  return ranges;
}

/** One pass: from each kept row on, bounds on the slope of every column are narrowed until a row falls outside them. */
function swing(table: Table, must: Uint8Array, ranges: Float64Array, share: number, low: Float64Array, high: Float64Array): number[] {
  const { times, data, capacity, rows, columns } = table;
  const kept = [0];
  let anchor = 0;
  low.fill(Number.NEGATIVE_INFINITY);
  high.fill(Number.POSITIVE_INFINITY);
  for (let r = 1; r < rows; r++) {
    const dt = times[r]! - times[anchor]!;
    let inside = dt > 0;
    for (let c = 0; inside && c < columns; c++) {
      const slope = (data[c * capacity + r]! - data[c * capacity + anchor]!) / dt;
      if (slope < low[c]! || slope > high[c]!) inside = false;
    }
    if (!inside && anchor !== r - 1) {
      anchor = r - 1;
      kept.push(anchor);
      low.fill(Number.NEGATIVE_INFINITY);
      high.fill(Number.POSITIVE_INFINITY);
    }
    if (must[r]) {
      anchor = r;
      kept.push(r);
      low.fill(Number.NEGATIVE_INFINITY);
      high.fill(Number.POSITIVE_INFINITY);
      continue;
    }
    const inverse = 1 / (times[r]! - times[anchor]!);
    for (let c = 0; c < columns; c++) {
      const rise = data[c * capacity + r]! - data[c * capacity + anchor]!;
      const slack = share * ranges[c]!;
      const lower = (rise - slack) * inverse;
      const upper = (rise + slack) * inverse;
      if (lower > low[c]!) low[c] = lower;
      if (upper < high[c]!) high[c] = upper;
    }
  }
  return kept;
}
