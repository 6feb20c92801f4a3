import { describe, expect, it } from 'vitest';
import { checkValve } from './check-valve.ts';
import { compensatedPump } from './compensated-pump/compensated-pump.ts';
import { cylinder } from './cylinder/cylinder.ts';
import { directionalValve42 } from './directional-valve/directional-valve-4-2.ts';
import { directionalValve43 } from './directional-valve/directional-valve-4-3.ts';
import { electricMotor } from './electric-motor/electric-motor.ts';
import { filter } from './filter.ts';
import { flowMeter } from './flow-meter.ts';
import type { ComponentKind } from './kind.ts';
import { pressureGauge } from './pressure-gauge.ts';
import { reliefValve } from './relief-valve/relief-valve.ts';
import { plateOf, type Rig, rigOf, testRun } from './testing.ts';
import { throttle } from './throttle.ts';

/** Static laws of each kind on its own. */

const BAR = 1e5;
const LITRE = 1e-3 / 60;

function setAll(rig: Rig, values: Readonly<Record<string, number>>): Rig {
  for (const [name, value] of Object.entries(values)) rig.set(name, value);
  rig.flow();
  return rig;
}
const at = (kind: ComponentKind, plate: Readonly<Record<string, number | string>>, values: Readonly<Record<string, number>>): Rig =>
  setAll(rigOf(kind, plate), values);

describe('parts with a rated flow at a rated drop', () => {
  for (const [kind, plate] of [
    [throttle, {}],
    [checkValve, {}],
    [filter, {}],
    [flowMeter, {}],
  ] as const) {
    it(`${kind.id} passes its rated flow at its rated drop`, () => {
      const flow = plateOf(kind, plate).number('ratedFlow');
      const rig = at(kind, plate, { A: 3 * BAR + plateOf(kind, plate).number('ratedDrop'), B: 3 * BAR });
      expect(rig.pushed('B') / flow).toBeCloseTo(1, 5);
      expect(rig.pushed('A')).toBe(-rig.pushed('B'));
    });
  }
  it('throttle: half open passes half, shut next to nothing, both ways alike', () => {
    const open = at(throttle, {}, { A: 50 * BAR }).pushed('B');
    expect(at(throttle, {}, { A: 50 * BAR, opening: 0.5 }).pushed('B') / open).toBeCloseTo(0.5, 5);
    expect(at(throttle, {}, { A: 50 * BAR, opening: 0 }).pushed('B') / open).toBeLessThan(2e-6);
    expect(at(throttle, {}, { B: 50 * BAR }).pushed('B') / open).toBeCloseTo(-1, 12);
  });
  it('check valve: shut against the flow and below cracking', () => {
    expect(Math.abs(at(checkValve, {}, { B: 200 * BAR }).pushed('B'))).toBeLessThan(0.005 * LITRE);
    expect(at(checkValve, {}, { A: 0.3 * BAR }).pushed('B')).toBeLessThan(0.001 * LITRE);
    expect(at(checkValve, {}, { A: 0.9 * BAR }).pushed('B')).toBeGreaterThan(5 * LITRE);
  });
  it('check valve: a rated drop under the cracking pressure is said', () => {
    expect(checkValve.checks?.(plateOf(checkValve, { crackingPressure: 5 * BAR, ratedDrop: 2 * BAR }))).toHaveLength(1);
  });
  it('filter: clogging raises the drop until the bypass takes the flow', () => {
    const clogged = at(filter, { clogging: 1 }, { A: 3 * BAR });
    expect(clogged.pushed('B') / (60 * LITRE)).toBeCloseTo(1, 3);
    expect(clogged.reading('bypassFlow') / clogged.pushed('B')).toBeGreaterThan(0.999);
    expect(at(filter, { clogging: 1 }, { A: 1.9 * BAR }).pushed('B')).toBeLessThan(0.1 * LITRE);
    expect(at(filter, { clogging: 0.5 }, { A: 1 * BAR }).pushed('B') / at(filter, {}, { A: 1 * BAR }).pushed('B')).toBeCloseTo(0.5, 3);
  });
});

