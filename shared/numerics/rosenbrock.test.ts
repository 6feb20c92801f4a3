import { describe, expect, it } from 'vitest';
import { Rosenbrock } from './rosenbrock.ts';
import { defaultSolverOptions, type OdeSystem, type SolverOptions } from './solver.ts';
import { SparseLu } from './sparse-lu.ts';
import { sparsePattern } from './sparse-pattern.ts';

interface Problem {
  readonly size: number;
  readonly nominal?: readonly number[];
  readonly ramping?: boolean;
  readonly f: (t: number, y: Float64Array) => readonly number[];
  readonly j: (t: number, y: Float64Array) => readonly (readonly number[])[];
}

/** An integrator for a small problem with a full Jacobian. */
function integratorOf(problem: Problem, options: Partial<SolverOptions> = {}) {
  const { size } = problem;
  const pairs: [number, number][] = [];
  for (let r = 0; r < size; r++) for (let c = 0; c < size; c++) pairs.push([r, c]);
  const pattern = sparsePattern(size, pairs);
  const times: number[] = [];
  const system: OdeSystem = {
    size,
    length: size,
    counted: size,
    nominal: Float64Array.from(problem.nominal ?? new Array(size).fill(1)),
    ramping: problem.ramping ?? false,
    derivative(t, y, dy) {
      times.push(t);
      dy.set(problem.f(t, y));
    },
    jacobian(t, y, values) {
      values.fill(0);
      problem.j(t, y).forEach((row, r) => {
        row.forEach((value, c) => {
          values[pattern.slot(r, c)]! += value;
        });
      });
    },
  };
  return { integrator: new Rosenbrock(system, new SparseLu(pattern), { ...defaultSolverOptions, ...options }), times };
}

function solve(problem: Problem, y0: readonly number[], t0: number, end: number, tolerance: number, options: Partial<SolverOptions> = {}) {
  const { integrator, times } = integratorOf(problem, { ...options, tolerance });
  integrator.begin(t0, Float64Array.from(y0), end);
  let outcome = integrator.step();
  while (outcome === 'accepted') outcome = integrator.step();
  return { outcome, y: integrator.after, integrator, times };
}

/** Non-linear, non-autonomous, with known solution y = sin t + 2: y′ = cos t − (y² − (sin t + 2)²). */
const tracking: Problem = {
  size: 1,
  ramping: true,
  f: (t, y) => [Math.cos(t) - (y[0]! * y[0]! - (Math.sin(t) + 2) ** 2)],
  j: (_t, y) => [[-2 * y[0]!]],
};

/** Largest end and dense-output errors with a fixed step: the tolerance is loose enough for every step to pass. */
function fixedStep(h: number): { end: number; dense: number } {
  const { integrator } = integratorOf(tracking, { tolerance: 1e3, firstStep: h });
  let y = Float64Array.of(2);
  let dense = 0;
  const out = new Float64Array(1);
  const steps = Math.round(2 / h);
  for (let k = 0; k < steps; k++) {
    integrator.begin(k * h, y, (k + 1) * h);
    expect(integrator.step()).toBe('accepted');
    for (const q of [0.25, 0.5, 0.75]) {
      integrator.dense(q, out);
      dense = Math.max(dense, Math.abs(out[0]! - Math.sin((k + q) * h) - 2));
    }
    y = integrator.after.slice();
  }
  return { end: Math.abs(y[0]! - Math.sin(steps * h) - 2), dense };
}

