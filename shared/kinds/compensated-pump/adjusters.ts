import { BAR, CUBIC_CENTIMETRE_PER_TURN as CC, settingInput } from '../build.ts';
import type { FaultSpec, InputSpec, ScrewSpec } from '../kind.ts';

/** Screws, faults and inputs of the pressure-compensated piston pump. */

export const pumpScrews: readonly ScrewSpec[] = [
  {
    id: 'compensatorPressure',
    label: 'Compensator',
    short: 'comp.',
    perTurn: 'compensatorPerTurn',
    least: 'leastCompensator',
    most: 'mostCompensator',
    inward: 'raises',
    anchor: 'compensatorPressure',
  },
  {
    id: 'maxVolumeStop',
    label: 'Max. volume stop',
    short: 'vol. stop',
    perTurn: 'stopPerTurn',
    least: 'leastStop',
    most: 'mostStop',
    inward: 'lowers',
    anchor: 'maxVolumeStop',
  },
  {
    id: 'minVolumeStop',
    label: 'Min. volume stop',
    short: 'min. stop',
    perTurn: 'minStopPerTurn',
    least: 'leastMinStop',
    most: 'mostMinStop',
    inward: 'raises',
    anchor: 'minVolumeStop',
  },
];

export const pumpFaults: readonly FaultSpec[] = [
  {
    id: 'stuck-on-stroke',
    label: 'Stuck on stroke',
    help: '0: free. 1: the swash plate stays at its stop whatever the pressure; only the relief limits it.',
  },
  {
    id: 'stuck-off-stroke',
    label: 'Stuck off stroke',
    help: '0: free. 1: the swash plate stays at the minimum stop and the pump does not deliver.',
  },
  { id: 'slow', label: 'Slow control (plugged orifice)', help: '0: lags as on the plate. 1: both lags ten times as long.' },
  { id: 'worn', label: 'Worn', help: '0: leakage as on the plate. 1: ten times as much.' },
  { id: 'dry', label: 'Run dry', help: '0: lubricated. 1: a quarter of full ideal torque is added as friction.' },
  { id: 'seized', label: 'Seized', help: '0: free. 1: friction of five times the full ideal torque: the shaft does not turn.' },
  { id: 'coupling-sheared', label: 'Coupling sheared', help: '0: whole. 1: the motor turns, the pump does not.' },
];

export const pumpInputs: readonly InputSpec[] = [
  settingInput('compensatorPressure', 'Compensator', 'pressure', [5 * BAR, 700 * BAR], 0.5),
  settingInput('maxVolumeStop', 'Max. volume stop', 'displacement', [0.1 * CC, 1000 * CC], 0.5),
  settingInput('minVolumeStop', 'Min. volume stop', 'displacement', [0, 500 * CC], 0.5),
];
