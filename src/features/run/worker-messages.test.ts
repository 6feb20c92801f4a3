import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { evaluateToEnd } from '#shared/findings/evaluate.ts';
import { tolerances } from '#shared/simulation/result.ts';
import { transferables } from './worker-messages.ts';

/** The demo without its overload relay: its load picture has an empty curve. */
const withoutRelay = {
  ...demoCircuit,
  components: demoCircuit.components.map((component) =>
    component.id === 'M1'
      ? { ...component, parameters: { ...component.parameters, relayFitted: { value: 'no', source: 'typed' as const } } }
      : component,
  ),
};

describe('what is moved from the worker to the page', () => {
  it('leaves nothing behind that the next result needs', () => {
    for (let run = 0; run < 2; run++) {
      const outcome = evaluateToEnd(withoutRelay, 'A', tolerances.draft);
      if (!outcome.ok) throw new Error('the demo runs');
      const { run: result, curves } = outcome.evaluation;
      expect(curves?.trips.pressure.length).toBe(0);
      const moved = transferables(result, curves);
      expect(moved.length).toBeGreaterThan(10);
      expect(moved.every((buffer) => (buffer as ArrayBuffer).byteLength > 0)).toBe(true);
      structuredClone({ result, curves }, { transfer: moved });
    }
  });
});
