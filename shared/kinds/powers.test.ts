import { describe, expect, it } from 'vitest';
import type { Powers } from './kind.ts';
import { kinds } from './registry.ts';
import { scatter, seeded } from './scatter.ts';
import { type Rig, rigOf } from './testing.ts';

/** Each kind declares supplied, delivered, heat and stored power by its own laws; what crosses its ports must come to the same. */

function powersOf(rig: Rig): Powers {
  const out: Powers = { supplied: 0, delivered: 0, heat: 0, stored: 0 };
  rig.kind.powers(rig.block, 0, rig.w, out);
  return out;
}

/** Power taken in through the ports [W]: what the nodes and the shaft lose. */
function takenIn(rig: Rig): number {
  let power = 0;
  rig.kind.ports.forEach((port, k) => {
    power -= rig.pushed(port.id) * rig.w.y[k]!;
  });
  return power;
}

describe('energy laws', () => {
  for (const kind of kinds) {
    it(`${kind.id}: in through the ports + supplied = delivered + heat + stored`, () => {
      const random = seeded(17 + kind.id.length);
      for (let trial = 0; trial < 300; trial += 1) {
        const rig = rigOf(
          kind,
          kind.id === 'cylinder'
            ? { workForce: 52e3, workContact: 0.1, workFull: 0.35, angle: 0.5, workSpringback: 0.3, crossLeakage: 1e-12 }
            : {},
        );
        scatter(rig, random, trial % 2 === 1);
        rig.flow();
        const p = powersOf(rig);
        const size = Math.abs(takenIn(rig)) + p.supplied + p.delivered + Math.abs(p.heat) + Math.abs(p.stored) + 1;
        expect(Math.abs(takenIn(rig) + p.supplied - p.delivered - p.heat - p.stored) / size).toBeLessThan(1e-9);
        expect(p.supplied).toBeGreaterThanOrEqual(0);
        expect(p.delivered).toBeGreaterThanOrEqual(0);
        expect(p.heat).toBeGreaterThanOrEqual(-1e-9 * size);
      }
    });
    it(`${kind.id}: oil is neither made nor lost`, () => {
      const random = seeded(5 + kind.id.length);
      for (let trial = 0; trial < 50; trial += 1) {
        const rig = rigOf(kind);
        scatter(rig, random, true);
        rig.flow();
        let sum = 0;
        let size = 1e-12;
        for (const port of kind.ports) {
          if (port.medium !== 'oil') continue;
          sum += rig.pushed(port.id);
          size += Math.abs(rig.pushed(port.id));
        }
        // A cylinder's chambers take up what does not come out again.
        if (kind.id === 'cylinder')
          sum += (rig.coefficients.areaA! - rig.coefficients.areaB!) * rig.w.y[rig.names.indexOf('state:velocity')]!;
        expect(Math.abs(sum) / size).toBeLessThan(1e-9);
      }
    });
  }
});
