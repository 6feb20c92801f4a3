import { describe, expect } from 'vitest';
import { electricMotor } from '#shared/kinds/electric-motor/electric-motor.ts';
import {
  classTimeConstant,
  designMinima,
  klossRatio,
  pullOutSlip,
  relayFactor,
  singlePhaseRatio,
  synchronousSpeed,
  tripTime,
} from '#shared/kinds/electric-motor/laws.ts';
import { type Rig, rigOf, testRun } from '#shared/kinds/testing.ts';
import { inUnit, near, row, si } from './row.ts';

const rpm = (value: number): number => si(value, 'speed', 'rpm');

/** Torque of a motor at a speed and supply. */
function torqueAt(rig: Rig, speed: number, volts?: number, frequency?: number): number {
  rig.set('contactor', 1);
  rig.set('shaft', speed);
  if (volts !== undefined) rig.set('supplyVoltage', volts);
  if (frequency !== undefined) rig.set('supplyFrequency', frequency);
  rig.flow();
  return rig.pushed('shaft');
}

/** Speed between two speeds at which a motor gives a torque (torque falls with speed there). */
function speedFor(rig: Rig, torque: number, low: number, high: number): number {
  let from = low;
  let to = high;
  for (let k = 0; k < 80; k += 1) {
    const middle = (from + to) / 2;
    if (torqueAt(rig, middle) > torque) from = middle;
    else to = middle;
  }
  return from;
}

const tenHorse = {
  ratedPower: si(10, 'power', 'hp'),
  ratedFrequency: 60,
  ratedVoltage: 460,
  ratedSpeed: rpm(1750),
  drag: 0,
  designLetter: 'entered',
  pullOut: 2,
};
const usRun = { ...testRun, supplyVoltage: 460, supplyFrequency: 60 };

