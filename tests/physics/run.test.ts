import { describe, expect, it } from 'vitest';
import { demoCircuit } from '#shared/circuit/samples/demo.ts';
import { BitHash } from '#shared/simulation/hash.ts';
import { channelOf, type RunResult } from '#shared/simulation/result.ts';
import { runSimulation, runToEnd } from '#shared/simulation/run.ts';
import { compiled, readFixtureCircuit } from '../support/reference-case.ts';
import { command, standCircuit } from '../support/small-circuits.ts';

describe('a run', () => {
  it('hands back often, with ascending times, and returns the same bits however it is driven', () => {
    const circuit = compiled(demoCircuit);
    const run = runSimulation(circuit, { tolerance: 1e-4 });
    const times: number[] = [];
    let next = run.next();
    while (!next.done) {
      times.push(next.value.time);
      next = run.next();
    }
    expect(times.length).toBeGreaterThan(20);
    expect(times).toEqual([...times].sort((a, b) => a - b));
    const again = runToEnd(circuit, 1e-4);
    expect(next.value.hash).toBe(again.hash);
    expect(next.value.channels.map((channel) => [...channel.values])).toEqual(again.channels.map((channel) => [...channel.values]));
  });

  it('stops when asked, with what it has', () => {
    let asked = 0;
    const run = runToEnd(compiled(demoCircuit), 1e-4, { stop: () => ++asked > 3 });
    expect(run.status).toBe('stopped');
    expect(run.time).toBeGreaterThan(0);
    expect(run.time).toBeLessThan(run.duration);
    expect(run.times.at(-1)).toBe(run.time);
    expect(run.reason).toContain('Stopped at');
  });

  it('gives up at the step cap as a value that says where', () => {
    const run = runToEnd(compiled(demoCircuit), 1e-4, { stepCap: 50 });
    expect(run.status).toBe('failed');
    expect(run.reason).toMatch(/given up at .* s/);
    expect(run.stuck?.state).toBeTruthy();
    expect(run.times.length).toBeGreaterThan(10);
    expect(run.audit).not.toBeNull();
  });

  it('keeps about 4000 rows of a long ringing run without losing any peak of a channel', () => {
    const circuit = compiled(readFixtureCircuit('s1'));
    const fine = runToEnd(circuit, 1e-6);
    expect(fine.times.length).toBeLessThanOrEqual(5000);
    const most = (run: RunResult, address: string): number => Math.max(...(channelOf(run, address)?.values ?? []));
    for (const phase of fine.phases) expect(Object.keys(phase.channels)).toHaveLength(fine.channels.length);
    for (const { address } of fine.channels) {
      const peak = Math.max(...fine.phases.map((phase) => phase.channels[address]?.max ?? Number.NEGATIVE_INFINITY));
      expect(most(fine, address), address).toBe(peak);
    }
  });

  it('shows no pressure under absolute zero and shares one column within a net', () => {
    const run = runToEnd(compiled(readFixtureCircuit('s1')), 1e-4);
    expect(Math.min(...(channelOf(run, 'A1.B.pressure')?.values ?? []))).toBe(-101325);
    expect(channelOf(run, 'A1.B.pressure')?.values).toBe(channelOf(run, 'V3.B.pressure')?.values);
    expect(channelOf(run, 'T1.T.pressure')?.values.every((value) => value === 0)).toBe(true);
  });

  it('opens the contactor when the overload relay trips, and says so', () => {
    // A relay dialled far down on a pump at its relief: it trips within seconds.
    const values = { 'M1.relayDial': 1.2, 'P1.compensatorPressure': 3e7, 'P1.mostCompensator': 3.5e7, 'V1.setPressure': 6e6 };
    const run = runToEnd(compiled(standCircuit({ values, duty: { duration: 40, repeat: false, commands: [] } })), 1e-4);
    const trip = run.events.find((event) => event.signal === 'overload-trip');
    expect(trip?.rising).toBe(true);
    const { times } = run;
    const speed = channelOf(run, 'M1.speed')?.values as Float64Array;
    const before = times.findIndex((time) => time >= (trip?.time ?? 0) - 0.05);
    expect(speed[before]).toBeGreaterThan(100);
    expect(speed.at(-1)).toBeLessThan(5);
    expect(run.events.filter((event) => event.signal === 'overload-trip' && event.rising)).toHaveLength(1);
    expect(run.status).toBe('finished');
    expect(run.audit?.residual).toBeLessThan(1e-3);
  });

  it('marks a jump of an input with two rows at one time', () => {
    const duty = { duration: 1, repeat: false, commands: [command('c', 0.5, 0, 'M1', 'contactor', 0)] };
    const run = runToEnd(compiled(standCircuit({ duty })), 1e-4);
    expect(run.times.filter((time) => time === 0.5)).toHaveLength(2);
    expect(run.phases.map((phase) => [phase.from, phase.to])).toEqual([
      [0, 0.5],
      [0.5, 1],
    ]);
    const torque = run.phases.map((phase) => phase.channels['M1.torque']?.end ?? Number.NaN);
    expect(torque[0]).toBeGreaterThan(1);
  });

  it('names nets left under pressure', () => {
    const run = runToEnd(compiled(readFixtureCircuit('s1')), 1e-4);
    expect(run.pressureLeft.map((left) => left.net)).toEqual(['A1.A', 'A1.B']);
    expect(run.pressureLeft[0]?.label).toContain('V3 port A');
    expect(run.pressureLeft.every((left) => left.pressure > 5e5)).toBe(true);
  });
});

describe('the step hash', () => {
  it('depends on every bit and on the order', () => {
    const of = (...values: number[]): string => {
      const hash = new BitHash();
      for (const value of values) hash.add(value);
      return hash.text();
    };
    expect(of(1, 2)).toBe(of(1, 2));
    expect(of(1, 2)).not.toBe(of(2, 1));
    expect(of(1)).not.toBe(of(1 + Number.EPSILON));
    expect(of(0)).toBe(of(-0));
    expect(of(1)).toMatch(/^[0-9a-f]{16}$/);
  });
});
