import { describe, expect, it } from 'vitest';
import { atmosphericPressure } from './atmosphere.ts';
import { densityAt } from './density.ts';
import { effectiveModulus, effectiveModulusSlope } from './effective-modulus.ts';
import { exponential, naturalLog, power, sine } from './elementary.ts';
import { lineLoss, lineVolume, tubeCompliance } from './line.ts';
import { oilModel, REFERENCE_VISCOSITY, runConstants } from './run-constants.ts';
import { kinematicViscosity } from './viscosity.ts';

describe('own logarithm, exponential and sine', () => {
  it('agree with the host to 1e-14', () => {
    for (let k = -40; k <= 40; k += 1) {
      const x = 1.37 ** k;
      expect(Math.abs(naturalLog(x) - Math.log(x))).toBeLessThanOrEqual(1e-14 * Math.max(1, Math.abs(Math.log(x))));
      const e = k / 2;
      expect(Math.abs(exponential(e) / Math.exp(e) - 1)).toBeLessThan(1e-14);
      const angle = (k / 40) * 2 * Math.PI;
      expect(Math.abs(sine(angle) - Math.sin(angle))).toBeLessThan(1e-13);
    }
    expect(Math.abs(power(2, 0.5) - Math.SQRT2)).toBeLessThan(1e-15);
  });
  it('are exact where a run needs it', () => {
    expect(naturalLog(1)).toBe(0);
    expect(exponential(0)).toBe(1);
    expect(sine(0)).toBe(0);
    expect(Math.abs(sine(Math.PI / 2) - 1)).toBeLessThan(1e-15);
  });
  it('give NaN instead of looping for ever', () => {
    for (const x of [0, -1, Number.NaN, Number.POSITIVE_INFINITY]) expect(naturalLog(x)).toBeNaN();
  });
});

describe('effective modulus', () => {
  const oil = { modulus: 1.7e9, airFraction: 0.005, atmosphere: 101325 };
  it('has the slope it says, from a cavity to 700 bar, with and without yielding walls', () => {
    for (const compliance of [0, 5e-11]) {
      for (const p of [-1.2e5, -1.01325e5, -9e4, -5e4, 0, 1e5, 1e6, 1e7, 7e7]) {
        const h = Math.max(1, Math.abs(p) * 1e-5);
        const numeric = (effectiveModulus(p + h, oil, compliance) - effectiveModulus(p - h, oil, compliance)) / (2 * h);
        const exact = effectiveModulusSlope(p, oil, compliance);
        expect(Math.abs(exact - numeric)).toBeLessThan(1e-4 * Math.abs(exact) + 1e-3);
      }
    }
  });
  it('rises with pressure, falls with air, and never reaches zero', () => {
    let last = 0;
    for (let p = -2e5; p < 300e5; p += 1e5) {
      const k = effectiveModulus(p, oil);
      expect(k).toBeGreaterThan(last);
      last = k;
    }
    expect(effectiveModulus(-5e5, oil)).toBeGreaterThan(2e4);
    expect(effectiveModulus(20e5, { ...oil, airFraction: 0.02 })).toBeLessThan(effectiveModulus(20e5, oil));
  });
  it('is softer by the walls in series', () => {
    const wall = tubeCompliance(0.016, 0.002);
    expect(1 / effectiveModulus(100e5, oil, wall)).toBeCloseTo(1 / effectiveModulus(100e5, oil) + wall, 15);
  });
});

describe('once per run', () => {
  const fluid = { grade: 'VG 46', temperature: 313.15, airFraction: 0.005, bulkModulus: 1.7e9, density: 870 } as const;
  const supply = { voltage: 400, frequency: 50, impedance: 0.3 };
  it('gathers density, viscosity and the site', () => {
    const run = runConstants(fluid, supply, { altitude: 0 });
    expect(run.atmosphere).toBe(101325);
    expect(run.density).toBeLessThan(870);
    expect(run.density).toBe(densityAt(870, 313.15));
    expect(run.viscosity).toBeCloseTo(kinematicViscosity('VG 46', 313.15) * run.density, 12);
    expect(Math.abs(run.viscosity / REFERENCE_VISCOSITY - 1)).toBeLessThan(0.02);
    expect([run.supplyVoltage, run.supplyFrequency, run.supplyImpedance]).toEqual([400, 50, 0.3]);
    expect(oilModel(fluid, { altitude: 1500 }).atmosphere).toBe(atmosphericPressure(1500));
  });
  it('makes cold oil thick and the grades differ', () => {
    expect(kinematicViscosity('VG 46', 273.15)).toBeGreaterThan(10 * kinematicViscosity('VG 46', 313.15));
    const at40 = (['VG 22', 'VG 32', 'VG 46', 'VG 68'] as const).map((grade) => kinematicViscosity(grade, 313.15) * 1e6);
    at40.forEach((value, k) => {
      expect(Math.abs(value - [22, 32, 46, 68][k]!)).toBeLessThan(1e-6);
    });
  });
  it('gives a line its volume and loss', () => {
    expect(lineVolume(2, 0.016)).toBeCloseTo((Math.PI / 4) * 0.016 ** 2 * 2, 12);
    const short = lineLoss(1, 0.016, 870, 0.04);
    const long = lineLoss(3, 0.016, 870, 0.04);
    expect(long.laminar / short.laminar).toBeCloseTo(3, 12);
    expect(long.quadratic / short.quadratic).toBeCloseTo(3, 12);
    expect(lineLoss(1, 0.016, 870, 0.08).laminar / short.laminar).toBeCloseTo(2, 12);
  });
});
