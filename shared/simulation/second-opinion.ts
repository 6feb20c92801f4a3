import { breakpoints } from '../circuit/profile.ts';
import { Outcome, Solver } from '../odex/solver.js';
import type { CompiledCircuit } from './circuit.ts';
import { runToEnd } from './run.ts';
import type { CircuitSystem } from './system.ts';

/** Places of the window at which the two methods are compared. */
const PLACES = 20;
/** Steps of the explicit method: about 60 000 per simulated second of a stiff circuit. */
const MOST_STEPS = 2_000_000;
const MOST_EVALUATIONS = 20_000_000;

export interface SecondOpinionWindow {
  /** Start and end of the window [s]; short, the explicit method takes about a second of computing per simulated second. */
  readonly from: number;
  readonly to: number;
  readonly tolerance: number;
  /** Steps allowed to the second method [2 million]. */
  readonly maxSteps?: number;
}

export type SecondOpinion =
  | {
      readonly ok: true;
      /** Largest difference of any state, relative to its size plus its nominal scale. */
      readonly largestDifference: number;
      /** Which state, in words, and when [s]. */
      readonly state: string;
      readonly time: number;
      readonly evaluations: number;
    }
  | { readonly ok: false; readonly reason: string };

class TooMuchWork extends Error {}

/** Runs a window of the duty again with an unrelated method (explicit extrapolation) on the same right-hand side, starting from
 *  the engine's own state at the start of the window, and compares. */
export function secondOpinion(circuit: CompiledCircuit, window: SecondOpinionWindow): SecondOpinion {
  const from = Math.max(0, window.from);
  const to = Math.min(circuit.duration, window.to);
  if (!(to > from)) return { ok: false, reason: 'The window is empty.' };
  const places = Array.from({ length: PLACES + 1 }, (_, k) => from + ((to - from) * k) / PLACES);
  const own: Float64Array[] = from === 0 ? [circuit.start.slice()] : [];
  let system: CircuitSystem | null = null;
  const run = runToEnd(circuit, window.tolerance, {
    stop: () => own.length > PLACES,
    onStep: (step, running) => {
      system = running;
      for (let next = places[own.length]; next !== undefined && next <= step.to; next = places[own.length]) {
        const y = new Float64Array(circuit.size + 1);
        step.dense((next - step.from) / (step.to - step.from), y);
        own.push(y);
      }
    },
  });
  if (own.length <= PLACES || system === null) return { ok: false, reason: run.reason ?? 'The run ends before the window does.' };
  return compare(circuit, system, places, own, window);
}

function compare(
  circuit: CompiledCircuit,
  system: CircuitSystem,
  places: readonly number[],
  own: readonly Float64Array[],
  window: SecondOpinionWindow,
): SecondOpinion {
  const { size } = circuit;
  const solver = new Solver(size);
  solver.relativeTolerance = window.tolerance;
  solver.absoluteTolerance = Array.from(circuit.nominal.subarray(0, size), (scale) => scale * window.tolerance);
  solver.maxSteps = window.maxSteps ?? MOST_STEPS;
  const y = new Float64Array(size + 1);
  const dy = new Float64Array(size + 1);
  let evaluations = 0;
  const derivative = (t: number, values: number[]): number[] => {
    if (++evaluations > MOST_EVALUATIONS) throw new TooMuchWork('The second method needs too many evaluations.');
    for (let i = 0; i < size; i++) y[i] = values[i]!;
    system.derivative(t, y, dy);
    const out = Array.from(dy.subarray(0, size));
    if (!out.every(Number.isFinite)) throw new TooMuchWork(`The second method met a value that is not a number at ${t.toFixed(4)} s.`);
    return out;
  };
  const corners = breakpoints(system.inputs, circuit.duration);
  let values = Array.from((own[0] as Float64Array).subarray(0, size));
  let worst = { difference: 0, state: 0, time: places[0]! };
  try {
    for (let k = 1; k < places.length; k++) {
      const start = places[k - 1]!;
      const end = places[k]!;
      const stops = [...corners.filter((corner) => corner > start && corner < end), end];
      let at = start;
      for (const stop of stops) {
        system.enterSegment(at);
        solver.initialStepSize = Math.min(1e-5, stop - at);
        const solution = solver.solve(derivative, at, values, stop);
        if (solution.outcome !== Outcome.Converged) {
          return { ok: false, reason: `The second method needs more than ${solver.maxSteps} steps before ${stop.toFixed(3)} s.` };
        }
        values = solution.y;
        at = stop;
      }
      for (let i = 0; i < size; i++) {
        const mine = own[k]![i]!;
        const difference = Math.abs(values[i]! - mine) / (circuit.nominal[i]! + Math.abs(mine));
        if (difference > worst.difference) worst = { difference, state: i, time: end };
      }
    }
  } catch (error) {
    if (error instanceof TooMuchWork) return { ok: false, reason: error.message };
    throw error;
  }
  return { ok: true, largestDifference: worst.difference, state: circuit.labels[worst.state]?.words ?? '', time: worst.time, evaluations };
}
