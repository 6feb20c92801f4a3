import { describe, expect } from 'vitest';
import { compensatedPump } from '#shared/kinds/compensated-pump/compensated-pump.ts';
import { compensatorStroke, filling, idealFlow, idealTorque, kneePressure } from '#shared/kinds/compensated-pump/laws.ts';
import { type Rig, rigOf } from '#shared/kinds/testing.ts';
import { inUnit, near, row, si, TURN } from './row.ts';

const ideal = (perTurn: number, unit: string, rpm: number): number =>
  idealFlow(1, si(perTurn, 'displacement', unit), si(rpm, 'speed', 'rpm'));

/** A pump at one working point: stroke, outlet pressure [Pa], speed [rad/s]. */
function pumpAt(values: Readonly<Record<string, number | string>>, stroke: number, pressure: number, speed: number): Rig {
  const rig = rigOf(compensatedPump, values);
  rig.set('state:stroke', stroke);
  rig.set('outlet', pressure);
  rig.set('shaft', speed);
  rig.flow();
  return rig;
}

describe('pump flow and torque', () => {
  row('P3', 'worked example of pump flow and power', '18 cm³/rev at 1500 rpm, 92 %: 24.84 L/min', () => {
    near(inUnit(ideal(18, 'cm3/rev', 1500), 'flow', 'L/min') * 0.92, 24.84, 1e-4);
  });
  row('P4', 'Fluid Power with Applications, 6th ed., ex. 5.8', '5 in³/rev, 1000 rpm, 20 gpm, 1000 psi, 900 lbf·in', () => {
    near(si(20, 'flow', 'gpm') / ideal(5, 'in3/rev', 1000), 0.924, 1e-3);
    const torque = idealTorque(1, si(5, 'displacement', 'in3/rev'), si(1000, 'pressure', 'psi'));
    near(inUnit(torque, 'torque', 'lbf.in'), 795.8, 1e-4);
    near(torque / si(900, 'torque', 'lbf.in'), 0.884, 1e-3);
  });
  row('P5', 'Fluid Power with Applications, 6th ed., ex. 5.9', '100 cm³/rev, 1000 rpm, 70 bar, 120 N·m', () => {
    near(1.5e-3 / ideal(100, 'cm3/rev', 1000), 0.9, 1e-3);
    const torque = idealTorque(1, si(100, 'displacement', 'cm3/rev'), 70e5);
    near(torque, 111.4, 1e-3);
    near(torque / 120, 0.928, 1e-3);
  });
  row('P9', 'Fluid Power: Theory and Applications, 4th ed., ex. 7.2', '3.75 in³/rev at 3300 rpm, 52 gpm: 0.9707', () => {
    near(si(52, 'flow', 'gpm') / ideal(3.75, 'in3/rev', 3300), 0.9707, 1e-4);
  });
  row(
    'P11',
    'Fluid Power: Theory and Applications, 4th ed., ex. 7.4',
    'nine pistons of 0.5 in bore and 0.75 in stroke at 3000 rpm: 17.21 gpm',
    () => {
      near(inUnit(ideal(9 * (Math.PI / 4) * 0.5 * 0.5 * 0.75, 'in3/rev', 3000), 'flow', 'gpm'), 17.21, 2e-4);
    },
  );
  row(
    'P13',
    'power-hydraulics exercises',
    'worn pump: 1.8 in³/rev at 1500 rpm loses 1.69 gpm at 3000 psi and gives 10.0 gpm, 0.855',
    () => {
      const pressure = si(3000, 'pressure', 'psi');
      const rig = pumpAt(
        {
          displacement: si(1.8, 'displacement', 'in3/rev'),
          'raw.leakage': si(1.69, 'flow', 'gpm') / pressure,
          ratedSpeed: si(3000, 'speed', 'rpm'),
        },
        1,
        pressure,
        si(1500, 'speed', 'rpm'),
      );
      near(inUnit(rig.pushed('outlet'), 'flow', 'gpm'), 10.0, 1e-3);
      near(rig.pushed('outlet') / ideal(1.8, 'in3/rev', 1500), 0.855, 1e-3);
      near(inUnit(rig.pushed('drain'), 'flow', 'gpm'), 1.69, 1e-6);
    },
  );
  row(
    'P15',
    'Fluid Power with Applications, 6th ed., ex. 7.3',
    'hydraulic motor 10 in³/rev, 1000 psi, 2000 rpm, 95 gpm, 1500 lbf·in',
    () => {
      near(ideal(10, 'in3/rev', 2000) / si(95, 'flow', 'gpm'), 0.911, 1.5e-3);
      near(si(1500, 'torque', 'lbf.in') / idealTorque(1, si(10, 'displacement', 'in3/rev'), si(1000, 'pressure', 'psi')), 0.9425, 1.5e-3);
    },
  );
  row('P18', 'derived: what the stroke stop is set for', '10 hp at 1750 rpm carries 17.06 cm³/rev at 2000 psi and 92 %', () => {
    const torque = idealTorque(1, si(17.06, 'displacement', 'cm3/rev'), si(2000, 'pressure', 'psi'));
    near(inUnit(torque / 0.92, 'torque', 'lbf.in'), 360.1, 1e-3);
  });
});