describe('directional valves', () => {
  const big = 1 * LITRE;
  const joined = (rig: Rig, from: string, to: string): boolean => {
    for (const port of ['P', 'T', 'A', 'B']) rig.set(port, 0);
    rig.set(from, 5 * BAR);
    rig.flow();
    return rig.pushed(to) > big;
  };
  for (const [centre, pairs] of [
    ['closed', []],
    ['tandem', ['PT']],
    ['float', ['AT', 'BT']],
    ['open', ['PT', 'PA', 'PB', 'AT', 'BT']],
  ] as const) {
    it(`4/3 ${centre} centre joins ${pairs.join(', ') || 'nothing'}`, () => {
      const rig = rigOf(directionalValve43, { centre });
      for (const pair of ['PT', 'PA', 'PB', 'AT', 'BT']) {
        expect(joined(rig, pair[0]!, pair[1]!), pair).toBe((pairs as readonly string[]).includes(pair));
      }
    });
  }
  it('4/3: solenoid a joins P to A and B to T with the rated flow at the rated drop, solenoid b the other way', () => {
    const rig = rigOf(directionalValve43);
    rig.set('spool', 1);
    for (const [pair, open] of Object.entries({ PA: true, BT: true, PB: false, AT: false, PT: false })) {
      expect(joined(rig, pair[0]!, pair[1]!), pair).toBe(open);
    }
    joined(rig, 'P', 'A');
    expect(rig.pushed('A') / (60 * LITRE)).toBeCloseTo(1, 3);
    rig.set('spool', -1);
    for (const [pair, open] of Object.entries({ PA: false, BT: false, PB: true, AT: true, PT: false })) {
      expect(joined(rig, pair[0]!, pair[1]!), pair).toBe(open);
    }
  });
  it('4/2: P to B at rest, P to A switched', () => {
    const rig = rigOf(directionalValve42);
    expect([joined(rig, 'P', 'B'), joined(rig, 'A', 'T'), joined(rig, 'P', 'A')]).toEqual([true, true, false]);
    rig.set('spool', 1);
    expect([joined(rig, 'P', 'A'), joined(rig, 'B', 'T'), joined(rig, 'P', 'B')]).toEqual([true, true, false]);
  });
  it('leak through a closed spool: 50 mL/min per edge at 200 bar', () => {
    const rig = at(directionalValve43, { centre: 'closed' }, { A: 200 * BAR, P: 200 * BAR });
    expect(rig.pushed('T') / (0.1 * LITRE)).toBeCloseTo(1, 3);
  });
  it('leak more with thin oil', () => {
    const thin = rigOf(directionalValve43, { centre: 'closed' }, { ...testRun, viscosity: testRun.viscosity / 4 });
    setAll(thin, { A: 200 * BAR });
    expect(thin.pushed('T') / at(directionalValve43, { centre: 'closed' }, { A: 200 * BAR }).pushed('T')).toBeCloseTo(4, 6);
  });
});

describe('relief valve', () => {
  const plate = { setPressure: 200 * BAR, override: 0.05, setFlow: 40 * LITRE, reseat: 0.9 };
  /** Lift at which the valve comes to rest at a pressure, from a lift. */
  const settle = (pressure: number, from: number, changes: Readonly<Record<string, number>> = {}): number => {
    const rig = rigOf(reliefValve, { ...plate, ...changes });
    rig.set('P', pressure);
    let lift = from;
    for (let k = 0; k < 4000; k += 1) {
      rig.set('state:lift', lift);
      rig.flow();
      lift += 1e-4 * rig.rate('state:lift');
    }
    return lift;
  };
  it('opens by half at its set pressure and wholly at twice the override, from either side', () => {
    const cracking = (200 * BAR) / 1.05;
    expect(settle(200 * BAR, 0)).toBeCloseTo(0.5, 2);
    expect(settle(200 * BAR, 1)).toBeCloseTo(0.5, 2);
    expect(settle(2 * 200 * BAR - cracking + 2 * BAR, 0)).toBeGreaterThan(0.98);
  });
  it('stays shut until cracking when it was shut, and closes only at reseat when it was open', () => {
    const cracking = (200 * BAR) / 1.05;
    expect(settle(cracking - 2 * BAR, 0)).toBeLessThan(0.01);
    expect(settle(cracking - 2 * BAR, 0.5)).toBeGreaterThan(0.2);
    expect(settle(0.9 * cracking - 1 * BAR, 0.5)).toBeLessThan(0.01);
  });
  it('does not creep between the two', () => {
    const cracking = (200 * BAR) / 1.05;
    const rig = at(reliefValve, plate, { P: cracking - 5 * BAR, 'state:lift': 0.05 });
    expect(rig.rate('state:lift')).toBe(0);
  });
  it('with faults: stuck open passes at once, stuck shut never, a weak spring cracks at half', () => {
    expect(at(reliefValve, { ...plate, 'fault.stuck-open': 1 }, { P: 200 * BAR }).pushed('T') / (80 * LITRE)).toBeCloseTo(1, 4);
    expect(at(reliefValve, { ...plate, 'fault.stuck-shut': 1 }, { P: 400 * BAR, 'state:lift': 1 }).pushed('T')).toBe(0);
    expect(rigOf(reliefValve, { ...plate, 'fault.weak-spring': 1 }).reading('cracksAt') / (95.238 * BAR)).toBeCloseTo(1, 4);
  });
  it('says when the override does not suit the type', () => {
    expect(reliefValve.checks?.(plateOf(reliefValve, { type: 'direct', override: 0.05 }))).toHaveLength(1);
    expect(reliefValve.checks?.(plateOf(reliefValve, { type: 'direct', override: 0.2 }))).toHaveLength(0);
  });
});

