import { BAR, choice, LITRE_PER_MINUTE, number, raw } from '../build.ts';
import type { FaultSpec, InputSpec, ParameterSpec } from '../kind.ts';
import * as S from '../sources.ts';

/** Nameplate, load, faults and inputs of the double-acting cylinder. */

const MOTION = 'm·dv/dt = pA·AA − pB·AB − load − friction + end stop';
const FRICTION = 'friction = (Fc + (Fs − Fc)/(1 + (v/0.02)²))·sign(v) + b·v, the sign rounded within 2 mm/s';
const WORK =
  'work force = force at full·((x − contact)/(full − contact))^shape for x beyond contact, continuing beyond full; × springback once the rod goes back (below −20 mm/s)';

export const cylinderParameters: readonly ParameterSpec[] = [
  number('plate', 'bore', 'Bore', 'length', 0.063, [0.005, 1], 'Piston diameter.', S.PRACTICE, { equation: 'AA = π·bore²/4' }),
  number('plate', 'rod', 'Rod', 'length', 0.036, [0.001, 0.99], 'Rod diameter; smaller than the bore.', S.PRACTICE, {
    equation: 'AB = π·(bore² − rod²)/4',
  }),
  number('plate', 'stroke', 'Stroke', 'length', 0.5, [0.001, 20], 'Travel between the end stops.', S.PRACTICE),
  number(
    'plate',
    'ratedPressure',
    'Rated pressure',
    'pressure',
    null,
    [1 * BAR, 1000 * BAR],
    'Highest pressure on either side of the piston.',
    S.PRACTICE,
    { ratingOf: 'highestPressure' },
  ),
  number('load', 'mass', 'Moving mass', 'mass', 100, [0.1, 1e6], 'Rod, piston and everything that moves with them.', S.PRACTICE, {
    equation: MOTION,
  }),
  number(
    'load',
    'startPosition',
    'Position at the start',
    'length',
    0,
    [0, 20],
    'Rod travel from fully retracted when the run starts.',
    S.CHOICE,
  ),
  number(
    'load',
    'angle',
    'Angle',
    'angle',
    0,
    [-Math.PI / 2, Math.PI / 2],
    '0 horizontal; +90° the rod lifts the mass as it comes out; −90° it lowers it.',
    S.CHOICE,
    {
      equation: 'weight = m·g·sin(angle), g = 9.80665 m/s²',
    },
  ),
  number('load', 'loadForce', 'Constant load', 'force', 0, [-1e8, 1e8], 'Force against coming out; negative pulls the rod out.', S.CHOICE, {
    equation: MOTION,
  }),
  number('load', 'springRate', 'Spring rate', 'stiffness', 0, [0, 1e9], 'Spring that pushes the rod back in.', S.CHOICE, {
    equation: 'spring force = rate·(x − from), only beyond "from"',
  }),
  number('load', 'springFrom', 'Spring starts at', 'length', 0, [0, 20], 'Position at which the spring is met.', S.CHOICE),
  number('load', 'workContact', 'Work met at', 'length', 0, [0, 20], 'Position at which the rod meets the work.', S.CHOICE, {
    equation: WORK,
  }),
  number('load', 'workFull', 'Work done at', 'length', 0.5, [0, 20], 'Position at which the work gives its full force.', S.CHOICE, {
    equation: WORK,
  }),
  number(
    'load',
    'workForce',
    'Force of the work',
    'force',
    0,
    [0, 1e8],
    'Force at the position where the work is done; 0 means no work.',
    S.CHOICE,
    { equation: WORK },
  ),
  choice(
    'load',
    'workShape',
    'Shape of the work',
    [
      ['1', 'straight'],
      ['2', 'square'],
      ['3', 'cube'],
    ],
    '2',
    'How the force rises: straight like a spring, or ever steeper like a bale.',
    S.CHOICE,
  ),
  number(
    'load',
    'workSpringback',
    'Springback of the work',
    'fraction',
    1,
    [0, 1],
    'Share of the work’s force that pushes back once the rod retreats: 100 % for a spring, a few per cent for card or metal that stays pressed.',
    S.CHOICE,
    { equation: WORK },
  ),
  number(
    'load',
    'requiredForce',
    'Force required',
    'force',
    null,
    [0, 1e8],
    'Force the job needs at the rod; used for verdicts, not in the run. Without it the force of the work counts.',
    S.CHOICE,
  ),
  number(
    'detail',
    'coulomb',
    'Friction, sliding',
    'force',
    1500,
    [0, 1e7],
    'Coulomb friction of seals and guides.',
    `${S.TYPICAL}: 3 % of the force at rated pressure`,
    { equation: FRICTION },
  ),
  number(
    'detail',
    'stiction',
    'Friction, breaking loose',
    'force',
    2250,
    [0, 1e7],
    'Friction at standstill; at least the sliding friction.',
    `${S.TYPICAL}: 1.5 × sliding`,
    { equation: FRICTION },
  ),
  number('detail', 'viscous', 'Friction, viscous', 'damping', 1000, [0, 1e7], 'Friction that grows with speed.', S.TYPICAL, {
    typical: [200, 10000],
    equation: FRICTION,
  }),
  number(
    'detail',
    'crossLeakage',
    'Piston leakage',
    'leakage',
    0,
    [0, (10 * LITRE_PER_MINUTE) / BAR],
    'Leakage past the piston per bar, with ISO VG 46 at 40 °C; none with soft seals.',
    S.TYPICAL,
    {
      equation: 'q = kCyl·(pA − pB)·μ_ref/μ',
    },
  ),
  number(
    'detail',
    'capDeadVolume',
    'Dead volume, cap side',
    'volume',
    5e-5,
    [1e-6, 0.1],
    'Oil behind the piston when fully retracted.',
    S.PRACTICE,
  ),
  number(
    'detail',
    'rodDeadVolume',
    'Dead volume, rod side',
    'volume',
    5e-5,
    [1e-6, 0.1],
    'Oil on the rod side when fully extended.',
    S.PRACTICE,
  ),
  raw('crossLeakage', 'Piston leakage (raw)', 'leakage', [0, 1e-6], 'kCyl in m³/s per Pa.'),
  raw('stopStiffness', 'End-stop stiffness (raw)', 'stiffness', [1e5, 1e12], 'kStop; 1e8 N/m unless given.'),
  raw('stopDamping', 'End-stop damping (raw)', 'number', [0, 1e4], 'dStop in s/m; 20 unless given.'),
];

export const cylinderFaults: readonly FaultSpec[] = [
  {
    id: 'piston-bypass',
    label: 'Piston seal bypassing',
    help: '0: as on the plate. 1: at 100 bar across the piston enough oil passes it to stop a rod moving at 100 mm/s.',
  },
  { id: 'bound-rod', label: 'Rod bound', help: '0: free. 1: guide friction as large as the force of 100 bar on the piston.' },
];

export const cylinderInputs: readonly InputSpec[] = [
  {
    id: 'load',
    label: 'Load',
    quantity: 'force',
    min: -1e8,
    max: 1e8,
    rest: (plate) => plate.number('loadForce'),
    ramp: 0.1,
    role: 'load',
  },
];
