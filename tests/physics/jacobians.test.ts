import { describe, expect, it } from 'vitest';
import { crowdedCircuit } from '#shared/circuit/samples/crowded.ts';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import type { CircuitDocument } from '#shared/circuit/schema.ts';
import { kinds } from '#shared/kinds/registry.ts';
import type { CompiledCircuit } from '#shared/simulation/circuit.ts';
import { CircuitSystem } from '#shared/simulation/system.ts';
import { randomCircuit, randomSequence } from '../support/random-circuit.ts';
import { compiled, readFixtureCircuit } from '../support/reference-case.ts';

/** A state anywhere a run may come: pressures from a cavity to 400 bar, shafts both ways, rods in and beyond the stops. */
function randomState(circuit: CompiledCircuit, next: () => number): Float64Array {
  const y = new Float64Array(circuit.size + 1);
  for (let i = 0; i < circuit.size; i++) {
    const kind = i < circuit.nodes ? 'pressure' : i < circuit.nodes + circuit.shafts ? 'speed' : 'own';
    if (kind === 'pressure') y[i] = next() < 0.2 ? -1.05e5 * next() : 4e7 * next() ** 3;
    else if (kind === 'speed') y[i] = -20 + 220 * next();
    else y[i] = circuit.start[i]! + (next() - (circuit.labels[i]!.words.includes('position') ? 0.04 : 0.3)) * 12 * circuit.nominal[i]!;
  }
  return y;
}

/** Largest disagreement of the Jacobian with central differences, in entries scaled by the states' nominal sizes and relative
 *  to the entry plus a small share of its row; with the entry's place. */
function disagreement(circuit: CompiledCircuit, system: CircuitSystem, time: number, y: Float64Array): { worst: number; place: string } {
  const { size, pattern, nominal, labels } = circuit;
  const dy = new Float64Array(size + 1);
  const values = new Float64Array(pattern.rows.length + 1);
  system.derivative(time, y, dy);
  system.jacobian(time, y, values);
  const exact = new Float64Array(size * size);
  for (let s = 0; s < pattern.rows.length; s++) exact[pattern.rows[s]! * size + pattern.columns[s]!]! += values[s]!;
  const scaled = (matrix: Float64Array, i: number, j: number): number => (matrix[i * size + j]! * nominal[j]!) / nominal[i]!;

  const differences = [1e-4, 1e-5, 1e-6].map((share) => {
    const matrix = new Float64Array(size * size);
    const up = new Float64Array(size + 1);
    const down = new Float64Array(size + 1);
    const moved = y.slice();
    for (let j = 0; j < size; j++) {
      const h = share * (nominal[j]! + 0.01 * Math.abs(y[j]!));
      moved[j] = y[j]! + h;
      system.derivative(time, moved, up);
      moved[j] = y[j]! - h;
      system.derivative(time, moved, down);
      moved[j] = y[j]!;
      for (let i = 0; i < size; i++) matrix[i * size + j] = (up[i]! - down[i]!) / (2 * h);
    }
    return matrix;
  });
  let worst = 0;
  let place = '';
  for (let i = 0; i < size; i++) {
    let row = 0;
    for (let j = 0; j < size; j++) row = Math.max(row, Math.abs(scaled(exact, i, j)), Math.abs(scaled(differences[1]!, i, j)));
    for (let j = 0; j < size; j++) {
      const miss = Math.min(...differences.map((matrix) => Math.abs(scaled(exact, i, j) - scaled(matrix, i, j))));
      const relative = miss / (Math.abs(scaled(exact, i, j)) + 1e-4 * row + 1e-9);
      if (relative > worst) {
        worst = relative;
        place = `d(${labels[i]?.words})/d(${labels[j]?.words})`;
      }
    }
  }
  return { worst, place };
}

function check(document: CircuitDocument, states: number): void {
  const circuit = compiled(document);
  const system = new CircuitSystem(circuit);
  const next = randomSequence(circuit.size);
  for (let k = 0; k < states; k++) {
    const time = circuit.duration * next();
    system.enterSegment(time);
    const y = randomState(circuit, next);
    const { worst, place } = disagreement(circuit, system, time, y);
    expect(worst, `${document.title}, state ${k}: ${place}`).toBeLessThan(2e-3);
  }
}

describe('Jacobian of compiled circuits against central differences', () => {
  it('in the reference cases', () => {
    check(readFixtureCircuit('s1'), 30);
    check(readFixtureCircuit('s2'), 30);
  });

  it('in the demo and in a crowded circuit', () => {
    check(demoCircuit, 30);
    check(crowdedCircuit, 20);
  });

  it('in random circuits, together holding every kind', () => {
    const seen = new Set<string>();
    for (let seed = 1; seed <= 30; seed++) {
      const document = randomCircuit(seed);
      for (const component of document.components) seen.add(component.kind);
      check(document, 6);
    }
    expect([...seen].sort()).toEqual(kinds.map((kind) => kind.id).sort());
  });

  it('would notice a wrong entry', () => {
    const circuit = compiled(readFixtureCircuit('s1'));
    const system = new CircuitSystem(circuit);
    const spoiled = Object.create(system) as CircuitSystem;
    spoiled.jacobian = (t, y, values) => {
      system.jacobian(t, y, values);
      values[circuit.pattern.slot(circuit.size - 1, circuit.size - 2)]! *= 1.05;
    };
    const y = randomState(circuit, randomSequence(3));
    y[circuit.size - 2] = 0.41;
    expect(disagreement(circuit, spoiled, 5, y).worst).toBeGreaterThan(0.01);
  });
});
