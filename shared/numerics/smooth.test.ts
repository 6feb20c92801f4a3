import { describe, expect, it } from 'vitest';
import * as smooth from './smooth.ts';

/** Central difference. */
function slope(f: (x: number) => number, x: number, h: number): number {
  return (f(x + h) - f(x - h)) / (2 * h);
}

describe('smooth laws', () => {
  const places = [-3, -0.7, -0.01, 0.02, 0.5, 0.99, 4];

  it('have slopes that agree with differences', () => {
    for (const x of places) {
      expect(smooth.smoothSignSlope(x)).toBeCloseTo(slope(smooth.smoothSign, x, 1e-5), 8);
      expect(smooth.smoothStepSlope(x)).toBeCloseTo(slope(smooth.smoothStep, x, 1e-5), 8);
      expect(smooth.smoothMaxSlope(x, 0.3, 0.05)).toBeCloseTo(
        slope((a) => smooth.smoothMax(a, 0.3, 0.05), x, 1e-5),
        7,
      );
      expect(smooth.smoothMinSlope(x, 0.3, 0.05)).toBeCloseTo(
        slope((a) => smooth.smoothMin(a, 0.3, 0.05), x, 1e-5),
        7,
      );
      const d = x * 1e5;
      expect(smooth.orificeSlope(d, 2e4) / slope((p) => smooth.orifice(1, p, 2e4), d, 1)).toBeCloseTo(1, 7);
      expect(smooth.lineFlowSlope(4e8, 2e12, d) / slope((p) => smooth.lineFlow(4e8, 2e12, p), d, 1)).toBeCloseTo(1, 7);
    }
  });

  it('line flow inverts the loss law', () => {
    for (const q of [-1e-3, -1e-6, 0, 2e-5, 4e-4]) {
      const d = 4e8 * q + 2e12 * q * Math.abs(q);
      expect(smooth.lineFlow(4e8, 2e12, d)).toBeCloseTo(q, 14);
    }
    expect(smooth.lineFlow(0, 2e12, 0)).toBe(0);
  });

  it('orifice is odd, finite at zero and goes with the root far from it', () => {
    expect(smooth.orifice(5e-7, 0, 2e4)).toBe(0);
    expect(smooth.orifice(5e-7, -1e6, 2e4)).toBe(-smooth.orifice(5e-7, 1e6, 2e4));
    expect(smooth.orifice(5e-7, 1e7, 2e4) / (5e-7 * Math.sqrt(1e7))).toBeCloseTo(1, 5);
  });

  it('step and clamps reach their ends', () => {
    expect(smooth.smoothStep(-1)).toBe(0);
    expect(smooth.smoothStep(0.5)).toBe(0.5);
    expect(smooth.smoothStep(2)).toBe(1);
    expect(smooth.smoothMax(5, 0, 1e-3)).toBeCloseTo(5, 6);
    expect(smooth.smoothMin(5, 0, 1e-3)).toBeCloseTo(0, 6);
  });
});
