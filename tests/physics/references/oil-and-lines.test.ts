import { describe, expect } from 'vitest';
import { atmosphericPressure } from '#shared/fluid/atmosphere.ts';
import { airVolume, effectiveModulus } from '#shared/fluid/effective-modulus.ts';
import { boreArea, lineLoss, tubeCompliance } from '#shared/fluid/line.ts';
import { kinematicViscosity, walther, waltherViscosity } from '#shared/fluid/viscosity.ts';
import { lineFlow } from '#shared/numerics/smooth.ts';
import { inUnit, near, row, si } from './row.ts';

const ATMOSPHERE = 101325;
const psi = (value: number): number => si(value, 'pressure', 'psi');
const clean = (modulus: number) => ({ modulus, airFraction: 0, atmosphere: ATMOSPHERE });

describe('bulk modulus', () => {
  row('B1', 'Fluid Power with Applications, 6th ed., ex. 2.11', '10 in³ of oil of 250 000 psi from 100 to 2000 psi: −0.076 in³', () => {
    near((-10 * psi(1900)) / effectiveModulus(psi(1050), clean(psi(250000))), -0.076, 1e-3);
  });
  row('B2', 'Fluid Power with Applications, 6th ed., ex. 2.17', '687 to 13 740 kPa, 1718 MPa: −0.76 %', () => {
    near((13740e3 - 687e3) / effectiveModulus(7e6, clean(1718e6)), 0.0076, 1e-3);
  });
  row('B3', 'Fluid Power: Theory and Applications, 4th ed., ex. 6.2', '1000 psi on 350 000 psi: 0.286 %', () => {
    near(psi(1000) / effectiveModulus(psi(500), clean(psi(350000))), 0.00286, 2e-3);
  });
  row(
    'B8',
    'Fluid Power Engineering (2009), eq. 2.51 to 2.57',
    'mixture: n·p·B/(n·p·(1 − a) + a·B) with the gas share a at that pressure',
    () => {
      const oil = { modulus: 1.7e9, airFraction: 0.02, atmosphere: ATMOSPHERE };
      for (const absolute of [2e5, 5e5, 20e5, 100e5, 200e5]) {
        const p = absolute - ATMOSPHERE;
        const volume = airVolume(p, oil);
        const share = volume / (1 + volume);
        const stiff = (4 / 3) * absolute;
        near(effectiveModulus(p, oil), (stiff * 1.7e9) / (stiff * (1 - share) + share * 1.7e9), 2e-3);
      }
    },
  );
  const table: readonly (readonly [number, readonly number[], readonly number[]])[] = [
    [0.001, [0.32, 1.006, 1.45, 1.63, 1.688, 1.697, 1.699], [0.359, 0.957, 1.375, 1.586, 1.675, 1.692, 1.698]],
    [0.005, [0.075, 0.381, 0.912, 1.398, 1.643, 1.685, 1.696], [0.086, 0.347, 0.777, 1.249, 1.581, 1.662, 1.688]],
    [0.01, [0.038, 0.214, 0.621, 1.185, 1.59, 1.671, 1.693], [0.044, 0.193, 0.502, 0.985, 1.477, 1.626, 1.677]],
    [0.02, [0.019, 0.113, 0.377, 0.906, 1.491, 1.643, 1.685], [0.022, 0.102, 0.293, 0.689, 1.303, 1.556, 1.654]],
    [0.05, [0.008, 0.046, 0.17, 0.522, 1.249, 1.56, 1.663], [0.009, 0.041, 0.128, 0.357, 0.953, 1.373, 1.586]],
  ];
  for (const [air, isothermal, adiabatic] of table) {
    row(
      'B9',
      'derived from the mixture equation; agrees with an oil-stiffness note (0.7 to 1.0 GPa with 1 to 2 % air near 20 bar)',
      `${100 * air} % air, exponent 4/3: between isothermal and adiabatic`,
      () => {
        // Air per volume of oil from air per volume of mixture.
        const oil = { modulus: 1.7e9, airFraction: air / (1 - air), atmosphere: ATMOSPHERE };
        [2, 5, 10, 20, 50, 100, 200].forEach((bar, k) => {
          const found = effectiveModulus(bar * 1e5 - ATMOSPHERE, oil) / 1e9;
          const ends = [isothermal[k]!, adiabatic[k]!];
          expect(found).toBeGreaterThan(Math.min(...ends) * 0.995 - 0.0006);
          expect(found).toBeLessThan(Math.max(...ends) * 1.005 + 0.0006);
        });
      },
    );
  }
  for (const [bore, wall, modulus, together] of [
    [12, 1.5, 21.3, 1.574],
    [16, 2, 21.3, 1.574],
    [20, 2, 17.7, 1.551],
  ] as const) {
    row(
      'B10',
      'derived from the thick-tube equation',
      `steel tube of ${bore} mm bore and ${wall} mm wall: ${modulus} GPa, with 1.7 GPa oil ${together} GPa`,
      () => {
        const compliance = tubeCompliance(bore * 1e-3, wall * 1e-3);
        near(1 / compliance, modulus * 1e9, 4e-3);
        near(effectiveModulus(500e5, clean(1.7e9), compliance), together * 1e9, 1e-3);
      },
    );
  }
});

