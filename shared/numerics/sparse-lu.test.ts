import { describe, expect, it } from 'vitest';
import { DenseLu } from './dense-lu.ts';
import { SparseLu } from './sparse-lu.ts';
import { sparsePattern } from './sparse-pattern.ts';

/** Repeatable numbers in [0, 1). */
function sequence(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 4294967296;
  };
}

function randomCase(seed: number, size: number) {
  const next = sequence(seed);
  const pairs: [number, number][] = [];
  for (let k = 0; k < 3 * size; k++) pairs.push([Math.floor(next() * size), Math.floor(next() * size)]);
  const pattern = sparsePattern(size, pairs);
  const values = new Float64Array(pattern.rows.length + 1);
  for (let s = 0; s < pattern.rows.length; s++) values[s] = (next() - 0.5) * 10 ** Math.floor(next() * 4);
  const b = Float64Array.from({ length: size }, () => next() - 0.5);
  return { pattern, values, b };
}

describe('sparse LU', () => {
  it('solves as the dense one does', () => {
    for (let seed = 1; seed <= 40; seed++) {
      const size = 3 + (seed % 30);
      const { pattern, values, b } = randomCase(seed, size);
      const sparse = new SparseLu(pattern);
      expect(sparse.factor(values, 4e4)).toBe(true);
      const x = b.slice();
      expect(sparse.solveChecked(x)).toBe(true);
      const dense = new DenseLu(size);
      expect(dense.factor(pattern.rows, pattern.columns, values, pattern.rows.length, 4e4)).toBe(true);
      const y = b.slice();
      dense.solve(y);
      for (let i = 0; i < size; i++) expect(Math.abs(x[i]! - y[i]!)).toBeLessThan(1e-12 * (Math.abs(y[i]!) + 1e-8));
    }
  });

  it('falls back to pivoting when a diagonal pivot is zero', () => {
    const pattern = sparsePattern(2, [
      [0, 1],
      [1, 0],
    ]);
    const values = new Float64Array(5);
    values[pattern.slot(0, 1)] = -1;
    values[pattern.slot(1, 0)] = -1;
    const lu = new SparseLu(pattern);
    expect(lu.factor(values, 0)).toBe(true);
    expect(lu.fallbacks).toBe(1);
    const b = Float64Array.of(2, 3);
    expect(lu.solveChecked(b)).toBe(true);
    expect([...b]).toEqual([3, 2]);
  });

  it('falls back when a tiny pivot spoils the solution', () => {
    const pattern = sparsePattern(2, [
      [0, 1],
      [1, 0],
    ]);
    const values = new Float64Array(5);
    values[0] = -1e-22;
    values[pattern.slot(0, 1)] = -1;
    values[pattern.slot(1, 0)] = -1;
    values[1] = -1;
    const lu = new SparseLu(pattern);
    lu.factor(values, 0);
    const b = Float64Array.of(1, 2);
    expect(lu.solveChecked(b)).toBe(true);
    expect(lu.fallbacks).toBe(1);
    expect(b[0]).toBeCloseTo(1, 12);
    expect(b[1]).toBeCloseTo(1, 12);
  });

  it('says when a matrix is singular or not finite', () => {
    const pattern = sparsePattern(2, [[0, 1]]);
    expect(new SparseLu(pattern).factor(new Float64Array(4), 0)).toBe(false);
    expect(new SparseLu(pattern).factor(Float64Array.of(Number.NaN, 1, 0, 0), 1)).toBe(false);
  });

  it('orders a bordered diagonal without fill', () => {
    const size = 30;
    const pairs: [number, number][] = [];
    for (let i = 1; i < size; i++) pairs.push([0, i], [i, 0]);
    const pattern = sparsePattern(size, pairs);
    expect(new SparseLu(pattern).nonzeros).toBe(pattern.rows.length);
  });

  it('puts pairs outside the matrix into the dump slot', () => {
    const pattern = sparsePattern(2, [
      [0, 2],
      [2, 0],
    ]);
    expect(pattern.rows.length).toBe(2);
    expect(pattern.slot(0, 2)).toBe(2);
    expect(pattern.slot(2, 1)).toBe(2);
  });
});