describe('induction motor', () => {
  row('M1', 'motor sizing guide', '4 poles 60 Hz: 1800 rpm', () => {
    near(inUnit(synchronousSpeed(60, 4), 'speed', 'rpm'), 1800, 1e-12);
    near(inUnit(synchronousSpeed(50, 2), 'speed', 'rpm'), 3000, 1e-12);
  });
  row('M2', 'Electrical Machines, ex. 4.16', 'pull-out slip 0.20: standstill torque 38.46 % of pull-out', () => {
    near(klossRatio(1, 0.2), 0.3846, 2e-4);
  });
  row('M4', 'A Textbook of Electrical Technology, ex. 34.14c', 'slip 0.01, pull-out slip 0.06: 0.3243', () => {
    near(klossRatio(0.01, 0.06), 0.3243, 2e-4);
  });
  row('M5', 'Electric Machines, ex. 5.4', '90 % voltage gives 81 % torque; 50 hp, 1760 rpm: 28.35 lbf·ft less', () => {
    const rig = rigOf(electricMotor, { ...tenHorse, ratedPower: si(50, 'power', 'hp'), ratedSpeed: rpm(1760) }, usRun);
    const full = torqueAt(rig, rpm(1760), 460);
    const low = torqueAt(rig, rpm(1760), 414);
    near(low / full, 0.81, 1e-9);
    near(inUnit(full - low, 'torque', 'lbf.ft'), 28.35, 2e-4);
  });
  row('M7', 'Electric Machines, ex. 5.6', '20 hp 1175 rpm at −10 % volts and −6 % frequency: 1100.7 rpm, 18.74 hp', () => {
    const rig = rigOf(
      electricMotor,
      { ...tenHorse, ratedPower: si(20, 'power', 'hp'), poles: '6', ratedSpeed: rpm(1175), pullOut: 4 },
      { ...usRun, supplyVoltage: 414, supplyFrequency: 56.4 },
    );
    const rated = si(20, 'power', 'hp') / rpm(1175);
    // The book takes torque as proportional to slip; the Kloss curve bends a little: 0.1 %.
    const speed = speedFor(rig, rated, rpm(900), rpm(1128));
    near(inUnit(speed, 'speed', 'rpm'), 1100.7, 1e-3);
    near(inUnit(rated * speed, 'power', 'hp'), 18.74, 1e-3);
  });
  row(
    'M12',
    'Fundamentals of Electrical Drives, ex. 6.7',
    'run-up of 100 kg·m² on 21 441 N·m, sk 0.1197, 1000 rpm: 1.105 s to slip 0.05',
    () => {
      const ws = synchronousSpeed(50, 6);
      const steps = 20000;
      let time = 0;
      for (let k = 0; k < steps; k += 1) {
        const slip = 1 - (0.95 * (k + 0.5)) / steps;
        time += (100 * ws * 0.95) / steps / (21441 * klossRatio(slip, 0.1197));
      }
      near(time, 1.1054, 1e-3);
    },
  );
  for (const [hp, speed, torque, slip, b, sm] of [
    [5, 1750, 20.35, 0.0278, 2.25, 0.1185],
    [10, 1750, 40.69, 0.0278, 2, 0.1037],
    [20, 1755, 81.15, 0.025, 2, 0.0933],
  ] as const) {
    row(
      'M11',
      'derived from the Kloss equation and the table of torque minima',
      `${hp} hp at ${speed} rpm: ${torque} N·m, pull-out slip ${sm}`,
      () => {
        const rig = rigOf(electricMotor, { ...tenHorse, ratedPower: si(hp, 'power', 'hp'), ratedSpeed: rpm(speed), pullOut: b }, usRun);
        near(torqueAt(rig, rpm(speed)), torque, 3e-4);
        near(1 - speed / 1800, slip, 2e-3);
        near(pullOutSlip(1 - speed / 1800, b), sm, 1e-3);
        near(rig.coefficients.pullOutSlip!, sm, 1e-3);
      },
    );
  }
  row(
    'M11',
    'derived from the Kloss equation',
    '10 hp: 1741.0 rpm at 115 % and 1715.8 rpm at 150 % torque; Kloss alone starts with 41 %',
    () => {
      const rig = rigOf(electricMotor, tenHorse, usRun);
      const rated = tenHorse.ratedPower / rpm(1750);
      near(inUnit(speedFor(rig, 1.15 * rated, rpm(1650), rpm(1800)), 'speed', 'rpm'), 1741.0, 1e-4);
      near(inUnit(speedFor(rig, 1.5 * rated, rpm(1650), rpm(1800)), 'speed', 'rpm'), 1715.8, 1e-4);
      near(2 * klossRatio(1, 0.1037), 0.41, 5e-3);
    },
  );
  for (const [hp, kilowatts, two, four] of [
    [3, 2.2, [1.7, 1.1, 2], [1.8, 1.2, 2]],
    [5, 3.7, [1.6, 1.1, 2], [1.7, 1.2, 2]],
    [7.5, 5.5, [1.5, 1, 2], [1.6, 1.1, 2]],
    [10, 7.5, [1.5, 1, 2], [1.6, 1.1, 2]],
    [20, 15, [1.4, 1, 2], [1.5, 1.1, 2]],
  ] as const) {
    row('M11', 'IEC design N as quoted by an engineering handbook', `least torques of a ${hp} hp motor with 2 and 4 poles`, () => {
      for (const [poles, published] of [
        ['2', two],
        ['4', four],
      ] as const) {
        const found = designMinima(kilowatts * 1e3, poles);
        expect([found.lockedRotor, found.pullUp, found.pullOut]).toEqual([...published]);
      }
    });
  }
  row('M11', 'derived: torque with the square of voltage', 'pull-out of 200 % becomes 162, 128 and 98 % at 90, 80 and 70 % volts', () => {
    const rig = rigOf(electricMotor, tenHorse, usRun);
    const rated = tenHorse.ratedPower / rpm(1750);
    for (const [share, published] of [
      [0.9, 1.62],
      [0.8, 1.28],
      [0.7, 0.98],
    ] as const) {
      torqueAt(rig, rpm(1700), 460 * share);
      near(rig.reading('pullOutTorque') / rated, published, 1e-9);
    }
  });
  row(
    'M9',
    'NEMA MG 1-12.35 and NEC table 430.250 as quoted',
    'locked-rotor current of 10 hp at 230 V is 162 A on 28 A; the curve gives both plate points',
    () => {
      const rig = rigOf(
        electricMotor,
        { ...tenHorse, ratedVoltage: 230, ratedCurrent: 28, noLoadCurrent: 11, lockedRotorCurrent: 162 / 28 },
        { ...usRun, supplyVoltage: 230 },
      );
      torqueAt(rig, 0);
      near(rig.reading('current'), 162, 1e-9);
      torqueAt(rig, rpm(1750));
      near(rig.reading('current'), 28, 1e-9);
      torqueAt(rig, rpm(1800));
      near(rig.reading('current'), 11, 1e-9);
    },
  );
  row(
    'M0',
    'derived from the two counter-rotating fields',
    'with a phase lost: pull-out 46 %, nothing at standstill, √3 times the current',
    () => {
      let most = 0;
      for (let slip = 0; slip <= 1; slip += 0.001) most = Math.max(most, singlePhaseRatio(slip, 0.12));
      near(most, 0.46, 0.05);
      expect(singlePhaseRatio(1, 0.12)).toBe(0);
      const whole = rigOf(electricMotor, tenHorse, usRun);
      const lost = rigOf(electricMotor, { ...tenHorse, 'fault.single-phasing': 1 }, usRun);
      const torque = 0.5 * (tenHorse.ratedPower / rpm(1750));
      torqueAt(whole, speedFor(whole, torque, rpm(1700), rpm(1800)));
      torqueAt(lost, speedFor(lost, torque, rpm(1750), rpm(1800)));
      near(lost.reading('current') / whole.reading('current'), Math.sqrt(3), 0.05);
    },
  );
  row('M0', 'two readings at one motor', '400 V idle and 346 V at 31 A are explained by 1.0 Ω per phase', () => {
    const values = { ratedCurrent: 31, noLoadCurrent: 0.05, ratedSpeed: rpm(1450), lockedRotorCurrent: 6 };
    const rig = rigOf(electricMotor, values, { ...testRun, supplyImpedance: 1 });
    for (let speed = rpm(1300); speed < rpm(1500); speed += 0.01) {
      torqueAt(rig, speed);
      if (rig.reading('current') < 31) break;
    }
    near(rig.reading('terminalVoltage'), 346.3, 1e-3);
  });
});

