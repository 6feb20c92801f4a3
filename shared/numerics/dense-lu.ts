/** LU factors of a full matrix with scaled partial pivoting: the fallback of the sparse solver and its yardstick in tests. */
export class DenseLu {
  readonly size: number;
  private readonly a: Float64Array;
  private readonly order: Int32Array;
  private readonly work: Float64Array;

  constructor(size: number) {
    this.size = size;
    this.a = new Float64Array(size * size);
    this.order = new Int32Array(size);
    this.work = new Float64Array(size);
  }

  /** Factors shift·I − J, J given as triplets (duplicates add). False when singular or not finite. */
  factor(rows: Int32Array, columns: Int32Array, values: Float64Array, count: number, shift: number): boolean {
    const { size, a, order, work } = this;
    a.fill(0);
    for (let k = 0; k < count; k++) a[rows[k]! * size + columns[k]!]! -= values[k]!;
    for (let i = 0; i < size; i++) a[i * size + i]! += shift;
    for (let i = 0; i < size; i++) {
      order[i] = i;
      let largest = 0;
      for (let j = 0; j < size; j++) largest = Math.max(largest, Math.abs(a[i * size + j]!));
      if (!(largest > 0) || largest === Number.POSITIVE_INFINITY) return false;
      work[i] = 1 / largest;
    }
    for (let k = 0; k < size; k++) {
      let best = -1;
      let bestSize = 0;
      for (let i = k; i < size; i++) {
        const row = order[i]!;
        const s = Math.abs(a[row * size + k]!) * work[row]!;
        if (s > bestSize) {
          bestSize = s;
          best = i;
        }
      }
      if (best < 0 || bestSize === Number.POSITIVE_INFINITY) return false;
      const swap = order[k]!;
      order[k] = order[best]!;
      order[best] = swap;
      const pivotRow = order[k]! * size;
      const inverse = 1 / a[pivotRow + k]!;
      for (let i = k + 1; i < size; i++) {
        const row = order[i]! * size;
        const factor = a[row + k]! * inverse;
        a[row + k] = factor;
        if (factor === 0) continue;
        for (let j = k + 1; j < size; j++) a[row + j]! -= factor * a[pivotRow + j]!;
      }
    }
    return true;
  }

  /** Overwrites the first `size` entries of b with the solution. */
  solve(b: Float64Array): void {
    const { size, a, order, work } = this;
    for (let i = 0; i < size; i++) {
      const row = order[i]! * size;
      let sum = b[order[i]!]!;
      for (let j = 0; j < i; j++) sum -= a[row + j]! * work[j]!;
      work[i] = sum;
    }
    for (let i = size - 1; i >= 0; i--) {
      const row = order[i]! * size;
      let sum = work[i]!;
      for (let j = i + 1; j < size; j++) sum -= a[row + j]! * work[j]!;
      work[i] = sum / a[row + i]!;
    }
    for (let i = 0; i < size; i++) b[i] = work[i]!;
  }
}
