import type { SparsePattern } from './sparse-pattern.ts';

/** Elimination order, fill and index lists of a sparse LU with diagonal pivots, worked out once per circuit. */
export interface SymbolicLu {
  readonly size: number;
  /** order[k] = row and column eliminated in step k. */
  readonly order: Int32Array;
  readonly nonzeros: number;
  /** Place of each pattern slot in the factor values. */
  readonly load: Int32Array;
  /** Place of each pivot, by elimination step. */
  readonly pivot: Int32Array;
  /** Elimination as a list: step k has entries eliminate[k] … eliminate[k+1]−1; each has a lower entry and its own updates
   *  (target, source pairs) update[2·updateStart[e]] … . */
  readonly eliminate: Int32Array;
  readonly lower: Int32Array;
  readonly updateStart: Int32Array;
  readonly update: Int32Array;
  /** Triangular solves in elimination order: row k uses entries start[k] … start[k+1]−1 of (place, step). */
  readonly lowerStart: Int32Array;
  readonly lowerPlace: Int32Array;
  readonly lowerStep: Int32Array;
  readonly upperStart: Int32Array;
  readonly upperPlace: Int32Array;
  readonly upperStep: Int32Array;
}

/** Chooses at each step the diagonal with the least product of row and column counts (least number breaks a tie). */
function eliminationOrder(size: number, rows: Set<number>[], columns: Set<number>[]): Int32Array {
  const order = new Int32Array(size);
  const left = new Set<number>(Array.from({ length: size }, (_, i) => i));
  for (let k = 0; k < size; k++) {
    let best = -1;
    let bestCost = Number.POSITIVE_INFINITY;
    for (const i of left) {
      const cost = (rows[i]!.size - 1) * (columns[i]!.size - 1);
      if (cost < bestCost) {
        bestCost = cost;
        best = i;
      }
    }
    order[k] = best;
    left.delete(best);
    const across = [...rows[best]!].filter((j) => j !== best);
    const down = [...columns[best]!].filter((i) => i !== best);
    for (const i of down) {
      for (const j of across) {
        rows[i]!.add(j);
        columns[j]!.add(i);
      }
      rows[i]!.delete(best);
    }
    for (const j of across) columns[j]!.delete(best);
  }
  return order;
}

/** Works out order, fill and index lists for a pattern. */
export function analyse(pattern: SparsePattern): SymbolicLu {
  const { size } = pattern;
  const setsOf = (key: Int32Array, value: Int32Array): Set<number>[] => {
    const sets = Array.from({ length: size }, () => new Set<number>());
    for (let s = 0; s < key.length; s++) sets[key[s]!]!.add(value[s]!);
    return sets;
  };
  const order = eliminationOrder(size, setsOf(pattern.rows, pattern.columns), setsOf(pattern.columns, pattern.rows));
  const stepOf = new Int32Array(size);
  for (let k = 0; k < size; k++) stepOf[order[k]!] = k;

  const filled = Array.from({ length: size }, () => new Set<number>());
  for (let s = 0; s < pattern.rows.length; s++) filled[stepOf[pattern.rows[s]!]!]!.add(stepOf[pattern.columns[s]!]!);
  const below = Array.from({ length: size }, () => [] as number[]);
  for (let k = 0; k < size; k++) {
    for (let i = k + 1; i < size; i++) {
      if (!filled[i]!.has(k)) continue;
      below[k]!.push(i);
      for (const j of filled[k]!) if (j > k) filled[i]!.add(j);
    }
  }
  const place = filled.map(() => new Map<number, number>());
  let nonzeros = 0;
  const sorted = filled.map((row) => [...row].sort((a, b) => a - b));
  sorted.forEach((row, i) => {
    for (const j of row) place[i]!.set(j, nonzeros++);
  });
  const at = (i: number, j: number): number => place[i]!.get(j)!;

  const eliminate: number[] = [0];
  const lower: number[] = [];
  const updateStart: number[] = [0];
  const update: number[] = [];
  for (let k = 0; k < size; k++) {
    const across = sorted[k]!.filter((j) => j > k);
    for (const i of below[k]!) {
      lower.push(at(i, k));
      for (const j of across) update.push(at(i, j), at(k, j));
      updateStart.push(update.length / 2);
    }
    eliminate.push(lower.length);
  }
  const triangle = (keep: (i: number, j: number) => boolean): [Int32Array, Int32Array, Int32Array] => {
    const start: number[] = [0];
    const places: number[] = [];
    const steps: number[] = [];
    sorted.forEach((row, i) => {
      for (const j of row) {
        if (!keep(i, j)) continue;
        places.push(at(i, j));
        steps.push(j);
      }
      start.push(places.length);
    });
    return [Int32Array.from(start), Int32Array.from(places), Int32Array.from(steps)];
  };
  const [lowerStart, lowerPlace, lowerStep] = triangle((i, j) => j < i);
  const [upperStart, upperPlace, upperStep] = triangle((i, j) => j > i);
  return {
    size,
    order,
    nonzeros,
    load: Int32Array.from(pattern.rows, (row, s) => at(stepOf[row]!, stepOf[pattern.columns[s]!]!)),
    pivot: Int32Array.from({ length: size }, (_, k) => at(k, k)),
    eliminate: Int32Array.from(eliminate),
    lower: Int32Array.from(lower),
    updateStart: Int32Array.from(updateStart),
    update: Int32Array.from(update),
    lowerStart,
    lowerPlace,
    lowerStep,
    upperStart,
    upperPlace,
    upperStep,
  };
}
