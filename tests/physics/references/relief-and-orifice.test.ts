import { describe, expect } from 'vitest';
import { edgeCoefficient } from '#shared/kinds/directional-valve/laws.ts';
import { crackingPressure } from '#shared/kinds/relief-valve/laws.ts';
import { reliefValve } from '#shared/kinds/relief-valve/relief-valve.ts';
import { rigOf } from '#shared/kinds/testing.ts';
import { throttle } from '#shared/kinds/throttle.ts';
import { orifice } from '#shared/numerics/smooth.ts';
import { inUnit, near, row, si } from './row.ts';

const psi = (value: number): number => si(value, 'pressure', 'psi');
const gpm = (value: number): number => si(value, 'flow', 'gpm');
const WATER = 999;

/** Heat [W] of a part from its own power law. */
function heatOf(rig: ReturnType<typeof rigOf>): number {
  const out = { supplied: 0, delivered: 0, heat: 0, stored: 0 };
  rig.kind.powers(rig.block, 0, rig.w, out);
  return out.heat;
}

describe('relief valve', () => {
  row(
    'R1',
    'Fluid Power with Applications, 6th ed., ex. 8.1',
    'cracks at 666.7 psi, full flow at 1000 psi: override 50 % of cracking',
    () => {
      const fromSpring = psi((2500 * 0.2) / 0.75);
      near(inUnit(crackingPressure(psi(1000), 0.5), 'pressure', 'psi'), 666.7, 1e-3);
      near(crackingPressure(psi(1000), 0.5), fromSpring, 1e-3);
      const rig = rigOf(reliefValve, { setPressure: psi(1000), override: 0.5 });
      near(rig.reading('cracksAt'), psi(666.7), 1e-3);
    },
  );
  row('R3', 'Fluid Power with Applications, 6th ed., ex. 8.2', '20 gpm at 1000 psi: 11.7 HP of heat', () => {
    const rig = rigOf(reliefValve, { setPressure: psi(1000), setFlow: gpm(20) });
    rig.set('P', psi(1000));
    rig.set('state:lift', 0.5);
    rig.flow();
    near(inUnit(-rig.pushed('P'), 'flow', 'gpm'), 20, 1e-9);
    near(inUnit(heatOf(rig), 'power', 'hp'), 11.7, 4e-3);
    // At its set pressure the valve rests at half lift.
    expect(Math.abs(rig.rate('state:lift'))).toBeLessThan(0.05);
  });
  row('R4', 'Fluid Power with Applications, 6th ed., ex. 8.3', 'unloaded at 25 psi, 20 gpm: 0.29 HP', () => {
    const rig = rigOf(throttle, { ratedFlow: gpm(20), ratedDrop: psi(25) });
    rig.set('A', psi(25));
    rig.flow();
    near(inUnit(heatOf(rig), 'power', 'hp'), 0.29, 7e-3);
  });
  row('R5', 'trade magazine on relief valves', 'a pilot-operated valve starts to open at about 90 % of its full pressure', () => {
    near(crackingPressure(1, 0.08), 0.9, 0.03);
    const rig = rigOf(reliefValve, { setPressure: 200e5, override: 0.08 });
    rig.set('P', 184e5);
    rig.flow();
    expect(rig.rate('state:lift')).toBeLessThan(0.2);
    rig.set('P', 188e5);
    rig.flow();
    expect(rig.rate('state:lift')).toBeGreaterThan(1);
  });
  row('R6', 'aircraft hydraulics text (statement); amount from memory', 'closes below cracking, wholly at 90 % of it', () => {
    const rig = rigOf(reliefValve, { setPressure: 200e5, override: 0.08, reseat: 0.9 });
    const cracking = rig.reading('cracksAt');
    rig.set('state:lift', 0.05);
    rig.set('P', cracking - 2e5);
    rig.flow();
    // Still open between reseat and cracking, and not closing.
    expect(rig.rate('state:lift')).toBeGreaterThan(-0.1);
    rig.set('P', 0.9 * cracking - 0.5e5);
    rig.flow();
    expect(rig.rate('state:lift')).toBeLessThan(-1);
  });
});

describe('orifices', () => {
  row('O1', 'Fluid Power with Applications, 6th ed., ex. 8.4', '1 in, C 0.80, 100 psi, SG 0.9: 252 gpm', () => {
    const area = (Math.PI / 4) * si(1, 'length', 'in') ** 2;
    const k = 0.8 * area * Math.sqrt(2 / (0.9 * WATER));
    near(inUnit(orifice(k, psi(100), 2e4), 'flow', 'gpm'), 252, 2.5e-3);
  });
  row('O2', 'Fluid Power: Theory and Applications, 4th ed., ex. 5.4', '1000 gpm through 3.14 in² at 120 psi, SG 0.85: Cd 0.70', () => {
    const k = edgeCoefficient(gpm(1000), psi(120));
    near(k / (si(3.14, 'area', 'in2') * Math.sqrt(2 / (0.85 * WATER))), 0.704, 3e-3);
  });
  row(
    'O4',
    'Fluid Power with Applications, 6th ed., ex. 8.5',
    '25 gpm at 100 psi, SG 0.9: Cv 2.372 gpm/√psi; 94.8 L/min at 687 kPa: 3.431',
    () => {
      const us = edgeCoefficient(gpm(25), psi(100)) * Math.sqrt(0.9);
      near((us / gpm(1)) * Math.sqrt(psi(1)), 2.372, 1e-3);
      const metric = edgeCoefficient(si(94.8, 'flow', 'L/min'), 687e3) * Math.sqrt(0.9);
      near((metric / si(1, 'flow', 'L/min')) * Math.sqrt(1e3), 3.431, 1e-3);
    },
  );
  row('O6', 'Fluid Power with Applications, 6th ed., ex. 9.4', 'meter-in: Cv 1.0, 1400 psi against 4000 lbf on 3.14 in²: 11.84 gpm', () => {
    const k = gpm(1) / Math.sqrt(psi(1)) / Math.sqrt(0.9);
    const flow = orifice(k, psi(1400 - 4000 / 3.14), 2e4);
    near(inUnit(flow, 'flow', 'gpm'), 11.84, 1e-3);
    near(inUnit(flow / si(3.14, 'area', 'in2'), 'velocity', 'in/s'), 14.51, 1e-3);
  });
});
