import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { crowdedCircuit } from '#shared/circuit/samples/crowded.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import type { CompiledCircuit } from '#shared/simulation/circuit.ts';
import { compileCircuit } from '#shared/simulation/compile.ts';
import { runToEnd } from '#shared/simulation/run.ts';
import { CircuitSystem } from '#shared/simulation/system.ts';

export interface Measure {
  readonly name: string;
  readonly value: number;
  readonly unit: string;
  readonly goal?: number;
}

/** Read from the project's root: the bundle lies elsewhere. */
function fixture(name: string): CircuitDocument {
  return JSON.parse(readFileSync(join(process.cwd(), 'tests/fixtures/circuits/v1', `${name}.json`), 'utf8')) as CircuitDocument;
}

function compiled(document: CircuitDocument): CompiledCircuit {
  const result = compileCircuit(document, document.cases[0]?.id ?? '');
  if (!result.ok) throw new Error(result.problems.map((problem) => problem.message).join('\n'));
  return result.circuit;
}

/** Median and least time of repeated calls [ms], after warming up. */
function timed(call: () => void, repeats: number, warm: number): { median: number; least: number } {
  for (let k = 0; k < warm; k++) call();
  const times: number[] = [];
  for (let k = 0; k < repeats; k++) {
    const start = performance.now();
    call();
    times.push(performance.now() - start);
  }
  times.sort((a, b) => a - b);
  return { median: times[times.length >> 1] ?? Number.NaN, least: times[0] ?? Number.NaN };
}

/** What this machine does just now: a chain of a million square roots that wait for each other [ms]. */
function anchor(): number {
  let sum = 0;
  return timed(
    () => {
      for (let k = 0; k < 1e6; k++) sum = Math.sqrt(sum + k);
    },
    9,
    3,
  ).median;
}

function passes(circuit: CompiledCircuit): { derivative: number; jacobian: number; reading: number } {
  const system = new CircuitSystem(circuit);
  const states: Float64Array[] = [];
  runToEnd(circuit, 1e-4, { onStep: (step) => states.push(step.after.slice()) });
  const dy = new Float64Array(circuit.size + 1);
  const values = new Float64Array(circuit.pattern.rows.length + 1);
  const each = (call: (y: Float64Array) => void): number =>
    (timed(
      () => {
        for (let k = 0; k < 20; k++) for (const y of states) call(y);
      },
      9,
      3,
    ).least /
      (20 * states.length)) *
    1e6;
  return {
    derivative: each((y) => system.derivative(0, y, dy)),
    jacobian: each((y) => system.jacobian(0, y, values)),
    reading: each((y) => system.read(0, y)),
  };
}

export function measure(): Measure[] {
  const first = compiled(fixture('s1'));
  const list: Measure[] = [{ name: 'anchor: a million dependent square roots', value: anchor(), unit: 'ms' }];
  const run = runToEnd(first, 1e-4);
  const warm = timed(() => runToEnd(first, 1e-4), 41, 20);
  list.push(
    { name: 'S1, 10 s at 1e-4 with all channels, warm, median', value: warm.median, unit: 'ms', goal: 20 },
    { name: 'S1, the same, least', value: warm.least, unit: 'ms' },
    { name: 'S1 steps accepted', value: run.statistics.steps, unit: '' },
    { name: 'S1 steps rejected', value: run.statistics.rejected, unit: '' },
    { name: 'S1 evaluations of the right-hand side', value: run.statistics.evaluations, unit: '' },
    { name: 'S1 rows recorded', value: run.times.length, unit: '' },
  );
  const cost = passes(first);
  list.push(
    { name: 'right-hand side of S1', value: cost.derivative, unit: 'ns' },
    { name: 'Jacobian of S1', value: cost.jacobian, unit: 'ns' },
    { name: 'reading pass of S1', value: cost.reading, unit: 'ns' },
  );
  for (const [name, document] of [
    ['S2', fixture('s2')],
    ['demo, case A', demoCircuit],
    ['crowded circuit', crowdedCircuit],
  ] as const) {
    const circuit = compiled(document);
    list.push(
      { name: `${name} at 1e-4, warm, median`, value: timed(() => runToEnd(circuit, 1e-4), 21, 8).median, unit: 'ms' },
      { name: `${name} at 1e-3 (draft), warm, median`, value: timed(() => runToEnd(circuit, 1e-3), 21, 4).median, unit: 'ms' },
    );
  }
  list.push({ name: 'compiling the demo', value: timed(() => compiled(demoCircuit), 21, 10).median, unit: 'ms' });
  list.push({ name: 'energy account of S1, residual', value: run.audit?.residual ?? Number.NaN, unit: '', goal: 1e-3 });
  return list;
}
