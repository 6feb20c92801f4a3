import { describe, expect, it } from 'vitest';
import { part, pipe } from '#shared/circuit/samples/sample-builder.ts';
import { liftStarter } from '#shared/circuit/samples/starter-lift.ts';
import { standStarter } from '#shared/circuit/samples/starter-stand.ts';
import type { CircuitDocument, Command } from '#shared/circuit/schema.ts';
import { classTimeConstant, tripTime } from '#shared/kinds/electric-motor/laws.ts';
import { compileCircuit } from '#shared/simulation/compile.ts';
import { channelOf, type RunResult, valueAt } from '#shared/simulation/result.ts';
import { runToEnd } from '#shared/simulation/run.ts';

/** What every technician knows, seen in real runs. Common practice, no source, unless a line says otherwise. */

type Changes = Readonly<Record<string, number | string>>;

/** The document with 'component.parameter' values changed. */
function changed(document: CircuitDocument, changes: Changes, commands?: readonly Command[]): CircuitDocument {
  const copy = structuredClone(document) as CircuitDocument;
  for (const [address, value] of Object.entries(changes)) {
    const [id, ...rest] = address.split('.');
    const component = copy.components.find((entry) => entry.id === id);
    if (!component) throw new Error(`no component ${id}`);
    component.parameters[rest.join('.')] = { value, source: 'typed' };
  }
  return commands ? { ...copy, duty: { ...copy.duty, commands: [...commands] } } : copy;
}

function command(time: number, target: string, input: string, value: number, ramp = 0.05): Command {
  return { id: `c${time}${target}${input}`, time, ramp, target, input, value, label: `${target} ${input} ${value}` };
}

function run(document: CircuitDocument): RunResult {
  const compiled = compileCircuit(document, document.cases[0]!.id);
  if (!('circuit' in compiled)) throw new Error(JSON.stringify(compiled.problems));
  const result = runToEnd(compiled.circuit, 1e-4);
  expect(result.status, result.reason).toBe('finished');
  return result;
}

function at(result: RunResult, address: string, time: number): number {
  return valueAt(result.times, values(result, address), time);
}

function values(result: RunResult, address: string): Float64Array {
  const channel = channelOf(result, address);
  if (!channel) throw new Error(`no channel ${address}`);
  return channel.values;
}

const largest = (result: RunResult, address: string): number =>
  values(result, address).reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
const smallest = (result: RunResult, address: string): number =>
  values(result, address).reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY);
const happens = (result: RunResult, component: string, signal: string): boolean =>
  result.events.some((event) => event.component === component && event.signal === signal && event.rising);

const BAR = 1e5;
const CC = 1e-6 / (2 * Math.PI);
/** Test stand: pump 28 cm³/rev, compensator 200 bar with 8 bar band; relief out of the way; throttle shut slowly from 1 s to 4 s. */
const closing = [command(0, 'M1', 'contactor', 1, 0), command(1, 'V2', 'opening', 0.1, 0.5), command(2, 'V2', 'opening', 0, 2)];
const outOfTheWay: Changes = { 'V1.setPressure': 260 * BAR, 'V1.override': 0.06 };
const SETTING = 200 * BAR;
const BAND = 8 * BAR;

