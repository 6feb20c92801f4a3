import { defineKind } from '../kind.ts';
import { prepareValve, valveCoefficients, valveEntries, valveFlow, valveHeat, valveJacobian } from './kernel.ts';
import { valveParameters, valvePorts } from './parameters.ts';
import { valveReadings } from './readings.ts';

export const directionalValve42 = defineKind({
  id: 'directional-valve-4-2',
  version: 1,
  title: '4/2 directional valve',
  word: '4/2 valve',
  letter: 'V',
  stage: 'direct',
  about:
    'Spool valve with two positions: the spring joins P to B and A to T, the solenoid joins P to A and B to T. All ports are shut for a moment as it crosses. Edges from a rated flow at a rated drop, with spool leakage: it does not hold a load. Flow forces are left out.',
  parameters: valveParameters,
  faults: [],
  ports: valvePorts,
  states: [],
  inputs: [
    {
      id: 'spool',
      label: 'Spool',
      quantity: 'number',
      min: 0,
      max: 1,
      rest: () => 0,
      ramp: 0.05,
      words: [
        { value: 1, label: 'solenoid on' },
        { value: 0, label: 'solenoid off' },
      ],
      role: 'command',
    },
  ],
  screws: [],
  coefficients: valveCoefficients,
  prepare: (plate, run) => prepareValve(plate, run, ''),
  entries: valveEntries,
  flow: valveFlow,
  jacobian: valveJacobian,
  powers: (block, i, w, out) => {
    out.heat += valveHeat(block, i, w);
  },
  signals: [],
  trips: [],
  readings: valveReadings,
  passes: [],
});