describe('viscosity', () => {
  for (const [grade, low, high] of [
    ['VG 32', 28.8, 35.2],
    ['VG 46', 41.4, 50.6],
    ['VG 68', 61.2, 74.8],
  ] as const) {
    row('V1', 'ISO 3448 as shown on viscosity charts', `${grade} at 40 °C is ${low} to ${high} cSt`, () => {
      const found = kinematicViscosity(grade, 313.15) * 1e6;
      expect(found).toBeGreaterThan(low);
      expect(found).toBeLessThan(high);
    });
  }
  row('V2', 'ASTM D341 worksheet', '32 cSt at 40 °C and 5.4 at 100 °C: A 9.5259, B 3.7449, 8.5 cSt at 80 °C', () => {
    const { a, b } = walther(32, 313, 5.4, 373);
    near(a, 9.5259, 1e-5);
    near(b, 3.7449, 2e-5);
    near(waltherViscosity(a, b, 353), 8.53, 1e-3);
  });
  const celsius = [-10, 0, 10, 20, 30, 40, 50, 60, 70, 80, 100];
  for (const [grade, values] of [
    ['VG 32', [805, 336, 161, 86.3, 50.6, 32.0, 21.5, 15.2, 11.2, 8.5, 5.4]],
    ['VG 46', [1474, 577, 262, 133.8, 75.4, 46.0, 30.0, 20.6, 14.8, 11.1, 6.8]],
    ['VG 68', [2823, 1033, 442, 214.8, 115.8, 68.0, 42.9, 28.7, 20.1, 14.7, 8.7]],
  ] as const) {
    row('V3', 'derived by ASTM D341 from typical values at 40 and 100 °C', `${grade} from −10 to 100 °C`, () => {
      celsius.forEach((t, k) => {
        near(kinematicViscosity(grade, t + 273.15) * 1e6, values[k]!, 6e-3);
      });
    });
  }
});

describe('lines', () => {
  row('H3', 'Fluid Power with Applications, 6th ed., ex. 4.3', '10 ft/s of 100 cSt, SG 0.9, in 100 ft of 1 in: 60 psi', () => {
    const bore = si(1, 'length', 'in');
    const flow = si(10, 'velocity', 'ft/s') * boreArea(bore);
    const { laminar } = lineLoss(si(100, 'length', 'ft'), bore, 900, 100e-6 * 900);
    near(inUnit(laminar * flow, 'pressure', 'psi'), 60, 5e-3);
  });
  row('H4', 'Fluid Power with Applications, 6th ed., ex. 4.4', '5 m/s of 1e-3 m²/s, 8800 N/m³, in 50 m of 50 mm: 28.7 bar', () => {
    const density = 8800 / 9.81;
    const { laminar } = lineLoss(50, 0.05, density, 1e-3 * density);
    near((laminar * 5 * boreArea(0.05)) / 1e5, 28.7, 2e-3);
  });
  row('H5', 'Fluid Power: Theory and Applications, 4th ed., ex. 5.2', '15 gpm of 0.08 in²/s, SG 0.85, in 400 ft of 1 in: 71.7 psi', () => {
    const bore = si(1, 'length', 'in');
    const kinematic = 0.08 * si(1, 'length', 'in') ** 2;
    const flow = si(15, 'flow', 'gpm');
    near(inUnit(flow / boreArea(bore), 'velocity', 'ft/s'), 6.13, 1e-3);
    const { laminar } = lineLoss(si(400, 'length', 'ft'), bore, 850, kinematic * 850);
    near(inUnit(laminar * flow, 'pressure', 'psi'), 71.7, 4e-3);
  });
  row('H6', 'a maker’s line-size page', '20 L/min: 0.5 m/s in 29 mm, 2 m/s in 15 mm, 10 m/s in 7 mm', () => {
    for (const [speed, millimetres] of [
      [0.5, 29.1],
      [1.5, 16.8],
      [2, 14.6],
      [4, 10.3],
      [3, 11.9],
      [10, 6.5],
    ] as const) {
      near(inUnit(speed * boreArea(millimetres * 1e-3), 'flow', 'L/min'), 20, 1.2e-2);
    }
  });
  row('H7', 'trade tip on line sizing', '0.824 in at 20 ft/s: 33.2 gpm; 1.610 in: 126.9 gpm', () => {
    const speed = si(20, 'velocity', 'ft/s');
    near(inUnit(speed * boreArea(si(0.824, 'length', 'in')), 'flow', 'gpm'), 33.24, 1e-3);
    near(inUnit(speed * boreArea(si(1.61, 'length', 'in')), 'flow', 'gpm'), 126.9, 1e-3);
  });
  row(
    'H8',
    'Fluid Power with Applications, 6th ed., ex. 10.1 and 10.2',
    '30 gpm at 20 ft/s: 0.783 in; 2.0e-3 m³/s at 6.1 m/s: 20.4 mm',
    () => {
      near(inUnit(si(20, 'velocity', 'ft/s') * boreArea(si(0.783, 'length', 'in')), 'flow', 'gpm'), 30, 2e-3);
      near(6.1 * boreArea(0.0204), 2e-3, 5e-3);
    },
  );
  row(
    'H10',
    'Fluid Power with Applications, 6th ed., ex. 4.5',
    'smooth pipe at Re 6194, f 0.0357: our line gives the flow of that drop within 11 %',
    () => {
      const bore = si(1, 'length', 'in');
      const speed = si(40, 'velocity', 'ft/s');
      const drop = (0.0357 * (1 / bore) * 900 * speed * speed) / 2;
      const { laminar, quadratic } = lineLoss(1, bore, 900, 50e-6 * 900);
      near(lineFlow(laminar, quadratic, drop) / boreArea(bore), speed, 0.11);
    },
  );
});

describe('atmosphere', () => {
  row('A0', 'ISO 2533 standard atmosphere', 'sea level 101325 Pa, 1000 m 89 875 Pa, 2000 m 79 495 Pa', () => {
    expect(atmosphericPressure(0)).toBe(101325);
    near(atmosphericPressure(1000), 89875, 2e-4);
    near(atmosphericPressure(2000), 79495, 2e-4);
  });
});