describe('the stop', () => {
  const full = run(changed(standStarter, outOfTheWay, closing));
  const turnedIn = run(changed(standStarter, { ...outOfTheWay, 'P1.maxVolumeStop': 0.75 * 28 * CC }, closing));

  it('turned in by a quarter takes a quarter off the ideal torque at equal pressure', () => {
    const share = (result: RunResult): number => at(result, 'P1.displacement', 0.9);
    expect(share(turnedIn) / share(full)).toBeCloseTo(0.75, 3);
    // Over the relief, at the same pressure: the whole torque, friction and all, falls by nearly a quarter.
    const onRelief = (stop: number): RunResult =>
      run(
        changed(
          standStarter,
          { 'V1.setPressure': 150 * BAR, 'P1.maxVolumeStop': stop * CC, 'V1.setFlow': (stop * 1e-6 * 1450) / 60 },
          closing,
        ),
      );
    const a = onRelief(28);
    const b = onRelief(21);
    const perBar = (result: RunResult): number => at(result, 'P1.torque', 4.4) / at(result, 'P1.outletPressure', 4.4);
    expect(Math.abs(at(a, 'P1.outletPressure', 4.4) / at(b, 'P1.outletPressure', 4.4) - 1)).toBeLessThan(0.02);
    expect(perBar(b) / perBar(a)).toBeGreaterThan(0.75);
    expect(perBar(b) / perBar(a)).toBeLessThan(0.78);
  });

  it('changes flow, not dead-head pressure', () => {
    expect(at(turnedIn, 'P1.flow', 0.9) / at(full, 'P1.flow', 0.9)).toBeCloseTo(0.75, 2);
    expect(Math.abs(at(turnedIn, 'P1.outletPressure', 5) - at(full, 'P1.outletPressure', 5))).toBeLessThan(0.2 * BAR);
  });

  it('moves the knee up when turned in', () => {
    const knee = (result: RunResult): number => {
      const event = result.events.find((entry) => entry.signal === 'compensating' && entry.rising)!;
      return at(result, 'P1.outletPressure', event.time);
    };
    expect(Math.abs(knee(full) - (SETTING - BAND))).toBeLessThan(0.5 * BAR);
    expect(Math.abs(knee(turnedIn) - (SETTING - 0.75 * BAND))).toBeLessThan(0.5 * BAR);
  });

  it('and a minimum stop wound in keeps the pump from zero flow: only the relief limits pressure', () => {
    const result = run(changed(standStarter, { ...outOfTheWay, 'P1.minVolumeStop': 5 * CC, 'V1.setPressure': 230 * BAR }, closing));
    expect(at(result, 'P1.outletPressure', 5)).toBeGreaterThan(SETTING + 5 * BAR);
    expect(at(result, 'V1.flow', 5)).toBeGreaterThan((4 * 1e-6 * 1450) / 60);
  });
});

describe('the compensator', () => {
  const result = run(changed(standStarter, outOfTheWay, closing));

  it('begins to destroke before its setting and can go to zero flow', () => {
    const begins = result.events.find((event) => event.component === 'P1' && event.signal === 'compensating' && event.rising)!;
    expect(at(result, 'P1.outletPressure', begins.time)).toBeLessThan(SETTING - 0.8 * BAND);
    expect(at(result, 'P1.stroke', 5)).toBeLessThan(0.03);
    expect(Math.abs(at(result, 'P1.flow', 5))).toBeLessThan(0.05e-3 / 60);
    expect(Math.abs(at(result, 'P1.outletPressure', 5) - SETTING)).toBeLessThan(0.5 * BAR);
  });

  it('makes power peak at the knee, not at dead-head', () => {
    const power = values(result, 'P1.shaftPower');
    const pressure = values(result, 'P1.outletPressure');
    let best = 0;
    // After run-up: the throttle begins to close at 1 s.
    for (let k = 0; k < power.length; k += 1) if (result.times[k]! > 1 && (best === 0 || power[k]! > power[best]!)) best = k;
    expect(pressure[best]!).toBeGreaterThan(SETTING - BAND - 4 * BAR);
    expect(pressure[best]!).toBeLessThan(SETTING - 0.5 * BAND);
    expect(at(result, 'P1.shaftPower', 5)).toBeLessThan(0.12 * power[best]!);
  });

  it('acts on the pressure over the case drain: back pressure there raises dead-head bar for bar', () => {
    const blocked = changed(standStarter, outOfTheWay, closing);
    blocked.components.push(
      part('V9', 'relief-valve', [26, 34], {
        setPressure: { value: 12 * BAR, source: 'typed' },
        leastSet: { value: 5 * BAR, source: 'typed' },
        setFlow: { value: 1e-3 / 60, source: 'typed' },
        override: { value: 0.05, source: 'typed' },
      }),
    );
    blocked.lines = blocked.lines.flatMap((line) =>
      line.id === 'L2' ? [pipe('L2', 'P1.drain', 'V9.P', 1, 10), pipe('L20', 'V9.T', 'T2.T', 0.2, 10)] : [line],
    );
    const held = run(blocked);
    const drain = at(held, 'P1.drain.pressure', 5);
    expect(drain).toBeGreaterThan(8 * BAR);
    expect(Math.abs(at(held, 'P1.outletPressure', 5) - at(result, 'P1.outletPressure', 5) - drain)).toBeLessThan(0.1 * BAR);
  });

  it('of a worn pump sags with leakage, and its amps rise at dead-head but hardly while moving', () => {
    const worn = run(changed(standStarter, { ...outOfTheWay, 'P1.fault.worn': 1 }, closing));
    expect(at(worn, 'P1.outletPressure', 5)).toBeLessThan(at(result, 'P1.outletPressure', 5) - 0.5 * BAR);
    expect(at(worn, 'M1.current', 5)).toBeGreaterThan(1.1 * at(result, 'M1.current', 5));
    expect(Math.abs(at(worn, 'M1.current', 0.9) / at(result, 'M1.current', 0.9) - 1)).toBeLessThan(0.01);
  });

  it('stuck on stroke leaves only the relief', () => {
    const stuck = run(changed(standStarter, { ...outOfTheWay, 'V1.setPressure': 220 * BAR, 'P1.fault.stuck-on-stroke': 1 }, closing));
    expect(at(stuck, 'P1.stroke', 4.4)).toBeGreaterThan(0.99);
    expect(at(stuck, 'V1.flow', 4.4)).toBeGreaterThan(0.9 * at(stuck, 'P1.flow', 4.4));
  });
});

