import { defineKind } from '../kind.ts';
import { prepareValve, valveCoefficients, valveEntries, valveFlow, valveHeat, valveJacobian } from './kernel.ts';
import { centreParameters, valveParameters, valvePorts } from './parameters.ts';
import { valveReadings } from './readings.ts';

export const directionalValve43 = defineKind({
  id: 'directional-valve-4-3',
  version: 1,
  title: '4/3 directional valve',
  word: '4/3 valve',
  letter: 'V',
  stage: 'direct',
  about:
    'Spool valve with three positions: solenoid a joins P to A and B to T, solenoid b joins P to B and A to T, springs bring it to the centre. Edges from a rated flow at a rated drop, with spool leakage: it does not hold a load. Flow forces are left out.',
  parameters: [...centreParameters.slice(0, 1), ...valveParameters, ...centreParameters.slice(1)],
  faults: [],
  ports: valvePorts,
  states: [],
  inputs: [
    {
      id: 'spool',
      label: 'Spool',
      quantity: 'number',
      min: -1,
      max: 1,
      rest: () => 0,
      ramp: 0.05,
      words: [
        { value: 1, label: 'solenoid a on' },
        { value: 0, label: 'solenoids off' },
        { value: -1, label: 'solenoid b on' },
      ],
      role: 'command',
    },
  ],
  screws: [],
  coefficients: valveCoefficients,
  prepare: (plate, run) => prepareValve(plate, run, plate.choice('centre')),
  entries: valveEntries,
  flow: valveFlow,
  jacobian: valveJacobian,
  powers: (block, i, w, out) => {
    out.heat += valveHeat(block, i, w);
  },
  signals: [],
  trips: [],
  readings: valveReadings,
  // Every edge can close.
  passes: [],
});
