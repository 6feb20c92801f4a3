/** The part of odex (extrapolation method for equations that are not stiff) that we use. Import it only from here: the
 *  package's own TypeScript source does not compile under our options. */

export declare enum Outcome {
  Converged = 0,
  MaxStepsExceeded = 1,
  EarlyReturn = 2,
}

export interface Solution {
  readonly y: number[];
  /** Always check: on MaxStepsExceeded `xEnd` still reads as the end that was asked for. */
  readonly outcome: Outcome;
  readonly nStep: number;
  readonly nAccept: number;
  readonly nReject: number;
  readonly nEval: number;
}

export declare class Solver {
  constructor(dimension: number);
  /** 10 000 unless raised: too few for a circuit. */
  maxSteps: number;
  initialStepSize: number;
  relativeTolerance: number | number[];
  absoluteTolerance: number | number[];
  solve(derivative: (x: number, y: number[]) => number[], x: number, y0: readonly number[], xEnd: number): Solution;
}
