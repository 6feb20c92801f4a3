import { compileCircuit } from '#shared/simulation/compile.ts';
import { runToEnd } from '#shared/simulation/run.ts';
import { randomCircuit } from './random-circuit.ts';

export interface RandomSummary {
  readonly circuits: number;
  readonly finished: number;
  readonly refused: number;
  /** Seed and reason of every run that ended early. */
  readonly ended: readonly string[];
  /** Seed and what is wrong: an exception, a value that is no number, an end without a reason. */
  readonly faults: readonly string[];
  readonly residuals: { readonly middle: number; readonly of95: number; readonly largest: number };
  readonly steps: { readonly middle: number; readonly of95: number; readonly largest: number };
}

function spread(values: number[]): { middle: number; of95: number; largest: number } {
  values.sort((a, b) => a - b);
  const at = (share: number): number => values[Math.min(values.length - 1, Math.floor(values.length * share))] ?? 0;
  return { middle: at(0.5), of95: at(0.95), largest: at(1) };
}

/** Compiles and runs the circuits of seeds `from` … `to` at normal tolerance. */
export function runRandomCircuits(from: number, to: number): RandomSummary {
  const faults: string[] = [];
  const ended: string[] = [];
  const residuals: number[] = [];
  const steps: number[] = [];
  let refused = 0;
  for (let seed = from; seed <= to; seed++) {
    try {
      const compiled = compileCircuit(randomCircuit(seed), 'A');
      if (!compiled.ok) {
        refused++;
        if (!compiled.problems.some((problem) => problem.message.length > 0)) faults.push(`${seed}: refused without words`);
        continue;
      }
      const run = runToEnd(compiled.circuit, 1e-4, { stepCap: 20_000 });
      const bad = run.channels.find((channel) => !channel.values.every(Number.isFinite));
      if (bad) faults.push(`${seed}: ${bad.address} holds a value that is no number`);
      if (run.times.some((time, i) => i > 0 && time < run.times[i - 1]!)) faults.push(`${seed}: times go backwards`);
      if (run.status !== 'finished') {
        ended.push(`${seed}: ${run.reason}`);
        if (!run.reason) faults.push(`${seed}: ended without a reason`);
        continue;
      }
      residuals.push(run.audit?.residual ?? Number.NaN);
      steps.push(run.statistics.steps);
    } catch (error) {
      faults.push(`${seed}: ${String(error)}`);
    }
  }
  const circuits = to - from + 1;
  return { circuits, finished: steps.length, refused, ended, faults, residuals: spread(residuals), steps: spread(steps) };
}
