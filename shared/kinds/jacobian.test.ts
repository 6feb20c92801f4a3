import { describe, expect, it } from 'vitest';
import { kinds } from './registry.ts';
import { scatter, seeded } from './scatter.ts';
import { jacobianError, rigOf } from './testing.ts';

/** Every kind's Jacobian against central differences (fourth order), at 200 seeded random states each: pressures, speeds,
 *  own states, inputs and faults all moved. Errors relative to the largest entry of the row. */

const variants: Record<string, readonly Record<string, number | string>[]> = {
  'directional-valve-4-3': [{ centre: 'closed' }, { centre: 'open' }, { centre: 'tandem' }, { centre: 'float' }],
  'relief-valve': [{}, { reseat: 1 }, { 'raw.crackingPressure': 150e5, 'raw.overridePressure': 20e5, 'raw.flowCoefficient': 1.6e-7 }],
  'electric-motor': [
    {},
    { 'raw.klossAlone': 1, 'raw.reverseBrake': 50 },
    { designLetter: 'entered', pullOut: 2.4, pullUp: 1.5, lockedRotor: 2.6 },
  ],
  cylinder: [
    {},
    { workForce: 52e3, workContact: 0.1, workFull: 0.35, workShape: '1', workSpringback: 0.02, angle: 0.7 },
    { workForce: 52e3, workContact: 0.1, workFull: 0.35, workShape: '3', springRate: 1e5, springFrom: 0.2, crossLeakage: 1e-13 },
  ],
};

describe('exact Jacobians', () => {
  for (const kind of kinds) {
    for (const [index, values] of (variants[kind.id] ?? [{}]).entries()) {
      for (const faults of [false, true]) {
        it(`${kind.id}, plate ${index + 1}${faults ? ', with faults' : ''}`, () => {
          const random = seeded(1000 * kind.id.length + index * 7 + (faults ? 3 : 0) + 1);
          const run = {
            density: 860,
            viscosity: 0.03,
            referenceViscosity: 0.04,
            atmosphere: 98000,
            supplyVoltage: 400,
            supplyFrequency: 50,
            supplyImpedance: index === 1 ? 0 : 0.8,
          };
          let worst = { worst: 0, where: '' };
          for (let trial = 0; trial < 200; trial += 1) {
            const rig = rigOf(kind, values, run);
            scatter(rig, random, faults);
            const found = jacobianError(rig);
            if (found.worst > worst.worst) worst = found;
          }
          expect(worst.worst, worst.where).toBeLessThan(1e-5);
        });
      }
    }
  }

  it('notices a wrong entry', () => {
    const valve = kinds.find((kind) => kind.id === 'throttle')!;
    const broken = rigOf({
      ...valve,
      jacobian: (block, w) => {
        valve.jacobian(block, w);
        w.jac[0] = w.jac[0]! * 1.01;
      },
    });
    broken.set('A', 50e5);
    expect(jacobianError(broken).worst).toBeGreaterThan(1e-3);
  });
});
