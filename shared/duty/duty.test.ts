import { describe, expect, it } from 'vitest';
import { type ComponentKind, defineKind } from '../kinds/kind.ts';
import { offeredCommands } from './command-offers.ts';
import { commandWords, shortWords } from './command-words.ts';
import type { DutyCommand, DutyDocument } from './duty.ts';
import { defaultLanes, fewerLanes } from './lanes.ts';
import { dutyPhases } from './phases.ts';

function kind(id: string, part: Partial<ComponentKind>): ComponentKind {
  return defineKind({
    id,
    version: 1,
    title: id,
    word: id,
    letter: 'X',
    stage: 'act',
    about: '',
    parameters: [],
    faults: [],
    ports: [],
    states: [],
    inputs: [],
    screws: [],
    coefficients: [],
    prepare: () => ({}),
    entries: [],
    flow: () => undefined,
    jacobian: () => undefined,
    powers: () => undefined,
    signals: [],
    trips: [],
    readings: [],
    passes: [],
    ...part,
  });
}

const rest = () => 0;
const kinds: Record<string, ComponentKind> = {
  motor: kind('motor', {
    inputs: [
      {
        id: 'contactor',
        label: 'Contactor',
        quantity: 'number',
        min: 0,
        max: 1,
        rest,
        ramp: 0,
        role: 'command',
      },
    ],
    faults: [{ id: 'worn', label: 'Worn bearings', help: '' }],
  }),
  valve: kind('valve', {
    inputs: [
      {
        id: 'spool',
        label: 'Spool',
        quantity: 'number',
        min: -1,
        max: 1,
        rest,
        ramp: 0.05,
        role: 'command',
        words: [
          { value: 1, label: 'solenoid a on' },
          { value: 0, label: 'centre' },
        ],
      },
    ],
  }),
  cylinder: kind('cylinder', {
    inputs: [
      {
        id: 'load',
        label: 'Load',
        quantity: 'force',
        min: -1e6,
        max: 1e6,
        rest,
        ramp: 0.1,
        role: 'load',
      },
    ],
  }),
};
const kindOf = (id: string) => kinds[id];
const show = (value: number, quantity: string) => `${value} ${quantity}`;

function command(part: Partial<DutyCommand>): DutyCommand {
  return {
    id: 'c1',
    time: 0,
    ramp: 0,
    target: 'M1',
    input: 'contactor',
    value: 1,
    label: '',
    ...part,
  };
}

function circuit(commands: readonly DutyCommand[] = []): DutyDocument {
  return {
    components: [
      { id: 'M1', kind: 'motor', name: 'M1' },
      { id: 'V3', kind: 'valve', name: 'V3' },
      { id: 'A1', kind: 'cylinder', name: 'A1' },
    ],
    supply: { voltage: 400, frequency: 50 },
    duty: { duration: 7, repeat: true, commands },
  };
}

describe('words of a command', () => {
  const words = (part: Partial<DutyCommand>) => commandWords(circuit(), kindOf, command(part), show);
  it('keeps the label a person gave', () => expect(words({ label: 'Close the press' })).toBe('Close the press'));
  it('says start and stop', () => {
    expect(words({})).toBe('Start');
    expect(words({ value: 0 })).toBe('Stop');
  });
  it('takes the words of the input', () => expect(words({ target: 'V3', input: 'spool' })).toBe('Solenoid a on'));
  it('names the valve where there are two', () => {
    const two = {
      ...circuit(),
      components: [...circuit().components, { id: 'V5', kind: 'valve', name: 'V5' }],
    };
    expect(commandWords(two, kindOf, command({ target: 'V5', input: 'spool' }), show)).toBe('V5: solenoid a on');
  });
  it('says a value with its unit', () => expect(words({ target: 'A1', input: 'load', value: 5e4 })).toBe('Load 50000 force'));
  it('says a fault and its end', () => {
    expect(words({ input: 'fault.worn' })).toBe('M1 worn bearings');
    expect(words({ input: 'fault.worn', value: 0.5 })).toBe('M1 worn bearings 0.5 fraction');
    expect(words({ input: 'fault.worn', value: 0 })).toBe('M1 worn bearings ends');
  });
  it('says dip, return and loss of supply', () => {
    const dip = command({
      id: 'c1',
      time: 1,
      target: 'supply',
      input: 'voltage',
      value: 340,
    });
    const back = command({
      id: 'c2',
      time: 2,
      target: 'supply',
      input: 'voltage',
      value: 400,
    });
    const document = circuit([back, dip]);
    expect(commandWords(document, kindOf, dip, show)).toBe('Supply dips to 340 voltage');
    expect(commandWords(document, kindOf, back, show)).toBe('Supply back to 400 voltage');
    expect(commandWords(document, kindOf, command({ target: 'supply', input: 'voltage', value: 0 }), show)).toBe('Supply lost');
  });
  it('cuts words down for narrow tapes', () => expect(shortWords('Solenoid a on')).toBe('a on'));
});

describe('phases', () => {
  it('cover the duty without gaps and join what is given together', () => {
    const commands = [
      command({ id: 'b', time: 2, label: 'B' }),
      command({ id: 'a', time: 2, label: 'A' }),
      command({ time: 9, label: 'late' }),
    ];
    expect(dutyPhases({ duration: 7, commands }, (entry) => entry.label)).toEqual([
      { label: 'At rest', from: 0, to: 2 },
      { label: 'B, A', from: 2, to: 7 },
    ]);
  });
  it('is one phase without commands', () => {
    expect(dutyPhases({ duration: 3, commands: [] }, () => '')).toEqual([{ label: 'At rest', from: 0, to: 3 }]);
  });
});

describe('offers', () => {
  it('holds start, shift, load, supply dip and fault onset', () => {
    const words = offeredCommands(circuit(), kindOf).map((group) => [group.title, group.offers.map((entry) => entry.words)]);
    expect(words).toEqual([
      ['Commands', ['M1: start', 'M1: stop', 'V3: solenoid a on', 'V3: centre']],
      ['Load', ['A1: load']],
      ['Supply', ['Supply dips', 'Supply back to nominal', 'Supply lost']],
      ['Fault onset', ['M1: worn bearings']],
    ]);
  });
});

describe('lanes', () => {
  const press = [
    { id: 'm', kind: 'electric-motor', name: 'M1' },
    { id: 'p', kind: 'compensated-pump', name: 'P1' },
    { id: 'a', kind: 'cylinder', name: 'A1' },
  ];
  it('ask the five questions', () => {
    expect(defaultLanes({ components: press }).map((lane) => lane.address)).toEqual([
      'p.outlet.pressure',
      'p.flow',
      'm.torqueRatio',
      'm.speed',
      'a.position',
    ]);
  });
  it('name the part where there are several, and never exceed their number', () => {
    const lanes = defaultLanes({
      components: [...press, { id: 'a2', kind: 'cylinder', name: 'A2' }],
    });
    expect(lanes).toHaveLength(5);
    expect(lanes[4]?.title).toBe('A1 rod extended');
  });
  it('keep the load on one lane, and three in their order', () => {
    const lanes = defaultLanes({ components: press });
    expect(fewerLanes(lanes, 1).map((lane) => lane.title)).toEqual(['Motor torque']);
    expect(fewerLanes(lanes, 3).map((lane) => lane.title)).toEqual(['Pump port', 'Motor torque', 'Rod extended']);
  });
  it('fill up from what is there', () => {
    expect(
      defaultLanes({
        components: [{ id: 'v', kind: 'relief-valve', name: 'V1' }],
      }),
    ).toHaveLength(1);
  });
});
