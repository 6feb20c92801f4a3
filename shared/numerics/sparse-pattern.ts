/** Pattern of a sparse square matrix whose entries are written many times: slot numbers for (row, column) pairs.
 *  Every diagonal entry has a slot. Pairs outside the matrix (the fixed tank) share the dump slot behind the last one. */
export interface SparsePattern {
  readonly size: number;
  readonly rows: Int32Array;
  readonly columns: Int32Array;
  /** Slot of each diagonal entry. */
  readonly diagonal: Int32Array;
  /** Slot of a pair; the dump slot (= rows.length) when the row or column is outside. */
  slot(row: number, column: number): number;
}

/** Builds the pattern from declared pairs; order of slots: the diagonal, then pairs as they first come. */
export function sparsePattern(size: number, pairs: Iterable<readonly [row: number, column: number]>): SparsePattern {
  const slots = new Map<number, number>();
  const rows: number[] = [];
  const columns: number[] = [];
  const add = (row: number, column: number): void => {
    if (row < 0 || column < 0 || row >= size || column >= size) return;
    const key = row * size + column;
    if (slots.has(key)) return;
    slots.set(key, rows.length);
    rows.push(row);
    columns.push(column);
  };
  for (let i = 0; i < size; i++) add(i, i);
  for (const [row, column] of pairs) add(row, column);
  const dump = rows.length;
  return {
    size,
    rows: Int32Array.from(rows),
    columns: Int32Array.from(columns),
    diagonal: Int32Array.from({ length: size }, (_, i) => i),
    slot: (row, column) => (row < 0 || column < 0 || row >= size || column >= size ? dump : (slots.get(row * size + column) ?? dump)),
  };
}
