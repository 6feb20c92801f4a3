import { coefficient, portValue, stateValue } from '../access.ts';
import { indices } from '../build.ts';
import { type Block, defineKind, type Explanation, type Workspace } from '../kind.ts';
import * as S from '../sources.ts';
import { cylinderCoefficients, cylinderEntries, cylinderFlow, cylinderJacobian, evaluateCylinder, prepareCylinder } from './kernel.ts';
import { cylinderFaults, cylinderInputs, cylinderParameters } from './parameters.ts';

const C = indices(cylinderCoefficients);
/** Gauge pressure under which a side counts as a cavity [Pa]. */
const CAVITY = -0.9e5;

function explain(
  equation: string,
  where: string,
  inputs: readonly string[],
  limits: string,
  source: string,
  assumptions: readonly string[] = [],
): Explanation {
  return { equation, where, inputs, assumptions, limits, source };
}

function hasWork(block: Block, i: number): boolean {
  return coefficient(block, i, C.workForce) > 0;
}

const position = (block: Block, i: number, w: Workspace): number => stateValue(block, i, 0, w);
const CONTINUITY = 'dp/dt = K/V·(sum of flows − dV/dt), V grows and shrinks with the rod';

export const cylinder = defineKind({
  id: 'cylinder',
  version: 1,
  title: 'Cylinder',
  word: 'cylinder',
  letter: 'A',
  stage: 'act',
  about:
    'Double-acting cylinder with one rod, its moving mass and its load: constant force, weight by angle, spring, and a piece of work whose force rises with position and, once the rod goes back, leaves only its springback. Friction with a rounded sign: a held rod creeps by less than 2 mm/s. Stiff end stops. Cushions and seal stretch are left out.',
  parameters: cylinderParameters,
  faults: cylinderFaults,
  ports: [
    {
      id: 'A',
      letter: 'A',
      label: 'Cap side',
      medium: 'oil',
      role: 'inlet',
      whenOpen: 'plugged',
      deadVolume: (plate) => plate.number('capDeadVolume'),
    },
    {
      id: 'B',
      letter: 'B',
      label: 'Rod side',
      medium: 'oil',
      role: 'outlet',
      whenOpen: 'plugged',
      deadVolume: (plate) => plate.number('rodDeadVolume'),
    },
  ],
  states: [
    { id: 'position', label: 'Rod position', quantity: 'length', nominal: 1e-2, start: (c) => c.start ?? 0 },
    { id: 'velocity', label: 'Rod speed', quantity: 'velocity', nominal: 0.1, start: () => 0 },
  ],
  inputs: cylinderInputs,
  screws: [],
  coefficients: cylinderCoefficients,
  prepare: prepareCylinder,
  entries: cylinderEntries,
  flow: cylinderFlow,
  jacobian: cylinderJacobian,
  powers: (block, i, w, out) => {
    const q = evaluateCylinder(block, i, w);
    const v = stateValue(block, i, 1, w);
    const work = q.load * v;
    if (work >= 0) out.delivered += work;
    else out.supplied -= work;
    out.heat += q.friction * v + q.leak * (portValue(block, i, 0, w) - portValue(block, i, 1, w)) - q.stop * v - q.stopStored;
    out.stored += coefficient(block, i, C.mass) * v * q.acceleration + q.stopStored;
  },
  signals: [
    { id: 'out', rises: 'rod fully extended', falls: '', value: (block, i, w) => position(block, i, w) - coefficient(block, i, C.stroke) },
    { id: 'in', rises: 'rod fully retracted', falls: '', value: (block, i, w) => -position(block, i, w) },
    {
      id: 'work-met',
      rises: 'meets the work',
      falls: 'leaves the work',
      value: (block, i, w) => (hasWork(block, i) ? position(block, i, w) - coefficient(block, i, C.workContact) : -1),
    },
    {
      id: 'work-done',
      rises: 'work done',
      falls: '',
      value: (block, i, w) =>
        hasWork(block, i) ? position(block, i, w) - coefficient(block, i, C.workContact) - coefficient(block, i, C.workTravel) : -1,
    },
    {
      id: 'cap-cavity',
      rises: 'cap side runs empty',
      falls: 'cap side refilled',
      value: (block, i, w) => CAVITY - portValue(block, i, 0, w),
    },
    {
      id: 'rod-cavity',
      rises: 'rod side runs empty',
      falls: 'rod side refilled',
      value: (block, i, w) => CAVITY - portValue(block, i, 1, w),
    },
  ],
  trips: [],
  readings: [
    {
      id: 'position',
      label: 'Rod position',
      quantity: 'length',
      value: position,
      explain: explain(
        'dx/dt = v',
        'x from fully retracted',
        ['velocity', 'startPosition'],
        'A stop gives by a tenth of a millimetre or so.',
        S.NEWTON,
      ),
    },
    {
      id: 'velocity',
      label: 'Rod speed',
      quantity: 'velocity',
      value: (block, i, w) => stateValue(block, i, 1, w),
      explain: explain(
        'm·dv/dt = pA·AA − pB·AB − load − friction + end stop',
        'AA piston area, AB ring area',
        ['mass', 'capPressure', 'rodPressure', 'loadForce', 'coulomb', 'stiction', 'viscous'],
        'A held rod creeps: the friction’s sign is rounded within 2 mm/s.',
        S.CYLINDER,
      ),
    },
    {
      id: 'force',
      label: 'Hydraulic force',
      quantity: 'force',
      value: (block, i, w) => evaluateCylinder(block, i, w).force,
      explain: explain(
        'F = pA·AA − pB·AB',
        'positive pushes the rod out',
        ['capPressure', 'rodPressure', 'bore', 'rod'],
        'Before friction.',
        S.CYLINDER,
      ),
    },
    {
      id: 'loadForce',
      label: 'Load',
      quantity: 'force',
      value: (block, i, w) => evaluateCylinder(block, i, w).load,
      explain: explain(
        'F = load + m·g·sin(angle) + spring + work',
        'work = force at full·((x − contact)/(full − contact))^shape',
        ['loadForce', 'mass', 'angle', 'springRate', 'workContact', 'workFull', 'workForce', 'workShape', 'workSpringback'],
        'Positive against coming out.',
        'definition of this load',
        ['Once the rod goes back only the springback of the work is left.'],
      ),
    },
    {
      id: 'capPressure',
      label: 'Cap-side pressure',
      quantity: 'pressure',
      value: (block, i, w) => portValue(block, i, 0, w),
      explain: explain(CONTINUITY, 'V = dead volume + AA·x', ['A.pressure', 'capDeadVolume'], S.AS_INPUTS, S.CONTINUITY),
    },
    {
      id: 'rodPressure',
      label: 'Rod-side pressure',
      quantity: 'pressure',
      value: (block, i, w) => portValue(block, i, 1, w),
      explain: explain(
        CONTINUITY,
        'V = dead volume + AB·(stroke − x)',
        ['B.pressure', 'rodDeadVolume'],
        'May exceed the cap side: intensification.',
        S.INTENSIFICATION,
      ),
    },
    {
      id: 'highestPressure',
      label: 'Higher of both sides',
      quantity: 'pressure',
      value: (block, i, w) => Math.max(portValue(block, i, 0, w), portValue(block, i, 1, w)),
      explain: explain('the larger of pA, pB', 'pressures of the two sides', ['capPressure', 'rodPressure'], S.AS_INPUTS, S.DEFINITION),
    },
  ],
  checks: (plate) => {
    const words: string[] = [];
    if (plate.number('rod') >= plate.number('bore')) words.push('the rod is not thinner than the bore');
    if (plate.number('startPosition') > plate.number('stroke')) words.push('the start position is beyond the stroke: taken at the end');
    if (plate.number('workForce') > 0 && plate.number('workFull') <= plate.number('workContact')) {
      words.push('the work is done before it is met: taken as 1 mm of travel');
    }
    if (plate.number('stiction') < plate.number('coulomb'))
      words.push('friction when breaking loose is below sliding friction: taken as equal');
    return words;
  },
  passes: [],
});