describe('the relief', () => {
  it('that cracks above dead-head stays shut', () => {
    const result = run(changed(standStarter, { 'V1.setPressure': 225 * BAR, 'V1.override': 0.06 }, closing));
    expect(at(result, 'V1.cracksAt', 5)).toBeGreaterThan(at(result, 'P1.outletPressure', 5));
    expect(happens(result, 'V1', 'cracks')).toBe(false);
    expect(largest(result, 'V1.flow')).toBeLessThan(0.02e-3 / 60);
  });

  it('lowered under the compensator hides it: the pump stays on stroke and its whole flow becomes heat', () => {
    const result = run(changed(standStarter, { 'V1.setPressure': 150 * BAR }, closing));
    expect(happens(result, 'P1', 'compensating')).toBe(false);
    expect(at(result, 'P1.stroke', 5)).toBeGreaterThan(0.99);
    expect(at(result, 'V1.flow', 5)).toBeGreaterThan(0.95 * at(result, 'P1.flow', 5));
    expect(at(result, 'V1.heat', 5)).toBeGreaterThan(0.9 * at(result, 'P1.hydraulicPower', 5));
    // Half lift at the set flow: the set pressure within 3 %.
    expect(Math.abs(at(result, 'V1.drop', 5) / (150 * BAR) - 1)).toBeLessThan(0.03);
  });
});