describe('pump faults', () => {
  const running = { outlet: 150 * BAR, shaft: 150, 'state:stroke': 1 };
  it('stuck on stroke stays at the stop above the setting; stuck off goes to the minimum', () => {
    const high = { ...running, outlet: 250 * BAR };
    expect(at(compensatedPump, {}, high).rate('state:stroke')).toBeLessThan(-50);
    expect(Math.abs(at(compensatedPump, { 'fault.stuck-on-stroke': 1 }, high).rate('state:stroke'))).toBeLessThan(1e-9);
    expect(at(compensatedPump, { 'fault.stuck-off-stroke': 1 }, running).rate('state:stroke')).toBeLessThan(-50);
    expect(rigOf(compensatedPump, { 'fault.stuck-off-stroke': 1 }).w.y[4]).toBe(0);
  });
  it('worn leaks ten times, slow takes ten times as long, dry and seized drag, a sheared coupling takes nothing', () => {
    const plain = at(compensatedPump, {}, running);
    const fault = (id: string): Rig => at(compensatedPump, { [`fault.${id}`]: 1 }, running);
    expect(fault('worn').pushed('drain') / plain.pushed('drain')).toBeCloseTo(10, 9);
    const high = { ...running, outlet: 250 * BAR };
    expect(
      at(compensatedPump, {}, high).rate('state:stroke') / at(compensatedPump, { 'fault.slow': 1 }, high).rate('state:stroke'),
    ).toBeCloseTo(10, 6);
    expect(fault('dry').pushed('shaft')).toBeLessThan(plain.pushed('shaft') - 15);
    expect(fault('seized').pushed('shaft')).toBeLessThan(plain.pushed('shaft') - 300);
    expect(Math.abs(fault('coupling-sheared').pushed('shaft'))).toBe(0);
    expect(fault('coupling-sheared').pushed('outlet')).toBeLessThan(0);
  });
  it('starves when the inlet runs dry of pressure, and draws less torque', () => {
    const starved = at(compensatedPump, {}, { ...running, suction: -0.85 * BAR });
    expect(starved.reading('filling')).toBeLessThan(0.5);
    expect(starved.pushed('outlet')).toBeLessThan(0.5 * at(compensatedPump, {}, running).pushed('outlet'));
  });
  it('motors when driven backwards by pressure', () => {
    const back = at(compensatedPump, {}, { ...running, shaft: -50 });
    expect(back.pushed('suction')).toBeGreaterThan(0);
    expect(back.pushed('shaft')).toBeLessThan(0);
  });
  it('says when the stop is above the displacement', () => {
    expect(compensatedPump.checks?.(plateOf(compensatedPump, { displacement: 16e-6 / (2 * Math.PI) }))).toHaveLength(1);
  });
});

describe('cylinder', () => {
  it('rests on its stop under its load at the start', () => {
    const rig = rigOf(cylinder, { loadForce: 5000, 'raw.stopStiffness': 2e8 });
    expect(rig.coefficients.start).toBe(-2.5e-5);
    rig.flow();
    expect(Math.abs(rig.rate('state:velocity'))).toBeLessThan(1e-9);
    expect(rigOf(cylinder, { startPosition: 0.5, loadForce: -5000 }).coefficients.start).toBeCloseTo(0.5 + 5000 / 1e8, 12);
  });
  it('stops that are hit push back and never pull', () => {
    const push = at(cylinder, {}, { 'state:position': 0.501, 'state:velocity': 0.1 });
    expect(push.rate('state:velocity')).toBeLessThan(-1000);
    // Leaving fast: the stop has let go, only friction acts.
    const away = at(cylinder, { coulomb: 0, stiction: 0, viscous: 0 }, { 'state:position': 0.501, 'state:velocity': -0.1 });
    expect(Math.abs(away.rate('state:velocity'))).toBeLessThan(1e-9);
  });
  it('weighs by its angle', () => {
    const load = (angle: number): number => rigOf(cylinder, { angle, mass: 1000 }).reading('loadForce');
    expect(load(Math.PI / 2) / 9806.65).toBeCloseTo(1, 12);
    expect(load(-Math.PI / 6) / -4903.325).toBeCloseTo(1, 12);
    expect(load(0)).toBe(0);
  });
  it('meets its work: nothing before, all at full, more beyond, only the springback on the way back', () => {
    for (const [shape, half] of [
      ['1', 0.5],
      ['2', 0.25],
      ['3', 0.125],
    ] as const) {
      const plate = { workContact: 0.1, workFull: 0.3, workForce: 50e3, workShape: shape, workSpringback: 0.02 };
      const load = (x: number, v = 0.05): number => at(cylinder, plate, { 'state:position': x, 'state:velocity': v }).reading('loadForce');
      expect(load(0.09)).toBe(0);
      expect(load(0.2) / 50e3).toBeCloseTo(half, 9);
      expect(load(0.3) / 50e3).toBeCloseTo(1, 9);
      expect(load(0.32)).toBeGreaterThan(50e3);
      expect(load(0.3, -0.1) / 50e3).toBeCloseTo(0.02, 9);
    }
  });
  it('with faults: a bypassing piston passes oil, a bound rod drags', () => {
    const pressures = { A: 100 * BAR, 'state:position': 0.2 };
    expect(at(cylinder, {}, pressures).pushed('B')).toBe(0);
    expect(at(cylinder, { 'fault.piston-bypass': 1 }, pressures).pushed('B')).toBeGreaterThan(15 * LITRE);
    const free = at(cylinder, {}, { ...pressures, 'state:velocity': 0.1 }).rate('state:velocity');
    expect(at(cylinder, { 'fault.bound-rod': 1 }, { ...pressures, 'state:velocity': 0.1 }).rate('state:velocity')).toBeLessThan(free - 250);
  });
  it('creeps when held by friction alone, slower than 2 mm/s', () => {
    const rig = at(cylinder, {}, { A: (1000 / rigOf(cylinder).coefficients.areaA!) * 1, 'state:position': 0.2, 'state:velocity': 2e-3 });
    expect(rig.rate('state:velocity')).toBeLessThan(0);
  });
});

