import { BAR, choice, LITRE_PER_MINUTE, number, raw, settingInput } from '../build.ts';
import type { FaultSpec, InputSpec, ParameterSpec, ScrewSpec } from '../kind.ts';
import * as S from '../sources.ts';

/** Nameplate, screw, faults and inputs of the relief valve, direct-acting or pilot-operated. */

const LIFT =
  'opening lift = (Δp − cracking)/(2·(set − cracking)), held between 0 and 1: half lift and the flow it was set at when Δp is the set pressure';
const CLOSE = 'closing lift = (Δp − reseat)/(2·(set − reseat)) below the set pressure; between the two lines the poppet stays where it is';

export const reliefParameters: readonly ParameterSpec[] = [
  choice(
    'plate',
    'type',
    'Type',
    [
      ['direct', 'direct-acting'],
      ['pilot', 'pilot-operated'],
    ],
    'pilot',
    'Direct-acting valves are fast with a large override, pilot-operated ones slower with a small one. The figures below count; this word chooses the symbol.',
    S.RELIEF,
  ),
  number(
    'setting',
    'setPressure',
    'Set pressure',
    'pressure',
    210 * BAR,
    [2 * BAR, 1000 * BAR],
    'Pressure at which the valve passes the flow it was set with. It starts to open lower, at cracking.',
    S.RELIEF_GAP,
    {
      equation: 'cracking = set/(1 + override)',
    },
  ),
  number(
    'detail',
    'leastSet',
    'Set pressure, least',
    'pressure',
    20 * BAR,
    [1 * BAR, 1000 * BAR],
    'Lower end of the adjustable range.',
    S.PRACTICE,
  ),
  number(
    'detail',
    'mostSet',
    'Set pressure, most',
    'pressure',
    315 * BAR,
    [2 * BAR, 1000 * BAR],
    'Upper end of the adjustable range.',
    S.PRACTICE,
  ),
  number(
    'detail',
    'setPerTurn',
    'Set pressure, per turn',
    'pressurePerTurn',
    40 * BAR,
    [0.1 * BAR, 500 * BAR],
    'Change of the setting for one turn in.',
    S.PRACTICE,
  ),
  number(
    'plate',
    'setFlow',
    'Flow it was set at',
    'flow',
    40 * LITRE_PER_MINUTE,
    [0.1 * LITRE_PER_MINUTE, 5000 * LITRE_PER_MINUTE],
    'Flow through the valve at the set pressure: the pump’s full flow.',
    S.RELIEF_SIZE,
    { equation: LIFT },
  ),
  number(
    'plate',
    'override',
    'Override',
    'fraction',
    0.08,
    [0.005, 1],
    '(set − cracking) ÷ cracking: direct-acting about 20 %, pilot-operated 5–8 %.',
    S.RELIEF,
    {
      typical: [0.03, 0.5],
      equation: 'cracking = set/(1 + override)',
    },
  ),
  number(
    'plate',
    'reseat',
    'Reseat',
    'fraction',
    0.9,
    [0.5, 1],
    'Pressure at which the valve has closed again ÷ cracking pressure.',
    S.RESEAT,
    {
      typical: [0.8, 0.95],
      equation: CLOSE,
    },
  ),
  number(
    'detail',
    'lag',
    'Lag',
    'time',
    0.025,
    [1e-4, 1],
    'Time constant of the lift: direct-acting about 10 ms, pilot-operated about 25 ms.',
    S.TYPICAL,
    {
      typical: [0.005, 0.1],
      equation: 'd(lift)/dt = (wanted lift − lift)/lag',
    },
  ),
  number(
    'plate',
    'ratedPressure',
    'Rated pressure',
    'pressure',
    null,
    [1 * BAR, 1000 * BAR],
    'Highest pressure the valve body is made for.',
    S.PRACTICE,
    { ratingOf: 'P.pressure' },
  ),
  raw('crackingPressure', 'Cracking pressure (raw)', 'pressure', [1e4, 1e8], 'pCrack.'),
  raw('overridePressure', 'Pressure for full lift above cracking (raw)', 'pressure', [1e3, 1e8], 'pOv.'),
  raw('flowCoefficient', 'Flow coefficient at full lift (raw)', 'flowCoefficient', [1e-12, 1e-2], 'Kr.'),
];

export const reliefScrews: readonly ScrewSpec[] = [
  {
    id: 'setPressure',
    label: 'Relief',
    short: 'relief',
    perTurn: 'setPerTurn',
    least: 'leastSet',
    most: 'mostSet',
    inward: 'raises',
    anchor: 'setPressure',
  },
];

export const reliefFaults: readonly FaultSpec[] = [
  { id: 'stuck-open', label: 'Stuck open', help: '0: closes. 1: stays fully open.' },
  { id: 'stuck-shut', label: 'Stuck shut', help: '0: opens as on the plate. 1: never opens; nothing protects the net.' },
  { id: 'weak-spring', label: 'Weak or broken spring', help: '0: as set. 1: half the set pressure is left.' },
];

export const reliefInputs: readonly InputSpec[] = [settingInput('setPressure', 'Relief', 'pressure', [2 * BAR, 1000 * BAR], 0.5)];
