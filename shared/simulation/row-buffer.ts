import { rowsToKeep } from './thin-rows.ts';

/** Rows to which a finished run is thinned for plotting, and how many it may have without being thinned. */
const PLOT_ROWS = 4000;
const ROWS_AT_MOST = 5000;
/** Numbers held before rows are thinned in between. */
const NUMBERS_HELD = 4_000_000;

/** Numbers of memory kept between runs. */
const SPARE_AT_MOST = 2_000_000;

/** Memory of a finished run, kept for the next one: fetching fresh pages costs as much as filling them. */
let spare: Float64Array | null = null;

/** A growing table of recorded rows: time and one number per column. Column after column: number c of row r is
 *  data[c·capacity + r]. */
export class RowBuffer {
  readonly columns: number;
  capacity = ROWS_AT_MOST;
  times: Float64Array;
  data: Float64Array;
  rows = 0;
  private readonly held: number;

  constructor(columns: number) {
    this.columns = columns;
    this.held = Math.max(2 * ROWS_AT_MOST, Math.floor(NUMBERS_HELD / Math.max(1, columns)));
    this.times = new Float64Array(ROWS_AT_MOST);
    const needed = ROWS_AT_MOST * columns;
    this.data = spare !== null && spare.length >= needed ? spare : new Float64Array(needed);
    spare = null;
    // Column 0 stands for what is always zero and is never written.
    this.data.fill(0, 0, ROWS_AT_MOST);
  }

  /** Appends a row and returns its number; its place in every column is still to be written. */
  add(time: number): number {
    if (this.rows === this.capacity) this.grow();
    this.times[this.rows] = time;
    return this.rows++;
  }

  private grow(): void {
    const { columns, capacity, rows } = this;
    const larger = 2 * capacity;
    const times = new Float64Array(larger);
    times.set(this.times);
    const data = new Float64Array(larger * columns);
    for (let c = 0; c < columns; c++) data.set(this.data.subarray(c * capacity, c * capacity + rows), c * larger);
    this.times = times;
    this.data = data;
    this.capacity = larger;
  }

  /** So many rows that they should be thinned at the next chance. */
  get full(): boolean {
    return this.rows >= this.held;
  }

  /** Thins a finished run. */
  thinForPlot(): void {
    if (this.rows > ROWS_AT_MOST) this.thin(PLOT_ROWS);
  }

  thin(limit: number): void {
    const { times, data, columns, capacity } = this;
    const keep = rowsToKeep(this, limit);
    for (let k = 0; k < keep.length; k++) times[k] = times[keep[k]!]!;
    for (let c = 0; c < columns; c++) {
      const base = c * capacity;
      for (let k = 0; k < keep.length; k++) data[base + k] = data[base + keep[k]!]!;
    }
    this.rows = keep.length;
  }

  /** Number of a column in the last row; 0 before the first. */
  latest(column: number): number {
    return this.rows === 0 ? 0 : this.data[column * this.capacity + this.rows - 1]!;
  }

  /** One array per column; the buffer is not to be used afterwards. */
  split(): Float64Array[] {
    const { data, rows, columns, capacity } = this;
    const split = Array.from({ length: columns }, (_, c) => data.slice(c * capacity, c * capacity + rows));
    if (data.length <= SPARE_AT_MOST) spare = data;
    this.data = new Float64Array(0);
    return split;
  }
}
