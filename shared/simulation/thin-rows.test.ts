import { describe, expect, it } from 'vitest';
import { rowsToKeep } from './thin-rows.ts';

function table(rows: number, columns: readonly ((t: number) => number)[], times = Array.from({ length: rows }, (_, r) => r / rows)) {
  const data = new Float64Array(rows * columns.length);
  columns.forEach((of, c) => {
    times.forEach((t, r) => {
      data[c * rows + r] = of(t);
    });
  });
  return { times: Float64Array.from(times), data, capacity: rows, rows, columns: columns.length };
}

describe('thinning rows', () => {
  it('keeps everything within the limit', () => {
    expect([...rowsToKeep(table(5, [(t) => t]), 10)]).toEqual([0, 1, 2, 3, 4]);
  });

  it('keeps next to nothing of straight lines', () => {
    expect(rowsToKeep(table(1000, [(t) => t, (t) => 3 - 2 * t]), 100).length).toBeLessThan(5);
  });

  it('keeps every extreme, both rows of a jump, and the ends', () => {
    const times = Array.from({ length: 1000 }, (_, r) => (r <= 500 ? r : r - 1) / 999);
    const spike = (t: number): number => (Math.abs(t - 0.3) < 2e-4 ? 9 : 0);
    const dip = (t: number): number => Math.sin(40 * t) - (Math.abs(t - 0.7) < 6e-4 ? 20 : 0);
    const full = table(1000, [spike, dip], times);
    const kept = [...rowsToKeep(full, 60)];
    expect(kept.length).toBeLessThanOrEqual(60);
    expect(kept[0]).toBe(0);
    expect(kept.at(-1)).toBe(999);
    expect(kept).toEqual(expect.arrayContaining([500, 501]));
    for (const c of [0, 1]) {
      const column = full.data.subarray(c * 1000, c * 1000 + 1000);
      const chosen = kept.map((r) => column[r]!);
      expect(Math.max(...chosen)).toBe(Math.max(...column));
      expect(Math.min(...chosen)).toBe(Math.min(...column));
    }
  });

  it('strays from the dropped rows by a small share of the range only', () => {
    const wave = (t: number): number => Math.sin(30 * t) * Math.exp(-3 * t);
    const full = table(4000, [wave]);
    const kept = rowsToKeep(full, 400);
    let worst = 0;
    for (let k = 1; k < kept.length; k++) {
      for (let r = kept[k - 1]!; r <= kept[k]!; r++) {
        const share = (r - kept[k - 1]!) / (kept[k]! - kept[k - 1]!);
        const line = full.data[kept[k - 1]!]! * (1 - share) + full.data[kept[k]!]! * share;
        worst = Math.max(worst, Math.abs(line - full.data[r]!));
      }
    }
    expect(worst).toBeLessThan(2e-3);
  });
});
