import { describe, expect, it } from 'vitest';
import { randomCircuit } from '../support/random-circuit.ts';
import { runRandomCircuits } from '../support/run-random-circuits.ts';

describe('random circuits', () => {
  it('are the same for the same seed', () => {
    expect(randomCircuit(7)).toEqual(randomCircuit(7));
    expect(randomCircuit(7)).not.toEqual(randomCircuit(8));
  });

  it('run to the end or fail as values: no exception, no number that is none', () => {
    const summary = runRandomCircuits(1, 200);
    expect(summary.faults).toEqual([]);
    expect(summary.finished).toBeGreaterThanOrEqual(199);
    expect(summary.residuals.middle).toBeLessThan(1e-4);
    expect(summary.residuals.of95).toBeLessThan(1e-3);
  });
});
