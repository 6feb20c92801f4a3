/** What an integrator needs from a system of equations and what it gives back. Vectors may be longer than `size` (a system may
 *  keep constants behind its states); the integrator copies whole vectors and changes only the first `size` entries. */

/** y′ = f(t, y) with an exact Jacobian. */
export interface OdeSystem {
  /** Number of states that are integrated. */
  readonly size: number;
  /** Length of state vectors (≥ size). */
  readonly length: number;
  /** Absolute scale of each state: absolute tolerance = rtol × nominal. */
  readonly nominal: Float64Array;
  /** Number of states over which the root mean square of the error is taken: those on which others depend, so that states that
   *  only watch (a gauge's needle, a relay's heat) do not loosen the tolerance of the rest. */
  readonly counted: number;
  /** True while f depends on time explicitly in the present segment. */
  readonly ramping: boolean;
  /** Writes the first `size` entries of dy. */
  derivative(t: number, y: Float64Array, dy: Float64Array): void;
  /** Writes ∂f/∂y at (t, y) into the linear solver's slots. */
  jacobian(t: number, y: Float64Array, values: Float64Array): void;
}

/** Solves (shift·I − J)·x = b for a J of fixed pattern. */
export interface LinearSolver {
  /** Number of entries of `values`, without the dump slot at the end. */
  readonly slots: number;
  /** Nonzeros of the factors. */
  readonly nonzeros: number;
  /** How often the fallback with full pivoting was needed. */
  readonly fallbacks: number;
  /** False when the matrix is singular or not finite. */
  factor(values: Float64Array, shift: number): boolean;
  /** Overwrites the first n entries of b with the solution. */
  solve(b: Float64Array): void;
  /** Like `solve`, with a residual check of the factors; false when no usable solution was found. */
  solveChecked(b: Float64Array): boolean;
}

export interface SolverOptions {
  /** Relative tolerance, 1e-12 … 1e-2. */
  readonly tolerance: number;
  /** First step after a start or an event [s]. */
  readonly firstStep: number;
  /** Longest step [s]: bounds how far dense output is stretched between two accepted states. */
  readonly longestStep: number;
  /** Steps, rejected ones included, after which the run is given up. */
  readonly stepCap: number;
  /** The relative part of a state's tolerance stops growing at this many nominal sizes [30]: at 500 bar a difference of a fraction
   *  of a bar still decides whether a check valve is open. (Measured: 10 times less error in the stalled reference case for
   *  1.5 % more steps.) */
  readonly relativeLimit: number;
}

export const defaultSolverOptions: SolverOptions = {
  tolerance: 1e-4,
  firstStep: 1e-4,
  longestStep: Number.POSITIVE_INFINITY,
  stepCap: 200_000,
  relativeLimit: 30,
};

export type StepOutcome = 'accepted' | 'end' | 'failed';

export interface StepFailure {
  readonly reason: 'not-finite-start' | 'step-too-small' | 'step-cap' | 'singular';
  readonly time: number;
  /** Index of the state that asked for the smallest step, −1 when unknown. */
  readonly state: number;
}

export interface StepCounts {
  steps: number;
  rejected: number;
  evaluations: number;
  jacobians: number;
  factorisations: number;
}

/** A one-step method with dense output. After an accepted step the step just taken is readable. */
export interface Integrator {
  readonly counts: StepCounts;
  readonly failure: StepFailure | null;
  /** Start and end of the step just taken [s]. */
  readonly from: number;
  readonly to: number;
  /** State at `from` and `to`. */
  readonly before: Float64Array;
  readonly after: Float64Array;
  /** Starts a segment at (t, y) that ends exactly at `end`; f is never evaluated outside [t, end]. */
  begin(t: number, y: Float64Array, end: number): void;
  /** Takes one accepted step; 'end' when the segment is already complete. */
  step(): StepOutcome;
  /** State inside the step just taken, q = 0 … 1. */
  dense(q: number, out: Float64Array): void;
  /** Time derivative of the dense output [per s]. */
  denseSlope(q: number, out: Float64Array): void;
}