describe('motor and gauge', () => {
  it('a motor that is off only drags; energised it starts; with star left in it has a third of the torque', () => {
    expect(at(electricMotor, {}, { contactor: 0, shaft: 100 }).pushed('shaft')).toBeCloseTo(-0.2, 9);
    const full = at(electricMotor, {}, { shaft: 0 }).pushed('shaft');
    // Design N minima of a 5.5 kW 4-pole motor: 160 % at standstill.
    expect(full / (5500 / ((1450 * 2 * Math.PI) / 60))).toBeCloseTo(1.6, 9);
    expect(at(electricMotor, { 'fault.stuck-in-star': 1 }, { shaft: 0 }).pushed('shaft') / full).toBeCloseTo(1 / 3, 9);
    expect(at(electricMotor, { 'fault.wrong-rotation': 1 }, { shaft: 0 }).pushed('shaft') / full).toBeCloseTo(-1, 9);
  });
  it('the torque curve has no step and no dip under pull-up', () => {
    const rig = rigOf(electricMotor, { drag: 0 });
    const rated = 5500 / ((1450 * 2 * Math.PI) / 60);
    let last = Number.NaN;
    for (let speed = -20; speed < 150; speed += 0.05) {
      setAll(rig, { shaft: speed });
      const torque = rig.pushed('shaft') / rated;
      if (!Number.isNaN(last)) expect(Math.abs(torque - last)).toBeLessThan(0.01);
      last = torque;
      if (speed > 1 && speed < 137) expect(torque).toBeGreaterThan(1.0999);
      expect(torque).toBeLessThan(2.0001);
    }
  });
  it('the relay is asked only where it is fitted', () => {
    expect(at(electricMotor, {}, { 'state:overloadHeat': 1.1 }).signal('overload-trip')).toBeGreaterThan(0);
    expect(at(electricMotor, { relayFitted: 'no' }, { 'state:overloadHeat': 1.1 }).signal('overload-trip')).toBeLessThan(0);
  });
  it('a standing relay cools three times slower than it warms', () => {
    const warm = at(electricMotor, {}, { contactor: 1, shaft: 156.9, 'state:overloadHeat': 0.5 });
    const off = at(electricMotor, {}, { contactor: 0, shaft: 0, 'state:overloadHeat': 0.5 });
    const idle = (warm.reading('current') / (1.15 * 11)) ** 2;
    expect(warm.rate('state:overloadHeat') / (idle - 0.5) / (off.rate('state:overloadHeat') / -0.5)).toBeCloseTo(3, 6);
  });
  it('contradictions on the plate are said', () => {
    expect(electricMotor.checks?.(plateOf(electricMotor, { ratedSpeed: 160 }))).toHaveLength(1);
    expect(electricMotor.checks?.(plateOf(electricMotor, { noLoadCurrent: 12 }))).toHaveLength(1);
  });
  it('a gauge follows its net with its lag and knows the end of its scale', () => {
    const rig = at(pressureGauge, {}, { M: 100 * BAR, 'state:shown': 40 * BAR });
    expect(rig.rate('state:shown') / ((60 * BAR) / 0.05)).toBeCloseTo(1, 12);
    expect(rig.signal('off-scale')).toBeLessThan(0);
    expect(at(pressureGauge, {}, { M: 260 * BAR }).signal('off-scale')).toBeGreaterThan(0);
  });
});
