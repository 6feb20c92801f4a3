import { type ErrorScale, errorNorm, worstState } from './error-norm.ts';
import { rodas4p } from './rodas4p-tableau.ts';
import type { Integrator, LinearSolver, OdeSystem, SolverOptions, StepCounts, StepFailure, StepOutcome } from './solver.ts';
import { factorAfterRejection, factorAfterSuccess } from './step-control.ts';

/** Taken apart here so that the inner loops read constants of this module. */
const {
  A21,
  A31,
  A32,
  A41,
  A42,
  A43,
  A51,
  A52,
  A53,
  A54,
  C2,
  C21,
  C3,
  C31,
  C32,
  C4,
  C41,
  C42,
  C43,
  C51,
  C52,
  C53,
  C54,
  C61,
  C62,
  C63,
  C64,
  C65,
  D1,
  D2,
  D3,
  D4,
  GAMMA,
  H11,
  H12,
  H13,
  H14,
  H21,
  H22,
  H23,
  H24,
  H25,
} = rodas4p;

const VANISHING = 1e-200;

/** Rodas4P: one exact Jacobian and one factorisation a step, a new factorisation only after a rejection. Needs the exact
 *  Jacobian (it is not a W-method). Deterministic: + − × ÷ and Math.sqrt only. */
export class Rosenbrock implements Integrator {
  readonly counts: StepCounts = {
    steps: 0,
    rejected: 0,
    evaluations: 0,
    jacobians: 0,
    factorisations: 0,
  };
  failure: StepFailure | null = null;
  from = 0;
  to = 0;
  before: Float64Array;
  after: Float64Array;
  private readonly k1: Float64Array;
  private readonly k2: Float64Array;
  private readonly jac: Float64Array;
  private readonly f0: Float64Array;
  private readonly f: Float64Array;
  private readonly ft: Float64Array;
  private readonly stage: Float64Array;
  private readonly u1: Float64Array;
  private readonly u2: Float64Array;
  private readonly u3: Float64Array;
  private readonly u4: Float64Array;
  private readonly u5: Float64Array;
  private readonly u6: Float64Array;
  private end = 0;
  private h = 0;
  private lastStep = 0;
  private lastError = 0;
  /** State that asked for the shortest step at the latest rejection. */
  private worst = -1;
  private readonly system: OdeSystem;
  private readonly linear: LinearSolver;
  private readonly options: SolverOptions;
  private readonly scale: ErrorScale;

  constructor(system: OdeSystem, linear: LinearSolver, options: SolverOptions) {
    this.system = system;
    this.linear = linear;
    this.options = options;
    const { size, counted, nominal } = system;
    this.scale = { size, counted, nominal, tolerance: options.tolerance, relativeLimit: options.relativeLimit };
    const vector = (): Float64Array => new Float64Array(system.length);
    this.before = vector();
    this.after = vector();
    this.k1 = vector();
    this.k2 = vector();
    this.jac = new Float64Array(linear.slots + 1);
    this.f0 = vector();
    this.f = vector();
    this.ft = vector();
    this.stage = vector();
    this.u1 = vector();
    this.u2 = vector();
    this.u3 = vector();
    this.u4 = vector();
    this.u5 = vector();
    this.u6 = vector();
  }

  begin(t: number, y: Float64Array, end: number): void {
    this.after.set(y);
    this.stage.set(y);
    this.from = t;
    this.to = t;
    this.end = end;
    this.h = this.options.firstStep;
    this.lastStep = 0;
    this.lastError = 0;
    this.failure = null;
    for (let i = 0; i < this.system.size; i++) {
      if (!Number.isFinite(y[i]!)) {
        this.failure = { reason: 'not-finite-start', time: t, state: i };
        return;
      }
    }
  }

  step(): StepOutcome {
    if (this.failure) return 'failed';
    const t = this.to;
    if (!(t < this.end)) return 'end';
    const swap = this.before;
    this.before = this.after;
    this.after = swap;
    const { system, counts, options } = this;
    const y = this.before;
    system.derivative(t, y, this.f0);
    system.jacobian(t, y, this.jac);
    counts.evaluations++;
    counts.jacobians++;
    if (system.ramping) this.timeSlope(t, y);
    else this.ft.fill(0);

    const least = 1e-15 * Math.abs(t) + 1e-30;
    let h = Math.min(this.h, options.longestStep);
    let rejectedBefore = false;
    for (;;) {
      const left = this.end - t;
      const last = h >= 0.99 * left;
      if (last) h = left;
      if (!(h > least) && !last) return this.fail('step-too-small', t);
      if (counts.steps + counts.rejected >= options.stepCap) return this.fail('step-cap', t);
      const solved = this.attempt(t, y, h);
      const error = solved ? errorNorm(this.scale, this.u6, y, this.after) : Number.NaN;
      if (error <= 1) {
        this.accept(t, h, last, Math.max(error, 1e-10), rejectedBefore);
        return 'accepted';
      }
      this.worst = worstState(this.scale, this.u6, y, this.after);
      if (!(h > least)) return this.fail(solved ? 'step-too-small' : 'singular', t);
      counts.rejected++;
      rejectedBefore = true;
      h *= factorAfterRejection(error);
    }
  }

  private accept(t: number, h: number, last: boolean, error: number, rejectedBefore: boolean): void {
    this.counts.steps++;
    const ratio = this.lastStep > 0 ? h / this.lastStep : 0;
    this.h = h * factorAfterSuccess(error, ratio, this.lastError, rejectedBefore);
    this.lastStep = h;
    this.lastError = error;
    this.from = t;
    this.to = last ? this.end : t + h;
    this.finish();
  }

