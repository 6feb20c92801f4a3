import { describe, expect, it } from 'vitest';
import type { ComponentKind } from './kind.ts';
import { kinds } from './registry.ts';
import { scatter, seeded } from './scatter.ts';
import { rigOf } from './testing.ts';

/** Any plate that may be entered, however odd, gives finite numbers: a run may be bad, never NaN. */

function anyPlate(kind: ComponentKind, random: () => number): Record<string, number | string> {
  const values: Record<string, number | string> = {};
  for (const spec of kind.parameters) {
    const choose = random();
    if (spec.type === 'choice') {
      values[spec.id] = spec.choices[Math.floor(random() * spec.choices.length)]!.value;
    } else if (choose < 0.25) {
      values[spec.id] = spec.min;
    } else if (choose < 0.5) {
      values[spec.id] = spec.max;
    } else if (spec.initial !== null) {
      values[spec.id] = Math.min(spec.max, Math.max(spec.min, spec.initial * 10 ** (2 * random() - 1)));
    }
  }
  for (const fault of kind.faults) if (random() < 0.3) values[`fault.${fault.id}`] = random();
  return values;
}

describe('any plate that may be entered', () => {
  for (const kind of kinds) {
    it(`${kind.id}: finite coefficients, flows, derivatives, readings`, () => {
      const random = seeded(kind.id.length * 31 + 5);
      for (let trial = 0; trial < 400; trial += 1) {
        const plate = anyPlate(kind, random);
        const rig = rigOf(kind, plate);
        const where = JSON.stringify(plate);
        for (const [name, value] of Object.entries(rig.coefficients)) expect(Number.isFinite(value), `${name} of ${where}`).toBe(true);
        if (trial % 2 === 1) scatter(rig, random, false);
        rig.flow();
        kind.jacobian(rig.block, rig.w);
        for (const [list, values] of Object.entries({ balance: rig.w.balance, dy: rig.w.dy, jac: rig.w.jac })) {
          expect([...values].every(Number.isFinite), `${list} of ${where}`).toBe(true);
        }
        for (const reading of kind.readings) expect(Number.isFinite(rig.reading(reading.id)), `${reading.id} of ${where}`).toBe(true);
        for (const signal of kind.signals) expect(Number.isFinite(rig.signal(signal.id)), `${signal.id} of ${where}`).toBe(true);
        kind.checks?.({ number: (id) => Number(plate[id] ?? 1), given: () => null, choice: (id) => String(plate[id]) });
      }
    });
  }
});