describe('pump losses', () => {
  const displacement = si(28, 'displacement', 'cm3/rev');
  const viscosity = 0.04;
  const model = {
    displacement,
    'raw.leakage': (5e-9 * displacement) / viscosity,
    'raw.viscousDrag': 5e4 * displacement * viscosity,
    'raw.coulombTorque': 0,
    'raw.pressureFriction': 0.03,
  };
  const speed = 50 * Math.PI;
  for (const [stroke, volumetric, torque, overall] of [
    [1, 0.98408, 0.95629, 0.94107],
    [0.5, 0.96817, 0.91624, 0.88708],
    [0.25, 0.93634, 0.84543, 0.79161],
  ] as const) {
    row('L1', 'derived from the three-coefficient loss model', `28 cm³/rev, 200 bar, 1500 rpm, stroke ${stroke}`, () => {
      const rig = pumpAt(model, stroke, 200e5, speed);
      const flow = rig.pushed('outlet');
      const taken = -rig.pushed('shaft');
      near(flow / idealFlow(stroke, displacement, speed), volumetric, 1e-5);
      near(idealTorque(stroke, displacement, 200e5) / taken, torque, 5e-5);
      near((flow * 200e5) / (taken * speed), overall, 5e-5);
    });
  }
  row('L4', 'derived from the three-coefficient loss model', 'dead-head: 0.668 L/min leak, 5.492 N·m, 863 W', () => {
    const rig = pumpAt(model, (5e-9 * 200e5) / (viscosity * speed), 200e5, speed);
    expect(Math.abs(rig.pushed('outlet'))).toBeLessThan(1e-12);
    near(inUnit(rig.pushed('drain'), 'flow', 'L/min'), 0.668, 1e-3);
    near(-rig.pushed('shaft'), 5.492, 5e-4);
    near(-rig.pushed('shaft') * speed, 863, 1e-3);
  });
  row(
    'L5',
    'Engineering ToolBox, pump horsepower; a fluid test for piston pumps',
    'overall efficiency of the typical pump at full stroke lies in 0.80 to 0.95',
    () => {
      const rig = pumpAt({}, 1, 190e5, si(1450, 'speed', 'rpm'));
      const overall = (rig.pushed('outlet') * 190e5) / (-rig.pushed('shaft') * si(1450, 'speed', 'rpm'));
      expect(overall).toBeGreaterThan(0.85);
      expect(overall).toBeLessThan(0.95);
    },
  );
  row(
    'L6',
    'trade magazine on case drains; Fluid Power: Theory and Applications, 4th ed., ex. 9.5',
    'case drain of the typical pump is about 2 % of its flow and under the 10 % of a worn one',
    () => {
      const rig = pumpAt({}, 1, 200e5, si(1450, 'speed', 'rpm'));
      const share = rig.pushed('drain') / ideal(28, 'cm3/rev', 1450);
      expect(share).toBeGreaterThan(0.01);
      expect(share).toBeLessThan(0.041);
    },
  );
  row('P17', 'general fluid-power guidelines (common practice)', 'standby at dead-head takes 3 to 10 % of full power', () => {
    const w = si(1450, 'speed', 'rpm');
    const full = -pumpAt({}, 1, 190e5, w).pushed('shaft');
    const stroke = pumpAt({}, 0, 190e5, w).pushed('drain') / ideal(28, 'cm3/rev', 1450);
    const standby = -pumpAt({}, stroke, 190e5, w).pushed('shaft');
    expect(standby / full).toBeGreaterThan(0.03);
    expect(standby / full).toBeLessThan(0.1);
  });
  row(
    'K1',
    'SAE J745 as quoted in US Army TM 5-3820-256-24-2',
    'at the 0.844 bar absolute it allows, and at our 0.8 bar warning, the pump still fills',
    () => {
      const speedLimit = si(1800, 'speed', 'rpm');
      near(101325 - 127 * 133.322, 0.844e5, 1e-3);
      expect(filling(101325 - 127 * 133.322, speedLimit, speedLimit)).toBe(1);
      expect(filling(0.8e5, speedLimit, speedLimit)).toBe(1);
      expect(filling(0.1e5, speedLimit, speedLimit)).toBe(0);
    },
  );
});

