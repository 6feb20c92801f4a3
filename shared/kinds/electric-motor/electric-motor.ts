import { stateValue } from '../access.ts';
import { indices } from '../build.ts';
import { type Block, defineKind, type Workspace } from '../kind.ts';
import { evaluateMotor, motorCoefficients, motorInputIds, prepareMotor } from './curve.ts';
import { motorFaults, motorInputs } from './inputs.ts';
import { motorParameters } from './parameters.ts';
import { motorReadings } from './readings.ts';

const C = indices(motorCoefficients);
const U = indices(motorInputIds);
/** With the contactor open the relay cools this many times slower. */
const COOLING = 3;

function relayRate(block: Block, i: number, w: Workspace): number {
  const on = w.u[block.input[i * block.inputCount + U.contactor]!]!;
  return (1 + (COOLING - 1) * on) / (COOLING * block.c[i * block.coefficientCount + C.relayTime]!);
}

/** Current at which θ settles at 1 [A]. */
function relayLimit(block: Block, i: number, w: Workspace): number {
  return block.c[i * block.coefficientCount + C.relayFactor]! * w.u[block.input[i * block.inputCount + U.relayDial]!]!;
}

export const electricMotor = defineKind({
  id: 'electric-motor',
  version: 1,
  title: 'Electric motor',
  word: 'motor',
  letter: 'M',
  stage: 'drive',
  about:
    'Three-phase induction motor with contactor and thermal overload relay. Torque by the Kloss equation from no load to pull-out through the plate point, then smoothly through pull-up to locked rotor; torque with the square of voltage. Quasi-steady: no electrical transients, no heating of the winding. It has no brake: a load can drive it backwards.',
  parameters: motorParameters,
  faults: motorFaults,
  ports: [{ id: 'shaft', letter: '', label: 'Shaft', medium: 'shaft', role: 'outlet', whenOpen: 'problem' }],
  states: [{ id: 'overloadHeat', label: 'Overload relay heat', quantity: 'fraction', nominal: 0.1, start: () => 0 }],
  inputs: motorInputs,
  screws: [],
  coefficients: motorCoefficients,
  prepare: prepareMotor,
  inertia: (plate) => plate.number('inertia'),
  entries: [
    ['shaft', 'shaft'],
    ['state:overloadHeat', 'shaft'],
    ['state:overloadHeat', 'state:overloadHeat'],
  ],
  flow: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      const point = evaluateMotor(block, i, w);
      const shaft = block.balance[i]!;
      w.balance[shaft] = w.balance[shaft]! + point.shaft;
      const heat = block.state[i]!;
      const load = point.current / relayLimit(block, i, w);
      w.dy[heat] = (load * load - w.y[heat]!) * relayRate(block, i, w);
    }
  },
  jacobian: (block, w) => {
    for (let i = 0; i < block.count; i += 1) {
      const point = evaluateMotor(block, i, w);
      const e = 3 * i;
      const onShaft = block.slot[e]!;
      const heatOnShaft = block.slot[e + 1]!;
      const heatOnHeat = block.slot[e + 2]!;
      const limit = relayLimit(block, i, w);
      const rate = relayRate(block, i, w);
      w.jac[onShaft] = w.jac[onShaft]! + point.shaftSlope;
      w.jac[heatOnShaft] = w.jac[heatOnShaft]! + ((2 * point.current * point.currentSlope) / (limit * limit)) * rate;
      w.jac[heatOnHeat] = w.jac[heatOnHeat]! - rate;
    }
  },
  powers: (block, i, w, out) => {
    const point = evaluateMotor(block, i, w);
    const speed = w.y[block.port[i]!]!;
    const work = point.field * speed;
    // Driven above synchronous speed or backwards the motor brakes: its work goes out, not in.
    if (work >= 0) out.supplied += work;
    else out.delivered -= work;
    out.heat += point.losses * speed;
  },
  signals: [
    {
      id: 'up-to-speed',
      rises: 'passes pull-out speed',
      falls: 'falls below pull-out speed',
      value: (block, i, w) => {
        const point = evaluateMotor(block, i, w);
        const speed = w.y[block.port[i]!]!;
        return (point.synchronous < 0 ? -speed : speed) - point.pullOutSpeed;
      },
    },
    {
      id: 'overload-trip',
      rises: 'overload relay trips',
      falls: '',
      value: (block, i, w) => (block.c[i * block.coefficientCount + C.relayFitted]! > 0 ? stateValue(block, i, 0, w) - 1 : -1),
    },
    {
      id: 'switched-on',
      rises: 'motor switched on',
      falls: 'motor switched off',
      value: (block, i, w) => w.u[block.input[i * block.inputCount + U.contactor]!]! - 0.5,
    },
  ],
  trips: [{ signal: 'overload-trip', input: 'contactor', value: 0, label: 'overload relay trips: contactor opens' }],
  readings: motorReadings,
  checks: (plate) => {
    const words: string[] = [];
    const synchronous = (4 * Math.PI * plate.number('ratedFrequency')) / Number(plate.choice('poles'));
    if (plate.number('ratedSpeed') >= synchronous) words.push('the rated speed is not below synchronous speed: check poles and frequency');
    if (plate.number('noLoadCurrent') >= plate.number('ratedCurrent')) words.push('the no-load current is not below the full-load current');
    if (plate.choice('designLetter') === 'entered' && plate.number('pullUp') > plate.number('pullOut')) {
      words.push('the pull-up torque is above the pull-out torque');
    }
    return words;
  },
  passes: [],
});
