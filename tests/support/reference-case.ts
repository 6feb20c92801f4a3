import { readFileSync } from 'node:fs';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { bisect, crosses, SUBSAMPLES } from '#shared/numerics/events.ts';
import type { CompiledCircuit } from '#shared/simulation/circuit.ts';
import { compileCircuit } from '#shared/simulation/compile.ts';
import type { RunResult } from '#shared/simulation/result.ts';
import { runToEnd } from '#shared/simulation/run.ts';

/** Columns of the reference tables, in words of the compiled circuit's states. */
const stateWords = {
  w: 'M1 shaft (speed)',
  alpha: 'P1 (stroke)',
  y_relief: 'V2 (lift)',
  pP: 'P1 outlet (pressure)',
  pL: 'V1 outlet (pressure)',
  pV: 'J1 arm a (pressure)',
  pA: 'A1 cap side (pressure)',
  pB: 'A1 rod side (pressure)',
  pT: 'J2 arm a (pressure)',
  x: 'A1 (rod position)',
  v: 'A1 (rod speed)',
} as const;

export type StateName = keyof typeof stateWords;
export const stateNames = Object.keys(stateWords) as StateName[];

const folder = new URL('../fixtures/', import.meta.url);

export function readFixtureCircuit(name: string): CircuitDocument {
  return JSON.parse(readFileSync(new URL(`circuits/v1/${name}.json`, folder), 'utf8')) as CircuitDocument;
}

export function compiled(document: CircuitDocument, caseId = document.cases[0]?.id ?? ''): CompiledCircuit {
  const result = compileCircuit(document, caseId);
  if (!result.ok) throw new Error(result.problems.map((problem) => problem.message).join('\n'));
  return result.circuit;
}

/** A table of the reference folder: one record of numbers per row. */
export function readTable(file: string): Record<string, number>[] {
  const [head = '', ...rows] = readFileSync(new URL(`reference/${file}`, folder), 'utf8')
    .trim()
    .split('\n');
  const names = head.split(',');
  return rows.map((row) => Object.fromEntries(row.split(',').map((cell, i) => [names[i], Number(cell)])));
}

/** State index of every column. */
export function stateIndex(circuit: CompiledCircuit): Record<StateName, number> {
  const at = (words: string): number => {
    const index = circuit.labels.findIndex((label) => label.words === words);
    if (index < 0) throw new Error(`no state "${words}" among ${circuit.labels.map((label) => label.words).join(', ')}`);
    return index;
  };
  return Object.fromEntries(stateNames.map((name) => [name, at(stateWords[name])])) as Record<StateName, number>;
}

export interface ReferenceRun {
  readonly run: RunResult;
  /** States at the times asked for. */
  readonly samples: readonly Float64Array[];
  /** Times at which the shaft passes 10 rad/s, alternately up and down. */
  readonly shaftTimes: readonly number[];
  /** Largest and smallest value of every state over the run, from accepted steps and quarter points. */
  readonly max: Float64Array;
  readonly min: Float64Array;
}

/** Runs a circuit and takes its states at given times from the dense output. */
export function runAtTimes(circuit: CompiledCircuit, tolerance: number, times: readonly number[]): ReferenceRun {
  const speed = stateIndex(circuit).w;
  const samples: Float64Array[] = [];
  const shaftTimes: number[] = [];
  const max = circuit.start.slice();
  const min = circuit.start.slice();
  const y = circuit.start.slice();
  let before = y[speed]! - 10;
  const run = runToEnd(circuit, tolerance, {
    onStep: (step) => {
      const length = step.to - step.from;
      const take = (q: number): number => {
        step.dense(q, y);
        return y[speed]! - 10;
      };
      while (samples.length < times.length && times[samples.length]! <= step.to) {
        take((times[samples.length]! - step.from) / length);
        samples.push(y.slice());
      }
      SUBSAMPLES.forEach((q, k) => {
        const now = take(q);
        for (let i = 0; i < circuit.size; i++) {
          if (y[i]! > max[i]!) max[i] = y[i]!;
          if (y[i]! < min[i]!) min[i] = y[i]!;
        }
        const crossing = crosses(before, now);
        before = now;
        if (crossing) shaftTimes.push(step.from + length * bisect(take, SUBSAMPLES[k - 1] ?? 0, q, crossing === 'rises', length));
      });
    },
  });
  return { run, samples, shaftTimes, max, min };
}
