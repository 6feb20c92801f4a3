import { DenseLu } from './dense-lu.ts';
import type { LinearSolver } from './solver.ts';
import type { SparsePattern } from './sparse-pattern.ts';
import { analyse, type SymbolicLu } from './symbolic-lu.ts';

/** Largest residual of a row, relative to the sum of its terms, with which the sparse factors are still used. */
const RESIDUAL_LIMIT = 1e-6;

/** Residuals below this are the rounding of numbers that have all but vanished. */
const VANISHING = 1e-250;

/** Sparse LU of shift·I − J with a fixed pattern and diagonal pivots; when a pivot is unusable or the residual of a checked
 *  solution is too large, the same matrix is factored densely with pivoting. */
export class SparseLu implements LinearSolver {
  readonly slots: number;
  readonly nonzeros: number;
  fallbacks = 0;
  private readonly pattern: SparsePattern;
  private readonly symbolic: SymbolicLu;
  private readonly lu: Float64Array;
  private readonly inverse: Float64Array;
  private readonly x: Float64Array;
  private readonly kept: Float64Array;
  private readonly residual: Float64Array;
  private readonly terms: Float64Array;
  private values: Float64Array;
  private shift = 0;
  private dense: DenseLu | null = null;
  private useDense = false;

  constructor(pattern: SparsePattern, symbolic: SymbolicLu = analyse(pattern)) {
    const { size } = pattern;
    this.pattern = pattern;
    this.symbolic = symbolic;
    this.slots = pattern.rows.length;
    this.nonzeros = symbolic.nonzeros;
    this.lu = new Float64Array(symbolic.nonzeros);
    this.inverse = new Float64Array(size);
    this.x = new Float64Array(size);
    this.kept = new Float64Array(size);
    this.residual = new Float64Array(size);
    this.terms = new Float64Array(size);
    this.values = new Float64Array(this.slots);
  }

  factor(values: Float64Array, shift: number): boolean {
    this.values = values;
    this.shift = shift;
    this.useDense = false;
    const { size, load, pivot, eliminate, lower, updateStart, update } = this.symbolic;
    const { lu, inverse, slots } = this;
    lu.fill(0);
    for (let s = 0; s < slots; s++) lu[load[s]!] = -values[s]!;
    for (let k = 0; k < size; k++) lu[pivot[k]!]! += shift;
    for (let k = 0; k < size; k++) {
      const p = lu[pivot[k]!]!;
      if (!(Math.abs(p) > 0) || Math.abs(p) === Number.POSITIVE_INFINITY) return this.fallBack();
      const invertedPivot = 1 / p;
      inverse[k] = invertedPivot;
      for (let e = eliminate[k]!; e < eliminate[k + 1]!; e++) {
        const place = lower[e]!;
        const f = lu[place]! * invertedPivot;
        lu[place] = f;
        const last = 2 * updateStart[e + 1]!;
        for (let q = 2 * updateStart[e]!; q < last; q += 2) lu[update[q]!]! -= f * lu[update[q + 1]!]!;
      }
    }
    return true;
  }

  private fallBack(): boolean {
    this.dense ??= new DenseLu(this.pattern.size);
    this.fallbacks++;
    this.useDense = true;
    return this.dense.factor(this.pattern.rows, this.pattern.columns, this.values, this.slots, this.shift);
  }

  solve(b: Float64Array): void {
    if (this.useDense) {
      this.dense!.solve(b);
      return;
    }
    const { size, order, lowerStart, lowerPlace, lowerStep, upperStart, upperPlace, upperStep } = this.symbolic;
    const { lu, inverse, x } = this;
    for (let k = 0; k < size; k++) {
      let sum = b[order[k]!]!;
      for (let q = lowerStart[k]!; q < lowerStart[k + 1]!; q++) sum -= lu[lowerPlace[q]!]! * x[lowerStep[q]!]!;
      x[k] = sum;
    }
    for (let k = size - 1; k >= 0; k--) {
      let sum = x[k]!;
      for (let q = upperStart[k]!; q < upperStart[k + 1]!; q++) sum -= lu[upperPlace[q]!]! * x[upperStep[q]!]!;
      x[k] = sum * inverse[k]!;
    }
    for (let k = 0; k < size; k++) b[order[k]!] = x[k]!;
  }

  solveChecked(b: Float64Array): boolean {
    const { kept } = this;
    const { size } = this.pattern;
    for (let i = 0; i < size; i++) kept[i] = b[i]!;
    this.solve(b);
    if (this.fits(b)) return true;
    if (this.useDense || !this.fallBack()) return false;
    for (let i = 0; i < size; i++) b[i] = kept[i]!;
    this.solve(b);
    return this.fits(b);
  }

  /** Residual of every row within the limit (false for anything not finite). */
  private fits(x: Float64Array): boolean {
    const { kept, residual, terms, values, slots, shift } = this;
    const { size, rows, columns } = this.pattern;
    for (let i = 0; i < size; i++) {
      const term = shift * x[i]!;
      residual[i] = kept[i]! - term;
      terms[i] = Math.abs(kept[i]!) + Math.abs(term);
    }
    for (let s = 0; s < slots; s++) {
      const term = values[s]! * x[columns[s]!]!;
      residual[rows[s]!]! += term;
      terms[rows[s]!]! += Math.abs(term);
    }
    for (let i = 0; i < size; i++) {
      if (!(Math.abs(residual[i]!) <= RESIDUAL_LIMIT * terms[i]! + VANISHING)) return false;
    }
    return true;
  }
}