describe('Rodas4P', () => {
  it('converges with order 4, its dense output with order 3 at least', () => {
    const coarse = fixedStep(0.05);
    const fine = fixedStep(0.025);
    expect(Math.log2(coarse.end / fine.end)).toBeGreaterThan(3.7);
    expect(Math.log2(coarse.end / fine.end)).toBeLessThan(4.6);
    expect(Math.log2(coarse.dense / fine.dense)).toBeGreaterThan(2.9);
  });

  it('has a dense output that meets both ends of the step and whose slope is its derivative', () => {
    const { integrator } = integratorOf(tracking);
    integrator.begin(0, Float64Array.of(2), 1);
    integrator.step();
    const a = new Float64Array(1);
    const b = new Float64Array(1);
    integrator.dense(0, a);
    expect(a[0]).toBe(integrator.before[0]);
    integrator.dense(1, a);
    expect(a[0]).toBe(integrator.after[0]);
    integrator.dense(0.4001, a);
    integrator.dense(0.3999, b);
    const difference = (a[0]! - b[0]!) / (0.0002 * (integrator.to - integrator.from));
    integrator.denseSlope(0.4, a);
    expect(a[0]! / difference).toBeCloseTo(1, 6);
  });

  it('is L-stable: one large step on a fast decay leaves nothing', () => {
    const { integrator } = integratorOf({ size: 1, f: (_t, y) => [-1e12 * y[0]!], j: () => [[-1e12]] }, { tolerance: 1, firstStep: 1 });
    integrator.begin(0, Float64Array.of(1), 1);
    expect(integrator.step()).toBe('accepted');
    expect(Math.abs(integrator.after[0]!)).toBeLessThan(1e-9);
  });

  it('solves Van der Pol with stiffness 1e-6 (reference sheet, J1)', () => {
    const eps = 1e-6;
    const problem: Problem = {
      size: 2,
      f: (_t, y) => [y[1]!, ((1 - y[0]! * y[0]!) * y[1]! - y[0]!) / eps],
      j: (_t, y) => [
        [0, 1],
        [(-2 * y[0]! * y[1]! - 1) / eps, (1 - y[0]! * y[0]!) / eps],
      ],
    };
    const { outcome, y } = solve(problem, [2, 0], 0, 2, 1e-8);
    expect(outcome).toBe('end');
    expect(y[0]).toBeCloseTo(1.706167732, 6);
    expect(y[1]).toBeCloseTo(-0.892809701, 6);
  });

  it('solves Robertson’s kinetics (reference sheet, J2)', () => {
    const problem: Problem = {
      size: 3,
      nominal: [1e-4, 1e-8, 1e-4],
      f: (_t, y) => {
        const a = 0.04 * y[0]!;
        const b = 1e4 * y[1]! * y[2]!;
        const c = 3e7 * y[1]! * y[1]!;
        return [-a + b, a - b - c, c];
      },
      j: (_t, y) => [
        [-0.04, 1e4 * y[2]!, 1e4 * y[1]!],
        [0.04, -1e4 * y[2]! - 6e7 * y[1]!, -1e4 * y[1]!],
        [0, 6e7 * y[1]!, 0],
      ],
    };
    const { y } = solve(problem, [1, 0, 0], 0, 40, 1e-8);
    expect(y[0]! / 0.715827069).toBeCloseTo(1, 7);
    expect(y[1]! / 9.18553476e-6).toBeCloseTo(1, 7);
    expect(y[2]! / 0.284163746).toBeCloseTo(1, 7);
    const late = solve({ ...problem, nominal: [1e-9, 1e-14, 1e-4] }, [1, 0, 0], 0, 1e11, 1e-8, {
      relativeLimit: Number.POSITIVE_INFINITY,
    });
    expect(late.y[0]! / 2.08334015e-8).toBeCloseTo(1, 4);
    expect(late.y[1]! / 8.33336077e-14).toBeCloseTo(1, 4);
    expect(late.y[2]).toBeCloseTo(0.999999979, 8);
  });

  it('closes the Arenstorf orbit (reference sheet, J3)', () => {
    const mu = 0.012277471;
    const nu = 1 - mu;
    const parts = (y: Float64Array) => {
      const p = (y[0]! + mu) ** 2 + y[1]! ** 2;
      const q = (y[0]! - nu) ** 2 + y[1]! ** 2;
      return { p, q, d1: p * Math.sqrt(p), d2: q * Math.sqrt(q) };
    };
    const orbit: Problem = {
      size: 4,
      f: (_t, y) => {
        const { d1, d2 } = parts(y);
        return [
          y[2]!,
          y[3]!,
          y[0]! + 2 * y[3]! - (nu * (y[0]! + mu)) / d1 - (mu * (y[0]! - nu)) / d2,
          y[1]! - 2 * y[2]! - (nu * y[1]!) / d1 - (mu * y[1]!) / d2,
        ];
      },
      j: (_t, y) => {
        const { p, q, d1, d2 } = parts(y);
        const a = y[0]! + mu;
        const b = y[0]! - nu;
        const c = y[1]!;
        const xx = 1 - nu / d1 - mu / d2 + (3 * nu * a * a) / (d1 * p) + (3 * mu * b * b) / (d2 * q);
        const xy = (3 * nu * a * c) / (d1 * p) + (3 * mu * b * c) / (d2 * q);
        const yy = 1 - nu / d1 - mu / d2 + (3 * nu * c * c) / (d1 * p) + (3 * mu * c * c) / (d2 * q);
        return [
          [0, 0, 1, 0],
          [0, 0, 0, 1],
          [xx, xy, 0, 2],
          [xy, yy, -2, 0],
        ];
      },
    };
    const start = [0.994, 0, 0, -2.0015851063790824];
    const { y } = solve(orbit, start, 0, 17.065216560157964, 1e-11);
    expect(Math.abs(y[0]! - 0.994)).toBeLessThan(1e-4);
    expect(Math.abs(y[1]!)).toBeLessThan(1e-4);
  });

  it('fills a volume through a laminar leak in the time computed by hand (reference sheet, J4)', () => {
    const flow = 20e-3 / 60;
    const leak = flow / 150e5;
    const rate = 1.4e9 / 1e-3;
    const tau = 1 / (rate * leak);
    expect(tau * 1000).toBeCloseTo(32.14, 2);
    const { y } = solve(
      { size: 1, nominal: [2e5], f: (_t, p) => [rate * (flow - leak * p[0]!)], j: () => [[-rate * leak]] },
      [0],
      0,
      tau,
      1e-8,
    );
    expect(y[0]! / 1e5).toBeCloseTo(94.8, 1);
  });

  it('lets an oil spring ring with the right period and decay (reference sheet, J5)', () => {
    const w = 2 * Math.PI * 28.52;
    const zeta = 0.1;
    const spring: Problem = {
      size: 2,
      nominal: [0.01, 1],
      f: (_t, y) => [y[1]!, -w * w * y[0]! - 2 * zeta * w * y[1]!],
      j: () => [
        [0, 1],
        [-w * w, -2 * zeta * w],
      ],
    };
    const period = (2 * Math.PI) / (w * Math.sqrt(1 - zeta * zeta));
    expect(period * 1000).toBeCloseTo(35.24, 1);
    const { y } = solve(spring, [1, 0], 0, period, 1e-8);
    expect(y[0]).toBeCloseTo(0.532, 3);
  });

  it('never evaluates outside the interval', () => {
    const { times, outcome } = solve(tracking, [5], 0.3, 0.7, 1e-6);
    expect(outcome).toBe('end');
    expect(Math.min(...times)).toBeGreaterThanOrEqual(0.3);
    expect(Math.max(...times)).toBeLessThanOrEqual(0.7);
  });

  it('refuses a start that is not finite and ends at once on a run of no length', () => {
    const refused = solve(tracking, [Number.NaN], 0, 1, 1e-4);
    expect(refused.outcome).toBe('failed');
    expect(refused.integrator.failure).toMatchObject({ reason: 'not-finite-start', state: 0 });
    const none = solve(tracking, [2], 1, 1, 1e-4);
    expect(none.outcome).toBe('end');
    expect(none.y[0]).toBe(2);
    expect(none.times).toHaveLength(0);
  });

  it('lets a state decay to nothing without getting stuck in vanishing numbers', () => {
    const decay: Problem = {
      size: 2,
      f: (_t, y) => [-50 * y[0]! + 20 * y[1]!, -30 * y[1]!],
      j: () => [
        [-50, 20],
        [0, -30],
      ],
    };
    const { outcome, integrator, y } = solve(decay, [1, 1], 0, 1000, 1e-6, { longestStep: 0.25 });
    expect(outcome).toBe('end');
    expect(integrator.counts.rejected).toBeLessThan(20);
    expect([...y]).toEqual([0, 0]);
  });

  it('says where it sticks instead of throwing', () => {
    const burst = solve({ size: 1, f: (_t, y) => [y[0]! * y[0]!], j: (_t, y) => [[2 * y[0]!]] }, [1], 0, 2, 1e-6);
    expect(burst.outcome).toBe('failed');
    expect(burst.integrator.failure?.state).toBe(0);
    expect(burst.integrator.failure?.time).toBeCloseTo(1, 4);
    const { integrator } = integratorOf(tracking, { stepCap: 5, tolerance: 1e-10 });
    integrator.begin(0, Float64Array.of(5), 10);
    let outcome = integrator.step();
    while (outcome === 'accepted') outcome = integrator.step();
    expect(integrator.failure?.reason).toBe('step-cap');
  });
});