describe('pressure compensator', () => {
  const psi = (value: number): number => si(value, 'pressure', 'psi');
  row('C1', 'US Navy NAVEDTRA 14105, p. 4-15', '3000 psi pump begins to unload at 2850 psi and is half way at 2925 psi', () => {
    near(kneePressure(psi(3000), psi(150), 1), psi(2850), 1e-12);
    near(compensatorStroke(psi(2925), psi(3000), psi(150), 0, 1), 0.5, 1e-7);
    expect(compensatorStroke(psi(2850), psi(3000), psi(150), 0, 1)).toBeGreaterThan(0.99);
    expect(compensatorStroke(psi(2700), psi(3000), psi(150), 0, 1)).toBeGreaterThan(0.999);
    // Rounded by half a hundredth of full stroke at the very end.
    expect(compensatorStroke(psi(3000), psi(3000), psi(150), 0, 1)).toBeLessThan(0.0051);
  });
  row('C2', 'US Army TM 5-3805-291-23-1', 'setting 3046 psi, destroking 100 psi below: band 3.3 %', () => {
    near((psi(3046) - kneePressure(psi(3046), psi(100), 1)) / psi(3046), 0.033, 6e-3);
  });
  row('C8', 'trade article on swash-plate stroke', 'at zero tilt the pump turns without delivering', () => {
    const rig = pumpAt({ 'raw.leakage': 0 }, 0, 0, si(1450, 'speed', 'rpm'));
    expect(rig.pushed('outlet')).toBe(0);
    expect(-rig.pushed('shaft')).toBeGreaterThan(0);
  });
  row('C1', 'US Navy NAVEDTRA 14105, p. 4-15', 'the typical pump is at dead-head within 0.5 bar of its setting', () => {
    const w = si(1450, 'speed', 'rpm');
    let low = 180e5;
    let high = 200e5;
    for (let k = 0; k < 60; k += 1) {
      const p = (low + high) / 2;
      const stroke = compensatorStroke(p, 190e5, 8e5, 0, 1);
      if (pumpAt({}, stroke, p, w).pushed('outlet') > 0) low = p;
      else high = p;
    }
    expect(Math.abs(low - 190e5)).toBeLessThan(0.5e5);
  });
  row(
    'P12',
    'US Army TM 5-3820-256-24-1, para. 4-6.3.4',
    '0.15 in³/rev per turn from 2.3 down to 0.9 in³/rev takes 9.3 turns; flow follows the stop',
    () => {
      near((2.3 - 0.9) / 0.15, 9.3, 5e-3);
      const full = si(2.3, 'displacement', 'in3/rev');
      const rig = rigOf(compensatedPump, { displacement: full, maxVolumeStop: si(0.9, 'displacement', 'in3/rev'), 'raw.leakage': 0 });
      rig.set('shaft', TURN);
      rig.flow();
      near(rig.pushed('outlet'), si(0.9, 'displacement', 'in3/rev') * TURN, 1e-12);
    },
  );
});
