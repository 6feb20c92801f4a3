import { describe, expect } from 'vitest';
import { effectiveModulus } from '#shared/fluid/effective-modulus.ts';
import { cylinder } from '#shared/kinds/cylinder/cylinder.ts';
import { capArea, hydraulicForce, rodSideArea } from '#shared/kinds/cylinder/laws.ts';
import { rigOf } from '#shared/kinds/testing.ts';
import { inUnit, near, row, si } from './row.ts';

const psi = (value: number): number => si(value, 'pressure', 'psi');
const inch = (value: number): number => si(value, 'length', 'in');
const gpm = (value: number): number => si(value, 'flow', 'gpm');
const pounds = (force: number): number => inUnit(force, 'force', 'lbf');

describe('cylinder', () => {
  row(
    'Y1',
    'Fluid Power with Applications, 6th ed., ex. 6.1',
    '20 gpm, bore 2 in, rod 1 in, 1000 lbf: out 318 psi and 2.04 ft/s, in 424 psi and 2.72 ft/s',
    () => {
      const cap = capArea(inch(2));
      const ring = rodSideArea(inch(2), inch(1));
      near(pounds(hydraulicForce(psi(318.3), 0, cap, ring)), 1000, 4e-3);
      near(inUnit(gpm(20) / cap, 'velocity', 'ft/s'), 2.042, 4e-3);
      near(-pounds(hydraulicForce(0, psi(424.4), cap, ring)), 1000, 4e-3);
      near(inUnit(gpm(20) / ring, 'velocity', 'ft/s'), 2.723, 4e-3);
    },
  );
  row(
    'Y2',
    'Fluid Power with Applications, 6th ed., ex. 9.1',
    'regeneration on 25 and 7 in²: 7000 lbf out, 18 000 lbf in at 1000 psi; 11.0 and 4.28 in/s at 20 gpm',
    () => {
      const cap = si(25, 'area', 'in2');
      const ring = si(18, 'area', 'in2');
      near(pounds(hydraulicForce(psi(1000), psi(1000), cap, ring)), 7000, 4e-3);
      near(pounds(-hydraulicForce(0, psi(1000), cap, ring)), 18000, 4e-3);
      near(inUnit(gpm(20) / (cap - ring), 'velocity', 'in/s'), 11.0, 4e-3);
      near(inUnit(gpm(20) / ring, 'velocity', 'in/s'), 4.278, 4e-3);
    },
  );
  row('Y3', 'trade note on regeneration', 'bore 1.5 in, 3000 psi: rod 0.625 in 920 lbf out and 4381 lbf in; rod 1.375 in 4455 lbf', () => {
    const cap = capArea(inch(1.5));
    near(pounds(hydraulicForce(psi(3000), psi(3000), cap, rodSideArea(inch(1.5), inch(0.625)))), 920, 1e-3);
    near(-pounds(hydraulicForce(0, psi(3000), cap, rodSideArea(inch(1.5), inch(0.625)))), 4381, 1e-3);
    near(pounds(hydraulicForce(psi(3000), psi(3000), cap, rodSideArea(inch(1.5), inch(1.375)))), 4455, 1e-3);
  });
  row(
    'Y4',
    'trade article on intensification',
    '2:1 cylinder, 3000 psi on the cap side: 6000 psi balances it on a blocked rod side',
    () => {
      expect(Math.abs(hydraulicForce(psi(3000), psi(6000), 2e-3, 1e-3))).toBeLessThan(1e-6);
    },
  );
  row('Y5', 'practitioners’ page on cylinder dangers', '3 in bore, 2 in rod: 2000 psi becomes 3600 psi and 2800 becomes 5040', () => {
    const cap = capArea(inch(3));
    const ring = rodSideArea(inch(3), inch(2));
    near(cap / ring, 1.8, 1e-12);
    expect(Math.abs(hydraulicForce(psi(2000), psi(3600), cap, ring))).toBeLessThan(1e-6);
    expect(Math.abs(hydraulicForce(psi(2800), psi(5040), cap, ring))).toBeLessThan(1e-6);
  });
  row('Y7', 'Fluid Power with Applications, 6th ed., ex. 6.4', 'lifting 6000 lbf to 8 ft/s in 0.5 s takes 8981 lbf', () => {
    const mass = si(6000, 'mass', 'lb');
    const rig = rigOf(cylinder, { mass, angle: Math.PI / 2, coulomb: 0, stiction: 0, viscous: 0, startPosition: 0.25 });
    rig.set('A', si(8981, 'force', 'lbf') / rig.coefficients.areaA!);
    rig.flow();
    near(rig.rate('state:velocity'), si(8, 'velocity', 'ft/s') / 0.5, 1e-3);
  });
  row('Y9', 'open course "Hydraulics and Electrical Control", ch. 3.5', 'bore 2.5, rod 1, stroke 24 in, 2.3 gpm, 400 psi', () => {
    const cap = capArea(inch(2.5));
    const ring = rodSideArea(inch(2.5), inch(1));
    near((cap * inch(24)) / gpm(2.3), 13.3, 1e-3);
    near((ring * inch(24)) / gpm(2.3), 11.18, 1e-3);
    near(((cap - ring) * inch(24)) / gpm(2.3), 2.13, 2e-3);
    near(pounds(hydraulicForce(psi(400), 0, cap, ring)), 1963, 1e-3);
    near(-pounds(hydraulicForce(0, psi(400), cap, ring)), 1649, 1e-3);
    near(pounds(hydraulicForce(psi(400), psi(400), cap, ring)), 314, 1e-3);
  });
  row('Y10', 'open course "Hydraulics and Electrical Control", ch. 3.5', 'bore 3, rod 1.25, stroke 16 in, 1.8 gpm, 500 psi', () => {
    const cap = capArea(inch(3));
    const ring = rodSideArea(inch(3), inch(1.25));
    near((cap * inch(16)) / gpm(1.8), 16.32, 1e-3);
    near(((cap - ring) * inch(16)) / gpm(1.8), 2.83, 2e-3);
    near(pounds(hydraulicForce(psi(500), 0, cap, ring)), 3534, 1e-3);
    near(pounds(hydraulicForce(psi(500), psi(500), cap, ring)), 614, 1e-3);
  });
  row('N4', 'derived: two oil springs at mid-stroke', 'bore 50, rod 28, stroke 500 mm, 500 kg, 1.2 GPa: 15.894 MN/m, 28.38 Hz', () => {
    const rig = rigOf(cylinder, {
      bore: 0.05,
      rod: 0.028,
      stroke: 0.5,
      startPosition: 0.25,
      mass: 500,
      coulomb: 0,
      stiction: 0,
      viscous: 0,
    });
    rig.kind.jacobian(rig.block, rig.w);
    // Entries of the cylinder's own Jacobian: flow by rod speed, acceleration by pressure.
    const entry = (row: string, column: string): number =>
      rig.w.jac[rig.names.indexOf(row) * rig.names.length + rig.names.indexOf(column)]!;
    const modulus = effectiveModulus(200e5, { modulus: 1.2e9, airFraction: 0, atmosphere: 101325 });
    const spring = (port: string, area: number): number =>
      (-modulus / (area * 0.25)) * entry(port, 'state:velocity') * entry('state:velocity', port);
    const square = spring('A', capArea(0.05)) + spring('B', rodSideArea(0.05, 0.028));
    near(square * 500, 15.894e6, 1e-4);
    near(Math.sqrt(square) / (2 * Math.PI), 28.38, 1e-3);
  });
  row('H14', 'Fluid Power: Theory and Applications, 4th ed., ex. 8.2', '25 gpm on 12.56 in²: 38.3 ft/min', () => {
    near(inUnit(gpm(25) / capArea(inch(4)), 'velocity', 'ft/s') * 60, 38.3, 1e-3);
  });
});
