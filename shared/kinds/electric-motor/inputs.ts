import type { FaultSpec, InputSpec } from '../kind.ts';

/** Faults and inputs of the three-phase induction motor. */

export const motorFaults: readonly FaultSpec[] = [
  {
    id: 'single-phasing',
    label: 'One phase lost',
    help: '0: three phases. 1: one leg dead; under half the pull-out torque is left and none at standstill.',
  },
  {
    id: 'stuck-in-star',
    label: 'Stuck in star (US: wye)',
    help: '0: delta. 1: the starter never changes over; a third of the torque is left.',
  },
  { id: 'wrong-rotation', label: 'Wrong rotation', help: 'Two leads exchanged: from 0.5 on the field turns backwards.' },
  {
    id: 'worn',
    label: 'Worn motor',
    help: '0: as new. 1: a quarter of the torque lost and bearings that drag with a tenth of rated torque.',
  },
];

export const motorInputs: readonly InputSpec[] = [
  {
    id: 'contactor',
    label: 'Contactor',
    quantity: 'number',
    min: 0,
    max: 1,
    rest: (plate) => (plate.choice('contactorAtStart') === 'closed' ? 1 : 0),
    ramp: 0,
    words: [
      { value: 1, label: 'start' },
      { value: 0, label: 'stop' },
    ],
    role: 'command',
  },
  {
    id: 'supplyVoltage',
    label: 'Supply voltage',
    quantity: 'voltage',
    min: 0,
    max: 1000,
    rest: (_plate, run) => run.supplyVoltage,
    ramp: 0.02,
    role: 'setting',
  },
  {
    id: 'supplyFrequency',
    label: 'Supply frequency',
    quantity: 'frequency',
    min: 10,
    max: 100,
    rest: (_plate, run) => run.supplyFrequency,
    ramp: 0.1,
    role: 'setting',
  },
  {
    id: 'relayDial',
    label: 'Overload dial',
    quantity: 'current',
    min: 0.1,
    max: 2000,
    rest: (plate) => plate.number('relayDial'),
    ramp: 0,
    role: 'setting',
  },
];