describe('loads', () => {
  const start = command(0, 'M1', 'contactor', 1, 0);

  it('an external load raises pressure above the compensator', () => {
    // Spool centred, rod part way out, then 35 kN from outside.
    const result = run(
      changed(liftStarter, {}, [
        start,
        command(0.6, 'V3', 'spool', 1),
        command(2, 'V3', 'spool', 0),
        command(3, 'A1', 'load', 35e3, 0.3),
        command(4, 'A1', 'load', 0, 0.3),
      ]),
    );
    const compensator = 130 * BAR;
    expect(at(result, 'P1.outletPressure', 3.6)).toBeLessThan(compensator + 0.5 * BAR);
    expect(at(result, 'A1.capPressure', 3.6)).toBeGreaterThan(compensator + 50 * BAR);
  });

  it('pushing back through an open valve raises the line above the compensator until the relief passes', () => {
    const result = run(changed(liftStarter, {}, [start, command(0.6, 'V3', 'spool', 1), command(2.5, 'A1', 'load', 45e3, 0.3)]));
    expect(at(result, 'V2.P.pressure', 3)).toBeGreaterThan(140 * BAR);
    expect(at(result, 'V2.flow', 3)).toBeGreaterThan(1e-3 / 60);
    expect(at(result, 'A1.velocity', 3)).toBeLessThan(0);
  });

  it('drive a tripped pump backwards where no check valve stops them', () => {
    const stops = [start, command(0.6, 'V3', 'spool', 1), command(3, 'M1', 'contactor', 0, 0)];
    const withCheck = run(changed(liftStarter, {}, stops));
    // The trapped oil at the outlet may turn the pump back by a fraction of a turn, no more.
    expect(Math.abs(at(withCheck, 'M1.speed', 4))).toBeLessThan(2);
    expect(Math.abs(at(withCheck, 'A1.position', 5) - at(withCheck, 'A1.position', 3.5))).toBeLessThan(0.02);
    const without = changed(liftStarter, {}, stops);
    without.components.splice(
      without.components.findIndex((component) => component.id === 'V1'),
      1,
    );
    without.lines = without.lines.flatMap((line) =>
      line.id === 'L3' ? [pipe('L3', 'P1.outlet', 'J1.a', 0.7, 16)] : line.id === 'L4' ? [] : [line],
    );
    const result = run(without);
    expect(smallest(result, 'M1.speed')).toBeLessThan(-20);
    expect(at(result, 'M1.speed', 4)).toBeLessThan(-20);
    expect(happens(result, 'P1', 'backwards')).toBe(true);
    expect(at(result, 'A1.position', 5)).toBeLessThan(at(result, 'A1.position', 3) - 0.05);
  });

  it('are not held by a closed spool: the rod creeps down', () => {
    const result = run(changed(liftStarter, {}, [start, command(0.6, 'V3', 'spool', 1), command(2, 'V3', 'spool', 0)]));
    expect(at(result, 'A1.position', 10)).toBeLessThan(at(result, 'A1.position', 3) - 1e-4);
    expect(at(result, 'A1.position', 10)).toBeGreaterThan(at(result, 'A1.position', 3) - 0.1);
  });

  it('leave pressure in a cylinder when the pump has stopped: the gauge at the pump reads less', () => {
    const result = run(
      changed(liftStarter, {}, [
        start,
        command(0.6, 'V3', 'spool', 1),
        command(2, 'V3', 'spool', 0),
        command(2.5, 'M1', 'contactor', 0, 0),
      ]),
    );
    expect(at(result, 'P1.outletPressure', 9)).toBeLessThan(5 * BAR);
    expect(at(result, 'A1.capPressure', 9)).toBeGreaterThan(50 * BAR);
  });
});

describe('the motor', () => {
  it('loses a fifth of its pull-out torque with a tenth of its volts', () => {
    const low = run({ ...changed(standStarter, outOfTheWay, closing), supply: { ...standStarter.supply, voltage: 360 } });
    const full = run(changed(standStarter, outOfTheWay, closing));
    expect(at(low, 'M1.pullOutTorque', 1) / at(full, 'M1.pullOutTorque', 1)).toBeCloseTo(0.81, 6);
    expect(at(low, 'M1.speed', 0.9)).toBeLessThan(at(full, 'M1.speed', 0.9));
  });

  it('turning the wrong way gives no pressure', () => {
    const result = run(changed(standStarter, { ...outOfTheWay, 'M1.fault.wrong-rotation': 1 }, closing));
    expect(at(result, 'M1.speed', 1)).toBeLessThan(-100);
    expect(at(result, 'P1.outletPressure', 5)).toBeLessThan(1 * BAR);
  });

  it('with one phase lost hums at standstill and does not start', () => {
    const result = run(changed(standStarter, { ...outOfTheWay, 'M1.fault.single-phasing': 1 }, closing));
    expect(Math.abs(at(result, 'M1.speed', 2))).toBeLessThan(1);
    expect(at(result, 'M1.current', 2)).toBeGreaterThan(4 * 21);
  });

  it('held at standstill draws its locked-rotor current until the overload relay opens the contactor', () => {
    const result = run(changed(standStarter, { ...outOfTheWay, 'P1.fault.seized': 1, 'M1.relayDial': 10 }, closing));
    const trip = result.events.find((event) => event.component === 'M1' && event.signal === 'overload-trip')!;
    expect(at(result, 'M1.current', 1)).toBeGreaterThan(5.9 * 21);
    const predicted = tripTime(at(result, 'M1.current', 1) / 10, 1.15, classTimeConstant('IEC', '10'));
    expect(Math.abs(trip.time / predicted - 1)).toBeLessThan(0.01);
    expect(at(result, 'M1.current', trip.time + 0.5)).toBe(0);
  });
});
