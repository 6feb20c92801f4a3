import { rowsToKeep } from './thin-rows.ts';

/** Rows a finished run keeps for plotting. */
export const PLOT_ROWS = 4000;
/** Numbers held before rows are thinned in between. */
const NUMBERS_HELD = 4_000_000;

/** A growing table of recorded rows: time and one number per column. */
export class RowBuffer {
  readonly columns: number;
  times: Float64Array;
  data: Float64Array;
  rows = 0;
  private readonly held: number;

  constructor(columns: number) {
    this.columns = columns;
    this.held = Math.max(2 * PLOT_ROWS, Math.floor(NUMBERS_HELD / Math.max(1, columns)));
    this.times = new Float64Array(PLOT_ROWS);
    this.data = new Float64Array(PLOT_ROWS * columns);
  }

  /** Appends a row and returns where its numbers start in `data`. */
  add(time: number): number {
    if (this.rows === this.times.length) this.grow();
    this.times[this.rows] = time;
    return this.columns * this.rows++;
  }

  private grow(): void {
    const times = new Float64Array(2 * this.times.length);
    times.set(this.times);
    const data = new Float64Array(2 * this.data.length);
    data.set(this.data);
    this.times = times;
    this.data = data;
  }

  /** So many rows that they should be thinned at the next chance. */
  get full(): boolean {
    return this.rows >= this.held;
  }

  thin(limit: number): void {
    const { times, data, rows, columns } = this;
    const keep = rowsToKeep({ times, data, rows, columns }, limit);
    for (let k = 0; k < keep.length; k++) {
      const r = keep[k]!;
      times[k] = times[r]!;
      data.copyWithin(k * columns, r * columns, (r + 1) * columns);
    }
    this.rows = keep.length;
  }

  /** One array per column. */
  split(): Float64Array[] {
    const { data, rows, columns } = this;
    return Array.from({ length: columns }, (_, c) => {
      const values = new Float64Array(rows);
      for (let r = 0, at = c; r < rows; r++, at += columns) values[r] = data[at]!;
      return values;
    });
  }
}