describe('overload relay', () => {
  for (const [tripClass, tau, at15, least, most] of [
    ['10', 271, 240, 4, 10],
    ['20', 503, 446, 6, 20],
    ['30', 774, 686, 9, 30],
  ] as const) {
    row(
      'M16',
      'derived: one-body heat through the middle of the class band',
      `class ${tripClass}: τ ${tau} s, ${at15} s at 1.5 × dial`,
      () => {
        const found = classTimeConstant('IEC', tripClass);
        near(found, tau, 2e-3);
        near(tripTime(1.5, relayFactor('IEC'), found), at15, 3e-3);
      },
    );
    row('M14', 'IEC 60947-4-1 as quoted by relay makers', `class ${tripClass} at 7.2 × dial from cold: ${least} to ${most} s`, () => {
      const time = tripTime(7.2, relayFactor('IEC'), classTimeConstant('IEC', tripClass));
      expect(time).toBeGreaterThan(least);
      expect(time).toBeLessThan(most);
    });
    row('M14', 'NEMA classes as quoted by relay makers', `class ${tripClass}: at most ${tripClass} s at 600 %`, () => {
      expect(tripTime(6, relayFactor('NEMA'), classTimeConstant('NEMA', tripClass))).toBeLessThanOrEqual(Number(tripClass) * (1 + 1e-12));
    });
  }
  row('M16', 'limits of IEC 60947-4-1, from memory', 'class 10: 11.3 min at 1.2 × dial, never at 1.05 ×', () => {
    const tau = classTimeConstant('IEC', '10');
    near(tripTime(1.2, 1.15, tau) / 60, 11.3, 6e-3);
    expect(tripTime(1.05, 1.15, tau)).toBe(Number.POSITIVE_INFINITY);
  });
  row('M16', 'derived: the relay of a run follows the same equation', 'heat of the motor kind rises towards (I/(k·dial))² with τ', () => {
    const rig = rigOf(electricMotor, { relayDial: 11, ratedCurrent: 11 });
    torqueAt(rig, rpm(1450));
    near(rig.rate('state:overloadHeat'), 1 / 1.15 ** 2 / classTimeConstant('IEC', '10'), 1e-9);
  });
});