  private fail(reason: StepFailure['reason'], time: number): StepOutcome {
    const state = this.worst < 0 && this.counts.steps > 0 ? worstState(this.scale, this.u6, this.before, this.after) : this.worst;
    this.failure = { reason, time, state };
    this.after.set(this.before);
    return 'failed';
  }

  /** ∂f/∂t by one difference, inside the segment. */
  private timeSlope(t: number, y: Float64Array): void {
    const { system, ft, f0 } = this;
    const delta = Math.min(Math.sqrt(1e-16 * Math.max(1e-5, Math.abs(t))), 0.5 * (this.end - t));
    const later = t + delta;
    const used = later - t;
    this.counts.evaluations++;
    system.derivative(later, y, ft);
    const inverse = used > 0 ? 1 / used : 0;
    for (let i = 0; i < system.size; i++) ft[i] = (ft[i]! - f0[i]!) * inverse;
  }

  /** The six stages; false when the matrix cannot be solved. Leaves y1 in `after` and the stages in u1 … u6. */
  private attempt(t: number, y: Float64Array, h: number): boolean {
    const { system, linear, f0, f, ft, stage, after, u1, u2, u3, u4, u5, u6 } = this;
    const n = system.size;
    const end = this.end;
    this.counts.factorisations++;
    if (!linear.factor(this.jac, 1 / (h * GAMMA))) return false;
    const ih = 1 / h;
    const d1 = h * D1;
    const d2 = h * D2;
    const d3 = h * D3;
    const d4 = h * D4;
    for (let i = 0; i < n; i++) u1[i] = f0[i]! + d1 * ft[i]!;
    if (!linear.solveChecked(u1)) return false;

    for (let i = 0; i < n; i++) stage[i] = y[i]! + A21 * u1[i]!;
    system.derivative(Math.min(t + C2 * h, end), stage, f);
    for (let i = 0; i < n; i++) u2[i] = f[i]! + ih * (C21 * u1[i]!) + d2 * ft[i]!;
    linear.solve(u2);

    for (let i = 0; i < n; i++) stage[i] = y[i]! + A31 * u1[i]! + A32 * u2[i]!;
    system.derivative(Math.min(t + C3 * h, end), stage, f);
    for (let i = 0; i < n; i++) u3[i] = f[i]! + ih * (C31 * u1[i]! + C32 * u2[i]!) + d3 * ft[i]!;
    linear.solve(u3);

    for (let i = 0; i < n; i++) stage[i] = y[i]! + A41 * u1[i]! + A42 * u2[i]! + A43 * u3[i]!;
    system.derivative(Math.min(t + C4 * h, end), stage, f);
    for (let i = 0; i < n; i++) u4[i] = f[i]! + ih * (C41 * u1[i]! + C42 * u2[i]! + C43 * u3[i]!) + d4 * ft[i]!;
    linear.solve(u4);

    const later = Math.min(t + h, end);
    for (let i = 0; i < n; i++) stage[i] = y[i]! + A51 * u1[i]! + A52 * u2[i]! + A53 * u3[i]! + A54 * u4[i]!;
    system.derivative(later, stage, f);
    for (let i = 0; i < n; i++) u5[i] = f[i]! + ih * (C51 * u1[i]! + C52 * u2[i]! + C53 * u3[i]! + C54 * u4[i]!);
    linear.solve(u5);

    for (let i = 0; i < n; i++) stage[i]! += u5[i]!;
    system.derivative(later, stage, f);
    for (let i = 0; i < n; i++) {
      u6[i] = f[i]! + ih * (C61 * u1[i]! + C62 * u2[i]! + C63 * u3[i]! + C64 * u4[i]! + C65 * u5[i]!);
    }
    linear.solve(u6);
    for (let i = 0; i < n; i++) after[i] = stage[i]! + u6[i]!;
    this.counts.evaluations += 5;
    return true;
  }

  /** Coefficients of the dense output of the step just accepted; states that have all but vanished become zero, because numbers
   *  near the smallest a computer knows lose their digits and are slow. */
  private finish(): void {
    const { after, k1, k2, u1, u2, u3, u4, u5 } = this;
    for (let i = 0; i < this.system.size; i++) {
      if (Math.abs(after[i]!) < VANISHING) after[i] = 0;
      k1[i] = H11 * u1[i]! + H12 * u2[i]! + H13 * u3[i]! + H14 * u4[i]!;
      k2[i] = H21 * u1[i]! + H22 * u2[i]! + H23 * u3[i]! + H24 * u4[i]! + H25 * u5[i]!;
    }
  }

  dense(q: number, out: Float64Array): void {
    const { before, after, k1, k2 } = this;
    const p = 1 - q;
    for (let i = 0; i < this.system.size; i++) out[i] = p * before[i]! + q * (after[i]! + p * (k1[i]! + q * k2[i]!));
  }

  denseSlope(q: number, out: Float64Array): void {
    const { before, after, k1, k2 } = this;
    const inverse = 1 / (this.to - this.from);
    const p = 1 - q;
    for (let i = 0; i < this.system.size; i++) {
      const k = k1[i]! + q * k2[i]!;
      out[i] = (after[i]! - before[i]! + (p - q) * k + q * p * k2[i]!) * inverse;
    }
  }
}
